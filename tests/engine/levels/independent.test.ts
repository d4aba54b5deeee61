import { describe, expect, test } from 'vitest';
import { levels } from '#engine';
import type { FieldParameters, Geometry, Level } from '#engine';
import { fullEnergies, fullOperators, fullShelves } from './fullConfiguration.ts';
import { seeded } from '../../published/random.ts';

/**
 * The engine against an independent calculation on the whole configuration (fullConfiguration.ts): the two share
 * neither basis, integrals nor symmetry. 1e-9 of the highest level is the accuracy the engine promises.
 */
const geometries: readonly Geometry[] = ['octahedral', 'tetrahedral'];
const electronCounts = [1, 2, 3, 4, 5, 6, 7, 8, 9];

/** Points of ordinary chemistry, then the corners: no field, no repulsion, one parameter alone, extreme ratios. */
function points(electrons: number, geometry: Geometry): readonly FieldParameters[] {
  const random = seeded(1000 * electrons + (geometry === 'octahedral' ? 1 : 2));
  const ordinary = Array.from({ length: 3 }, () => {
    const racahB = 200 + 1000 * random();
    return { delta: 1000 + 34000 * random(), racahB, racahC: racahB * (2 + 7 * random()) };
  });
  return [
    ...ordinary,
    { delta: 0, racahB: 917.3, racahC: 4031.7 },
    { delta: 21500, racahB: 0, racahC: 0 },
    { delta: 18000, racahB: 0.37, racahC: 1.9 },
    { delta: 0.02, racahB: 1064, racahC: 4915 },
    { delta: 17400, racahB: 812, racahC: 0 },
    { delta: 9000, racahB: 0, racahC: 3900 },
  ];
}

describe.each(electronCounts)('d%i', (electrons) => {
  const operators = fullOperators(electrons);

  test.each(geometries)('every state of the %s field, one by one, has the energy of the full calculation', (geometry) => {
    const sign = geometry === 'octahedral' ? 1 : -1;
    for (const parameters of points(electrons, geometry)) {
      const { delta, racahB, racahC } = parameters;
      const expected = fullEnergies(operators, sign, delta, racahB, racahC);
      const got = levels({ electrons, geometry }, parameters).flatMap((level) => Array.from({ length: level.degeneracy }, () => level.energy));
      expect(got).toHaveLength(expected.length);
      // Without a field d1 and d9 have one level only: what is left is the rounding of their common repulsion.
      const tolerance = 1e-9 * expected.at(-1)! + 1e-14 * (racahB + racahC);
      const worst = Math.max(...got.map((energy, i) => Math.abs(energy - expected[i]!)));
      expect(worst, JSON.stringify(parameters)).toBeLessThanOrEqual(tolerance);
    }
  });

  test.each(geometries)('spin, e electrons and gradients in the %s field are traces over the same eigenstates', (geometry) => {
    const sign = geometry === 'octahedral' ? 1 : -1;
    for (const parameters of points(electrons, geometry).slice(0, 2)) {
      const { delta, racahB, racahC } = parameters;
      const shelves = fullShelves(operators, sign, delta, racahB, racahC, 1e-6 * delta);
      const found = levels({ electrons, geometry }, parameters);
      const ground = shelves[0]!;
      let next = 0;
      for (const shelf of shelves) {
        const members: Level[] = [];
        for (let states = 0; states < shelf.states; next++) {
          members.push(found[next]!);
          states += found[next]!.degeneracy;
        }
        const sum = (value: (level: Level) => number) => members.reduce((total, level) => total + level.degeneracy * value(level), 0);
        expect(sum(() => 1)).toBe(shelf.states);
        expect(sum(({ multiplicity }) => (multiplicity ** 2 - 1) / 4)).toBeCloseTo(shelf.spinSquared, 6);
        expect(sum(({ eElectrons }) => eElectrons)).toBeCloseTo(shelf.eElectrons, 6);
        for (const parameter of ['racahB', 'racahC'] as const)
          expect(sum(({ gradient }) => gradient[parameter])).toBeCloseTo(shelf[parameter] - (shelf.states * ground[parameter]) / ground.states, 5);
        expect(sum(({ gradient }) => gradient.delta)).toBeCloseTo(shelf.field - (shelf.states * ground.field) / ground.states, 6);
      }
      expect(next).toBe(found.length);
    }
  });
});

test('the full calculation would notice a wrong sign of one c^k: its d2 free-ion terms are those of Racah (1942)', () => {
  // Published: Racah, Phys. Rev. 62, 438 (1942), from memory: 3F -8B, 3P 7B, 1D -3B + 2C, 1G 4B + 2C, 1S 14B + 7C.
  const [racahB, racahC] = [1, 4.3];
  const expected = [[-8, 21], [-3 + 2 * racahC, 5], [7, 9], [4 + 2 * racahC, 9], [14 + 7 * racahC, 1]].sort((a, b) => a[0]! - b[0]!);
  const shelves = fullShelves(fullOperators(2), 1, 0, racahB, racahC, 1e-9);
  expect(shelves.map(({ states }) => states)).toEqual(expected.map(([, states]) => states));
  shelves.forEach(({ energy }, i) => expect(energy).toBeCloseTo(expected[i]![0]! + 8, 9));
});
