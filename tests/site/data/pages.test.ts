import { expect, test } from 'vitest';
import { collectionPage, collectionPages, orderedResults } from '../../../site/data/collection.ts';
import { differenceOf, kinds, seriesOfKind } from '../../../site/data/comparable.ts';
import { complexPage } from '../../../site/data/complex.ts';
import { letterKey, ionDiagrams } from '../../../site/data/diagram.ts';
import { dataPage } from '../../../site/data/downloads.ts';
import { frame } from '../../../site/data/frame.ts';
import { ionList, ionPage } from '../../../site/data/ion.ts';
import { ligandList, ligandPage } from '../../../site/data/ligand.ts';
import { methodsPage } from '../../../site/data/methods.ts';
import { ionSlug } from '../../../site/data/paths.ts';
import { seriesPage } from '../../../site/data/series.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const complex = (id: string) => tree.complexes.find(({ row }) => row.id === id)!;
const text = (parts: readonly { readonly text: string }[]): string => parts.map((part) => part.text).join('');

test('the collection stands by d count of its metals, and by Delta within an ion', () => {
  const ids = orderedResults(tree).map((measurement) => `${measurement.complex.row.id}/${measurement.row.id}`);
  expect(ids).toEqual(['ti-aq6/aq-295', 'cr-aq6/aq-295', 'cr-aq6/solid-77', 'cr-cl2-en2/aq-295', 'cr-am6/aq-295', 'cr-en3/aq-295', 'co-cl4/aq-295', 'ni-aq6/aq-295', 'ni-am6/aq-295']);
  expect(collectionPage(tree, 1).sections.map(({ ion }) => ion)).toEqual(['Ti(III)', 'Cr(III)', 'Co(II)', 'Ni(II)']);
  expect(collectionPage(tree, 1).counts).toBe('8 complexes of 4 ions, 9 measurements.');
});

test('a collection without records is one friendly page', () => {
  const none = sampleTree({ complexes: false });
  expect(collectionPages(none)).toEqual([1]);
  expect(collectionPage(none, 1)).toMatchObject({ empty: true, counts: '0 complexes of 0 ions, 0 measurements.' });
  expect(seriesPage(none)).toEqual({ byLigand: [], byMetal: [] });
  expect(ionList(none).table.rows).toEqual([]);
});

test('an invented collection says so, and a real one does not', () => {
  expect(frame(tree).banner).toContain('invented');
  expect(frame({ ...tree, meta: new Map([...tree.meta, ['group.demonstration', 'false']]) }).banner).toBeNull();
});

test('a number stands with its uncertainty and standing, a withheld one with its reason', () => {
  const [delta, racahB, racahC] = complexPage(tree, complex('ti-aq6')).measurements[0]!.meaning.parameters;
  expect(delta).toMatchObject({ name: 'Delta', unit: 'cm⁻¹', standing: 'fitted', total: { text: '20\u2009200(160)' }, own: { text: '20\u2009200(60)' } });
  expect(racahB).toMatchObject({ standing: 'withheld', total: { text: null, reason: 'One d electron: no repulsion parameter enters.' } });
  expect(racahC!.total.text).toBeNull();
});

test('a hazard caution leads, with what raised it and what to do, and what all end with is said once', () => {
  const page = complexPage(tree, complex('cr-am6'));
  expect(page.hazards).toHaveLength(1);
  expect(page.hazards[0]).toMatchObject({ code: 'PERCHLORATE', name: 'Caution: perchlorate.', foundIn: 'the sample of cr-am6/aq-295' });
  expect(page.hazardAdvice).toContain('safety data sheet');
});

test('the bands stand as typed beside cm-1 and nm; an assumed uncertainty is marked', () => {
  const { rows } = complexPage(tree, complex('cr-aq6')).measurements[0]!.read.bands;
  expect(rows[0]!.slice(0, 3)).toEqual([expect.stringMatching(/^\d+\(60\) cm-1$/), expect.stringMatching(/^17\u2009\d{3}\(60\)$/), expect.stringMatching(/^\d{3}\.\d\(\d+\)$/)]);
  expect(rows[1]![0]).toMatch(/ nm$/);
  expect(rows[1]![1]).toMatch(/ \*$/);
  expect(rows[2]!.at(-1)).toMatchObject({ soft: true, parts: [{ text: 'charge transfer' }] });
});

test('a quoted value stands against the refitted one', () => {
  expect(complexPage(tree, complex('cr-en3')).quotes).toEqual([expect.objectContaining({ typed: '21850 cm-1', difference: '\u221250' })]);
});

test('the citation names people, record, collection, release, date and address, and invents no DOI', () => {
  const { citation } = complexPage(tree, complex('cr-am6'));
  expect(text(citation.parts)).toBe('T. Linde: [Cr(NH3)6]3+, record cr-am6, in: Sample bands, release 2026.1 (not frozen), 2026-01-01. The invented sample group. https://example.org/bands/complexes/cr-am6/ DOI: not yet assigned. Invented demonstration data, not to be cited as measurements.');
  expect(citation.text).toBe(text(citation.parts));
  expect(citation.parts).toContainEqual({ text: '3+', style: 'super' });
  expect(citation.files.map(({ path }) => path)).toEqual(['complexes/cr-am6/cite.bib', 'complexes/cr-am6/cite.ris']);
});

test('the complex is named from its ligands where the record gives no name', () => {
  expect(complexPage(tree, complex('cr-am6')).name).toBe('hexaamminechromium(III)');
  expect(complexPage(tree, complex('co-cl4')).name).toBe('tetrachloridocobaltate(II)');
});

test('a series keeps to one phase and says what it left out', () => {
  const chromium = kinds(tree).find(({ ion }) => ion === 'Cr(III)')!;
  const series = seriesOfKind(tree, chromium, 'Delta');
  expect(chromium.words).toBe('Cr(III), octahedral, quartet');
  expect(series.conditions).toBe('solution, within 50 K of 295 K');
  expect(series.members.map(({ complex: { row } }) => row.id)).toEqual(['cr-aq6', 'cr-cl2-en2', 'cr-am6', 'cr-en3']);
  expect(series.leftOut.map(({ measurement, reason }) => `${measurement.row.id}: ${reason}`)).toEqual(['solid-77: another phase: crystal']);
});

test('like results are compared by their readings and the differential floor, unlike ones by total uncertainties', () => {
  const [water, ammine, ethylene, mixed] = ['cr-aq6', 'cr-am6', 'cr-en3', 'cr-cl2-en2'].map((id) => complex(id).measurements[0]!) as [never, never, never, never];
  expect(differenceOf(tree, ethylene, water, 'Delta')).toMatchObject({ value: 4590, u: expect.closeTo(Math.hypot(58, 58, 50), 6), distinguishable: true });
  expect(differenceOf(tree, mixed, water, 'Delta')!.u).toBeCloseTo(Math.hypot(162, 162), 6);
  expect(differenceOf(tree, water, ammine, 'beta')).not.toBeNull();
  expect(differenceOf(tree, water, complex('ti-aq6').measurements[0]!, 'beta')).toBeNull();
});

test('neighbours closer than two uncertainties of the difference are not distinguishable', () => {
  const { table } = complexPage(tree, complex('cr-am6')).neighbours;
  const verdicts = Object.fromEntries(table!.rows.map((cells) => [text((cells[0] as { parts: never }).parts), cells[3]]));
  expect(verdicts).toMatchObject({ '[Cr(H2O)6]3+': 'lower', '[Cr(NH3)6]3+': 'itself' });
  expect(Object.values(verdicts)).toContain('higher');
});

test('an ion page holds the free ion, its diagram with the complexes on it, and its series', () => {
  const page = ionPage(tree, 'Cr(III)');
  expect(page.elementName).toBe('chromium');
  expect(page.list.rows).toHaveLength(5);
  expect(page.diagrams.map(({ id }) => id)).toEqual(['cr-iii-octahedral-levels']);
  expect(page.diagrams[0]!.caption.join(' ')).toContain('n = 5');
  expect(page.diagrams[0]!.table!.rows.length).toBeGreaterThan(8);
  expect(page.series.map(({ figure }) => figure.id)).toEqual(['cr-iii-octahedral-quartet-delta', 'cr-iii-octahedral-quartet-beta']);
  expect(ionPage(tree, 'Ti(III)').freeIon).toBeNull();
});

test('every published figure has title, caption with n, source, data table, SVG, PNG and CSV', () => {
  const figures = tree.ions.flatMap(({ name }) => { const page = ionPage(tree, name); return [...page.diagrams, ...page.series.map(({ figure }) => figure)]; });
  expect(figures.length).toBeGreaterThan(5);
  for (const figure of figures) {
    expect(figure.title, figure.id).toMatch(/\.$/);
    if (figure.table!.rows.length > 0) expect(figure.caption.join(' '), figure.id).toMatch(/n = \d/);
    expect(figure.source, figure.id).not.toBe('');
    expect(figure.svg, figure.id).toMatch(/^<svg/);
    expect(figure.csv!.split('\r\n').length, figure.id).toBeGreaterThan(2);
    expect(figure.files.map(({ path }) => path), figure.id).toEqual([`figures/${figure.id}.svg`, `figures/${figure.id}.png`, `figures/${figure.id}.csv`]);
  }
});

test('a ligand page lists its complexes, and metals of those that hold it alone', () => {
  const page = ligandPage(tree, 'ammine');
  expect(page.list.rows.map(({ complex: id }) => id)).toEqual(['cr-am6', 'ni-am6']);
  expect(page.series.map(({ figure }) => figure.id)).toEqual(['ligand-ammine-octahedral-delta', 'ligand-ammine-octahedral-beta']);
  expect(ligandPage(tree, 'chlorido').facts).toContainEqual({ name: 'Charge', value: '\u22121' });
  expect(ligandList(tree).rows).toHaveLength(4);
});

test('the methods page prints the policy in force', () => {
  const page = methodsPage(tree);
  expect(page.policy.rows).toContainEqual(['C/B where C is not fitted', '4.5(9)']);
  expect(page.policy.rows).toContainEqual(['Ceiling on u/value of Δ, B, C', '10 %, 15 %, 15 %']);
  expect(page.freeIonSets.filter(({ inUse }) => inUse).map(({ name }) => name)).toEqual(['published']);
});

test('the data page offers every file once, and says which licence holds', () => {
  const page = dataPage(tree);
  const paths = [...page.files, ...page.tables].map(({ path }) => path);
  expect(new Set(paths).size).toBe(paths.length);
  expect(paths).toEqual(expect.arrayContaining(['data/SHA256SUMS', 'data/datacite.xml', 'data/csv/band.csv']));
  expect(page.licence).toBe('CC-BY-4.0');
  expect(page.citation.text).toContain('DOI: not yet assigned');
});

test('diagrams are drawn once a collection, and keys go on after z', () => {
  expect(ionDiagrams(tree)).toBe(ionDiagrams(tree));
  expect([0, 25, 26, 27, 52, 702].map(letterKey)).toEqual(['a', 'z', 'aa', 'ab', 'ba', 'aaa']);
});

test('an ion has one address', () => {
  expect(ionSlug('Cr(III)')).toBe('cr-iii');
  expect(ionSlug('Fe(-I)')).toBe('fe-minus-i');
  expect(ionSlug('Fe(0)')).toBe('fe-0');
});
