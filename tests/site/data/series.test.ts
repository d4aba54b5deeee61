import Database from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { correlationPage } from '../../../site/data/correlation.ts';
import { readRows } from '../../../site/data/database.ts';
import { departure } from '../../../site/data/factorTables.ts';
import { factorsPage } from '../../../site/data/factors.ts';
import { numberFiles, pictures, publishedFigures } from '../../../site/data/figures.ts';
import { ionPage } from '../../../site/data/ion.ts';
import { leftOutShown } from '../../../site/data/leftOut.ts';
import { laterPages, listPage, seriesOnPage } from '../../../site/data/listPages.ts';
import { ligandPage } from '../../../site/data/ligand.ts';
import { mapFigures } from '../../../site/data/mapFigures.ts';
import { ordersPage } from '../../../site/data/orders.ts';
import { predictionsPage } from '../../../site/data/predictions.ts';
import { bracketSentence, bracketsWithin, ionSeries } from '../../../site/data/seriesFigures.ts';
import { factorFitOf, geometries } from '../../../site/data/seriesFit.ts';
import { slanted } from '../../../site/data/slanted.ts';
import { type CollectionTree, collectionTree } from '../../../site/data/tree.ts';
import { refittedDemonstration } from '../demonstration.ts';
import { sampleTree } from '../sample.ts';

const text = (parts: readonly { readonly text: string }[]): string => parts.map((part) => part.text).join('');

let tree: CollectionTree;
let database: Database.Database;
beforeAll(async () => {
  const refitted = await refittedDemonstration();
  tree = collectionTree(readRows(refitted));
  database = new Database(refitted, { readonly: true });
});
afterAll(() => { database?.close(); });

describe('the factors of the pages are those of the database', () => {
  test('every factor, its uncertainty, its island and its reason', () => {
    const stored = database.prepare('SELECT parameter, geometry, kind, name, value, u, complexes, island, gauge, tested, reason FROM factor').all();
    const own = geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => factorFitOf(tree, parameter, geometry).factors
      .map(({ kind, name, value, u, complexes, island, gauge, tested, reason }) => ({ parameter, geometry, kind, name, value, u, complexes, island, gauge: Number(gauge), tested: Number(tested), reason }))));
    const order = (a: unknown, b: unknown): number => (JSON.stringify(a) < JSON.stringify(b) ? -1 : 1);
    expect(own.length).toBeGreaterThan(60);
    expect([...own].sort(order)).toEqual([...stored].sort(order));
  });
  test('every prediction that leaves a complex out', () => {
    const stored = new Map((database.prepare("SELECT complex, measurement, parameter, z FROM placement WHERE method = 'factors' AND z IS NOT NULL").all() as { complex: string; measurement: string; parameter: string; z: number }[])
      .map(({ complex, measurement, parameter, z }) => [`${complex}/${measurement} ${parameter}`, z]));
    let compared = 0;
    for (const parameter of ['Delta', 'beta'] as const) for (const { result, leftOut } of factorFitOf(tree, parameter, 'octahedral').complexes) {
      if (leftOut === null) continue;
      compared += 1;
      expect(stored.get(`${result.complex.id}/${result.measurement} ${parameter}`)).toBeCloseTo(leftOut.z, 9);
    }
    expect(compared).toBeGreaterThan(80);
  });
});

describe('a series on its page', () => {
  test('stands in ascending order with brackets in figure and table, and no member of a bracket is far from another', () => {
    const [delta] = ionSeries(tree, 'Cr(III)');
    const rows = delta!.figure.csv!.trimEnd().split('\r\n').slice(1).map((line) => line.split(','));
    const members = rows.filter((cells) => cells.at(-1) === '');
    const values = members.map((cells) => Number(cells[5]));
    expect(values.length).toBe(delta!.count);
    expect(values).toEqual([...values].sort((a, b) => a - b));
    const letters = [...new Set(members.flatMap((cells) => cells.join(',').match(/"([a-z, ]+)"|,([a-z]),$/)?.slice(1).join('').split(', ') ?? []))];
    expect(delta!.figure.svg.match(/class="bracket"/g)!.length).toBe(letters.filter((letter) => letter.length === 1).length);
    expect(delta!.figure.caption.join(' ')).toContain('not distinguishable');
  });
  test('what was left out is counted by kind, and the file names each with its reason', () => {
    const [delta] = ionSeries(tree, 'Cr(III)');
    expect(delta!.leftOut!.summary).toMatch(/^\d+ measurements left out: \d+ in other phases/);
    const reasons = delta!.figure.csv!.trimEnd().split('\r\n').slice(1).filter((line) => !line.endsWith(','));
    expect(reasons.length).toBe(Number(/^\d+/.exec(delta!.leftOut!.summary)![0]));
  });
  test('a long list of what was left out is cut on the page and says how much the file holds more', () => {
    const one = { measurement: tree.complexes[0]!.measurements[0]!, kind: 'phase' as const, reason: 'another phase: crystal' };
    expect(leftOutShown(Array.from({ length: 130 }, () => one))).toMatchObject({ more: 30, summary: '130 measurements left out: 130 in other phases.' });
    expect(leftOutShown([])).toBeNull();
  });
  test('a bracket that runs over the end of a part is open there', () => {
    const groups = [{ first: 40, last: 55 }, { first: 60, last: 61 }];
    expect(bracketsWithin(groups, 0, 50)).toEqual([{ first: 40, last: 49, letter: 'a', openBefore: false, openBehind: true }]);
    expect(bracketsWithin(groups, 50, 50)).toEqual([{ first: 0, last: 5, letter: 'a', openBefore: true, openBehind: false }, { first: 10, last: 11, letter: 'b', openBefore: false, openBehind: false }]);
    expect(bracketSentence([])).toBe('All neighbours can be told apart.');
    expect(bracketSentence(groups)).toMatch(/^Brackets a and b: not distinguishable/);
  });
});

describe('pages of long lists', () => {
  test('hold 200 rows each, and every row once', () => {
    const list = Array.from({ length: 450 }, (_, i) => i);
    expect(laterPages(450, [])).toEqual([2, 3]);
    expect([laterPages(0, []), laterPages(200, []), laterPages(201, [])]).toEqual([[], [], [2]]);
    expect([1, 2, 3].flatMap((number) => listPage(list, [], number, 'ions/x/').rows)).toEqual(list);
    expect(listPage(list, [], 2, 'ions/x/').pages.map(({ path }) => path)).toEqual(['ions/x/', 'ions/x/page/2/', 'ions/x/page/3/']);
  });
  test('the parts of a series are shared out over the pages of its list', () => {
    const parts = Array.from({ length: 9 }, (_, index) => ({ part: index + 1 }) as never);
    expect([1, 2, 3, 4, 5].map((number) => seriesOnPage(parts, number).length)).toEqual([2, 2, 2, 2, 1]);
    // A series may go on where the list has ended.
    expect(laterPages(201, parts)).toEqual([2, 3, 4, 5]);
    expect(listPage([1], parts, 5, 'ions/x/')).toMatchObject({ rows: [], pages: { length: 5 } });
  });
});

describe('factors beside the printed ones', () => {
  test('gauge, scatter and agreement are said; an order without water is not held against the printed one', () => {
    const sections = factorsPage(tree).sections.map(({ id, sentences, shown }) => ({ id, words: sentences.map(text).join(' '), shown }));
    const octahedral = sections.find(({ id }) => id === 'delta-octahedral')!;
    expect(octahedral.words).toMatch(/Factors are counted from aqua, f = 1\./);
    expect(octahedral.words).toMatch(/Residual scatter \d+\.\d %, from \d+ spare complexes\./);
    expect(octahedral.words).toMatch(/Order of f against the printed order: Kendall’s τ-b 0\.\d\d/);
    const tetrahedral = sections.find(({ id }) => id === 'delta-tetrahedral')!;
    expect(tetrahedral.words).toContain('water is not among them');
    expect(tetrahedral.words).not.toContain('printed order');
    expect(tetrahedral.shown.flatMap(({ figures }) => figures).every(({ svg }) => !svg.includes('class="beside"'))).toBe(true);
    expect(octahedral.shown.flatMap(({ figures }) => figures).every(({ svg }) => svg.includes('class="beside"'))).toBe(true);
  });
  test('a factor from one complex is drawn open and says there is no test', () => {
    const figure = factorsPage(tree).sections[0]!.shown[0]!.figures[0]!;
    const untested = figure.table!.rows.filter((row) => row.at(-1) === 'from one complex: no test').length;
    expect(untested).toBeGreaterThan(2);
    expect(figure.svg.match(/class="calculated"/g)!.length).toBe(untested);
  });
  test('a ligand and an ion show their own factors', () => {
    expect(ligandPage(tree, 'ammine').factors!.rows.map((row) => row[1])).toEqual(['octahedral', 'octahedral']);
    expect(ionPage(tree, 'Co(II)').factors!.rows.map((row) => row[1])).toEqual(['octahedral, quartet', 'octahedral, quartet', 'tetrahedral, quartet', 'tetrahedral, quartet']);
    expect(ionPage(tree, 'Co(II)', 1).list.number).toBe(1);
  });
  test.each([[0.05, '+5.0 %'], [-0.123, '−12 %'], [0, '0.0 %'], [0.0996, '+10 %']])('a departure of %s reads %s', (fraction, shown) => {
    expect(departure(fraction)).toBe(shown);
  });
});

describe('measured, predicted, missing', () => {
  test('every cell of a map is one of the three, and the counts add up', () => {
    for (const { figures: [figure] } of mapFigures(tree)) {
      const [framed, slantedCells, dots] = ['class="frame"', 'class="note-text"', 'class="leader"'].map((mark) => figure!.svg.split(mark).length - 1) as [number, number, number];
      const [, measured, predicted, neither] = /n = (\d+)\. Slanted: not measured, predicted by the factors of the collection, (\d+)\. Dot: neither, (\d+)/.exec(figure!.caption.join(' '))!.map(Number) as [number, number, number, number];
      expect([framed, slantedCells, dots], figure!.id).toEqual([measured, predicted, neither]);
      expect(figure!.csv!.trimEnd().split('\r\n').length - 1).toBe(measured + predicted + neither);
    }
  });
  test('no beta below 0 is shown as a prediction', () => {
    for (const { figures } of mapFigures(tree)) for (const figure of figures) expect(figure.svg, figure.id).not.toMatch(/>−\d/);
  });
  test('a section tells how many lie apart and how many would by chance', () => {
    expect(predictionsPage(tree)[0]!.sentence).toMatch(/^\d+ of \d+ complexes are predicted by the others\. \d+ lie beyond \|z\| = 2 and \d+ beyond 3; by chance alone it would be about \d/);
  });
});

describe('orders, trends and correlation', () => {
  test('pairs against the pooled order are told with z, the surest first; those that cannot be told apart only in the file', () => {
    const page = ordersPage(tree);
    const z = page.inversions[0]!.table!.rows.map((row) => Number(row[4]));
    expect(z.every((value) => value >= 2)).toBe(true);
    const surest = page.inversions[0]!.table!.rows.map((row) => Math.min(Number(row[4]), Number(row.at(-1))));
    expect(surest).toEqual([...surest].sort((a, b) => b - a));
    const file = numberFiles(tree).find(({ id }) => id === 'inversions')!.csv.trimEnd().split('\r\n').slice(1);
    const fields = file.filter((line) => line.startsWith('Delta')).map((line) => line.split(',').slice(-6).map(Number));
    expect(fields.filter(([differenceZ]) => differenceZ! > 2).length).toBe(z.length);
    for (const [differenceZ, pooled, u, pooledZ, least, sure] of fields) {
      expect(pooledZ).toBeCloseTo(pooled! / u!, 9);
      expect(least).toBe(Math.min(differenceZ!, pooledZ!));
      expect(sure).toBe(least! > 2 ? 1 : 0);
    }
  });
  test('each trend counts its steps and names the records that break it', () => {
    for (const { counts, against, figure } of ordersPage(tree).trends) {
      const [, steps, expected, contrary, alike] = /^(\d+) steps?: (\d+) as expected, (\d+) against, (\d+) not distinguishable/.exec(counts)!.map(Number) as [number, number, number, number, number];
      expect(expected + contrary + alike, figure.id).toBe(steps);
      expect(against.length).toBe(contrary);
    }
    expect(ordersPage(tree).trends.map(({ figure }) => figure.id)).toContain('trend-oxidation-state-delta-octahedral');
  });
  test('r never stands without its null band', () => {
    const { table, entries } = correlationPage(tree);
    expect(table.rows.length).toBeGreaterThan(4);
    expect(entries.length).toBe(table.rows.length);
    for (const row of table.rows) {
      expect(row[5]).toMatch(/^−?[01]\.\d\d to /);
      expect(row[6]).toMatch(/^(within|outside) the null band/);
    }
  });
});

describe('every figure of the series', () => {
  test('has title, caption with n, source, data table, SVG, PNG and CSV, and one id for ever', () => {
    const figures = publishedFigures(tree);
    expect(new Set(figures.map(({ id }) => id)).size).toBe(figures.length);
    expect(figures.length).toBeGreaterThan(60);
    const files = new Set(numberFiles(tree).map(({ id }) => `figures/${id}.csv`));
    for (const figure of figures) {
      expect(figure.title, figure.id).toMatch(/\.$/);
      if (figure.table!.rows.length > 0) expect(figure.caption.join(' '), figure.id).toMatch(/n = \d/);
      expect(figure.svg, figure.id).not.toMatch(/NaN|undefined|Infinity/);
      expect(figure.files[0]!.path, figure.id).toBe(`figures/${figure.id}.svg`);
      expect(figure.files[1]!.path, figure.id).toBe(`figures/${figure.id}.png`);
      expect(files.has(figure.files.find(({ name }) => name === 'CSV')!.path), figure.id).toBe(true);
    }
    expect(pictures(tree).length).toBeGreaterThan(20);
  });
  test('a collection with nothing to compare says so instead', () => {
    const none = sampleTree({ complexes: false });
    expect([factorsPage(none).sections, predictionsPage(none), ordersPage(none).trends, correlationPage(none).entries]).toEqual([[], [], [], []]);
    expect(text(ordersPage(none).inversions[0]!.sentence)).toContain('no ion has two comparable complexes');
    expect(ordersPage(none).without).toContain('make a step for');
  });
});

test('symbols of a sentence are slanted, letters within words are not', () => {
  expect(slanted('Δ of f, half of g', 'fg')).toEqual([
    { text: 'Δ', style: 'italic' }, { text: ' of ', style: 'plain' }, { text: 'f', style: 'italic' }, { text: ', half of ', style: 'plain' }, { text: 'g', style: 'italic' },
  ]);
  expect(slanted('plain', '')).toEqual([{ text: 'plain', style: 'plain' }]);
});
