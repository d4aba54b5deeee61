import { copyFileSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import Database from 'better-sqlite3';
import { besideTarget, removeLitter } from '../litter.ts';
import { insertBuffer } from './insertBuffer.ts';
import { complexTables } from './rows/complexResult.ts';
import { pack } from './rows/packed.ts';
import type { PackedTables } from './rows/packed.ts';
import type { Tables } from './rows/row.ts';
import { plainWriteError, renameSynced } from './writeFile.ts';

const schemaFile = new URL('./schema.sql', import.meta.url);

/**
 * Bytes of a page. A reading's row takes over 1 kB; a page of this size still holds four of it, where the usual 4096 bytes would give each
 * a page of its own: the file is a quarter smaller and copied in half the time.
 */
const pageSize = 16_384;

/** A database that is being written beside its target. The target stays as it is until `finish`. */
export interface DraftDatabase {
  /** Takes away every row of these complexes. */
  readonly removeComplexes: (ids: readonly string[]) => void;
  /** Takes away every row that belongs to no single complex. */
  readonly removeWhole: () => void;
  /** Adds rows; they may be written later. The rows that others refer to come first. */
  readonly insert: (tables: PackedTables) => void;
  /** Puts the database at its target. Its bytes depend on the rows alone: not on the way that led to them. */
  readonly finish: () => void;
  /** Leaves nothing behind but the target; to be called in every case. */
  readonly close: () => void;
}

/** Begins a database for `target`: an empty one, or one with the rows of the file at `target`, which must be a database of this schema. */
export function draftDatabase(target: string, from: 'nothing' | 'target'): DraftDatabase {
  mkdirSync(dirname(target), { recursive: true });
  removeLitter(target);
  const draft = besideTarget(target, 'old');
  const result = besideTarget(target, 'tmp');
  if (from === 'target') copyFileSync(target, draft);
  let database: Database.Database | null = null;
  const open = (): Database.Database => {
    database ??= openDraft(draft, from);
    return database;
  };
  let buffer: ReturnType<typeof insertBuffer> | null = null;
  // What the system says about a write that fails is lost in SQLite; the plain write tells it.
  const told = <T>(work: () => T): T => {
    try {
      return work();
    } catch (error) {
      throw plainWriteError(error, draft);
    }
  };
  return {
    removeComplexes: (ids) => told(() => deleteComplexes(open(), ids)),
    removeWhole: () => told(() => deleteWhole(open())),
    insert: (tables) => told(() => {
      buffer ??= insertBuffer(open());
      buffer.add(tables);
    }),
    finish: () => told(() => {
      buffer?.flush();
      // Counted up by every copy: the one thing of a file that is not its rows.
      open().unsafeMode().pragma('schema_version = 1');
      open().prepare('VACUUM INTO ?').run(result);
      renameSynced(result, target);
    }),
    close: () => {
      database?.close();
      for (const file of [draft, result]) rmSync(file, { force: true });
    },
  };
}

// The draft is thrown away where anything fails, so it needs neither a journal nor syncing.
function openDraft(file: string, from: 'nothing' | 'target'): Database.Database {
  if (from === 'nothing') rmSync(file, { force: true });
  const database = new Database(file);
  database.pragma(`page_size = ${pageSize}`);
  database.pragma('journal_mode = OFF');
  database.pragma('synchronous = OFF');
  database.pragma('cache_size = -65536');
  database.pragma('foreign_keys = OFF');
  if (from === 'nothing') database.exec(readFileSync(schemaFile, 'utf8'));
  return database;
}

function deleteComplexes(database: Database.Database, ids: readonly string[]): void {
  database.transaction(() => {
    for (const table of complexTables) {
      const remove = database.prepare<[string]>(`DELETE FROM "${table}" WHERE "${table === 'complex' ? 'id' : 'complex'}" = ?`);
      for (const id of ids) remove.run(id);
    }
  })();
}

function deleteWhole(database: Database.Database): void {
  const tables = database.prepare<[], { name: string }>("SELECT name FROM sqlite_schema WHERE type = 'table'").all();
  database.transaction(() => {
    for (const { name } of tables) if (!complexTables.includes(name)) database.exec(`DELETE FROM "${name}"`);
  })();
}

/**
 * Writes the database file for the given rows, replacing an older one only when the new one is whole.
 * The bytes depend on the rows alone: not on their order, the folder, the time zone or the locale.
 * Throws where a row misses a column, has an unknown one, or breaks a constraint or a foreign key; the old file then stands.
 */
export function writeDatabase(path: string, tables: Tables): void {
  const draft = draftDatabase(path, 'nothing');
  try {
    draft.insert(pack(tables));
    draft.finish();
  } finally {
    draft.close();
  }
}

/** The bytes of a database file with the given rows. */
export function databaseBytes(tables: Tables): Buffer {
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-'));
  try {
    writeDatabase(join(folder, 'rows.sqlite'), tables);
    return readFileSync(join(folder, 'rows.sqlite'));
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** What tells a written database from any other: path, size, time of change and identity on the disk; null: there is none. */
export function databaseStamp(path: string): string | null {
  const found = statSync(path, { bigint: true, throwIfNoEntry: false });
  return found === undefined ? null : `${found.size} ${found.mtimeNs} ${found.ino} ${path}`;
}
