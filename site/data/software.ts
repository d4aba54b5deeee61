import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { counted, listed } from './show.ts';
import { type Table, column, longColumn, rowColumn } from './table.ts';

/** What the project is made with, and under which licences. */
export interface Software {
  readonly name: string;
  readonly version: string;
  readonly licence: string;
  readonly packages: Table;
  /** "They need 203 packages more: MIT 180, ISC 23." */
  readonly more: string;
}

/** What each package is there for. */
const PURPOSES: Readonly<Record<string, string>> = {
  '@observablehq/plot': 'axes and marks of figures',
  '@resvg/resvg-js': 'figures as PNG',
  'astro': 'pages',
  'better-sqlite3': 'the database',
  'linkedom': 'a document to draw figures in',
  'ml-matrix': 'least squares of the series, also in the compare page',
  'openchemlib': 'layout of ligand drawings',
  'yaml': 'records as typed',
  'zod': 'the schema of records',
};

interface Locked { readonly version?: string; readonly license?: string; readonly dev?: boolean; readonly optional?: boolean }

/** From the project's own lock file, so that it is what is installed. */
export function software(): Software {
  const read = (file: string): unknown => JSON.parse(readFileSync(resolve(process.cwd(), file), 'utf8'));
  const { name, version, license: licence, dependencies } = read('package.json') as { name: string; version: string; license: string; dependencies: Readonly<Record<string, string>> };
  const locked = Object.entries((read('package-lock.json') as { readonly packages: Readonly<Record<string, Locked>> }).packages).filter(([path, { dev }]) => path !== '' && dev !== true);
  const direct = Object.keys(dependencies);
  const ofPackage = new Map(locked);
  const others = locked.filter(([path, { optional }]) => optional !== true && !direct.includes(path.replace('node_modules/', '')));
  const counts = new Map<string, number>();
  for (const [, { license }] of others) counts.set(license ?? 'not said', (counts.get(license ?? 'not said') ?? 0) + 1);
  const most = [...counts].sort(([a, x], [b, y]) => y - x || (a < b ? -1 : 1)).map(([one, count]) => `${one} ${count}`);
  return {
    name, version, licence,
    packages: {
      caption: 'Packages that make this site', columns: [rowColumn('Package'), column('Version'), column('Licence'), longColumn('For')],
      rows: direct.map((one) => {
        const found = ofPackage.get(`node_modules/${one}`);
        return [one, found?.version ?? dependencies[one]!, found?.license ?? 'not said', PURPOSES[one] ?? ''];
      }),
    },
    more: `They need ${counted(others.length, 'package')} more: ${listed(most)}.`,
  };
}
