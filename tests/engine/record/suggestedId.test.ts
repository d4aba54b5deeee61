import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { slug, suggestedId, suggestedMeasurementId } from '../../../engine/index.ts';
import { badId } from '../../../scripts/content/ids.ts';

describe('a suggested id', () => {
  it.each([
    ['cr3-ammine5-chlorido', { formula: '[CrCl(NH3)5]2+', ion: 'Cr(III)', geometry: 'octahedral', ligands: { ammine: '5', chlorido: '1' } }],
    ['cr3-en2-chlorido2-trans', { formula: '[CrCl2(en)2]+', ion: 'Cr(III)', geometry: 'octahedral', isomer: 'trans', ligands: { en: '2', chlorido: { count: '2' } } }],
    ['ni2-cyanido4-square-planar', { formula: '[Ni(CN)4]2-', ion: 'Ni(II)', geometry: 'square planar', isomer: 'none', ligands: { cyanido: '4' } }],
    ['cr-nh3-6-3', { formula: '[Cr(NH3)6]3+' }],
    ['complex', { formula: '[]' }],
  ] as const)('%s', (id, complex) => {
    expect(suggestedId(complex)).toBe(id);
  });

  it('of a measurement names what the sample stood in, and the temperature', () => {
    expect(suggestedMeasurementId({ medium: 'water', phase: 'solution', temperature: '295 K' })).toBe('water-295');
    expect(suggestedMeasurementId({ phase: 'solid' })).toBe('solid');
    expect(suggestedMeasurementId({})).toBe('spectrum');
  });

  it('is always legal', () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.constantFrom('no', 'NUL', '77', '-a-', 'é')), (text) => {
      expect(badId(slug(text, 'complex'), 'an id')).toBeNull();
    }));
  });
});
