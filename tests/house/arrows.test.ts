import { readdirSync } from 'node:fs';
import { expect, test } from 'vitest';
import * as rules from './rules.ts';
import { allSources, importsOf, top } from './sources.ts';
import type { Source } from './sources.ts';

const sources = allSources();

/** Each rule with a sentence, and with files that must offend it: a check that cannot fail holds nothing. */
const houseRules: readonly (readonly [string, rules.Rule, readonly Source[]])[] = [
  ['the engine uses ml-matrix and its own files, nothing else', rules.engineStandsAlone, [
    { path: 'engine/ions/a.ts', text: "import { z } from 'zod';" },
    { path: 'engine/ions/b.ts', text: "import type { Row } from '../../scripts/database/row.ts';" },
    { path: 'engine/ions/c.ts', text: "export * from 'node:fs';" },
    { path: 'engine/ions/d.ts', text: "const x = await import('yaml');" },
    { path: 'engine/ions/e.ts', text: "import { levels } from '#engine';" },
  ]],
  [`inside the engine each folder uses only those before it: ${rules.engineFolders.join(', ')}`, rules.engineFoldersInOrder, [
    { path: 'engine/shell/a.ts', text: "import { levels } from '../levels/levels.ts';" },
    { path: 'engine/attic/a.ts', text: "import { levels } from '../levels/levels.ts';" },
    { path: 'engine/ions/a.ts', text: "import { levels } from '../index.ts';" },
  ]],
  ['no file of the engine uses itself by a way round', rules.engineWithoutCircles, [
    { path: 'engine/ions/a.ts', text: "import { b } from './b.ts';" },
    { path: 'engine/ions/b.ts', text: "import type { A } from './a.ts';" },
  ]],
  ['the public face of the engine is re-exports only', rules.publicFaceOnlyReexports, [
    { path: 'engine/index.ts', text: "export { a } from './a.ts';\nexport const b = 1;" },
  ]],
  ['the engine has no clock, no chance, no console and no locale', rules.engineIsPure, [
    { path: 'engine/ions/a.ts', text: 'const now = Date.now();' },
    { path: 'engine/ions/b.ts', text: 'const x = Math.random();' },
    { path: 'engine/ions/c.ts', text: "const y = (1e6).toLocaleString('de');" },
    { path: 'engine/ions/d.ts', text: 'list.sort((a, b) => a.localeCompare(b));' },
  ]],
  ['the clock is asked for the date of a release only, chance for a name in passing, the locale never', rules.noClockInBuilds, [
    { path: 'scripts/export/a.ts', text: 'const made = new Date().toISOString();' },
    { path: 'site/pages/a.astro', text: '---\nconst now = Date.now();\n---\n' },
    { path: 'site/data/a.ts', text: 'const id = Math.random();' },
    { path: 'scripts/keptBytes.ts', text: 'list.sort((a, b) => a.localeCompare(b));' },
  ]],
  ["scripts and site reach the engine as '#engine' alone", rules.oneDoorToTheEngine, [
    { path: 'scripts/refit.ts', text: "import { levels } from '../engine/levels/levels.ts';" },
    { path: 'site/charts/a.ts', text: "import type { Ion } from '../../engine/ions/types.ts';" },
    { path: 'site/pages/a.astro', text: "---\nimport { levels } from '../../engine/index.ts';\n---\n<p></p>" },
    { path: 'site/pages/b.astro', text: "<p></p><script>import { levels } from '#engine/levels';</script>" },
  ]],
  ['scripts never import site', rules.scriptsNeverImportSite, [
    { path: 'scripts/build.ts', text: "import { url } from '../site/url.ts';" },
  ]],
  ['the site parses no YAML, holds no schema, and opens the database in site/data/ alone', rules.siteReadsRowsOnly, [
    { path: 'site/data/a.ts', text: "import { parse } from 'yaml';" },
    { path: 'site/client/a.ts', text: "import * as z from 'zod/mini';" },
    { path: 'site/pages/a.astro', text: "---\nimport Database from 'better-sqlite3';\n---\n" },
  ]],
  ['no test runs alone, and a test that is left out says why', rules.noSilentSkips, [
    { path: 'tests/a.test.ts', text: ['// a reason does not help here', 'test', '.only', '("x", () => {})'].join('').replace('here', 'here\n') },
    { path: 'tests/b.test.ts', text: ['test', '.skip', '("x", () => {});'].join('') },
    { path: 'tests/c.test.ts', text: ['describe', '.skipIf(true)("x", () => {});'].join('') },
  ]],
  ['no file speaks of how or where it was written, and none names a path of one machine or a registry host', rules.noForeignWords, [
    { path: 'README.md', text: ['see /', 'work/main'].join('') },
    { path: 'content/a.yaml', text: ['notes: from the lec', 'ture'].join('') },
    { path: 'scripts/a.ts', text: ['// a helper ag', 'ent wrote this'].join('') },
    { path: 'package-lock.json', text: ['https://regis', 'try.example.org/astro'].join('') },
  ]],
];

test.each(houseRules)('%s', (_, rule) => {
  expect(rule(sources)).toEqual([]);
});

test.each(houseRules.flatMap(([sentence, rule, bad]) => bad.map((file) => [sentence, `${file.path}: ${file.text}`, rule, rule === rules.engineWithoutCircles ? bad : [file]] as const)))(
  'the rule "%s" notices %j', (_, __, rule, files) => {
    expect(rule(files)).not.toEqual([]);
  });

test('the site cannot fetch YAML through a file of scripts, however far behind', () => {
  const columns: Source = { path: 'scripts/export/columns.ts', text: "import { words } from './words.ts';" };
  const words = (text: string): Source => ({ path: 'scripts/export/words.ts', text });
  const page: Source = { path: 'site/data/downloads.ts', text: "import { columns } from '../../scripts/export/columns.ts';" };
  expect(rules.siteReadsRowsOnly([page, columns, words('export const words = 1;')])).toEqual([]);
  expect(rules.siteReadsRowsOnly([page, columns, words("import { parse } from 'yaml';")])).toEqual(['scripts/export/words.ts imports yaml']);
});

test('the rules allow what the house needs', () => {
  const good: Source[] = [
    { path: 'engine/levels/a.ts', text: "import { Matrix } from 'ml-matrix';\nimport { shellBlocks } from '../shell/blocks.ts';\n// new values, a date, a console of levels" },
    { path: 'engine/index.ts', text: "// Levels\nexport { levels } from './levels/a.ts';\nexport type { Level } from './levels/a.ts';" },
    { path: 'scripts/a.ts', text: "import { parse } from 'yaml';\nimport { levels } from '#engine';\nimport { b } from './b.ts';" },
    { path: 'site/data/a.ts', text: "import Database from 'better-sqlite3';\nimport { levels } from '#engine';" },
    { path: 'site/pages/a.astro', text: "---\nimport Page from '../layouts/Page.astro';\n---\n<Page>import from '../../scripts/x.ts'</Page>" },
    { path: 'tests/a.test.ts', text: ['// needs a browser, and none was found\ntest', '.skip', '("x", () => {});'].join('') },
    { path: 'content/a.yaml', text: 'notes: a reducing agent was added' },
    { path: 'package-lock.json', text: '"https-proxy-agent": "^7.0.6", "agent-base": "^7.1.2"' },
  ];
  for (const [, rule] of houseRules) expect(rule(good)).toEqual([]);
});

test('the walk sees every room, and reads imports out of TypeScript and Astro files', () => {
  for (const room of ['content', 'engine', 'scripts', 'site', 'tests']) expect(sources.filter(({ path }) => path.startsWith(`${room}/`)).length, room).toBeGreaterThan(3);
  const count = (ending: string) => sources.filter(({ path }) => path.startsWith('site/') && path.endsWith(ending)).flatMap(importsOf).length;
  expect(count('.ts')).toBeGreaterThan(10);
  expect(count('.astro')).toBeGreaterThan(3);
  expect(sources.filter(({ path }) => path.startsWith('engine/')).flatMap(importsOf).length).toBeGreaterThan(40);
});

test('nothing stands at the top but the rooms, the two guides and the files that tools look for there', () => {
  const allowed = new Set([
    'content', 'engine', 'scripts', 'site', 'tests',
    'astro.config.mjs', 'package.json', 'package-lock.json', 'tsconfig.json', 'README.md', 'DEVELOPERS.md', 'LICENSE',
    // Made by commands and not tracked.
    'node_modules', 'dist',
  ]);
  expect(readdirSync(top).filter((name) => !name.startsWith('.') && !allowed.has(name))).toEqual([]);
});
