import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { normaliseQuery, searchScore } from '#engine';
import { collection } from './collection.ts';

function hits(text: string): readonly string[] {
  const query = normaliseQuery(text);
  return collection
    .map(({ id, keys }) => ({ id, score: searchScore(query, keys) }))
    .filter(({ score }) => score > 0)
    .sort((a, b) => b.score - a.score || (a.id < b.id ? -1 : 1))
    .map(({ id }) => id);
}

describe('the first hit of a query', () => {
  test.each([
    ['Cr(NH3)6', 'cr-am6'], ['[Cr(NH3)6]3+', 'cr-am6'], ['[Cr(NH₃)₆]³⁺', 'cr-am6'], ['[Cr(NH3)6]^3+', 'cr-am6'], ['[Cr(NH3)6]^{3+}', 'cr-am6'],
    ['[Cr(NH_3)_6]^{3+}', 'cr-am6'], ['[Cr(NH<sub>3</sub>)<sub>6</sub>]<sup>3+</sup>', 'cr-am6'], ['cr nh3 6', 'cr-am6'], ['Cr NH3 6', 'cr-am6'],
    ['cr(nh3)6', 'cr-am6'], ['CR(NH3)6', 'cr-am6'], ['Cr(NH3)63+', 'cr-am6'], ['[Cr(NH3)6]', 'cr-am6'], ['[Cr(NH3)6](NO3)3', 'cr-am6'], ['[Cr(NH3)6]Cl3', 'cr-am6'],
    ['hexaamminechromium(III)', 'cr-am6'], ['hexaammine chromium', 'cr-am6'], ['CrN6', 'cr-am6'], ['(NH3)6 Cr', 'cr-am6'], ['[Cr(NH3)6] 3+', 'cr-am6'], ['[Cr(NH3)6](3+)', 'cr-am6'],
    ['Cr(NH3)5Cl', 'cr-am5cl'], ['[Cr(NH3)5Cl]2+', 'cr-am5cl'], ['[CrCl(NH3)5]Cl2', 'cr-am5cl'], ['CrClN5', 'cr-am5cl'], ['crn5cl', 'cr-am5cl'],
    ['Cr(H2O)6', 'cr-aq6'], ['Cr(OH2)6', 'cr-aq6'], ['[Cr(H2O)6]2+', 'cr2-aq6'], ['[Cr(H2O)6]3+', 'cr-aq6'], ['hexaaquachromium(II)', 'cr2-aq6'], ['aquo chromium', 'cr-aq6'],
    ['[Cr(en)3]3+', 'cr-en3'], ['[Cr(en)₃]³⁺', 'cr-en3'], ['Cren3', 'cr-en3'], ['cr en 3', 'cr-en3'], ['tris(ethane-1,2-diamine)chromium(III)', 'cr-en3'],
    ['tris(ethane-1,2-diamine)', 'cr-en3'], ['tris(ethylenediamine)chromium', 'cr-en3'], ['Cr(C2H8N2)3', 'cr-en3'],
    ['cis-[CrCl2(en)2]+', 'cr-cis-en2cl2'], ['trans-[CrCl2(en)2]+', 'cr-trans-en2cl2'], ['trans-[Cr(en)2Cl2]+', 'cr-trans-en2cl2'], ['trans-Cr(en)2Cl2', 'cr-trans-en2cl2'],
    ['trans-cr(en)2cl2', 'cr-trans-en2cl2'], ['CrCl2N4', 'cr-cis-en2cl2'], ['CrN4Cl2', 'cr-cis-en2cl2'],
    ['[Cr(ox)3]3-', 'cr-ox3'], ['[Cr(C2O4)3]3-', 'cr-ox3'], ['[Cr(C₂O₄)₃]³⁻', 'cr-ox3'], ['K3[Cr(C2O4)3]·3H2O', 'cr-ox3'], ['trioxalatochromate(III)', 'cr-ox3'], ['tris(oxalato)chromate(III)', 'cr-ox3'], ['chromium oxalate', 'cr-ox3'],
    ['K3[Cr(CN)6]', 'cr-cn6'], ['k3[cr(cn)6]', 'cr-cn6'], ['Cr(CN)63-', 'cr-cn6'], ['hexacyanochromate(III)', 'cr-cn6'], ['hexacyanidochromate', 'cr-cn6'], ['CrC6', 'cr-cn6'],
    ['CrF6 3-', 'cr-f6'], ['CrF63-', 'cr-f6'], ['crf6', 'cr-f6'], ['hexafluorochromate', 'cr-f6'],
    ['Cr(NCS)6', 'cr-ncs6'], ['Cr(SCN)6', 'cr-ncs6'], ['[Cr(NCS)6]3−', 'cr-ncs6'], ['Cr(CO)6', 'cr-co6'],
    ['Co(NH3)6', 'co-am6'], ['cobalt ammine', 'co-am6'], ['Co(III)', 'co-am6'], ['Co3+', 'co-am6'], ['cobalt(III)', 'co-am6'],
    ['CoCl4', 'co-cl4'], ['[CoCl4]2-', 'co-cl4'], ['CoCl42-', 'co-cl4'], ['tetrachlorocobaltate', 'co-cl4'], ['Co(II)', 'co-cl4'], ['cobalt 2', 'co-cl4'],
    ['[Fe(CN)6]4-', 'fe2-cn6'], ['[Fe(CN)6]3-', 'fe3-cn6'], ['Fe(CN)6 3-', 'fe3-cn6'], ['Fe(II)', 'fe2-cn6'], ['hexacyanidoferrate(III)', 'fe3-cn6'],
    ['Ni(H2O)6', 'ni-aq6'], ['[Ni(H2O)6](ClO4)2.6H2O', 'ni-aq6'], ['nickel water', 'ni-aq6'], ['NiO6', 'ni-aq6'],
    ['Ni(bpy)3', 'ni-bpy3'], ['Ni(bipy)3', 'ni-bpy3'], ["[Ni(2,2'-bpy)3]2+", 'ni-bpy3'], ["tris(2,2'-bipyridine)nickel(II)", 'ni-bpy3'], ['nickel bipyridine', 'ni-bpy3'],
    ['[Ni(DMSO)6]2+', 'ni-dmso6'], ['Ni(dmso-O)6', 'ni-dmso6'], ['dimethyl sulphoxide', 'ni-dmso6'],
    ['V(H2O)6', 'v-aq6'], ['V', 'v-aq6'], ['vanadium', 'v-aq6'], ['V3+', 'v-aq6'],
  ])('%s finds %s', (query, first) => {
    expect(hits(query)[0]).toBe(first);
  });
});

describe('what a query must not find', () => {
  test('a metal alone finds its own complexes and no carbonyl of another metal', () => {
    expect([...hits('Co')].sort()).toEqual(['co-am6', 'co-cl4']);
    expect(hits('Cr(III)')).not.toContain('cr2-aq6');
    expect(hits('Cr2+')).toEqual(['cr2-aq6']);
    expect(hits('vanadium')).toEqual(['v-aq6']);
  });

  test('another number of ligands is another complex', () => {
    expect(hits('Cr(NH3)4')).toEqual([]);
    expect(hits('[Co(en)3]3+')).toEqual([]);
    expect(hits('Xe')).toEqual([]);
    expect(hits('')).toEqual([]);
  });

  test('a ligand alone finds every complex that holds it; a charge alone every complex that has it', () => {
    expect([...hits('NH3')].sort()).toEqual(['co-am6', 'cr-am5cl', 'cr-am6']);
    expect([...hits('en')].sort()).toEqual(['cr-cis-en2cl2', 'cr-en3', 'cr-trans-en2cl2']);
    expect(hits('^{4-}')).toEqual(['fe2-cn6']);
    expect([...hits('2−')].sort()).toEqual(['co-cl4']);
  });
});

describe('laws', () => {
  test('while a formula is typed letter by letter, its complex never leaves the hits', () => {
    for (const typed of ['Cr(NH3)6', '[Cr(NH3)6]3+', '[Cr(en)3]3+', 'hexaamminechromium(III)', 'crn6']) {
      for (let length = 2; length <= typed.length; length += 1) {
        const part = typed.slice(0, length);
        expect(hits(part), part).toContain(typed.includes('en)') ? 'cr-en3' : 'cr-am6');
      }
    }
  });

  test('every complex is the first hit of its own formula', () => {
    const own = ['[Cr(NH3)6]3+', '[CrCl(NH3)5]2+', '[Cr(H2O)6]3+', '[Cr(H2O)6]2+', '[Cr(en)3]3+', 'cis-[CrCl2(en)2]+', 'trans-[CrCl2(en)2]+'];
    expect(own.map((formula) => hits(formula)[0])).toEqual(collection.slice(0, own.length).map(({ id }) => id));
  });

  test('no query makes the search throw', () => {
    const soup = fc.string({ unit: fc.constantFrom(...'CrcoNnHh3624()[]+-^{}_.,· en₃³⁺⁻iIVv'), maxLength: 24 });
    fc.assert(
      fc.property(fc.oneof(soup, fc.string({ unit: 'binary', maxLength: 300 })), (text) => {
        for (const score of collection.map(({ keys }) => searchScore(normaliseQuery(text), keys))) expect(score).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});
