import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { databaseTables } from './dictionary/schemaFile.ts';
import type { TableEntry } from './dictionary/types.ts';
import { exportNames } from './writeExports.ts';
import { readTableCsv } from './tableFiles.ts';
import type { TableRows } from './tableFiles.ts';

export interface ReadExport {
  readonly tables: readonly TableEntry[];
  readonly rows: TableRows;
  /** Bytes of its database file, or null where it was not kept. */
  readonly database: Buffer | null;
}

/**
 * Reads the CSV files of an export, from its folder data/ or the site around it. Every file is held against SHA256SUMS first.
 * @throws Error where there is no export, a file is missing, or one is not as it was published
 */
export function readExport(folder: string): ReadExport {
  const data = [folder, join(folder, 'data')].find((place) => existsSync(join(place, 'SHA256SUMS')));
  if (data === undefined) throw new Error(`${folder} holds no export: there is no SHA256SUMS, here or in data/`);
  const sums = readSums(join(data, 'SHA256SUMS'));
  const tables = databaseTables();
  const rows = Object.fromEntries(tables.map((table) => {
    const bytes = checkedFile(data, `csv/${table.name}.csv`, sums);
    return [table.name, readTableCsv(table, bytes.toString('utf8'))];
  }));
  const database = existsSync(join(data, exportNames.database)) ? checkedFile(data, exportNames.database, sums) : null;
  return { tables, rows, database };
}

function readSums(file: string): ReadonlyMap<string, string> {
  const lines = readFileSync(file, 'utf8').split('\n').filter((line) => line !== '');
  return new Map(lines.map((line) => {
    const [, hash = '', name = ''] = /^([0-9a-f]{64}) [ *](.+)$/.exec(line) ?? [];
    return [name, hash];
  }));
}

function checkedFile(folder: string, name: string, sums: ReadonlyMap<string, string>): Buffer {
  const path = join(folder, name);
  if (!existsSync(path)) throw new Error(`the export has no ${name}`);
  const bytes = readFileSync(path);
  const wanted = sums.get(name);
  if (wanted === undefined) throw new Error(`SHA256SUMS does not name ${name}`);
  if (createHash('sha256').update(bytes).digest('hex') !== wanted) throw new Error(`${name} is not as it was published: its sha256 differs from SHA256SUMS`);
  return bytes;
}
