import { type Measurement, type ReadMeasurement, readWithRivals } from '#engine';
import type { PackedCollection } from './compareData.ts';

/** Reads a measurement under the collection's policy, as the commands do. */
export function createReader({ policy, freeIons }: PackedCollection): (measurement: Measurement) => ReadMeasurement {
  const known = new Map(freeIons.map((one) => [one.ion, one]));
  return (measurement) => readWithRivals(measurement, policy, known.get(measurement.ion.name) ?? null);
}
