/**
 * Householder's reduction of a symmetric matrix to tridiagonal form, T = Q' M Q (J. H. Wilkinson and C. Reinsch,
 * Linear Algebra, Handbook for Automatic Computation II, contribution II/2). The last rows go first, which keeps
 * the digits of matrices graded towards their last row.
 *
 * @param matrix M when called, `size` x `size`, row-major, at least 2 rows; Q on return
 * @param diagonal of length `size`; the diagonal of T on return
 * @param beside of length `size`; on return element i stands beside diagonal elements i and i + 1, the last is 0
 */
export function reduceToTridiagonal(matrix: Float64Array, diagonal: Float64Array, beside: Float64Array, size: number): void {
  for (let i = size - 1; i > 0; i--) diagonal[i] = reflectRow(matrix, beside, size, i);
  diagonal[0] = 0;
  gatherReflections(matrix, diagonal, size);
  for (let i = 1; i < size; i++) beside[i - 1] = beside[i]!;
  beside[size - 1] = 0;
}

/**
 * Clears row i up to its element i - 2 by a reflection I - v v'/h of the rows before it. Leaves v in the row, v/h in the column
 * and what stands beside the diagonal in `beside[i]`; returns h, 0 where the row was clear.
 */
function reflectRow(matrix: Float64Array, beside: Float64Array, size: number, i: number): number {
  const row = i * size;
  let scale = 0;
  for (let k = 0; k < i; k++) scale += Math.abs(matrix[row + k]!);
  // The last element alone needs no reflection.
  if (i === 1 || scale === 0 || scale === Math.abs(matrix[row + i - 1]!)) {
    beside[i] = matrix[row + i - 1]!;
    return 0;
  }
  let h = 0;
  for (let k = 0; k < i; k++) {
    const element = matrix[row + k]! / scale;
    matrix[row + k] = element;
    h += element * element;
  }
  const last = matrix[row + i - 1]!;
  const g = last >= 0 ? -Math.sqrt(h) : Math.sqrt(h);
  beside[i] = scale * g;
  h -= last * g;
  matrix[row + i - 1] = last - g;
  transformRowsBefore(matrix, beside, size, i, h);
  return h;
}

/** M - v q' - q v' on the rows before i, with p = M v/h and q = p - (v'p/2h) v; `beside` holds p, then q, below i. */
function transformRowsBefore(matrix: Float64Array, beside: Float64Array, size: number, i: number, h: number): void {
  const row = i * size;
  let along = 0;
  for (let j = 0; j < i; j++) {
    matrix[j * size + i] = matrix[row + j]! / h;
    let sum = 0;
    for (let k = 0; k <= j; k++) sum += matrix[j * size + k]! * matrix[row + k]!;
    for (let k = j + 1; k < i; k++) sum += matrix[k * size + j]! * matrix[row + k]!;
    beside[j] = sum / h;
    along += beside[j]! * matrix[row + j]!;
  }
  const share = along / (h + h);
  for (let j = 0; j < i; j++) {
    const v = matrix[row + j]!;
    const q = beside[j]! - share * v;
    beside[j] = q;
    for (let k = 0; k <= j; k++) matrix[j * size + k]! -= v * beside[k]! + q * matrix[row + k]!;
  }
}

/** Turns the reflections kept in the matrix into Q, and takes the diagonal of T out of their way. */
function gatherReflections(matrix: Float64Array, diagonal: Float64Array, size: number): void {
  for (let i = 0; i < size; i++) {
    const row = i * size;
    if (diagonal[i] !== 0)
      for (let j = 0; j < i; j++) {
        let sum = 0;
        for (let k = 0; k < i; k++) sum += matrix[row + k]! * matrix[k * size + j]!;
        for (let k = 0; k < i; k++) matrix[k * size + j]! -= sum * matrix[k * size + i]!;
      }
    diagonal[i] = matrix[row + i]!;
    matrix[row + i] = 1;
    for (let j = 0; j < i; j++) matrix[j * size + i] = matrix[row + j] = 0;
  }
}
