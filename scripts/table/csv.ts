// Tables as text: RFC 4180 with any of the three usual separators, any line ends, quotes that hold line ends.

export const separators = { comma: ',', semicolon: ';', tab: '\t' } as const;
export type SeparatorName = keyof typeof separators;

/** Where a table cannot be read; row and column count from 1. */
export interface CsvFault {
  readonly row: number;
  readonly column: number;
  readonly found: string;
  readonly expected: string;
  readonly mend: string;
}

export interface CsvText {
  /** Cells as typed, row by row; a row of one empty cell is an empty line. */
  readonly rows: readonly (readonly string[])[];
  readonly fault: CsvFault | null;
}

/**
 * Reads a table. Never throws; what stands behind a fault is not read.
 * A quote within an unquoted cell stands for itself, as spreadsheets take it.
 */
export function readCsv(text: string, separator: string): CsvText {
  const rows: string[][] = [];
  let row: string[] = [];
  let at = 0;
  const endCell = (cell: string): void => { row.push(cell); };
  const endRow = (): void => { rows.push(row); row = []; };
  const lineEnd = (index: number): number => (text[index] === '\r' && text[index + 1] === '\n' ? 2 : text[index] === '\n' || text[index] === '\r' ? 1 : 0);
  while (at < text.length) {
    let cell = '';
    if (text[at] === '"') {
      const place = { row: rows.length + 1, column: row.length + 1 };
      at += 1;
      for (;;) {
        const close = text.indexOf('"', at);
        if (close < 0) {
          return { rows, fault: { ...place, found: `"${text.slice(at, at + 40)}`, expected: 'a closing quote', mend: 'close the quote that this cell opens, or write a quote within a quoted cell twice' } };
        }
        cell += text.slice(at, close);
        at = close + 1;
        if (text[at] !== '"') break;
        cell += '"';
        at += 1;
      }
      if (at < text.length && text[at] !== separator && lineEnd(at) === 0) {
        return { rows, fault: { ...place, found: `"${cell.slice(0, 40)}"${text.slice(at, at + 10)}`, expected: 'the end of the cell behind its closing quote', mend: 'write a quote within a quoted cell twice, or check the separator' } };
      }
    } else {
      let end = at;
      while (end < text.length && text[end] !== separator && lineEnd(end) === 0) end += 1;
      cell = text.slice(at, end);
      at = end;
    }
    endCell(cell);
    if (at >= text.length) endRow();
    else if (text[at] === separator) {
      at += 1;
      if (at >= text.length) {
        endCell('');
        endRow();
      }
    } else {
      at += lineEnd(at);
      endRow();
    }
  }
  return { rows, fault: null };
}

/** A table's text: line ends of RFC 4180, quotes where they are needed. */
export function csvText(rows: readonly (readonly string[])[], separator: string): string {
  const cellText = (cell: string): string => (cell.includes(separator) || /["\r\n]/.test(cell) || cell !== cell.trim() ? `"${cell.replaceAll('"', '""')}"` : cell);
  return rows.map((row) => `${row.length === 1 && row[0] === '' ? '""' : row.map(cellText).join(separator)}\r\n`).join('');
}

/** The separator that cuts the rows into the most columns, alike in most rows. */
export function guessedSeparator(text: string): SeparatorName {
  const score = (name: SeparatorName): number => {
    const { rows, fault } = readCsv(text, separators[name]);
    const widths = rows.filter((row) => row.some((cell) => cell.trim() !== '')).slice(0, 50).map((row) => row.length);
    const usual = mostFrequent(widths);
    const alike = widths.filter((width) => width === usual).length / Math.max(widths.length, 1);
    return usual <= 1 ? 0 : (fault === null ? 1 : 0.5) * alike * (1 + Math.min(usual, 40) / 100);
  };
  // The semicolon first: a table with decimal commas is cut by commas too.
  const names: readonly SeparatorName[] = ['semicolon', 'tab', 'comma'];
  return names.reduce((best, name) => (score(name) > score(best) ? name : best), 'semicolon' as SeparatorName);
}

function mostFrequent(numbers: readonly number[]): number {
  const counts = new Map<number, number>();
  for (const one of numbers) counts.set(one, (counts.get(one) ?? 0) + 1);
  return [...counts].reduce((best, entry) => (entry[1] > best[1] ? entry : best), [0, 0])[0];
}
