import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { chargeShown, type Formula, type FormulaCode, type FormulaOptions, formulaParts, parseFormula, plainFormula, spokenFormula } from '#engine';

function formula(text: string, options?: FormulaOptions): Formula {
  const parsed = parseFormula(text, options);
  if (!parsed.ok) throw new Error(`${text}: ${parsed.code}, ${parsed.mend}`);
  return parsed.formula;
}

/** Typeset pieces as one text: counts as _n, charges as ^n. */
function set(text: string): string {
  const mark = { plain: '', sub: '_', super: '^', italic: '~' };
  return formulaParts(formula(text)).map((part) => mark[part.style] + part.text).join('|');
}

describe('formulas as they are typed', () => {
  test('the tree of a complex', () => {
    const nh3 = [{ kind: 'element', symbol: 'N', count: 1 }, { kind: 'element', symbol: 'H', count: 3 }];
    expect(formula('[Cr(NH3)6]3+')).toEqual({
      isomer: null,
      charge: 3,
      parts: [{
        multiplier: 1,
        nodes: [{
          kind: 'group', bracket: '[', count: 1,
          nodes: [{ kind: 'element', symbol: 'Cr', count: 1 }, { kind: 'group', bracket: '(', nodes: nh3, count: 6 }],
        }],
      }],
    });
  });

  test.each([
    ['[Cr(NH3)6]3+', '[Cr(NH3)6]3+'], ['[Cr(NH₃)₆]³⁺', '[Cr(NH3)6]3+'], ['[Cr(NH_3)_6]^{3+}', '[Cr(NH3)6]3+'], ['[Cr(NH3)6]^3+', '[Cr(NH3)6]3+'], ['[Cr(NH3)6] 3+', '[Cr(NH3)6]3+'],
    ['[Cr(NH<sub>3</sub>)<sub>6</sub>]<sup>3+</sup>', '[Cr(NH3)6]3+'], ['[Cr(en)₃]³⁺', '[Cr(en)3]3+'], ['[CoCl4]2-', '[CoCl4]2-'], ['[CoCl4]2−', '[CoCl4]2-'],
    ['cis-[CrCl2(en)2]+', 'cis-[CrCl2(en)2]+'], ['[Cr(ox)3]3-', '[Cr(ox)3]3-'], ['[Ni(H2O)6](ClO4)2.6H2O', '[Ni(H2O)6](ClO4)2·6H2O'],
    ['[Ni(H2O)6](ClO4)2 · 6 H2O', '[Ni(H2O)6](ClO4)2·6H2O'], ['CuSO4·½H2O', 'CuSO4·0.5H2O'], ['CuSO4.nH2O', 'CuSO4·nH2O'], ['K3[Cr(CN)6]', 'K3[Cr(CN)6]'],
    ['CrN6', 'CrN6'], ['Cren3', 'Cren3'], ['C2O4 2-', 'C2O4 2-'], ['C2O4^2-', 'C2O4 2-'], ['C₂O₄²⁻', 'C2O4 2-'], ['NH4+', 'NH4+'], ['Cl-', 'Cl-'], ['CN−', 'CN-'], ['Cr3+', 'Cr3+'], ['N₃⁻', 'N3 -'],
    ['[Ni(CO)4]', '[Ni(CO)4]'], ['[Ni(CO)4]⁰', '[Ni(CO)4]^0'], ["[Cr(2,2'-bpy)3]3+", "[Cr(2,2'-bpy)3]3+"], ['[(NH3)5Cr(μ-OH)Cr(NH3)5]5+', '[(NH3)5Cr(μ-OH)Cr(NH3)5]5+'],
    ['[CrO6]9-', '[CrO6]9-'], ['[Co{N(CH2)2}2]+', '[Co{N(CH2)2}2]+'], ['[Ru(PPh3)2Cl2]', '[Ru(PPh3)2Cl2]'], ['[Ni(dmso-O)6]2+', '[Ni(dmso-O)6]2+'],
  ])('%s is %s', (typed, plain) => {
    expect(plainFormula(formula(typed))).toBe(plain);
  });

  test('abbreviations in capitals are known from the ligand records', () => {
    expect(parseFormula('[Ni(DMSO)6]2+').ok).toBe(false);
    expect(plainFormula(formula('[Ni(DMSO)6]2+', { abbreviations: ['DMSO'] }))).toBe('[Ni(DMSO)6]2+');
  });

  test('charges', () => {
    expect(['[CoCl4]2-', '[CrCl2(en)2]+', '[Ni(CO)4]', '[Ni(CO)4]^0', 'V2+', 'NO3-', 'SO4 2-'].map((text) => formula(text).charge)).toEqual([-2, 1, null, 0, 2, -1, -2]);
    expect([3, 1, -1, -2, 0, null].map(chargeShown)).toEqual(['3+', '+', '−', '2−', '', '']);
  });
});

describe('what is refused', () => {
  test.each([
    ['', 'EMPTY', 0, null],
    ['C'.repeat(201), 'TOO_LONG', 200, null],
    ['C2O42-', 'CHARGE_AMBIGUOUS', 3, 'C2O4^2-'],
    ['Cr(NH3)63+', 'CHARGE_AMBIGUOUS', 7, 'Cr(NH3)6^3+'],
    ['N3-', 'CHARGE_AMBIGUOUS', 1, null],
    ['[Cr(NH3)6', 'BRACKET', 9, null],
    ['[Cr(NH3)6)3+', 'BRACKET', 9, null],
    ['Cr(NH3)6]', 'BRACKET', 8, null],
    ['('.repeat(60), 'BRACKET', 21, null],
    ['[Cr()6]', 'NO_CONTENT', 4, null],
    ['.6H2O', 'UNEXPECTED', 0, null],
    ['CuSO4.', 'NO_CONTENT', 6, null],
    ['[Cr(NH3)0]', 'COUNT', 8, null],
    ['[Cr(NH3)06]', 'COUNT', 8, null],
    ['[Cr(NH3)6]+3', 'CHARGE', 11, '[Cr(NH3)6]3+'],
    ['[Cr(NH3)6]+++', 'CHARGE', 11, '[Cr(NH3)6]3+'],
    ['[Cr(NH3)6]3', 'CHARGE', 11, null],
    ['[Cr(NH3)6]3+x', 'CHARGE', 12, null],
    ['CR(NH3)6', 'UNKNOWN_SYMBOL', 1, 'Cr(NH3)6'],
    ['[cr(NH3)6]', 'UNKNOWN_SYMBOL', 1, '[Cr(NH3)6]'],
    ['[XrCl6]3-', 'UNKNOWN_SYMBOL', 1, null],
    ['[Cr(NH3)6]#', 'UNEXPECTED', 10, null],
    ['3+', 'UNEXPECTED', 0, null],
  ] as [string, FormulaCode, number, string | null][])('%s', (text, code, position, corrected) => {
    expect(parseFormula(text)).toMatchObject({ ok: false, code, position, corrected });
  });

  test('the messages name what was found and how to mend it', () => {
    expect(parseFormula('[Cr(NH3)6)3+')).toMatchObject({ found: ')', expected: '"]" for the "[" at character 1', mend: 'close the bracket with ]' });
    expect(parseFormula('N3-')).toMatchObject({ mend: 'write N3^- or N^3-' });
  });
});

describe('typeset and spoken', () => {
  test('counts low, charges high with a real minus, isomers in italics', () => {
    expect(set('[CoCl4]2-')).toBe('[CoCl|_4|]|^2−');
    expect(set('cis-[CrCl2(en)2]+')).toBe('~cis|-[CrCl|_2|(en)|_2|]|^+');
    expect(set('[Ni(H2O)6](ClO4)2.6H2O')).toBe('[Ni(H|_2|O)|_6|](ClO|_4|)|_2|·6H|_2|O');
    expect(set('C2O4 2-')).toBe('C|_2|O|_4|^2−');
  });

  test.each([
    ['[Cr(NH3)6]3+', 'Cr, N H 3 six times, charge three plus'],
    ['cis-[CrCl2(en)2]+', 'cis, Cr, Cl 2, en two times, charge one plus'],
    ['K3[Cr(CN)6]', 'K 3, Cr, C N six times'],
    ['[Ni(H2O)6](ClO4)2.6H2O', 'Ni, H 2 O six times, Cl O 4 two times, with six H 2 O'],
    ['C2O4 2-', 'C 2 O 4, charge two minus'],
    ['NH3', 'N H 3'],
  ])('%s is said %s', (typed, said) => {
    expect(spokenFormula(formula(typed))).toBe(said);
  });
});

describe('laws', () => {
  const element = fc.constantFrom('Cr', 'Co', 'Cl', 'N', 'O', 'H', 'C', 'K');
  const piece = fc.tuple(fc.oneof(element, fc.constantFrom('(NH3)', '(en)', '(H2O)', '[CrF6]', '(PPh3)')), fc.integer({ min: 1, max: 12 }));
  const body = fc.array(piece, { minLength: 1, maxLength: 5 }).map((pieces) => pieces.map(([text, count]) => text + (count === 1 ? '' : `_${count}`)).join(''));
  const charged = fc.tuple(body, fc.constantFrom('', '^+', '^-', '^2+', '^3-', ' 4+')).map(([text, charge]) => text + charge);

  test('plain text is read back as the same formula, and prints alike', () => {
    fc.assert(
      fc.property(charged, (text) => {
        const parsed = parseFormula(text);
        fc.pre(parsed.ok);
        if (!parsed.ok) return;
        const plain = plainFormula(parsed.formula);
        const again = parseFormula(plain);
        expect(again, plain).toEqual(parsed);
      }),
      { numRuns: 1000 },
    );
  });

  test('typeset pieces are never empty and hold exactly the plain letters', () => {
    fc.assert(
      fc.property(charged, (text) => {
        const parsed = parseFormula(text);
        fc.pre(parsed.ok);
        if (!parsed.ok) return;
        const parts = formulaParts(parsed.formula);
        expect(parts.every((part) => part.text !== '')).toBe(true);
        expect(parts.map((part) => part.text).join('').replace('−', '-')).toBe(plainFormula(parsed.formula).replace(' ', ''));
      }),
    );
  });

  test('no text makes the reader throw; a place named lies in the text; a mended text is nearer', () => {
    const soup = fc.string({ unit: fc.constantFrom(...'CrcoNnHh3624()[]{}+-^_.,· e₃³⁺⁻½μ-x<sub>'), maxLength: 40 });
    fc.assert(
      fc.property(fc.oneof(soup, fc.string({ unit: 'binary', maxLength: 250 })), (text) => {
        const parsed = parseFormula(text);
        if (parsed.ok) return;
        expect(parsed.position).toBeGreaterThanOrEqual(0);
        expect(parsed.position).toBeLessThanOrEqual(text.length);
        expect(parsed.mend).not.toBe('');
        expect(parsed.corrected).not.toBe(text);
      }),
      { numRuns: 2000 },
    );
  });
});
