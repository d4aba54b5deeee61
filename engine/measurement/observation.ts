import type { Policy } from '../policy/types.ts';
import { bandUncertainty } from './defaultUncertainty.ts';
import type { Band, Measurement } from './types.ts';

/** One or several bands of a measurement standing for one transition. Energies in cm-1. */
export interface Observation {
  /** Indices into `Measurement.bands`. */
  readonly bands: readonly number[];
  readonly position: number;
  readonly uMinus: number;
  readonly uPlus: number;
  readonly uAssumed: boolean;
}

/** Symmetric standard uncertainty that stands for an asymmetric one in a covariance: sqrt((u1^2 + u2^2)/2). */
export function symmetricU(observation: Pick<Observation, 'uMinus' | 'uPlus'>): number {
  return Math.sqrt((observation.uMinus ** 2 + observation.uPlus ** 2) / 2);
}

export function singleBand(measurement: Measurement, index: number, policy: Policy): Observation {
  const band = measurement.bands[index]!;
  const { uMinus, uPlus, assumed } = bandUncertainty(band, policy);
  return { bands: [index], position: band.position, uMinus, uPlus, uAssumed: assumed };
}

/**
 * Components of one term merged to their barycentre weighted by degeneracy, sum(n nu) / sum(n); never the
 * plain mean, never the lowest.
 *
 * @throws RangeError where a component carries no degeneracy
 */
export function mergedBands(measurement: Measurement, indices: readonly number[], policy: Policy): Observation {
  let weight = 0;
  let position = 0;
  let low = 0;
  let high = 0;
  let uAssumed = false;
  for (const index of indices) {
    const band = measurement.bands[index]!;
    if (band.degeneracy === null) throw new RangeError(`bands[${index}].degeneracy: missing; components are merged by degeneracy`);
    const { uMinus, uPlus, assumed } = bandUncertainty(band, policy);
    weight += band.degeneracy;
    position += band.degeneracy * band.position;
    low += (band.degeneracy * uMinus) ** 2;
    high += (band.degeneracy * uPlus) ** 2;
    uAssumed ||= assumed;
  }
  return { bands: indices, position: position / weight, uMinus: Math.sqrt(low) / weight, uPlus: Math.sqrt(high) / weight, uAssumed };
}

/** Why a band takes no part in any fit, or null where it may. */
export function setAside(band: Band): string | null {
  if (band.leftOut !== null) return band.leftOut;
  switch (band.role) {
    case 'transition':
      return null;
    case 'CT':
      return 'charge transfer, not a d-d transition';
    case 'ligand':
      return 'transition within a ligand, not a d-d transition';
    case 'vibration':
      return 'vibration, not a d-d transition';
    case 'impurity':
      return 'ascribed to an impurity';
  }
}
