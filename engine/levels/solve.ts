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

/**
 * Solves one block for H = sign * delta * field + racahB * B + racahC * C.
 *
 * Where levels of the block coincide (at Delta = 0), the field is diagonalised among them, so that order
 * and derivatives are those of the limit Delta -> 0 from above.
 *
 * @param sign +1 octahedral, -1 tetrahedral
 */
export function solveBlock(block: Block, sign: number, delta: number, racahB: number, racahC: number): BlockSolution {
  const { size, field, racahB: matrixB, racahC: matrixC } = block;
  const solution = {
    energy: new Float64Array(size), field: new Float64Array(size),
    racahB: new Float64Array(size), racahC: new Float64Array(size),
  };
  if (size === 1) {
    solution.field[0] = sign * field[0]!;
    solution.racahB[0] = matrixB[0]!;
    solution.racahC[0] = matrixC[0]!;
    solution.energy[0] = delta * solution.field[0]! + racahB * matrixB[0]! + racahC * matrixC[0]!;
    return solution;
  }
  const total = new Float64Array(size * size);
  let scale = 0;
  for (let i = 0; i < total.length; i++) {
    total[i] = sign * delta * field[i]! + racahB * matrixB[i]! + racahC * matrixC[i]!;
    scale = Math.max(scale, Math.abs(total[i]!));
  }
  const { values, vectors } = symmetricEigen(total, size);
  for (const [first, last] of clusters(values, 1e-10 * scale)) if (last > first) alignWithField(block, sign, vectors, first, last);
  for (let k = 0; k < size; k++) {
    let sumField = 0;
    let sumB = 0;
    let sumC = 0;
    for (let i = 0; i < size; i++) {
      const left = vectors[i * size + k]!;
      sumField += left * left * field[i * size + i]!;
      let rowB = 0;
      let rowC = 0;
      for (let j = 0; j < size; j++) {
        const right = vectors[j * size + k]!;
        rowB += matrixB[i * size + j]! * right;
        rowC += matrixC[i * size + j]! * right;
      }
      sumB += left * rowB;
      sumC += left * rowC;
    }
    solution.field[k] = sign * sumField;
    solution.racahB[k] = sumB;
    solution.racahC[k] = sumC;
    // Energies are homogeneous of degree one, so Euler's theorem gives the eigenvalue back.
    solution.energy[k] = delta * solution.field[k]! + racahB * sumB + racahC * sumC;
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
