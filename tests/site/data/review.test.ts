import { expect, test } from 'vitest';
import { cautionMeanings } from '#engine';
import { cautionIndex, cautionPage, pagedCautions } from '../../../site/data/cautions.ts';
import { methodsPage } from '../../../site/data/methods.ts';
import { ROWS_A_PAGE, pageLinks, pageNumbers, rowsOfPage } from '../../../site/data/paging.ts';
import { reviewPage } from '../../../site/data/review.ts';
import type { Cell } from '../../../site/data/table.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const text = (cell: Cell | undefined): string => typeof cell === 'string' ? cell : (cell?.parts ?? []).map((part) => part.text).join('');

test('the review page holds the stored list by kind, with its counts and a way to each record', () => {
  const page = reviewPage(tree, 1);
  expect(page.sentence).toBe('In all: 1 strained reading and 1 near rival.');
  expect(page.sections.map(({ kind, table }) => [kind, table.rows.length])).toEqual([['strained', 1], ['near rival', 1]]);
  expect(page.sections[0]!.table.rows[0]![0]).toMatchObject({ path: 'complexes/cr-cl2-en2/#aq-295' });
  expect(page.pages).toEqual([]);
});

test('floors are judged against what spare bands suggest, from the same table on both pages', () => {
  expect(reviewPage(tree, 1).floors!.rows.map((row) => row.map(text))).toEqual([['Cr(III)', 'octahedral', '2.5(3)', '28', 'floors look low']]);
  expect(methodsPage(tree).floors).toEqual(reviewPage(tree, 1).floors);
});

test('an empty review says that nothing needs a person', () => {
  expect(reviewPage({ ...tree, review: [], floorFactors: [] }, 1)).toMatchObject({ sections: [], floors: null, sentence: expect.stringContaining('Nothing needs a person') });
});

test('a long list is cut into pages of 200 rows, and none is lost', () => {
  const many = Array.from({ length: 2 * ROWS_A_PAGE + 1 }, (_, index) => ({ number: index + 1, kind: 'near rival', complex: 'cr-am6', measurement: 'aq-295', text: String(index) }));
  expect(pageNumbers(many.length)).toEqual([1, 2, 3]);
  expect(pageNumbers(0)).toEqual([1]);
  expect(pageNumbers(many.length).flatMap((number) => rowsOfPage(many, number))).toEqual(many);
  expect(pageLinks(many.length, (page) => `x/${page}/`).map(({ path }) => path)).toEqual(['x/1/', 'x/2/', 'x/3/']);
  const last = reviewPage({ ...tree, review: many }, 3);
  expect(last.sections[0]!.table.rows).toHaveLength(1);
  expect(last.sentence).toContain('401 near rivals');
});

test('the index of cautions names every code once, with how many carry it', () => {
  const rows = cautionIndex(tree).sections.flatMap(({ table }) => table.rows);
  expect(rows.map(([code]) => text(code)).sort()).toEqual(cautionMeanings.map(({ code }) => code).sort());
  const counts = new Map(rows.map((row) => [text(row[0]), text(row[2])]));
  expect(counts.get('PERCHLORATE')).toBe('1');
  expect(counts.get('TWO_ELECTRON_BAND')).toBe('1');
  expect(counts.get('LOOSE_B')).toBe('none');
});

test('a caution has its page whether a record carries it or not', () => {
  expect(pagedCautions(tree).length).toBe(cautionMeanings.filter(({ subject }) => subject !== 'comparison').length);
  expect(cautionPage(tree, 'LOOSE_B', 1)).toMatchObject({ sentence: 'No record of the collection carries it.', table: null });
  const page = cautionPage(tree, 'TWO_ELECTRON_BAND', 1);
  expect(page.sentence).toBe('1 measurement carries it.');
  expect(page.table!.rows[0]![0]).toMatchObject({ path: 'complexes/cr-cl2-en2/#aq-295' });
  expect(cautionPage(tree, 'PERCHLORATE', 1).table!.rows.map((row) => row.map(text))).toEqual([['[Cr(NH3)6]3+', 'the sample of cr-am6/aq-295']]);
});

test('a caution that the catalogue does not know is no silent gap: its code is counted nowhere else', () => {
  const known = new Set(cautionMeanings.map(({ code }) => code));
  const carried = tree.complexes.flatMap((complex) => [...complex.hazards, ...complex.measurements.flatMap(({ chosen }) => chosen.cautions)]).map(({ code }) => code);
  expect(carried.length).toBeGreaterThan(1);
  expect(carried.filter((code) => !known.has(code))).toEqual([]);
});
