import type { TableEntry } from './dictionary/types.ts';

/** A file for download. */
export interface DataFile {
  /** Path within data/. */
  readonly name: string;
  readonly mediaType: string;
  /** What it holds, as a phrase. */
  readonly about: string;
}

const file = (name: string, mediaType: string, about: string): DataFile => ({ name, mediaType, about });

/** Everything in data/ but the CSV files of single tables and SHA256SUMS, in the order in which a reader wants them. */
export const mainFiles: readonly DataFile[] = [
  file('results.csv', 'text/csv', 'one row for each measurement\'s chosen reading, numbers in full'),
  file('results.json', 'application/json', 'the same rows with the meaning and unit of every column'),
  file('collection.sqlite', 'application/vnd.sqlite3', 'everything: readings as typed, fits, uncertainties, cautions; the view "result" is the flat table'),
  file('collection.json', 'application/json', 'every row of every table'),
  file('collection.schema.json', 'application/schema+json', 'JSON Schema of collection.json'),
  file('record.schema.json', 'application/schema+json', 'JSON Schema of the record.json beside each complex'),
  file('dictionary.json', 'application/json', 'data dictionary: meaning, unit, type and range of every column'),
  file('sources.bib', 'application/x-bibtex', 'the publications that the records cite'),
  file('cite.txt', 'text/plain', 'how to cite the collection'),
  file('cite.bib', 'application/x-bibtex', 'the same for BibTeX'),
  file('cite.ris', 'application/x-research-info-systems', 'the same as RIS'),
  file('CITATION.cff', 'application/yaml', 'the same in the Citation File Format'),
  file('datapackage.json', 'application/json', 'Data Package descriptor: tables, units, constraints and hashes'),
  file('datacite.json', 'application/json', 'DataCite metadata, ready to deposit'),
  file('datacite.xml', 'application/xml', 'the same as XML'),
  file('ro-crate-metadata.json', 'application/ld+json', 'RO-Crate description of the files'),
  file('linkset.json', 'application/linkset+json', 'links between the records and their files, for machines'),
];

/** The CSV file of one table. */
export function tableFile({ name, meaning }: TableEntry): DataFile {
  return file(`csv/${name}.csv`, 'text/csv', meaning);
}

export const sumsFile: DataFile = file('SHA256SUMS', 'text/plain', 'hashes of all these files; check them with  sha256sum -c SHA256SUMS');

/** Files that a build puts beside the page of each complex. */
export const recordFiles: readonly DataFile[] = [
  file('record.json', 'application/json', 'everything that is known of the complex'),
  file('record.yaml', 'application/yaml', 'the record as it was typed'),
  file('bands.csv', 'text/csv', 'the bands with their assignment'),
  file('cite.bib', 'application/x-bibtex', 'how to cite the record, for BibTeX'),
  file('cite.ris', 'application/x-research-info-systems', 'how to cite the record, as RIS'),
];
