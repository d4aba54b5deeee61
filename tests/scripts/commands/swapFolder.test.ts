import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { replaceFile } from '../../../scripts/database/writeFile.ts';
import { swapFolder } from '../../../scripts/publish/swapFolder.ts';
import { temporaryFolder } from './sampleContent.ts';

let place = temporaryFolder();
let target = '';
beforeEach(() => {
  place = temporaryFolder();
  target = join(place.path, 'dist');
  mkdirSync(target);
  writeFileSync(join(target, 'old.html'), 'old');
});
afterEach(() => place.remove());

describe('the swap of the site', () => {
  it('puts the new folder whole in the place of the old one', async () => {
    await swapFolder(target, async (folder) => writeFileSync(join(folder, 'new.html'), 'new'));
    expect(readdirSync(target)).toEqual(['new.html']);
    expect(readdirSync(place.path)).toEqual(['dist']);
  });

  it('leaves the old folder and no litter where the work fails halfway', async () => {
    const work = swapFolder(target, async (folder) => {
      writeFileSync(join(folder, 'half.html'), 'half');
      throw new Error('the disk is full');
    });
    await expect(work).rejects.toThrow('the disk is full');
    expect(readFileSync(join(target, 'old.html'), 'utf8')).toBe('old');
    expect(readdirSync(place.path)).toEqual(['dist']);
  });

  it('makes the folder where there was none', async () => {
    const fresh = join(place.path, 'deep', 'site');
    await swapFolder(fresh, async (folder) => writeFileSync(join(folder, 'new.html'), 'new'));
    expect(readdirSync(fresh)).toEqual(['new.html']);
  });
});

describe('what killed runs left', () => {
  // No process has this number: it is above the system's limit.
  const dead = 4_194_399;

  it('is removed by the next run, and nothing else is', async () => {
    for (const name of [`.dist.${dead}.new`, `.dist.${process.pid}.old`, '.dist.notes', `.other.${dead}.new`]) mkdirSync(join(place.path, name));
    writeFileSync(join(place.path, `.dist.${dead}.tmp`), 'half');
    await swapFolder(target, async () => undefined);
    expect(readdirSync(place.path).sort()).toEqual(['.dist.notes', `.other.${dead}.new`, 'dist'].sort());
  });

  it('of a database is removed too', () => {
    writeFileSync(join(place.path, `.a.sqlite.${dead}.tmp`), 'half');
    replaceFile(join(place.path, 'a.sqlite'), Buffer.from('new'));
    expect(readdirSync(place.path).sort()).toEqual(['a.sqlite', 'dist']);
    expect(readFileSync(join(place.path, 'a.sqlite'), 'utf8')).toBe('new');
  });
});
