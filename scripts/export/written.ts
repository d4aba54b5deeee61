import { createHash } from 'node:crypto';
import { closeSync, mkdirSync, openSync, writeSync } from 'node:fs';
import { dirname, join } from 'node:path';
import type { DataFile } from './files.ts';
import type { WrittenFile } from './metadata/dataPackage.ts';

/** Writes a file into a folder, whole or part by part, and returns it with its size and hash. */
export function written(folder: string, file: DataFile, content: string | Buffer | Iterable<string>): WrittenFile {
  const path = join(folder, file.name);
  mkdirSync(dirname(path), { recursive: true });
  const handle = openSync(path, 'w');
  const hash = createHash('sha256');
  let bytes = 0;
  try {
    for (const part of typeof content === 'string' || Buffer.isBuffer(content) ? [content] : content) {
      const chunk = typeof part === 'string' ? Buffer.from(part, 'utf8') : part;
      for (let at = 0; at < chunk.length; ) at += writeSync(handle, chunk, at);
      hash.update(chunk);
      bytes += chunk.length;
    }
  } finally {
    closeSync(handle);
  }
  return { ...file, bytes, sha256: hash.digest('hex') };
}
