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

/**
 * Least squares by Gauss-Newton steps with Marquardt's damping (J. Soc. Indust. Appl. Math. 11, 431 (1963)), which vanishes as the steps
 * succeed. Damping also keeps the equations solvable where the data leave a direction open: that direction is then not moved along.
 *
 * @throws Error where the steps do not converge
 */
export function solveIsland(data: IslandData, weights: Float64Array, start: Float64Array): { readonly unknowns: Float64Array; readonly chi2: number } {
  const { size } = data;
  let unknowns = start;
  let equations = normalEquations(data, weights, unknowns);
  let damping = 1e-3;
  for (let step = 0; step < stepsAtMost; step++) {
    const move = dampedStep(equations, size, damping);
    const next = unknowns.map((value, j) => value + move[j]!);
    const chi2 = chiSquare(data, weights, next);
    const small = move.every((value, j) => Math.abs(value) <= 1e-12 * (1 + Math.abs(unknowns[j]!)));
    if (chi2 <= equations.chi2) {
      const gain = equations.chi2 - chi2;
      unknowns = next;
      if (small || gain <= 1e-15 * chi2) {
        if (small || damping <= 1e-9) return { unknowns, chi2 };
      }
      equations = normalEquations(data, weights, unknowns);
      damping = Math.max(damping / 10, 1e-12);
    } else {
      // Rounding alone separates the two: no better point can be told.
      if (small || chi2 - equations.chi2 <= 1e-12 * equations.chi2) return { unknowns, chi2: equations.chi2 };
      damping = Math.max(damping * 10, 1e-9);
    }
  }
  throw new Error('the factors did not converge');
}

function dampedStep({ matrix, right }: NormalEquations, size: number, damping: number): Float64Array {
  const scale = diagonalScale(matrix, size);
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
