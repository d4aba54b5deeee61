import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { symmetricEigen } from '../../../engine/linear/symmetricEigen.ts';
import { norm, randomSymmetric, rowsOf, withEigenvalues } from './matrices.ts';

const sizes = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
const scales = [1e-9, 1e-3, 1, 1e4, 1e9];
const seeds = [1, 2, 3, 4, 5];

/** Largest |element| of V'V - 1. */
function awayFromOrthogonal(vectors: Float64Array, size: number): number {
  let worst = 0;
  for (let a = 0; a < size; a++)
    for (let b = 0; b < size; b++) {
      let sum = a === b ? -1 : 0;
      for (let i = 0; i < size; i++) sum += vectors[i * size + a]! * vectors[i * size + b]!;
      worst = Math.max(worst, Math.abs(sum));
    }
  return worst;
}

/** Largest |element| of V diag(values) V' - M. */
function awayFromMatrix(matrix: Float64Array, values: Float64Array, vectors: Float64Array, size: number): number {
  let worst = 0;
  for (let i = 0; i < size; i++)
    for (let j = 0; j < size; j++) {
      let sum = -matrix[i * size + j]!;
      for (let k = 0; k < size; k++) sum += vectors[i * size + k]! * values[k]! * vectors[j * size + k]!;
      worst = Math.max(worst, Math.abs(sum));
    }
  return worst;
}

// Each rotation rounds once or twice an element; ten columns take a few hundred rotations.
const rounding = 500 * Number.EPSILON;

function expectLaws(matrix: Float64Array, size: number, name: string): void {
  const { values, vectors } = symmetricEigen(matrix, size);
  const scale = norm(matrix);
  expect(values.length, name).toBe(size);
  for (let k = 1; k < size; k++) expect(values[k]!, `${name}: ascending at ${k}`).toBeGreaterThanOrEqual(values[k - 1]!);
  expect(awayFromOrthogonal(vectors, size), `${name}: vectors orthonormal`).toBeLessThan(rounding);
  expect(awayFromMatrix(matrix, values, vectors, size), `${name}: vectors and values give the matrix back`).toBeLessThanOrEqual(rounding * scale);
}

describe('laws', () => {
  test.each(sizes)('size %i: values ascend, vectors are orthonormal and give the matrix back, at every scale from 1e-9 to 1e9', (size) => {
    for (const scale of scales) for (const seed of seeds) expectLaws(randomSymmetric(size, seed, scale), size, `scale ${scale}, seed ${seed}`);
  });

  test.each(sizes)('size %i: the values are those of the library decomposition', (size) => {
    for (const scale of scales)
      for (const seed of seeds) {
        const matrix = randomSymmetric(size, seed, scale);
        const expected = new EigenvalueDecomposition(new Matrix(rowsOf(matrix, size)), { assumeSymmetric: true }).realEigenvalues.toSorted((a, b) => a - b);
        const { values } = symmetricEigen(matrix, size);
        for (let k = 0; k < size; k++) expect(Math.abs(values[k]! - expected[k]!), `scale ${scale}, seed ${seed}, value ${k}`).toBeLessThanOrEqual(rounding * norm(matrix));
      }
  });

  test('values scale with the matrix, and the vectors stay as they are: powers of two exactly', () => {
    const matrix = randomSymmetric(6, 11);
    const plain = symmetricEigen(matrix, 6);
    for (const power of [-30, -3, 5, 30]) {
      const scaled = symmetricEigen(matrix.map((element) => element * 2 ** power), 6);
      expect(Array.from(scaled.values)).toEqual(Array.from(plain.values, (value) => value * 2 ** power));
      expect(Array.from(scaled.vectors)).toEqual(Array.from(plain.vectors));
    }
  });

  test('a multiple of the unit matrix added moves every value by it', () => {
    const matrix = randomSymmetric(5, 3, 100);
    const shifted = matrix.map((element, i) => (i % 6 === 0 ? element + 1000 : element));
    const { values } = symmetricEigen(matrix, 5);
    const moved = symmetricEigen(shifted, 5).values;
    for (let k = 0; k < 5; k++) expect(Math.abs(moved[k]! - values[k]! - 1000)).toBeLessThan(rounding * norm(shifted));
  });

  test('the matrix handed in is not changed', () => {
    const matrix = randomSymmetric(4, 9);
    const before = matrix.slice();
    symmetricEigen(matrix, 4);
    expect(matrix).toEqual(before);
  });
});

describe('degenerate, diagonal and graded matrices', () => {
  test.each([
    ['all equal', [3, 3, 3, 3]],
    ['two pairs', [-2, -2, 5, 5]],
    ['a triple and one', [1, 7, 7, 7]],
    ['a near pair', [1, 1 + 1e-13, 2, 3]],
    ['zeros', [0, 0, 0, 0]],
    ['zeros and one', [0, 0, 0, 1]],
  ])('%s: known values are found, and the vectors stay orthonormal', (name, known) => {
    for (const scale of scales) {
      const matrix = withEigenvalues(known.map((value) => value * scale), 21);
      expectLaws(matrix, 4, `${name}, scale ${scale}`);
      const { values } = symmetricEigen(matrix, 4);
      known.forEach((value, k) => {
        expect(Math.abs(values[k]! - value * scale)).toBeLessThanOrEqual(rounding * norm(matrix));
      });
    }
  });

  test('a diagonal matrix comes back sorted and untouched', () => {
    const { values, vectors } = symmetricEigen(Float64Array.from([5, 0, 0, 0, -1, 0, 0, 0, 2]), 3);
    expect(Array.from(values)).toEqual([-1, 2, 5]);
    expect(Array.from(vectors, Math.abs)).toEqual([0, 0, 1, 1, 0, 0, 0, 1, 0]);
  });

  // [[a, b], [b, d]]: (a + d)/2 -+ sqrt(((a - d)/2)^2 + b^2).
  test('two levels repel as the closed form says, from no coupling to full mixing', () => {
    for (const [a, b, d] of [[0, 1, 0], [0, 1e-8, 1], [3, -4, -3], [1e6, 1, -1e6], [2, 0, 1]] as const) {
      const { values } = symmetricEigen(Float64Array.from([a, b, b, d]), 2);
      const half = Math.hypot((a - d) / 2, b);
      const size = Math.hypot(a, d, b);
      expect(Math.abs(values[0]! - ((a + d) / 2 - half))).toBeLessThanOrEqual(4 * Number.EPSILON * size);
      expect(Math.abs(values[1]! - ((a + d) / 2 + half))).toBeLessThanOrEqual(4 * Number.EPSILON * size);
    }
  });

  // Jacobi's method keeps small values of a graded positive definite matrix to relative accuracy.
  test('small values beside large ones keep their digits', () => {
    const known = [1e-6, 1e-3, 1, 1e3];
    const graded = new Float64Array(16);
    // D R D with R close to the unit matrix: determinant and trace of the small corner are known to rounding.
    const couple = 1e-4;
    for (let i = 0; i < 4; i++) for (let j = 0; j < 4; j++) graded[i * 4 + j] = Math.sqrt(known[i]! * known[j]!) * (i === j ? 1 : couple);
    const { values } = symmetricEigen(graded, 4);
    const determinant = known.reduce((product, value) => product * value, 1) * (1 - couple) ** 3 * (1 + 3 * couple);
    expect(Array.from(values).reduce((product, value) => product * value, 1) / determinant).toBeCloseTo(1, 9);
    known.forEach((value, k) => {
      expect(values[k]! / value).toBeCloseTo(1, 6);
    });
  });
});

describe('impossible input', () => {
  test.each([
    ['NaN on the diagonal', [Number.NaN, 0, 0, 1]],
    ['NaN beside it', [1, Number.NaN, Number.NaN, 1]],
    ['an infinite element', [1, Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, 1]],
  ])('%s: refused, never an answer', (_, elements) => {
    expect(() => symmetricEigen(Float64Array.from(elements), 2)).toThrow(RangeError);
  });
});
