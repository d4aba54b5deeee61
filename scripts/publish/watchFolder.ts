import { readdirSync, watch } from 'node:fs';
import type { FSWatcher } from 'node:fs';
import { join } from 'node:path';

/** Editors write a file in several steps, and a checkout touches many: wait until it has been quiet for this long, in ms. */
const quiet = 150;

/**
 * Calls `changed` when anything in the folder has changed and the folder has been quiet for a moment. One call at a time: what
 * changes during a call leads to one more. Returns a function that ends the watch.
 */
export function watchFolder(folder: string, changed: () => Promise<void>): () => void {
  let timer: NodeJS.Timeout | null = null;
  let busy = false;
  let again = false;
  const run = async (): Promise<void> => {
    if (busy) {
      again = true;
      return;
    }
    busy = true;
    try {
      await changed();
    } finally {
      busy = false;
    }
    if (again) {
      again = false;
      plan();
    }
  };
  const plan = (): void => {
    if (timer !== null) clearTimeout(timer);
    timer = setTimeout(() => {
      timer = null;
      void run();
    }, quiet);
  };
  const watchers = watchEveryFolder(folder, plan);
  return () => {
    if (timer !== null) clearTimeout(timer);
    watchers.close();
  };
}

// Node's own recursive watch on Linux follows files, and loses a file that an editor replaces by renaming a new one over it.
// A watch on each folder sees both; folders made later join in.
function watchEveryFolder(top: string, changed: () => void): { readonly close: () => void } {
  const watched = new Map<string, FSWatcher>();
  const seen = (): void => {
    follow();
    changed();
  };
  const follow = (): void => {
    const folders = new Set(foldersBelow(top));
    for (const [folder, watcher] of watched) {
      if (folders.has(folder)) continue;
      watcher.close();
      watched.delete(folder);
    }
    for (const folder of folders) {
      if (watched.has(folder)) continue;
      const watcher = watch(folder, seen);
      watcher.on('error', () => {
        watcher.close();
        watched.delete(folder);
      });
      watched.set(folder, watcher);
    }
  };
  follow();
  return {
    close: () => {
      for (const watcher of watched.values()) watcher.close();
    },
  };
}

function foldersBelow(top: string): string[] {
  try {
    const below = readdirSync(top, { withFileTypes: true }).filter((entry) => entry.isDirectory());
    return [top, ...below.flatMap(({ name }) => foldersBelow(join(top, name)))];
  } catch {
    return [];
  }
}
