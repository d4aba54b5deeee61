import { symmetricEigen } from '../linear/symmetricEigen.ts';
import type { Block } from '../shell/blocks.ts';

/**
 * Eigenvalues of one block in ascending order with their exact derivatives
 * dE/dp = <v|H_p|v> (Hellmann-Feynman), each of length `block.size`.
 */
export interface BlockSolution {
  readonly energy: Float64Array;
  readonly field: Float64Array;
  readonly racahB: Float64Array;
  readonly racahC: Float64Array;
}

/** <v_a|M|v_b> for columns a and b of a row-major eigenvector matrix of the same size. */
export function between(matrix: Float64Array, vectors: Float64Array, size: number, a: number, b: number): number {
  let sum = 0;
  for (let i = 0; i < size; i++) {
    const left = vectors[i * size + a]!;
    if (left === 0) continue;
    let row = 0;
    for (let j = 0; j < size; j++) row += matrix[i * size + j]! * vectors[j * size + b]!;
    sum += left * row;
  }
  return sum;
}

/** Index ranges [first, last] of eigenvalues that agree within `tolerance`, ascending input. */
export function clusters(values: ArrayLike<number>, tolerance: number): [number, number][] {
  const found: [number, number][] = [];
  let first = 0;
  for (let i = 1; i <= values.length; i++) {
    if (i < values.length && values[i]! - values[i - 1]! <= tolerance) continue;
    found.push([first, i - 1]);
    first = i;
  }
  return found;
}

/** Eigenvectors of one block at one point, column k belonging to its k-th level. */
export interface Diagonal {
  readonly vectors: Float64Array;
}

const single: Diagonal = { vectors: Float64Array.of(1) };

/** Work space for the matrix of a block: nothing outlives the call that fills it. */
const workspaces: Float64Array[] = [];

function workspace(size: number): Float64Array {
  workspaces[size] ??= new Float64Array(size * size);
  return workspaces[size];
}

/**
 * Diagonalises one block for H = sign * delta * field + racahB * B + racahC * C.
 *
 * Where levels of the block coincide (at Delta = 0), the field is diagonalised among them, so that order
 * and derivatives are those of the limit Delta -> 0 from above.
 *
 * @param sign +1 octahedral, -1 tetrahedral
 */
export function diagonalise(block: Block, sign: number, delta: number, racahB: number, racahC: number): Diagonal {
  const { size, field, racahB: matrixB, racahC: matrixC } = block;
  if (size === 1) return single;
  const total = workspace(size);
  let scale = 0;
  for (let i = 0; i < total.length; i++) {
    const element = sign * delta * field[i]! + racahB * matrixB[i]! + racahC * matrixC[i]!;
    total[i] = element;
    const magnitude = Math.abs(element);
    if (magnitude > scale) scale = magnitude;
  }
  const { values, vectors } = symmetricEigen(total, size);
  for (let k = 1; k < size; k++)
    if (values[k]! - values[k - 1]! <= 1e-10 * scale) {
      for (const [first, last] of clusters(values, 1e-10 * scale)) if (last > first) alignWithField(block, sign, vectors, first, last);
      break;
    }
  return { vectors };
}

/** Exact derivatives of the k-th level by Delta, B and C. */
export interface LevelSlopes {
  readonly field: number;
  readonly racahB: number;
  readonly racahC: number;
}

/** dE/dp = <v|H_p|v> (Hellmann-Feynman) for one level of a diagonalised block. */
export function levelSlopes(block: Block, sign: number, { vectors }: Diagonal, k: number): LevelSlopes {
  const { size, field, racahB: matrixB, racahC: matrixC } = block;
  let sumField = 0;
  let sumB = 0;
  let sumC = 0;
  for (let i = 0; i < size; i++) {
    const left = vectors[i * size + k]!;
    sumField += left * left * field[i * size + i]!;
    // The matrices are symmetric: the diagonal once, what lies above it twice.
    let rowB = matrixB[i * size + i]! * left;
    let rowC = matrixC[i * size + i]! * left;
    for (let j = i + 1; j < size; j++) {
      const right = 2 * vectors[j * size + k]!;
      rowB += matrixB[i * size + j]! * right;
      rowC += matrixC[i * size + j]! * right;
    }
    sumB += left * rowB;
    sumC += left * rowC;
  }
  return { field: sign * sumField, racahB: sumB, racahC: sumC };
}

/** Solves one block: all its levels with their derivatives. Arguments as for `diagonalise`. */
export function solveBlock(block: Block, sign: number, delta: number, racahB: number, racahC: number): BlockSolution {
  const { size } = block;
  const solution = {
    energy: new Float64Array(size), field: new Float64Array(size),
    racahB: new Float64Array(size), racahC: new Float64Array(size),
  };
  const diagonal = diagonalise(block, sign, delta, racahB, racahC);
  for (let k = 0; k < size; k++) {
    const slopes = levelSlopes(block, sign, diagonal, k);
    solution.field[k] = slopes.field;
    solution.racahB[k] = slopes.racahB;
    solution.racahC[k] = slopes.racahC;
    // Energies are homogeneous of degree one, so Euler's theorem gives the eigenvalue back.
    solution.energy[k] = delta * slopes.field + racahB * slopes.racahB + racahC * slopes.racahC;
  }
  return solution;
}

/** Turns the eigenvectors first..last, which share one energy, so that the field is diagonal and ascending among them. */
function alignWithField(block: Block, sign: number, vectors: Float64Array, first: number, last: number): void {
  const { size } = block;
  const count = last - first + 1;
  const inner = new Float64Array(count * count);
  for (let a = 0; a < count; a++)
    for (let b = 0; b < count; b++) inner[a * count + b] = sign * between(block.field, vectors, size, first + a, first + b);
  const turn = symmetricEigen(inner, count).vectors;
  for (let i = 0; i < size; i++) {
    const old = vectors.slice(i * size + first, i * size + last + 1);
    for (let b = 0; b < count; b++) {
      let sum = 0;
      for (let a = 0; a < count; a++) sum += old[a]! * turn[a * count + b]!;
      vectors[i * size + first + b] = sum;
    }
  }
}
