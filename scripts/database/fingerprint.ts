import { createHash } from 'node:crypto';
import type { Hash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { FreeIon, Measurement, Policy } from '#engine';
import type { History } from '../release/types.ts';
import type { CollectionFrame } from './rows/collection.ts';

const engineFolder = fileURLToPath(new URL('../../engine', import.meta.url));
const scriptsFolder = fileURLToPath(new URL('..', import.meta.url));
const packageFile = new URL('../../package.json', import.meta.url);

/** sha256, in hex, of the engine's sources: names and contents in binary order of name, and the version of its one dependency. */
export function engineHash(folder: string = engineFolder): string {
  return sourcesHash(folder, createHash('sha256')).update(versionOf('ml-matrix')).digest('hex');
}

function sourcesHash(folder: string, hash: Hash): Hash {
  const names = readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .map((name) => name.replaceAll('\\', '/'))
    .filter((name) => /\.(?:ts|sql)$/.test(name))
    .sort();
  for (const name of names) hash.update(`${name}\0`).update(readFileSync(join(folder, name))).update('\0');
  return hash;
}

let ofThisProcess: string | null = null;

/** `engineHash` of the sources that this process runs: taken once, for a change on the disk does not change what is loaded. */
export function loadedEngineHash(): string {
  ofThisProcess ??= engineHash();
  return ofThisProcess;
}

let rowsOfThisProcess: string | null = null;

// All that turns records into rows.
function loadedRowsHash(): string {
  rowsOfThisProcess ??= ['content', 'database', 'release', 'structures']
    .reduce((hash, folder) => sourcesHash(join(scriptsFolder, folder), hash), createHash('sha256').update(loadedEngineHash()))
    .update(['yaml', 'zod', 'better-sqlite3', 'openchemlib'].map(versionOf).join(' ')).digest('hex');
  return rowsOfThisProcess;
}

/** sha256, in hex, of all that the rows of every complex hang on beside its own record. */
export function basisHash({ policy, ligands, sources }: CollectionFrame): string {
  return createHash('sha256').update(JSON.stringify([policy, ligands, sources.map(({ id }) => id), loadedRowsHash(), process.versions.v8])).digest('hex');
}

/** sha256, in hex, of all that the other rows hang on beside the complexes and their basis. */
export function wholeHash(frame: CollectionFrame, history: History): string {
  return createHash('sha256').update(JSON.stringify([frame, history, softwareName()])).digest('hex');
}

/** Name and version of this software, "bandstead 0.1.0". */
export function softwareName(): string {
  const { name, version } = JSON.parse(readFileSync(packageFile, 'utf8')) as { name: string; version: string };
  return `${name} ${version}`;
}

/**
 * sha256, in hex, of everything that a measurement's readings depend on: the measurement as the engine sees it, the policy,
 * the free ion, the engine's sources, and the JavaScript engine, whose elementary functions differ in the last bit between versions.
 */
export function readingKey(measurement: Measurement, policy: Policy, freeIon: FreeIon | null, engine: string): string {
  return createHash('sha256').update(JSON.stringify([measurement, policy, freeIon, engine, process.versions.v8])).digest('hex');
}

// The version is pinned in package.json, so that is what was installed.
function versionOf(name: string): string {
  const { dependencies } = JSON.parse(readFileSync(packageFile, 'utf8')) as { dependencies: Record<string, string> };
  return `${name} ${dependencies[name]}`;
}
