import { reduceToTridiagonal } from './tridiagonal.ts';

/**
 * Eigenvalues and eigenvectors of small symmetric matrices: Householder reduction to tridiagonal form, then QL
 * steps with implicit shifts (J. H. Wilkinson and C. Reinsch, Linear Algebra, Handbook for Automatic Computation
 * II, contributions II/2 and II/4).
 *
 * The engine solves millions of blocks of size 2 to 10. At that size this takes a third of the time of Jacobi's
 * rotations; a general library costs more to call than to run.
 */
export interface SymmetricEigen {
  /** Ascending. */
  readonly values: Float64Array;
  /** Row-major; column k belongs to value k. */
  readonly vectors: Float64Array;
}

const stepsAtMost = 60;

/**
 * @param matrix symmetric, `size` x `size`, row-major; not changed
 * @throws RangeError where the steps do not converge (a matrix with NaN, infinity, or elements whose squares overflow)
 */
export function symmetricEigen(matrix: Float64Array, size: number): SymmetricEigen {
  const solution = { values: new Float64Array(size), vectors: matrix.slice() };
  eigenInPlace(solution.vectors, solution.values, size);
  return solution;
}

/** What lies beside the diagonal, by size of matrix; nothing in it outlives a call. */
const besides: Float64Array[] = [];

/**
 * The same without allocation: the matrix is replaced by its eigenvectors.
 *
 * @param vectors the matrix when called, its eigenvectors on return
 * @param values of length `size`; eigenvalues on return
 */
export function eigenInPlace(vectors: Float64Array, values: Float64Array, size: number): void {
  if (size === 1) {
    values[0] = requireFinite(vectors[0]!);
    vectors[0] = 1;
  } else if (size === 2) twoByTwo(vectors, values);
  else {
    besides[size] ??= new Float64Array(size);
    const beside = besides[size];
    reduceToTridiagonal(vectors, values, beside, size);
    diagonaliseTridiagonal(vectors, values, beside, size);
    // A matrix with NaN looks diagonal to every comparison.
    requireFinite(values.reduce((sum, value) => sum + value, 0));
    sortAscending(vectors, values, size);
  }
}

function requireFinite(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError('matrix: the eigenvalues did not converge');
  return value;
}

/** One rotation makes a matrix of two rows diagonal. */
function twoByTwo(vectors: Float64Array, values: Float64Array): void {
  const a = vectors[0]!;
  const b = vectors[1]!;
  const d = vectors[3]!;
  requireFinite(a * a + b * b + d * d);
  let t = 0;
  if (b !== 0) {
    const theta = (d - a) / (2 * b);
    t = (theta >= 0 ? 1 : -1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  }
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  const first = a - t * b;
  const second = d + t * b;
  const inOrder = first <= second;
  values[0] = inOrder ? first : second;
  values[1] = inOrder ? second : first;
  vectors[0] = inOrder ? c : s;
  vectors[1] = inOrder ? s : c;
  vectors[2] = inOrder ? -s : c;
  vectors[3] = inOrder ? c : -s;
}

/** QL steps until nothing is left beside the diagonal; the rotations are gathered in `vectors`. */
function diagonaliseTridiagonal(vectors: Float64Array, values: Float64Array, beside: Float64Array, size: number): void {
  for (let low = 0; low < size; low++)
    for (let step = 0; ; step++) {
      const high = endOfPiece(values, beside, size, low);
      if (high === low) break;
      if (!(step < stepsAtMost)) throw new RangeError('matrix: the eigenvalues did not converge');
      stepOfQL(vectors, values, beside, size, low, high);
    }
}

/** The first place from `low` on where nothing stands beside the diagonal: what comes before is a matrix of its own. */
function endOfPiece(values: Float64Array, beside: Float64Array, size: number, low: number): number {
  let high = low;
  while (high < size - 1 && Math.abs(beside[high]!) > Number.EPSILON * (Math.abs(values[high]!) + Math.abs(values[high + 1]!))) high++;
  return high;
}

/** One QL step with an implicit shift on the rows low..high. */
function stepOfQL(vectors: Float64Array, values: Float64Array, beside: Float64Array, size: number, low: number, high: number): void {
  let g = (values[low + 1]! - values[low]!) / (2 * beside[low]!);
  let r = Math.sqrt(g * g + 1);
  g = values[high]! - values[low]! + beside[low]! / (g + (g >= 0 ? r : -r));
  let s = 1;
  let c = 1;
  let p = 0;
  for (let i = high - 1; i >= low; i--) {
    const f = s * beside[i]!;
    const b = c * beside[i]!;
    r = Math.sqrt(f * f + g * g);
    beside[i + 1] = r;
    if (r === 0) {
      // The matrix falls apart here: the next step takes the pieces.
      values[i + 1]! -= p;
      beside[high] = 0;
      return;
    }
    s = f / r;
    c = g / r;
    g = values[i + 1]! - p;
    r = (values[i]! - g) * s + 2 * c * b;
    p = s * r;
    values[i + 1] = g + p;
    g = c * r - b;
    for (let k = i, end = size * size; k < end; k += size) {
      const left = vectors[k]!;
      const right = vectors[k + 1]!;
      vectors[k + 1] = s * left + c * right;
      vectors[k] = c * left - s * right;
    }
  }
  values[low]! -= p;
  beside[low] = g;
  beside[high] = 0;
}

function sortAscending(vectors: Float64Array, values: Float64Array, size: number): void {
  for (let i = 0; i < size - 1; i++) {
    let lowest = i;
    for (let j = i + 1; j < size; j++) if (values[j]! < values[lowest]!) lowest = j;
    if (lowest === i) continue;
    const value = values[i]!;
    values[i] = values[lowest]!;
    values[lowest] = value;
    for (let row = 0; row < size * size; row += size) {
      const element = vectors[row + i]!;
      vectors[row + i] = vectors[row + lowest]!;
      vectors[row + lowest] = element;
    }
  }
}
