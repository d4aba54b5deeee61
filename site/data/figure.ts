import type { Table } from './table.ts';
import type { Parts } from './typeset.ts';

/** A figure with all that belongs to it. */
export interface FigureShown {
  readonly id: string;
  readonly svg: string;
  readonly title: string;
  /** The title typeset, where it holds a formula. */
  readonly titleParts?: Parts;
  readonly caption: readonly string[];
  /** What the letters in the drawing stand for. */
  readonly keys?: readonly { readonly key: string; readonly formula: Parts; readonly path: string; readonly measurement: string }[];
  readonly source: string;
  readonly table: Table | null;
  /** Files to keep, from the site's root; empty where the figure is saved from the page only. */
  readonly files: readonly { readonly name: string; readonly path: string }[];
}

/** A figure that is also published as files, with its numbers at full precision. */
export interface PublishedFigure extends FigureShown {
  /** null: the numbers stand in the file of another figure, of which this is a further part. */
  readonly csv: string | null;
}

/** Id of the picture of a series figure on the series page. */
export const plateId = (id: string): string => `${id}-plate`;

export function figureFiles(id: string): FigureShown['files'] {
  return [{ name: 'SVG', path: `figures/${id}.svg` }, { name: 'CSV', path: `figures/${id}.csv` }];
}
