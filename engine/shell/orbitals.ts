import type { Matrix3 } from './rotations.ts';

/**
 * The five real d orbitals, in the order yz, xz, xy (t2) then z2, x2-y2 (e), as traceless symmetric
 * tensors normalised to Tr(QQ) = 1. A rotation R turns the tensor Q into R Q R^T.
 */
export const orbitalCount = 5;

/** Orbitals 0 to 2 are t2, 3 and 4 are e. */
export const t2Orbitals = 0b00111;

const half = Math.SQRT1_2;
const third = 1 / Math.sqrt(6);

const tensors: readonly Matrix3[] = [
  [[0, 0, 0], [0, 0, half], [0, half, 0]],
  [[0, 0, half], [0, 0, 0], [half, 0, 0]],
  [[0, half, 0], [half, 0, 0], [0, 0, 0]],
  [[-third, 0, 0], [0, -third, 0], [0, 0, 2 * third]],
  [[half, 0, 0], [0, -half, 0], [0, 0, 0]],
];

/** How the orbitals are made of the spherical harmonics Y2m: [m, real, imaginary] (Condon-Shortley phases). */
export const harmonics: readonly (readonly (readonly [number, number, number])[])[] = [
  [[-1, 0, half], [1, 0, half]],
  [[-1, half, 0], [1, -half, 0]],
  [[-2, 0, half], [2, 0, -half]],
  [[0, 1, 0]],
  [[-2, half, 0], [2, half, 0]],
];

function multiply(a: Matrix3, b: Matrix3): number[][] {
  return a.map((row) => [0, 1, 2].map((j) => row[0]! * b[0]![j]! + row[1]! * b[1]![j]! + row[2]! * b[2]![j]!));
}

function transpose(a: Matrix3): number[][] {
  return [0, 1, 2].map((i) => [0, 1, 2].map((j) => a[j]![i]!));
}

function traceOfProduct(a: Matrix3, b: Matrix3): number {
  let sum = 0;
  for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) sum += a[i]![j]! * b[j]![i]!;
  return sum;
}

/** The 5 x 5 matrix of a rotation on the orbitals, row-major: element [i * 5 + j] = Tr(Q_i R Q_j R^T). */
export function rotateOrbitals(rotation: Matrix3): Float64Array {
  const matrix = new Float64Array(25);
  const back = transpose(rotation);
  tensors.forEach((tensor, j) => {
    const turned = multiply(multiply(rotation, tensor), back);
    tensors.forEach((other, i) => {
      matrix[i * orbitalCount + j] = traceOfProduct(other, turned);
    });
  });
  return matrix;
}

/**
 * The three components of orbital angular momentum on the orbitals, divided by i: real antisymmetric
 * 5 x 5 matrices, row-major, up to one common sign (only products of two of them are used).
 */
export function angularMomentum(): readonly Float64Array[] {
  const generators: Matrix3[] = [
    [[0, 0, 0], [0, 0, -1], [0, 1, 0]],
    [[0, 0, 1], [0, 0, 0], [-1, 0, 0]],
    [[0, -1, 0], [1, 0, 0], [0, 0, 0]],
  ];
  return generators.map((generator) => {
    const matrix = new Float64Array(25);
    tensors.forEach((tensor, j) => {
      const forward = multiply(generator, tensor);
      const backward = multiply(tensor, generator);
      const commutator = forward.map((row, a) => row.map((value, b) => value - backward[a]![b]!));
      tensors.forEach((other, i) => {
        matrix[i * orbitalCount + j] = traceOfProduct(other, commutator);
      });
    });
    return matrix;
  });
}
