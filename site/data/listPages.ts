import { ROWS_A_PAGE } from './collection.ts';
import { inParts } from './parts.ts';
import type { SeriesShown } from './seriesFigures.ts';

/** One built page of a long list. */
export interface ListPage<Row> {
  readonly number: number;
  readonly rows: readonly Row[];
  /** Every page of the list; one alone needs no links. */
  readonly pages: readonly { readonly number: number; readonly path: string }[];
}

/**
 * A page of a list with the series that belong to it; a series may go on where the list has ended.
 * @param path of the first page, from the site's root
 */
export function listPage<Row>(list: readonly Row[], series: readonly SeriesShown[], number: number, path: string): ListPage<Row> {
  return {
    number, rows: inParts(list, ROWS_A_PAGE)[number - 1]?.rows ?? [],
    pages: Array.from({ length: pageCount(list.length, series) }, (_, index) => ({ number: index + 1, path: pagePath(path, index + 1) })),
  };
}

/** The same page with its rows made into others. */
export const mapped = <Row, Shown>({ rows, ...page }: ListPage<Row>, shown: (row: Row) => Shown): ListPage<Shown> => ({ ...page, rows: rows.map(shown) });

export const pagePath = (path: string, number: number): string => (number === 1 ? path : `${path}page/${number}/`);

/** Parts of each series on one page. */
const PARTS_A_PAGE = 2;

/** How many pages a list fills, and the series that go on over them. */
const pageCount = (rows: number, series: readonly SeriesShown[]): number =>
  Math.max(1, Math.ceil(rows / ROWS_A_PAGE), ...series.map(({ part }) => Math.ceil(part / PARTS_A_PAGE)));

/** Numbers of the pages after the first. */
export const laterPages = (rows: number, series: readonly SeriesShown[]): readonly number[] => Array.from({ length: pageCount(rows, series) - 1 }, (_, index) => index + 2);

/** The parts of series that stand on a page. */
export const seriesOnPage = (series: readonly SeriesShown[], number: number): readonly SeriesShown[] => series.filter(({ part }) => Math.ceil(part / PARTS_A_PAGE) === number);
