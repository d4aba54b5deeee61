import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { termParts } from '#engine';
import { expect, test } from 'vitest';
import { readStructure } from '../../../scripts/structures/layout.ts';
import { alignedStrips } from '../../../site/charts/alignedStrips.ts';
import { visibleGradient } from '../../../site/charts/energyAxis.ts';
import { levelColumns } from '../../../site/charts/levelColumns.ts';
import { levelDiagram } from '../../../site/charts/levelCurves.ts';
import { levelDiagramFigure } from '../../../site/charts/levelDiagram.ts';
import { levelScheme } from '../../../site/charts/levelScheme.ts';
import { mapFigure } from '../../../site/charts/mapFigure.ts';
import { type PlaneMark, planeFigure } from '../../../site/charts/planeFigure.ts';
import { newDocument } from '../../../site/charts/plot.ts';
import { readingsFigure } from '../../../site/charts/readingsFigure.ts';
import { residualBar } from '../../../site/charts/residualBar.ts';
import { schematicFigure } from '../../../site/charts/schematic.ts';
import { type SeriesPoint, seriesFigure } from '../../../site/charts/seriesFigure.ts';
import { GRADIENT_ID, type StripRow, bandStrip } from '../../../site/charts/strip.ts';
import { stripFigure } from '../../../site/charts/stripFigure.ts';
import { structureFigure } from '../../../site/charts/structure.ts';
import { formulaShown } from '../../../site/data/typeset.ts';
import { collisions, textBoxes } from './textBoxes.ts';

const formula = (typed: string) => formulaShown(typed, 'none', []).parts;
const LONG = formula('trans-[Cr(NH2CH2CH2NHCH2CH2NH2)(NCS)2(OH2)]+');
const AXIS = [{ text: 'Δ', style: 'italic' as const }, { text: ' / 10³ cm⁻¹', style: 'plain' as const }];
let number = 0;
const dress = (title = 'Awkward') => ({ id: `g${number++}`, title, description: title });

const point = (label = '[Cr(NH3)6]3+', value = 21550, u: number | null = 60, uTotal: number | null = 150, more: Partial<SeriesPoint> = {}): SeriesPoint => ({ label: formula(label), value, u, uTotal, open: false, ...more });
const mark = (x: number, y: number, key: string, ux = 0.02, uy = 200): PlaneMark => ({ x, y, ux, uy, correlation: -0.6, key });
const noCoefficient = { r: 0, interval: null, leaveOneOut: null, nullBand: { low: -0.5, high: 0.5 } };
const band = (position: number, kind: StripRow['bands'][number]['kind'] = 'maximum', more = {}): StripRow['bands'][number] => ({ position, kind, side: null, width: null, fitted: true, ...more });
const empty: StripRow = { bands: [], absent: [], scanned: [] };
const kinds: StripRow = {
  bands: [band(14000, 'line'), band(15000, 'zero-phonon'), band(18000), band(21000, 'shoulder', { side: 'higher' }), band(24000, 'dip'), band(27000, 'component'), band(29000, 'centroid'), band(33000, 'envelope', { width: 5000 }), band(2000), band(60000, 'maximum', { fitted: false })],
  absent: [{ low: 35000, high: 40000 }, { low: 50000, high: 60000 }], scanned: [{ low: 9000, high: 20000 }, { low: 22000, high: 33000 }],
};
const equal: StripRow = { ...empty, bands: [band(20000), band(20000), band(20010, 'line')], scanned: [{ low: 4000, high: 44000 }] };
const named = (...positions: number[]) => positions.map((position, index) => ({ position, parts: termParts(['a4T2g', 'b4T1g', '2Eg', 'a2T1g'][index % 4]!) }));
const level = (energy: number, label = 'a4T1g', spinAllowed = true) => ({ energy, parts: termParts(label), spinAllowed });

/** Every chart with data that are none, one, equal, without u, or long of name. */
const charts: Readonly<Record<string, () => string>> = {
  'series, none': () => seriesFigure([], AXIS, newDocument(), dress()),
  'series, one': () => seriesFigure([point()], AXIS, newDocument(), dress()),
  'series, equal, without u': () => seriesFigure([point('[CrF6]3-', 15000, null, null), point('[CrF6]3-', 15000, null, null)], AXIS, newDocument(), dress()),
  'series, long names, brackets, notes': () => seriesFigure([point(), { ...point('x', 17000, null, 900, { open: true, beside: 16000, note: '128' }), label: LONG }, point('[Cr(CN)6]3-', 26600, 100, 4000, { note: '1' })], AXIS, newDocument(), dress(), {
    brackets: [{ first: 0, last: 1, letter: 'a' }, { first: 1, last: 2, letter: 'b', openBehind: true }], upright: 20000, noteHead: [{ text: 'n', style: 'italic' }],
  }),
  'series, zero and below': () => seriesFigure([point('a', 0, 0, 0), point('b', -1e-9, null, 1)], AXIS, newDocument(), dress()),
  'plane, none': () => planeFigure([], { x: AXIS, y: AXIS }, noCoefficient, newDocument(), dress()),
  'plane, one': () => planeFigure([mark(0.7, 21000, 'a')], { x: AXIS, y: AXIS }, noCoefficient, newDocument(), dress()),
  'plane, equal, no u': () => planeFigure([mark(0.7, 21000, 'a', 0, 0), mark(0.7, 21000, 'b', 0, 0), mark(0.7, 21000, 'c', 0, 0)], { x: AXIS, y: AXIS }, { ...noCoefficient, r: 1, interval: { low: -1, high: 1 }, leaveOneOut: { low: 1, high: 1 } }, newDocument(), dress()),
  'map, none': () => mapFigure([], [], dress()),
  'map, every mark, long names': () => mapFigure([{ label: LONG, cells: [{ form: 'framed', text: '26.6', flag: 'far above' }, { form: 'slanted', text: '9.8', flag: null }, { form: 'ring', text: '', flag: null }, { form: 'dot', text: '', flag: null }] }], [formula('Cr(III)'), LONG, formula('Fe(-I)'), formula('Ni(II)')], dress()),
  'level scheme, none': () => levelScheme([], [], dress()),
  'level scheme, equal and crowded': () => levelScheme([level(0, 'a4A2g'), ...Array.from({ length: 12 }, (_, index) => level(20000 + 10 * index, 'b2T1g', index % 2 === 0))], Array.from({ length: 9 }, () => ({ observed: 20000, used: false })), dress()),
  'level columns, none': () => levelColumns([], dress()),
  'level columns, one, long name': () => levelColumns([{ name: LONG, levels: [level(0), level(17000)], bands: [{ observed: 17100, used: true }] }], dress()),
  'strip, none': () => stripFigure(empty, [], [], dress()),
  'strip, every kind and beyond the axis': () => stripFigure(kinds, named(14000, 15000, 18000, 60000), [17800, 60000], dress()),
  'strip, equal': () => stripFigure(equal, named(20000, 20000, 20010), [20000, 20000], dress()),
  'strips, none': () => alignedStrips([], dress()),
  'strips, two, long name': () => alignedStrips([{ name: LONG, row: kinds }, { name: formula('[Cr(NH3)6]3+'), row: empty }], dress()),
  'small strip, none': () => bandStrip(empty, 'No band', `g${number++}`),
  'small strip, every kind': () => bandStrip(kinds, 'Every kind', `g${number++}`),
  'readings, one, none named': () => readingsFigure([{ name: 'chosen', strip: empty, named: [], calculated: [], expected: [] }], dress()),
  'readings, crowded': () => readingsFigure(['chosen', 'rival 1', 'rival 10'].map((name) => ({ name, strip: equal, named: named(20000, 20000, 20010), calculated: [20000, 50000], expected: named(25000, 25010, 25020, 43900) })), dress()),
  'residual, none and far': () => residualBar(0, 0, 1) + residualBar(-900, 20, 900),
  ...Object.fromEntries([1, 2, 3, 4, 5, 6, 7, 8, 9].flatMap((electrons) => (['octahedral', 'tetrahedral'] as const).map((geometry) => [`diagram of ${geometry} d${electrons}, complexes at both ends and at one place`, () =>
    levelDiagramFigure(levelDiagram({ electrons, geometry }, 4.5, 40), 70, [0.5, 20, 20, 20.1, 40].map((x, index) => ({ key: 'abcde'[index]!, x, bands: [{ y: 10 + 15 * index, used: index % 2 === 0 }] })), newDocument(), dress())]))),
  ...Object.fromEntries(['C', 'CC', '[Cl-]', '[N-]=[N+]=[N-]', '[N-]=C=S', '[C-]#N', 'CC(=O)[CH-]C(C)=O', 'C[C@@H](N)CN', 'C[N+](C)(C)C', '[2H]O[2H]', 'OC(=O)CN(CCN(CC(=O)[O-])CC(=O)[O-])CC(=O)[O-]', 'C1CNCCNCCCNCCNC1', 'c1cc2ccc3cccnc3c2nc1', 'c1ccc(cc1)P(c1ccccc1)c1ccccc1'].map((smiles) => [`structure of ${smiles}`, () => {
    const read = readStructure(smiles);
    return read.ok ? structureFigure(read.structure, dress()) : '';
  }])),
  'schematic, octahedron with chelates': () => schematicFigure('Co', [['Cl', null], ['Cl', null], ['N', 0], ['N', 0], ['N', 1], ['N', 1]].map(([text, chelate]) => ({ parts: [{ text: String(text), style: 'plain' as const }], chelate: chelate as number | null })), dress()),
  'schematic, tetrahedron, long names': () => schematicFigure('Co', Array.from({ length: 4 }, () => ({ parts: LONG, chelate: null })), dress()),
};

test.each(Object.keys(charts))('%s: a drawing with a name, and no number that is none', (name) => {
  const svg = charts[name]!();
  expect(svg).toMatch(/^<svg class="[^"]+" (?:role="img" aria-labelledby="[^"]+"|aria-hidden="true")/);
  expect(/NaN|undefined|Infinity| style=|<style/.exec(svg)?.[0] ?? null).toBeNull();
});

test('a long name stays inside its drawing', () => {
  const boxes = textBoxes(charts['series, long names, brackets, notes']!());
  expect(Math.min(...boxes.map(({ left }) => left))).toBeGreaterThan(0);
  expect(collisions(boxes)).toEqual([]);
});

/** For the makers to look at after any change of a chart; nothing of it is published. */
test('the gallery holds every chart', () => {
  const styles = ['colours.css', 'figures.css'].map((name) => readFileSync(`site/styles/${name}`, 'utf8')).join('\n');
  const figures = Object.entries(charts).map(([name, draw]) => `<section><h2>${name}</h2>${draw()}</section>`);
  expect(figures.length).toBeGreaterThan(50);
  mkdirSync('.cache', { recursive: true });
  writeFileSync('.cache/gallery.html', `<!doctype html><html lang="en"><meta charset="utf-8"><title>Charts with awkward data</title><style>${styles}
body { background: var(--paper); color: var(--ink); font-family: var(--text); margin: 2rem; display: flex; flex-wrap: wrap; gap: 2rem 3rem; align-items: start; } h2 { font-size: 1rem; font-weight: normal; color: var(--soft); }
section { max-width: 100%; }</style><svg width="0" height="0" aria-hidden="true"><defs>${visibleGradient(GRADIENT_ID)}</defs></svg>${figures.join('\n')}</html>\n`);
});
