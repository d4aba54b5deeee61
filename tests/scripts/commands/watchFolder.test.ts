import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { watchFolder } from '../../../scripts/publish/watchFolder.ts';

let folder = '';
let calls = 0;
let end: () => void = () => undefined;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'bandstead-'));
  mkdirSync(join(folder, 'complexes'));
  calls = 0;
});
afterEach(() => {
  end();
  rmSync(folder, { recursive: true });
});

/** Waits until the count of calls is reached, or three seconds have gone by. */
async function reached(count: number): Promise<number> {
  for (let i = 0; i < 60 && calls < count; i += 1) await wait(50);
  return calls;
}

function replace(name: string, text: string): void {
  writeFileSync(join(folder, 'complexes', 'new'), text);
  renameSync(join(folder, 'complexes', 'new'), join(folder, 'complexes', name));
}

describe('watching the content', () => {
  it('sees a file that is replaced by renaming another over it, again and again', async () => {
    replace('a.yaml', '1');
    end = watchFolder(folder, async () => { calls += 1; });
    for (const count of [1, 2, 3]) {
      replace('a.yaml', `text ${count}`);
      expect(await reached(count)).toBe(count);
    }
  });

  it('sees files in a folder that was made later', async () => {
    end = watchFolder(folder, async () => { calls += 1; });
    mkdirSync(join(folder, 'sources'));
    expect(await reached(1)).toBe(1);
    writeFileSync(join(folder, 'sources', 'a.yaml'), '1');
    expect(await reached(2)).toBe(2);
  });

  it('answers a burst of changes once, and a change during the answer once more', async () => {
    end = watchFolder(folder, async () => {
      calls += 1;
      if (calls === 1) writeFileSync(join(folder, 'complexes', 'late.yaml'), '1');
      await wait(300);
    });
    for (let i = 0; i < 20; i += 1) writeFileSync(join(folder, 'complexes', `${i}.yaml`), '1');
    expect(await reached(2)).toBe(2);
    await wait(800);
    expect(calls).toBe(2);
  });
});
