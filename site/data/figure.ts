import { complexPath } from './paths.ts';
import type { Table } from './table.ts';
import type { Parts } from './typeset.ts';

export interface FigureFile {
  readonly name: string;
  readonly path: string;
  /** Made in the browser from the drawing at `path`: its name within that drawing. */
  readonly madeHere?: string;
}

/** A figure with all that belongs to it. */
export interface FigureShown {
  readonly id: string;
  readonly svg: string;
  /** Too heavy to stand in a page: shown there as a picture file, `plateId`, without a name or a place for each mark. */
  readonly asPicture?: boolean;
  readonly title: string;
  /** The title typeset, where it holds a formula. */
  readonly titleParts?: Parts;
  readonly caption: readonly string[];
  /** What the letters in the drawing stand for. */
  readonly keys?: readonly { readonly key: string; readonly formula: Parts; readonly path: string; readonly measurement: string }[];
  readonly source: string;
  readonly table: Table | null;
  /** Files to keep, from the site's root; each in its own format. */
  readonly files: readonly FigureFile[];
  /** Id of the table on the page in which the figure's numbers stand, where the figure has none of its own. */
  readonly numbersIn?: string;
}

/** A figure that is also published as files, with its numbers at full precision. */
export interface PublishedFigure extends FigureShown {
  /** null: the numbers stand in the file of another figure, of which this is a further part. */
  readonly csv: string | null;
}

/** Id of the picture that stands for a figure where the figure itself does not. */
export const plateId = (id: string): string => `${id}-plate`;

/** Width and height of a drawing. */
export function drawingSize(svg: string): { readonly width: number; readonly height: number } {
  const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg) ?? [];
  return { width: Number(width), height: Number(height) };
}

/** Path of the picture that stands for a figure. */
export const platePath = (id: string): string => `figures/${plateId(id)}.svg`;

/** @param table id of the figure in whose file the numbers stand, where this is a further part of it */
export function figureFiles(id: string, table = id): FigureShown['files'] {
  return [{ name: 'SVG', path: `figures/${id}.svg` }, { name: 'PNG', path: `figures/${id}.png` }, { name: 'CSV', path: `figures/${table}.csv` }];
}

/** Files of a figure of a complex's own page: the sheet that holds it, the picture made of it in the browser, the numbers in the table of bands. */
export function ownFigureFiles(complex: string, id: string): FigureShown['files'] {
  const drawing = `${complexPath(complex)}${/-(?:strip|readings)$/.test(id) ? 'strip' : 'levels'}.svg`;
  return [{ name: 'SVG', path: drawing }, { name: 'PNG', path: drawing, madeHere: id }, { name: 'CSV', path: `${complexPath(complex)}bands.csv` }];
}
