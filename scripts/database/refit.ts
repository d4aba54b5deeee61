import type { Reading, Verdict } from '#engine';
import { readCollection } from '../content/readCollection.ts';
import type { Collection, Fault } from '../content/types.ts';
import { noCache, openCache } from './cache.ts';
import { loadedEngineHash, softwareName } from './fingerprint.ts';
import { readCollectionReadings } from './readings.ts';
import { allTables } from './rows/tables.ts';
import { writeDatabase } from './write.ts';

/** Verdicts in the order in which a summary counts them. */
export const verdicts: readonly Verdict[] = ['tested', 'untested', 'assumed', 'strained', 'not determinable', 'refused'];

export interface RefitOrder {
  /** Folder of the content. */
  readonly content: string;
  /** Database file to write. */
  readonly database: string;
  /** Cache file, or null for a cold run that leaves no cache. */
  readonly cache: string | null;
  readonly progress?: (done: number, of: number) => void;
}

export interface Refit {
  readonly collection: Collection;
  readonly readings: ReadonlyMap<string, readonly Reading[]>;
  readonly records: number;
  readonly measurements: number;
  readonly refitted: number;
  readonly verdicts: Readonly<Record<Verdict, number>>;
}

export type RefitResult =
  | { readonly ok: true; readonly refit: Refit }
  | { readonly ok: false; readonly faults: readonly Fault[]; readonly records: number };

/** Content to database: reads every record, fits every measurement, writes the file. Faults in the content leave the old file as it is. */
export function refit(order: RefitOrder): RefitResult {
  const { collection, faults, filesRead } = readCollection(order.content);
  if (collection === null) return { ok: false, faults, records: filesRead };
  const engine = loadedEngineHash();
  const measurements = collection.complexes.reduce((count, complex) => count + complex.measurements.length, 0);
  const cache = order.cache === null ? noCache : openCache(order.cache);
  try {
    const { readings, refitted } = readCollectionReadings(
      collection, engine, cache, (done) => order.progress?.(done, measurements),
    );
    writeDatabase(order.database, allTables(collection, readings, engine, softwareName()));
    return {
      ok: true,
      refit: { collection, readings, records: filesRead, measurements, refitted, verdicts: countVerdicts(readings) },
    };
  } finally {
    cache.close();
  }
}

/** How many measurements' chosen readings carry each verdict. */
export function countVerdicts(readings: ReadonlyMap<string, readonly Reading[]>): Record<Verdict, number> {
  const counts = Object.fromEntries(verdicts.map((verdict) => [verdict, 0])) as Record<Verdict, number>;
  for (const [chosen] of readings.values()) if (chosen !== undefined) counts[chosen.verdict] += 1;
  return counts;
}
