import { describe, expect, test } from 'vitest';
import { averageFactor, fitFactors, inversions, kendallTauB, planeCorrelation, rankAgreement, selectComparable, trendSteps } from '#engine';
import type { SeriesResult } from '#engine';
import { randomFrom } from '../../../scripts/generate/random.ts';
import { identity, result, testFloor, testPolicy } from './sample.ts';

describe("Kendall's tau-b", () => {
  test('of equal orders is 1, of opposite ones -1, and ties count half as the formula says', () => {
    expect(kendallTauB([1, 2, 3, 4], [10, 20, 30, 40])).toBe(1);
    expect(kendallTauB([1, 2, 3, 4], [4, 3, 2, 1])).toBe(-1);
    // By hand: 4 concordant, 1 discordant, 1 tie in x: 3/sqrt(5 * 6).
    expect(kendallTauB([1, 1, 2, 3], [1, 2, 4, 3])).toBeCloseTo(3 / Math.sqrt(30), 12);
  });
  test('says nothing of fewer than two values or of one that never varies', () => {
    expect([kendallTauB([], []), kendallTauB([1], [1]), kendallTauB([1, 1], [1, 2])]).toEqual([null, null, null]);
    expect(() => kendallTauB([1, 2], [1])).toThrow(RangeError);
  });
  test('its interval is the same for the same seed, shrinks to the value without uncertainty, and widens with it', () => {
    const pairs = (u: number) => [1, 2, 3, 4, 5, 6].map((value) => [{ value, u }, { value, u: 0 }] as const);
    const resampling = { seed: 5, draws: 500 };
    expect(rankAgreement(pairs(0), resampling)).toEqual({ tau: 1, low: 1, high: 1, pairs: 6 });
    const [narrow, wide] = [rankAgreement(pairs(0.3), resampling)!, rankAgreement(pairs(2), resampling)!];
    expect(rankAgreement(pairs(2), resampling)).toEqual(wide);
    expect(wide.low).toBeLessThan(narrow.low);
    expect(narrow.low).toBeGreaterThan(0.6);
    expect(wide.tau).toBe(1);
  });
});

const f: Readonly<Record<string, number>> = { chlorido: 0.78, fluorido: 0.9, aqua: 1, ammine: 1.25 };
const g: Readonly<Record<string, number>> = { 'Cr(III)': 17400, 'V(II)': 12000, 'Mo(III)': 24600 };

describe('inversions against the pooled order', () => {
  const regular = Object.entries(g).flatMap(([ion, gValue]) => Object.entries(f).map(([ligand, fValue]) => result({ ion, ligands: { [ligand]: 6 }, delta: gValue * fValue })));
  const fit = (results: readonly SeriesResult[]) => fitFactors(results, { parameter: 'Delta', geometry: 'octahedral', policy: testPolicy, aqua: 'aqua' });
  const seriesOf = (results: readonly SeriesResult[]) => selectComparable(results, 'Delta', {
    policy: testPolicy, ion: 'V(II)', geometry: 'octahedral', multiplicity: 4, ligandSet: null, phase: 'solution', temperature: { near: 295, orNotRecorded: false },
  });
  test('a regular collection has none', () => {
    expect(inversions(seriesOf(regular), fit(regular), testFloor)).toEqual([]);
  });
  test('one ion that puts fluoride above water shows it, with its z', () => {
    const odd = regular.map((one) => (one.complex.ion.name === 'V(II)' && one.complex.ligands[0]!.ligand === 'fluorido' ? result({ ion: 'V(II)', ligands: { fluorido: 6 }, delta: 12500 }) : one));
    const found = inversions(seriesOf(odd), fit(odd), testFloor);
    expect(found.map(({ higher, lower }) => [higher.complex.ligands[0]!.ligand, lower.complex.ligands[0]!.ligand])).toEqual([['fluorido', 'aqua']]);
    expect(found[0]!.difference).toMatchObject({ value: 500, distinguishable: true });
    expect(found[0]!.difference.z).toBeCloseTo(500 / Math.hypot(60, 60, 50), 9);
    expect(found[0]!.pooled).toBeGreaterThan(0);
    expect(found[0]).toMatchObject({ z: Math.min(found[0]!.difference.z, found[0]!.zPooled), distinguishable: found[0]!.difference.z > 2 && found[0]!.zPooled > 2 });
  });
  test('the pooled order carries the uncertainty of its factors, as redrawn factors spread it', () => {
    const odd = [...regular.filter(({ complex }) => complex.ion.name !== 'V(II)'), ...[[{ fluorido: 6 }, 12500], [{ aqua: 4, ammine: 2 }, 11800]].map(([ligands, delta]) => result({ ion: 'V(II)', ligands: ligands as Record<string, number>, delta: delta as number }))];
    const factors = fit(odd);
    const [pair] = inversions(seriesOf(odd), factors, testFloor);
    const { names, values, covariance } = factors.islands[0]!.solution;
    const free = names.flatMap(({ kind, name }, place) => (kind === 'ligand' ? [{ name, place }] : []));
    const order = (moved: (name: string) => number): number => (4 + 2 * moved('ammine')) / 6 / moved('fluorido') - 1;
    const at = (shift: ReadonlyMap<string, number>) => order((name) => Math.exp(values[free.find((one) => one.name === name)!.place]! + (shift.get(name) ?? 0)));
    // Central differences of the order itself, through the covariance of the fit.
    const slopes = free.map(({ name }) => (at(new Map([[name, 1e-5]])) - at(new Map([[name, -1e-5]]))) / 2e-5);
    const variance = slopes.reduce((sum, a, i) => sum + slopes.reduce((inner, b, j) => inner + a * b * covariance[free[i]!.place]![free[j]!.place]!, 0), 0);
    expect(pair!.higher.complex.ligands[0]!.ligand).toBe('fluorido');
    expect(pair!.uPooled / Math.sqrt(variance)).toBeCloseTo(1, 6);
    expect(pair!.uPooled).toBeGreaterThan(0);
  });
  test('a ligand without a factor takes no part', () => {
    expect(averageFactor(fit(regular), identity({ ligands: { en: 6 } }))).toBeNull();
    expect(averageFactor(fit(regular), identity({ ligands: { aqua: 3, ammine: 3 } }))).toBeCloseTo(1.125, 8);
  });
});

describe('trends', () => {
  const am = (ion: string, multiplicity: number, delta: number, beta = 0.75) => result({ ion, multiplicity, ligands: { ammine: 6 }, delta, beta });
  test('along oxidation state Delta rises and beta falls: each step with its outcome', () => {
    const members = [am('Co(II)', 4, 10200, 0.92), am('Co(III)', 1, 22900, 0.58)];
    expect(trendSteps(members, 'Delta', testFloor)).toMatchObject([{ expectation: { trend: 'oxidation state', direction: 'rises' }, outcome: 'as expected', spinDiffers: true, ratio: 22900 / 10200, difference: { basis: 'total' } }]);
    expect(trendSteps(members, 'beta', testFloor)).toMatchObject([{ expectation: { direction: 'falls' }, outcome: 'as expected' }]);
    expect(trendSteps([members[0]!, am('Co(III)', 1, 9000)], 'Delta', testFloor)).toMatchObject([{ outcome: 'against' }]);
    expect(trendSteps([members[0]!, am('Co(III)', 1, 10300)], 'Delta', testFloor)).toMatchObject([{ outcome: 'not distinguishable' }]);
  });
  test('down the group neighbours of one oxidation state and spin are compared', () => {
    const steps = trendSteps([am('Co(III)', 1, 22900), am('Rh(III)', 1, 34100), am('Ir(III)', 1, 41000), am('Co(II)', 4, 10200)], 'Delta', testFloor).filter(({ expectation }) => expectation.trend === 'down the group');
    expect(steps.map(({ from, to }) => `${from.complex.ion.name} ${to.complex.ion.name}`)).toEqual(['Co(III) Rh(III)', 'Rh(III) Ir(III)']);
  });
  test('along 3d the order is that of the printed g, within one oxidation state', () => {
    const steps = trendSteps([am('Ni(II)', 3, 10750), am('Co(II)', 4, 10200), am('Cr(III)', 4, 21550)], 'Delta', testFloor).filter(({ expectation }) => expectation.trend === 'along 3d');
    expect(steps.map(({ from, to, outcome }) => [from.complex.ion.name, to.complex.ion.name, outcome])).toEqual([['Ni(II)', 'Co(II)', 'against']]);
  });
  test('other ligands, other isomers and lone complexes make no step', () => {
    expect(trendSteps([am('Co(II)', 4, 10200), result({ ion: 'Co(III)', multiplicity: 1, ligands: { aqua: 6 } })], 'Delta', testFloor)).toEqual([]);
    expect(trendSteps([], 'Delta', testFloor)).toEqual([]);
  });
});

describe('Delta against beta', () => {
  const resampling = { seed: 11, draws: 400 };
  const cloud = (seed: number, slope: number, correlation: number): SeriesResult[] => {
    const random = randomFrom(seed, 'plane');
    return Array.from({ length: 12 }, (_, i) => {
      const delta = 14000 + 700 * i;
      const [a, b] = [random.normal(0, 1), random.normal(0, 1)];
      return result({
        id: `c-${i}`, ligands: { aqua: i, ammine: 12 - i }, delta: delta + 300 * a, beta: 0.75 + slope * (delta - 18000) + 0.04 * (correlation * a + Math.sqrt(1 - correlation ** 2) * b),
        uDeltaTotal: 300, uBetaTotal: 0.04, correlation,
      });
    });
  };
  test('a real dependence lies outside the null band', () => {
    const found = planeCorrelation(cloud(1, -3e-5, 0), resampling)!;
    expect(found.r).toBeLessThan(-0.6);
    expect(found).toMatchObject({ withinNull: false, points: { length: 12 } });
    expect(found.interval!.low).toBeLessThan(found.r);
    expect(found.interval!.high).toBeGreaterThan(found.r);
    expect(found.leaveOneOut!.low).toBeLessThanOrEqual(found.r);
  });
  test('a correlation that only the fits make lies inside it, in 95 of 100 collections', () => {
    let [inside, negative] = [0, 0];
    for (let seed = 1; seed <= 100; seed++) {
      const found = planeCorrelation(cloud(seed, 0, -0.95), { seed, draws: 200 })!;
      if (found.withinNull) inside += 1;
      if (found.nullBand.low + found.nullBand.high < 0) negative += 1;
    }
    expect(inside).toBeGreaterThanOrEqual(90);
    expect(negative).toBeGreaterThanOrEqual(90);
  });
  test('says nothing below three points, where nothing varies, or where a number is withheld', () => {
    expect(planeCorrelation(cloud(1, 0, 0).slice(0, 2), resampling)).toBeNull();
    expect(planeCorrelation(Array.from({ length: 5 }, (_, i) => result({ id: `c-${i}`, ligands: { aqua: 6 } })), resampling)).toBeNull();
    expect(planeCorrelation(Array.from({ length: 5 }, (_, i) => result({ id: `c-${i}`, ligands: { aqua: 6 }, delta: 10000 + i, beta: null })), resampling)).toBeNull();
    expect(planeCorrelation(cloud(1, 0, 0).slice(0, 3), resampling)).toMatchObject({ interval: null, leaveOneOut: null });
  });
});
