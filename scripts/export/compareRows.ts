import type { TableEntry } from './dictionary/types.ts';
import type { Cell, Row, TableRows } from './tableFiles.ts';

/** A cell, or a whole row, in which two sets of rows differ. */
export interface RowDifference {
  readonly table: string;
  /** Values of the key. */
  readonly row: string;
  /** null: the row stands on one side only. */
  readonly column: string | null;
  readonly published: Cell | 'no such row';
  readonly rebuilt: Cell | 'no such row';
}

export interface RowComparison {
  readonly cells: number;
  readonly differences: readonly RowDifference[];
  /** Largest difference of a fitted parameter or its uncertainty, as a part of itself; 1 where one side withholds it. */
  readonly largest: number;
}

/** Compares two sets of rows cell by cell, rows matched by their keys. Numbers are equal to the last bit or they differ. */
export function compareRows(tables: readonly TableEntry[], published: TableRows, rebuilt: TableRows): RowComparison {
  const differences: RowDifference[] = [];
  let cells = 0;
  for (const table of tables) {
    const keyOf = (row: Row): string => table.key.map((column) => String(row[column])).join(' / ');
    const others = new Map((rebuilt[table.name] ?? []).map((row) => [keyOf(row), row]));
    for (const row of published[table.name] ?? []) {
      const key = keyOf(row);
      const other = others.get(key);
      others.delete(key);
      cells += table.columns.length;
      if (other === undefined) differences.push({ table: table.name, row: key, column: null, published: key, rebuilt: 'no such row' });
      else differences.push(...differingCells(table, key, row, other));
    }
    for (const key of others.keys()) differences.push({ table: table.name, row: key, column: null, published: 'no such row', rebuilt: key });
  }
  return { cells, differences, largest: Math.max(0, ...differences.map(relativeDifference)) };
}

function differingCells({ name: table, columns }: TableEntry, row: string, published: Row, rebuilt: Row): RowDifference[] {
  return columns.flatMap(({ name: column }) => {
    const [before, after] = [published[column] ?? null, rebuilt[column] ?? null];
    return before === after ? [] : [{ table, row, column, published: before, rebuilt: after }];
  });
}

function relativeDifference({ table, column, published, rebuilt }: RowDifference): number {
  if (table !== 'parameter' || (column !== 'value' && column !== 'u' && column !== 'u_total')) return 0;
  if (typeof published !== 'number' || typeof rebuilt !== 'number') return 1;
  return Math.abs(published - rebuilt) / Math.max(Math.abs(published), Math.abs(rebuilt));
}
