import { expect, test } from 'vitest';
import { complexCharge, containsComplex, donorCount, elementCounts, entitiesOf, type Formula, groupsOf, parseFormula } from '#engine';
import { ligands } from './collection.ts';

function formula(text: string): Formula {
  const parsed = parseFormula(text);
  if (!parsed.ok) throw new Error(parsed.mend);
  return parsed.formula;
}

const abbreviations = Object.values(ligands).flatMap(({ abbreviation, formula: long }) => (abbreviation === null ? [] : [{ abbreviation, formula: long }]));

test('elements are counted through brackets, waters and abbreviations', () => {
  const counts = (text: string) => [...elementCounts(formula(text), abbreviations)].map(([symbol, count]) => symbol + count).join(' ');
  expect(counts('[Ni(H2O)6](ClO4)2.6H2O')).toBe('Cl2 H24 Ni1 O20');
  expect(counts('[Cr(en)3]3+')).toBe('C6 Cr1 H24 N6');
  expect(counts('[Cr(ox)3]3-')).toBe('C6 Cr1 O12');
  expect(counts('[Cr(dien)2]3+')).toBe('Cr1 dien2');
  expect(counts('CuSO4·½H2O')).toBe('Cu1 H1 O4.5 S1');
});

test('the groups around a metal, equal ones gathered', () => {
  const groups = (text: string) => groupsOf(entitiesOf(formula(text))[0] ?? []).map(({ count }) => count);
  expect(groups('cis-[CrCl2(en)2]+')).toEqual([2, 2]);
  expect(groups('[(NH3)5Cr(μ-OH)Cr(NH3)5]5+')).toEqual([10, 1]);
  expect(groups('K3[Cr(CN)6]')).toEqual([6]);
});

test('a sample contains the complex, whatever the order and the spelling', () => {
  const contains = (sample: string, complex: string) => containsComplex(formula(sample), formula(complex), abbreviations);
  expect(contains('[Cr(NH3)6](NO3)3', '[Cr(NH3)6]3+')).toBe(true);
  expect(contains('[Cr(en)2Cl2]Cl·2H2O', 'cis-[CrCl2(en)2]+')).toBe(true);
  expect(contains('K3[Cr(C2O4)3]·3H2O', '[Cr(ox)3]3-')).toBe(true);
  expect(contains('[Co(NH3)6][Cr(CN)6]', '[Cr(CN)6]3-')).toBe(true);
  expect(contains('[Cr(NH3)5Cl]Cl2', '[Cr(NH3)6]3+')).toBe(false);
  expect(contains('[Co(NH3)6]Cl3', '[Cr(NH3)6]3+')).toBe(false);
});

test('charges add up: Cr(III) with three oxalate, Co(II) with four chloride, a bridged pair', () => {
  expect(complexCharge(3, [{ charge: -2, count: 3 }])).toBe(-3);
  expect(complexCharge(2, [{ charge: -1, count: 4 }])).toBe(-2);
  expect(complexCharge(3, [{ charge: 0, count: 10 }, { charge: -1, count: 1 }], 2)).toBe(5);
  expect(complexCharge(0, [])).toBe(0);
  expect(() => complexCharge(2.5, [])).toThrow(RangeError);
  expect(() => complexCharge(3, [{ charge: -1, count: 0 }])).toThrow(RangeError);
});

test('donors add up: two chloride and two ethane-1,2-diamine are six', () => {
  expect(donorCount([{ bound: 1, count: 2 }, { bound: 2, count: 2 }])).toBe(6);
  expect(donorCount([])).toBe(0);
  expect(() => donorCount([{ bound: 0, count: 2 }])).toThrow(RangeError);
});
