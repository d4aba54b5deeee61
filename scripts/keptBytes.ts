import { createHash, randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';

/** Folder of what is dear to make and hangs on nothing but its content: BANDSTEAD_CACHE, else .cache where the command runs. */
const folder = (): string => resolve(process.cwd(), process.env['BANDSTEAD_CACHE'] ?? '.cache', 'drawings');

/**
 * Bytes that a function makes of a text, made once and kept: the name of the file is the hash of the text, so that nothing old is ever taken
 * for new. A folder that cannot be written to costs time, not the build.
 * @param kind end of the file's name, "png"
 * @param from all that the bytes hang on, the maker's version with it
 */
export function keptBytes(kind: string, from: string, make: () => Uint8Array): Uint8Array {
  const file = join(folder(), `${createHash('sha256').update(from).digest('hex').slice(0, 40)}.${kind}`);
  try {
    return readFileSync(file);
  } catch {
    const made = make();
    try {
      mkdirSync(folder(), { recursive: true });
      // Renamed into place: a killed build, or two at once, leave no half file.
      const beside = `${file}.${randomBytes(4).toString('hex')}`;
      writeFileSync(beside, made);
      renameSync(beside, file);
    } catch { /* Nothing kept. */ }
    return made;
  }
}
