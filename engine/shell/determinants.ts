import { orbitalCount } from './orbitals.ts';

/**
 * Slater determinants of d^n as bit masks over ten spin orbitals: bits 0 to 4 spin up, bits 5 to 9 spin
 * down, creation operators in ascending order of bit.
 */
export type Determinant = number;

export function countBits(mask: number): number {
  let count = 0;
  for (let rest = mask; rest !== 0; rest &= rest - 1) count++;
  return count;
}

/** All masks of `size` orbitals out of five, ascending. */
export function orbitalSets(size: number): readonly number[] {
  const sets: number[] = [];
  for (let mask = 0; mask < 1 << orbitalCount; mask++) if (countBits(mask) === size) sets.push(mask);
  return sets;
}

/** Determinants with the given numbers of spin-up and spin-down electrons. */
export function determinants(up: number, down: number): readonly Determinant[] {
  return orbitalSets(up).flatMap((alpha) => orbitalSets(down).map((beta) => alpha | (beta << orbitalCount)));
}

export const alphaOf = (determinant: Determinant): number => determinant & 0b11111;

export const betaOf = (determinant: Determinant): number => determinant >> orbitalCount;

function bitsOf(mask: number): number[] {
  const bits: number[] = [];
  for (let bit = 0; bit < 2 * orbitalCount; bit++) if (mask & (1 << bit)) bits.push(bit);
  return bits;
}

const bitLists: readonly (readonly number[])[] = Array.from({ length: 1 << (2 * orbitalCount) }, (_, mask) => bitsOf(mask));

/** Occupied spin orbitals of a mask, ascending. */
export function occupied(mask: number): readonly number[] {
  return bitLists[mask]!;
}

/** <pq|g|rs> - <pq|g|sr> over spin orbitals, from spatial integrals. */
function antisymmetric(pair: Float64Array, p: number, q: number, r: number, s: number): number {
  const spinP = p >= orbitalCount;
  const spinQ = q >= orbitalCount;
  const spinR = r >= orbitalCount;
  const spinS = s >= orbitalCount;
  const a = spinP ? p - orbitalCount : p;
  const b = spinQ ? q - orbitalCount : q;
  const c = spinR ? r - orbitalCount : r;
  const d = spinS ? s - orbitalCount : s;
  let value = 0;
  if (spinP === spinR && spinQ === spinS) value += pair[((a * 5 + b) * 5 + c) * 5 + d]!;
  if (spinP === spinS && spinQ === spinR) value -= pair[((a * 5 + b) * 5 + d) * 5 + c]!;
  return value;
}

const below = (mask: number, bit: number): number => countBits(mask & ((1 << bit) - 1));

/**
 * Matrix element of a two-electron operator between two determinants (Slater-Condon rules).
 * `pair` holds the operator's spatial integrals, see integrals.ts.
 */
export function pairElement(left: Determinant, right: Determinant, pair: Float64Array): number {
  const gone = left & ~right;
  const excitations = countBits(gone);
  if (excitations > 2) return 0;
  if (excitations === 0) {
    const orbitals = occupied(left);
    let sum = 0;
    for (let i = 0; i < orbitals.length; i++)
      for (let j = i + 1; j < orbitals.length; j++)
        sum += antisymmetric(pair, orbitals[i]!, orbitals[j]!, orbitals[i]!, orbitals[j]!);
    return sum;
  }
  const from = occupied(gone);
  const to = occupied(right & ~left);
  let swaps = 0;
  for (const bit of from) swaps += below(left, bit);
  for (const bit of to) swaps += below(right, bit);
  const sign = swaps % 2 === 0 ? 1 : -1;
  if (excitations === 2) return sign * antisymmetric(pair, from[0]!, from[1]!, to[0]!, to[1]!);
  let sum = 0;
  for (const q of occupied(left & right)) sum += antisymmetric(pair, from[0]!, q, to[0]!, q);
  return sign * sum;
}

/**
 * Minors of a 5 x 5 orbital matrix: the matrix by which a rotation acts on the sets of `size` like-spin
 * electrons. Row-major over `orbitalSets(size)`.
 */
export function minors(orbitalMatrix: Float64Array, size: number): Float64Array {
  const sets = orbitalSets(size).map(occupied);
  const result = new Float64Array(sets.length ** 2);
  sets.forEach((rows, i) => {
    sets.forEach((columns, j) => {
      result[i * sets.length + j] = minor(orbitalMatrix, rows, columns, 0, (1 << size) - 1);
    });
  });
  return result;
}

/** Laplace expansion by the first row left; `columnsLeft` marks the columns not yet used. */
function minor(matrix: Float64Array, rows: readonly number[], columns: readonly number[], row: number, columnsLeft: number): number {
  if (row === rows.length) return 1;
  let sum = 0;
  let sign = 1;
  for (let j = 0; j < columns.length; j++) {
    if (!(columnsLeft & (1 << j))) continue;
    const element = matrix[rows[row]! * orbitalCount + columns[j]!]!;
    // The d matrices of the cube are mostly zeros: skipping them makes the expansion cheap.
    if (element > 1e-14 || element < -1e-14) sum += sign * element * minor(matrix, rows, columns, row + 1, columnsLeft & ~(1 << j));
    sign = -sign;
  }
  return sum;
}
