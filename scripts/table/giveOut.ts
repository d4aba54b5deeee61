// npm run table -- out FILE.csv: the records become a table.

import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { typedComplex } from '../content/typedRecord.ts';
import type { Collection } from '../content/types.ts';
import { csvText, separators } from './csv.ts';
import { tableRows, wholeMapping } from './give.ts';
import type { NamedComplex } from './give.ts';
import { lostTexts } from './lost.ts';
import type { Mapping } from './mapping.ts';

export interface GivenOut {
  readonly complexes: number;
  readonly rows: number;
  readonly columns: number;
  /** Counts, by field, of texts that the table does not hold. */
  readonly lost: ReadonlyMap<string, number>;
}

/** Writes the table; `like` is the mapping of a table in whose form it is written, or the settings of a whole one. Never writes over a file. */
export function giveOut(file: string, content: string, collection: Collection, like: Mapping | Pick<Mapping, 'rows' | 'separator' | 'decimal'>): GivenOut {
  const records = typedRecords(content, collection);
  const mapping = 'columns' in like ? like : wholeMapping(records, like);
  const rows = tableRows(records, mapping);
  // Spreadsheets know UTF-8 by its byte order mark.
  writeFileSync(file, `\ufeff${csvText(rows, separators[mapping.separator])}`, { flag: 'wx' });
  return { complexes: records.length, rows: rows.length - mapping.header, columns: mapping.columns.length, lost: lostTexts(records, rows, mapping, collection.ligands) };
}

/** The records as they are typed, in the order of their ids. Expects a collection without faults. */
export function typedRecords(content: string, { complexes }: Collection): NamedComplex[] {
  return complexes.map(({ id, file }) => {
    const complex = typedComplex(readFileSync(join(content, file), 'utf8'));
    if (complex === null) throw new Error(`${file} changed while it was read`);
    return { id, complex };
  });
}
