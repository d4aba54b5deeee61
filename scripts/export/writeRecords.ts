import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { bandsCsv } from './bands.ts';
import { aboutJson, citedRecords } from './describe.ts';
import { citationBibtex, citationRis } from './metadata/cite.ts';
import { recordAddress } from './metadata/publication.ts';
import { complexPath } from './paths.ts';
import type { Published } from './published.ts';
import { recordJson, rowFinder } from './record.ts';

/**
 * Writes the files beside the page of each complex into the site's folder: record.json, record.yaml, bands.csv, cite.bib, cite.ris.
 * @throws Error where a record was changed after it was fitted: its text would not be that of the numbers
 */
export function writeRecords({ tables, rows, publication }: Published, content: string, site: string): void {
  const find = rowFinder(tables, rows);
  const complexes = new Map((rows['complex'] ?? []).map((row) => [String(row['id']), row]));
  for (const record of citedRecords(rows)) {
    const complex = complexes.get(record.id)!;
    const folder = join(site, complexPath(record.id));
    mkdirSync(folder, { recursive: true });
    const about = { $schema: '../../data/record.schema.json', ...aboutJson(publication, recordAddress(publication, record)) };
    const put = (name: string, text: string | Buffer): void => writeFileSync(join(folder, name), text);
    put('record.json', `${JSON.stringify(recordJson(tables, rows, find, complex, about))}\n`);
    put('record.yaml', typedRecord(content, String(complex['file']), String(complex['hash'])));
    put('bands.csv', bandsCsv({ complex, find }));
    put('cite.bib', citationBibtex(publication, record));
    put('cite.ris', citationRis(publication, record));
  }
}

function typedRecord(content: string, file: string, hash: string): Buffer {
  const bytes = readFileSync(join(content, file));
  if (createHash('sha256').update(bytes).digest('hex') !== hash) throw new Error(`${file} was changed while the site was built; run the build again`);
  return bytes;
}
