import type { Policy } from '../policy/types.ts';
import type { Band } from './types.ts';

/** One standard uncertainty towards lower and towards higher wavenumber, cm-1. */
export interface BandUncertainty {
  readonly uMinus: number;
  readonly uPlus: number;
  /** true where no uncertainty was typed. */
  readonly assumed: boolean;
}

/** Widths taken where none was recorded, cm-1: an ordinary d-d band, and a narrow dip. */
const usualWidth = 3000;
const usualDipWidth = 500;

/** A shoulder of unrecorded width: away from the stronger neighbour and towards it. */
const shoulderAway = 600;
const shoulderTowards = 250;

function byKind(band: Band, policy: Policy): [number, number] {
  const { width } = band;
  const asMaximum = width === null ? policy.defaultUncertainties.maximum : 30 + 0.02 * width;
  switch (band.kind) {
    case 'maximum':
      return [asMaximum, asMaximum];
    case 'component': {
      const u = band.deconvoluted ? 2 * asMaximum : asMaximum;
      return [u, u];
    }
    case 'line':
    case 'zero-phonon':
      return [policy.defaultUncertainties.line, policy.defaultUncertainties.line];
    case 'dip': {
      const u = 0.5 * (width ?? usualDipWidth);
      return [u, u];
    }
    case 'centroid':
      return [0.05 * (width ?? usualWidth), 0.05 * (width ?? usualWidth)];
    case 'envelope':
      return [0.15 * (width ?? usualWidth), 0.15 * (width ?? usualWidth)];
    case 'shoulder': {
      // A shoulder is seen displaced towards its stronger neighbour, so its band lies on the far side.
      const away = width === null ? shoulderAway : 0.35 * width;
      const towards = width === null ? shoulderTowards : 0.15 * width;
      if (band.side === 'higher') return [away, towards];
      if (band.side === 'lower') return [towards, away];
      return [away, away];
    }
  }
}

/**
 * The uncertainty of a band's position: as typed, or by the way it was read.
 *
 * A default is never below half the last typed digit / sqrt 3 (a rectangular distribution, GUM 4.3.7).
 */
export function bandUncertainty(band: Band, policy: Policy): BandUncertainty {
  if (band.uMinus !== null && band.uPlus !== null) return { uMinus: band.uMinus, uPlus: band.uPlus, assumed: false };
  const [low, high] = byKind(band, policy);
  const least = band.halfDigit / Math.sqrt(3);
  return { uMinus: Math.max(low, least), uPlus: Math.max(high, least), assumed: true };
}
