import { describe, expect, test } from 'vitest';
import { minors, orbitalSets } from '../../../engine/shell/determinants.ts';
import { angularMomentum, rotateOrbitals } from '../../../engine/shell/orbitals.ts';
import { irrepDimension, irreps, rotations } from '../../../engine/shell/rotations.ts';
import type { Irrep, Matrix3 } from '../../../engine/shell/rotations.ts';

const keyOf = (matrix: Matrix3): string => matrix.map((row) => row.map((x) => x + 0).join(' ')).join('; ');
const times = (a: Matrix3, b: Matrix3): number[][] => a.map((row) => [0, 1, 2].map((j) => row.reduce((sum, x, k) => sum + x * b[k]![j]!, 0)));
const transposed = (a: Matrix3): number[][] => [0, 1, 2].map((i) => [0, 1, 2].map((j) => a[j]![i]!));
const traceOf = (a: Matrix3): number => a[0]![0]! + a[1]![1]! + a[2]![2]!;
const determinantOf = (m: Matrix3): number =>
  [0, 1, 2].reduce((sum, j) => sum + m[0]![j]! * (m[1]![(j + 1) % 3]! * m[2]![(j + 2) % 3]! - m[1]![(j + 2) % 3]! * m[2]![(j + 1) % 3]!), 0);

function product(a: Float64Array, b: Float64Array, size: number): Float64Array {
  return Float64Array.from({ length: size * size }, (_, at) => {
    let sum = 0;
    for (let k = 0; k < size; k++) sum += a[Math.floor(at / size) * size + k]! * b[k * size + (at % size)]!;
    return sum;
  });
}

function largestDifference(a: ArrayLike<number>, b: ArrayLike<number>): number {
  expect(a.length).toBe(b.length);
  let worst = 0;
  for (let i = 0; i < a.length; i++) worst = Math.max(worst, Math.abs(a[i]! - b[i]!));
  return worst;
}

/** Class of a rotation of the cube: by its angle, and for half turns by the parity of the axis exchange. */
function classOf(matrix: Matrix3, parity: number): string {
  const trace = traceOf(matrix);
  if (trace === 3) return 'E';
  if (trace === 0) return 'C3';
  if (trace === 1) return 'C4';
  return parity === 1 ? 'C2' : "C2'";
}

/** Character table of the group O, as printed in any text on group theory (e.g. F. A. Cotton, Chemical Applications of Group Theory), from memory. */
const characters: Readonly<Record<Irrep, Readonly<Record<string, number>>>> = {
  A1: { E: 1, C3: 1, C2: 1, C4: 1, "C2'": 1 },
  A2: { E: 1, C3: 1, C2: 1, C4: -1, "C2'": -1 },
  E: { E: 2, C3: -1, C2: 2, C4: 0, "C2'": 0 },
  T1: { E: 3, C3: 0, C2: -1, C4: 1, "C2'": -1 },
  T2: { E: 3, C3: 0, C2: -1, C4: -1, "C2'": 1 },
};

describe('the rotations of the cube', () => {
  test('are 24 different proper rotations in the five classes of the group O', () => {
    expect(new Set(rotations.map(({ matrix }) => keyOf(matrix))).size).toBe(24);
    const sizes: Record<string, number> = {};
    for (const { matrix, parity } of rotations) {
      expect(determinantOf(matrix)).toBe(1);
      expect(keyOf(times(matrix, transposed(matrix)))).toBe('1 0 0; 0 1 0; 0 0 1');
      const name = classOf(matrix, parity);
      sizes[name] = (sizes[name] ?? 0) + 1;
    }
    expect(sizes).toEqual({ E: 1, C3: 8, C2: 3, C4: 6, "C2'": 6 });
  });

  test('form a group: every product of two is one of them, and parities multiply', () => {
    const known = new Map(rotations.map(({ matrix, parity }) => [keyOf(matrix), parity]));
    for (const a of rotations) for (const b of rotations) expect(known.get(keyOf(times(a.matrix, b.matrix)))).toBe(a.parity * b.parity);
    for (const { matrix } of rotations) expect(known.has(keyOf(transposed(matrix)))).toBe(true);
  });
});

describe('the d orbitals under rotation', () => {
  const matrices = rotations.map(({ matrix }) => rotateOrbitals(matrix));

  test('each matrix is orthogonal and mixes neither t2 with e', () => {
    for (const matrix of matrices) {
      const back = Float64Array.from({ length: 25 }, (_, at) => matrix[(at % 5) * 5 + Math.floor(at / 5)]!);
      expect(largestDifference(product(matrix, back, 5), Float64Array.from({ length: 25 }, (_, at) => (at % 6 === 0 ? 1 : 0)))).toBeLessThan(1e-14);
      for (let t2 = 0; t2 < 3; t2++) for (let e = 3; e < 5; e++) expect(Math.abs(matrix[t2 * 5 + e]!) + Math.abs(matrix[e * 5 + t2]!)).toBeLessThan(1e-15);
    }
  });

  test('a product of rotations is represented by the product of their matrices', () => {
    for (const a of rotations) for (const b of rotations)
      expect(largestDifference(product(rotateOrbitals(a.matrix), rotateOrbitals(b.matrix), 5), rotateOrbitals(times(a.matrix, b.matrix)))).toBeLessThan(1e-14);
  });

  test('yz, xz, xy have the characters of T2, and z2, x2-y2 those of E', () => {
    rotations.forEach(({ matrix, parity }, r) => {
      const name = classOf(matrix, parity);
      expect(matrices[r]![0]! + matrices[r]![6]! + matrices[r]![12]!).toBeCloseTo(characters.T2[name]!, 14);
      expect(matrices[r]![18]! + matrices[r]![24]!).toBeCloseTo(characters.E[name]!, 14);
    });
  });

  test('the angular momentum of a d electron has l(l + 1) = 6, and its components commute to one another', () => {
    const [x, y, z] = angularMomentum();
    const sum = [x!, y!, z!].map((l) => product(l, l, 5)).reduce((a, b) => a.map((value, i) => value + b[i]!));
    // The matrices are l divided by i, so their squares add up to -6.
    expect(largestDifference(sum, Float64Array.from({ length: 25 }, (_, at) => (at % 6 === 0 ? -6 : 0)))).toBeLessThan(1e-14);
    const commutator = product(x!, y!, 5).map((value, i) => value - product(y!, x!, 5)[i]!);
    const same = largestDifference(commutator, z!);
    const opposite = largestDifference(commutator, z!.map((value) => -value));
    expect(Math.min(same, opposite)).toBeLessThan(1e-14);
  });
});

describe.each([1, 2, 3, 4])('%i electrons of one spin under rotation', (size) => {
  const count = orbitalSets(size).length;
  const matrices = rotations.map(({ matrix }) => minors(rotateOrbitals(matrix), size));

  test('a product of rotations is represented by the product of the matrices of minors', () => {
    for (let a = 0; a < 24; a += 5) for (let b = 0; b < 24; b++) {
      const both = minors(rotateOrbitals(times(rotations[a]!.matrix, rotations[b]!.matrix)), size);
      expect(largestDifference(product(matrices[a]!, matrices[b]!, count), both)).toBeLessThan(1e-13);
    }
  });

  test('projectors made with the character table are idempotent, mutually exclusive, and together leave nothing out', () => {
    const projectors = irreps.map((irrep) => {
      const projector = new Float64Array(count * count);
      rotations.forEach(({ matrix, parity }, r) => {
        const weight = (irrepDimension[irrep] * characters[irrep][classOf(matrix, parity)]!) / 24;
        for (let i = 0; i < projector.length; i++) projector[i]! += weight * matrices[r]![i]!;
      });
      return projector;
    });
    projectors.forEach((a, i) => projectors.forEach((b, j) => {
      expect(largestDifference(product(a, b, count), i === j ? a : new Float64Array(count * count))).toBeLessThan(1e-13);
    }));
    const sum = projectors.reduce((a, b) => a.map((value, i) => value + b[i]!));
    expect(largestDifference(sum, Float64Array.from({ length: count * count }, (_, at) => (at % (count + 1) === 0 ? 1 : 0)))).toBeLessThan(1e-13);
    projectors.forEach((projector, i) => {
      const trace = Array.from({ length: count }, (_, at) => projector[at * (count + 1)]!).reduce((a, b) => a + b);
      expect(trace / irrepDimension[irreps[i]!]).toBeCloseTo(Math.round(trace / irrepDimension[irreps[i]!]), 12);
    });
  });
});

test('five electrons of one spin fill the shell and are not turned at all', () => {
  for (const { matrix } of rotations) expect(minors(rotateOrbitals(matrix), 5)[0]).toBeCloseTo(1, 14);
  expect([...minors(rotateOrbitals(rotations[7]!.matrix), 0)]).toEqual([1]);
});
