import { freeIon, readWithRivals } from '#engine';
import type { Reading } from '#engine';
import type { Collection, MeasurementRecord } from '../content/types.ts';
import type { ReadingCache } from './cache.ts';
import { readingKey } from './fingerprint.ts';
import { measurementKey } from './rows/tables.ts';

export interface CollectionReadings {
  /** By full measurement id; the chosen reading first. */
  readonly readings: ReadonlyMap<string, readonly Reading[]>;
  /** How many measurements were fitted in this run; the others came from the cache. */
  readonly refitted: number;
}

/**
 * The readings of every measurement of a collection. A measurement is fitted only where the cache has no readings for exactly its
 * record, ion, free ion, policy and engine. Every reading passes through the same JSON text, so that cold and cached runs agree.
 * `progress` is called after each measurement with how many are done. Throws where the engine fails, naming the measurement.
 */
export function readCollectionReadings(
  collection: Collection, engine: string, cache: ReadingCache, progress: (done: number) => void = () => undefined,
): CollectionReadings {
  const readings = new Map<string, readonly Reading[]>();
  const current = new Set<string>();
  const fresh = new Map<string, string>();
  for (const complex of collection.complexes) {
    for (const measurement of complex.measurements) {
      const id = measurementKey(complex.id, measurement.id);
      const ion = freeIon(measurement.policy.freeIons, measurement.engine.ion);
      const key = readingKey(measurement.engine, measurement.policy, ion, engine);
      let json = fresh.get(key) ?? cache.get(key);
      if (json === null) {
        json = JSON.stringify(readOne(id, measurement));
        fresh.set(key, json);
      }
      current.add(key);
      readings.set(id, JSON.parse(json) as readonly Reading[]);
      progress(readings.size);
    }
  }
  cache.keep(fresh, current);
  return { readings, refitted: fresh.size };
}

function readOne(id: string, { engine, policy }: MeasurementRecord): readonly Reading[] {
  try {
    const { chosen, rivals } = readWithRivals(engine, policy, freeIon(policy.freeIons, engine.ion));
    return [chosen, ...rivals];
  } catch (error) {
    throw new Error(`the fit of ${id} failed: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}
