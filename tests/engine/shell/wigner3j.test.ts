import { describe, expect, test } from 'vitest';
import { condonShortley, wigner3j } from '../../../engine/shell/integrals.ts';
import { condonShortleyTable } from '../levels/condonShortleyTable.ts';

const upTo = (j: number): number[] => Array.from({ length: 2 * j + 1 }, (_, i) => i - j);

describe('Wigner 3j symbols', () => {
  // Published: A. R. Edmonds, Angular Momentum in Quantum Mechanics, table 2 and equations (3.7.9), (3.7.17), from memory.
  test.each([
    [[0, 0, 0, 0, 0, 0], 1],
    [[1, 1, 0, 0, 0, 0], -Math.sqrt(1 / 3)],
    [[1, 1, 0, 1, -1, 0], Math.sqrt(1 / 3)],
    [[1, 1, 1, 1, -1, 0], Math.sqrt(1 / 6)],
    [[1, 1, 1, 0, 0, 0], 0],
    [[1, 1, 2, 0, 0, 0], Math.sqrt(2 / 15)],
    [[1, 1, 2, 1, -1, 0], Math.sqrt(1 / 30)],
    [[1, 1, 2, 1, 0, -1], -Math.sqrt(1 / 10)],
    [[1, 1, 2, 1, 1, -2], Math.sqrt(1 / 5)],
    [[2, 2, 0, 0, 0, 0], Math.sqrt(1 / 5)],
    [[2, 2, 2, 0, 0, 0], -Math.sqrt(2 / 35)],
    [[2, 2, 4, 0, 0, 0], Math.sqrt(2 / 35)],
    [[2, 2, 4, 2, 2, -4], Math.sqrt(1 / 9)],
    [[1, 2, 3, 0, 0, 0], -Math.sqrt(3 / 35)],
    [[3, 3, 2, 0, 0, 0], Math.sqrt(4 / 105)],
  ] as const)('(%j) has its tabulated value %f', ([j1, j2, j3, m1, m2, m3], value) => {
    expect(wigner3j(j1, j2, j3, m1, m2, m3)).toBeCloseTo(value, 14);
  });

  test('are zero where the projections do not cancel, the triangle does not close or m exceeds j', () => {
    expect(wigner3j(2, 2, 2, 1, 1, 1)).toBe(0);
    expect(wigner3j(1, 1, 3, 0, 0, 0)).toBe(0);
    expect(wigner3j(3, 1, 1, 0, 0, 0)).toBe(0);
    expect(wigner3j(1, 2, 2, 2, -1, -1)).toBe(0);
  });

  test('keep their value under an even exchange of columns, and take (-1)^(j1 + j2 + j3) under an odd one or a change of all signs of m', () => {
    let nonzero = 0;
    for (const j1 of [0, 1, 2]) for (const j2 of [1, 2, 3]) for (const j3 of [0, 1, 2, 3, 4])
      for (const m1 of upTo(j1)) for (const m2 of upTo(j2)) {
        const m3 = -m1 - m2;
        const value = wigner3j(j1, j2, j3, m1, m2, m3);
        const sign = (j1 + j2 + j3) % 2 === 0 ? 1 : -1;
        expect(wigner3j(j2, j3, j1, m2, m3, m1)).toBeCloseTo(value, 14);
        expect(wigner3j(j2, j1, j3, m2, m1, m3)).toBeCloseTo(sign * value, 14);
        expect(wigner3j(j1, j2, j3, -m1, -m2, -m3)).toBeCloseTo(sign * value, 14);
        if (value !== 0) nonzero++;
      }
    expect(nonzero).toBeGreaterThan(100);
  });

  test('are orthogonal: the sum over m1, m2 of (2 j3 + 1) times two of them is 1 for the same j3, m3 and 0 otherwise', () => {
    for (const j3 of [0, 1, 2, 3, 4]) for (const j4 of [0, 1, 2, 3, 4]) for (const m3 of upTo(Math.min(j3, j4))) {
      let sum = 0;
      for (const m1 of upTo(2)) for (const m2 of upTo(2)) sum += (2 * j3 + 1) * wigner3j(2, 2, j3, m1, m2, m3) * wigner3j(2, 2, j4, m1, m2, m3);
      expect(sum).toBeCloseTo(j3 === j4 ? 1 : 0, 13);
    }
  });
});

describe('Condon and Shortley coefficients of d electrons', () => {
  test.each([0, 2, 4] as const)('all 25 values of c^%i are those of the printed table', (k) => {
    for (const m of upTo(2)) for (const n of upTo(2)) expect(condonShortley(k, m, n), `c^${k}(${m}, ${n})`).toBeCloseTo(condonShortleyTable(k, m, n), 14);
  });

  test('odd k gives nothing between two d orbitals', () => {
    for (const k of [1, 3]) for (const m of upTo(2)) for (const n of upTo(2)) expect(condonShortley(k, m, n)).toBeCloseTo(0, 15);
  });

  test('a closed shell is spherical: the diagonal values of c^2 and of c^4 add up to 0', () => {
    for (const k of [2, 4] as const) {
      expect(upTo(2).reduce((sum, m) => sum + condonShortley(k, m, m), 0)).toBeCloseTo(0, 14);
      expect(upTo(2).reduce((sum, m) => sum + condonShortleyTable(k, m, m), 0)).toBeCloseTo(0, 14);
    }
  });
});
