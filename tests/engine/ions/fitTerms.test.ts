import { expect, test } from 'vitest';
import { fitTerms, termEnergies, termTables } from '#engine';

test.each(termTables.filter(({ terms }) => terms.length > 3).map((table) => [table.spectrum, table] as const))(
  'terms made from known B and C, with the list of %s, give B and C back', (_, { electrons, terms }) => {
    const made = termEnergies(electrons, 812.5, 3456.7);
    const fit = fitTerms(electrons, terms.map(({ term }) => ({ term, energy: 250 + (made.find((entry) => entry.term === term)?.energy ?? Number.NaN) })));
    expect(fit.racahB).toBeCloseTo(812.5, 6);
    expect(fit.racahC).toBeCloseTo(3456.7, 6);
    expect(fit.offset).toBeCloseTo(250, 5);
    expect(fit.rms).toBeLessThan(1e-6);
  });

test.each(termTables.map((table) => [table.spectrum, table] as const))('%s: no small step away from the fit lowers the sum of squares', (_, { electrons, terms }) => {
  const fit = fitTerms(electrons, terms);
  const sumAt = (b: number, c: number, offset: number) => {
    const calculated = new Map(termEnergies(electrons, b, c).map(({ term, energy }) => [term, energy]));
    return terms.reduce((sum, { term, energy }) => sum + (energy - offset - (calculated.get(term) ?? Number.NaN)) ** 2, 0);
  };
  const least = sumAt(fit.racahB, fit.racahC, fit.offset);
  expect(least).toBeCloseTo(fit.rms ** 2 * terms.length, 3);
  for (const [b, c, offset] of [[1, 0, 0], [0, 4, 0], [0, 0, 10], [1, -4, 10]] as const) {
    for (const sign of [-1, 1]) {
      expect(sumAt(fit.racahB + sign * b, fit.racahC + sign * c, fit.offset + sign * offset)).toBeGreaterThan(least);
    }
  }
});

test('a fit does not depend on which level is called zero', () => {
  const table = termTables.find(({ spectrum }) => spectrum === 'V III');
  const [here, there] = [0, 5000].map((shift) => fitTerms(3, (table?.terms ?? []).map(({ term, energy }) => ({ term, energy: energy + shift }))));
  expect(there?.racahB).toBeCloseTo(here?.racahB ?? Number.NaN, 6);
  expect(there?.offset).toBeCloseTo((here?.offset ?? Number.NaN) + 5000, 5);
});

test('too few terms, a foreign term and terms that fix nothing are refused', () => {
  expect(() => fitTerms(2, [{ term: '3F', energy: 0 }, { term: '3P', energy: 10000 }])).toThrow('2 terms');
  expect(() => fitTerms(2, [{ term: '3F', energy: 0 }, { term: '3P', energy: 10000 }, { term: '3H', energy: 2 }])).toThrow('3H');
  expect(() => fitTerms(3, [{ term: '4F', energy: 0 }, { term: '4P', energy: 13000 }, { term: "4F'", energy: 5 }])).toThrow("4F'");
  expect(() => fitTerms(3, [{ term: '2H', energy: 20000 }, { term: '2P', energy: 19000 }, { term: '2F', energy: 33000 }])).toThrow('do not fix');
});
