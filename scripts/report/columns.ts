/** Rows of text as lines with aligned columns, two spaces between them; no blanks at the end of a line. */
export function aligned(rows: readonly (readonly string[])[], indent = '  '): string[] {
  const widths: number[] = [];
  for (const row of rows) row.forEach((cell, i) => { widths[i] = Math.max(widths[i] ?? 0, [...cell].length); });
  return rows.map((row) => (indent + row.map((cell, i) => cell + ' '.repeat((widths[i] ?? 0) - [...cell].length)).join('  ')).trimEnd());
}

/** "1 record", "2 records". */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
