/**
 * Inverse of a small symmetric positive definite matrix by Cholesky's factorisation, for normal equations of
 * two or three scaled parameters.
 *
 * @returns null where a pivot is not positive: the equations are singular
 */
export function inversePositive(matrix: readonly (readonly number[])[]): number[][] | null {
  const size = matrix.length;
  const lower = matrix.map(() => new Array<number>(size).fill(0));
  for (let i = 0; i < size; i++)
    for (let j = 0; j <= i; j++) {
      let sum = matrix[i]![j]!;
      for (let k = 0; k < j; k++) sum -= lower[i]![k]! * lower[j]![k]!;
      if (i === j && !(sum > 0)) return null;
      lower[i]![j] = i === j ? Math.sqrt(sum) : sum / lower[j]![j]!;
    }
  const inverse = matrix.map(() => new Array<number>(size).fill(0));
  for (let column = 0; column < size; column++) {
    const y: number[] = [];
    for (let i = 0; i < size; i++) {
      let sum = i === column ? 1 : 0;
      for (let k = 0; k < i; k++) sum -= lower[i]![k]! * y[k]!;
      y.push(sum / lower[i]![i]!);
    }
    for (let i = size - 1; i >= 0; i--) {
      let sum = y[i]!;
      for (let k = i + 1; k < size; k++) sum -= lower[k]![i]! * inverse[k]![column]!;
      inverse[i]![column] = sum / lower[i]![i]!;
    }
  }
  return inverse;
}

/** Solution of the equations with the right-hand side given; null where they are singular. */
export function solvePositive(matrix: readonly (readonly number[])[], right: readonly number[]): number[] | null {
  return inversePositive(matrix)?.map((row) => row.reduce((sum, value, j) => sum + value * right[j]!, 0)) ?? null;
}

/** A symmetric 3 x 3 matrix by its six different elements: 11, 12, 13, 22, 23, 33. */
export type SymmetricThree = [number, number, number, number, number, number];

/**
 * Solves M x = right for a symmetric positive definite 3 x 3 matrix, without allocation.
 *
 * @param lift is added to each diagonal element
 * @param into the solution; not touched where there is none
 * @returns false where the matrix, lifted, is not positive definite
 */
export function solveThree(matrix: SymmetricThree, lift: number, right: ArrayLike<number>, into: [number, number, number]): boolean {
  const a = matrix[0] + lift;
  if (!(a > 0)) return false;
  const ba = matrix[1] / a;
  const ca = matrix[2] / a;
  const b = matrix[3] + lift - ba * matrix[1];
  if (!(b > 0)) return false;
  const cb = (matrix[4] - ca * matrix[1]) / b;
  const c = matrix[5] + lift - ca * matrix[2] - cb * cb * b;
  if (!(c > 0)) return false;
  const second = right[1]! - ba * right[0]!;
  const third = (right[2]! - ca * right[0]! - cb * second) / c;
  into[2] = third;
  into[1] = second / b - cb * third;
  into[0] = right[0]! / a - ba * into[1] - ca * third;
  return true;
}
