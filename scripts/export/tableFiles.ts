// A table of the database as a CSV file, and back.

import { csvText } from './csv.ts';
import type { ColumnEntry, TableEntry } from './dictionary/types.ts';
import { readCsv } from './readCsv.ts';

export type Cell = string | number | null;
export type Row = Readonly<Record<string, Cell>>;
export type TableRows = Readonly<Record<string, readonly Row[]>>;

/** The CSV file of a table: the database's values, every digit, in the order of the rows. */
export function tableCsv({ columns }: TableEntry, rows: readonly Row[]): string {
  return csvText(columns.map(({ name }) => name), rows.map((row) => columns.map(({ name }) => row[name] ?? null)));
}

/**
 * Rows of a table from its CSV file.
 * @throws Error naming table, row and column where the header differs or a cell is not what its column holds
 */
export function readTableCsv({ name: table, columns }: TableEntry, text: string): readonly Row[] {
  const [header = [], ...lines] = readCsv(text);
  const wanted = columns.map(({ name }) => name);
  if (header.join(',') !== wanted.join(',')) throw new Error(`${table}.csv has the columns ${header.join(', ')}; expected ${wanted.join(', ')}`);
  return lines.map((line, index) => {
    if (line.length !== columns.length) throw new Error(`${table}.csv, row ${index + 1}: ${line.length} cells; expected ${columns.length}`);
    return Object.fromEntries(columns.map((column, place) => [column.name, cellOf(table, index + 1, column, line[place]!)]));
  });
}

function cellOf(table: string, row: number, { name, type, required }: ColumnEntry, text: string | null): Cell {
  const where = `${table}.csv, row ${row}, column ${name}`;
  if (text === null) {
    if (required) throw new Error(`${where}: an empty cell; expected a value`);
    return null;
  }
  if (type === 'text' || type === 'json') return text;
  const value = Number(text);
  if (text.trim() === '' || !Number.isFinite(value)) throw new Error(`${where}: "${text}"; expected a number`);
  return value;
}
