import { mkdirSync, rmSync } from 'node:fs';
import { dirname } from 'node:path';
import Database from 'better-sqlite3';

/** Readings kept as JSON text by the hash of all they depend on. */
export interface ReadingCache {
  readonly get: (key: string) => string | null;
  /** Keeps exactly the given entries: adds the new, drops what is not among `current`. */
  readonly keep: (fresh: ReadonlyMap<string, string>, current: ReadonlySet<string>) => void;
  readonly close: () => void;
}

/** A cache that holds nothing: every run is a cold one. */
export const noCache: ReadingCache = { get: () => null, keep: () => undefined, close: () => undefined };

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
    for (const ending of ['', '-journal']) rmSync(path + ending, { force: true });
    return openFile(path);
  } catch {
    return noCache;
  }
}

function openFile(path: string): ReadingCache {
  mkdirSync(dirname(path), { recursive: true });
  const database = new Database(path, { timeout: 2000 });
  try {
    database.exec('CREATE TABLE IF NOT EXISTS reading (key TEXT NOT NULL PRIMARY KEY, json TEXT NOT NULL) STRICT, WITHOUT ROWID');
    if (database.pragma('quick_check', { simple: true }) !== 'ok') throw damaged();
    return overDatabase(database);
  } catch (error) {
    database.close();
    throw error;
  }
}

function overDatabase(database: Database.Database): ReadingCache {
  const select = database.prepare<[string], { json: string }>('SELECT json FROM reading WHERE key = ?');
  const keys = database.prepare<[], { key: string }>('SELECT key FROM reading');
  const insert = database.prepare<[string, string]>('INSERT OR REPLACE INTO reading (key, json) VALUES (?, ?)');
  const remove = database.prepare<[string]>('DELETE FROM reading WHERE key = ?');
  const keep = database.transaction((fresh: ReadonlyMap<string, string>, current: ReadonlySet<string>) => {
    for (const { key } of keys.all()) if (!current.has(key)) remove.run(key);
    for (const [key, json] of fresh) insert.run(key, json);
  });
  return {
    get: (key) => select.get(key)?.json ?? null,
    keep: (fresh, current) => {
      try {
        keep.immediate(fresh, current);
      } catch {
        // Another run holds the file, or the disk is full: the next run refits, nothing is lost.
        return;
      }
    },
    close: () => database.close(),
  };
}

function damaged(): Error {
  return Object.assign(new Error('the cache file is damaged'), { code: 'SQLITE_CORRUPT' });
}

function isDamaged(error: unknown): boolean {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  return code.startsWith('SQLITE_CORRUPT') || code.startsWith('SQLITE_NOTADB') || code.startsWith('SQLITE_ERROR');
}
