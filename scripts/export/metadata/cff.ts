// CITATION.cff, Citation File Format 1.2.0.

import { descriptionOf, nameParts, setIdentifier, versionCode, versionWords } from './publication.ts';
import type { Publication } from './publication.ts';

/**
 * The text of CITATION.cff. A person's name is divided only where it was typed "Family, Given"; any other stands whole under `name`,
 * which the format allows. A licence id in the SPDX list goes under `license`.
 */
export function citationCff(publication: Publication): string {
  const { people, group, title, doi, date, licence, address } = publication;
  const authors = people.length === 0 ? [{ name: group, orcid: null }] : people;
  return [
    'cff-version: 1.2.0',
    `message: ${quoted(`Cite this collection as ${versionWords(publication)}.`)}`,
    'type: dataset',
    `title: ${quoted(title)}`,
    `abstract: ${quoted(descriptionOf(publication))}`,
    'authors:',
    ...authors.flatMap(({ name, orcid }) => {
      const parts = nameParts(name);
      const lines = parts === null ? [`name: ${quoted(name)}`] : [`family-names: ${quoted(parts.family)}`, `given-names: ${quoted(parts.given)}`];
      return [...lines, ...(orcid === null ? [] : [`orcid: ${quoted(`https://orcid.org/${orcid}`)}`])].map((line, index) => `${index === 0 ? '  - ' : '    '}${line}`);
    }),
    `version: ${quoted(versionCode(publication))}`,
    `date-released: ${quoted(date)}`,
    `license: ${quoted(licence)}`,
    `url: ${quoted(address)}`,
    ...(doi === null ? [] : [`doi: ${quoted(doi)}`]),
    'identifiers:',
    `  - type: ${doi === null ? 'url' : 'doi'}`,
    `    value: ${quoted(doi ?? setIdentifier(publication))}`,
    `    description: ${quoted(doi === null ? 'Address of the collection. DOI not yet assigned.' : 'DOI of the collection.')}`,
    'keywords:',
    ...keywords.map((word) => `  - ${quoted(word)}`),
    '',
  ].join('\n');
}

/** Words under which the set is found. */
export const keywords: readonly string[] = [
  'ligand-field theory', 'electronic spectra', 'transition-metal complexes', 'Racah parameters', 'spectrochemical series', 'nephelauxetic series',
];

/** A double-quoted YAML scalar; YAML 1.2 reads JSON strings. */
function quoted(text: string): string {
  return JSON.stringify(text);
}
