import { expect, test } from 'vitest';
import { badRows, checkTable } from './table.ts';
import type { Row } from './table.ts';

const good: Row = { name: 'Delta', got: 17401, expected: 17400, tolerance: 2, standing: 'published', source: 'a print' };

test('a row within its tolerance passes, one outside fails with both numbers', () => {
  expect(badRows([good])).toEqual([]);
  expect(badRows([{ ...good, got: 17403 }])).toEqual(['Delta: got 17403, expected 17400 within 2 (published: a print)']);
});

test('every bad row is named, not only the first', () => {
  expect(() => checkTable([{ ...good, got: 1 }, good, { ...good, name: 'B', got: 2 }])).toThrow(/Delta: got 1,[\s\S]*B: got 2,/);
});

test('a missing number, NaN, a missing source and a tolerance that tests nothing all fail', () => {
  expect(badRows([{ ...good, got: null }])[0]).toContain('no number');
  for (const fault of [{ got: Number.NaN }, { source: ' ' }, { tolerance: 0 }, { tolerance: Number.NaN }, { expected: Number.NaN }]) {
    expect(badRows([{ ...good, ...fault }])).toHaveLength(1);
  }
});

test('a table without rows fails', () => {
  expect(() => checkTable([])).toThrow();
});
