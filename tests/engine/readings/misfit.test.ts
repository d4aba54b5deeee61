import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bestScale, isSymmetric, misfitSlope, weightAt } from '../../../engine/readings/misfit.ts';
import type { Target } from '../../../engine/readings/misfit.ts';

const target = (observed: number, uBelow: number, uAbove = uBelow): Target => ({ observed, weightBelow: uBelow ** -2, weightAbove: uAbove ** -2 });

/** chi2 written out: u towards lower wavenumber for a band calculated too low, towards higher for one calculated too high. */
function chi2(targets: readonly Target[], energies: readonly number[], rho: number): number {
  return targets.reduce((sum, { observed, weightBelow, weightAbove }, k) => {
    const miss = rho * energies[k]! - observed;
    return sum + (miss < 0 ? weightBelow : weightAbove) * miss ** 2;
  }, 0);
}

/** The minimum of a convex function by trying a grid and narrowing it, 40 times. */
function byTrying(f: (x: number) => number, from: number, to: number): { x: number; y: number } {
  let [low, high] = [from, to];
  let best = { x: low, y: f(low) };
  for (let round = 0; round < 40; round++) {
    const step = (high - low) / 50;
    for (let i = 0; i <= 50; i++) {
      const x = low + i * step;
      const y = f(x);
      if (y < best.y) best = { x, y };
    }
    [low, high] = [best.x - 2 * step, best.x + 2 * step];
  }
  return best;
}

const energy = fc.oneof({ weight: 9, arbitrary: fc.double({ min: 0.01, max: 60, noNaN: true }) }, { weight: 1, arbitrary: fc.double({ min: -20, max: -0.01, noNaN: true }) });
const uncertainty = fc.double({ min: 5, max: 800, noNaN: true });
const row = fc.record({ energy, observed: fc.double({ min: 1000, max: 50_000, noNaN: true }), below: uncertainty, above: uncertainty });
const rows = fc.array(row, { minLength: 1, maxLength: 8 });

/** Repeatable: the same cases in every run. */
const settings = { seed: 20_260, numRuns: 500 } as const;

describe('the best common scale of asymmetric readings', () => {
  test('is the minimum that trying finds, for one band to eight', () => {
    fc.assert(
      fc.property(rows, (list) => {
        const targets = list.map(({ observed, below, above }) => target(observed, below, above));
        const energies = list.map((one) => one.energy);
        const { rho, chi2: found } = bestScale(targets, energies, false);
        const reach = Math.max(...list.map((one) => Math.abs(one.observed / one.energy)));
        const tried = byTrying((x) => chi2(targets, energies, x), -reach, reach);
        expect(chi2(targets, energies, rho)).toBeCloseTo(found, 6);
        // Nothing that trying found lies lower; what it found lies no higher than its steps explain.
        const rounding = 1e-10 * (1 + chi2(targets, energies, 0));
        expect(found - tried.y).toBeLessThanOrEqual(rounding);
        expect(tried.y - found).toBeLessThanOrEqual(rounding);
      }),
      settings,
    );
  });

  test('is where the two sides pull alike: the slope of chi2 vanishes', () => {
    fc.assert(
      fc.property(rows, (list) => {
        const targets = list.map(({ observed, below, above }) => target(observed, below, above));
        const energies = list.map((one) => one.energy);
        const { rho } = bestScale(targets, energies, false);
        const pulls = targets.map((one, k) => weightAt(one, rho * energies[k]!) * (rho * energies[k]! - one.observed) * energies[k]!);
        const size = targets.reduce((sum, one, k) => sum + Math.max(one.weightBelow, one.weightAbove) * one.observed * Math.abs(energies[k]!), 0);
        expect(Math.abs(pulls.reduce((a, b) => a + b))).toBeLessThanOrEqual(1e-9 * size);
      }),
      settings,
    );
  });

  test('with both sides alike it is the weighted least-squares quotient', () => {
    fc.assert(
      fc.property(rows, (list) => {
        const targets = list.map(({ observed, below }) => target(observed, below));
        const energies = list.map((one) => one.energy);
        expect(isSymmetric(targets)).toBe(true);
        const quotient =
          list.reduce((sum, one) => sum + (one.observed * one.energy) / one.below ** 2, 0) / list.reduce((sum, one) => sum + one.energy ** 2 / one.below ** 2, 0);
        for (const symmetric of [true, false]) {
          const { rho } = bestScale(targets, energies, symmetric);
          expect(Math.abs(rho - quotient)).toBeLessThanOrEqual(1e-9 * Math.abs(quotient) + 1e-9);
        }
      }),
      settings,
    );
  });

  test('one band is met exactly, however lopsided its u', () => {
    expect(bestScale([target(17_400, 600, 10)], [20], false).rho).toBeCloseTo(870, 10);
    expect(bestScale([target(17_400, 600, 10)], [20], false).chi2).toBeCloseTo(0, 12);
  });

  // One band wants rho = 100 and the other 110: with u of 10 on the sides in use they meet halfway.
  test('only the sides in use count: two bands pulling apart settle by u above the lower and u below the higher', () => {
    const { rho, chi2: found } = bestScale([target(1000, 999, 10), target(1100, 10, 999)], [10, 10], false);
    expect(rho).toBeCloseTo(105, 10);
    expect(found).toBeCloseTo(50, 10);
  });

  test('a scale with which no positive parameters go comes back as it is, not as positive', () => {
    expect(bestScale([target(1000, 10)], [-5], true).rho).toBeCloseTo(-200, 10);
    expect(bestScale([target(1000, 10, 20)], [-5], false).rho).toBeCloseTo(-200, 10);
  });

  test('energies that are all zero leave the scale at zero and the whole misfit standing', () => {
    for (const symmetric of [true, false]) expect(bestScale([target(1000, 10), target(2000, 10)], [0, 0], symmetric)).toEqual({ rho: 0, chi2: 50_000 });
  });

  test('scales with the readings: positions and u times 1000 give rho times 1000 and the same chi2', () => {
    const plain = bestScale([target(1000, 30, 10), target(1250, 20, 60), target(900, 5, 8)], [10, 11, 9.5], false);
    const scaled = bestScale([target(1e6, 30e3, 10e3), target(1.25e6, 20e3, 60e3), target(9e5, 5e3, 8e3)], [10, 11, 9.5], false);
    expect(scaled.rho / plain.rho).toBeCloseTo(1000, 8);
    expect(scaled.chi2).toBeCloseTo(plain.chi2, 9);
  });
});

describe('the weight in force', () => {
  test('a band calculated too low is judged by u below, one calculated too high by u above', () => {
    const lopsided = target(20_000, 600, 250);
    expect(weightAt(lopsided, 19_900)).toBe(600 ** -2);
    expect(weightAt(lopsided, 20_100)).toBe(250 ** -2);
    expect(isSymmetric([lopsided])).toBe(false);
  });
});

describe('d chi2 / dt at the best scale', () => {
  // Energies that move with t as quadratics: the best scale moves too, yet to first order that costs nothing.
  test('equals the finite difference of the reduced chi2, symmetric or not', () => {
    const moving = fc.record({ energy: fc.double({ min: 1, max: 40, noNaN: true }), slope: fc.double({ min: -30, max: 30, noNaN: true }), bend: fc.double({ min: -5, max: 5, noNaN: true }) });
    fc.assert(
      fc.property(fc.array(fc.tuple(row, moving), { minLength: 2, maxLength: 5 }), (list) => {
        const targets = list.map(([{ observed, below, above }]) => target(observed, below, above));
        const at = (t: number): number[] => list.map(([, move]) => move.energy + t * move.slope + t * t * move.bend);
        const reduced = (t: number): number => bestScale(targets, at(t), false).chi2;
        const { rho } = bestScale(targets, at(0), false);
        const step = 1e-5;
        const difference = (reduced(step) - reduced(-step)) / (2 * step);
        const exact = misfitSlope(targets, at(0), list.map(([, move]) => move.slope), rho);
        expect(Math.abs(exact - difference)).toBeLessThanOrEqual(1e-4 * (Math.abs(exact) + reduced(0) + 1));
      }),
      { ...settings, numRuns: 200 },
    );
  });
});
