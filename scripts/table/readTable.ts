// A whole table read into judged records.

import type { Collection, Fault } from '../content/types.ts';
import { assemble } from './assemble.ts';
import { readCsv, separators } from './csv.ts';
import { decoded } from './encoding.ts';
import { gathered, judge, knownRecords } from './judge.ts';
import type { Judged } from './judge.ts';
import { columnLetter } from './mapping.ts';
import type { Mapping } from './mapping.ts';
import { tableFault } from './places.ts';
import type { TableNames, TablePlace } from './places.ts';
import { readRows } from './readRows.ts';

export interface ReadTable {
  readonly records: readonly Judged[];
  /** Every fault of table and records, by row and column. */
  readonly faults: readonly Fault[];
  /** Ids of records in whose rows nothing is at fault. */
  readonly good: ReadonlySet<string>;
  readonly rows: number;
}

/** Reads a table's bytes by its mapping against the collection. */
export function readTable(bytes: Uint8Array, mapping: Mapping, placeOf: (field: string) => { line: number; column: number }, collection: Collection, names: TableNames): ReadTable {
  const none = { records: [], good: new Set<string>(), rows: 0 };
  const text = decoded(bytes, mapping.encoding);
  if (text === null) {
    const place: TablePlace = { row: 1, column: 1, header: '' };
    return { ...none, faults: [tableFault(place, { code: 'NOT_UTF8', found: `bytes that are not ${mapping.encoding}`, expected: `a table in ${mapping.encoding}, as the mapping declares`, mend: 'declare another encoding in the mapping, or save the table as CSV UTF-8' }, names)] };
  }
  const { rows, fault } = readCsv(text, separators[mapping.separator]);
  if (fault !== null) return { ...none, faults: [tableFault({ row: fault.row, column: fault.column, header: '' }, { ...fault, code: 'TABLE_SYNTAX' }, names)] };
  const changed = headerFaults(rows[mapping.header - 1] ?? [], mapping, names);
  if (changed.length > 0) return { ...none, faults: changed };
  const read = readRows(rows, mapping, (field) => ({ ...placeOf(field), field }));
  const cells = read.findings.map(({ place, finding }) => tableFault(place, finding, names));
  const known = knownRecords(collection);
  const records = assemble(read.rows, mapping, collection.ligands).map((one) => judge(one, known, names));
  const faultyRows = new Set(read.findings.flatMap(({ place }) => ('row' in place ? [place.row] : [])));
  const good = new Set(records.filter(({ faults, assembled }) => faults.length === 0 && !assembled.rows.some((row) => faultyRows.has(row))).map(({ id }) => id));
  // A cell that could not be read was told once: that its field is missing is no second fault.
  const others = records.flatMap(({ faults, assembled }) => (assembled.rows.some((row) => faultyRows.has(row)) ? faults.filter(({ code }) => code !== 'MISSING_FIELD') : faults));
  return { records, faults: byPlace(gathered([...cells, ...others])), good, rows: read.rows.length };
}

/** The table's headers against those that the mapping was made for. */
function headerFaults(headers: readonly string[], mapping: Mapping, names: TableNames): Fault[] {
  const faults: Fault[] = [];
  const claims = new Map<string, number>();
  for (const { index, header, field, number } of mapping.columns) {
    const place: TablePlace = { row: mapping.header, column: index + 1, header };
    const found = headers[index]?.trim();
    if (found === undefined || (header !== '' && found !== header)) {
      faults.push(tableFault(place, {
        code: 'TABLE_COLUMNS', found: found === undefined ? `no column ${columnLetter(index)}` : `"${found}"`, expected: `the header "${header}", as in the mapping`,
        mend: 'mend the mapping, or delete it and run the command again: it writes a new one',
      }, names));
    }
    const claim = `${field} ${number ?? ''}`;
    const earlier = claims.get(claim);
    if (field !== 'leave-out' && earlier !== undefined) {
      faults.push(tableFault(place, {
        code: 'TABLE_COLUMNS', found: `a second column for ${field}${number === null ? '' : `, number ${number}`}`, expected: `one; column ${columnLetter(earlier)} is taken for it already`,
        mend: 'give the two different numbers in the mapping, or leave one out',
      }, names));
    } else claims.set(claim, index);
  }
  return faults;
}

function byPlace(faults: readonly Fault[]): Fault[] {
  return [...faults].sort((a, b) => (a.file < b.file ? -1 : a.file > b.file ? 1 : 0) || a.line - b.line || a.column - b.column || (a.code < b.code ? -1 : a.code > b.code ? 1 : 0));
}
