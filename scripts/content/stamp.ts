import { mkdirSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** Content that was edited while it was being read or fitted: what came of it belongs to no one state of the folder. */
export class ContentChangedError extends Error {}

/** Every file of a content folder with its size, its time of change and its identity on the disk: told in milliseconds, without reading. */
export type ContentStamp = ReadonlyMap<string, string>;

export function stampContent(directory: string): ContentStamp {
  const stamp = new Map<string, string>();
  for (const name of filesUnder(directory)) {
    const found = statSync(join(directory, name), { bigint: true, throwIfNoEntry: false });
    if (found !== undefined) stamp.set(name, `${found.size} ${found.mtimeNs} ${found.ino}`);
  }
  return stamp;
}

/** Two changes closer than this may bear the same time of change on some disks, ns. */
const grain = 2_000_000_000n;

/** What the disk says the time is, ns: the time of change of `file`, which is written and removed. null: it cannot be written. */
export function diskTime(file: string): bigint | null {
  try {
    mkdirSync(dirname(file), { recursive: true });
    writeFileSync(file, '');
    const { mtimeNs } = statSync(file, { bigint: true });
    rmSync(file);
    return mtimeNs;
  } catch {
    return null;
  }
}

/** Whether a stamp names one state of its file for good: at the time of the stamp the file had not changed lately. */
export function isSettled(stamp: string, time: bigint | null): boolean {
  return time !== null && BigInt(stamp.split(' ')[1]!) < time - grain;
}

function filesUnder(directory: string): string[] {
  try {
    return readdirSync(directory, { recursive: true, encoding: 'utf8' }).filter((name) => /\.(?:ya?ml|json)$/i.test(name)).sort();
  } catch {
    // Reading the content says what is wrong with the folder.
    return [];
  }
}

/** @throws ContentChangedError where the folder differs from the stamp */
export function holdContent(directory: string, before: ContentStamp): void {
  const now = stampContent(directory);
  const changed = [...new Set([...before.keys(), ...now.keys()])].filter((name) => before.get(name) !== now.get(name));
  if (changed.length === 0) return;
  const more = changed.length > 3 ? ` and ${changed.length - 3} more` : '';
  throw new ContentChangedError(`the content changed during the run: ${changed.slice(0, 3).join(', ')}${more}. What was being written was dropped; start again`);
}
