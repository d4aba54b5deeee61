import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { condonShortleyTable } from './condonShortleyTable.ts';

/**
 * A second calculation of d^n in a cubic field that shares nothing with the engine: all C(10, n) determinants
 * over the complex spin orbitals |m_l m_s>, operators applied one creator and annihilator at a time, no
 * symmetry and no projection, the whole matrix diagonalised at once.
 *
 * Repulsion: (1/2) sum <ab|cd> a+ b+ d c with <ab|cd> = delta(m_a + m_b, m_c + m_d) sum_k c^k(m_a, m_c) c^k(m_d, m_b) F^k,
 * F^0 = 7C/5, F^2 = 49B + 7C, F^4 = 63C/5. Field along the fourfold axis (Delta = 10 Dq): m = 0 at 6 Dq, +-1 at -4 Dq,
 * +-2 at 1 Dq, and 5 Dq between +2 and -2.
 */
export interface Operators {
  readonly size: number;
  readonly field: Float64Array;
  readonly racahB: Float64Array;
  readonly racahC: Float64Array;
  readonly spinSquared: Float64Array;
  readonly eElectrons: Float64Array;
}

/** One group of eigenvalues that agree, with the traces of operators over its eigenvectors. */
export interface Shelf {
  readonly energy: number;
  readonly states: number;
  readonly spinSquared: number;
  readonly eElectrons: number;
  readonly field: number;
  readonly racahB: number;
  readonly racahC: number;
}

const projections = [-2, -1, 0, 1, 2];

/** Spin orbital p: m_l = p mod 5 - 2, spin up below 5. */
const spinOf = (p: number): number => (p < 5 ? 1 : -1);
const projectionOf = (p: number): number => projections[p % 5]!;

/** A determinant with its sign, or null where the operator destroys it. */
type Signed = { readonly mask: number; readonly sign: number } | null;

function passed(mask: number, p: number): number {
  let count = 0;
  for (let bit = 0; bit < p; bit++) if (mask & (1 << bit)) count++;
  return count % 2 === 0 ? 1 : -1;
}

function annihilate(state: Signed, p: number): Signed {
  return state && state.mask & (1 << p) ? { mask: state.mask & ~(1 << p), sign: state.sign * passed(state.mask, p) } : null;
}

function create(state: Signed, p: number): Signed {
  return state && !(state.mask & (1 << p)) ? { mask: state.mask | (1 << p), sign: state.sign * passed(state.mask, p) } : null;
}

function determinantsOf(electrons: number): number[] {
  return Array.from({ length: 1024 }, (_, mask) => mask).filter((mask) => mask.toString(2).replaceAll('0', '').length === electrons);
}

/** Coefficients of B and C in <ab|cd> over spin orbitals. */
function repulsion(a: number, b: number, c: number, d: number): { readonly racahB: number; readonly racahC: number } {
  const [ma, mb, mc, md] = [a, b, c, d].map(projectionOf);
  if (spinOf(a) !== spinOf(c) || spinOf(b) !== spinOf(d) || ma! + mb! !== mc! + md!) return { racahB: 0, racahC: 0 };
  const [rank0, rank2, rank4] = ([0, 2, 4] as const).map((k) => condonShortleyTable(k, ma!, mc!) * condonShortleyTable(k, md!, mb!));
  return { racahB: 49 * rank2!, racahC: (7 / 5) * rank0! + 7 * rank2! + (63 / 5) * rank4! };
}

/** One-electron elements between orbitals of equal spin: field in units of Delta, and the number operator of the e orbitals. */
function oneElectron(m: number, n: number): { readonly field: number; readonly eElectrons: number } {
  if (m === n) return [{ field: 0.6, eElectrons: 1 }, { field: -0.4, eElectrons: 0 }, { field: 0.1, eElectrons: 0.5 }][Math.abs(m)]!;
  return Math.abs(m) === 2 && m === -n ? { field: 0.5, eElectrons: 0.5 } : { field: 0, eElectrons: 0 };
}

export function fullOperators(electrons: number): Operators {
  const masks = determinantsOf(electrons);
  const size = masks.length;
  const place = new Map(masks.map((mask, i) => [mask, i]));
  const [field, racahB, racahC, spinSquared, eElectrons] = Array.from({ length: 5 }, () => new Float64Array(size * size)) as
    [Float64Array, Float64Array, Float64Array, Float64Array, Float64Array];
  const add = (matrix: Float64Array, target: Signed, column: number, value: number): void => {
    if (target && value !== 0) matrix[place.get(target.mask)! * size + column]! += target.sign * value;
  };
  const all = Array.from({ length: 10 }, (_, p) => p);
  masks.forEach((mask, column) => {
    const start: Signed = { mask, sign: 1 };
    for (const c of all) {
      const without = annihilate(start, c);
      if (!without) continue;
      for (const a of all) {
        if (spinOf(a) !== spinOf(c)) continue;
        const value = oneElectron(projectionOf(a), projectionOf(c));
        const target = create(without, a);
        add(field, target, column, value.field);
        add(eElectrons, target, column, value.eElectrons);
      }
      for (const d of all) {
        const emptied = annihilate(without, d);
        if (!emptied) continue;
        for (const b of all)
          for (const a of all) {
            const value = repulsion(a, b, c, d);
            if (value.racahB === 0 && value.racahC === 0) continue;
            const target = create(create(emptied, b), a);
            add(racahB, target, column, value.racahB / 2);
            add(racahC, target, column, value.racahC / 2);
          }
      }
    }
    // S^2 = S- S+ + Sz(Sz + 1); S+ raises one electron of any orbital.
    const sz = all.reduce((sum, p) => sum + (mask & (1 << p) ? spinOf(p) / 2 : 0), 0);
    add(spinSquared, start, column, sz * (sz + 1));
    for (let p = 0; p < 5; p++)
      for (let q = 0; q < 5; q++) {
        const raised = create(annihilate(start, p + 5), p);
        add(spinSquared, create(annihilate(raised, q), q + 5), column, 1);
      }
  });
  return { size, field, racahB, racahC, spinSquared, eElectrons };
}

function traceOver(matrix: Float64Array, vectors: Matrix, first: number, last: number): number {
  const size = vectors.rows;
  let trace = 0;
  for (let k = first; k <= last; k++) {
    const vector = vectors.getColumn(k);
    for (let i = 0; i < size; i++) {
      if (vector[i] === 0) continue;
      let row = 0;
      for (let j = 0; j < size; j++) row += matrix[i * size + j]! * vector[j]!;
      trace += vector[i]! * row;
    }
  }
  return trace;
}

/** Eigenvalues as they stand, ascending and absolute, with their eigenvectors. */
function diagonalise(operators: Operators, sign: number, delta: number, racahB: number, racahC: number) {
  const { size } = operators;
  const rows = Array.from({ length: size }, (_, i) =>
    Array.from({ length: size }, (__, j) => {
      const at = i * size + j;
      return sign * delta * operators.field[at]! + racahB * operators.racahB[at]! + racahC * operators.racahC[at]!;
    }));
  const solved = new EigenvalueDecomposition(new Matrix(rows), { assumeSymmetric: true });
  return { values: solved.realEigenvalues, vectors: solved.eigenvectorMatrix };
}

/** Every eigenvalue above the lowest, ascending: one entry a state. */
export function fullEnergies(operators: Operators, sign: number, delta: number, racahB: number, racahC: number): number[] {
  const { values } = diagonalise(operators, sign, delta, racahB, racahC);
  return values.map((value) => value - values[0]!);
}

/** Eigenvalues gathered where neighbours lie within `tolerance`, with traces over each group; energies above the lowest. */
export function fullShelves(operators: Operators, sign: number, delta: number, racahB: number, racahC: number, tolerance: number): Shelf[] {
  const { values, vectors } = diagonalise(operators, sign, delta, racahB, racahC);
  const shelves: Shelf[] = [];
  for (let first = 0; first < values.length;) {
    let last = first;
    while (last + 1 < values.length && values[last + 1]! - values[last]! <= tolerance) last++;
    shelves.push({
      energy: values[first]! - values[0]!, states: last - first + 1,
      spinSquared: traceOver(operators.spinSquared, vectors, first, last),
      eElectrons: traceOver(operators.eElectrons, vectors, first, last),
      field: sign * traceOver(operators.field, vectors, first, last),
      racahB: traceOver(operators.racahB, vectors, first, last),
      racahC: traceOver(operators.racahC, vectors, first, last),
    });
    first = last + 1;
  }
  return shelves;
}
