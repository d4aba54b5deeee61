import { createHash } from 'node:crypto';
import { cpSync, existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { writeSample } from '../commands/sampleContent.ts';

/** Writes the sample collection; `position` is that of the first band of cr-am6, by which two states of it differ. */
export function writeState(folder: string, position: number): void {
  writeSample(folder);
  const file = join(folder, 'complexes', 'cr-am6.yaml');
  writeFileSync(file, readFileSync(file, 'utf8').replace('21550(60) cm-1', `${position}(60) cm-1`));
}

export const hashOf = (path: string): string | null => (existsSync(path) ? createHash('sha256').update(readFileSync(path)).digest('hex') : null);

/** One hash over the names and bytes of all files of a folder; null where it is not there. */
export function folderHash(folder: string): string | null {
  if (!existsSync(folder)) return null;
  const hash = createHash('sha256');
  for (const name of readdirSync(folder, { recursive: true, encoding: 'utf8' }).sort()) {
    const path = join(folder, name);
    if (statSync(path).isFile()) hash.update(`${name}\n`).update(readFileSync(path));
  }
  return hash.digest('hex');
}

/** Hidden leftovers of runs beside a target. */
export const litterIn = (folder: string): string[] => readdirSync(folder).filter((name) => /^\..*\.(?:tmp|new|old|lock|stale)$|^\..*\.lock\./.test(name));

export const copyOf = (from: string, to: string): void => cpSync(from, to, { recursive: true });
