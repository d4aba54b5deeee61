import { copyFileSync, existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import type { BeginPlan } from './plan.ts';

/**
 * Does what the plan says. group.yaml is written last: a run that was cut short can be run again.
 * @throws what the disk has to say
 */
export function carryOut(directory: string, { remove, write }: BeginPlan): void {
  for (const { path, oldTextTo } of write) {
    if (oldTextTo !== null) copyFileSync(join(directory, path), join(directory, oldTextTo));
  }
  for (const path of remove) rmSync(join(directory, path));
  const last = (path: string): number => (path === 'group.yaml' ? 1 : 0);
  for (const { path, text } of [...write].sort((a, b) => last(a.path) - last(b.path))) {
    mkdirSync(dirname(join(directory, path)), { recursive: true });
    writeFileSync(join(directory, path), text);
  }
  for (const folder of ['complexes', 'ligands', 'sources']) {
    if (!existsSync(join(directory, folder))) mkdirSync(join(directory, folder), { recursive: true });
  }
}
