// FAIR signposting: typed links in the heads of pages, and the same for all pages in one link set (RFC 9264).

import { recordFiles } from '../files.ts';
import type { JsonObject } from '../json.ts';
import { licenceAddress, recordAddress, setIdentifier } from './publication.ts';
import type { CitedRecord, Publication } from './publication.ts';

/** A link of a page's head. */
export interface TypedLink {
  readonly rel: string;
  readonly href: string;
  readonly type?: string;
}

function common({ people, licence }: Publication): TypedLink[] {
  return [
    { rel: 'license', href: licenceAddress(licence) },
    { rel: 'type', href: 'https://schema.org/Dataset' },
    ...people.flatMap(({ orcid }) => (orcid === null ? [] : [{ rel: 'author', href: `https://orcid.org/${orcid}` }])),
  ];
}

/** Links of the data page, which is the landing page of the set. */
export function setLinks(publication: Publication): readonly TypedLink[] {
  const data = `${publication.address}data/`;
  return [
    { rel: 'cite-as', href: publication.doi === null ? data : setIdentifier(publication) },
    { rel: 'type', href: 'https://schema.org/AboutPage' },
    ...common(publication),
    { rel: 'describedby', href: `${data}datacite.xml`, type: 'application/xml' },
    { rel: 'describedby', href: `${data}datapackage.json`, type: 'application/json' },
    { rel: 'describedby', href: `${data}cite.bib`, type: 'application/x-bibtex' },
    { rel: 'item', href: `${data}collection.sqlite`, type: 'application/vnd.sqlite3' },
    { rel: 'item', href: `${data}collection.json`, type: 'application/json' },
    { rel: 'item', href: `${data}results.csv`, type: 'text/csv' },
    { rel: 'linkset', href: `${data}linkset.json`, type: 'application/linkset+json' },
  ];
}

/** Links of a record's page. */
export function recordLinks(publication: Publication, record: Pick<CitedRecord, 'id'>): readonly TypedLink[] {
  const address = recordAddress(publication, record);
  return [
    { rel: 'cite-as', href: address },
    { rel: 'type', href: 'https://schema.org/AboutPage' },
    ...common(publication),
    { rel: 'collection', href: `${publication.address}data/`, type: 'text/html' },
    ...recordFiles.map(({ name, mediaType }) => ({ rel: name.startsWith('cite.') ? 'describedby' : 'item', href: `${address}${name}`, type: mediaType })),
  ];
}

/** linkset.json: the links of the data page and of every record's page. */
export function linkset(publication: Publication, records: readonly Pick<CitedRecord, 'id'>[]): JsonObject {
  const own = setLinks(publication).filter(({ rel }) => rel !== 'linkset');
  return {
    linkset: [
      linkContext(`${publication.address}data/`, own),
      ...records.map((record) => linkContext(recordAddress(publication, record), recordLinks(publication, record))),
    ],
  };
}

function linkContext(anchor: string, links: readonly TypedLink[]): JsonObject {
  const relations = [...new Set(links.map(({ rel }) => rel))];
  return {
    anchor,
    ...Object.fromEntries(relations.map((relation) => [relation, links.filter(({ rel }) => rel === relation).map(({ href, type }) => (type === undefined ? { href } : { href, type }))])),
  };
}
