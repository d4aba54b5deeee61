import { ROWS_A_PAGE } from './collection.ts';
import { inParts } from './parts.ts';
import { ROWS_A_FIGURE, type SeriesShown } from './seriesFigures.ts';

/** One built page of a long list. */
export interface ListPage<Row> {
  readonly number: number;
  readonly rows: readonly Row[];
  /** Every page of the list; one alone needs no links. */
  readonly pages: readonly { readonly number: number; readonly path: string }[];
}

/** @param path of the first page, from the site's root */
export function listPage<Row>(list: readonly Row[], number: number, path: string): ListPage<Row> {
  const parts = inParts(list, ROWS_A_PAGE);
  return { number, rows: parts[number - 1]!.rows, pages: parts.map((_, index) => ({ number: index + 1, path: pagePath(path, index + 1) })) };
}

/** The same page with its rows made into others. */
export const mapped = <Row, Shown>({ rows, ...page }: ListPage<Row>, shown: (row: Row) => Shown): ListPage<Shown> => ({ ...page, rows: rows.map(shown) });

export const pagePath = (path: string, number: number): string => (number === 1 ? path : `${path}page/${number}/`);

/** Numbers of the pages after the first that a list of so many rows fills. */
export const laterPages = (rows: number): readonly number[] => Array.from({ length: Math.max(1, Math.ceil(rows / ROWS_A_PAGE)) - 1 }, (_, index) => index + 2);

const PARTS_A_PAGE = ROWS_A_PAGE / ROWS_A_FIGURE;

/** The parts of series that stand on a page: as many of their rows as the page has of the list. */
export const seriesOnPage = (series: readonly SeriesShown[], number: number): readonly SeriesShown[] => series.filter(({ part }) => Math.ceil(part / PARTS_A_PAGE) === number);
