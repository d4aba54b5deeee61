import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { factorModel } from './factorModel.ts';
import type { PlacedComposition } from './factorModel.ts';
import type { SeriesParameter } from './types.ts';

/** The data of one island in the scale of the model. */
export interface IslandData {
  readonly parameter: SeriesParameter;
  readonly compositions: readonly PlacedComposition[];
  readonly found: Float64Array;
  /** Number of free unknowns. */
  readonly size: number;
}

export interface NormalEquations {
  /** J'WJ, row-major. */
  readonly matrix: Float64Array;
  /** J'Wr. */
  readonly right: Float64Array;
  /** r'Wr. */
  readonly chi2: number;
}

/** J'WJ and J'Wr at a point. Each complex touches one ion and a few ligands, so the sums run over those places alone. */
export function normalEquations({ parameter, compositions, found, size }: IslandData, weights: Float64Array, unknowns: Float64Array): NormalEquations {
  const matrix = new Float64Array(size * size);
  const right = new Float64Array(size);
  let chi2 = 0;
  compositions.forEach((composition, i) => {
    const { value, places, derivatives } = factorModel(parameter, composition, unknowns);
    const weight = weights[i]!;
    const residual = found[i]! - value;
    chi2 += weight * residual * residual;
    for (let a = 0; a < places.length; a++) {
      const wa = weight * derivatives[a]!;
      right[places[a]!]! += wa * residual;
      for (let b = 0; b < places.length; b++) if (places[b]! <= places[a]!) matrix[places[a]! * size + places[b]!]! += wa * derivatives[b]!;
    }
  });
  for (let i = 0; i < size; i++) for (let j = 0; j < i; j++) matrix[j * size + i] = matrix[i * size + j]!;
  return { matrix, right, chi2 };
}

function chiSquare({ parameter, compositions, found }: IslandData, weights: Float64Array, unknowns: Float64Array): number {
  let chi2 = 0;
  for (let i = 0; i < compositions.length; i++) chi2 += weights[i]! * (found[i]! - factorModel(parameter, compositions[i]!, unknowns).value) ** 2;
  return chi2;
}

const stepsAtMost = 200;
/** Residuals this nearly at right angles to every column of the Jacobian: a stationary point. */
const rightAngle = 1e-11;
/** A step that betters chi2 by less than this share of it. */
const noGain = 1e-13;

/**
 * Least squares by Gauss-Newton steps with Marquardt's damping (J. Soc. Indust. Appl. Math. 11, 431 (1963)), steered by the ratio of the
 * gain found to the gain foreseen (K. Madsen, H. B. Nielsen and O. Tingleff, Methods for Non-Linear Least Squares Problems (2004), section 3.2).
 * Damping also keeps the equations solvable where the data leave a direction open: that direction is then hardly moved along.
 * Where chi2 falls for ever towards a factor without bound, the steps end after a fixed number; such a factor is then as uncertain as
 * chi2 is flat, and is withheld for it.
 */
export function solveIsland(data: IslandData, weights: Float64Array, start: Float64Array): { readonly unknowns: Float64Array; readonly chi2: number } {
  const { size } = data;
  let unknowns = start;
  let equations = normalEquations(data, weights, unknowns);
  let damping = 1e-3;
  let raise = 2;
  for (let step = 0; step < stepsAtMost; step++) {
    const scale = diagonalScale(equations.matrix, size);
    const { right, chi2 } = equations;
    if (right.every((value, j) => Math.abs(value * scale[j]!) <= rightAngle * Math.sqrt(chi2))) break;
    const move = dampedStep(equations, scale, damping);
    if (move.every((value, j) => Math.abs(value) <= 1e-14 * (1 + Math.abs(unknowns[j]!)))) break;
    const next = unknowns.map((value, j) => value + move[j]!);
    const foreseen = move.reduce((sum, value, j) => sum + value * (right[j]! + (damping * value) / scale[j]! ** 2), 0);
    const gain = chi2 - chiSquare(data, weights, next);
    if (gain > 0) {
      unknowns = next;
      equations = normalEquations(data, weights, unknowns);
      damping = Math.max(1e-14, damping * Math.max(1 / 3, 1 - (2 * (gain / foreseen) - 1) ** 3));
      raise = 2;
      if (gain <= noGain * chi2) break;
    } else {
      damping *= raise;
      raise *= 2;
      // Damped this much the steps have no length left.
      if (damping > 1e12) break;
    }
  }
  return { unknowns, chi2: equations.chi2 };
}

function dampedStep({ matrix, right }: NormalEquations, scale: Float64Array, damping: number): Float64Array {
  const size = scale.length;
  const damped = scaledMatrix(matrix, scale);
  for (let i = 0; i < size; i++) damped.set(i, i, damped.get(i, i) + damping);
  const target = Matrix.columnVector(right.map((value, i) => value * scale[i]!));
  let decomposition = new CholeskyDecomposition(damped);
  for (let extra = Math.max(damping, 1e-13); !decomposition.isPositiveDefinite(); extra *= 10) {
    for (let i = 0; i < size; i++) damped.set(i, i, damped.get(i, i) + extra);
    decomposition = new CholeskyDecomposition(damped);
  }
  const step = decomposition.solve(target);
  return Float64Array.from({ length: size }, (_, j) => step.get(j, 0) * scale[j]!);
}

/** 1/sqrt of the diagonal: what brings every unknown to a common scale; 1 for an unknown that nothing moves with. */
export function diagonalScale(matrix: Float64Array, size: number): Float64Array {
  return Float64Array.from({ length: size }, (_, j) => {
    const diagonal = matrix[j * size + j]!;
    return diagonal > 0 ? 1 / Math.sqrt(diagonal) : 1;
  });
}

/** J'WJ in unknowns divided by `scale`, symmetric to the last bit. */
export function scaledMatrix(matrix: Float64Array, scale: Float64Array): Matrix {
  const size = scale.length;
  const scaled = Matrix.zeros(size, size);
  for (let i = 0; i < size; i++)
    for (let j = 0; j <= i; j++) {
      const value = matrix[i * size + j]! * scale[i]! * scale[j]!;
      scaled.set(i, j, value);
      scaled.set(j, i, value);
    }
  return scaled;
}
