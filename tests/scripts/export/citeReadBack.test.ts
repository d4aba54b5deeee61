import { createRequire } from 'node:module';
import { afterAll, describe, expect, it } from 'vitest';
import { places } from '../../../scripts/places.ts';
import { citedRecords } from '../../../scripts/export/describe.ts';
import { citationBibtex, citationRis } from '../../../scripts/export/metadata/cite.ts';
import type { CitedRecord, Publication } from '../../../scripts/export/metadata/publication.ts';
import { recordAddress, versionCode } from '../../../scripts/export/metadata/publication.ts';
import { exported } from './built.ts';
import { publications, record } from './publications.ts';

/** What a reference manager's parser makes of an entry. */
interface Read {
  readonly title: string;
  readonly author: readonly { readonly given?: string; readonly family?: string; readonly literal?: string }[];
  readonly issued: { readonly 'date-parts': readonly (readonly number[])[] };
  readonly version: string;
  readonly URL: string;
  readonly DOI?: string;
  readonly note: string;
  readonly publisher: string;
}

// The parsers come without types, and their modules for import name files that are not there.
const load = createRequire(import.meta.url);
const { Cite } = load('@citation-js/core') as { readonly Cite: new (text: string) => { readonly data: readonly Read[] } };
load('@citation-js/plugin-bibtex');
load('@citation-js/plugin-ris');

const built = exported(places.content);
afterAll(() => built.remove());
const collections: readonly (readonly [string, Publication, readonly CitedRecord[]])[] = [
  ...publications.map(([what, publication]) => [what, publication, [record]] as const), ['as it stands in content/', built.publication, citedRecords(built.rows)] as const,
];

/** Names of one author are divided by the reader, or whole. */
const names = (read: Read): string[] => read.author.map(({ given, family, literal }) => literal ?? [given, family].filter((part) => part !== undefined).join(' ')).sort();
const plain = (text: string): string => text.replace(/\s+/g, ' ');

describe.each(collections)('citations of a collection %s, read back by an independent parser', (_, publication, records) => {
  it.each([['BibTeX', citationBibtex], ['RIS', citationRis]] as const)('as %s name title, people, version, date, address and DOI, of the set and of every record', (format, write) => {
    expect(records.length).toBeGreaterThan(0);
    for (const cited of [null, ...records]) {
      const entries = new Cite(write(publication, cited)).data;
      expect(entries).toHaveLength(1);
      const read = entries[0]!;
      const [year, month, day] = publication.date.split('-').map(Number);
      expect(plain(read.title), read.URL).toBe(cited === null ? plain(publication.title) : plain(`${cited.formula}, record ${cited.id}, in: ${publication.title}`));
      expect(read).toMatchObject({ URL: cited === null ? publication.address : recordAddress(publication, cited), version: versionCode(publication), publisher: plain(publication.group) });
      expect(read.DOI ?? null).toBe(publication.doi);
      expect(read.issued['date-parts'][0]).toEqual(format === 'RIS' ? [year, month, day] : [year, month]);
      expect(read.note).toContain(publication.date);
      expect(names(read)).toEqual((publication.people.length === 0 ? [format === 'RIS' ? publication.group.replaceAll(',', ' –') : publication.group] : publication.people.map(({ name }) => name.split(', ').reverse().join(' '))).sort());
    }
  });
});
