import { describe, expect, test } from 'vitest';
import { aquaLigand, ionKey, parametersByName, publishedFactor, publishedIonOf, publishedIons, publishedLigandOf, publishedLigands, seriesResult, spinName } from '#engine';
import type { Reading, SeriesLigand } from '#engine';
import { islandsOf } from '../../../engine/series/islands.ts';
import { quantile, seededRandom } from '../../../engine/series/random.ts';
import { effectiveDegrees, normalOfStudent } from '../../../engine/series/student.ts';
import { handMadeMeasurement, handMadeReading } from '../../scripts/database/sample.ts';
import { identity } from './sample.ts';

describe('islands of sets that share names', () => {
  test('are numbered by size, whatever the order of the sets', () => {
    const sets = [['a', 'x'], ['b', 'y'], ['c', 'x'], ['c', 'z'], ['d', 'y'], ['e', 'w']];
    expect(islandsOf(sets)).toEqual([0, 1, 0, 0, 1, 2]);
    const order = [5, 3, 0, 4, 1, 2];
    expect(islandsOf(order.map((i) => sets[i]!))).toEqual(order.map((i) => [0, 1, 0, 0, 1, 2][i]));
  });
  test('a set that bridges two makes one; none gives none', () => {
    expect(new Set(islandsOf([['a', 'x'], ['b', 'y'], ['x', 'y']])).size).toBe(1);
    expect(islandsOf([])).toEqual([]);
  });
});

describe("Student's t as a normal deviate", () => {
  // Two-sided 5 % and 1 % points of t as printed in any table (common practice) against 1.960 and 2.576.
  test.each([[2.571, 5, 1.96], [2.228, 10, 1.96], [2.042, 30, 1.96], [4.032, 5, 2.576], [3.169, 10, 2.576], [2.75, 30, 2.576]])('t %f with %i degrees of freedom is z %f', (t, degrees, z) => {
    expect(Math.abs(normalOfStudent(t, degrees) - z)).toBeLessThan(0.03);
    expect(normalOfStudent(-t, degrees)).toBe(-normalOfStudent(t, degrees));
  });
  test('known uncertainty leaves t as it is, and an estimated share below 1 counts for more degrees', () => {
    expect(normalOfStudent(7.5, null)).toBe(7.5);
    expect(normalOfStudent(2, 1e9)).toBeCloseTo(2, 6);
    expect([effectiveDegrees(0, 5), effectiveDegrees(1, 5), effectiveDegrees(0.5, 5)]).toEqual([null, 5, 20]);
    expect(() => normalOfStudent(1, 0)).toThrow(RangeError);
  });
});

describe('resampling', () => {
  test('the same seed gives the same numbers, of mean 0 and variance 1, without memory', () => {
    const draw = (seed: number, count: number) => { const random = seededRandom(seed); return Array.from({ length: count }, () => random.normal()); };
    expect(draw(3, 20)).toEqual(draw(3, 20));
    expect(draw(3, 5)).not.toEqual(draw(4, 5));
    const many = draw(1, 40_000);
    const mean = (list: readonly number[]) => list.reduce((a, b) => a + b) / list.length;
    expect(Math.abs(mean(many))).toBeLessThan(0.02);
    expect(Math.abs(mean(many.map((x) => x * x)) - 1)).toBeLessThan(0.03);
    expect(Math.abs(mean(many.slice(1).map((x, i) => x * many[i]!)))).toBeLessThan(0.02);
  });
  test('quantiles lie between the numbers', () => {
    expect([0, 0.25, 0.5, 1].map((share) => quantile([1, 2, 3, 5], share))).toEqual([1, 1.75, 2.5, 5]);
    expect(() => quantile([], 0.5)).toThrow(RangeError);
  });
});

describe('the printed factors', () => {
  const ligand = (id: string, formula: string, donors: readonly string[]): SeriesLigand => ({ id, name: id, formula, charge: 0, donors });
  test.each([
    ['H2O', ['O'], 'water'], ['NH3', ['N'], 'ammonia'], ['C2H8N2', ['N', 'N'], 'ethylenediamine'], ['NCS-', ['N'], 'thiocyanate, N bound'], ['NCS-', ['S'], 'thiocyanate, S bound'],
    ['NO2-', ['N'], 'nitrite, N bound'], ['C2O4 2-', ['O', 'O'], 'oxalate'], ['C2H4NO2-', ['O', 'N'], 'glycinate'], ['C10H8N2', ['N', 'N'], '2,2′-bipyridine'], ['CH4N2O', ['O'], 'urea'], ['(CH3)2SO', ['O'], 'dimethyl sulfoxide, O bound'],
  ])('%s bound by %s is %s', (formula, donors, name) => {
    expect(publishedLigandOf({ formula, donors })?.name).toBe(name);
  });
  test('a ligand bound otherwise, or not printed, has none', () => {
    for (const [formula, donors] of [['NO2-', ['O']], ['C12H8N2', ['N', 'N']], ['H2O', ['O', 'O']], ['not a formula', ['N']]] as const) expect(publishedLigandOf({ formula, donors })).toBeNull();
  });
  test('an ion is known by its spin state too', () => {
    expect(publishedIonOf('Fe(II)', 5)?.g).toBe(8500);
    expect(publishedIonOf('Fe(II)', 1)).toBeNull();
    expect(publishedFactor({ kind: 'ion', name: 'Cr(III) octahedral quartet' }, 'Delta', [])).toBe(17400);
    expect(publishedFactor({ kind: 'ion', name: 'Cr(III) octahedral quartet' }, 'beta', [])).toBe(0.21);
    expect(publishedFactor({ kind: 'ion', name: 'Co(II) tetrahedral quartet' }, 'Delta', [])).toBeNull();
    expect(publishedFactor({ kind: 'ligand', name: 'x' }, 'Delta', [ligand('x', 'NH3', ['N'])])).toBe(1.25);
    expect(publishedFactor({ kind: 'ligand', name: 'missing' }, 'Delta', [])).toBeNull();
  });
  test('water is found whatever its id, and its f and h are 1', () => {
    expect(aquaLigand([ligand('nh', 'NH3', ['N']), ligand('wasser', 'H2O', ['O'])])).toBe('wasser');
    expect(aquaLigand([])).toBeNull();
    expect(publishedLigands.find(({ name }) => name === 'water')).toMatchObject({ f: 1, h: 1 });
  });
  test('no ligand and no ion stands twice, and Ir(III) is 32 000, not the misprint 8000', () => {
    expect(new Set(publishedLigands.map(({ composition, donors }) => `${composition}|${donors}`)).size).toBe(publishedLigands.length);
    expect(new Set(publishedIons.map(({ ion }) => ion)).size).toBe(publishedIons.length);
    expect(publishedIons.find(({ ion }) => ion === 'Ir(III)')!.g).toBe(32000);
  });
});

describe('a reading as a comparison sees it', () => {
  const complex = identity({ ligands: { ammine: 6 }, multiplicity: null });
  const reading: Reading = { ...handMadeReading, cautions: [{ code: 'B_ASSUMED', text: '' }, { code: 'LOOSE_B', text: '' }] };
  test('keeps the numbers, the transitions in the fit, the correlation, and the spin that the reading found', () => {
    expect(seriesResult(complex, 'aq', handMadeMeasurement, 'p-1', reading)).toMatchObject({
      complex: { multiplicity: 4 }, measurement: 'aq', phase: 'solution', temperature: 295, policy: 'p-1', verdict: 'untested', correlation: -0.62,
      transitions: ['a4T1g', 'a4T2g'], cautions: ['B_ASSUMED'], parameters: { Delta: { value: 21550, u: 60, uTotal: 161.5, standing: 'fitted', reason: null }, C: { value: null } },
    });
  });
  test('needs all four numbers', () => {
    expect(() => parametersByName(handMadeReading.parameters.slice(1))).toThrow('Delta is missing');
  });
  test('names an ion with its geometry and spin', () => {
    expect(ionKey(identity({ ligands: { ammine: 6 } }))).toBe('Cr(III) octahedral quartet');
    expect(ionKey(complex)).toBe('Cr(III) octahedral');
    expect([1, 2, 3, 4, 5, 6].map(spinName)).toEqual(['singlet', 'doublet', 'triplet', 'quartet', 'quintet', 'sextet']);
    expect(() => spinName(7)).toThrow(RangeError);
  });
});
