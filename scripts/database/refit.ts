import type { Reading, Verdict } from '#engine';
import { holdContent, stampContent } from '../content/stamp.ts';
import type { ReadMemory } from '../content/readCollection.ts';
import type { Collection, Fault } from '../content/types.ts';
import { readContent } from '../release/readContent.ts';
import { historyRows } from '../release/rows.ts';
import type { History } from '../release/types.ts';
import { noCache, openCache } from './cache.ts';
import { loadedEngineHash, softwareName } from './fingerprint.ts';
import { readCollectionReadings } from './readings.ts';
import { mergeTables } from './rows/row.ts';
import type { Tables } from './rows/row.ts';
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
  /** Records that this process has read before. */
  readonly memory?: ReadMemory;
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

/**
 * Content to database: reads every record, fits every measurement, writes the file. Faults in the content leave the old file as it is.
 *
 * @throws ContentChangedError where a file of the content changed in between; the old file stays then too
 */
export function refit(order: RefitOrder): RefitResult {
  const stamp = stampContent(order.content);
  const { collection, history, faults, filesRead } = readContent(order.content, order.memory ?? null);
  if (collection === null) return { ok: false, faults, records: filesRead };
  const { refit: done, tables } = refitCollection(collection, history, filesRead, order);
  holdContent(order.content, stamp);
  writeDatabase(order.database, tables);
  return { ok: true, refit: done };
}

/** Fits a collection that is read already. Returns every row of its database, and writes none. */
export function refitCollection(
  collection: Collection, history: History, records: number, { cache: cacheFile, progress }: Pick<RefitOrder, 'cache' | 'progress'>,
): { readonly refit: Refit; readonly tables: Tables } {
  const engine = loadedEngineHash();
  const measurements = collection.complexes.reduce((count, complex) => count + complex.measurements.length, 0);
  const cache = cacheFile === null ? noCache : openCache(cacheFile);
  try {
    const { readings, refitted } = readCollectionReadings(collection, engine, cache, (done) => progress?.(done, measurements));
    const current = allTables(collection, readings, engine, softwareName());
    return {
      refit: { collection, readings, records, measurements, refitted, verdicts: countVerdicts(readings) },
      tables: mergeTables([current, historyRows(history, current)]),
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
