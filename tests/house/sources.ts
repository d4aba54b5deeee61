import { readFileSync, readdirSync } from 'node:fs';
import { extname, join, posix } from 'node:path';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';

/** A file of the repository; `path` from its top, with forward strokes. */
export interface Source {
  readonly path: string;
  readonly text: string;
}

export const top = fileURLToPath(new URL('../..', import.meta.url));

const rooms = ['content', 'engine', 'scripts', 'site', 'tests', '.ci'];
const binary = new Set(['.png', '.jpg', '.ico', '.sqlite', '.woff2', '.gz', '.zip']);
const generated = new Set(['node_modules', 'dist', '.astro', '.cache']);

function walk(path: string): string[] {
  return readdirSync(join(top, path), { withFileTypes: true }).flatMap((entry) => {
    if (generated.has(entry.name)) return [];
    const below = posix.join(path, entry.name);
    if (entry.isDirectory()) return walk(below);
    return entry.isFile() && !binary.has(extname(entry.name)) ? [below] : [];
  });
}

/** Every text file of the repository, generated folders left out. */
export function allSources(): readonly Source[] {
  const loose = readdirSync(top, { withFileTypes: true }).filter((entry) => entry.isFile() && !binary.has(extname(entry.name))).map(({ name }) => name);
  const present = readdirSync(top);
  return [...loose, ...rooms.filter((room) => present.includes(room)).flatMap(walk)].map((path) => ({ path, text: readFileSync(join(top, path), 'utf8') }));
}

/** The TypeScript in a file: all of a .ts file, the frontmatter and scripts of an .astro file. */
function codeOf({ path, text }: Source): string {
  if (/\.(ts|mts|js|mjs)$/.test(path)) return text;
  if (!path.endsWith('.astro')) return '';
  const frontmatter = /^\s*---\r?\n([\s\S]*?)\r?\n---/.exec(text)?.[1] ?? '';
  const scripts = [...text.matchAll(/<script[^>]*>([\s\S]*?)<\/script>/g)].map((found) => found[1]!);
  return [frontmatter, ...scripts].join('\n');
}

export interface Import {
  readonly from: string;
  /** As typed: "#engine", "./rows.ts", "node:fs". */
  readonly specifier: string;
  /** Path from the top for a relative import, else null. */
  readonly target: string | null;
}

/** Everything a file imports or re-exports, types too, by TypeScript's own reader. */
export function importsOf(source: Source): readonly Import[] {
  return ts.preProcessFile(codeOf(source), true, true).importedFiles.map(({ fileName }) => ({
    from: source.path,
    specifier: fileName,
    target: fileName.startsWith('.') ? posix.join(posix.dirname(source.path), fileName) : null,
  }));
}
