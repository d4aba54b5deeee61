import { mkdirSync, rmSync } from 'node:fs';
import { dirname } from 'node:path';
import Database from 'better-sqlite3';

/** Readings kept as JSON text by the hash of all they depend on. */
export interface ReadingCache {
  readonly get: (key: string) => string | null;
  readonly put: (key: string, json: string) => void;
  /** Drops every entry that is not among `current`. */
  readonly keepOnly: (current: ReadonlySet<string>) => void;
  /** What was put is kept from here on. */
  readonly close: () => void;
}

/** A cache that holds nothing: every run is a cold one. */
export const noCache: ReadingCache = { get: () => null, put: () => undefined, keepOnly: () => undefined, close: () => undefined };

/**
 * Opens the cache file, making it where it is missing and making it anew where it is damaged. A cache only saves time:
 * where the file cannot be used at all (locked, no space, no right to write) the answer is `noCache`.
 */
export function openCache(path: string): ReadingCache {
  try {
    return openFile(path);
  } catch (error) {
    if (!isDamaged(error)) return noCache;
  }
  try {
    removeFile(path);
    return openFile(path);
  } catch {
    return noCache;
  }
}

function openFile(path: string): ReadingCache {
  mkdirSync(dirname(path), { recursive: true });
  const database = new Database(path, { timeout: 2000 });
  try {
    // With row numbers the long texts are written one behind the other, and the keys apart.
    database.exec('CREATE TABLE IF NOT EXISTS reading (key TEXT NOT NULL PRIMARY KEY, json TEXT NOT NULL) STRICT');
    database.pragma('cache_size = -32768');
    return overDatabase(database, path);
  } catch (error) {
    database.close();
    throw error;
  }
}

function overDatabase(database: Database.Database, path: string): ReadingCache {
  const select = database.prepare<[string], { json: string }>('SELECT json FROM reading WHERE key = ?');
  const known = new Set(database.prepare<[], string>('SELECT key FROM reading').pluck().all());
  const insert = database.prepare<[string, string]>('INSERT OR REPLACE INTO reading (key, json) VALUES (?, ?)');
  const remove = database.prepare<[string]>('DELETE FROM reading WHERE key = ?');
  let usable = true;
  // Another run holds the file, the disk is full, or a page is damaged: the next run refits, nothing is lost.
  const tried = <T>(work: () => T, otherwise: T): T => {
    if (!usable) return otherwise;
    try {
      return work();
    } catch (error) {
      usable = false;
      if (isDamaged(error)) removeFile(path);
      return otherwise;
    }
  };
  const writing = (): void => { if (!database.inTransaction) database.exec('BEGIN IMMEDIATE'); };
  return {
    get: (key) => (known.has(key) ? tried(() => select.get(key)?.json ?? null, null) : null),
    put: (key, json) => tried(() => {
      writing();
      insert.run(key, json);
    }, undefined),
    keepOnly: (current) => tried(() => {
      const gone = [...known].filter((key) => !current.has(key));
      if (gone.length > 0) writing();
      for (const key of gone) remove.run(key);
    }, undefined),
    close: () => {
      tried(() => { if (database.inTransaction) database.exec('COMMIT'); }, undefined);
      database.close();
    },
  };
}

function removeFile(path: string): void {
  for (const ending of ['', '-journal']) rmSync(path + ending, { force: true });
}

function isDamaged(error: unknown): boolean {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  return code.startsWith('SQLITE_CORRUPT') || code.startsWith('SQLITE_NOTADB') || code.startsWith('SQLITE_ERROR');
}
