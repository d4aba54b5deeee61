import Database from 'better-sqlite3';
import type { TableEntry } from './dictionary/types.ts';
import type { Row, TableRows } from './tableFiles.ts';

/** Every row of every table of the dictionary, in binary order of the keys. */
export function readDatabaseRows(databaseFile: string, tables: readonly TableEntry[]): TableRows {
  const database = new Database(databaseFile, { readonly: true, fileMustExist: true });
  try {
    return Object.fromEntries(tables.map(({ name, key }) => {
      const order = key.map((column) => `"${column}"`).join(', ');
      return [name, database.prepare<[], Row>(`SELECT * FROM "${name}" ORDER BY ${order}`).all()];
    }));
  } finally {
    database.close();
  }
}
