import { parseHTML } from 'linkedom';
import { expect, test } from 'vitest';
import { below, levelDiagram } from '../../../site/charts/levelCurves.ts';
import { diagramCeiling, diagramOverlay, levelDiagramFigure } from '../../../site/charts/levelDiagram.ts';
import { newDocument } from '../../../site/charts/plot.ts';

const IONS = [[1, 'octahedral'], [3, 'octahedral'], [5, 'octahedral'], [6, 'octahedral'], [7, 'tetrahedral']] as const;
const dress = { id: 'd', title: 'Levels', description: 'Levels of an ion' };
const drawn = (svg: string) => parseHTML(`<!doctype html><html><body>${svg}</body></html>`).document;

test.each(IONS)('d%i %s: each level in view has exactly one label, and no label lies on another', (electrons, geometry) => {
  const diagram = levelDiagram({ electrons, geometry }, 4.5, 40);
  const document = drawn(levelDiagramFigure(diagram, 70, [], newDocument(), dress));
  const labels = [...document.querySelectorAll('text')].filter((text) => /^[a-j]?[1-6](A|E|T)/.test(text.textContent ?? ''));
  expect(labels.length).toBe(diagram.curves.filter((curve) => below(curve.points, 70).length > 0).length);
  const turned = labels.filter((text) => text.getAttribute('transform')).map((text) => ({ at: Number(/translate\(([\d.]+)/.exec(text.getAttribute('transform')!)![1]), size: Number(text.getAttribute('font-size')) }));
  const level = labels.filter((text) => !text.getAttribute('transform')).map((text) => ({ at: Number(text.getAttribute('y')), size: Number(text.getAttribute('font-size')) }));
  for (const group of [turned, level]) {
    const sorted = [...group].sort((a, b) => a.at - b.at);
    for (let index = 1; index < sorted.length; index++) expect(sorted[index]!.at - sorted[index - 1]!.at).toBeGreaterThanOrEqual(sorted[index]!.size - 0.02);
  }
});

test('levels of the ground multiplicity are solid and all others dashed, on each side of a change of the ground level', () => {
  const svg = levelDiagramFigure(levelDiagram({ electrons: 6, geometry: 'octahedral' }, 4.5, 40), 60, [], newDocument(), dress);
  const document = drawn(svg);
  expect(document.querySelectorAll('g.level:not(.forbidden) path').length).toBeGreaterThan(3);
  expect(document.querySelectorAll('g.forbidden path').length).toBeGreaterThan(10);
  expect(document.querySelectorAll('.crossing').length).toBe(1);
});

test('the drawing has a name and a description, no style of its own and no number that is none', () => {
  const svg = levelDiagramFigure(levelDiagram({ electrons: 3, geometry: 'octahedral' }, 4.5, 40), 70, [{ key: 'a', x: 24, bands: [{ y: 24, used: true }, { y: 20, used: false }] }], newDocument(), dress);
  expect(svg).not.toMatch(/<style| style=|NaN|undefined|aria-label="/);
  const document = drawn(svg);
  expect(document.querySelector('svg')!.getAttribute('role')).toBe('img');
  expect(document.querySelector('title')!.textContent).toBe('Levels');
  expect(document.querySelectorAll('circle.mark').length).toBe(1);
  expect(document.querySelectorAll('circle.mark-open').length).toBe(1);
});

test('marks laid over a finished diagram fall where the diagram itself would put them', () => {
  const diagram = levelDiagram({ electrons: 3, geometry: 'octahedral' }, 4.5, 40);
  const marks = [{ key: 'a', x: 24.3, bands: [{ y: 35.1, used: true }] }, { key: 'b', x: 31, bands: [{ y: 12, used: true }] }];
  const places = (svg: string) => [...drawn(svg).querySelectorAll('circle.mark')].map((dot) => [Number(dot.getAttribute('cx')), Number(dot.getAttribute('cy'))]);
  const whole = places(levelDiagramFigure(diagram, 70, marks, newDocument(), dress));
  const over = places(diagramOverlay(40, 70, marks, dress));
  expect(over.length).toBe(2);
  over.flat().forEach((value, index) => expect(value).toBeCloseTo(whole.flat()[index]!, 1));
});

test('the frame is high enough for every mark and never endless', () => {
  expect(diagramCeiling(40, [])).toBe(60);
  expect(diagramCeiling(40, [{ key: 'a', x: 1, bands: [{ y: 80, used: true }] }])).toBe(90);
  expect(diagramCeiling(80, [{ key: 'a', x: 1, bands: [{ y: 500, used: true }] }])).toBe(120);
});
