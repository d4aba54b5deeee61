import { describe, expect, test } from 'vitest';
import { defaultPolicy, freeIon } from '#engine';
import { stressOf } from '../../../engine/readings/stress.ts';
import { seeded } from '../../published/random.ts';
import type { Planted } from './planted.ts';
import { assumed, forAllThree, forFieldAndB, planted, readings, standingFit, transitionEnergies, valuesOf } from './planted.ts';

const stress = (one: Planted, noise: number, seed: number) => {
  const next = seeded(seed);
  const positions = transitionEnergies(one.ion, one.labels, one.at).map((energy) => energy + noise * (2 * next() - 1));
  const assigned = readings(one.labels, positions);
  const settings = { ratio: assumed(one.at.racahC / one.at.racahB, 0) };
  const fit = standingFit(one, assigned, settings);
  return { fit, assigned, stress: stressOf(one.ion, assigned, fit, defaultPolicy, freeIon('published', { name: one.ionName })) };
};
const spare = [...forFieldAndB, ...forAllThree].filter((one) => one.labels.length > (forAllThree.includes(one) ? 3 : 2));

describe('a band left out', () => {
  test.each(spare.map((one) => [one.name, one] as const))('of exact bands the others give the planted parameters and put it where it is: %s', (_, one) => {
    const { leftOut } = stress(one, 0, 1).stress;
    expect(leftOut.length).toBe(one.labels.length);
    const told = leftOut.filter(({ at }) => at !== null);
    expect(told.length).toBeGreaterThan(0);
    for (const { at, z } of told) {
      expect(Math.abs(z!)).toBeLessThan(1e-3);
      valuesOf(at!).forEach((value, k) => { expect(Math.abs(value / valuesOf(one.at)[k]! - 1)).toBeLessThan(1e-5); });
    }
  });

  // Of a linear fit, with its weights held: D. A. Belsley, E. Kuh and R. E. Welsch, Regression Diagnostics, Wiley 1980, chapter 2.
  test.each(spare.map((one) => [one.name, one] as const))('its distance from where the others put it is its residual over 1 - leverage, for small residuals: %s', (_, one) => {
    let compared = 0;
    for (let seed = 1; seed <= 5; seed++) {
      const { fit, assigned, stress: { leftOut } } = stress(one, 3, seed);
      leftOut.forEach(({ predicted }, k) => {
        if (predicted === null || fit.leverage[k]! > 0.97) return;
        const expected = (assigned[k]!.observation.position - fit.calculated[k]!.energy) / (1 - fit.leverage[k]!);
        expect(Math.abs(assigned[k]!.observation.position - predicted - expected)).toBeLessThan(0.05 * Math.abs(expected) + 0.3);
        compared += 1;
      });
    }
    expect(compared).toBeGreaterThan(0);
  });

  test('of bands none of which is spare the others fix too little, and no agreement is claimed', () => {
    for (const one of forAllThree.filter(({ labels }) => labels.length === 3)) {
      const { leftOut } = stress(one, 0, 1).stress;
      expect(leftOut.map(({ at, predicted, z }) => [at, predicted, z])).toEqual([[null, null, null], [null, null, null], [null, null, null]]);
    }
    for (const one of forFieldAndB.filter(({ labels }) => labels.length === 2)) expect(stress(one, 0, 1).stress).toEqual({ pairs: [], leftOut: [] });
  });
});

test('bands are told by their place in the reading, also where a line that the fit does not use stands before them', () => {
  const one = planted('Cr(III)', 3, 'octahedral', 4, 'a2Eg a4T2g a4T1g b4T1g', 17_400, 725);
  const assigned = readings(one.labels, transitionEnergies(one.ion, one.labels, one.at));
  const policy = { ...defaultPolicy, cFitted: false };
  const fit = standingFit(one, assigned, { policy });
  expect(fit.used).toEqual([false, true, true, true]);
  const { leftOut, pairs } = stressOf(one.ion, assigned, fit, policy, freeIon('published', { name: one.ionName }));
  expect(leftOut.map(({ label, band }) => [label, band])).toEqual([['a4T2g', 1], ['a4T1g', 2], ['b4T1g', 3]]);
  expect(pairs.map(({ bands }) => bands)).toEqual([[1, 2], [1, 3], [2, 3]]);
});

describe('each pair alone', () => {
  test('of exact bands gives the planted parameters, or has no solution', () => {
    let told = 0;
    for (const one of spare) {
      const { pairs } = stress(one, 0, 1).stress;
      const exact = transitionEnergies(one.ion, one.labels, one.at);
      expect(pairs.length).toBe((one.labels.length * (one.labels.length - 1)) / 2);
      for (const { at, bands } of pairs) {
        expect(bands[0]).toBeLessThan(bands[1]);
        if (at === null) continue;
        told += 1;
        // Two bands may have two solutions, so the planted one need not be the one told: each puts both bands where they are.
        transitionEnergies(one.ion, bands.map((k) => one.labels[k]!), at).forEach((energy, i) => {
          expect(Math.abs(energy / exact[bands[i]!]! - 1)).toBeLessThan(1e-5);
        });
      }
    }
    expect(told).toBeGreaterThan(20);
  });
});
