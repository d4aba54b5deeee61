// The plain way to the same levels: library eigenvalues of the same blocks.

import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { shellBlocks } from '#engine';
import type { Block, FieldParameters, Geometry } from '#engine';

/** Where a level stands: its block and its place from 0 in it. */
export interface Place {
  readonly block: Block;
  readonly index: number;
}

/** Throws RangeError for a label that names no level of the ion. */
export function placeOf(label: string, electrons: number, geometry: Geometry): Place {
  const parts = /^([a-z])(\d)([A-Z]\d?)/.exec(label);
  const block = shellBlocks(electrons).find(({ multiplicity, irrep }) => parts && multiplicity === Number(parts[2]) && irrep === parts[3]);
  if (!parts || !block) throw new RangeError(`label: "${label}" is no level of d${electrons} ${geometry}`);
  return { block, index: parts[1]!.charCodeAt(0) - 97 };
}

/** One block at one point, row by row. */
export function blockMatrix({ field, racahB, racahC }: Block, sign: 1 | -1, at: FieldParameters): Float64Array {
  return field.map((element, i) => sign * at.delta * element + at.racahB * racahB[i]! + at.racahC * racahC[i]!);
}

/** Eigenvalues by ml-matrix, ascending. */
export function libraryEigenvalues(block: Block, sign: 1 | -1, at: FieldParameters): number[] {
  return new EigenvalueDecomposition(Matrix.from1DArray(block.size, block.size, blockMatrix(block, sign, at)), { assumeSymmetric: true }).realEigenvalues.sort((a, b) => a - b);
}
