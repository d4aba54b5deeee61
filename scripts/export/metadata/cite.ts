// Citations of the set and of one record: text, BibTeX, RIS. Each names version and date.

import { bibtexEntry } from './bibtex.ts';
import { doiWords, recordAddress, versionCode, versionWords } from './publication.ts';
import type { CitedRecord, Publication } from './publication.ts';
import { risEntry } from './ris.ts';

const invented = 'Invented demonstration data, not to be cited as measurements.';

interface Cited {
  readonly title: string;
  readonly address: string;
  readonly key: string;
}

function citedOf(publication: Publication, record: CitedRecord | null): Cited {
  const key = `${new URL(publication.address).hostname.split('.')[0]}-${publication.release}`.replace(/[^A-Za-z0-9.-]+/g, '-');
  if (record === null) return { title: publication.title, address: publication.address, key };
  return { title: `${record.formula}, record ${record.id}, in: ${publication.title}`, address: recordAddress(publication, record), key: `${key}-${record.id}` };
}

function authors({ people, group }: Publication): readonly string[] {
  return people.length === 0 ? [group] : people.map(({ name }) => name);
}

/** A citation in words, of the set or of one record. */
export function citationText(publication: Publication, record: CitedRecord | null = null): string {
  const { title, address } = citedOf(publication, record);
  const names = authors(publication);
  const group = publication.people.length === 0 ? '' : ` ${publication.group}.`;
  return `${names.join(', ')}: ${title}, ${versionWords(publication)}.${group} ${address} DOI: ${doiWords(publication)}.${publication.demonstration ? ` ${invented}` : ''}`;
}

/** A citation for BibTeX. */
export function citationBibtex(publication: Publication, record: CitedRecord | null = null): string {
  const { title, address, key } = citedOf(publication, record);
  const personal = publication.people.length > 0;
  return bibtexEntry('misc', key, [
    ['author', authors(publication), personal ? 'people' : 'group'],
    ['title', title], ['publisher', publication.group], ['year', publication.date.slice(0, 4)], ['month', String(Number(publication.date.slice(5, 7)))],
    ['version', versionCode(publication)], ['url', address], ['doi', publication.doi],
    ['note', `${capital(versionWords(publication))}. DOI: ${doiWords(publication)}. Licence: ${publication.licence}.${publication.demonstration ? ` ${invented}` : ''}`],
  ]);
}

/** A citation as RIS. */
export function citationRis(publication: Publication, record: CitedRecord | null = null): string {
  const { title, address, key } = citedOf(publication, record);
  // RIS divides every author at a comma: a group's name with commas would be read as family and given names. PB has it as it is.
  const names = publication.people.length === 0 ? [publication.group.replaceAll(',', ' –')] : authors(publication);
  return risEntry('DATA', [
    ['ID', key], ...names.map((name) => ['AU', name] as const), ['TI', title], ['PB', publication.group],
    ['PY', publication.date.slice(0, 4)], ['DA', publication.date.replaceAll('-', '/')], ['ET', versionCode(publication)],
    ['UR', address], ['DO', publication.doi], ['C1', publication.licence],
    ['N1', `${capital(versionWords(publication))}. DOI: ${doiWords(publication)}.${publication.demonstration ? ` ${invented}` : ''}`],
  ]);
}

function capital(text: string): string {
  return text.slice(0, 1).toUpperCase() + text.slice(1);
}
