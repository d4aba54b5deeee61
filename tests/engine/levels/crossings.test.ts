import { describe, expect, test } from 'vitest';
import { groundCrossings, levels, lowestLevel } from '#engine';
import { fullOperators, fullShelves } from './fullConfiguration.ts';

describe('where high spin turns into low spin', () => {
  // Computed: exact crossings of an independent full calculation, to the digits given.
  test.each([
    [4, 4.61, 27.34, 'a5Eg', 'a3T1g'],
    [5, 4.477, 28.29, 'a6A1g', 'a2T2g'],
  ])('octahedral d%i at C/B %f changes its ground level at Delta/B %f, from %s to %s', (electrons, ratio, deltaOverB, below, above) => {
    const crossings = groundCrossings(electrons, 'octahedral', ratio);
    expect(crossings).toHaveLength(1);
    expect(Math.abs(crossings[0]!.deltaOverB - deltaOverB)).toBeLessThanOrEqual(0.005);
    expect(crossings[0]).toMatchObject({ below, above });
  });

  // Published diagrams of Tanabe and Sugano, J. Phys. Soc. Jpn. 9, 766 (1954), read by eye (from memory): good to 1 in Delta/B.
  test.each([
    [4, 4.61, 27, 'a5Eg', 'a3T1g'],
    [5, 4.477, 28, 'a6A1g', 'a2T2g'],
    [6, 4.81, 20, 'a5T2g', 'a1A1g'],
    [7, 4.633, 21.5, 'a4T1g', 'a2Eg'],
  ])('the printed diagram of d%i (C/B %f) bends near %f', (electrons, ratio, deltaOverB, below, above) => {
    const [crossing] = groundCrossings(electrons, 'octahedral', ratio);
    expect(Math.abs(crossing!.deltaOverB - deltaOverB)).toBeLessThanOrEqual(1);
    expect(crossing).toMatchObject({ below, above });
  });

  test.each([4, 5])('the full calculation of d%i changes the spin of its lowest level on either side of the crossing', (electrons) => {
    const { deltaOverB } = groundCrossings(electrons, 'octahedral', 4.5)[0]!;
    const operators = fullOperators(electrons);
    const spinAt = (x: number) => {
      const ground = fullShelves(operators, 1, x, 1, 4.5, 1e-9)[0]!;
      return Math.sqrt(1 + (4 * ground.spinSquared) / ground.states);
    };
    const highest = electrons + 1;
    expect(spinAt(deltaOverB * (1 - 1e-6))).toBeCloseTo(highest, 6);
    expect(spinAt(deltaOverB * (1 + 1e-6))).toBeCloseTo(electrons === 4 ? 3 : 2, 6);
  });

  test('at a crossing the two levels have one energy', () => {
    for (const electrons of [4, 5, 6, 7])
      for (const { deltaOverB, below, above } of groundCrossings(electrons, 'octahedral', 4.2)) {
        const found = levels({ electrons, geometry: 'octahedral' }, { delta: deltaOverB, racahB: 1, racahC: 4.2 });
        const energyOf = (name: string) => found.find(({ label }) => label === name)!.energy;
        expect(Math.abs(energyOf(below) - energyOf(above))).toBeLessThan(1e-8);
        expect(Math.min(energyOf(below), energyOf(above))).toBe(0);
      }
  });

  test('d1, d2, d3, d8 and d9 keep one ground level at any field', () => {
    for (const electrons of [1, 2, 3, 8, 9]) expect(groundCrossings(electrons, 'octahedral', 4.5)).toEqual([]);
  });

  test('a tetrahedral dn crosses where the octahedral d(10 - n) does', () => {
    for (const electrons of [3, 4, 5, 6]) {
      const tetrahedral = groundCrossings(electrons, 'tetrahedral', 4.5);
      const octahedral = groundCrossings(10 - electrons, 'octahedral', 4.5);
      expect(tetrahedral.length).toBe(octahedral.length);
      tetrahedral.forEach((crossing, i) => {
        expect(crossing.deltaOverB).toBeCloseTo(octahedral[i]!.deltaOverB, 7);
        expect(`${crossing.below}g ${crossing.above}g`).toBe(`${octahedral[i]!.below} ${octahedral[i]!.above}`);
      });
    }
  });

  test('a larger C/B holds high spin to a stronger field', () => {
    for (const electrons of [4, 5, 6, 7]) {
      const [weak, strong] = [4, 5].map((ratio) => groundCrossings(electrons, 'octahedral', ratio)[0]!.deltaOverB);
      expect(strong!).toBeGreaterThan(weak! + 1);
    }
  });

  test('nothing beyond the limit is reported', () => {
    expect(groundCrossings(5, 'octahedral', 4.477, 28)).toEqual([]);
    expect(groundCrossings(5, 'octahedral', 4.477, 29)).toHaveLength(1);
  });
});

describe('excited levels that cross', () => {
  // Computed from the published matrices: 4T2 and 2E of octahedral d3 at 19.15 (C/B 4) and 22.32 (C/B 5).
  test.each([[4, 19.15], [5, 22.32]])('2Eg and 4T2g of octahedral d3 at C/B %i have one energy at Delta/B %f', (ratio, deltaOverB) => {
    const difference = (x: number) => {
      const found = levels({ electrons: 3, geometry: 'octahedral' }, { delta: x, racahB: 1, racahC: ratio });
      return found.find(({ label }) => label === 'a2Eg')!.energy - found.find(({ label }) => label === 'a4T2g')!.energy;
    };
    expect(difference(deltaOverB - 0.005)).toBeGreaterThan(0);
    expect(difference(deltaOverB + 0.005)).toBeLessThan(0);
  });

  // From the closed forms E(A2) - E(T2) = Delta, E(T1 P) = sqrt(225B2 + 18B Delta + Delta2): exactly 13.5 B.
  test('3A2g and 3T1g(P) of octahedral d2 cross at Delta = 13.5 B exactly, and so do those of tetrahedral d3', () => {
    for (const [electrons, geometry, a2, t1] of [[2, 'octahedral', 'a3A2g', 'b3T1g'], [8, 'tetrahedral', 'a3A2', 'b3T1'], [3, 'tetrahedral', 'a4A2', 'b4T1'], [7, 'octahedral', 'a4A2g', 'b4T1g']] as const) {
      const found = levels({ electrons, geometry }, { delta: 13.5 * 640, racahB: 640, racahC: 2900 });
      const [first, second] = [a2, t1].map((name) => found.find(({ label }) => label === name)!.energy);
      expect(first).toBeCloseTo(second!, 7);
    }
  });
});

describe('the lowest level', () => {
  test('over all spins it is the first of the list', () => {
    for (let electrons = 1; electrons <= 9; electrons++)
      for (const geometry of ['octahedral', 'tetrahedral'] as const)
        for (const delta of [3000, 12000, 31000]) {
          const [first] = levels({ electrons, geometry }, { delta, racahB: 700, racahC: 3100 });
          expect(lowestLevel(electrons, geometry, delta, 700, 3100).label).toBe(first!.label);
        }
  });

  test('of one multiplicity it lies above the lowest of all by its transition energy', () => {
    const parameters = { delta: 17400, racahB: 725, racahC: 3300 };
    const doublet = levels({ electrons: 3, geometry: 'octahedral' }, parameters).find(({ multiplicity }) => multiplicity === 2)!;
    const [lowest, lowestDoublet] = [undefined, 2].map((multiplicity) => lowestLevel(3, 'octahedral', 17400, 725, 3300, multiplicity));
    expect(lowestDoublet!.label).toBe(doublet.label);
    expect(lowestDoublet!.energy - lowest!.energy).toBeCloseTo(doublet.energy, 7);
  });

  test('a multiplicity that the ion cannot have is refused', () => {
    expect(() => lowestLevel(3, 'octahedral', 17400, 725, 3300, 3)).toThrow(new RangeError('multiplicity: d3 has no level of multiplicity 3'));
  });
});
