// JSON-LD (schema.org) for the heads of pages.

import type { DataFile } from '../files.ts';
import type { Json, JsonObject } from '../json.ts';
import { citationText } from './cite.ts';
import { keywords } from './cff.ts';
import { descriptionOf, licenceAddress, nameParts, recordAddress, setIdentifier, versionCode } from './publication.ts';
import type { CitedRecord, Person, Publication } from './publication.ts';

/** The text of a script of the type application/ld+json. No "<" is left in it, so that no text can end the script. */
export function jsonLdText(value: JsonObject): string {
  return JSON.stringify(value).replaceAll('<', '\\u003c').replaceAll('\u2028', '\\u2028').replaceAll('\u2029', '\\u2029');
}

const context = 'https://schema.org/';
const catalogId = ({ address }: Publication): string => `${address}#catalog`;
const setId = ({ address }: Publication): string => `${address}data/#dataset`;

/** The collection as a DataCatalog: for the front page. */
export function dataCatalog(publication: Publication): JsonObject {
  return {
    '@context': context,
    '@type': 'DataCatalog',
    '@id': catalogId(publication),
    name: publication.title,
    description: descriptionOf(publication),
    url: publication.address,
    license: licenceAddress(publication.licence),
    publisher: organisation(publication),
    dataset: [{ '@type': 'Dataset', '@id': setId(publication), name: publication.title, description: descriptionOf(publication), license: licenceAddress(publication.licence), creator: creators(publication) }],
  };
}

/** The quantities of the set. */
const quantities: readonly (readonly [name: string, unit: string, description: string])[] = [
  ['band position', 'cm-1', 'position of an absorption band as it was read, with its standard uncertainty'],
  ['molar absorption coefficient', 'L.mol-1.cm-1', 'of a band, where it was recorded'],
  ['Delta', 'cm-1', 'ligand-field splitting, fitted'],
  ['Racah B', 'cm-1', 'fitted'],
  ['Racah C', 'cm-1', 'fitted where spin-flip bands determine it'],
  ['beta', '1', 'nephelauxetic ratio, B over that of the free ion'],
];

/** The whole set as a Dataset: for the data page. `files` are those of data/. */
export function dataset(publication: Publication, files: readonly DataFile[]): JsonObject {
  return {
    '@context': context,
    '@type': 'Dataset',
    '@id': setId(publication),
    name: publication.title,
    description: descriptionOf(publication),
    url: `${publication.address}data/`,
    ...identity(publication),
    ...(publication.doi === null ? {} : { identifier: setIdentifier(publication) }),
    keywords: [...keywords],
    measurementTechnique: 'electronic absorption spectroscopy; ligand-field fit',
    includedInDataCatalog: { '@type': 'DataCatalog', '@id': catalogId(publication), name: publication.title, url: publication.address },
    creditText: citationText(publication),
    variableMeasured: quantities.map(([name, unitText, description]) => ({ '@type': 'PropertyValue', name, unitText, description })),
    distribution: files.map(({ name, mediaType, about }) => ({
      '@type': 'DataDownload', name, description: about, encodingFormat: mediaType, contentUrl: `${publication.address}data/${name}`,
    })),
  };
}

/** A fitted number of one record. */
export interface RecordNumber {
  readonly measurement: string;
  readonly name: string;
  /** null where withheld. */
  readonly value: number | null;
  readonly uTotal: number | null;
  readonly unit: 'cm-1' | '1';
  readonly standing: string;
  readonly reason: string | null;
}

export interface DescribedRecord extends CitedRecord {
  /** Further names: the typed or additive name. */
  readonly names: readonly string[];
  /** Samples that were weighed, formulas as plain text. */
  readonly samples: readonly string[];
  readonly numbers: readonly RecordNumber[];
  readonly files: readonly DataFile[];
}

/** One record as a Dataset about a MolecularEntity, with the ChemicalSubstances that were weighed. */
export function recordDataset(publication: Publication, record: DescribedRecord): JsonObject {
  const address = recordAddress(publication, record);
  return {
    '@context': context,
    '@type': 'Dataset',
    '@id': `${address}#dataset`,
    name: `${record.formula}: bands and ligand-field parameters`,
    description: `Band readings, assignment and ligand-field parameters of ${record.formula}, ${record.geometry} ${record.ion}, record ${record.id} of ${publication.title}.${publication.demonstration ? ' Invented demonstration data.' : ''}`,
    url: address,
    identifier: record.id,
    ...identity(publication),
    isPartOf: { '@type': 'Dataset', '@id': setId(publication), name: publication.title, description: descriptionOf(publication), license: licenceAddress(publication.licence), creator: creators(publication) },
    creditText: citationText(publication, record),
    about: [
      { '@type': 'MolecularEntity', '@id': `${address}#complex`, identifier: record.id, name: record.formula, ...(record.names.length === 0 ? {} : { alternateName: [...record.names] }), molecularFormula: record.formula },
      ...[...new Set(record.samples)].map((sample) => ({ '@type': 'ChemicalSubstance', name: sample, chemicalComposition: sample })),
    ],
    variableMeasured: record.numbers.map(numberLd),
    distribution: record.files.map(({ name, mediaType, about }) => ({ '@type': 'DataDownload', name, description: about, encodingFormat: mediaType, contentUrl: `${address}${name}` })),
  };
}

function numberLd({ measurement, name, value, uTotal, unit, standing, reason }: RecordNumber): JsonObject {
  const start = { '@type': 'PropertyValue', name: `${name} (${measurement})`, unitText: unit } as const;
  if (value === null) return { ...start, description: `withheld${reason === null ? '' : `: ${reason}`}` };
  return { ...start, value, description: `${standing}; ${uTotal === null ? 'u not reported' : `total standard uncertainty ${uTotal} ${unit}`}` };
}

function identity(publication: Publication): JsonObject {
  return {
    version: versionCode(publication),
    dateCreated: publication.started,
    ...(publication.state === 'not frozen' ? {} : { datePublished: publication.date }),
    license: licenceAddress(publication.licence),
    creator: creators(publication),
    publisher: organisation(publication),
    isAccessibleForFree: true,
    inLanguage: 'en',
  };
}

function creators(publication: Publication): Json {
  return publication.people.length === 0 ? organisation(publication) : publication.people.map(personLd);
}

function personLd({ name, orcid }: Person): JsonObject {
  const parts = nameParts(name);
  return {
    '@type': 'Person', name,
    ...(parts === null ? {} : { familyName: parts.family, givenName: parts.given }),
    ...(orcid === null ? {} : { '@id': `https://orcid.org/${orcid}`, identifier: `https://orcid.org/${orcid}` }),
  };
}

function organisation({ group, contact }: Publication): JsonObject {
  return { '@type': 'Organization', name: group, ...(contact !== null && /^[^\s@]+@[^\s@]+$/.test(contact) ? { email: contact } : {}) };
}
