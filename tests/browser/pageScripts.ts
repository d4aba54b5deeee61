import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { ServedSite } from './site.ts';

const folderOf = (site: ServedSite): string => join(site.folder, '_astro');

/** Scripts that a script brings in when it is loaded, itself among them; what it fetches later on is not counted. */
function reached(folder: string, name: string, seen: Set<string>): Set<string> {
  if (seen.has(name)) return seen;
  seen.add(name);
  const code = readFileSync(join(folder, name), 'utf8');
  for (const [, , other] of code.matchAll(/(?:^|[;}\s])(import|export)(?:[^"'();]*?from)?\s*["'`]\.\/([^"'`]+\.js)["'`]/g)) reached(folder, other!, seen);
  return seen;
}

const weight = (folder: string, names: ReadonlySet<string>): number => [...names].reduce((sum, name) => sum + gzipSync(readFileSync(join(folder, name)), { level: 9 }).length, 0);

/** Bytes of script, compressed, that a page loads. */
export function pageScriptBytes(site: ServedSite, html: string): number {
  const seen = new Set<string>();
  for (const [, name] of html.matchAll(/<script[^>]+src="[^"]*\/_astro\/([^"]+)"/g)) reached(folderOf(site), name!, seen);
  return weight(folderOf(site), seen);
}

/** Bytes of script, compressed, that parts of a page fetch together when they are asked for, all that they need counted once. */
export function partScriptBytes(site: ServedSite, ...parts: readonly string[]): number {
  const folder = folderOf(site);
  const seen = new Set<string>();
  for (const part of parts) {
    const name = readdirSync(folder).find((one) => one.startsWith(`${part}.`) && one.endsWith('.js'));
    if (name === undefined) throw new Error(`no script ${part}`);
    reached(folder, name, seen);
  }
  return weight(folder, seen);
}
