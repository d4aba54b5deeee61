import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { levels, termEnergies } from '#engine';
import type { FieldIon, FieldParameters, Geometry, Level } from '#engine';
import { shellBlocks } from '../../../engine/shell/blocks.ts';
import { seeded } from '../../published/random.ts';

const electronCounts = [1, 2, 3, 4, 5, 6, 7, 8, 9];
const geometries: readonly Geometry[] = ['octahedral', 'tetrahedral'];
const ions: readonly FieldIon[] = electronCounts.flatMap((electrons) => geometries.map((geometry) => ({ electrons, geometry })));
const named = ions.map((ion) => [`d${ion.electrons} ${ion.geometry}`, ion] as const);

const binomial = (n: number, k: number): number => (k === 0 ? 1 : (binomial(n - 1, k - 1) * n) / k);
const signOf = ({ geometry }: FieldIon): number => (geometry === 'octahedral' ? 1 : -1);
const highestOf = (list: readonly Level[]): number => list.at(-1)!.energy;
const byLabel = (list: readonly Level[]): ReadonlyMap<string, Level> => new Map(list.map((level) => [level.label, level]));
const meanOver = (list: readonly Level[], value: (level: Level) => number): number =>
  list.reduce((sum, level) => sum + level.degeneracy * value(level), 0) / list.reduce((sum, level) => sum + level.degeneracy, 0);

/** Repeats the law at seeded chemical points of every ion. */
function everywhere(law: (ion: FieldIon, parameters: FieldParameters) => void, runs = 6): void {
  const random = seeded(20);
  for (const ion of ions)
    for (let run = 0; run < runs; run++) {
      const racahB = 250 + 950 * random();
      law(ion, { delta: racahB * 45 * random(), racahB, racahC: racahB * (3 + 3.5 * random()) });
    }
}

describe('what a list of levels is', () => {
  test('levels ascend from the ground level, which stands at 0 with no gradient', () => {
    everywhere((ion, parameters) => {
      const list = levels(ion, parameters);
      expect(list[0]!.energy).toBe(0);
      expect(Object.values(list[0]!.gradient)).toEqual([0, 0, 0]);
      for (let i = 1; i < list.length; i++) expect(list[i]!.energy).toBeGreaterThanOrEqual(list[i - 1]!.energy);
      for (const level of list)
        for (const value of [level.energy, level.eElectrons, ...Object.values(level.gradient)]) expect(Number.isFinite(value)).toBe(true);
    });
  });

  test('a label is the letter of the place in the block, the multiplicity and the irreducible representation, with g only in an octahedron', () => {
    everywhere((ion, parameters) => {
      const list = levels(ion, parameters);
      expect(byLabel(list).size).toBe(list.length);
      for (const level of list) {
        expect(level.label).toBe('abcdefghij'[level.index - 1]! + level.multiplicity + level.irrep);
        expect(level.irrep).toMatch(ion.geometry === 'octahedral' ? /^(A1|A2|E|T1|T2)g$/ : /^(A1|A2|E|T1|T2)$/);
        expect(level.degeneracy).toBe(level.multiplicity * { A: 1, E: 2, T: 3 }[level.irrep[0] as 'A' | 'E' | 'T']);
      }
    });
  });

  test('within one multiplicity and irreducible representation places count 1, 2, 3 ... upwards in energy', () => {
    everywhere((ion, parameters) => {
      const places = new Map<string, number>();
      for (const { multiplicity, irrep, index } of levels(ion, parameters)) {
        const block = `${multiplicity}${irrep}`;
        expect(index).toBe((places.get(block) ?? 0) + 1);
        places.set(block, index);
      }
    });
  });

  test.each(named)('the levels of %s hold all C(10, n) states', (_, ion) => {
    const list = levels(ion, { delta: 15000, racahB: 700, racahC: 3100 });
    expect(list.reduce((sum, { degeneracy }) => sum + degeneracy, 0)).toBe(binomial(10, ion.electrons));
  });

  // Group theory: the free-ion terms of d^n resolved in O; the list of the Tanabe-Sugano matrices (J. Phys. Soc. Jpn. 9, 753 (1954)), from memory.
  test.each([
    [[1, 9], '2T2 1, 2E 1'],
    [[2, 8], '3T1 2, 3T2 1, 3A2 1, 1A1 2, 1E 2, 1T1 1, 1T2 2'],
    [[3, 7], '4T1 2, 4T2 1, 4A2 1, 2A1 1, 2A2 1, 2E 4, 2T1 5, 2T2 5'],
    [[4, 6], '5E 1, 5T2 1, 3T1 7, 3T2 5, 3E 3, 3A1 1, 3A2 2, 1A1 5, 1A2 2, 1E 5, 1T1 4, 1T2 7'],
    [[5], '6A1 1, 4T1 3, 4T2 3, 4E 2, 4A1 1, 4A2 1, 2T2 10, 2T1 8, 2E 7, 2A1 4, 2A2 3'],
  ])('d%j has blocks of the sizes %s', (counts, sizes) => {
    for (const electrons of counts) {
      const found = shellBlocks(electrons).map((block) => `${block.multiplicity}${block.irrep} ${block.size}`);
      expect(found.toSorted()).toEqual(sizes.split(', ').toSorted());
    }
  });
});

describe('limits', () => {
  test.each(named)('with no field every level of %s stands on the free-ion term that is its parent', (_, ion) => {
    for (const ratio of [3.3, 4.4, 4.7, 6.1]) {
      const terms = new Map(termEnergies(ion.electrons, 1000, 1000 * ratio).map(({ term, energy }) => [term, energy]));
      const ground = Math.min(...terms.values());
      for (const { label, multiplicity, parent, energy } of levels(ion, { delta: 0, racahB: 1000, racahC: 1000 * ratio })) {
        // 2P and 2H of d3 and d7 coincide for any B and C: no parent is named.
        if (parent === null) {
          expect([3, 7]).toContain(ion.electrons);
          expect(energy).toBeCloseTo(terms.get('2H')! - ground, 7);
        } else expect(energy, label).toBeCloseTo(terms.get(multiplicity + parent)! - ground, 7);
      }
    }
  });

  test.each(named)('the parents of %s account for every state of every free-ion term', (_, ion) => {
    const states = new Map<string, number>();
    for (const { multiplicity, parent, degeneracy } of levels(ion, { delta: 0, racahB: 900, racahC: 4000 })) {
      const term = multiplicity + (parent ?? '?');
      states.set(term, (states.get(term) ?? 0) + degeneracy);
    }
    const expected = new Map(termEnergies(ion.electrons, 900, 4000).map(({ term }) => [term, Number(term[0]) * (2 * 'SPDFGHI'.indexOf(term[1]!) + 1)]));
    if (ion.electrons === 3 || ion.electrons === 7) {
      // 2P and 2H coincide: their three 2T1 have no parent of their own, the 2E and the 2T2 can only come from 2H.
      expected.delete('2P');
      expected.set('2H', 2 * (2 + 3)).set('2?', 2 * (3 + 3 + 3));
    }
    expect(Object.fromEntries(states)).toEqual(Object.fromEntries(expected));
  });

  test('two terms of one letter that coincide name no parent: 2F and 2F\' of d5 at C/B = 8, where -9B + 8C = -25B + 10C', () => {
    const list = levels({ electrons: 5, geometry: 'octahedral' }, { delta: 0, racahB: 1, racahC: 8 });
    const coincident = list.filter(({ multiplicity, energy }) => multiplicity === 2 && Math.abs(energy - (-9 + 8 * 8 + 35)) < 1e-9);
    expect(coincident.map(({ label }) => label.slice(2)).toSorted()).toEqual(['A2g', 'A2g', 'T1g', 'T1g', 'T2g', 'T2g']);
    for (const { parent } of coincident) expect(parent).toBeNull();
    // The primes of the other terms are not disturbed: the third 2D stays D''.
    expect(list.at(-1)!.parent).toBe("D''");
  });

  test('the parent depends on B and C alone, not on the field', () => {
    for (const ion of ions) {
      const [weak, strong] = [0, 32000].map((delta) => byLabel(levels(ion, { delta, racahB: 800, racahC: 3500 })));
      for (const [label, { parent }] of weak!) expect(strong!.get(label)!.parent).toBe(parent);
    }
  });

  test.each(named)('in the strong field the levels of %s gather in the configurations t2^m e^k, C(6, m) C(4, k) states each', (_, ion) => {
    const list = levels(ion, { delta: 1e7, racahB: 1, racahC: 4 });
    const found = new Map<number, number>();
    for (const { eElectrons, energy, degeneracy } of list) {
      const k = Math.round(eElectrons);
      expect(eElectrons).toBeCloseTo(k, 5);
      found.set(k, (found.get(k) ?? 0) + degeneracy);
      // One e electron more costs one Delta in an octahedron and gains one in a tetrahedron.
      const steps = signOf(ion) === 1 ? k - Math.max(0, ion.electrons - 6) : Math.min(4, ion.electrons) - k;
      expect(Math.abs(energy / 1e7 - steps)).toBeLessThan(2e-5);
    }
    for (let k = Math.max(0, ion.electrons - 6); k <= Math.min(4, ion.electrons); k++)
      expect(found.get(k)).toBe(binomial(6, ion.electrons - k) * binomial(4, k));
  });

  test('with no repulsion there are only the configurations, exactly one Delta apart', () => {
    for (const ion of ions)
      for (const { energy, eElectrons, parent } of levels(ion, { delta: 10000, racahB: 0, racahC: 0 })) {
        expect(energy / 10000).toBeCloseTo(Math.round(energy / 10000), 12);
        expect(eElectrons).toBeCloseTo(Math.round(eElectrons), 12);
        expect(parent).toBeNull();
      }
  });

  test('with nothing at all every level stands at 0', () => {
    for (const ion of ions) for (const { energy } of levels(ion, { delta: 0, racahB: 0, racahC: 0 })) expect(energy).toBe(0);
  });

  test('a vanishing field splits the free-ion terms in the order that Delta = 0 already names', () => {
    for (const ion of ions) {
      const none = byLabel(levels(ion, { delta: 0, racahB: 1000, racahC: 4400 }));
      for (const level of levels(ion, { delta: 0.01, racahB: 1000, racahC: 4400 })) {
        const limit = none.get(level.label)!;
        // The ground level may change within its own term, so slopes are compared through the number of e electrons.
        expect(level.eElectrons, level.label).toBeCloseTo(limit.eElectrons, 3);
      }
    }
  });
});

describe('electrons and holes', () => {
  test.each(electronCounts)('octahedral d%i has the levels of tetrahedral d(10 - n), holes for electrons', (electrons) => {
    const parameters = { delta: 13800, racahB: 655, racahC: 2900 };
    const octahedral = levels({ electrons, geometry: 'octahedral' }, parameters);
    const tetrahedral = byLabel(levels({ electrons: 10 - electrons, geometry: 'tetrahedral' }, parameters));
    const tolerance = 1e-11 * highestOf(octahedral);
    expect(tetrahedral.size).toBe(octahedral.length);
    for (const level of octahedral) {
      const partner = tetrahedral.get(level.label.replace(/g$/, ''))!;
      expect(Math.abs(partner.energy - level.energy)).toBeLessThan(tolerance);
      expect(partner.eElectrons).toBeCloseTo(4 - level.eElectrons, 9);
      expect(partner.parent).toBe(level.parent);
      for (const key of ['delta', 'racahB', 'racahC'] as const) expect(partner.gradient[key]).toBeCloseTo(level.gradient[key], 8);
    }
  });

  test.each([1, 2, 3, 4])('d%i and d(10 - n) in one geometry differ by the sign of the field alone', (electrons) => {
    const random = seeded(electrons);
    for (const block of shellBlocks(electrons)) {
      const hole = shellBlocks(10 - electrons).find(({ multiplicity, irrep }) => multiplicity === block.multiplicity && irrep === block.irrep)!;
      const traceOf = (matrix: Float64Array) => Array.from({ length: block.size }, (_, i) => matrix[i * block.size + i]!).reduce((a, b) => a + b);
      expect(hole.size).toBe(block.size);
      expect(traceOf(hole.field)).toBeCloseTo(-traceOf(block.field), 11);
    }
    const parameters = { delta: 30000 * random(), racahB: 800, racahC: 3000 + 1000 * random() };
    const free = { ...parameters, delta: 0 };
    const energies = (count: number) => levels({ electrons: count, geometry: 'octahedral' }, free).map(({ label, energy }) => [label, energy] as const).toSorted();
    energies(electrons).forEach(([label, energy], i) => {
      const [other, same] = energies(10 - electrons)[i]!;
      expect(other).toBe(label);
      expect(same).toBeCloseTo(energy, 7);
    });
  });
});

describe('sum rules', () => {
  test('the field keeps the barycentre: the mean level does not move with Delta, and holds 0.4 n electrons in e orbitals', () => {
    everywhere((ion, parameters) => {
      const list = levels(ion, parameters);
      expect(meanOver(list, ({ eElectrons }) => eElectrons)).toBeCloseTo(0.4 * ion.electrons, 9);
      // Slopes are counted from the ground level's own, s (n_e - 0.4 n).
      expect(meanOver(list, ({ gradient }) => gradient.delta)).toBeCloseTo(signOf(ion) * (0.4 * ion.electrons - list[0]!.eElectrons), 9);
    });
  });

  // Mean repulsion of a pair of d electrons: the d2 terms of Racah (1942) weighted by their states, (-70 B + 35 C) / 45 (computed from published formulas).
  test.each(electronCounts)('the mean repulsion of d%i is n(n - 1)/2 times that of a pair, (-14 B + 7 C)/9', (electrons) => {
    const sums = { field: 0, racahB: 0, racahC: 0 };
    for (const block of shellBlocks(electrons)) {
      const states = block.multiplicity * { A1: 1, A2: 1, E: 2, T1: 3, T2: 3 }[block.irrep];
      for (const key of ['field', 'racahB', 'racahC'] as const)
        for (let i = 0; i < block.size; i++) sums[key] += states * block[key][i * block.size + i]!;
    }
    const pairs = (binomial(10, electrons) * electrons * (electrons - 1)) / 2;
    expect(sums.field).toBeCloseTo(0, 9);
    expect(sums.racahB).toBeCloseTo((-14 / 9) * pairs, 8);
    expect(sums.racahC).toBeCloseTo((7 / 9) * pairs, 8);
  });

  test('the number of e electrons of a level lies between what the shell can hold, and follows from the slope', () => {
    everywhere((ion, parameters) => {
      const list = levels(ion, parameters);
      for (const { eElectrons, gradient } of list) {
        expect(eElectrons).toBeGreaterThanOrEqual(Math.max(0, ion.electrons - 6) - 1e-9);
        expect(eElectrons).toBeLessThanOrEqual(Math.min(4, ion.electrons) + 1e-9);
        expect(gradient.delta).toBeCloseTo(signOf(ion) * (eElectrons - list[0]!.eElectrons), 9);
      }
    });
  });
});

describe('homogeneity and gradients', () => {
  const ionOf = fc.constantFrom(...ions);
  const point = fc.record({ ratio: fc.double({ min: 0, max: 60, noNaN: true }), racahB: fc.double({ min: 100, max: 1300, noNaN: true }), cOverB: fc.double({ min: 2, max: 9, noNaN: true }) });

  test('parameters a thousand or a million times larger or smaller give energies by the same factor, and the same labels and gradients', () => {
    fc.assert(fc.property(ionOf, point, fc.constantFrom(1e-6, 1e-3, 0.37, 2, 1e3, 1e6), (ion, { ratio, racahB, cOverB }, factor) => {
      const at = (k: number) => byLabel(levels(ion, { delta: k * ratio * racahB, racahB: k * racahB, racahC: k * cOverB * racahB }));
      const [plain, scaled] = [at(1), at(factor)];
      const highest = Math.max(...[...plain.values()].map(({ energy }) => energy));
      for (const [label, level] of plain) {
        const other = scaled.get(label)!;
        expect(Math.abs(other.energy / factor - level.energy)).toBeLessThanOrEqual(1e-11 * (highest + racahB));
        expect(other.parent).toBe(level.parent);
        expect(other.eElectrons).toBeCloseTo(level.eElectrons, 5);
      }
    }), { seed: 1954, numRuns: 150 });
  });

  test("energies are homogeneous of degree one: Delta, B and C times the gradient add up to the energy (Euler's theorem)", () => {
    everywhere((ion, parameters) => {
      const list = levels(ion, parameters);
      for (const { energy, gradient } of list) {
        const sum = parameters.delta * gradient.delta + parameters.racahB * gradient.racahB + parameters.racahC * gradient.racahC;
        expect(Math.abs(sum - energy)).toBeLessThanOrEqual(1e-11 * highestOf(list));
      }
    }, 20);
  });

  test('every gradient equals the slope of the transition energy, taken by small steps', () => {
    everywhere((ion, parameters) => {
      const here = levels(ion, parameters);
      const ground = here[0]!.label;
      for (const key of ['delta', 'racahB', 'racahC'] as const) {
        const energyAt = (step: number) => {
          const found = byLabel(levels(ion, { ...parameters, [key]: parameters[key] + step }));
          return (label: string) => found.get(label)!.energy - found.get(ground)!.energy;
        };
        // Two central differences, extrapolated: the error falls with the fourth power of the step.
        const step = 0.04;
        const [up, down, farUp, farDown] = [energyAt(step), energyAt(-step), energyAt(2 * step), energyAt(-2 * step)];
        for (const { label, gradient } of here) {
          const near = (up(label) - down(label)) / (2 * step);
          const far = (farUp(label) - farDown(label)) / (4 * step);
          expect(Math.abs((4 * near - far) / 3 - gradient[key]), `${label} ${key}`).toBeLessThan(1e-6);
        }
      }
    }, 3);
  });
});

describe('input outside its range', () => {
  const good = { delta: 10000, racahB: 800, racahC: 3500 };
  test.each(['delta', 'racahB', 'racahC'] as const)('%s that is negative, not a number or infinite is refused by name', (key) => {
    for (const value of [-1, -1e-300, Number.NaN, Number.POSITIVE_INFINITY])
      expect(() => levels({ electrons: 3, geometry: 'octahedral' }, { ...good, [key]: value })).toThrow(new RangeError(`${key}: ${value} is not a finite number of at least 0`));
  });

  test.each([0, 10, -1, 2.5, Number.NaN])('%s d electrons are refused', (electrons) => {
    expect(() => levels({ electrons, geometry: 'octahedral' }, good)).toThrow(RangeError);
  });
});
