import { levels } from '#engine';
import { describe, expect, it } from 'vitest';
import { ionNamed, metalEntry } from '../../../scripts/generate/metalIons.ts';
import type { Recipe } from '../../../scripts/generate/recipes.ts';
import { averageFactor, multiplicityOf, truthOf } from '../../../scripts/generate/truth.ts';
import type { Truth } from '../../../scripts/generate/truth.ts';

function recipe(ion: string, ligands: [string, number][], more: Partial<Recipe> = {}): Recipe {
  return { id: 'probe', ion, geometry: 'octahedral', spin: null, ligands, isomer: 'none', ...more };
}

const seeds = Array.from({ length: 400 }, (_, i) => i);

/** Position of a band minus the exact level at the true parameters. */
function errorOf(truth: Truth, probe: Recipe, label: string): number {
  const exact = levels({ electrons: ionNamed(probe.ion).electrons, geometry: probe.geometry }, truth).find((level) => level.label === label)!;
  return truth.transitions.find((one) => one.label === label)!.position - exact.energy;
}

function meanAndDeviation(values: readonly number[]): { mean: number; deviation: number } {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return { mean, deviation: Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1)) };
}

describe('the true spectrum of an invented complex', () => {
  const chromium = recipe('Cr(III)', [['ammine', 6]]);

  it('scatters about Delta = g f by 2 % and B by 3 %', () => {
    const truths = seeds.map((seed) => truthOf(chromium, seed));
    const metal = metalEntry('Cr(III)', null);
    const delta = meanAndDeviation(truths.map((truth) => Math.log(truth.delta / (metal.g * averageFactor(chromium, 'f')))));
    expect(Math.abs(delta.mean)).toBeLessThan(0.004);
    expect(delta.deviation).toBeCloseTo(0.02, 2);
    const racahB = meanAndDeviation(truths.map((truth) => truth.racahB));
    expect(racahB.deviation / racahB.mean).toBeCloseTo(0.03, 2);
  });

  it.each([
    ['4T2g of Cr(III), one electron', chromium, 'a4T2g', 0, 100],
    ['4T1g(P) of Cr(III), two electrons', chromium, 'b4T1g', -850, 150],
    ['2Eg of Cr(III), a spin-flip line', chromium, 'a2Eg', 0, 200],
    ['3A2g of V(III)', recipe('V(III)', [['aqua', 6]]), 'a3A2g', -500, 400],
    ['4T2g of Co(II), with the offset of its ground term', recipe('Co(II)', [['aqua', 6]], { spin: 'high' }), 'a4T2g', 200, Math.hypot(100, 100)],
  ])('misses the exact level of %s as the model of real spectra does', (_, probe, label, mean, deviation) => {
    const found = meanAndDeviation(seeds.map((seed) => errorOf(truthOf(probe, seed), probe, label)));
    // Four standard deviations of the mean, and 15 % of the deviation, from 400 draws.
    expect(Math.abs(found.mean - mean)).toBeLessThan((4 * deviation) / 20);
    expect(Math.abs(found.deviation / deviation - 1)).toBeLessThan(0.15);
  });

  it('refuses a spin state that is not the lowest at its parameters', () => {
    expect(() => truthOf(recipe('Fe(III)', [['cyanido', 6]], { spin: 'high' }), 1)).toThrow(/lowest level/);
  });

  it('knows the multiplicities of high and low spin', () => {
    expect(multiplicityOf({ ion: 'Fe(III)', spin: 'high' })).toBe(6);
    expect(multiplicityOf({ ion: 'Fe(III)', spin: 'low' })).toBe(2);
    expect(multiplicityOf({ ion: 'Co(III)', spin: 'low' })).toBe(1);
    expect(multiplicityOf({ ion: 'Cr(II)', spin: 'low' })).toBe(3);
    expect(multiplicityOf({ ion: 'Ni(II)', spin: null })).toBe(3);
  });

  it('moves broad bands by the lower symmetry only where two kinds of ligand stand round the ion', () => {
    const mixed = recipe('Cr(III)', [['en', 2], ['chlorido', 2]], { isomer: 'cis' });
    const { deviation } = meanAndDeviation(seeds.map((seed) => errorOf(truthOf(mixed, seed), mixed, 'a4T2g')));
    const difference = 0.06 * metalEntry('Cr(III)', null).g * (1.265 - 0.765);
    expect(Math.abs(deviation / Math.hypot(100, difference) - 1)).toBeLessThan(0.15);
  });
});
