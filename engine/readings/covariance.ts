import { inversePositive } from '../linear/solveSymmetric.ts';
import { symmetricEigen } from '../linear/symmetricEigen.ts';

/** A 3 x 3 covariance of Delta, B and C in cm-2. */
export type Covariance = readonly (readonly number[])[];

/** One fitted band: derivatives by the free parameters, reading uncertainty, model floor. */
export interface Row {
  readonly slopes: readonly number[];
  readonly u: number;
  readonly floor: number;
}

export interface Uncertainty {
  /** From the readings alone: G diag(u^2) G'. */
  readonly reading: number[][];
  /** Readings and model floor: (J'WJ)^-1. */
  readonly total: number[][];
  /** G = (J'WJ)^-1 J'W, parameters by bands. */
  readonly gain: number[][];
  /** Leverage of each band, the diagonal of J G. */
  readonly leverage: number[];
}

/**
 * Linear propagation for weighted least squares with W = diag 1/(u^2 + tau^2).
 *
 * @param scales sizes of the parameters, by which columns are scaled before the inversion
 */
export function propagate(rows: readonly Row[], scales: readonly number[]): Uncertainty {
  const weights = rows.map((row) => 1 / (row.u ** 2 + row.floor ** 2));
  const normal = scales.map((si, i) => scales.map((sj, j) => rows.reduce((sum, row, k) => sum + weights[k]! * row.slopes[i]! * si * row.slopes[j]! * sj, 0)));
  const scaled = inversePositive(normal);
  if (!scaled) throw new RangeError('rows: the bands do not determine the parameters; test the singular values first');
  const total = scaled.map((line, i) => line.map((value, j) => value * scales[i]! * scales[j]!));
  const gain = total.map((line) => rows.map((row, k) => weights[k]! * line.reduce((sum, value, j) => sum + value * row.slopes[j]!, 0)));
  const reading = gain.map((left) => gain.map((right) => rows.reduce((sum, row, k) => sum + left[k]! * right[k]! * row.u ** 2, 0)));
  const leverage = rows.map((row, k) => row.slopes.reduce((sum, slope, i) => sum + slope * gain[i]![k]!, 0));
  return { reading, total, gain, leverage };
}

/** Singular values of the weighted Jacobian with columns scaled by the parameters, descending. */
export function singularValues(rows: readonly Row[], scales: readonly number[]): number[] {
  const count = scales.length;
  const matrix = rows.map((row) => scales.map((scale, i) => (row.slopes[i]! * scale) / Math.sqrt(row.u ** 2 + row.floor ** 2)));
  const normal = new Float64Array(count * count);
  for (let i = 0; i < count; i++) for (let j = 0; j < count; j++) normal[i * count + j] = matrix.reduce((sum, row) => sum + row[i]! * row[j]!, 0);
  return Array.from(symmetricEigen(normal, count).values, (square) => Math.sqrt(Math.max(0, square))).reverse();
}

/** a + factor * v v', 3 x 3. */
export function withOuter(matrix: Covariance, vector: readonly number[], factor: number): number[][] {
  return matrix.map((line, i) => line.map((value, j) => value + factor * vector[i]! * vector[j]!));
}

/** T M T' for a list of rows T (each as long as M). */
export function transform(rows: readonly (readonly number[])[], matrix: readonly (readonly number[])[]): number[][] {
  return rows.map((left) =>
    rows.map((right) => {
      let sum = 0;
      for (let i = 0; i < left.length; i++) for (let j = 0; j < right.length; j++) sum += left[i]! * matrix[i]![j]! * right[j]!;
      return sum;
    }),
  );
}

/** v' M v. */
export function quadratic(vector: readonly number[], matrix: Covariance): number {
  return transform([vector], matrix)[0]![0]!;
}
