/**
 * The 24 proper rotations of the cube, as 3 x 3 matrices acting on (x, y, z), and the first row of each
 * irreducible representation of the group O.
 *
 * A rotation of the cube is a signed permutation of the axes with determinant +1. The diagonal element of
 * the first row of an irreducible representation is all that a row projector needs:
 * A1: 1; A2: the parity of the axis permutation; E: the z2-z2 element of the d functions;
 * T1: the zz element of the vector; T2: A2 x T1.
 */

export type Irrep = 'A1' | 'A2' | 'E' | 'T1' | 'T2';

export const irreps: readonly Irrep[] = ['A1', 'A2', 'E', 'T1', 'T2'];

export const irrepDimension: Readonly<Record<Irrep, number>> = { A1: 1, A2: 1, E: 2, T1: 3, T2: 3 };

export type Matrix3 = readonly (readonly number[])[];

export interface Rotation {
  readonly matrix: Matrix3;
  /** +1 for the rotations that permute the axes evenly (1, 3 C2, 8 C3), -1 for 6 C4 and 6 C2'. */
  readonly parity: number;
}

const axisPermutations = [
  { order: [0, 1, 2], parity: 1 },
  { order: [1, 2, 0], parity: 1 },
  { order: [2, 0, 1], parity: 1 },
  { order: [1, 0, 2], parity: -1 },
  { order: [0, 2, 1], parity: -1 },
  { order: [2, 1, 0], parity: -1 },
] as const;

function cubeRotations(): Rotation[] {
  const found: Rotation[] = [];
  for (const { order, parity } of axisPermutations) {
    for (const sx of [1, -1]) {
      for (const sy of [1, -1]) {
        // The third sign is the one that makes the determinant +1.
        const signs = [sx, sy, parity * sx * sy];
        const matrix = order.map((column, row) => {
          const line = [0, 0, 0];
          line[column] = signs[row]!;
          return line;
        });
        found.push({ matrix, parity });
      }
    }
  }
  return found;
}

export const rotations: readonly Rotation[] = cubeRotations();
