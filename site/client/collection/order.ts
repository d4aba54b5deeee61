import type { FoundCollection, FoundRow } from './packed.ts';

/** Columns by which the table is sorted. */
export type SortKey = 'complex' | 'Delta' | 'B' | 'beta' | 'verdict';
export const SORT_KEYS: readonly SortKey[] = ['complex', 'Delta', 'B', 'beta', 'verdict'];

export interface Sorting {
  readonly key: SortKey;
  readonly descending: boolean;
}

const VERDICTS = ['tested', 'untested', 'assumed', 'strained', 'not determinable', 'refused'];

/** Rows sorted by a column's value; what is missing stands last either way, ties keep the order in which they came. */
export function ordered(collection: FoundCollection, rows: readonly number[], { key, descending }: Sorting): readonly number[] {
  const value = valueReader(collection, key);
  const sign = descending ? -1 : 1;
  return rows.map((row, place) => ({ row, place, value: value(collection.rows[row]!) })).sort((a, b) => {
    if (a.value === null || b.value === null) return a.value === b.value ? a.place - b.place : a.value === null ? 1 : -1;
    return a.value === b.value ? a.place - b.place : a.value < b.value ? -sign : sign;
  }).map(({ row }) => row);
}

function valueReader({ complexes }: FoundCollection, key: SortKey): (row: FoundRow) => number | string | null {
  switch (key) {
    case 'complex': return ({ complex }) => complexes[complex]!.formula.replace(/[^A-Za-z0-9]/g, '');
    case 'Delta': return ({ delta }) => delta;
    case 'B': return ({ racahB }) => racahB;
    case 'beta': return ({ beta }) => beta;
    case 'verdict': return ({ verdict }) => VERDICTS.indexOf(verdict);
  }
}

/** What a click on a column's head does: up, down, and back to the order of the book. */
export function nextSorting(now: Sorting | null, key: SortKey): Sorting | null {
  if (now?.key !== key) return { key, descending: false };
  return now.descending ? null : { key, descending: true };
}
