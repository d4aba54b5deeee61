import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { FreeIon, Measurement, Policy } from '#engine';

const engineFolder = fileURLToPath(new URL('../../engine', import.meta.url));
const packageFile = new URL('../../package.json', import.meta.url);

/** sha256, in hex, of the engine's sources: names and contents in binary order of name, and the version of its one dependency. */
export function engineHash(folder: string = engineFolder): string {
  const hash = createHash('sha256');
  const names = readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .map((name) => name.replaceAll('\\', '/'))
    .filter((name) => name.endsWith('.ts'))
    .sort();
  for (const name of names) hash.update(`${name}\0`).update(readFileSync(join(folder, name))).update('\0');
  return hash.update(matrixVersion()).digest('hex');
}

let ofThisProcess: string | null = null;

/** `engineHash` of the sources that this process runs: taken once, for a change on the disk does not change what is loaded. */
export function loadedEngineHash(): string {
  ofThisProcess ??= engineHash();
  return ofThisProcess;
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
function matrixVersion(): string {
  const { dependencies } = JSON.parse(readFileSync(packageFile, 'utf8')) as { dependencies: Record<string, string> };
  return `ml-matrix ${dependencies['ml-matrix']}`;
}
