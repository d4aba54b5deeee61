// Where something stands in a table or its mapping, in the words of a fault.

import type { FaultCode } from '../content/codes.ts';
import type { Fault } from '../content/types.ts';
import { columnLetter } from './mapping.ts';

/** Rows and columns count from 1 as a spreadsheet shows them; column null: the whole row. */
export type TablePlace =
  | { readonly row: number; readonly column: number | null; readonly header: string }
  | { readonly line: number; readonly column: number; readonly field: string };

/** Codes of faults of the table itself; those of records keep theirs. content/README.md lists both. */
export type TableCode = 'TABLE_SYNTAX' | 'TABLE_COLUMNS' | 'TABLE_CONFLICT' | 'TABLE_POINT' | 'TABLE_CELL' | 'RECORD_EXISTS';

export interface TableFinding {
  readonly code: FaultCode | TableCode;
  readonly found: string;
  readonly expected: string;
  readonly mend: string;
}

export interface TableNames {
  readonly table: string;
  readonly mapping: string;
}

/** A fault at a place of the table or of its mapping, with the names under which the user knows the files. */
export function tableFault(place: TablePlace, { code, found, expected, mend }: TableFinding, names: TableNames, about = ''): Fault {
  const clip = (text: string): string => (text.length > 300 ? `${text.slice(0, 300)} ...` : text).replace(/[\u0000-\u001f\u007f-\u009f\u2028\u2029]+/g, ' ');
  const words = { code, found: clip(found), expected: clip(expected), mend: clip(mend) };
  if ('line' in place) return { file: names.mapping, line: place.line, column: place.column, field: `every-row.${place.field}`, ...words };
  const column = place.column === null ? '' : `, column ${columnLetter(place.column - 1)}${place.header === '' ? '' : ` "${clip(place.header)}"`}`;
  return { file: names.table, line: place.row, column: place.column ?? 1, field: `row ${place.row}${column}${place.column === null && about !== '' ? `, ${about}` : ''}`, ...words };
}
