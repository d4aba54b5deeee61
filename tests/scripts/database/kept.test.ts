import { readFileSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { refit } from '../../../scripts/database/refit.ts';
import { sampleContent, temporaryFolder } from '../commands/sampleContent.ts';

const place = temporaryFolder();
afterAll(() => place.remove());
const content = sampleContent();
const complex = join(content, 'complexes', 'co3-am6.yaml');
const [database, cold, cache] = [join(place.path, 'a.sqlite'), join(place.path, 'cold.sqlite'), join(place.path, 'cache.sqlite')];

function run(target: string, kept: string | null): { readonly refitted: number; readonly bytes: Buffer } {
  const result = refit({ content, database: target, cache: kept });
  if (!result.ok) throw new Error(JSON.stringify(result.faults));
  return { refitted: result.refit.refitted, bytes: readFileSync(target) };
}

/** Another position of the same length, with the time of change that the file had. */
function changeUnseen(from: string, to: string): void {
  const { atime, mtime } = statSync(complex);
  writeFileSync(complex, readFileSync(complex, 'utf8').replace(from, to));
  utimesSync(complex, atime, mtime);
}

describe('complexes kept from the last run', () => {
  it('a file that changed shortly before the run is read again even where its stamp is the same', () => {
    writeFileSync(complex, readFileSync(complex));
    // Whole milliseconds: a time that can be set again.
    const { mtime } = statSync(complex);
    utimesSync(complex, mtime, mtime);
    run(database, cache);
    changeUnseen('21050', '21060');
    const again = run(database, cache);
    expect(again.refitted).toBe(1);
    expect(again.bytes.equals(run(cold, null).bytes)).toBe(true);
  });

  it('a file that had long been as it is, is not read', () => {
    utimesSync(complex, 1e9, 1e9);
    const before = run(database, cache).bytes;
    changeUnseen('21060', '21070');
    expect(run(database, cache).bytes.equals(before)).toBe(true);
    utimesSync(complex, 1e9, 1e9 + 1);
    const again = run(database, cache);
    expect(again.refitted).toBe(1);
    expect(again.bytes.equals(run(cold, null).bytes)).toBe(true);
  });

  it('a change of the group alone is written without a fit', () => {
    writeFileSync(join(content, 'group.yaml'), readFileSync(join(content, 'group.yaml'), 'utf8').replace(/^title: .*$/m, 'title: Another title'));
    const again = run(database, cache);
    expect(again.refitted).toBe(0);
    expect(again.bytes.includes('Another title')).toBe(true);
    expect(again.bytes.equals(run(cold, null).bytes)).toBe(true);
  });

  it('a database that is not the one it wrote is no base', () => {
    const whole = run(database, cache).bytes;
    writeFileSync(database, whole.subarray(0, whole.length / 2));
    expect(run(database, cache).bytes.equals(whole)).toBe(true);
  });
});
