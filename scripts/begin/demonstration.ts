// Which files of a content folder are the demonstration's, byte for byte as they came.

import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Files that a group keeps: the manuals, the editors' schema, and the ligands, whose chemistry is real. */
export const kept = /^(?:README\.md|releases\/README\.md|record\.schema\.json|ligands\/.*)$/;

export const manifestFile = join(import.meta.dirname, 'demonstration.json');

/** Fingerprints by path within the content folder. */
export type Manifest = Readonly<Record<string, string>>;

/** The fingerprint of a file's text, whatever its line ends. */
export function fingerprint(text: string): string {
  return createHash('sha256').update(text.replaceAll('\r\n', '\n')).digest('hex').slice(0, 16);
}

/** The demonstration as it came with the program. */
export function readManifest(): Manifest {
  return JSON.parse(readFileSync(manifestFile, 'utf8')) as Manifest;
}

/** The fingerprints of what stands in a content folder now, in the order of their names. */
export function fingerprintsOf(directory: string): Manifest {
  return Object.fromEntries(filesIn(directory).filter((file) => !kept.test(file)).map((file) => [file, fingerprint(readFileSync(join(directory, file), 'utf8'))]));
}

/** Every file below a folder, by its path with forward slashes, in the order of their names; hidden ones left out. */
export function filesIn(directory: string, below = ''): string[] {
  const folder = join(directory, below);
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => !entry.name.startsWith('.'))
    .sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0))
    .flatMap((entry) => {
      const path = below === '' ? entry.name : `${below}/${entry.name}`;
      return entry.isDirectory() ? filesIn(directory, path) : entry.isFile() ? [path] : [];
    });
}
