import { levels } from '#engine';
import { expect, test } from 'vitest';
import { below, levelDiagram, thinned } from '../../../site/charts/levelCurves.ts';

test('the ground level of d3 is 4A2g all along and lies at zero', () => {
  const diagram = levelDiagram({ electrons: 3, geometry: 'octahedral' }, 4.5, 40);
  expect(diagram.grounds.map(({ label }) => label)).toEqual(['a4A2g']);
  expect(diagram.curves.find(({ labels }) => labels.includes('a4A2g'))!.points.every(({ y }) => y === 0)).toBe(true);
});

test('where the ground level of d6 changes, both levels lie at zero on a point of the curves', () => {
  const diagram = levelDiagram({ electrons: 6, geometry: 'octahedral' }, 4.5, 40);
  expect(diagram.grounds.map(({ label }) => label)).toEqual(['a5T2g', 'a1A1g']);
  const crossing = diagram.grounds[1]!.from;
  for (const label of ['a5T2g', 'a1A1g']) {
    const point = diagram.curves.find(({ labels }) => labels.includes(label))!.points.find(({ x }) => x === crossing)!;
    expect(Math.abs(point.y)).toBeLessThan(1e-6);
  }
});

test('levels that coincide all along, 4A1g and 4Eg of d5, are one curve with both names', () => {
  const diagram = levelDiagram({ electrons: 5, geometry: 'octahedral' }, 4.5, 40);
  expect(diagram.curves.map(({ labels }) => labels).filter((labels) => labels.length > 1)).toEqual([expect.arrayContaining(['a4A1g', 'a4Eg'])]);
});

test.each([[1, 'octahedral'], [2, 'tetrahedral'], [4, 'octahedral'], [5, 'octahedral'], [8, 'octahedral'], [9, 'tetrahedral']] as const)(
  'every level of d%i %s is on the diagram, with the energy that the engine gives', (electrons, geometry) => {
    const diagram = levelDiagram({ electrons, geometry }, 4.5, 30, 30);
    const found = levels({ electrons, geometry }, { delta: 17, racahB: 1, racahC: 4.5 });
    expect(diagram.curves.flatMap(({ labels }) => labels).sort()).toEqual(found.map(({ label }) => label).sort());
    for (const level of found) {
      const curve = diagram.curves.find(({ labels }) => labels.includes(level.label))!;
      expect(curve.points.find(({ x }) => x === 17)!.y).toBeCloseTo(level.energy, 9);
    }
  });

test('a curve is cut exactly where it leaves the frame, and comes back where it returns', () => {
  const points = [{ x: 0, y: 0 }, { x: 10, y: 20 }, { x: 20, y: 0 }];
  expect(below(points, 10)).toEqual([[{ x: 0, y: 0 }, { x: 5, y: 10 }], [{ x: 15, y: 10 }, { x: 20, y: 0 }]]);
  expect(below(points, 30)).toEqual([points]);
  expect(below([{ x: 0, y: 50 }, { x: 1, y: 60 }], 30)).toEqual([]);
});

test('a thinned curve keeps its ends and lies within the tolerance of every point it leaves out', () => {
  for (const electrons of [2, 5, 7]) for (const { points } of levelDiagram({ electrons, geometry: 'octahedral' }, 4.5, 40).curves) {
    const few = thinned(points, 0.02);
    expect([few[0], few.at(-1)]).toEqual([points[0], points.at(-1)]);
    for (const { x, y } of points) {
      const after = few.findIndex((point) => point.x >= x);
      const [a, b] = [few[Math.max(0, after - 1)]!, few[after]!];
      expect(Math.abs(y - (b.x === a.x ? b.y : a.y + ((b.y - a.y) * (x - a.x)) / (b.x - a.x)))).toBeLessThanOrEqual(0.0201);
    }
  }
  expect(thinned([{ x: 0, y: 0 }, { x: 1, y: 1 }, { x: 2, y: 2 }], 0.01).length).toBe(2);
});
