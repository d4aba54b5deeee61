import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { noCache, openCache } from '../../../scripts/database/cache.ts';

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'bandstead-'));
});
afterEach(() => {
  rmSync(folder, { recursive: true });
});

function keep(file: string, fresh: readonly [string, string][], current: readonly string[]): void {
  const cache = openCache(file);
  for (const [key, json] of fresh) cache.put(key, json);
  cache.keepOnly(new Set(current));
  cache.close();
}

function read(file: string, keys: readonly string[]): (string | null)[] {
  const cache = openCache(file);
  const found = keys.map((key) => cache.get(key));
  cache.close();
  return found;
}

describe('the cache of readings', () => {
  it('gives back what it keeps and drops what is no longer current', () => {
    const file = join(folder, 'deep', 'readings.sqlite');
    keep(file, [['a', '1'], ['b', '2']], ['a', 'b']);
    expect(read(file, ['a', 'b', 'c'])).toEqual(['1', '2', null]);
    keep(file, [['c', '3']], ['b', 'c']);
    expect(read(file, ['a', 'b', 'c'])).toEqual([null, '2', '3']);
  });

  it('starts anew where the file is damaged', () => {
    const file = join(folder, 'readings.sqlite');
    writeFileSync(file, 'this is not a database at all '.repeat(50));
    keep(file, [['a', '1']], ['a']);
    expect(read(file, ['a'])).toEqual(['1']);
  });

  it('is passed over where the file cannot be opened', () => {
    const file = join(folder, 'readings.sqlite');
    mkdirSync(file);
    expect(openCache(file)).toBe(noCache);
  });
});
