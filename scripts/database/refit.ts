import type { Verdict } from '#engine';
import { fileFault, openFile } from '../content/files.ts';
import { readComplex, readSurroundings } from '../content/readCollection.ts';
import { sortedFaults } from '../content/report.ts';
import { diskTime, holdContent, isSettled, stampContent } from '../content/stamp.ts';
import type { Collection, Fault } from '../content/types.ts';
import { besideTarget } from '../litter.ts';
import { permanenceFaults } from '../release/permanence.ts';
import { readContent } from '../release/readContent.ts';
import { readHistory } from '../release/readHistory.ts';
import type { History } from '../release/types.ts';
import { complexFits } from './complexFits.ts';
import { tablesOf } from './fitComplex.ts';
import { basisHash, loadedEngineHash, softwareName, wholeHash } from './fingerprint.ts';
import { factsOf, keptFile, readKept, writeKept } from './keptComplexes.ts';
import { refitRun } from './refitRun.ts';
import { frameRows, sharedRows } from './rows/collection.ts';
import type { CollectionFrame } from './rows/collection.ts';
import type { ComplexFacts } from './rows/complexResult.ts';
import { unpack } from './rows/packed.ts';
import { mergeTables } from './rows/row.ts';
import type { Tables } from './rows/row.ts';
import { byId, wholeTables } from './rows/tables.ts';

/** Verdicts in the order in which a summary counts them. */
export const verdicts: readonly Verdict[] = ['tested', 'untested', 'assumed', 'strained', 'not determinable', 'refused'];

export interface RefitOrder {
  /** Folder of the content. */
  readonly content: string;
  /** Database file to write. */
  readonly database: string;
  /** Cache file, or null for a cold run that leaves no cache. */
  readonly cache: string | null;
  /** Called with how many measurements are done, of how many that are known so far. */
  readonly progress?: (done: number, of: number) => void;
}

export interface Refit {
  readonly frame: CollectionFrame;
  readonly records: number;
  readonly complexes: number;
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
 * A complex whose file, ligands, policy and software are those of the last run is not read again: its rows stand in the database that the run
 * wrote. The bytes of the new database are those of a cold run.
 *
 * @throws ContentChangedError where a file of the content changed in between; the old file stays then too
 */
export function refit({ content, database, cache, progress }: RefitOrder): RefitResult {
  const started = cache === null ? null : diskTime(besideTarget(keptFile(cache), 'tmp'));
  const stamp = stampContent(content);
  const surroundings = readSurroundings(content);
  const history = readHistory(content);
  const { frame } = surroundings;
  if (frame === null || history.faults.length > 0) {
    const { faults, filesRead } = readContent(content);
    return { ok: false, faults, records: filesRead };
  }
  const origin = { engine: loadedEngineHash(), software: softwareName() };
  const [basis, whole] = [basisHash(frame), wholeHash(frame, history.history)];
  const before = cache === null ? null : readKept(keptFile(cache), basis, database);
  const run = refitRun({ frame, origin, database, cache, progress, before, expected: surroundings.complexes.filter(({ id, file }) => before?.complexes.get(id)?.stamp !== stamp.get(file)).length });
  try {
    const faults: Fault[] = [];
    let records = surroundings.filesRead;
    for (const found of surroundings.complexes) {
      const kept = before?.complexes.get(found.id);
      const now = stamp.get(found.file);
      if (kept !== undefined && kept.stamp === now) {
        run.keep(found.id, kept);
        records += 1;
        continue;
      }
      const opened = openFile(content, found);
      if ('code' in opened) {
        faults.push(fileFault(found.file, opened));
        continue;
      }
      records += 1;
      const own = now !== undefined && isSettled(now, started) ? now : null;
      if (kept?.hash === opened.hash) {
        run.keep(found.id, { ...kept, stamp: own });
        continue;
      }
      const read = readComplex(opened, surroundings);
      faults.push(...read.faults);
      if (read.record !== null && faults.length === 0) run.fit(read.record, own);
    }
    if (faults.length > 0) return { ok: false, faults: sortedFaults(faults), records };
    const { complexes, refitted } = run.finish();
    const facts = [...complexes.values()].map(factsOf);
    const lost = permanenceFaults(history.history, facts.map(({ frozen }) => frozen), frame.ligands);
    if (lost.length > 0) return { ok: false, faults: sortedFaults(lost), records };
    if (before === null || before.whole !== whole || run.changed()) run.rest(wholeTables(frame, history.history, facts, origin), facts);
    holdContent(content, stamp);
    run.write();
    if (cache !== null) writeKept(keptFile(cache), { basis, whole, complexes }, database, before);
    return { ok: true, refit: { ...summaryOf(frame, facts), records, refitted } };
  } finally {
    run.close();
  }
}

/** Fits a collection that is read already. Returns every row of its database, and writes none. */
export function refitCollection(
  collection: Collection, history: History, records: number, { cache, progress }: Pick<RefitOrder, 'cache' | 'progress'>,
): { readonly refit: Refit; readonly tables: Tables; readonly facts: readonly ComplexFacts[] } {
  const origin = { engine: loadedEngineHash(), software: softwareName() };
  const facts: ComplexFacts[] = [];
  const parts: Tables[] = [];
  const fits = complexFits({
    basis: collection, engine: origin.engine, cache, progress, expected: collection.complexes.length,
    take: (fitted) => {
      facts.push(factsOf(fitted));
      parts.push(unpack(tablesOf(fitted)));
    },
  });
  try {
    for (const complex of collection.complexes) fits.add(complex);
    const refitted = fits.finish([]);
    facts.sort(byId);
    const tables = mergeTables([
      frameRows(collection, origin.engine, origin.software), ...facts.map(sharedRows(collection)), ...parts, wholeTables(collection, history, facts, origin),
    ]);
    return { refit: { ...summaryOf(collection, facts), records, refitted }, tables, facts };
  } finally {
    fits.close();
  }
}

function summaryOf(frame: CollectionFrame, facts: readonly ComplexFacts[]): Omit<Refit, 'records' | 'refitted'> {
  const counts = Object.fromEntries(verdicts.map((verdict) => [verdict, 0])) as Record<Verdict, number>;
  for (const complex of facts) for (const verdict of complex.verdicts) counts[verdict] += 1;
  return { frame, complexes: facts.length, measurements: facts.reduce((sum, complex) => sum + complex.verdicts.length, 0), verdicts: counts };
}
