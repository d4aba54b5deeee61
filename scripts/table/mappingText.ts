// A mapping as the file that a person looks through.

import { quotedText, typedText } from '#engine';
import { notTaken } from './fields.ts';
import { columnLetter } from './mapping.ts';
import type { Column, Mapping } from './mapping.ts';

export interface ColumnRemark {
  /** Some cells of the column, and what was guessed from them. */
  readonly remark: string;
}

/** The fields that every record needs, with an example each. */
const needed: readonly (readonly [names: readonly string[], example: string])[] = [
  [['formula'], 'formula: "[Cr(NH3)6]3+"'],
  [['geometry'], 'geometry: octahedral'],
  [['phase'], 'phase: solution'],
  [['source.notebook', 'source.cite'], 'source.notebook: "old table, sheet 1"'],
];

/** Example lines for the needed fields that no column and no value for every row gives. */
export function missingFields({ columns, everyRow }: Mapping): string[] {
  const given = new Set([...columns.map(({ field }) => field), ...Object.keys(everyRow)]);
  const lines = needed.filter(([names]) => !names.some((name) => given.has(name))).map(([, example]) => example);
  const quotes = columns.some(({ field }) => field.startsWith('quoted.'));
  return quotes && !given.has('quoted.cite') ? [...lines, 'quoted.cite: author-1999'] : lines;
}

/** The text of a mapping file. `table` is the name of the table; `remarks` go with the columns. */
export function mappingText(mapping: Mapping, table: string, remarks: readonly ColumnRemark[]): string {
  const lacking = missingFields(mapping);
  const everyRow = Object.entries(mapping.everyRow);
  return [
    `# How the columns of ${table} become records, as guessed. Look each line through, mend what is wrong, then write  confirmed: yes`,
    '# and run the command again. Every field that a column may hold stands in content/README.md under "Tables".',
    `confirmed: ${mapping.confirmed ? 'yes' : 'no'}`,
    `rows: ${mapping.rows}`.padEnd(34) + '# band: one row a band; complex: one row a spectrum, its bands side by side',
    `separator: ${mapping.separator}`.padEnd(34) + '# comma, semicolon or tab',
    `decimal: ${mapping.decimal}`.padEnd(34) + '# point or comma: what stands before decimals',
    `encoding: ${mapping.encoding}`,
    `header: ${mapping.header}`.padEnd(34) + '# number of the row with the headers; rows above it are passed over',
    `continued: ${mapping.continued}`.padEnd(34) + '# blank: a row without id and formula goes on with the complex above it',
    ...(mapping.missing.length === 0 ? [] : [`missing: [${mapping.missing.map(quotedText).join(', ')}]`.padEnd(34) + '# cells that mean: nothing known']),
    'columns:',
    ...mapping.columns.map((column, index) => `  - ${columnText(column)}${remarks[index] === undefined ? '' : `  # ${remarks[index].remark}`}`),
    ...(everyRow.length === 0 ? [] : ['every-row:', ...everyRow.map(([field, value]) => `  ${typedText(field)}: ${typedText(value)}`)]),
    ...(lacking.length === 0 ? [] : [
      '# Every record needs these too, and no column gives them. Take the # away and write what holds for every row:',
      ...(everyRow.length === 0 ? ['#every-row:'] : []),
      ...lacking.map((line) => `#  ${line}`),
    ]),
    '',
  ].join('\n');
}

function columnText({ index, header, field, unit, number, term, brackets }: Column): string {
  const parts = [
    `column: ${columnLetter(index)}`,
    ...(header === '' ? [] : [`header: ${typedText(header)}`]),
    `field: ${typedText(field)}`,
    ...(unit === null || field === notTaken ? [] : [`unit: ${typedText(unit)}`]),
    ...(number === null ? [] : [`number: ${number}`]),
    ...(term === null ? [] : [`term: ${typedText(term)}`]),
    ...(brackets === 'epsilon' ? ['brackets: epsilon'] : []),
  ];
  return `{ ${parts.join(', ')} }`;
}
