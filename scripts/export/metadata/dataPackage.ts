// datapackage.json: Data Package version 2 with units, constraints, keys and hashes.

import type { ColumnEntry, TableEntry } from '../dictionary/types.ts';
import type { DataFile } from '../files.ts';
import type { JsonObject } from '../json.ts';
import { keywords } from './cff.ts';
import { descriptionOf, doiWords, licenceAddress, setIdentifier, versionCode } from './publication.ts';
import type { Publication } from './publication.ts';

/** A file as it was written. */
export interface WrittenFile extends DataFile {
  readonly bytes: number;
  /** Hexadecimal. */
  readonly sha256: string;
}

/** A table with the CSV file that holds it. */
export interface TabularFile {
  readonly file: WrittenFile;
  readonly table: TableEntry;
}

/** The descriptor: the tables as tabular resources, other files as plain ones. Paths are within data/. */
export function dataPackage(publication: Publication, tables: readonly TabularFile[], others: readonly WrittenFile[]): JsonObject {
  const { title, address, licence, people, group, date } = publication;
  const known = new Set(tables.map(({ table }) => table.name));
  return {
    $schema: 'https://datapackage.org/profiles/2.0/datapackage.json',
    name: 'ligand-field-collection',
    id: setIdentifier(publication),
    title,
    description: `${descriptionOf(publication)} DOI: ${doiWords(publication)}.`,
    homepage: address,
    version: versionCode(publication),
    created: `${date}T00:00:00Z`,
    keywords: [...keywords],
    licenses: [{ name: licence, path: licenceAddress(licence), title: licence }],
    contributors: [
      ...people.map(({ name, orcid }) => ({ title: name, roles: ['creator'], ...(orcid === null ? {} : { path: `https://orcid.org/${orcid}` }) })),
      { title: group, roles: [people.length === 0 ? 'creator' : 'publisher'] },
    ],
    resources: [
      ...tables.map(({ file, table }) => ({
        ...plainResource(file, table.name.replaceAll('_', '-')), type: 'table', encoding: 'utf-8', format: 'csv',
        dialect: { header: true, delimiter: ',', lineTerminator: '\r\n', quoteChar: '"', doubleQuote: true },
        schema: tableSchema(table, known),
      })),
      ...others.map((file) => plainResource(file, file.name.toLowerCase().replace(/[^a-z0-9.]+/g, '-'))),
    ],
  };
}

function plainResource({ name: path, mediaType, about, bytes, sha256 }: WrittenFile, name: string): JsonObject {
  return { name, path, title: about, mediatype: mediaType, bytes, hash: `sha256:${sha256}` };
}

/** The Table Schema of one table. `unit` and `ucumCode` are properties of our own, which the standard allows. */
export function tableSchema({ columns, key, references }: TableEntry, known: ReadonlySet<string>): JsonObject {
  const usable = references.filter(({ table }) => known.has(table));
  return {
    $schema: 'https://datapackage.org/profiles/2.0/tableschema.json',
    fields: columns.map(fieldOf),
    primaryKey: [...key],
    missingValues: [''],
    ...(usable.length === 0 ? {} : {
      foreignKeys: usable.map(({ columns: fields, table, targets }) => ({ fields: [...fields], reference: { resource: table.replaceAll('_', '-'), fields: [...targets] } })),
    }),
  };
}

const typeNames = { text: 'string', integer: 'integer', real: 'number', flag: 'integer' } as const;

function fieldOf({ name, type, required, meaning, units, limits: { above, least, most }, values }: ColumnEntry): JsonObject {
  const constraints = {
    ...(required ? { required: true } : {}),
    ...(values === null ? {} : { enum: [...values] }),
    ...(type === 'flag' ? { enum: [0, 1] } : {}),
    ...(above === null ? {} : { exclusiveMinimum: above }),
    ...(least === null ? {} : { minimum: least }),
    ...(most === null ? {} : { maximum: most }),
  };
  return {
    name,
    // A JSON text may hold a list or an object: where it is not known which, "any" is the honest type.
    type: type === 'json' ? 'any' : typeNames[type],
    description: meaning,
    ...(units.length === 0 ? {} : { unit: units.join(' or ') }),
    ...(units.length === 1 ? { ucumCode: units[0]! } : {}),
    ...(Object.keys(constraints).length === 0 ? {} : { constraints }),
  };
}
