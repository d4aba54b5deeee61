// One run at a time writes a database or a site. The lock is a file beside the target that names who holds it.

import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { isRunning } from './litter.ts';

/** Another run holds the lock. */
export class LockedError extends Error {}

export const lockOf = (target: string): string => join(dirname(target), `.${basename(target)}.lock`);

/**
 * Runs `body` while holding the locks of all targets; a lock of a process that is gone is taken over.
 *
 * @throws LockedError at once where another run holds one of them: waiting would hide that two people, or two services, write to one place
 */
export async function whileLocked<T>(command: string, targets: readonly string[], body: () => T | Promise<T>): Promise<T> {
  const held: string[] = [];
  const release = (): void => {
    for (const lock of held.splice(0)) rmSync(lock, { force: true });
  };
  // A command that is told to stop leaves by process.exit.
  process.once('exit', release);
  try {
    for (const target of new Set(targets)) held.push(take(lockOf(target), target, command));
    return await body();
  } finally {
    release();
    process.off('exit', release);
  }
}

function take(lock: string, target: string, command: string): string {
  mkdirSync(dirname(lock), { recursive: true });
  // Written whole under a name of its own and then linked: nobody ever reads half a lock.
  const own = `${lock}.${process.pid}`;
  writeFileSync(own, `${process.pid} npm run ${command}\n`);
  try {
    for (let round = 0; round < 3; round++) {
      if (linked(own, lock)) return lock;
      const holder = holderOf(lock);
      if (holder !== null && isRunning(holder.pid)) {
        throw new LockedError(`${holder.command} (process ${holder.pid}) is writing ${target}. Wait until it has ended; if no such run exists, delete ${lock} and start again`);
      }
      if (holder !== null) removeStale(lock, holder.text);
    }
    throw new LockedError(`another run keeps taking ${lock}: start again when it has ended`);
  } finally {
    rmSync(own, { force: true });
  }
}

function linked(own: string, lock: string): boolean {
  try {
    linkSync(own, lock);
    return true;
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'EEXIST') return false;
    throw error;
  }
}

interface Holder {
  readonly pid: number;
  readonly command: string;
  readonly text: string;
}

function holderOf(lock: string): Holder | null {
  try {
    const text = readFileSync(lock, 'utf8');
    const [, pid, command] = /^(\d+) (.*)\n$/.exec(text) ?? [];
    return { pid: Number(pid ?? 0), command: command ?? 'another run', text };
  } catch {
    // It ended in between.
    return null;
  }
}

/** Takes a stale lock away, unless another run was quicker and holds its own by now. */
function removeStale(lock: string, seen: string): void {
  const aside = `${lock}.${process.pid}.stale`;
  try {
    renameSync(lock, aside);
  } catch {
    return;
  }
  if (readFileSync(aside, 'utf8') !== seen) linked(aside, lock);
  rmSync(aside, { force: true });
}
