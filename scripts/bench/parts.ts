// Where the time of reading measurements goes, by a sampling profile of a process of its own.

import { spawnSync } from 'node:child_process';
import { mkdirSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Measured } from './stopwatch.ts';

/** Parts of the work by the files that are on the call stack; the first that applies. */
const parts: readonly { readonly name: string; readonly files: RegExp }[] = [
  { name: 'blocks and level tables', files: /engine\/(shell\/|readings\/(table|segments)\.ts)/ },
  { name: 'stress', files: /engine\/readings\/stress\.ts/ },
  { name: 'limits', files: /engine\/readings\/(limits|profile)\.ts/ },
  { name: 'predictions', files: /engine\/readings\/(predicted|measureNext)\.ts/ },
  { name: 'words and cautions', files: /engine\/(words|cautions)\// },
  { name: 'fits', files: /engine\/readings\/(fit\w*|scan|freeRatio|allowedFits)\.ts/ },
  { name: 'search for rivals', files: /engine\/readings\/(rivals|search)\.ts/ },
];
const rest = 'rest';

interface Profile {
  readonly nodes: readonly { readonly id: number; readonly callFrame: { readonly url: string }; readonly children?: readonly number[] }[];
  readonly samples: readonly number[];
}

/** What reading one of the generated collections spends on each part, in percent; a fit for the stress table is stress. Throws where the process fails. */
export function measureShares(folder: string): Measured[] {
  const out = join(folder, 'profile');
  mkdirSync(out);
  const ran = spawnSync(process.execPath, ['--cpu-prof', '--cpu-prof-dir', out, '--cpu-prof-interval', '500', fileURLToPath(new URL('./readFolder.ts', import.meta.url)), join(folder, 'content')], { encoding: 'utf8' });
  if (ran.status !== 0) throw new Error(`the profiled process failed: ${ran.stderr}`);
  return shares(JSON.parse(readFileSync(join(out, readdirSync(out)[0]!), 'utf8')) as Profile);
}

function shares({ nodes, samples }: Profile): Measured[] {
  const byId = new Map(nodes.map((node) => [node.id, node]));
  const partOf = new Map<number, string>();
  const settle = (id: number, above: readonly string[]): void => {
    const { callFrame, children = [] } = byId.get(id)!;
    const stack = [...above, callFrame.url];
    // What is not below the engine's reading is start-up and the reading of files.
    if (stack.some((url) => url.endsWith('engine/readings/read.ts'))) partOf.set(id, parts.find(({ files }) => stack.some((url) => files.test(url)))?.name ?? rest);
    for (const child of children) settle(child, stack);
  };
  settle(nodes[0]!.id, []);
  const counted = samples.filter((id) => partOf.has(id));
  return [...parts.map(({ name }) => name), rest].map((name) => ({
    name: `part: ${name}`, value: (100 * counted.filter((id) => partOf.get(id) === name).length) / counted.length, unit: '% of time', over: 'of reading the generated measurements once, from a standing start',
  }));
}
