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
