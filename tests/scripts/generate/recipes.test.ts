import { describe, expect, it } from 'vitest';
import { chargeOf, formulaOf, sampleOf } from '../../../scripts/generate/recipes.ts';

const complex = (ion: string, ...ligands: [string, number][]) => ({ ion, ligands });

describe('formulas of generated complexes', () => {
  it.each([
    ['[Cr(NH3)6]3+', complex('Cr(III)', ['ammine', 6])],
    ['[CrCl2(en)2]+', complex('Cr(III)', ['en', 2], ['chlorido', 2])],
    ['[Cr(H2O)(NH3)5]3+', complex('Cr(III)', ['ammine', 5], ['aqua', 1])],
    ['[Co(N3)(NH3)5]2+', complex('Co(III)', ['ammine', 5], ['azido', 1])],
    ['[Cr(NCS)4(NH3)2]-', complex('Cr(III)', ['ammine', 2], ['thiocyanato-n', 4])],
    ['[Co(gly)3]', complex('Co(III)', ['glycinato', 3])],
    ['[Fe(CN)6]4-', complex('Fe(II)', ['cyanido', 6])],
  ])('%s has its ligand symbols in alphabetical order and the charge of ion and ligands', (formula, recipe) => {
    expect(formulaOf(recipe)).toBe(formula);
  });

  it('balance the charge with the counter-ion', () => {
    expect(sampleOf(complex('Cr(III)', ['ammine', 6]), 'NO3')).toBe('[Cr(NH3)6](NO3)3');
    expect(sampleOf(complex('Cr(III)', ['oxalato', 3]), 'K', 3)).toBe('K3[Cr(ox)3].3H2O');
    expect(sampleOf(complex('Co(II)', ['chlorido', 4]), 'NEt4')).toBe('(NEt4)2[CoCl4]');
    expect(sampleOf(complex('Mn(III)', ['aqua', 6]), 'SO4')).toBe('[Mn(H2O)6]2(SO4)3');
    expect(sampleOf(complex('Ni(II)', ['aqua', 6]), 'SO4')).toBe('[Ni(H2O)6]SO4');
    expect(sampleOf(complex('Co(III)', ['glycinato', 3]), '')).toBe('[Co(gly)3]');
  });

  it('are refused where the counter-ion has the charge of the complex', () => {
    expect(chargeOf(complex('Cr(III)', ['cyanido', 6]))).toBe(-3);
    expect(() => sampleOf(complex('Cr(III)', ['cyanido', 6]), 'NO3')).toThrow(RangeError);
  });
});
