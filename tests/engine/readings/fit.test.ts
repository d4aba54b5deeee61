import { describe, expect, test } from 'vitest';
import { defaultPolicy, freeIon } from '#engine';
import type { Policy } from '#engine';
import { isFit } from '../../../engine/readings/fitTypes.ts';
import type { Fit } from '../../../engine/readings/fitTypes.ts';
import { assumed, exactFit, fitOf, forAllThree, forFieldAlone, forFieldAndB, planted, readings, standingFit, transitionEnergies, valuesOf } from './planted.ts';
import type { Planted } from './planted.ts';

const named = (list: readonly Planted[]) => list.map((one) => [one.name, one] as const);
const positionsOf = (one: Planted): number[] => transitionEnergies(one.ion, one.labels, one.at);
const relative = (got: number, expected: number): number => Math.abs(got / expected - 1);

/** The solution nearest to what was planted, as the largest relative difference of the first `count` parameters. */
function nearest(fit: Fit, one: Planted, count: number): number {
  const away = fit.solutions.map((solution) => Math.max(...valuesOf(solution.at).slice(0, count).map((value, i) => relative(value, valuesOf(one.at)[i]!))));
  return Math.min(...away);
}

describe('parameters that were put in come out again, to 1e-9', () => {
  test.each(named(forFieldAndB))('Delta and B with C/B known: %s', (_, one) => {
    const fit = exactFit(one);
    expect(fit.mode).toBe('field, B');
    expect(nearest(fit, one, 3)).toBeLessThan(1e-9);
    expect(fit.solutions[0]!.chi2).toBeLessThan(1e-12);
    expect(fit.spare).toBe(one.labels.length - 2);
    expect(fit.used.every(Boolean)).toBe(true);
    const positions = positionsOf(one);
    fit.calculated.forEach(({ energy }, k) => {
      expect(relative(energy, positions[k]!)).toBeLessThan(1e-9);
    });
  });

  test.each(named(forFieldAndB.filter((one) => one.labels.length === 3)))('a third band leaves one solution, and it is the first: %s', (_, one) => {
    const { solutions } = exactFit(one);
    expect(nearest({ ...exactFit(one), solutions: solutions.slice(0, 1) }, one, 3)).toBeLessThan(1e-9);
    for (const other of solutions.slice(1)) expect(other.chi2).toBeGreaterThan(1);
  });

  test.each(named(forAllThree))('Delta, B and C: %s', (_, one) => {
    // The C/B of the policy is wrong on purpose: a fitted C must not feel it.
    const fit = exactFit(one, 40, { policy: withFloors(0), ratio: assumed(3.5) });
    expect(fit.mode).toBe('field, B, C');
    expect(nearest({ ...fit, solutions: fit.solutions.slice(0, 1) }, one, 3)).toBeLessThan(1e-9);
    expect(fit.solutions[0]!.chi2).toBeLessThan(1e-12);
    expect(fit.spare).toBe(one.labels.length - 3);
    expect(fit.ratio.origin).toBe('fitted');
    expect(relative(fit.ratio.value, one.at.racahC / one.at.racahB)).toBeLessThan(1e-9);
  });

  test.each(named(forFieldAlone))('Delta alone: %s', (_, one) => {
    const fit = exactFit(one);
    expect(fit.mode).toBe('field');
    expect(relative(fit.solutions[0]!.at.delta, one.at.delta)).toBeLessThan(1e-12);
    expect(fit.spare).toBe(0);
  });

  test('Delta and B from 4T2g and 2Eg of Cr(III) with C/B known: two bands cannot fix C as well', () => {
    const one = planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a2Eg', 17_400, 700, 4.5);
    const fit = exactFit(one);
    expect(fit.mode).toBe('field, B by a line');
    expect(nearest(fit, one, 3)).toBeLessThan(1e-9);
  });

  test.each([
    planted('V(III)', 2, 'octahedral', 3, 'a3T2g', 18_500, 0.75 * 861),
    planted('Co(II)', 7, 'octahedral', 4, 'a4T2g', 9200, 0.75 * 971),
    planted('Co(III)', 6, 'octahedral', 1, 'a1T1g', 23_500, 0.75 * 1065),
  ].map((one) => [one.name, one] as const))('Delta with beta = 0.75 assumed: %s', (_, one) => {
    const fit = exactFit(one);
    expect(fit.mode).toBe('field, B assumed');
    expect(fit.assumedBeta).toEqual({ value: 0.75, u: 0.12 });
    expect(nearest({ ...fit, solutions: fit.solutions.slice(0, 1) }, one, 3)).toBeLessThan(1e-9);
  });
});

/** The default policy with every floor at one value, so that a scaled problem can be scaled altogether. */
function withFloors(floor: number): Policy {
  return { ...defaultPolicy, floors: { general: floor, spinFlip: floor, twoElectron: floor } };
}

/** Readings off the exact ones by a few hundred, with lopsided u: an ordinary measurement. */
const scatter = [130, -210, 340, -90, 60];
const lopsided: readonly (readonly [number, number])[] = [[90, 90], [200, 70], [150, 150], [60, 300], [110, 90]];

function scattered(one: Planted, factor = 1) {
  return readings(one.labels, positionsOf(one).map((position, k) => factor * (position + scatter[k]!)), lopsided.map(([low, high]) => [factor * low, factor * high]));
}

describe('invariance', () => {
  test.each(named([...forFieldAndB, ...forAllThree]))('a thousandth or three times of everything, floors and B0 included, gives as much of Delta, B, C and u: %s', (_, one) => {
    const free = freeIon('published', { name: one.ionName })!;
    const plain = standingFit(one, scattered(one), { policy: withFloors(150) });
    for (const factor of [1e-3, 3]) {
      const scaled = standingFit(one, scattered(one, factor), { policy: withFloors(150 * factor), freeIon: { ...free, racahB0: free.racahB0 * factor } });
      expect(scaled.mode).toBe(plain.mode);
      expect(scaled.solutions.length).toBe(plain.solutions.length);
      valuesOf(scaled.solutions[0]!.at).forEach((value, i) => {
        expect(relative(value, factor * valuesOf(plain.solutions[0]!.at)[i]!)).toBeLessThan(1e-8);
      });
      for (const part of ['reading', 'total'] as const)
        for (const i of [0, 1, 2]) expect(relative(scaled[part][i]![i]!, factor ** 2 * plain[part][i]![i]!)).toBeLessThan(1e-6);
    }
  });

  test.each(named([...forFieldAndB, ...forAllThree]))('the order in which bands are listed does not matter: %s', (_, one) => {
    const forward = standingFit(one, scattered(one));
    const backward = standingFit(one, scattered(one).toReversed());
    expect(backward.solutions.length).toBe(forward.solutions.length);
    valuesOf(backward.solutions[0]!.at).forEach((value, i) => {
      // Where readings disagree the descent in three parameters closes in step by step, to about 1e-9.
      expect(relative(value, valuesOf(forward.solutions[0]!.at)[i]!)).toBeLessThan(1e-8);
    });
    for (const i of [0, 1, 2]) expect(relative(backward.total[i]![i]!, forward.total[i]![i]!)).toBeLessThan(1e-7);
    backward.leverage.toReversed().forEach((value, k) => {
      if (forward.leverage[k] === null) expect(value).toBeNull();
      else expect(value!).toBeCloseTo(forward.leverage[k]!, 7);
    });
  });

  test('a fit depends on nothing fitted before it: the same digits again after other ions', () => {
    const [first, ...others] = forFieldAndB;
    const before = standingFit(first!, scattered(first!));
    for (const one of others) standingFit(one, scattered(one));
    expect(standingFit(first!, scattered(first!))).toEqual(before);
  });
});

/** Best parameters of a refit near the planted ones. */
function refitted(one: Planted, positions: readonly number[], u: readonly number[], ratio: number, policy: Policy): number[] {
  const { solutions } = standingFit(one, readings(one.labels, positions, u), { policy, ratio: assumed(ratio) });
  const away = (values: readonly number[]): number => Math.max(...values.map((value, i) => relative(value, valuesOf(one.at)[i]!)));
  return solutions.map((solution) => valuesOf(solution.at)).toSorted((a, b) => away(a) - away(b))[0]!;
}

/** d(Delta, B, C)/d(reading k) by moving the reading and fitting again. */
function byMoving(one: Planted, u: readonly number[], k: number, policy: Policy): number[] {
  const step = 0.5;
  const ratio = one.at.racahC / one.at.racahB;
  const moved = (by: number): number[] => refitted(one, positionsOf(one).map((position, i) => (i === k ? position + by : position)), u, ratio, policy);
  const [up, down] = [moved(step), moved(-step)];
  return up.map((value, i) => (value - down[i]!) / (2 * step));
}

const unequal = [60, 110, 180, 90, 140];

// At the planted point nothing is left over, so linear propagation is exact there.
describe('uncertainties are those that refitting moved readings shows', () => {
  test.each(named([...forFieldAndB, ...forAllThree]))('%s', (_, one) => {
    const u = unequal.slice(0, one.labels.length);
    const policy = one.labels.length > 3 || forAllThree.includes(one) ? withFloors(20) : defaultPolicy;
    const fit = exactFit(one, u, { policy });
    if (nearest({ ...fit, solutions: fit.solutions.slice(0, 1) }, one, 3) > 1e-6) throw new Error('another branch comes first: the planted case is no test');
    const moves = one.labels.map((__, k) => byMoving(one, u, k, policy));
    const size = (i: number): number => Math.sqrt(fit.reading[i]![i]!);
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++) {
        const alone = moves.reduce((sum, move, k) => sum + move[i]! * move[j]! * u[k]! ** 2, 0);
        expect(Math.abs(fit.reading[i]![j]! - alone), `readings alone, ${i} ${j}`).toBeLessThan(1e-4 * size(i) * size(j));
        const all = moves.reduce((sum, move, k) => sum + move[i]! * move[j]! * (u[k]! ** 2 + fit.floors[k]! ** 2), 0) + fit.byRatio[i]! * fit.byRatio[j]! * fit.ratio.u ** 2 * (fit.ratio.origin === 'fitted' ? 0 : 1);
        const total = Math.sqrt(fit.total[i]![i]! * fit.total[j]![j]!);
        expect(Math.abs(fit.total[i]![j]! - all), `total, ${i} ${j}`).toBeLessThan(1e-4 * total);
      }
  });

  test.each(named(forFieldAndB))('d(Delta, B, C)/d(C/B) is what another C/B shows: %s', (_, one) => {
    const ratio = one.at.racahC / one.at.racahB;
    const u = unequal.slice(0, one.labels.length);
    const fit = exactFit(one, u);
    const step = 1e-3;
    const [up, down] = [ratio + step, ratio - step].map((r) => refitted(one, positionsOf(one), u, r, defaultPolicy)) as [number[], number[]];
    fit.byRatio.forEach((slope, i) => {
      const shown = (up[i]! - down[i]!) / (2 * step);
      expect(Math.abs(slope - shown), `parameter ${i}`).toBeLessThan(1e-4 * Math.abs(shown) + 1e-3);
    });
  });

  test('C/B moves low-spin d6, where C enters, and nothing of the ions whose spin-allowed bands do not feel it', () => {
    for (const one of forFieldAndB) {
      const [byDelta, byB] = exactFit(one).byRatio;
      const feels = [4, 5, 6].includes(one.ion.electrons) || one.ion.multiplicity === 2;
      if (feels) expect(Math.abs(byDelta!) + Math.abs(byB!), one.name).toBeGreaterThan(1);
      else expect(Math.abs(byDelta!) + Math.abs(byB!), one.name).toBeLessThan(1e-6);
    }
  });

  test.each(named(forFieldAlone))('one band that moves with Delta alone hands on its own u: %s', (_, one) => {
    const fit = exactFit(one, 70);
    // nu = Delta in all of these.
    expect(Math.sqrt(fit.reading[0]![0]!)).toBeCloseTo(70, 9);
    expect(Math.sqrt(fit.total[0]![0]!)).toBeCloseTo(Math.hypot(70, 150), 9);
  });

  test.each(named([...forFieldAndB, ...forAllThree]))('leverages lie between 0 and 1 and add up to the number of parameters: %s', (_, one) => {
    const { leverage, mode } = standingFit(one, scattered(one), { policy: withFloors(20) });
    const inFit = leverage.filter((value) => value !== null);
    for (const value of inFit) {
      expect(value).toBeGreaterThan(-1e-9);
      expect(value).toBeLessThan(1 + 1e-9);
    }
    expect(inFit.reduce((a, b) => a + b)).toBeCloseTo(mode === 'field, B, C' ? 3 : 2, 7);
  });

  test.each(named([...forFieldAndB, ...forAllThree]))('the total is never below the readings alone, and twice the u of every reading doubles the latter: %s', (_, one) => {
    const policy = withFloors(20);
    const fit = exactFit(one, 60, { policy });
    for (const i of [0, 1, 2]) expect(fit.total[i]![i]!).toBeGreaterThan(fit.reading[i]![i]!);
    const doubled = exactFit(one, 120, { policy: withFloors(40) });
    for (const i of [0, 1, 2]) expect(relative(doubled.reading[i]![i]!, 4 * fit.reading[i]![i]!)).toBeLessThan(1e-6);
  });
});

describe('how much is fitted depends on what the bands can tell', () => {
  const modeOf = (one: Planted, settings: Parameters<typeof fitOf>[2] = {}): string => {
    const outcome = fitOf(one, readings(one.labels, positionsOf(one)), settings);
    return isFit(outcome) ? outcome.mode : outcome.status;
  };

  test.each([
    ['d1: one band, Delta', planted('Ti(III)', 1, 'octahedral', 2, 'a2Eg', 20_000, 500), 'field'],
    ['d9: one band, Delta', planted('Cu(II)', 9, 'octahedral', 2, 'a2T2g', 12_600, 900), 'field'],
    ['high-spin d4: Delta', planted('Cr(II)', 4, 'octahedral', 5, 'a5T2g', 14_000, 600), 'field'],
    ['high-spin d6: Delta', planted('Fe(II)', 6, 'octahedral', 5, 'a5Eg', 10_400, 700), 'field'],
    ['octahedral d3, first band alone: Delta', planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g', 17_400, 700), 'field'],
    ['octahedral d3, first band and a line: B by the line', planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a2Eg', 17_400, 700), 'field, B by a line'],
    ['octahedral d3, two spin-allowed bands: Delta and B', planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g', 17_400, 700), 'field, B'],
    ['octahedral d3, two spin-allowed bands and a line: all three', planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g a2Eg', 17_400, 700), 'field, B, C'],
    ['octahedral d7, first band alone: it feels B, so beta is assumed', planted('Co(II)', 7, 'octahedral', 4, 'a4T2g', 9200, 820), 'field, B assumed'],
    ['low-spin d6, first band alone: likewise', planted('Co(III)', 6, 'octahedral', 1, 'a1T1g', 23_500, 700), 'field, B assumed'],
    ['low-spin d6, two bands: Delta and B, given C/B', planted('Co(III)', 6, 'octahedral', 1, 'a1T1g a1T2g', 23_500, 630), 'field, B'],
    ['low-spin d6, two bands and 3T1g: all three', planted('Co(III)', 6, 'octahedral', 1, 'a1T1g a1T2g a3T1g', 23_500, 630), 'field, B, C'],
    ['high-spin d5, three bands: all three', planted('Mn(II)', 5, 'octahedral', 6, 'a4T1g a4T2g a4A1g/a4Eg', 8000, 780, 4.3), 'field, B, C'],
    ['high-spin d5, two bands: nothing', planted('Mn(II)', 5, 'octahedral', 6, 'a4T1g a4T2g', 8000, 780, 4.3), 'not determinable'],
    ['high-spin d5, the level that does not move with Delta: nothing', planted('Mn(II)', 5, 'octahedral', 6, 'a4A1g/a4Eg', 8000, 780, 4.3), 'not determinable'],
    ['high-spin d5, two levels that do not move with Delta: nothing', planted('Mn(II)', 5, 'octahedral', 6, 'a4A1g/a4Eg b4Eg', 8000, 780, 4.3), 'not determinable'],
    ['a spin-flip line alone: nothing', planted('Cr(III)', 3, 'octahedral', 4, 'a2Eg', 17_400, 700), 'not determinable'],
  ] as const)('%s', (_, one, mode) => {
    expect(modeOf(one)).toBe(mode);
  });

  test('a line takes part only where C is free and determined: with a C that stays above its ceiling the spin-allowed fit stands untouched', () => {
    const one = planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g a2Eg', 17_400, 700);
    const positions = positionsOf(one).map((position, k) => position + [0, 0, 600][k]!);
    const policy: Policy = { ...defaultPolicy, ceilings: { ...defaultPolicy.ceilings, racahC: 0.001 } };
    const fit = standingFit(one, readings(one.labels, positions), { policy });
    expect(fit.mode).toBe('field, B');
    expect(fit.used).toEqual([true, true, false]);
    expect(fit.leverage[2]).toBeNull();
    // A line in a fit with C assumed would pull B by several per cent.
    expect(relative(fit.solutions[0]!.at.racahB, 700)).toBeLessThan(1e-9);
    expect(fit.calculated[2]!.energy - positions[2]!).toBeCloseTo(-600, 4);
  });

  test('without a free ion one band that feels B fixes nothing', () => {
    expect(modeOf(planted('Co(II)', 7, 'octahedral', 4, 'a4T2g', 9200, 820), { freeIon: null })).toBe('not determinable');
  });

  test('no band at all: not determinable, and the reason says so', () => {
    const outcome = fitOf(planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g', 17_400, 700), []);
    expect(outcome).toMatchObject({ status: 'not determinable', reason: expect.stringContaining('no band') });
  });

  test('floors go by the transition: 150, for a line 250, for the two-electron band 600', () => {
    const fit = exactFit(planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g b4T1g a2Eg', 17_400, 700));
    expect(fit.floors).toEqual([150, 150, 600, 250]);
    expect(exactFit(planted('V(III)', 2, 'octahedral', 3, 'a3T2g b3T1g a3A2g', 18_500, 650)).floors).toEqual([150, 150, 600]);
    expect(exactFit(planted('Co(II)', 7, 'octahedral', 4, 'a4T2g a4A2g b4T1g', 9200, 820)).floors).toEqual([150, 600, 150]);
    expect(exactFit(planted('Ni(II)', 8, 'octahedral', 3, 'a3T2g a3T1g b3T1g', 8700, 900)).floors).toEqual([150, 150, 150]);
    expect(exactFit(planted('Co(II)', 7, 'tetrahedral', 4, 'a4T2 a4T1 b4T1', 3150, 715)).floors).toEqual([150, 150, 150]);
  });
});

// physics.md computed these with an independent program; the engine must show the same entanglement.
describe('what the bands leave entangled', () => {
  test.each([['manganese fluoride', 6940, 800, 3139], ['a manganese(II) aqua ion', 8000, 780, 3354], ['an iron(III) aqua ion', 14_054, 939, 3012], ['an iron(III) oxide', 14_950, 580, 3450]])(
    'high-spin d5, five bands, parameters such as of %s: B and C are correlated between -0.93 and -0.98', (_, delta, racahB, racahC) => {
      const fit = exactFit(planted('Mn(II)', 5, 'octahedral', 6, 'a4T1g a4T2g a4A1g/a4Eg b4T2g b4Eg', delta, racahB, racahC / racahB));
      const correlation = fit.total[1]![2]! / Math.sqrt(fit.total[1]![1]! * fit.total[2]![2]!);
      expect(correlation).toBeLessThan(-0.93);
      expect(correlation).toBeGreaterThan(-0.98);
    },
  );

  test.each([['V(III)', 2, 'octahedral', 'a3T2g a3A2g', 18_500, 650], ['Co(II)', 7, 'octahedral', 'a4T2g a4A2g', 9200, 820]] as const)(
    '%s: T2 and A2 alone leave B loose', (ionName, electrons, geometry, labels, delta, racahB) => {
      const fit = exactFit(planted(ionName, electrons, geometry, electrons === 2 ? 3 : 4, labels, delta, racahB));
      expect(Math.sqrt(fit.total[1]![1]!) / racahB).toBeGreaterThan(0.4);
    },
  );

  // 1T1 lies near Delta - C: the pair of bands fixes Delta - 0.59 C.
  test('low-spin d6: another C/B moves Delta by 0.59 of what it moves C', () => {
    const { byRatio } = exactFit(planted('Co(III)', 6, 'octahedral', 1, 'a1T1g a1T2g', 23_500, 630));
    expect(byRatio[0]! / byRatio[2]!).toBeCloseTo(0.59, 1);
  });
});
