/** The records of a CSV text (RFC 4180) as they stand, quotes and all; a line break inside quotes ends no record. */
export function csvRecords(text: string): readonly string[] {
  const records: string[] = [];
  let start = 0;
  let quoted = false;
  for (let place = 0; place < text.length; place += 1) {
    const sign = text[place];
    if (sign === '"') quoted = !quoted;
    else if (sign === '\n' && !quoted) {
      records.push(text.slice(start, place).replace(/\r$/, ''));
      start = place + 1;
    }
  }
  if (start < text.length) records.push(text.slice(start));
  return records;
}

/** The first two fields of a CSV record, which name complex and measurement; ids hold no quotes and no commas. */
const nameOf = (record: string): string => record.split(',', 2).map((field) => field.replace(/^"|"$/g, '')).join('/');

/** The lines of the whole results whose measurement is wanted, heading first. */
export function csvOf(results: string, wanted: ReadonlySet<string>): string {
  const [head = '', ...records] = csvRecords(results);
  return [head, ...records.filter((record) => wanted.has(nameOf(record)))].join('\r\n') + '\r\n';
}

/** The whole results as JSON with the wanted measurements only. */
export function jsonOf(results: string, wanted: ReadonlySet<string>): string {
  const whole = JSON.parse(results) as { readonly results: readonly { readonly complex: string; readonly measurement: string }[] };
  return `${JSON.stringify({ ...whole, results: whole.results.filter(({ complex, measurement }) => wanted.has(`${complex}/${measurement}`)) }, null, 1)}\n`;
}
