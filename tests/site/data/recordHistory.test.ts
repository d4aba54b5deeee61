import { expect, test } from 'vitest';
import { recordHistory } from '../../../site/data/recordHistory.ts';
import type { ChangeRow, FrozenReleaseRow, FrozenValueRow } from '../../../site/data/rows.ts';
import type { CollectionTree } from '../../../site/data/tree.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const complex = tree.complexes.find(({ row }) => row.id === 'cr-am6')!;
const release = (id: string, number: number): FrozenReleaseRow => ({ id, number, date: `2027-0${number}-01`, who: 'T. Linde', cause: 'A sample.', doi: null, complexes: 8, measurements: 9 });
const change = (number: number, of: string | null): ChangeRow => ({ number, release: of, complex: 'cr-am6', measurement: 'aq-295', cause: 'policy', text: `B of change ${number}.` });
const frozen = (of: string, parameter: FrozenValueRow['parameter'], value: number | null): FrozenValueRow => ({ release: of, complex: 'cr-am6', measurement: 'aq-295', parameter, value, u_total: value === null ? null : 31 });
const history = (given: Partial<CollectionTree['history']>) => recordHistory({ ...tree, history: { releases: [], changes: [], gone: [], frozen: [], ...given } }, complex);

test('before the first release only the start of the collection is dated', () => {
  expect(history({})).toEqual({ sentence: 'No release holds this record yet; the collection was started on 2026-01-01.', changes: null, frozen: null, places: [] });
});

test('a record that came after the last release says so', () => {
  const { sentence, changes } = history({ releases: [release('1.0', 1)], changes: [change(1, null)] });
  expect(sentence).toBe('No release holds this record yet; it came after release 1.0.');
  expect(changes!.rows).toHaveLength(1);
});

test('releases that changed nothing of it are passed over; the first that held it stays', () => {
  const { sentence, changes, frozen: numbers } = history({
    releases: [release('1.0', 1), release('1.1', 2), release('1.2', 3)], changes: [change(1, '1.1')],
    frozen: ['1.0', '1.1', '1.2'].flatMap((of) => [frozen(of, 'B', 652), frozen(of, 'C', null)]),
  });
  expect(sentence).toBe('First in release 1.0 of 2027-01-01. As it was in release 1.2.');
  expect(changes!.rows.map(([, date, , , cause]) => [date, cause])).toEqual([['2027-02-01', 'policy'], ['2027-01-01', 'record']]);
  expect(numbers!.rows.map(([name, , , racahB]) => [name, racahB])).toEqual([['1.2', '650(30)'], ['1.1', '650(30)'], ['1.0', '650(30)']]);
});

test('a place that was taken away keeps its anchor and the reason', () => {
  expect(history({ gone: [{ address: 'complexes/cr-am6/#old', kind: 'tombstone', target: null, reason: 'The wrong solvent.' }] }).places).toEqual([{ id: 'old', text: 'old was taken away: The wrong solvent.', now: null }]);
});
