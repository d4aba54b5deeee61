import { type PackedRow, SLICE_ROWS, packRow } from '../client/collection/rowSlice.ts';
import { orderedResults, resultRowOf } from './collection.ts';
import type { CollectionTree } from './tree.ts';

/** Numbers of the files of rows, from 1. */
export function rowSlices(tree: CollectionTree): readonly number[] {
  return Array.from({ length: Math.ceil(orderedResults(tree).length / SLICE_ROWS) }, (_, place) => place + 1);
}

/** One file of rows, in the order of the book. */
export function rowSlice(tree: CollectionTree, number: number): readonly PackedRow[] {
  return orderedResults(tree).slice((number - 1) * SLICE_ROWS, number * SLICE_ROWS).map((measurement) => packRow(resultRowOf(measurement)));
}
