import { copyFileSync, mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { readResults, resultsCsv, resultsJson } from './results.ts';

/** Names of the files for download, in the folder data/ of the site. */
export const exportNames = { database: 'collection.sqlite', csv: 'results.csv', json: 'results.json' } as const;

/** Writes the files for download into `folder`, making it where it is missing. */
export function writeExports(databaseFile: string, folder: string): void {
  mkdirSync(folder, { recursive: true });
  copyFileSync(databaseFile, join(folder, exportNames.database));
  const results = readResults(databaseFile);
  writeFileSync(join(folder, exportNames.csv), resultsCsv(results));
  writeFileSync(join(folder, exportNames.json), resultsJson(results));
}
