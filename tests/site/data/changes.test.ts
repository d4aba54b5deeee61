import { expect, test } from 'vitest';
import { changesPage } from '../../../site/data/changes.ts';
import { ROWS_A_PAGE } from '../../../site/data/paging.ts';
import type { ChangeRow, FrozenReleaseRow } from '../../../site/data/rows.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const release = (id: string, number: number): FrozenReleaseRow => ({ id, number, date: `2027-0${number}-01`, who: 'T. Linde', cause: 'A sample.', doi: null, complexes: 8, measurements: 9 });
const change = (number: number, of: string | null, complex = 'cr-am6'): ChangeRow => ({ number, release: of, complex, measurement: 'aq-295', cause: 'readings', text: `Delta of change ${number}.` });
const withHistory = (changes: readonly ChangeRow[]) => ({ ...tree, history: { releases: [release('1.0', 1), release('1.1', 2)], changes, gone: [], frozen: [] } });

test('before the first release the page says since when, and that nothing is frozen', () => {
  expect(changesPage(tree, 1)).toMatchObject({ sections: [], gone: null, sentence: expect.stringContaining('started on 2026-01-01') });
});

test('the newest stands first, what came since the last release before all', () => {
  const page = changesPage(withHistory([change(1, '1.1'), change(2, null)]), 1);
  expect(page.sections.map(({ title, table }) => [title, table?.rows.length ?? 0])).toEqual([['Since release 1.1', 1], ['Release 1.1', 1], ['Release 1.0', 0]]);
  expect(page.sections[1]!.about).toContain('DOI: not yet assigned');
  expect(page.sentence).toBe('2 releases, the last 1.1 of 2027-02-01.');
});

test('a record that is gone keeps its change, without a dead link', () => {
  const [, { table }] = changesPage(withHistory([change(1, '1.1', 'cr-old')]), 1).sections as never as [unknown, { table: { rows: unknown[][] } }];
  expect(table.rows[0]![0]).toEqual({ parts: [{ text: 'cr-old', style: 'plain' }] });
});

test('later pages hold only what is on them', () => {
  const page = changesPage(withHistory(Array.from({ length: ROWS_A_PAGE + 1 }, (_, index) => change(index + 1, '1.0'))), 2);
  expect(page.sections.map(({ title, table }) => [title, table!.rows.length])).toEqual([['Release 1.0', 1]]);
});

test('a tombstone names its successor and the reason', () => {
  const page = changesPage({ ...tree, history: { releases: [], changes: [], frozen: [], gone: [{ address: 'complexes/cr-old/', kind: 'tombstone', target: 'complexes/cr-am6/', reason: 'measured on the wrong salt' }] } }, 1);
  expect(page.gone!.rows[0]).toEqual([{ parts: [{ text: 'complexes/cr-old/', style: 'plain' }] }, 'withdrawn', { parts: [{ text: 'complexes/cr-am6/', style: 'plain' }], path: 'complexes/cr-am6/' }, 'measured on the wrong salt']);
});
