import { describe, expect, it } from 'vitest';
import { randomFrom } from '../../../scripts/generate/random.ts';
import type { Recipe } from '../../../scripts/generate/recipes.ts';
import { scans } from '../../../scripts/generate/settings.ts';
import type { Setting } from '../../../scripts/generate/settings.ts';
import { chargeTransferEdge, spectrumOf } from '../../../scripts/generate/spectrum.ts';
import { componentsOf } from '../../../scripts/generate/splitting.ts';
import { truthOf } from '../../../scripts/generate/truth.ts';
import { everyRecipe } from '../../../scripts/generate/enumerate.ts';

const setting: Setting = {
  id: 'probe', phase: 'solution', medium: 'water', sample: null, host: null, temperature: 295, technique: 'absorption', scan: scans.usual,
  habits: { unit: 'cm-1', step: 10, typesUncertainty: true, typesEpsilon: true, typesWidth: true, typesTerms: true },
};

const homoleptic = everyRecipe().filter((one) => one.ligands.length === 1);

/** A spectrum, or none where the recipe's spin is not believable at this seed. */
function spectrum(recipe: Recipe, seed: number, conditions: Setting = setting) {
  try {
    return spectrumOf(recipe, truthOf(recipe, seed), conditions, seed);
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}

describe('the bands that a spectrum shows', () => {
  const all = homoleptic.map((recipe) => ({ recipe, bands: spectrum(recipe, 5) }));

  it('lie inside the scan, ascending', () => {
    const bands = all.flatMap((one) => one.bands);
    expect(bands.length).toBeGreaterThan(300);
    for (const { bands: own } of all) {
      expect(own.map((band) => band.position)).toEqual(own.map((band) => band.position).sort((a, b) => a - b));
      for (const band of own) {
        expect(band.position).toBeGreaterThan(scans.usual.low - 2000);
        expect(band.position).toBeLessThan(scans.usual.high + 500);
      }
    }
  });

  it('are not d-d bands above the foot of charge transfer', () => {
    for (const { recipe, bands } of all) {
      for (const band of bands) if (band.label !== null) expect(band.position, recipe.id).toBeLessThan(chargeTransferEdge(recipe) + 600);
    }
  });

  it('carry a side exactly where they are shoulders, a degeneracy exactly where they are components', () => {
    for (const band of all.flatMap((one) => one.bands)) {
      expect(band.side !== null).toBe(band.kind === 'shoulder');
      expect(band.degeneracy !== null).toBe(band.kind === 'component');
    }
  });

  it('share a term only as components', () => {
    for (const { recipe, bands } of all) {
      const labels = bands.filter((band) => band.kind !== 'component' && band.label !== null).map((band) => band.label);
      expect(new Set(labels).size, recipe.id).toBe(labels.length);
    }
  });

  it('are the same when read again with the same seed, and other with another measurement', () => {
    const recipe = homoleptic.find((one) => one.id === 'cr-am6')!;
    expect(spectrum(recipe, 5)).toEqual(spectrum(recipe, 5));
    expect(spectrum(recipe, 5, { ...setting, id: 'other' })).not.toEqual(spectrum(recipe, 5));
  });

  it('are narrower in the cold', () => {
    const recipe = homoleptic.find((one) => one.id === 'cr-am6')!;
    const meanWidth = (conditions: Setting): number => {
      const widths = Array.from({ length: 60 }, (_, seed) => spectrum(recipe, seed, conditions)).flat().filter((band) => band.kind === 'maximum').map((band) => band.width);
      return widths.reduce((sum, width) => sum + width, 0) / widths.length;
    };
    expect(meanWidth({ ...setting, temperature: 80 }) / meanWidth(setting)).toBeCloseTo(0.75, 1);
  });
});

describe('components', () => {
  it('of a trans complex keep the barycentre of the rule of average environment', () => {
    const recipe: Recipe = { id: 'probe', ion: 'Cr(III)', geometry: 'octahedral', spin: null, ligands: [['en', 2], ['chlorido', 2]], isomer: 'trans' };
    const truth = truthOf(recipe, 1);
    const lowest = truth.transitions.find((one) => one.spinAllowed)!;
    const parts = componentsOf(lowest, recipe, truth, randomFrom(1, 'probe'));
    if (parts === 'envelope') throw new Error('expected components');
    expect(parts.map((part) => part.degeneracy)).toEqual([2, 1]);
    expect(parts.reduce((sum, part) => sum + part.degeneracy * part.offset, 0)).toBeCloseTo(0, 9);
    // Half of Delta(Cr en3) - Delta(CrCl6) lies between them: g (1.265 - 0.765) / 2.
    expect(parts[1]!.offset - parts[0]!.offset).toBeCloseTo((17550 * 0.5) / 2, 6);
    expect(componentsOf(lowest, { ...recipe, isomer: 'cis' }, truth, randomFrom(1, 'probe'))).toEqual([]);
  });
});
