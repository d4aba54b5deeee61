import { readFileSync } from 'node:fs';
import Database from 'better-sqlite3';
import type { Cell, Row, Tables } from './rows/row.ts';
import { replaceFile } from './writeFile.ts';

const schemaFile = new URL('./schema.sql', import.meta.url);

/**
 * Writes the database file for the given rows, replacing an older one only when the new one is whole.
 * The bytes depend on the rows alone: not on their order, the folder, the time zone or the locale.
 * Throws where a row misses a column, has an unknown one, or breaks a constraint or a foreign key; the old file then stands.
 */
export function writeDatabase(path: string, tables: Tables): void {
  replaceFile(path, databaseBytes(tables));
}

/** The bytes of a database file with the given rows. */
export function databaseBytes(tables: Tables): Buffer {
  const database = new Database(':memory:');
  try {
    database.pragma('foreign_keys = OFF');
    database.exec(readFileSync(schemaFile, 'utf8'));
    database.transaction(() => {
      const known = tableNames(database);
      for (const name of Object.keys(tables)) {
        if (!known.includes(name)) throw new Error(`the database has no table "${name}"`);
      }
      for (const name of known) insertRows(database, name, tables[name] ?? []);
    })();
    // All at the end, table by table: sooner than at each row.
    const orphans = database.pragma('foreign_key_check') as readonly { readonly table: string; readonly parent: string }[];
    if (orphans.length > 0) throw new Error(`FOREIGN KEY constraint failed: ${orphans.length} rows, the first in "${orphans[0]!.table}", miss their row in "${orphans[0]!.parent}"`);
    database.exec('VACUUM');
    return database.serialize();
  } finally {
    database.close();
  }
}

function tableNames(database: Database.Database): string[] {
  return database.prepare<[], { name: string }>("SELECT name FROM sqlite_schema WHERE type = 'table' ORDER BY name").all()
    .map(({ name }) => name);
}

function insertRows(database: Database.Database, table: string, rows: readonly Row[]): void {
  if (rows.length === 0) return;
  const info = database.prepare<[string], { name: string; pk: number }>('SELECT name, pk FROM pragma_table_info(?)').all(table);
  const columns = info.map(({ name }) => name);
  const key = info.filter(({ pk }) => pk > 0).sort((a, b) => a.pk - b.pk).map(({ name }) => name);
  const quoted = columns.map((name) => `"${name}"`).join(', ');
  const one = `(${columns.map(() => '?').join(', ')})`;
  const insertOf = (count: number): Database.Statement => database.prepare(`INSERT INTO "${table}" (${quoted}) VALUES ${Array.from({ length: count }, () => one).join(', ')}`);
  const sorted = isSorted(rows, key) ? rows : [...rows].sort((a, b) => compareKeys(a, b, key));
  const together = Math.max(1, Math.floor(valuesTogether / columns.length));
  const insertMany = insertOf(together);
  for (let start = 0; start < sorted.length; start += together) {
    const part = sorted.slice(start, start + together);
    const values: Cell[] = [];
    for (const row of part) {
      checkColumns(table, row, columns);
      for (const name of columns) values.push(row[name]!);
    }
    (part.length === together ? insertMany : insertOf(part.length)).run(values);
  }
}

/** Values that one statement takes: a call costs more than a row. */
const valuesTogether = 400;

function isSorted(rows: readonly Row[], key: readonly string[]): boolean {
  for (let i = 1; i < rows.length; i += 1) if (compareKeys(rows[i - 1]!, rows[i]!, key) > 0) return false;
  return true;
}

function checkColumns(table: string, row: Row, columns: readonly string[]): void {
  for (const name of columns) {
    if (row[name] === undefined) throw new Error(`a row of table "${table}" has no value for "${name}"`);
  }
  if (Object.keys(row).length !== columns.length) {
    const unknown = Object.keys(row).filter((name) => !columns.includes(name));
    throw new Error(`a row of table "${table}" has unknown columns: ${unknown.join(', ')}`);
  }
}

// Binary order, never the locale's.
function compareKeys(a: Row, b: Row, key: readonly string[]): number {
  for (const name of key) {
    const left = a[name] ?? '';
    const right = b[name] ?? '';
    if (left !== right) return left < right ? -1 : 1;
  }
  return 0;
}
