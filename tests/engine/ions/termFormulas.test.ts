import { expect, test } from 'vitest';
import { termEnergies, termFormulas } from '#engine';

const orbital = 'SPDFGHI';
const states = (term: string) => Number(term[0]) * (2 * orbital.indexOf(term[1] ?? '') + 1);
const choose = [1, 10, 45, 120, 210, 252, 210, 120, 45, 10, 1];

test.each(choose.map((count, electrons) => [electrons, count]))('the terms of d%i hold all %i states', (electrons, count) => {
  expect(termFormulas(electrons).reduce((sum, { term }) => sum + states(term), 0)).toBe(count);
});

test.each([1, 2, 3, 4, 5, 6, 7, 8, 9])('d%i: the derivatives are exact and the energies homogeneous of degree one', (electrons) => {
  const [b, c, step] = [830, 3700, 1e-3];
  const at = termEnergies(electrons, b, c);
  const [moreB, lessB] = [termEnergies(electrons, b + step, c), termEnergies(electrons, b - step, c)];
  const [moreC, lessC] = [termEnergies(electrons, b, c + step), termEnergies(electrons, b, c - step)];
  for (const { term, energy, gradient } of at) {
    const of = (list: typeof at) => list.find((entry) => entry.term === term)?.energy ?? Number.NaN;
    expect((of(moreB) - of(lessB)) / (2 * step)).toBeCloseTo(gradient.racahB, 4);
    expect((of(moreC) - of(lessC)) / (2 * step)).toBeCloseTo(gradient.racahC, 4);
    expect(b * gradient.racahB + c * gradient.racahC).toBeCloseTo(energy, 6);
  }
});

test('terms of one kind are numbered from the lowest', () => {
  const doublets = termEnergies(5, 860, 3850).filter(({ term }) => term.startsWith('2D'));
  expect(doublets.map(({ term }) => term)).toEqual(['2D', "2D'", "2D''"]);
  expect(doublets.map(({ energy }) => energy)).toEqual(doublets.map(({ energy }) => energy).toSorted((a, b) => a - b));
});

test('the ground term of d^n obeys Hund', () => {
  const ground = [1, 2, 3, 4, 5, 6, 7, 8, 9].map((electrons) => termEnergies(electrons, 900, 4000)[0]?.term);
  expect(ground).toEqual(['2D', '3F', '4F', '5D', '6S', '5D', '4F', '3F', '2D']);
});

test('at B = C = 0 all terms fall together, without NaN', () => {
  for (const { energy, gradient } of termEnergies(4, 0, 0)) {
    expect(energy).toBe(0);
    expect(Number.isFinite(gradient.racahB + gradient.racahC)).toBe(true);
  }
});

test.each([-1, 11, 2.5])('a d count of %d is refused', (electrons) => {
  expect(() => termFormulas(electrons)).toThrow(String(electrons));
});
