import { closeSync, fsyncSync, mkdirSync, openSync, renameSync, rmSync, writeSync } from 'node:fs';
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
