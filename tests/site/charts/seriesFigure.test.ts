import { parseHTML } from 'linkedom';
import { expect, test } from 'vitest';
import { newDocument } from '../../../site/charts/plot.ts';
import { type SeriesPoint, seriesFigure } from '../../../site/charts/seriesFigure.ts';

const point = (value: number, u: number | null = 10, uTotal: number | null = 30): SeriesPoint => ({ label: [{ text: `at ${value}`, style: 'plain' }], value, u, uTotal, open: false });
const axis = [{ text: 'Δ', style: 'italic' as const }];
const figure = (points: readonly SeriesPoint[]) => {
  const svg = seriesFigure(points, axis, newDocument(), { id: 's', title: 'Series', description: 'Values' });
  expect(svg).not.toMatch(/NaN|Infinity|undefined|<style| style=/);
  return parseHTML(`<!doctype html><html><body>${svg}</body></html>`).document;
};

test('each value has a dot, its label, and its two bars', () => {
  const document = figure([point(17000), point(21000), point(22000)]);
  expect(document.querySelectorAll('circle').length).toBe(3);
  expect(document.querySelectorAll('.error:not(.own) line').length).toBe(3);
  expect(document.querySelectorAll('.error.own line').length).toBe(3);
  const dots = [...document.querySelectorAll('circle')].map((dot) => Number(dot.getAttribute('cx')));
  expect(dots[0]!).toBeLessThan(dots[1]!);
  expect(dots[1]!).toBeLessThan(dots[2]!);
});

test('the bars are as long as the uncertainties they show', () => {
  const document = figure([point(1000, 20, 60), point(2000, 20, 60)]);
  const lengths = (name: string) => [...document.querySelectorAll(`${name} line`)].map((line) => Number(line.getAttribute('x2')) - Number(line.getAttribute('x1')));
  const [thin, thick] = [lengths('.error:not(.own)')[0]!, lengths('.error.own')[0]!];
  expect(thin / thick).toBeCloseTo(3, 1);
});

test.each([['none', []], ['one', [point(5)]], ['equal', [point(5), point(5)]], ['exact and equal', [point(5, null, null), point(5, null, null)]], ['zero', [point(0, null, null)]], ['tiny', [point(1e-6, 1e-9, 2e-9), point(2e-6, 1e-9, 2e-9)]]] as const)(
  'awkward data are drawn: %s', (_, points) => {
    expect(figure(points).querySelectorAll('circle').length).toBe(points.length);
  });

test('a missing uncertainty draws no bar', () => {
  expect(figure([point(1, null, null), point(2)]).querySelectorAll('.error:not(.own) line').length).toBe(1);
});

test('ticks on one axis have the same number of decimals', () => {
  const document = figure([point(0.66, 0.01, 0.02), point(0.8, 0.01, 0.02)]);
  const ticks = [...document.querySelectorAll('.plot text')].map((text) => text.textContent ?? '').filter((text) => /^[\d.]+$/.test(text));
  expect(ticks.length).toBeGreaterThan(2);
  expect(new Set(ticks.map((text) => text.split('.')[1]?.length ?? 0)).size).toBe(1);
});
