import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { inject } from 'vitest';
import './folder.ts';

/**
 * A folder that several test files only read, made once a run: the first that asks for `name` makes it by `make`, the others wait for it.
 * Throws for each of them what the making threw.
 */
export async function sharedFolder(name: string, make: (folder: string) => void | Promise<void>): Promise<string> {
  const done = join(inject('runFolder'), name);
  const failed = `${done}.failed`;
  if (claim(`${done}.claimed`)) {
    const making = `${done}.making`;
    try {
      mkdirSync(making);
      await make(making);
      renameSync(making, done);
    } catch (error) {
      writeFileSync(failed, error instanceof Error ? error.message : String(error));
      throw error;
    }
  }
  while (!existsSync(done)) {
    if (existsSync(failed)) throw new Error(readFileSync(failed, 'utf8'));
    await wait(50);
  }
  return done;
}

/** Whether this caller is the first of the run. */
function claim(file: string): boolean {
  try {
    writeFileSync(file, '', { flag: 'wx' });
    return true;
  } catch {
    return false;
  }
}
