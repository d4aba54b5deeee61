import { existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { dirname } from 'node:path';
import { besideTarget, removeLitter } from '../litter.ts';

/**
 * Fills a new folder and puts it in the place of `target` only when `fill` has succeeded. The work is done beside the target, so
 * that the last step is a rename. On failure or interruption the old folder stands; what an interrupted run left is removed by the next.
 */
export async function swapFolder(target: string, fill: (folder: string) => Promise<void>): Promise<void> {
  mkdirSync(dirname(target), { recursive: true });
  removeLitter(target);
  const fresh = besideTarget(target, 'new');
  const old = besideTarget(target, 'old');
  const stop = (signal: NodeJS.Signals): never => {
    rmSync(fresh, { recursive: true, force: true });
    process.exit(signal === 'SIGINT' ? 130 : 143);
  };
  process.once('SIGINT', stop).once('SIGTERM', stop);
  try {
    mkdirSync(fresh);
    await fill(fresh);
    replace(target, fresh, old);
  } finally {
    process.off('SIGINT', stop).off('SIGTERM', stop);
    rmSync(fresh, { recursive: true, force: true });
    rmSync(old, { recursive: true, force: true });
  }
}

function replace(target: string, fresh: string, old: string): void {
  const had = existsSync(target);
  if (had) renameSync(target, old);
  try {
    renameSync(fresh, target);
  } catch (error) {
    if (had) renameSync(old, target);
    throw error;
  }
}
