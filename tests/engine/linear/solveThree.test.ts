import { expect, test } from 'vitest';
import { solvePositive, solveThree } from '../../../engine/linear/solveSymmetric.ts';
import type { SymmetricThree } from '../../../engine/linear/solveSymmetric.ts';
import { withEigenvalues } from './matrices.ts';

const sixOf = (m: ArrayLike<number>): SymmetricThree => [m[0]!, m[1]!, m[2]!, m[4]!, m[5]!, m[8]!];
const rows = ([a, b, c, d, e, f]: SymmetricThree): number[][] => [[a, b, c], [b, d, e], [c, e, f]];

test('the solution is the one of the general routine, with the diagonal lifted', () => {
  for (const values of [[1, 2, 3], [0.01, 1, 100], [5, 5, 5]])
    for (const seed of [1, 2, 3])
      for (const lift of [0, 0.5]) {
        const matrix = sixOf(withEigenvalues(values, seed));
        const right = [3, -1, 2];
        const into: [number, number, number] = [0, 0, 0];
        expect(solveThree(matrix, lift, right, into)).toBe(true);
        const expected = solvePositive(rows(matrix).map((row, i) => row.map((value, j) => (i === j ? value + lift : value))), right)!;
        into.forEach((value, i) => {
          expect(value).toBeCloseTo(expected[i]!, 9);
        });
      }
});

test('a matrix that is not positive definite has no solution, and the last one stays', () => {
  for (const values of [[-1, 2, 3], [1, -2, 3], [1, 2, -3], [0, 0, 0]]) {
    const into: [number, number, number] = [7, 8, 9];
    expect(solveThree(sixOf(withEigenvalues(values, 4)), 0, [1, 1, 1], into)).toBe(false);
    expect(into).toEqual([7, 8, 9]);
  }
});
