/**
 * Reads a CSV text after RFC 4180: cells as texts, null for an empty cell without quotes. Line ends may be CRLF or LF.
 * @throws Error with the line where quotes are left open or stand within a cell
 */
export function readCsv(text: string): (string | null)[][] {
  const rows: (string | null)[][] = [];
  let row: (string | null)[] = [];
  let line = 1;
  let at = text.startsWith('\ufeff') ? 1 : 0;
  while (at < text.length) {
    let cell: string | null;
    if (text[at] === '"') {
      const end = closingQuote(text, at, line);
      cell = text.slice(at + 1, end).replaceAll('""', '"');
      line += cell.split('\n').length - 1;
      at = end + 1;
    } else {
      const end = cellEnd(text, at);
      const plain = text.slice(at, end);
      if (plain.includes('"')) throw new Error(`line ${line}: a quotation mark within a cell`);
      cell = plain === '' ? null : plain;
      at = end;
    }
    row.push(cell);
    if (text[at] === ',') {
      at += 1;
      if (at === text.length) row.push(null);
      continue;
    }
    if (at < text.length && text[at] !== '\r' && text[at] !== '\n') throw new Error(`line ${line}: text behind a closing quotation mark`);
    at += text.startsWith('\r\n', at) ? 2 : 1;
    line += 1;
    rows.push(row);
    row = [];
  }
  if (row.length > 0) rows.push(row);
  return rows;
}

function closingQuote(text: string, open: number, line: number): number {
  for (let at = text.indexOf('"', open + 1); at >= 0; at = text.indexOf('"', at + 2)) if (text[at + 1] !== '"') return at;
  throw new Error(`line ${line}: a quotation mark is not closed`);
}

function cellEnd(text: string, from: number): number {
  let at = from;
  while (at < text.length && text[at] !== ',' && text[at] !== '\n' && text[at] !== '\r') at += 1;
  return at;
}
