// Names for work in progress beside its target, and the removal of what killed runs left of it.

import { readdirSync, rmSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';

type Kind = 'tmp' | 'new' | 'old';

/** A hidden name beside `target` that no other running process uses: ".dist.4711.new". */
export function besideTarget(target: string, kind: Kind): string {
  return join(dirname(target), `.${basename(target)}.${process.pid}.${kind}`);
}

/** Removes what earlier runs, no longer running, left beside `target`. */
export function removeLitter(target: string): void {
  const start = `.${basename(target)}.`;
  for (const entry of readdirSync(dirname(target))) {
    const pid = entry.startsWith(start) ? /^(\d+)\.(?:tmp|new|old)$/.exec(entry.slice(start.length))?.[1] : undefined;
    if (pid !== undefined && !isRunning(Number(pid))) rmSync(join(dirname(target), entry), { recursive: true, force: true });
  }
}

/** Whether a process of this number runs. */
export function isRunning(pid: number): boolean {
  if (!(pid > 0)) return false;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}
