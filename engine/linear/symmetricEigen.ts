/**
 * Eigenvalues and eigenvectors of small symmetric matrices by cyclic Jacobi rotations
 * (G. H. Golub and C. F. Van Loan, Matrix Computations, section 8.5).
 *
 * The engine solves millions of blocks of size 2 to 10. At that size the method is as fast as any, accurate
 * to the last bits also for small eigenvalues, and short; a general library costs more to call than to run.
 */
export interface SymmetricEigen {
  /** Ascending. */
  readonly values: Float64Array;
  /** Row-major; column k belongs to value k. */
  readonly vectors: Float64Array;
}

const sweepsAtMost = 40;

/**
 * @param matrix symmetric, `size` x `size`, row-major; not changed
 * @throws RangeError where the rotations do not converge (a matrix with NaN, infinity, or elements above about 1e153, whose squares overflow)
 */
export function symmetricEigen(matrix: Float64Array, size: number): SymmetricEigen {
  const a = matrix.slice();
  const v = new Float64Array(size * size);
  for (let i = 0; i < size; i++) v[i * size + i] = 1;
  for (let sweep = 0; ; sweep++) {
    let off = 0;
    let on = 0;
    for (let i = 0; i < size; i++) {
      on += a[i * size + i]! ** 2;
      for (let j = i + 1; j < size; j++) off += a[i * size + j]! ** 2;
    }
    // Before the test of convergence, which an infinite diagonal would pass.
    if (sweep === sweepsAtMost || !Number.isFinite(off + on)) throw new RangeError('matrix: the eigenvalues did not converge');
    // Convergence is quadratic: eigenvalues are wrong by the square of what is left, vectors by less than rounding.
    if (off <= 1e-30 * on) break;
    for (let p = 0; p < size - 1; p++) for (let q = p + 1; q < size; q++) rotate(a, v, size, p, q);
  }
  return sorted(a, v, size);
}

/** One rotation that makes element (p, q) zero. */
function rotate(a: Float64Array, v: Float64Array, size: number, p: number, q: number): void {
  const apq = a[p * size + q]!;
  if (apq === 0) return;
  const app = a[p * size + p]!;
  const aqq = a[q * size + q]!;
  const theta = (aqq - app) / (2 * apq);
  const t = (theta >= 0 ? 1 : -1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  a[p * size + p] = app - t * apq;
  a[q * size + q] = aqq + t * apq;
  a[p * size + q] = a[q * size + p] = 0;
  for (let k = 0; k < size; k++) {
    if (k !== p && k !== q) {
      const akp = a[k * size + p]!;
      const akq = a[k * size + q]!;
      a[k * size + p] = a[p * size + k] = c * akp - s * akq;
      a[k * size + q] = a[q * size + k] = s * akp + c * akq;
    }
    const vkp = v[k * size + p]!;
    const vkq = v[k * size + q]!;
    v[k * size + p] = c * vkp - s * vkq;
    v[k * size + q] = s * vkp + c * vkq;
  }
}

function sorted(a: Float64Array, v: Float64Array, size: number): SymmetricEigen {
  for (let i = 0; i < size - 1; i++) {
    let lowest = i;
    for (let j = i + 1; j < size; j++) if (a[j * size + j]! < a[lowest * size + lowest]!) lowest = j;
    if (lowest === i) continue;
    const value = a[i * size + i]!;
    a[i * size + i] = a[lowest * size + lowest]!;
    a[lowest * size + lowest] = value;
    for (let k = 0; k < size; k++) {
      const element = v[k * size + i]!;
      v[k * size + i] = v[k * size + lowest]!;
      v[k * size + lowest] = element;
    }
  }
  const values = new Float64Array(size);
  for (let i = 0; i < size; i++) values[i] = a[i * size + i]!;
  return { values, vectors: v };
}
