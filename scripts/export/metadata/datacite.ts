// DataCite metadata (schema 4.6) of the set, ready to deposit: as the JSON of its REST API and as XML.

import { keywords } from './cff.ts';
import type { Json, JsonObject } from '../json.ts';
import { descriptionOf, licenceAddress, nameParts, versionCode } from './publication.ts';
import type { Person, Publication } from './publication.ts';
import { element, xmlStart } from './xml.ts';

/** What DataCite asks for where an identifier is still to be assigned (its Appendix 3, unknown information). */
export const toBeAssigned = '(:tba)';

interface DatedType {
  readonly date: string;
  readonly dateType: 'Created' | 'Issued';
}

function datesOf({ started, date, state }: Publication): readonly DatedType[] {
  return [{ date: started, dateType: 'Created' }, ...(state === 'not frozen' ? [] : [{ date, dateType: 'Issued' as const }])];
}

/** datacite.json. `doi` is absent until the group has one: DataCite assigns it on deposit. `formats` are the media types of the files. */
export function dataciteJson(publication: Publication, formats: readonly string[]): JsonObject {
  const { people, group, title, doi, date, licence, address } = publication;
  const creators: Json = people.length === 0 ? [{ name: group, nameType: 'Organizational' }] : people.map((person) => personJson(person, group));
  return {
    ...(doi === null ? {} : { doi }),
    types: { resourceTypeGeneral: 'Dataset', resourceType: 'Band readings and fitted ligand-field parameters' },
    creators,
    titles: [{ title, lang: 'en' }],
    publisher: { name: group },
    publicationYear: date.slice(0, 4),
    subjects: keywords.map((subject) => ({ subject })),
    dates: datesOf(publication).map(({ date: day, dateType }) => ({ date: day, dateType })),
    language: 'en',
    version: versionCode(publication),
    formats: [...formats],
    rightsList: [{ rights: licence, rightsUri: licenceAddress(licence), rightsIdentifier: licence, rightsIdentifierScheme: 'SPDX', schemeUri: 'https://spdx.org/licenses/' }],
    descriptions: [{ description: descriptionOf(publication), descriptionType: 'Abstract', lang: 'en' }],
    url: address,
    schemaVersion: 'http://datacite.org/schema/kernel-4',
  };
}

function personJson({ name, orcid }: Person, group: string): JsonObject {
  const parts = nameParts(name);
  return {
    name,
    nameType: 'Personal',
    ...(parts === null ? {} : { givenName: parts.given, familyName: parts.family }),
    ...(orcid === null ? {} : { nameIdentifiers: [{ nameIdentifier: `https://orcid.org/${orcid}`, nameIdentifierScheme: 'ORCID', schemeUri: 'https://orcid.org/' }] }),
    affiliation: [{ name: group }],
  };
}

/** datacite.xml. Until a DOI is assigned the identifier is the code for "to be assigned". */
export function dataciteXml(publication: Publication, formats: readonly string[]): string {
  const { people, group, title, doi, date, licence } = publication;
  const creators = people.length === 0
    ? [element('creator', {}, [element('creatorName', { nameType: 'Organizational' }, group)])]
    : people.map((person) => personXml(person, group));
  const space = 'http://datacite.org/schema/kernel-4';
  return `${xmlStart}${element('resource', {
    xmlns: space, 'xmlns:xsi': 'http://www.w3.org/2001/XMLSchema-instance', 'xsi:schemaLocation': `${space} https://schema.datacite.org/meta/kernel-4.6/metadata.xsd`,
  }, [
    element('identifier', { identifierType: 'DOI' }, doi ?? toBeAssigned),
    element('creators', {}, creators),
    element('titles', {}, [element('title', { 'xml:lang': 'en' }, title)]),
    element('publisher', { 'xml:lang': 'en' }, group),
    element('publicationYear', {}, date.slice(0, 4)),
    element('resourceType', { resourceTypeGeneral: 'Dataset' }, 'Band readings and fitted ligand-field parameters'),
    element('subjects', {}, keywords.map((word) => element('subject', { 'xml:lang': 'en' }, word))),
    element('dates', {}, datesOf(publication).map(({ date: day, dateType }) => element('date', { dateType }, day))),
    element('language', {}, 'en'),
    element('formats', {}, formats.map((format) => element('format', {}, format))),
    element('version', {}, versionCode(publication)),
    element('rightsList', {}, [element('rights', {
      rightsURI: licenceAddress(licence), rightsIdentifier: licence, rightsIdentifierScheme: 'SPDX', schemeURI: 'https://spdx.org/licenses/', 'xml:lang': 'en',
    }, licence)]),
    element('descriptions', {}, [element('description', { descriptionType: 'Abstract', 'xml:lang': 'en' }, descriptionOf(publication))]),
  ])}\n`;
}

function personXml({ name, orcid }: Person, group: string): string {
  const parts = nameParts(name);
  return element('creator', {}, [
    element('creatorName', { nameType: 'Personal' }, name),
    ...(parts === null ? [] : [element('givenName', {}, parts.given), element('familyName', {}, parts.family)]),
    ...(orcid === null ? [] : [element('nameIdentifier', { nameIdentifierScheme: 'ORCID', schemeURI: 'https://orcid.org/' }, `https://orcid.org/${orcid}`)]),
    element('affiliation', {}, group),
  ]);
}
