import { readFileSync } from 'node:fs';
import { resultTable } from './columns.ts';
import { aboutJson, citedRecords } from './describe.ts';
import { dictionaryJson } from './dictionary/show.ts';
import type { TableEntry } from './dictionary/types.ts';
import { mainFiles, sumsFile, tableFile } from './files.ts';
import type { DataFile } from './files.ts';
import { collectionJson } from './json.ts';
import type { JsonObject } from './json.ts';
import { collectionSchema, recordSchema } from './jsonSchema.ts';
import { citationCff } from './metadata/cff.ts';
import { citationBibtex, citationRis, citationText } from './metadata/cite.ts';
import { dataPackage } from './metadata/dataPackage.ts';
import type { WrittenFile } from './metadata/dataPackage.ts';
import { dataciteJson, dataciteXml } from './metadata/datacite.ts';
import type { Publication } from './metadata/publication.ts';
import { roCrate } from './metadata/roCrate.ts';
import { linkset } from './metadata/signposting.ts';
import { sourcesBib } from './metadata/sources.ts';
import type { SourceCited } from './metadata/sources.ts';
import { readPublished } from './published.ts';
import type { Published } from './published.ts';
import { readResults, resultsCsv, resultsJson } from './results.ts';
import type { Results } from './results.ts';
import { tableCsv } from './tableFiles.ts';
import type { TableRows } from './tableFiles.ts';
import { written } from './written.ts';

/** Names of the files that commands look for, in the folder data/ of the site. */
export const exportNames = { database: 'collection.sqlite', csv: 'results.csv', json: 'results.json' } as const;

/** Files that describe the others, and so are written last. */
const describing: readonly string[] = ['datapackage.json', 'ro-crate-metadata.json'];

/** Writes the files for download into `folder`, making it where it is missing. They depend on the database alone. */
export function writeExports(databaseFile: string, folder: string): readonly WrittenFile[] {
  return writeDataFiles(readPublished(databaseFile), folder);
}

/** The same of a database that is read already. */
export function writeDataFiles({ databaseFile, tables, rows, publication }: Published, folder: string): readonly WrittenFile[] {
  const texts = dataTexts(tables, rows, readResults(databaseFile), publication);
  const plain = mainFiles.filter(({ name }) => !describing.includes(name)).map((file) =>
    written(folder, file, file.name === exportNames.database ? readFileSync(databaseFile) : texts.get(file.name)!));
  const tabular = tables.map((table) => ({ table, file: written(folder, tableFile(table), tableCsv(table, rows[table.name] ?? [])) }));
  const results = plain.find(({ name }) => name === exportNames.csv)!;
  const others = plain.filter((file) => file !== results);
  const packaged = written(folder, fileNamed('datapackage.json'), json(dataPackage(publication, [{ file: results, table: resultTable }, ...tabular], others)));
  const all = [...plain, ...tabular.map(({ file }) => file), packaged];
  const crate = written(folder, fileNamed('ro-crate-metadata.json'), json(roCrate(publication, all)));
  const everything = [...all, crate].sort((a, b) => (a.name < b.name ? -1 : 1));
  return [...everything, written(folder, sumsFile, everything.map(({ sha256, name }) => `${sha256}  ${name}\n`).join(''))];
}

/** The texts of data/ but for the database, the single tables and what describes the files, by name. */
function dataTexts(tables: readonly TableEntry[], rows: TableRows, results: Results, publication: Publication): ReadonlyMap<string, string | Iterable<string>> {
  const formats = [...new Set(mainFiles.map(({ mediaType }) => mediaType))];
  return new Map<string, string | Iterable<string>>([
    ['results.csv', resultsCsv(results)],
    ['results.json', resultsJson(results)],
    ['collection.json', collectionJson(tables, rows, aboutJson(publication, publication.address))],
    ['collection.schema.json', json(collectionSchema(tables))],
    ['record.schema.json', json(recordSchema(tables))],
    ['dictionary.json', dictionaryJson([...tables, resultTable])],
    ['sources.bib', sourcesBib((rows['source'] ?? []) as readonly unknown[] as readonly SourceCited[])],
    ['cite.txt', `${citationText(publication)}\n`],
    ['cite.bib', citationBibtex(publication)],
    ['cite.ris', citationRis(publication)],
    ['CITATION.cff', citationCff(publication)],
    ['datacite.json', json(dataciteJson(publication, formats))],
    ['datacite.xml', dataciteXml(publication, formats)],
    ['linkset.json', json(linkset(publication, citedRecords(rows)))],
  ]);
}

function fileNamed(name: string): DataFile {
  return mainFiles.find((file) => file.name === name)!;
}

function json(value: JsonObject): string {
  return `${JSON.stringify(value, null, 1)}\n`;
}
