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
  readonly source: string;
  readonly table: Table | null;
  /** Files to keep, from the site's root; empty where the figure is saved from the page only. */
  readonly files: readonly { readonly name: string; readonly path: string }[];
}

/** A figure that is also published as files, with its numbers at full precision. */
export interface PublishedFigure extends FigureShown {
  readonly csv: string;
}

export function figureFiles(id: string): FigureShown['files'] {
  return [{ name: 'SVG', path: `figures/${id}.svg` }, { name: 'CSV', path: `figures/${id}.csv` }];
}

/** Rows as CSV (RFC 4180): numbers in full, absent ones empty. */
export function csvText(head: readonly string[], rows: readonly (readonly (string | number | null)[])[]): string {
  const field = (value: string | number | null): string => {
    const text = value === null ? '' : String(value);
    return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
  };
  return `${[head, ...rows].map((row) => row.map(field).join(',')).join('\r\n')}\r\n`;
}
