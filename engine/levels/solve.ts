import { eigenInPlace, symmetricEigen } from '../linear/symmetricEigen.ts';
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

/** One block at one point: energies ascending, eigenvector k in column k. */
export interface Diagonal {
  readonly energy: Float64Array;
  readonly vectors: Float64Array;
}

/** Work space by size of block; no block has more than ten levels. */
const workspaces: readonly Diagonal[] = Array.from({ length: 11 }, (_, size) => ({ energy: new Float64Array(size), vectors: new Float64Array(size * size) }));

/**
 * Diagonalises one block for H = sign * delta * field + racahB * B + racahC * C.
 *
 * Where levels of the block coincide (at Delta = 0), the field is diagonalised among them, so that order
 * and derivatives are those of the limit Delta -> 0 from above.
 *
 * @param sign +1 octahedral, -1 tetrahedral
 * @returns work space that holds until the next block of the same size is diagonalised
 */
export function diagonalise(block: Block, sign: number, delta: number, racahB: number, racahC: number): Diagonal {
  const { size, field, racahB: matrixB, racahC: matrixC } = block;
  const diagonal = workspaces[size]!;
  const { energy, vectors } = diagonal;
  const signed = sign * delta;
  for (let i = 0; i < vectors.length; i++) vectors[i] = signed * field[i]! + racahB * matrixB[i]! + racahC * matrixC[i]!;
  eigenInPlace(vectors, energy, size);
  const scale = Math.max(Math.abs(energy[0]!), Math.abs(energy[size - 1]!));
  for (let k = 1; k < size; k++)
    if (energy[k]! - energy[k - 1]! <= 1e-10 * scale) {
      for (const [first, last] of clusters(energy, 1e-10 * scale)) if (last > first) alignWithField(block, sign, vectors, first, last);
      break;
    }
  return diagonal;
}

/** Exact derivatives of one level by Delta, B and C; may be used again for another level. */
export interface LevelSlopes {
  field: number;
  racahB: number;
  racahC: number;
}

/** dE/dp = <v|H_p|v> (Hellmann-Feynman) for the k-th level of a diagonalised block, written into `into`. */
export function levelSlopes(block: Block, sign: number, { vectors }: Diagonal, k: number, into: LevelSlopes): void {
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
  into.field = sign * sumField;
  into.racahB = sumB;
  into.racahC = sumC;
}

/** Exact second derivatives of one level. */
export interface LevelBends {
  fieldField: number;
  fieldB: number;
  fieldC: number;
  bB: number;
  bC: number;
  cC: number;
}

/** H_B and H_C applied to one eigenvector; no block has more than ten levels. */
const appliedB = new Float64Array(10);
const appliedC = new Float64Array(10);

function applyTo({ size, racahB, racahC }: Block, vectors: Float64Array, k: number): void {
  for (let a = 0; a < size; a++) {
    let rowB = 0;
    let rowC = 0;
    for (let b = 0; b < size; b++) {
      const element = vectors[b * size + k]!;
      rowB += racahB[a * size + b]! * element;
      rowC += racahC[a * size + b]! * element;
    }
    appliedB[a] = rowB;
    appliedC[a] = rowC;
  }
}

/**
 * d2E/dp dq = 2 sum over the other levels j of <v|H_p|j><j|H_q|v> / (E - E_j), second-order perturbation theory, for the k-th
 * level of a diagonalised block, written into `into`.
 */
export function levelBends(block: Block, sign: number, { energy, vectors }: Diagonal, k: number, into: LevelBends): void {
  const { size, field } = block;
  into.fieldField = into.fieldB = into.fieldC = into.bB = into.bC = into.cC = 0;
  applyTo(block, vectors, k);
  for (let j = 0; j < size; j++) {
    const gap = energy[k]! - energy[j]!;
    // Levels of one block do not cross; where rounding makes two alike their mixing is nothing that could be told.
    if (j === k || gap === 0) continue;
    let byField = 0;
    let byB = 0;
    let byC = 0;
    for (let a = 0; a < size; a++) {
      const left = vectors[a * size + j]!;
      byField += left * field[a * size + a]! * vectors[a * size + k]!;
      byB += left * appliedB[a]!;
      byC += left * appliedC[a]!;
    }
    byField *= sign;
    const factor = 2 / gap;
    into.fieldField += factor * byField * byField;
    into.fieldB += factor * byField * byB;
    into.fieldC += factor * byField * byC;
    into.bB += factor * byB * byB;
    into.bC += factor * byB * byC;
    into.cC += factor * byC * byC;
  }
}

/** Solves one block: all its levels with their derivatives. Arguments as for `diagonalise`. */
export function solveBlock(block: Block, sign: number, delta: number, racahB: number, racahC: number): BlockSolution {
  const { size } = block;
  const solution = {
    energy: new Float64Array(size), field: new Float64Array(size),
    racahB: new Float64Array(size), racahC: new Float64Array(size),
  };
  const diagonal = diagonalise(block, sign, delta, racahB, racahC);
  const slopes: LevelSlopes = { field: 0, racahB: 0, racahC: 0 };
  for (let k = 0; k < size; k++) {
    levelSlopes(block, sign, diagonal, k, slopes);
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
