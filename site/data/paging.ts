/** Rows that a built page of a long list holds. */
export const ROWS_A_PAGE = 200;

/** Numbers of the pages that so many rows take, from 1; a list without rows is one page. */
export function pageNumbers(rows: number): readonly number[] {
  return Array.from({ length: Math.max(1, Math.ceil(rows / ROWS_A_PAGE)) }, (_, index) => index + 1);
}

export function rowsOfPage<Row>(rows: readonly Row[], page: number): readonly Row[] {
  return rows.slice((page - 1) * ROWS_A_PAGE, page * ROWS_A_PAGE);
}

/** Links between the pages of a list; none where it is one page. */
export function pageLinks(rows: number, path: (page: number) => string): readonly { readonly number: number; readonly path: string }[] {
  const numbers = pageNumbers(rows);
  return numbers.length < 2 ? [] : numbers.map((number) => ({ number, path: path(number) }));
}
