// The small file that says how a table's columns become records: its fields, and how it is read.

import { existsSync, readFileSync } from 'node:fs';
import { z } from 'zod';
import { readDraft } from '../content/draft.ts';
import { nodeAt, pathAt } from '../content/node.ts';
import type { Place } from '../content/node.ts';
import { createReporter, sortedFaults } from '../content/report.ts';
import { choice, count, text } from '../content/schema/leaves.ts';
import type { Fault } from '../content/types.ts';
import { readYaml } from '../content/yaml/read.ts';
import { separators } from './csv.ts';
import type { SeparatorName } from './csv.ts';
import { encodings } from './encoding.ts';
import type { Encoding } from './encoding.ts';
import { columnFieldNames, isField, notTaken } from './fields.ts';

export interface Column {
  /** Index of the column, from 0. */
  readonly index: number;
  readonly header: string;
  readonly field: string;
  /** Unit of cells without one; null: each cell carries its own, or the field takes none. */
  readonly unit: string | null;
  /** Which band, or which set of quoted values, of its row; null where a row has one. */
  readonly number: number | null;
  /** Term of every band of the column, where the header names it. */
  readonly term: string | null;
  /** What stands in round brackets behind a position. */
  readonly brackets: 'uncertainty' | 'epsilon';
}

export interface Mapping {
  readonly confirmed: boolean;
  readonly rows: 'band' | 'complex';
  readonly separator: SeparatorName;
  readonly decimal: 'point' | 'comma';
  readonly encoding: Encoding;
  /** Number of the row with the headers, from 1; the rows above are passed over. */
  readonly header: number;
  /** blank: a row without id and formula goes on with the complex of the row above. */
  readonly continued: 'repeated' | 'blank';
  /** Cells that mean that nothing is known. */
  readonly missing: readonly string[];
  readonly columns: readonly Column[];
  /** Values, by field, for rows that say nothing else. */
  readonly everyRow: Readonly<Record<string, string>>;
}

const column = z.strictObject({
  column: text().meta({ description: 'letter of the column', examples: ['A'] }),
  header: text().optional().meta({ description: 'its header, as a check', examples: ['"Complex"'] }),
  field: choice(columnFieldNames).meta({ description: 'the field that it holds', examples: ['formula'] }),
  unit: text().optional().meta({ description: 'unit of cells that carry none', examples: ['cm-1'] }),
  number: count(1, 200).optional().meta({ description: 'which band or set of quoted values of its row', examples: ['1'] }),
  term: text().optional().meta({ description: 'term of every band of the column', examples: ['4T2g'] }),
  brackets: choice(['uncertainty', 'epsilon']).optional().meta({ description: 'what stands in brackets behind a position', examples: ['uncertainty'] }),
});

const schema = z.strictObject({
  confirmed: choice(['yes', 'no']).meta({ description: 'yes once a person has looked it through', examples: ['yes'] }),
  rows: choice(['band', 'complex']).meta({ description: 'what a row holds', examples: ['band'] }),
  separator: choice(Object.keys(separators) as [SeparatorName, ...SeparatorName[]]).meta({ description: 'what stands between cells', examples: ['semicolon'] }),
  decimal: choice(['point', 'comma']).meta({ description: 'what stands before decimals', examples: ['comma'] }),
  encoding: choice(encodings).optional().meta({ description: 'encoding of the file', examples: ['utf-8'] }),
  header: count(1, 1000).optional().meta({ description: 'number of the row with the headers', examples: ['1'] }),
  continued: choice(['repeated', 'blank']).optional().meta({ description: 'blank where a row without complex goes on with the one above', examples: ['blank'] }),
  missing: z.array(text()).max(20).optional().meta({ description: 'cells that mean that nothing is known', examples: ['["-", n.d.]'] }),
  columns: z.array(column).min(1).max(300).meta({ description: 'the columns', examples: ['[{ column: A, field: formula }]'] }),
  'every-row': z.record(text(), text()).optional().meta({ description: 'values for rows that say nothing else', examples: ['{ geometry: octahedral }'] }),
});

export type ReadMapping =
  | { readonly ok: true; readonly mapping: Mapping; /** Place of a value of every-row. */ readonly placeOf: (field: string) => Place }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** Reads a mapping file; null where there is none. `shown` is the name that faults carry. */
export function readMapping(path: string, shown: string): ReadMapping | null {
  if (!existsSync(path)) return null;
  const { root, faults } = readYaml(readFileSync(path, 'utf8'));
  const report = createReporter(shown, root);
  for (const { place, finding, path: at } of faults) report.atPlace(place, at ?? (root === null ? [] : pathAt(root, place)), finding);
  if (root === null) {
    if (faults.length === 0) report.at([], { code: 'FILE_EMPTY', found: 'a file without any field', expected: 'a mapping of columns', mend: 'delete the file and run the command again: it writes a new one' });
    return { ok: false, faults: report.faults };
  }
  const draft = readDraft(schema, root, report) as z.output<typeof schema>;
  for (const field of Object.keys(draft?.['every-row'] ?? {})) {
    if (!isField(field) || field === 'position.u') report.at(['every-row', field], { code: 'UNKNOWN_FIELD', found: `"${field}"`, expected: `one of ${columnFieldNames.filter((name) => name !== notTaken && name !== 'position.u').join(', ')}`, mend: 'write the name of a field' });
  }
  draft?.columns?.forEach((one, index) => {
    if (one?.column !== undefined && columnIndex(one.column) === null) report.at(['columns', index, 'column'], { code: 'WRONG_SHAPE', found: `"${one.column}"`, expected: 'the letter of a column, as spreadsheets name it: A, B, ..., Z, AA', mend: 'write the letter' });
  });
  if (report.faults.length > 0) return { ok: false, faults: sortedFaults(report.faults) };
  const placeOf = (field: string): Place => nodeAt(root, ['every-row', field]) ?? { line: 1, column: 1 };
  return { ok: true, mapping: mappingOf(draft), placeOf };
}

function mappingOf(typed: z.output<typeof schema>): Mapping {
  return {
    confirmed: typed.confirmed === 'yes',
    rows: typed.rows, separator: typed.separator, decimal: typed.decimal,
    encoding: typed.encoding ?? 'utf-8',
    header: typed.header ?? 1,
    continued: typed.continued ?? 'repeated',
    missing: typed.missing ?? [],
    columns: typed.columns.map((one) => ({
      index: columnIndex(one.column)!, header: one.header ?? '', field: one.field, unit: one.unit ?? null, number: one.number ?? null,
      term: one.term ?? null, brackets: one.brackets ?? 'uncertainty',
    })),
    everyRow: typed['every-row'] ?? {},
  };
}

/** "A" for 0, "AA" for 26: columns as spreadsheets name them. */
export function columnLetter(index: number): string {
  return index < 26 ? String.fromCharCode(65 + index) : columnLetter(Math.floor(index / 26) - 1) + columnLetter(index % 26);
}

function columnIndex(letters: string): number | null {
  if (!/^[A-Za-z]{1,2}$/.test(letters)) return null;
  return [...letters.toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
}
