import { inverse as libraryInverse, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { inversePositive, solvePositive } from '../../../engine/linear/solveSymmetric.ts';
import { rowsOf, withEigenvalues } from './matrices.ts';

const positive = (values: readonly number[], seed: number): number[][] => rowsOf(withEigenvalues(values, seed), values.length);

function largestDifference(a: readonly (readonly number[])[], b: readonly (readonly number[])[]): number {
  return Math.max(...a.flatMap((line, i) => line.map((value, j) => Math.abs(value - b[i]![j]!))));
}

function product(a: readonly (readonly number[])[], b: readonly (readonly number[])[]): number[][] {
  return a.map((line) => b[0]!.map((_, j) => line.reduce((sum, value, k) => sum + value * b[k]![j]!, 0)));
}

const unit = (size: number): number[][] => Array.from({ length: size }, (_, i) => Array.from({ length: size }, (__, j) => (i === j ? 1 : 0)));

describe('inverse of a positive definite matrix', () => {
  test.each([1e-9, 1e-3, 1, 1e4, 1e9])('scale %d: times the matrix it gives the unit matrix, and it is the library inverse', (scale) => {
    for (const values of [[1], [1, 2], [0.1, 1, 10], [1, 1, 1, 1], [0.01, 0.5, 3, 40, 100]])
      for (const seed of [1, 2, 3]) {
        const matrix = positive(values.map((value) => value * scale), seed);
        const inverse = inversePositive(matrix)!;
        const condition = Math.max(...values) / Math.min(...values);
        expect(largestDifference(product(inverse, matrix), unit(values.length))).toBeLessThan(50 * condition * Number.EPSILON);
        const library = libraryInverse(new Matrix(matrix)).to2DArray();
        const largest = 1 / (Math.min(...values) * scale);
        expect(largestDifference(inverse, library)).toBeLessThan(50 * condition * Number.EPSILON * largest);
      }
  });

  test('it is symmetric to the last digits', () => {
    const inverse = inversePositive(positive([0.3, 2, 9], 5))!;
    expect(largestDifference(inverse, inverse[0]!.map((_, j) => inverse.map((line) => line[j]!)))).toBeLessThan(1e-14);
  });

  // Of [[a, b], [b, d]] the inverse is [[d, -b], [-b, a]] / (ad - b^2).
  test('two parameters with a correlation of 0.999 keep their digits', () => {
    const inverse = inversePositive([[1, 0.999], [0.999, 1]])!;
    const determinant = 1 - 0.999 ** 2;
    expect(inverse[0]![0]! * determinant).toBeCloseTo(1, 12);
    expect(inverse[0]![1]! * determinant).toBeCloseTo(-0.999, 12);
  });

  test('the matrix handed in is not changed', () => {
    const matrix = [[4, 1], [1, 3]];
    inversePositive(matrix);
    expect(matrix).toEqual([[4, 1], [1, 3]]);
  });

  test.each([
    ['singular: two columns alike', [[1, 1], [1, 1]]],
    ['singular: all zero', [[0, 0], [0, 0]]],
    ['indefinite', [[1, 2], [2, 1]]],
    ['negative', [[-1]]],
    ['not a number', [[Number.NaN, 0], [0, 1]]],
    ['not a number beside the diagonal', [[1, Number.NaN], [Number.NaN, 1]]],
  ])('%s: null, never an answer', (_, matrix) => {
    expect(inversePositive(matrix)).toBeNull();
    expect(solvePositive(matrix, matrix.map(() => 1))).toBeNull();
  });
});

test('the solution of the equations gives the right-hand side back', () => {
  const matrix = positive([0.5, 2, 30], 8);
  const right = [3, -1, 0.25];
  const solution = solvePositive(matrix, right)!;
  matrix.forEach((line, i) => {
    expect(line.reduce((sum, value, j) => sum + value * solution[j]!, 0)).toBeCloseTo(right[i]!, 11);
  });
});
