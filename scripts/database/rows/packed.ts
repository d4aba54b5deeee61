import type { Cell, Row, Tables } from './row.ts';

/** Rows of one table without the names of their columns: the cells of one row after the other. */
export interface PackedRows {
  readonly columns: readonly string[];
  readonly cells: readonly Cell[];
}

/** Rows by table, as they pass between threads. */
export type PackedTables = Readonly<Record<string, PackedRows>>;

/** A table without rows stays, without columns. @throws Error where two rows of a table differ in their columns */
export function pack(tables: Tables): PackedTables {
  return Object.fromEntries(Object.entries(tables).map(([table, rows]) => [table, packRows(table, rows)]));
}

function packRows(table: string, rows: readonly Row[]): PackedRows {
  const columns = Object.keys(rows[0] ?? {});
  const cells: Cell[] = [];
  for (const row of rows) {
    for (const name of columns) {
      const cell = row[name];
      if (cell === undefined) throw new Error(`a row of table "${table}" has no value for "${name}"`);
      cells.push(cell);
    }
    if (Object.keys(row).length !== columns.length) throw new Error(`a row of table "${table}" has unknown columns: ${Object.keys(row).filter((name) => !columns.includes(name)).join(', ')}`);
  }
  return { columns, cells };
}

export function unpack(packed: PackedTables): Tables {
  return Object.fromEntries(Object.entries(packed).map(([table, { columns, cells }]) => [table, unpackRows(columns, cells)]));
}

function unpackRows(columns: readonly string[], cells: readonly Cell[]): Row[] {
  return Array.from({ length: columns.length === 0 ? 0 : cells.length / columns.length }, (_, row) => Object.fromEntries(columns.map((name, i) => [name, cells[row * columns.length + i]!])));
}
