import { rmSync } from 'node:fs';
import Database from 'better-sqlite3';
import { databaseStamp } from './write.ts';
import type { ComplexFacts } from './rows/complexResult.ts';

/** What the last run knew of one complex, whose rows stand in the database that it wrote. */
export interface KeptComplex {
  /** Stamp of its file; null where the file had changed so lately that a later change might bear the same one. */
  readonly stamp: string | null;
  /** sha256 of its file, hex. */
  readonly hash: string;
  /** `ComplexFacts` as JSON. */
  readonly facts: string;
  /** Keys of its measurements' readings in the cache. */
  readonly readings: readonly string[];
}

/** All that a run leaves for the next. */
export interface KeptRun {
  /** Hash of what the rows of every complex hang on. */
  readonly basis: string;
  /** Hash of what the other rows hang on beside the complexes. */
  readonly whole: string;
  readonly complexes: ReadonlyMap<string, KeptComplex>;
}

export function factsOf({ facts }: Pick<KeptComplex, 'facts'>): ComplexFacts {
  return JSON.parse(facts) as ComplexFacts;
}

/** The file of what a run leaves, beside its cache of readings. */
export function keptFile(cache: string): string {
  return cache.replace(/(?:\.sqlite)?$/, '-complexes.sqlite');
}

/** What the last run left, where the basis and the database that it wrote are still the same; else null. Saves time only: any failure is null. */
export function readKept(file: string, basis: string, database: string): KeptRun | null {
  const written = databaseStamp(database);
  if (written === null) return null;
  try {
    const kept = new Database(file, { fileMustExist: true, readonly: true, timeout: 2000 });
    try {
      const state = new Map(kept.prepare<[], { key: string; value: string }>('SELECT key, value FROM state').all().map(({ key, value }) => [key, value]));
      if (state.get('basis') !== basis || state.get('database') !== written) return null;
      const rows = kept.prepare<[], Omit<KeptComplex, 'readings'> & { id: string; readings: string }>('SELECT id, stamp, hash, facts, readings FROM complex').all();
      return { basis, whole: state.get('whole') ?? '', complexes: new Map(rows.map(({ id, readings, ...rest }) => [id, { ...rest, readings: readings === '' ? [] : readings.split(' ') }])) };
    } finally {
      kept.close();
    }
  } catch {
    return null;
  }
}

/** Keeps what a run leaves that wrote `database`; `before` is what the file holds, null where that is of no use. Where it cannot be kept, nothing is. */
export function writeKept(file: string, run: KeptRun, database: string, before: KeptRun | null): void {
  try {
    if (before === null) for (const ending of ['', '-journal']) rmSync(file + ending, { force: true });
    const kept = new Database(file, { timeout: 2000 });
    try {
      kept.exec(`CREATE TABLE IF NOT EXISTS state (key TEXT NOT NULL PRIMARY KEY, value TEXT NOT NULL) STRICT, WITHOUT ROWID;
        CREATE TABLE IF NOT EXISTS complex (id TEXT NOT NULL PRIMARY KEY, stamp TEXT, hash TEXT NOT NULL, facts TEXT NOT NULL, readings TEXT NOT NULL) STRICT`);
      const remove = kept.prepare<[string]>('DELETE FROM complex WHERE id = ?');
      const put = kept.prepare('INSERT OR REPLACE INTO complex (id, stamp, hash, facts, readings) VALUES (?, ?, ?, ?, ?)');
      const state = kept.prepare('INSERT OR REPLACE INTO state (key, value) VALUES (?, ?)');
      kept.transaction(() => {
        for (const id of before?.complexes.keys() ?? []) if (!run.complexes.has(id)) remove.run(id);
        for (const [id, one] of run.complexes) if (before?.complexes.get(id) !== one) put.run(id, one.stamp, one.hash, one.facts, one.readings.join(' '));
        state.run('basis', run.basis);
        state.run('whole', run.whole);
        state.run('database', databaseStamp(database) ?? '');
      }).immediate();
    } finally {
      kept.close();
    }
  } catch {
    rmSync(file, { force: true });
  }
}
