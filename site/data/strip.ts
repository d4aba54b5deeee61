import type { BandKind } from '#engine';
import type { StripRow } from '../charts/strip.ts';
import { listed, ratio } from './show.ts';
import type { MeasurementNode } from './tree.ts';

/** The measurement as the band strip draws it: bands that no transition of the chosen reading takes have a dotted stem. */
export function stripRow(measurement: MeasurementNode): StripRow {
  return stripRowOf(measurement, measurement.chosen.transitions.flatMap((transition) => transition.bands.map((band) => band.number)));
}

/** The same for any reading. @param fitted numbers of the bands that the reading takes */
export function stripRowOf(measurement: MeasurementNode, fitted: readonly number[]): StripRow {
  const assigned = new Set(fitted);
  return {
    bands: measurement.bands.map((band) => ({
      position: band.position, kind: band.kind as BandKind, side: band.side, width: band.width, fitted: assigned.has(band.number),
    })),
    absent: measurement.absent.map(({ low, high }) => ({ low, high })),
    scanned: measurement.scanned.map(({ low, high }) => ({ low, high })),
  };
}

/** The strip in words. */
export function stripTitle(measurement: MeasurementNode): string {
  if (measurement.bands.length === 0) return 'No band recorded';
  return `Bands at ${listed(measurement.bands.map((band) => `${ratio(band.position, 0)}${band.kind === 'maximum' ? '' : ` (${band.kind})`}`))} cm⁻¹`;
}
