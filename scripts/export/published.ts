import { publicationFromRows } from './describe.ts';
import { databaseTables } from './dictionary/schemaFile.ts';
import type { TableEntry } from './dictionary/types.ts';
import type { Publication } from './metadata/publication.ts';
import { readDatabaseRows } from './readDatabase.ts';
import type { TableRows } from './tableFiles.ts';

/** A database as its publication reads it: once, for all files that are made of it. */
export interface Published {
  readonly databaseFile: string;
  readonly tables: readonly TableEntry[];
  readonly rows: TableRows;
  readonly publication: Publication;
}

export function readPublished(databaseFile: string): Published {
  const tables = databaseTables();
  const rows = readDatabaseRows(databaseFile, tables);
  return { databaseFile, tables, rows, publication: publicationFromRows(rows) };
}
