import { afterAll, expect } from 'vitest';

/** What an expected value rests on. */
export type RowStanding = 'published' | 'memory' | 'computed' | 'common practice';

/**
 * One value against one expectation. `published`: the print or its abstract was seen; `memory`: recalled, the print not seen;
 * `computed`: an independent program run for this project; `common practice`: the trade knows it, no source.
 */
export interface Row {
  readonly name: string;
  /** null: the engine gave no number. Such a row fails. */
  readonly got: number | null;
  readonly expected: number;
  /** Largest allowed |got - expected|, in the unit of the row. */
  readonly tolerance: number;
  readonly standing: RowStanding;
  readonly source: string;
}

const standings: readonly RowStanding[] = ['published', 'memory', 'computed', 'common practice'];
const counts = new Map<RowStanding, number>();

/** Fails once for the whole table, with every bad row in the message, and counts its rows by standing. */
export function checkTable(rows: readonly Row[]): void {
  expect(rows.length, 'rows in the table').toBeGreaterThan(0);
  for (const { standing } of rows) counts.set(standing, (counts.get(standing) ?? 0) + 1);
  const bad = badRows(rows);
  if (bad.length > 0) throw new Error(`${bad.length} of ${rows.length} rows fail:\n${bad.join('\n')}`);
}

/** One line for each row that misses its expectation or is itself at fault (no source, no tolerance). */
export function badRows(rows: readonly Row[]): readonly string[] {
  return rows.flatMap((row) => {
    if (row.source.trim() === '') return [`${row.name}: no source named`];
    if (!(row.tolerance > 0) || !Number.isFinite(row.expected)) return [`${row.name}: tolerance ${row.tolerance} or expected ${row.expected} is no test`];
    if (row.got !== null && Math.abs(row.got - row.expected) <= row.tolerance) return [];
    const got = row.got === null ? 'no number' : digits(row.got);
    return [`${row.name}: got ${got}, expected ${digits(row.expected)} within ${digits(row.tolerance)} (${row.standing}: ${row.source})`];
  });
}

/** Prints, when the file's tests are through, how many rows of each standing were checked. Call once a file. */
export function reportStandings(title: string): void {
  afterAll(() => {
    const parts = standings.filter((standing) => counts.has(standing)).map((standing) => `${counts.get(standing)} ${standing}`);
    console.log(`${title}: ${parts.join(', ')} rows checked`);
  });
}

const digits = (value: number): string => String(Number(value.toPrecision(8)));
