// Finds and opens the files of a content folder, within the limits of the format.

import { createHash } from 'node:crypto';
import { lstatSync, readdirSync, readFileSync, realpathSync, statSync } from 'node:fs';
import { isAbsolute, join, relative, sep } from 'node:path';
import { badId } from './ids.ts';
import { createReporter, typedText } from './report.ts';
import type { Finding } from './report.ts';
import { nearNames } from './nearest.ts';
import type { Fault } from './types.ts';

/** Largest file that is read, bytes. */
export const largestFile = 1_000_000;

export const recordFolders = ['complexes', 'ligands', 'sources'] as const;
export type RecordFolder = (typeof recordFolders)[number];
const settingFiles = ['group.yaml', 'policy.yaml'] as const;

/** A file by its name; whether it can be read is not known yet. */
export interface FoundFile {
  /** Path within the content folder, with forward slashes: "complexes/cr-am6.yaml". */
  readonly file: string;
  readonly id: string;
}

export interface OpenedFile extends FoundFile {
  readonly text: string;
  /** SHA-256 of the file's bytes, hexadecimal. */
  readonly hash: string;
}

export interface ContentFiles {
  readonly group: FoundFile | null;
  readonly policy: FoundFile | null;
  /** Ascending by id. */
  readonly records: Readonly<Record<RecordFolder, readonly FoundFile[]>>;
  /** Of names and places alone. */
  readonly faults: readonly Fault[];
  /** true where the folder holds content at all. */
  readonly present: boolean;
}

/** Finds every file of a content folder, and opens none. Never throws for what stands in the folder. */
export function findContent(directory: string): ContentFiles {
  const faults: Fault[] = [];
  const say = (file: string, finding: Finding): void => { faults.push(fileFault(file, finding)); };
  const records: Record<RecordFolder, FoundFile[]> = { complexes: [], ligands: [], sources: [] };
  const top = namesIn(directory);
  const known = top.filter((name) => name === 'group.yaml' || (recordFolders as readonly string[]).includes(name));
  if (known.length === 0) {
    say('', {
      code: 'NO_CONTENT', found: top.length === 0 ? 'no folder, or an empty one' : `a folder without group.yaml (${top.slice(0, 3).join(', ')}${top.length > 3 ? ', ...' : ''})`,
      expected: 'a folder with group.yaml, complexes/, ligands/ and sources/',
      mend: 'name the folder by --content DIR, or start one: the example of content/README.md is a complete group.yaml',
    });
    return { group: null, policy: null, records, faults, present: false };
  }
  for (const name of top) {
    if (isPlainName(name) || !/\.ya?ml$/i.test(name) || (settingFiles as readonly string[]).includes(name)) continue;
    const near = nearNames(name, settingFiles, 1);
    say(name, { code: 'FILE_UNKNOWN', found: name, expected: 'group.yaml and policy.yaml at the top; records in complexes/, ligands/ and sources/', mend: near.length > 0 ? `rename it to ${near[0]}` : 'move it into one of these folders' });
  }
  for (const folder of recordFolders) {
    const byId = new Map<string, string>();
    const directories = foldersIn(join(directory, folder));
    for (const name of namesIn(join(directory, folder))) {
      const file = `${folder}/${name}`;
      if (directories.has(name)) {
        say(file, { code: 'FILE_UNKNOWN', found: `a folder within ${folder}/`, expected: `records as files directly in ${folder}/`, mend: 'move the files up one folder' });
        continue;
      }
      if (!/\.ya?ml$/i.test(name)) continue;
      const id = name.replace(/\.ya?ml$/i, '');
      const bad = name.endsWith('.yaml') ? badId(id, 'a file name') : { code: 'FILE_NAME' as const, found: typedText(name), expected: 'a file name that ends in .yaml', mend: `rename it to ${id}.yaml` };
      if (bad !== null) say(file, { ...bad, code: 'FILE_NAME', found: bad.found.startsWith('"') ? bad.found : typedText(bad.found), mend: bad.mend.replace(/^write (\S+?)(?:, for instance)?$/, 'rename it to $1.yaml') });
      const earlier = byId.get(id.toLowerCase());
      if (earlier !== undefined) {
        say(file, { code: 'DUPLICATE_ID', found: `the id "${id}"`, expected: `an id of its own; ${earlier} has it already (capitals and the ending do not count)`, mend: 'rename one of the two files' });
      } else byId.set(id.toLowerCase(), file);
      records[folder].push({ file, id });
    }
  }
  for (const folder of recordFolders) records[folder].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  const setting = (name: string): FoundFile | null => (top.includes(name) ? { file: name, id: name.slice(0, -5) } : null);
  return { group: setting('group.yaml'), policy: setting('policy.yaml'), records, faults, present: true };
}

/** Names in a folder in code-unit order, without hidden ones; none where it cannot be read. */
function namesIn(directory: string): string[] {
  try {
    return readdirSync(directory).filter((name) => !name.startsWith('.') && !name.endsWith('~')).sort();
  } catch {
    return [];
  }
}

/** Names of folders in a folder, and of links to folders. */
function foldersIn(directory: string): ReadonlySet<string> {
  try {
    const entries = readdirSync(directory, { withFileTypes: true });
    return new Set(entries.filter((entry) => (entry.isSymbolicLink() ? statSync(join(directory, entry.name), { throwIfNoEntry: false })?.isDirectory() === true : entry.isDirectory())).map(({ name }) => name));
  } catch {
    return new Set();
  }
}

/** A fault of a file as a whole. */
export function fileFault(file: string, finding: Finding): Fault {
  const report = createReporter(file, null);
  report.at([], finding);
  return report.faults[0]!;
}

function isPlainName(name: string): boolean {
  return !name.includes('.');
}

/** Opens a file of a content folder, or says why it cannot be read. */
export function openFile(directory: string, { file, id }: FoundFile): OpenedFile | Finding {
  const path = join(directory, file);
  try {
    if (leadsOutside(directory, path)) return { code: 'FILE_UNREADABLE', found: 'a link to a place outside the content folder', expected: 'a file of the content folder: all that is published stands in it', mend: 'put the file itself here' };
    const bytes = bytesOf(path);
    if (bytes === null) return { code: 'FILE_UNREADABLE', found: 'something that is not a file', expected: 'a text file', mend: 'remove it' };
    if (typeof bytes === 'number') return { code: 'FILE_TOO_LARGE', found: `${bytes} bytes`, expected: `at most ${largestFile} bytes`, mend: 'keep raw data in files of their own and name them by raw:' };
    const text = utf8.decode(bytes);
    if (text.includes('\u0000')) throw new TypeError('a NUL character');
    return { file, id, text, hash: createHash('sha256').update(bytes).digest('hex') };
  } catch (error) {
    if (error instanceof TypeError) return { code: 'NOT_UTF8', found: 'bytes that are not UTF-8 text', expected: 'a text file in UTF-8', mend: 'save the file again with the encoding UTF-8' };
    return { code: 'FILE_UNREADABLE', found: reason(error), expected: 'a file that can be opened', mend: linkAdvice(path) };
  }
}

/** Whether a file, or a folder on the way to it, is a link that leaves the content folder. */
function leadsOutside(directory: string, path: string): boolean {
  const way = relative(realpathSync.native(directory), realpathSync.native(path));
  return isAbsolute(way) || way.split(sep)[0] === '..';
}

const utf8 = new TextDecoder('utf-8', { fatal: true, ignoreBOM: false });

/** The bytes of a file, its size where it is too large, null where it is no file. */
function bytesOf(path: string): Buffer | number | null {
  const found = statSync(path);
  if (!found.isFile()) return null;
  return found.size > largestFile ? found.size : readFileSync(path);
}

function reason(error: unknown): string {
  return error instanceof Error && 'code' in error ? `the system says ${String(error.code)}` : 'the file cannot be opened';
}

function linkAdvice(path: string): string {
  try {
    return lstatSync(path).isSymbolicLink() ? 'the link leads nowhere: replace it by the file' : 'check who may read the file';
  } catch {
    return 'check who may read the file';
  }
}
