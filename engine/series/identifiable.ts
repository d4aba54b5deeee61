import { EigenvalueDecomposition } from 'ml-matrix';
import { diagonalScale, scaledMatrix } from './normalEquations.ts';

/** What the complexes of an island fix of its unknowns. */
export interface Identifiable {
  readonly rank: number;
  /** Covariance of the unknowns over the directions that are fixed. */
  readonly covariance: readonly (readonly number[])[];
  /** Unit directions, in unknowns divided by `scale`, that no complex fixes. */
  readonly open: readonly (readonly number[])[];
  readonly scale: readonly number[];
}

/** A singular value of the scaled weighted Jacobian below this share of the largest counts as zero. */
const smallestSingular = 1e-5;
/** An unknown with more than this share of an open direction is not fixed. */
export const openShare = 1e-5;

/**
 * Rank, covariance and open directions of the least-squares problem with J'WJ given. The singular values of the scaled weighted
 * Jacobian are the square roots of the eigenvalues of the scaled J'WJ.
 */
export function identifiable(matrix: Float64Array, size: number): Identifiable {
  const scale = diagonalScale(matrix, size);
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(scaledMatrix(matrix, scale), { assumeSymmetric: true });
  const largest = Math.max(0, ...realEigenvalues);
  const fixed = realEigenvalues.map((value) => value > smallestSingular ** 2 * largest);
  const column = (k: number): number[] => Array.from({ length: size }, (_, i) => eigenvectorMatrix.get(i, k));
  const covariance = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  realEigenvalues.forEach((value, k) => {
    if (!fixed[k]) return;
    const vector = column(k).map((element, i) => element * scale[i]!);
    for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) covariance[i]![j]! += (vector[i]! * vector[j]!) / value;
  });
  return {
    rank: fixed.filter(Boolean).length, covariance,
    open: realEigenvalues.flatMap((_, k) => (fixed[k] ? [] : [column(k)])), scale: [...scale],
  };
}

/** true where a linear combination of the unknowns (given by its derivatives) leans on no open direction. */
export function isFixed(derivatives: readonly number[], { open, scale }: Pick<Identifiable, 'open' | 'scale'>): boolean {
  const scaled = derivatives.map((value, j) => value * scale[j]!);
  const length = Math.hypot(...scaled);
  return open.every((direction) => Math.abs(direction.reduce((sum, value, j) => sum + value * scaled[j]!, 0)) <= openShare * length);
}
