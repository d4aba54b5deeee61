import { expect, test } from 'vitest';
import { ellipsePath, keyPlaces } from '../../../site/charts/ellipse.ts';
import { type MapMark, mapFigure } from '../../../site/charts/mapFigure.ts';
import { type PlaneMark, planeFigure } from '../../../site/charts/planeFigure.ts';
import { newDocument } from '../../../site/charts/plot.ts';

const same = { x: (value: number) => value, y: (value: number) => value };
/** Points along a path of cubic pieces. */
function corners(path: string): readonly [number, number][] {
  const [start, ...pieces] = path.slice(1, -1).split('C').map((piece) => piece.split(' ').map(Number));
  let from = start as [number, number];
  return pieces.flatMap((numbers) => {
    const [x1, y1, x2, y2, x3, y3] = numbers as [number, number, number, number, number, number];
    const [x0, y0] = from;
    from = [x3, y3];
    return Array.from({ length: 50 }, (_, step): [number, number] => {
      const [t, s] = [step / 50, 1 - step / 50];
      return [s ** 3 * x0 + 3 * s * s * t * x1 + 3 * s * t * t * x2 + t ** 3 * x3, s ** 3 * y0 + 3 * s * s * t * y1 + 3 * s * t * t * y2 + t ** 3 * y3];
    });
  });
}

test('the shadow of an error ellipse on each axis is the value with its standard uncertainty, whatever the correlation', () => {
  for (const correlation of [-0.95, 0, 0.6]) {
    const points = corners(ellipsePath({ x: 100, y: 50, ux: 10, uy: 4, correlation }, same));
    const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
    expect(Math.max(...xs)).toBeCloseTo(110, 1);
    expect(Math.min(...xs)).toBeCloseTo(90, 1);
    expect(Math.abs(Math.max(...ys) - 54)).toBeLessThan(0.02);
    for (const [x, y] of points) {
      const [a, b] = [(x - 100) / 10, (y - 50) / 4];
      expect((a * a - 2 * correlation * a * b + b * b) / (1 - correlation ** 2), `${x} ${y}`).toBeCloseTo(1, 1);
    }
    // At the right end the height is the correlation's: y = rho uy.
    expect(points[0]![1]).toBeCloseTo(50 + 4 * correlation, 1);
  }
});

test('an ellipse of full correlation is a line, and none is wider than full correlation allows', () => {
  const points = corners(ellipsePath({ x: 0, y: 0, ux: 3, uy: 3, correlation: 1 }, same));
  for (const [x, y] of points) expect(x).toBeCloseTo(y, 9);
});

test('letters lie on no point and on no other letter', () => {
  const points = Array.from({ length: 26 }, (_, i) => ({ x: 100 + 9 * Math.sin(5 * i) + 4 * i, y: 100 + 12 * Math.cos(3 * i) }));
  const keys = points.map((_, i) => String.fromCharCode(97 + i));
  const places = keyPlaces(points, keys, { left: 0, right: 400, top: 0, bottom: 300 });
  const set = places.filter((place) => place !== null);
  expect(set.length).toBeGreaterThan(20);
  for (const place of set) {
    expect(points.every(({ x, y }) => Math.abs(x - place.x) > 7 || Math.abs(y - place.y) > 7)).toBe(true);
    expect(set.filter((other) => other !== place && Math.abs(other.x - place.x) < 10 && Math.abs(other.y - place.y) < 12)).toEqual([]);
  }
});

const mark = (x: number, y: number, key = 'a'): PlaneMark => ({ x, y, ux: 0.02, uy: 150, correlation: -0.5, key });
const coefficient = { r: -0.4, interval: null, leaveOneOut: null, nullBand: { low: -0.6, high: 0.5 } };
test.each([['three', [mark(0.7, 17000), mark(0.8, 16000, 'b'), mark(0.9, 15000, 'c')]], ['equal', [mark(0.7, 17000), mark(0.7, 17000, 'b')]], ['without letters', [mark(0.7, 17000, ''), mark(0.6, 20000, '')]]] as const)('a plane is drawn with an ellipse and a dot for each point: %s', (_, marks) => {
  const svg = planeFigure(marks, { x: [], y: [] }, coefficient, newDocument(), { id: 'p', title: 'P', description: 'D' });
  expect(svg.match(/class="ellipse"/g)).toHaveLength(marks.length);
  expect(svg).not.toMatch(/NaN|undefined|Infinity/);
  // One open bar for the null band; no interval is drawn that is not known.
  expect(svg.match(/class="frame"/g)).toHaveLength(1);
  expect(svg).not.toContain('class="error"');
});

test('a map draws every cell by its form, and a triangle only where one is flagged', () => {
  const cell = (form: MapMark['form'], flag: MapMark['flag'] = null): MapMark => ({ form, text: '17.4', flag });
  const svg = mapFigure([{ label: [{ text: 'Cr(III)', style: 'plain' }], cells: [cell('framed'), cell('framed', 'above'), cell('framed', 'far below')] }, { label: [{ text: 'V(III)', style: 'plain' }], cells: [cell('slanted'), cell('ring'), cell('dot')] }],
    ['F', 'O', 'N'].map((text) => [{ text, style: 'plain' as const }]), { id: 'm', title: 'M', description: 'D' });
  expect(svg.match(/class="frame"/g)).toHaveLength(3);
  expect(svg.match(/>17\.4</g)).toHaveLength(4);
  expect([svg.match(/class="flag"/g)?.length, svg.match(/class="point"/g)?.length]).toEqual([1, 1]);
  expect(mapFigure([], [], { id: 'm', title: 'M', description: 'D' })).toMatch(/^<svg/);
});
