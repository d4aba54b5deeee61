import { seeded } from '../../published/random.ts';

/** Row-major symmetric matrix with elements between -1 and 1 times the scale; repeatable by its seed. */
export function randomSymmetric(size: number, seed: number, scale = 1): Float64Array {
  const next = seeded(seed);
  const matrix = new Float64Array(size * size);
  for (let i = 0; i < size; i++)
    for (let j = i; j < size; j++) matrix[i * size + j] = matrix[j * size + i] = scale * (2 * next() - 1);
  return matrix;
}

/** Q diag(values) Q' with Q the product of random plane rotations, so that the eigenvalues are known. */
export function withEigenvalues(values: readonly number[], seed: number): Float64Array {
  const size = values.length;
  const next = seeded(seed);
  const matrix = new Float64Array(size * size);
  values.forEach((value, i) => {
    matrix[i * size + i] = value;
  });
  for (let p = 0; p < size; p++)
    for (let q = p + 1; q < size; q++) {
      const angle = 2 * Math.PI * next();
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      for (let k = 0; k < size; k++) {
        const [left, right] = [matrix[k * size + p]!, matrix[k * size + q]!];
        matrix[k * size + p] = c * left - s * right;
        matrix[k * size + q] = s * left + c * right;
      }
      for (let k = 0; k < size; k++) {
        const [upper, lower] = [matrix[p * size + k]!, matrix[q * size + k]!];
        matrix[p * size + k] = c * upper - s * lower;
        matrix[q * size + k] = s * upper + c * lower;
      }
    }
  for (let i = 0; i < size; i++) for (let j = 0; j < i; j++) matrix[i * size + j] = matrix[j * size + i]!;
  return matrix;
}

/** Square root of the sum of squares of all elements. */
export function norm(matrix: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < matrix.length; i++) sum += matrix[i]! ** 2;
  return Math.sqrt(sum);
}

/** Rows of a row-major matrix. */
export function rowsOf(matrix: Float64Array, size: number): number[][] {
  return Array.from({ length: size }, (_, i) => Array.from(matrix.subarray(i * size, (i + 1) * size)));
}
