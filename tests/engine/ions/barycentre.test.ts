import { expect, test } from 'vitest';
import { barycentre, termTables } from '#engine';

// Raw levels: NIST Atomic Spectra Database, issues of 2013 to 2016 (cm-1).
const titanium3 = {
  '3F': [[2, 0], [3, 184.9], [4, 420.4]],
  '1D': [[2, 8473.5]],
  '3P': [[0, 10538.4], [1, 10603.6], [2, 10721.2]],
  '1G': [[4, 14397.6]],
  '1S': [[0, 32475.5]],
} as const;
const manganese3 = {
  '6S': [[2.5, 0]],
  '4G': [[5.5, 26824.4], [4.5, 26851.1], [2.5, 26857.8], [3.5, 26859.9]],
} as const;

const centre = (levels: readonly (readonly [number, number])[]) => barycentre(levels.map(([j, energy]) => ({ j, energy })));

test.each([
  ['Ti III', '3F', titanium3],
  ['Mn III', '6S', manganese3],
])('the terms of %s are its raw levels averaged over J with weight 2J + 1', (spectrum, ground, raw) => {
  const table = termTables.find((candidate) => candidate.spectrum === spectrum);
  const zero = centre(raw[ground as keyof typeof raw]);
  for (const [term, levels] of Object.entries(raw)) {
    const tabulated = table?.terms.find((candidate) => candidate.term === term)?.energy;
    // Both are printed to 0.1: three roundings of 0.05 at most.
    expect(Math.abs(centre(levels) - zero - (tabulated ?? Number.NaN)), `${spectrum} ${term}`).toBeLessThan(0.15);
  }
});

test('the average of one level is the level, and equal levels stay where they are', () => {
  expect(barycentre([{ j: 4, energy: 14397.6 }])).toBe(14397.6);
  expect(barycentre([{ j: 0, energy: 50 }, { j: 3, energy: 50 }])).toBe(50);
});

test('no levels, a negative J or a J that is no half-integer is refused', () => {
  expect(() => barycentre([])).toThrow('no levels');
  expect(() => barycentre([{ j: -1, energy: 0 }])).toThrow('-1');
  expect(() => barycentre([{ j: 0.3, energy: 0 }])).toThrow('0.3');
});
