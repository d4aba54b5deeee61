/**
 * A CSV file after RFC 4180: CRLF line ends, quotes where needed. An empty cell is null, a quoted empty one an empty text.
 * Numbers keep every digit.
 */
export function csvText(header: readonly string[], rows: readonly (readonly (string | number | null)[])[]): string {
  return [header, ...rows].map((row) => `${row.map(cellText).join(',')}\r\n`).join('');
}

function cellText(cell: string | number | null): string {
  if (cell === '') return '""';
  const text = cell === null ? '' : String(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
