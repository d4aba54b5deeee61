import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { runWatched } from './process.ts';
import { median } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

const record = `formula: "[Cr(NH3)4(H2O)2]3+"
ion: Cr(III)
geometry: octahedral
isomer: cis
ligands: { ammine: 4, aqua: 2 }
measurements:
  - id: aq-295
    phase: solution
    temperature: 295 K
    source: { notebook: "1, p. 1" }
    bands:
      - { position: 20300(80) cm-1, kind: maximum, term: 4T2g }
      - { position: 27200(120) cm-1, kind: maximum, term: 4T1g(F) }
`;

/** One new record against the collection of a folder that has been refitted, the command in a process of its own. */
export async function measureCompare(folder: string, complexes: number): Promise<Measured[]> {
  const file = join(folder, 'new-record.yaml');
  writeFileSync(file, record);
  const words = [join('scripts', 'require-node.mjs'), join('scripts', 'compare.ts'), file, '--database', join(folder, 'collection.sqlite'), '--content', join(folder, 'content'), '--json'];
  const times: number[] = [];
  for (let i = 0; i < 5; i += 1) times.push((await runWatched(words, {})).seconds);
  return [{ name: 'compare, one record', value: median(times), unit: 's', over: `the middle of five, against ${complexes} complexes, the whole command without npm` }];
}
