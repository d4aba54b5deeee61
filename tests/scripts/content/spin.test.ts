import { describe, expect, test } from 'vitest';
import { hasSpinChoice, lowSpinMultiplicity, possibleMultiplicities, resolvedSpin } from '../../../scripts/content/spin.ts';

const counts = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10];

describe('spin states of d^n', () => {
  test('the highest multiplicity follows Hund', () => {
    expect(counts.map((electrons) => possibleMultiplicities(electrons)[0])).toEqual([1, 2, 3, 4, 5, 6, 5, 4, 3, 2, 1]);
  });

  test('octahedral d4 to d7 and tetrahedral d3 to d6 have a choice, no other', () => {
    expect(counts.filter((electrons) => hasSpinChoice(electrons, 'octahedral'))).toEqual([4, 5, 6, 7]);
    expect(counts.filter((electrons) => hasSpinChoice(electrons, 'tetrahedral'))).toEqual([3, 4, 5, 6]);
  });

  test('low spin fills the lower orbitals first: t2g or e', () => {
    expect([4, 5, 6, 7].map((electrons) => lowSpinMultiplicity(electrons, 'octahedral'))).toEqual([3, 2, 1, 2]);
    expect([3, 4, 5, 6].map((electrons) => lowSpinMultiplicity(electrons, 'tetrahedral'))).toEqual([2, 1, 2, 3]);
  });
});

describe('what a typed spin means', () => {
  test.each([
    [6, 'octahedral', 'high', 5], [6, 'octahedral', 'low', 1], [6, 'octahedral', 'intermediate', 3], [6, 'octahedral', 'triplet', 3],
    [5, 'octahedral', 'intermediate', 4], [3, 'octahedral', 'quartet', 4], [3, 'octahedral', 'high', 4], [8, 'square planar', 'singlet', 1], [8, 'square planar', 'high', 3],
  ] as const)('d%i %s %s has multiplicity %i', (electrons, geometry, typed, multiplicity) => {
    expect(resolvedSpin(electrons, geometry, typed)).toMatchObject({ multiplicity, assumed: false });
  });

  test.each([
    [7, 'octahedral', 'intermediate'], [7, 'octahedral', 'triplet'], [3, 'octahedral', 'low'], [3, 'octahedral', 'doublet'], [8, 'octahedral', 'quintet'], [4, 'octahedral', 'singlet'],
  ] as const)('d%i %s cannot be %s', (electrons, geometry, typed) => {
    const { multiplicity, possible } = resolvedSpin(electrons, geometry, typed);
    expect(multiplicity).toBeNull();
    expect(possible).not.toContain(typed);
    expect(possible.length).toBeGreaterThan(0);
  });

  test('tetrahedral d3 to d6 without a spin are taken as high spin and marked', () => {
    expect(resolvedSpin(6, 'tetrahedral', null)).toMatchObject({ multiplicity: 5, assumed: true });
    expect(resolvedSpin(7, 'tetrahedral', null)).toMatchObject({ multiplicity: 4, assumed: false });
  });

  test('octahedral d4 to d7 without a spin have none', () => {
    expect(resolvedSpin(6, 'octahedral', null).multiplicity).toBeNull();
  });
});
