// What the project takes from others: free licences, exact versions, nothing run at install.

import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { allSources, importsOf, top } from './sources.ts';

interface Locked {
  readonly version?: string;
  readonly license?: string;
  readonly dev?: boolean;
  readonly integrity?: string;
  readonly hasInstallScript?: boolean;
}

interface Manifest {
  readonly dependencies: Readonly<Record<string, string>>;
  readonly devDependencies: Readonly<Record<string, string>>;
  readonly optionalDependencies: Readonly<Record<string, string>>;
  readonly allowScripts: Readonly<Record<string, boolean>>;
}

const readJson = (name: string): unknown => JSON.parse(readFileSync(join(top, name), 'utf8'));
const manifest = readJson('package.json') as Manifest;
const { packages } = readJson('package-lock.json') as { readonly packages: Readonly<Record<string, Locked>> };
const locked = Object.entries(packages).filter(([path]) => path !== '');
const nameOf = (path: string): string => path.slice(path.lastIndexOf('node_modules/') + 'node_modules/'.length);

/** Free licences whose terms the use of an unchanged package meets. */
const allowed = new Set(['0BSD', 'Apache-2.0', 'BSD-2-Clause', 'BSD-3-Clause', 'BlueOak-1.0.0', 'CC0-1.0', 'ISC', 'LGPL-3.0-or-later', 'MIT', 'MPL-2.0', 'Python-2.0', 'Unlicense']);

/** Every licence of a joint expression must be allowed, one of a choice. */
function isAllowed(expression: string): boolean {
  return expression.replaceAll(/[()]/g, '').split(' AND ').every((part) => part.split(' OR ').some((one) => allowed.has(one.trim())));
}

test('every package that runs carries a licence of the list', () => {
  const running = locked.filter(([, { dev }]) => dev !== true);
  expect(running.length).toBeGreaterThan(Object.keys(manifest.dependencies).length);
  expect(running.filter(([, { license }]) => license === undefined || !isAllowed(license)).map(([path, { license }]) => `${nameOf(path)}: ${license}`)).toEqual([]);
});

test('a licence outside the list is not allowed, alone or joined', () => {
  expect(['GPL-3.0-only', 'MIT AND GPL-3.0-only', 'UNLICENSED', ''].filter(isAllowed)).toEqual([]);
  expect(isAllowed('(MIT OR GPL-3.0-only)')).toBe(true);
});

test('versions are exact, and the lock holds the same with their hashes', () => {
  const asked = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies, ...manifest.optionalDependencies });
  expect(asked.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  expect(asked.filter(([name, version]) => packages[`node_modules/${name}`]?.version !== version)).toEqual([]);
  expect(locked.filter(([, { integrity }]) => integrity === undefined).map(([path]) => path)).toEqual([]);
});

test('one package alone would run something at install, and it is declared', () => {
  // esbuild's script only checks and speeds up the program that its optional package brings.
  const scripted = [...new Set(locked.filter(([, { hasInstallScript }]) => hasInstallScript === true).map(([path]) => nameOf(path)))];
  expect(scripted).toEqual(['esbuild']);
  expect(Object.keys(manifest.allowScripts)).toContain('esbuild');
});

test('what only tests and the bench import is a devDependency, and of those nothing shipped imports more than types', () => {
  const packageOf = (specifier: string): string => specifier.split('/').slice(0, specifier.startsWith('@') ? 2 : 1).join('/');
  // The bench measures against other packages and in a browser; it is for those who build the project.
  const shipped = allSources().filter(({ path }) => /^(?:engine|scripts|site)\/|^astro\.config/.test(path) && !path.startsWith('scripts/bench/'));
  const imported = (source: (typeof shipped)[number]): string[] => importsOf(source).map(({ specifier }) => packageOf(specifier));
  // Imports of types are erased before anything runs.
  const needed = new Set(shipped.flatMap((source) => imported({ ...source, text: source.text.replaceAll(/^import type [^;]*;/gm, '') })));
  expect(Object.keys(manifest.dependencies).filter((name) => !needed.has(name))).toEqual([]);
  expect(Object.keys(manifest.devDependencies).filter((name) => needed.has(name))).toEqual([]);
});
