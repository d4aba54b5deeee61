import { freeIon } from '#engine';
import type { Reading } from '#engine';
import type { Collection } from '../content/types.ts';
import type { ReadingCache } from './cache.ts';
import { readingKey } from './fingerprint.ts';
import { readAll } from './readAll.ts';
import type { ReadingTask } from './readOne.ts';
import { measurementKey } from './rows/tables.ts';

export interface CollectionReadings {
  /** By full measurement id; the chosen reading first. */
  readonly readings: ReadonlyMap<string, readonly Reading[]>;
  /** How many measurements were fitted in this run; the others came from the cache. */
  readonly refitted: number;
}

/**
 * The readings of every measurement of a collection. A measurement is read only where the cache has no readings for exactly its
 * record, ion, free ion, policy and engine. Every reading passes through the same JSON text, so that cold and cached runs agree.
 * `progress` is called with how many are done. Throws where the engine fails, naming the measurement.
 */
export function readCollectionReadings(
  collection: Collection, engine: string, cache: ReadingCache, progress: (done: number) => void = () => undefined,
): CollectionReadings {
  const wanted = collection.complexes.flatMap((complex) => complex.measurements.map((measurement) => {
    const ion = freeIon(measurement.policy.freeIons, measurement.engine.ion);
    return { id: measurementKey(complex.id, measurement.id), measurement, key: readingKey(measurement.engine, measurement.policy, ion, engine) };
  }));
  const known = new Map<string, string>();
  const missing = new Map<string, ReadingTask>();
  for (const { id, measurement, key } of wanted) {
    const json = cache.get(key);
    if (json !== null) known.set(key, json);
    else missing.set(key, { id, measurement: measurement.engine, policy: measurement.policy });
  }
  const before = wanted.length - missing.size;
  const read = readAll([...missing.values()], (done) => progress(before + done));
  const fresh = new Map([...missing.keys()].map((key, index) => [key, read[index]!]));
  cache.keep(fresh, new Set(wanted.map(({ key }) => key)));
  progress(wanted.length);
  return {
    readings: new Map(wanted.map(({ id, key }) => [id, JSON.parse(fresh.get(key) ?? known.get(key)!) as readonly Reading[]])),
    refitted: fresh.size,
  };
}
