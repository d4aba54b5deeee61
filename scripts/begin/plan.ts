// What beginning a collection does to a content folder; nothing is done here.

import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { plainValue } from '../content/node.ts';
import { readYaml } from '../content/yaml/read.ts';
import { filesIn, fingerprint, kept } from './demonstration.ts';
import type { Manifest } from './demonstration.ts';

export interface NewFile {
  readonly path: string;
  readonly text: string;
  /** Where the file's old text goes, because it is not the demonstration's and would be lost; null where nothing is lost. */
  readonly oldTextTo: string | null;
}

export interface BeginPlan {
  /** Files of the demonstration, as they came. */
  readonly remove: readonly string[];
  /** Records that are not the demonstration's as it came: own ones, and demonstration records that were edited or are cited by those. */
  readonly keep: readonly string[];
  readonly write: readonly NewFile[];
}

/** true where group.yaml says "demonstration: true". */
export function isDemonstration(directory: string): boolean {
  const file = join(directory, 'group.yaml');
  if (!existsSync(file)) return false;
  const { root } = readYaml(readFileSync(file, 'utf8'));
  const group = root === null ? null : plainValue(root);
  return typeof group === 'object' && group !== null && 'demonstration' in group && group.demonstration === 'true';
}

/**
 * Plans the beginning of a collection.
 * @param texts the new files by path; a record among them is not written over one that stands there
 */
export function planBegin(directory: string, manifest: Manifest, texts: Readonly<Record<string, string>>): BeginPlan {
  const present = new Map(filesIn(directory).map((path) => [path, readFileSync(join(directory, path), 'utf8')]));
  const asItCame = (path: string): boolean => Object.hasOwn(manifest, path) && manifest[path] === fingerprint(present.get(path) ?? '');
  const records = [...present.keys()].filter((path) => path.includes('/') && !kept.test(path));
  const own = records.filter((path) => !asItCame(path) && !Object.hasOwn(texts, path));
  const cited = own.map((path) => present.get(path)!).join('\n');
  const isCited = (path: string): boolean => path.startsWith('sources/') && new RegExp(`\\b${path.slice('sources/'.length, -'.yaml'.length)}\\b`).test(cited);
  const remove = records.filter((path) => asItCame(path) && !isCited(path));
  const write = Object.entries(texts).flatMap(([path, text]): NewFile[] => {
    const old = present.get(path);
    if (old === text || (old !== undefined && path.includes('/'))) return [];
    return [{ path, text, oldTextTo: old === undefined || asItCame(path) || path === 'README.md' ? null : freeName(path, present) }];
  });
  return { remove, keep: records.filter((path) => !remove.includes(path)), write };
}

/** "group.yaml.before", or with a number where that is taken. */
function freeName(path: string, present: ReadonlyMap<string, string>): string {
  const name = `${path}.before`;
  for (let number = 2; ; number += 1) {
    const candidate = number === 2 && !present.has(name) ? name : `${name}-${number}`;
    if (!present.has(candidate)) return candidate;
  }
}
