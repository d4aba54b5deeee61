import { parseHTML } from 'linkedom';
import { expect, test } from 'vitest';
import { STRIP_DOMAIN, VISIBLE_RANGE, energyScale } from '../../../site/charts/energyAxis.ts';
import { type StripBand, type StripRow, bandStrip } from '../../../site/charts/strip.ts';
import { stripFigure } from '../../../site/charts/stripFigure.ts';

const band = (more: Partial<StripBand> = {}): StripBand => ({ position: 20000, kind: 'maximum', side: null, width: null, fitted: true, ...more });
const row = (more: Partial<StripRow> = {}): StripRow => ({ bands: [], absent: [], scanned: [], ...more });
const drawn = (svg: string) => parseHTML(`<!doctype html><html><body>${svg}</body></html>`).document;
const strip = (more: Partial<StripRow>) => drawn(bandStrip(row(more), 'Bands', 'x'));

test('every kind of reading has a shape of its own', () => {
  const shapes = (['maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'component', 'centroid', 'envelope'] as const)
    .map((kind) => strip({ bands: [band({ kind, side: kind === 'shoulder' ? 'higher' : null })] }).querySelector('svg')!.innerHTML);
  expect(new Set(shapes).size).toBe(8);
  for (const shape of shapes) expect(shape).not.toMatch(/NaN|Infinity|undefined/);
});

test('a shoulder leans towards the stronger band', () => {
  const lean = (side: 'higher' | 'lower' | null) => Number(/l(-?[\d.]+)/.exec(strip({ bands: [band({ kind: 'shoulder', side })] }).querySelector('.tick')!.getAttribute('d')!)?.[1] ?? 0);
  expect(lean('higher')).toBeGreaterThan(0);
  expect(lean('lower')).toBeLessThan(0);
  expect(lean(null)).toBe(0);
});

test('a band that is kept and not fitted has a dotted stem', () => {
  expect(strip({ bands: [band({ fitted: false })] }).querySelectorAll('.left-out').length).toBe(1);
  expect(strip({ bands: [band()] }).querySelectorAll('.left-out').length).toBe(0);
});

test('a band outside the axis becomes an arrowhead at the end it lies beyond', () => {
  const tip = (position: number) => Number(/L([\d.]+)/.exec(strip({ bands: [band({ position })] }).querySelector('.tick')!.getAttribute('d')!)![1]);
  expect(tip(60000)).toBe(237);
  expect(tip(2000)).toBe(3);
});

test('the line is solid where the group looked and dotted elsewhere, without a gap', () => {
  const document = strip({ scanned: [{ low: 20000, high: 30000 }, { low: 10000, high: 15000 }] });
  const pieces = (name: string) => [...document.querySelector(name)!.getAttribute('d')!.matchAll(/M([\d.]+) [\d.]+H([\d.]+)/g)].map(([, from, to]) => [Number(from), Number(to)] as const);
  const all = [...pieces('.seen'), ...pieces('.unseen')].sort(([a], [b]) => a - b);
  expect(pieces('.seen').length).toBe(2);
  expect(all[0]![0]).toBe(3);
  expect(all.at(-1)![1]).toBe(237);
  for (let index = 1; index < all.length; index++) expect(all[index]![0]).toBeCloseTo(all[index - 1]![1], 1);
  expect(strip({}).querySelector('.seen')).toBeNull();
});

test('an empty range is drawn, and one wholly outside the axis is not', () => {
  expect(strip({ absent: [{ low: 28600, high: 33300 }] }).querySelectorAll('.absent').length).toBe(1);
  expect(strip({ absent: [{ low: 50000, high: 60000 }] }).querySelectorAll('.absent').length).toBe(0);
});

test('the title is text, whatever it holds', () => {
  const document = drawn(bandStrip(row(), '<img src=x onerror=alert(1)>', 'x'));
  expect(document.querySelector('img')).toBeNull();
  expect(document.querySelector('title')!.textContent).toBe('<img src=x onerror=alert(1)>');
});

test('the visible colours lie where the eye sees them', () => {
  expect(VISIBLE_RANGE[0]).toBeCloseTo(1e7 / 770, 6);
  expect(VISIBLE_RANGE[1]).toBeCloseTo(1e7 / 375, 6);
  const scale = energyScale([0, 400]);
  expect(scale.at(STRIP_DOMAIN[0])).toBe(0);
  expect(scale.at(STRIP_DOMAIN[1])).toBe(400);
});

test('the large strip names each band without one name on another and marks each calculated position', () => {
  const names = [20000, 20100, 20200].map((position) => ({ position, parts: [{ text: 'b4T1g', style: 'plain' as const }] }));
  const document = drawn(stripFigure(row({ bands: names.map(({ position }) => band({ position })) }), names, [20050, 99000], { id: 's', title: 'Strip', description: 'Three bands' }));
  const centres = [...document.querySelectorAll('text')].filter((text) => text.textContent === 'b4T1g').map((text) => Number(text.getAttribute('x')));
  expect(centres.length).toBe(3);
  expect(centres[1]! - centres[0]!).toBeGreaterThan(36);
  expect(centres[2]! - centres[1]!).toBeGreaterThan(36);
  expect(document.querySelectorAll('.calculated').length).toBe(1);
  expect(document.querySelector('svg')!.getAttribute('aria-labelledby')).toBe('s-title');
  expect(document.querySelector('desc')!.textContent).toBe('Three bands');
});
