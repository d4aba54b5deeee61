// npm run table -- in FILE.csv: a table's rows become records.

import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Collection, Fault } from '../content/types.ts';
import { UsageError } from '../runCommand.ts';
import { guessMapping } from './guess.ts';
import { readMapping } from './mapping.ts';
import type { Mapping } from './mapping.ts';
import { mappingText } from './mappingText.ts';
import type { Judged } from './judge.ts';
import { tableFault } from './places.ts';
import type { TableNames } from './places.ts';
import { readTable } from './readTable.ts';

export interface TableFiles {
  readonly table: string;
  readonly mapping: string;
  readonly content: string;
}

export interface TakenIn {
  readonly mapping: Mapping | null;
  /** true where the mapping was guessed and written by this run. */
  readonly guessed: boolean;
  readonly rows: number;
  readonly records: readonly Judged[];
  readonly faults: readonly Fault[];
  /** Ids of records that were written, or would be. */
  readonly written: readonly string[];
  /** Ids of records that stand in the content folder already, word for word. */
  readonly unchanged: readonly string[];
  /** true where files were written. */
  readonly done: boolean;
}

export interface TakeInOrder {
  readonly files: TableFiles;
  /** The files as the user names them. */
  readonly names: TableNames;
  readonly collection: Collection;
  /** Write the records without faults although others have some. */
  readonly partly: boolean;
  /** Write nothing. */
  readonly show: boolean;
}

/**
 * Writes the guessed mapping where there is none; writes the records where the mapping is confirmed and nothing is at fault.
 * @throws UsageError for a table without any row
 */
export function takeIn({ files, names, collection, partly, show }: TakeInOrder): TakenIn {
  const bytes = readFileSync(files.table);
  const guessed = !existsSync(files.mapping);
  const guess = guessed ? guessMapping(bytes) : null;
  if (guess?.mapping.columns.length === 0) throw new UsageError(`${names.table} holds no row.`);
  if (guess !== null && !show) writeFileSync(files.mapping, mappingText(guess.mapping, names.table.split('/').at(-1)!, guess.remarks), { flag: 'wx' });
  const typed = guess === null ? readMapping(files.mapping, names.mapping) : null;
  if (typed?.ok === false) return { mapping: null, guessed, rows: 0, records: [], faults: typed.faults, written: [], unchanged: [], done: false };
  const mapping = guess?.mapping ?? (typed?.ok === true ? typed.mapping : null)!;
  const placeOf = typed?.ok === true ? typed.placeOf : () => ({ line: 1, column: 1 });
  const { records, faults, good, rows } = readTable(bytes, mapping, placeOf, collection, names);

  const present = new Set(records.filter(({ id }) => existsSync(target(files, id))).map(({ id }) => id));
  const unchanged = records.filter(({ id, text }) => present.has(id) && readFileSync(target(files, id), 'utf8') === text).map(({ id }) => id);
  const other = records.filter(({ id }) => present.has(id) && !unchanged.includes(id));
  const all = [...faults, ...other.map((record) => existsFault(record, names))];
  const written = records.filter(({ id }) => good.has(id) && !present.has(id)).map(({ id }) => id);
  const done = !show && mapping.confirmed && (all.length === 0 || partly);
  if (done) {
    mkdirSync(join(files.content, 'complexes'), { recursive: true });
    for (const { id, text } of records) if (written.includes(id)) writeFileSync(target(files, id), text, { flag: 'wx' });
  }
  return { mapping, guessed, rows, records, faults: all, written, unchanged, done };
}

function target({ content }: TableFiles, id: string): string {
  return join(content, 'complexes', `${id}.yaml`);
}

function existsFault({ id, assembled }: Judged, names: TableNames): Fault {
  const place = assembled.origin.get('id') ?? { row: assembled.rows[0]!, column: null, header: '' };
  return tableFault(place, {
    code: 'RECORD_EXISTS', found: `the id "${id}"`, expected: 'an id of its own: complexes/' + `${id}.yaml is there already and says something else`,
    mend: 'give the rows another id, add the new spectra to that file by hand, or take the rows out of the table',
  }, names, 'id');
}
