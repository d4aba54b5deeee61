import { alphaOf, betaOf, countBits, determinants, minors, orbitalSets, pairElement } from './determinants.ts';
import type { Determinant } from './determinants.ts';
import { pairIntegrals } from './integrals.ts';
import { rotateOrbitals, t2Orbitals } from './orbitals.ts';
import { irrepDimension, irreps, rotations } from './rotations.ts';
import type { Irrep } from './rotations.ts';

/**
 * One symmetry block of d^n: all states of one spin multiplicity in one row of one irreducible
 * representation of O. Each operator is a fixed symmetric `size` x `size` matrix, row-major;
 * H = Delta * field + B * racahB + C * racahC, Racah's A dropped. The basis states belong to one
 * strong-field configuration each, so `field` is diagonal.
 */
export interface Block {
  readonly multiplicity: number;
  readonly irrep: Irrep;
  readonly size: number;
  /** Octahedral field: e at +3/5, t2 at -2/5. The tetrahedral one is its negative. */
  readonly field: Float64Array;
  readonly racahB: Float64Array;
  readonly racahC: Float64Array;
  /** Square of the total orbital angular momentum, L(L + 1) on free-ion terms. */
  readonly angular: Float64Array;
}

/** How the 24 rotations act on spin-up and spin-down sets, by number of electrons; shared by all ions. */
const orbitalMatrices = rotations.map((rotation) => rotateOrbitals(rotation.matrix));
const minorTables = new Map<number, readonly Float64Array[]>();

function minorsOf(size: number): readonly Float64Array[] {
  let table = minorTables.get(size);
  if (!table) {
    table = orbitalMatrices.map((matrix) => minors(matrix, size));
    minorTables.set(size, table);
  }
  return table;
}

/** Element (1, 1) of each irreducible representation for each rotation. */
const firstRow: Readonly<Record<Irrep, readonly number[]>> = {
  A1: rotations.map(() => 1),
  A2: rotations.map((r) => r.parity),
  E: orbitalMatrices.map((matrix) => matrix[3 * 5 + 3]!),
  T1: rotations.map((r) => r.matrix[2]![2]!),
  T2: rotations.map((r) => r.parity * r.matrix[2]![2]!),
};

interface Configuration {
  readonly members: readonly Determinant[];
  /** Number of electrons in e orbitals. */
  readonly eElectrons: number;
}

function configurations(all: readonly Determinant[]): Configuration[] {
  const byCount = new Map<number, Determinant[]>();
  for (const determinant of all) {
    const e = countBits(alphaOf(determinant) & ~t2Orbitals) + countBits(betaOf(determinant) & ~t2Orbitals);
    const list = byCount.get(e);
    if (list) list.push(determinant);
    else byCount.set(e, [determinant]);
  }
  return [...byCount].sort(([a], [b]) => a - b).map(([eElectrons, members]) => ({ members, eElectrons }));
}

/** S^2 between two determinants with M_S = spin: S- S+ + M(M + 1), where S+ flips one unpaired down spin. */
function spinSquared(members: readonly Determinant[], spin: number): Float64Array {
  const n = members.length;
  const index = new Map(members.map((determinant, i) => [determinant, i]));
  const matrix = new Float64Array(n * n);
  members.forEach((determinant, column) => {
    const alpha = alphaOf(determinant);
    const beta = betaOf(determinant);
    matrix[column * n + column]! += spin * (spin + 1);
    for (let p = 0; p < 5; p++) {
      if (!(beta & (1 << p)) || alpha & (1 << p)) continue;
      const raisedAlpha = alpha | (1 << p);
      const raisedBeta = beta & ~(1 << p);
      for (let q = 0; q < 5; q++) {
        if (!(raisedAlpha & (1 << q)) || raisedBeta & (1 << q)) continue;
        const target = (raisedAlpha & ~(1 << q)) | ((raisedBeta | (1 << q)) << 5);
        // With spin-up operators written first, each operator passes the electrons between its two places.
        const swaps =
          countBits(alpha & ((1 << p) - 1)) + countBits(beta & ((1 << p) - 1)) +
          countBits(raisedAlpha & ((1 << q) - 1)) + countBits(raisedBeta & ((1 << q) - 1));
        matrix[index.get(target)! * n + column]! += swaps % 2 === 0 ? 1 : -1;
      }
    }
  });
  return matrix;
}

function product(a: Float64Array, b: Float64Array, n: number): Float64Array {
  const result = new Float64Array(n * n);
  for (let i = 0; i < n; i++)
    for (let k = 0; k < n; k++) {
      const left = a[i * n + k]!;
      if (left === 0) continue;
      for (let j = 0; j < n; j++) result[i * n + j]! += left * b[k * n + j]!;
    }
  return result;
}

/** Loewdin's projector on total spin: the product over the higher spins S' of (S^2 - S'(S'+1)) / (S(S+1) - S'(S'+1)). */
function spinProjector(members: readonly Determinant[], spin: number, highest: number): Float64Array | null {
  if (spin === highest) return null;
  const n = members.length;
  const squared = spinSquared(members, spin);
  let projector: Float64Array | null = null;
  for (let other = highest; other > spin; other--) {
    const factor = squared.slice();
    const scale = 1 / (spin * (spin + 1) - other * (other + 1));
    for (let i = 0; i < n; i++) factor[i * n + i]! -= other * (other + 1);
    for (let i = 0; i < factor.length; i++) factor[i]! *= scale;
    projector = projector ? product(factor, projector, n) : factor;
  }
  return projector;
}

/** Projectors on the first row of every irreducible representation, for the determinants of one configuration. */
function rowProjectors(members: readonly Determinant[]): Readonly<Record<Irrep, Float64Array>> {
  const n = members.length;
  const up = countBits(alphaOf(members[0]!));
  const down = countBits(betaOf(members[0]!));
  const upSets = orbitalSets(up);
  const downSets = orbitalSets(down);
  const upMinors = minorsOf(up);
  const downMinors = minorsOf(down);
  const upIndex = members.map((d) => upSets.indexOf(alphaOf(d)));
  const downIndex = members.map((d) => downSets.indexOf(betaOf(d)));
  const result: Record<Irrep, Float64Array> = {
    A1: new Float64Array(n * n), A2: new Float64Array(n * n), E: new Float64Array(n * n),
    T1: new Float64Array(n * n), T2: new Float64Array(n * n),
  };
  const { A1, A2, E, T1, T2 } = result;
  for (let r = 0; r < rotations.length; r++) {
    const a = upMinors[r]!;
    const b = downMinors[r]!;
    const weightA2 = firstRow.A2[r]! / 24;
    const weightE = (2 * firstRow.E[r]!) / 24;
    const weightT1 = (3 * firstRow.T1[r]!) / 24;
    const weightT2 = (3 * firstRow.T2[r]!) / 24;
    for (let i = 0; i < n; i++) {
      const rowUp = upIndex[i]! * upSets.length;
      const rowDown = downIndex[i]! * downSets.length;
      for (let j = 0; j < n; j++) {
        const element = a[rowUp + upIndex[j]!]! * b[rowDown + downIndex[j]!]!;
        if (element === 0) continue;
        const at = i * n + j;
        A1[at]! += element / 24;
        A2[at]! += element * weightA2;
        E[at]! += element * weightE;
        T1[at]! += element * weightT1;
        T2[at]! += element * weightT2;
      }
    }
  }
  return result;
}

/**
 * Orthonormal vectors spanning the range of a projector, by Cholesky factorisation with pivoting.
 * A pivot is either a sizeable fraction or rounding noise, so the threshold is not delicate.
 */
function rangeOf(projector: Float64Array, n: number): Float64Array[] {
  const vectors: Float64Array[] = [];
  const left = Float64Array.from({ length: n }, (_, i) => projector[i * n + i]!);
  for (;;) {
    let pivot = 0;
    for (let i = 1; i < n; i++) if (left[i]! > left[pivot]! + 1e-9) pivot = i;
    if (left[pivot]! < 1e-6) return vectors;
    const vector = Float64Array.from({ length: n }, (_, i) => projector[i * n + pivot]!);
    for (const earlier of vectors) {
      const overlap = earlier[pivot]!;
      for (let i = 0; i < n; i++) vector[i]! -= overlap * earlier[i]!;
    }
    const norm = Math.sqrt(vector[pivot]!);
    for (let i = 0; i < n; i++) {
      vector[i]! /= norm;
      left[i]! -= vector[i]! ** 2;
    }
    vectors.push(vector);
  }
}

interface BasisState {
  /** Amplitudes over all determinants of the spin. */
  readonly amplitudes: Float64Array;
  readonly eElectrons: number;
}

/** Basis states of every irreducible representation, in order of e occupation. */
function basisStates(all: readonly Determinant[], spin: number, highest: number): Readonly<Record<Irrep, BasisState[]>> {
  const place = new Map(all.map((determinant, i) => [determinant, i]));
  const states: Record<Irrep, BasisState[]> = { A1: [], A2: [], E: [], T1: [], T2: [] };
  for (const { members, eElectrons } of configurations(all)) {
    const n = members.length;
    const onSpin = spinProjector(members, spin, highest);
    const rows = rowProjectors(members);
    for (const irrep of irreps) {
      const projector = onSpin ? product(onSpin, rows[irrep], n) : rows[irrep];
      for (const vector of rangeOf(projector, n)) {
        const amplitudes = new Float64Array(all.length);
        members.forEach((determinant, i) => {
          amplitudes[place.get(determinant)!] = vector[i]!;
        });
        states[irrep].push({ amplitudes, eElectrons });
      }
    }
  }
  return states;
}

/** The operator between the determinants, as rows of non-zero [column, value]. */
function sparseOperator(all: readonly Determinant[], pair: Float64Array, diagonal: number): (readonly [number, number])[][] {
  const rows: [number, number][][] = all.map(() => []);
  for (let i = 0; i < all.length; i++)
    for (let j = 0; j <= i; j++) {
      const value = pairElement(all[i]!, all[j]!, pair) + (i === j ? diagonal : 0);
      if (Math.abs(value) < 1e-13) continue;
      rows[i]!.push([j, value]);
      if (i !== j) rows[j]!.push([i, value]);
    }
  return rows;
}

/** The operator between basis states; rounding noise is set to zero and the matrix made exactly symmetric. */
function restrict(operator: readonly (readonly (readonly [number, number])[])[], states: readonly BasisState[]): Float64Array {
  const size = states.length;
  const matrix = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    const image = new Float64Array(operator.length);
    const source = states[j]!.amplitudes;
    operator.forEach((row, i) => {
      let sum = 0;
      for (const [column, value] of row) sum += value * source[column]!;
      image[i] = sum;
    });
    for (let i = 0; i <= j; i++) {
      const bra = states[i]!.amplitudes;
      let sum = 0;
      for (let k = 0; k < image.length; k++) sum += bra[k]! * image[k]!;
      matrix[i * size + j] = matrix[j * size + i] = Math.abs(sum) < 1e-11 ? 0 : sum;
    }
  }
  return matrix;
}

function fieldMatrix(states: readonly BasisState[], electrons: number): Float64Array {
  const size = states.length;
  const matrix = new Float64Array(size * size);
  states.forEach(({ eElectrons }, i) => {
    matrix[i * size + i] = eElectrons - 0.4 * electrons;
  });
  return matrix;
}

/** Derives all blocks of d^n from its determinants at M_S = S. */
function derive(electrons: number): readonly Block[] {
  const { racahB, racahC, angular } = pairIntegrals();
  const highest = Math.min(electrons, 10 - electrons) / 2;
  const blocks: Block[] = [];
  for (let spin = highest; spin >= 0; spin--) {
    const up = electrons / 2 + spin;
    const all = determinants(up, electrons - up);
    const states = basisStates(all, spin, highest);
    const operators = [racahB, racahC, angular].map((pair) => sparseOperator(all, pair, pair === angular ? 6 * electrons : 0));
    for (const irrep of irreps) {
      const basis = states[irrep];
      if (basis.length === 0) continue;
      const [blockB, blockC, blockL] = operators.map((operator) => restrict(operator, basis));
      blocks.push({
        multiplicity: 2 * spin + 1, irrep, size: basis.length,
        field: fieldMatrix(basis, electrons), racahB: blockB!, racahC: blockC!, angular: blockL!,
      });
    }
  }
  return blocks;
}

const derived = new Map<number, readonly Block[]>();

/**
 * Symmetry blocks of the d^n configuration, highest spin first, then A1, A2, E, T1, T2. Derived once on
 * first use and shared.
 *
 * @param electrons number of d electrons, 1 to 9
 * @throws RangeError outside 1 to 9
 */
export function shellBlocks(electrons: number): readonly Block[] {
  if (!Number.isInteger(electrons) || electrons < 1 || electrons > 9)
    throw new RangeError(`electrons: ${electrons} is not a whole number from 1 to 9`);
  let blocks = derived.get(electrons);
  if (!blocks) {
    blocks = derive(electrons);
    derived.set(electrons, blocks);
  }
  return blocks;
}

/** Degeneracy of a level of the block: spin times irreducible representation. */
export function blockDegeneracy(block: Pick<Block, 'multiplicity' | 'irrep'>): number {
  return block.multiplicity * irrepDimension[block.irrep];
}
