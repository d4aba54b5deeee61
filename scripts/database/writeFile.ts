import { closeSync, fsyncSync, mkdirSync, openSync, renameSync, rmSync, statSync, writeSync } from 'node:fs';
import { dirname } from 'node:path';
import { besideTarget, removeLitter } from '../litter.ts';

/**
 * Puts `bytes` at `path` whole or not at all: a temporary file in the same folder, synced, then renamed over the old one.
 * Missing folders are made. On any failure the old file stands untouched and the temporary file is removed;
 * what a killed run left is removed by the next.
 */
export function replaceFile(path: string, bytes: Uint8Array): void {
  const folder = dirname(path);
  mkdirSync(folder, { recursive: true });
  removeLitter(path);
  const temporary = besideTarget(path, 'tmp');
  try {
    writeSynced(temporary, bytes);
    renameSync(temporary, path);
  } catch (error) {
    rmSync(temporary, { force: true });
    throw error;
  }
  syncFolder(folder);
}

function writeSynced(path: string, bytes: Uint8Array): void {
  const file = openSync(path, 'w');
  try {
    for (let written = 0; written < bytes.length; ) written += writeSync(file, bytes, written);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
}

/** Syncs a file that is written, and renames it over its target. */
export function renameSynced(from: string, to: string): void {
  const file = openSync(from, 'r+');
  try {
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
  renameSync(from, to);
  syncFolder(dirname(to));
}

/** Bytes that are written to learn why a write failed. */
const probed = 1_000_000;

/**
 * For an error of SQLite's that a write failed: the system's own error, found by writing as much plainly in the place of `file`, which is lost.
 * Any other error, and one that does not come again, is given back as it is.
 */
export function plainWriteError(error: unknown, file: string): unknown {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  if (!/^SQLITE_(?:FULL|IOERR|CANTOPEN)/.test(code)) return error;
  try {
    writeSynced(file, new Uint8Array((statSync(file, { throwIfNoEntry: false })?.size ?? 0) + probed));
  } catch (reason) {
    return reason;
  }
  return error;
}

// Some systems cannot open a folder for syncing; the rename has happened by then, so that is no failure.
function syncFolder(folder: string): void {
  try {
    const handle = openSync(folder, 'r');
    try {
      fsyncSync(handle);
    } finally {
      closeSync(handle);
    }
  } catch {
    return;
  }
}
