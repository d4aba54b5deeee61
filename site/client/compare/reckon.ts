// Fetched when bands are first typed: all that reads a measurement is larger than the form.

import { type Measurement, type ReadMeasurement, readWithRivals } from '#engine';
import type { PackedCollection } from './compareData.ts';

export type Reader = (measurement: Measurement) => ReadMeasurement;

/** Reads a measurement under the collection's policy, as the commands do. */
export function createReader({ policy, freeIons }: PackedCollection): Reader {
  const known = new Map(freeIons.map((one) => [one.ion, one]));
  return (measurement) => readWithRivals(measurement, policy, known.get(measurement.ion.name) ?? null);
}
