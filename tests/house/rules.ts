import ts from 'typescript';
import { importsOf } from './sources.ts';
import type { Import, Source } from './sources.ts';

/** Each rule returns what offends it, one line an offence: an empty list is a house in order. */
export type Rule = (sources: readonly Source[]) => readonly string[];

const roomOf = (path: string): string => path.split('/')[0]!;
const isPackage = ({ target, specifier }: Import): boolean => target === null && !specifier.startsWith('#') && !specifier.startsWith('node:');
const packageOf = (specifier: string): string => specifier.split('/').slice(0, specifier.startsWith('@') ? 2 : 1).join('/');

const imports = (sources: readonly Source[], room: string): readonly Import[] => sources.filter(({ path }) => roomOf(path) === room).flatMap(importsOf);
const offence = ({ from, specifier }: Import): string => `${from} imports ${specifier}`;

/** The engine uses ml-matrix and its own files, nothing else. */
export const engineStandsAlone: Rule = (sources) =>
  imports(sources, 'engine').filter(({ specifier, target }) => specifier !== 'ml-matrix' && !target?.startsWith('engine/')).map(offence);

/**
 * Folders of the engine from the ground up: each uses only those before it. `index.ts` stands above all.
 * A new folder has to find its place here.
 */
export const engineFolders = ['linear', 'quantity', 'ions', 'formula', 'shell', 'levels', 'policy', 'measurement', 'words', 'cautions', 'readings', 'series', 'record'];

export const engineFoldersInOrder: Rule = (sources) =>
  imports(sources, 'engine').filter(({ from }) => from !== 'engine/index.ts').flatMap((one) => {
    if (!one.target?.startsWith('engine/')) return [];
    const [user, used] = [one.from, one.target].map((path) => engineFolders.indexOf(path.split('/')[1]!));
    return user === -1 || used === -1 || used! > user! ? [offence(one)] : [];
  });

/** No file of the engine uses, by any way round, itself. */
export const engineWithoutCircles: Rule = (sources) => {
  const uses = new Map(sources.filter(({ path }) => roomOf(path) === 'engine').map((source) => [source.path, importsOf(source).flatMap(({ target }) => target ?? [])]));
  const settled = new Set<string>();
  const found: string[] = [];
  const visit = (path: string, trail: readonly string[]): void => {
    if (trail.includes(path)) found.push([...trail.slice(trail.indexOf(path)), path].join(' -> '));
    else if (!settled.has(path)) {
      for (const next of uses.get(path) ?? []) visit(next, [...trail, path]);
      settled.add(path);
    }
  };
  for (const path of uses.keys()) visit(path, []);
  return found;
};

/** engine/index.ts holds re-exports and nothing else. */
export const publicFaceOnlyReexports: Rule = (sources) =>
  sources.filter(({ path }) => path === 'engine/index.ts').flatMap(({ path, text }) =>
    ts.createSourceFile(path, text, ts.ScriptTarget.Latest).statements
      .filter((statement) => !(ts.isExportDeclaration(statement) && statement.moduleSpecifier))
      .map((statement) => `${path} holds "${text.slice(statement.pos, statement.end).trim().split('\n')[0]}"`));

/** The engine has no clock, no chance, no console and no locale: the same input gives the same bits anywhere. */
export const engineIsPure: Rule = (sources) =>
  sources.filter(({ path }) => path.startsWith('engine/') && path.endsWith('.ts')).flatMap(({ path, text }) =>
    text.split('\n').flatMap((line, i) =>
      [...line.matchAll(/\b(new Date|Date\.(now|parse|UTC)|Math\.random|console\.|performance\.|Intl\.|toLocale\w+|localeCompare|setTimeout|globalThis)/g)].map((hit) => `${path}:${i + 1} ${hit[0]}`)));

const clockFiles: readonly string[] = ['scripts/release/surroundings.ts'];
const chanceFiles: readonly string[] = ['scripts/keptBytes.ts'];

/** What is built hangs on the content alone: one file asks the clock (for the date of a release), one makes a name by chance, none asks the locale. */
export const noClockInBuilds: Rule = (sources) =>
  sources.filter(({ path }) => /^(?:scripts|site)\/|^astro\.config/.test(path) && /\.(?:ts|mjs|astro)$/.test(path)).flatMap(({ path, text }) =>
    text.split('\n').flatMap((line, i) => [
      ...(clockFiles.includes(path) ? [] : line.matchAll(/\bnew Date\(\s*\)|\bDate\.now|(?<!new )\bDate\(/g)),
      ...(chanceFiles.includes(path) ? [] : line.matchAll(/\bMath\.random|\brandom(?:Bytes|UUID|Int)\b/g)),
      ...line.matchAll(/\bIntl\.|\btoLocale\w+|\blocaleCompare|\bhostname\(|\bhomedir\(/g),
    ].map((hit) => `${path}:${i + 1} ${hit[0]}`)));

/** The engine has one door: scripts and site come in by '#engine' alone. */
export const oneDoorToTheEngine: Rule = (sources) =>
  ['scripts', 'site'].flatMap((room) =>
    imports(sources, room).filter(({ specifier, target }) => target?.startsWith('engine/') || (specifier.startsWith('#') && specifier !== '#engine')).map(offence));

/** Nothing flows back: scripts never import site. */
export const scriptsNeverImportSite: Rule = (sources) =>
  imports(sources, 'scripts').filter(({ target }) => target !== null && roomOf(target) === 'site').map(offence);

/**
 * The site parses no YAML, holds no schema, and opens the database in site/data/ alone; a file of scripts that it
 * borrows (the columns of an export) may not bring them in by the back door.
 */
export const siteReadsRowsOnly: Rule = (sources) => {
  const byPath = new Map(sources.map((source) => [source.path, source]));
  const reached = sources.filter(({ path }) => roomOf(path) === 'site');
  const seen = new Set(reached.map(({ path }) => path));
  const found: string[] = [];
  for (const source of reached)
    for (const one of importsOf(source)) {
      const name = isPackage(one) ? packageOf(one.specifier) : null;
      if (name === 'yaml' || name === 'zod' || (name === 'better-sqlite3' && !one.from.startsWith('site/data/'))) found.push(offence(one));
      const next = one.target !== null && roomOf(one.target) === 'scripts' ? byPath.get(one.target) : undefined;
      if (!next || seen.has(next.path)) continue;
      seen.add(next.path);
      reached.push(next);
    }
  return found;
};

/** No test runs alone; a test that is left out says why in a comment on its line or the line above. */
export const noSilentSkips: Rule = (sources) =>
  sources.filter(({ path }) => path.startsWith('tests/') && /\.(ts|mts|js|mjs)$/.test(path)).flatMap(({ path, text }) => {
    const lines = text.split('\n');
    return lines.flatMap((line, i) => {
      const call = /\b(?:test|it|describe|suite|bench|each|context|ctx)\s*\.\s*(only|skip|skipIf|runIf|todo|fails)\b/.exec(line);
      if (!call) return [];
      const reason = /\/\/ *\S/.test(line) || /^\s*(\/\/|\*).*\S/.test(lines[i - 1] ?? '') || /\b(?:context|ctx)\.skip\(\s*['"`]\S/.test(line);
      return call[1] !== 'only' && reason ? [] : [`${path}:${i + 1} ${call[0]}`];
    });
  });

// Written in halves, so that this file does not offend its own rule.
const origin: readonly RegExp[] = [
  new RegExp(`\\b${'trans'}${'cripts?'}\\b`, 'i'),
  new RegExp(`\\b${'lec'}${'tur(e|es|er|ers)'}\\b`, 'i'),
  new RegExp(`\\b${'seed'} ${'documents?'}\\b`, 'i'),
];

/** The one file that may say where the idea of the project came from. */
const mayNameOrigin = 'DEVELOPERS.md';

const foreign: readonly RegExp[] = [
  new RegExp(`\\b${'ses'}${'sions?'}\\b`, 'i'),
  // The word is chemistry in a reducing one, and the web in the user and the proxy kind.
  new RegExp(`(?<!ing[ -]|user[ -]|proxy-)\\b${'ag'}${'ents?'}\\b(?!-base)`, 'i'),
  new RegExp(`\\b${'language'} ${'models?'}\\b`, 'i'),
  new RegExp(`(?<![\\w.])/${'(work|tmp|root|home)'}/`),
  new RegExp(`\\b${'regis'}${'try'}\\.[a-z0-9-]+\\.[a-z]{2,}`, 'i'),
  new RegExp(`\\b${'npm'}${'js'}\\.[a-z]{2,}`, 'i'),
];

/** The repository speaks of the project alone: no word of where or by what it was written, no path of one machine. */
export const noForeignWords: Rule = (sources) =>
  sources.flatMap(({ path, text }) =>
    [path, ...text.split('\n')].flatMap((line, i) => {
      const patterns = path === mayNameOrigin ? foreign : [...origin, ...foreign];
      const hit = patterns.map((pattern) => pattern.exec(line)).find((found) => found !== null);
      return hit ? [`${path}:${i} "${hit[0]}"`] : [];
    }));
