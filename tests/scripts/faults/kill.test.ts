import { spawn } from 'node:child_process';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { seeded } from '../../published/random.ts';
import { plainEnvironment, runScript } from '../commands/runScript.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';
import { copyOf, folderHash, hashOf, litterIn, writeState } from './contents.ts';

// A run that is killed leaves the old database and site, or the new ones, whole; the next run does its work and clears up.

const long = process.env['BANDSTEAD_LONG'] === '1';
const kills = long ? { refit: 250, build: 50 } : { refit: 17, build: 3 };

const place = temporaryFolder();
afterAll(() => place.remove());
const at = (name: string): string => join(place.path, name);
const settings = { BANDSTEAD_CACHE: place.path };

/** Starts a command, kills it after so many milliseconds with everything it started or alone; true where it was still running. */
async function killAfter(name: string, words: readonly string[], milliseconds: number, whole: boolean): Promise<boolean> {
  const child = spawn(process.execPath, ['scripts/require-node.mjs', `scripts/${name}.ts`, ...words], { cwd: projectFolder, env: plainEnvironment(settings), stdio: 'ignore', detached: true });
  const ended = new Promise<boolean>((resolve) => { child.once('exit', (code) => resolve(code === null)); });
  const timer = setTimeout(() => {
    try {
      process.kill(whole ? -child.pid! : child.pid!, 'SIGKILL');
    } catch {
      // It ended by itself.
    }
  }, milliseconds);
  const killed = await ended;
  clearTimeout(timer);
  // A page builder that lost its parent must not write on while the next run starts.
  if (killed && !whole) await wait(50);
  try {
    if (killed) process.kill(-child.pid!, 'SIGKILL');
  } catch {
    // Nothing of it runs any more.
  }
  return killed;
}

let [oldHash, newHash] = ['', ''];
let full = 0;
beforeAll(() => {
  writeState(at('old'), 21550);
  writeState(at('new'), 21700);
  expect(runScript('refit', ['--content', at('old'), '--database', at('old.sqlite')], settings).code).toBe(0);
  const started = performance.now();
  expect(runScript('refit', ['--content', at('new'), '--database', at('new.sqlite'), '--cold'], settings).code).toBe(0);
  full = performance.now() - started;
  [oldHash, newHash] = [hashOf(at('old.sqlite'))!, hashOf(at('new.sqlite'))!];
  expect(newHash).not.toBe(oldHash);
}, 60_000);

describe('a refit that is killed', () => {
  test(`leaves the old database or the new one, whole (${kills.refit} kills)`, async () => {
    const next = seeded(11);
    let killed = 0;
    for (let n = 0; n < kills.refit; n++) {
      const folder = at(`refit-${n}`);
      copyOf(at('old.sqlite'), join(folder, 'c.sqlite'));
      const words = ['--content', at('new'), '--database', join(folder, 'c.sqlite'), ...(n % 2 === 0 ? ['--cold'] : [])];
      const started = performance.now();
      if (await killAfter('refit', words, full * (0.2 + 0.85 * next()), true)) killed += 1;
      // The machine may have become quicker than when the whole run was timed.
      else full = Math.min(full, performance.now() - started);
      expect([oldHash, newHash]).toContain(hashOf(join(folder, 'c.sqlite')));
      if (n % 5 === 0) {
        expect(runScript('refit', words, settings).code).toBe(0);
        expect(hashOf(join(folder, 'c.sqlite'))).toBe(newHash);
        expect(litterIn(folder)).toEqual([]);
      }
      rmSync(folder, { recursive: true });
    }
    expect(killed).toBeGreaterThan(kills.refit / 4);
  }, 3_600_000);
});

describe('a build that is killed', () => {
  test(`leaves the old site or the new one, whole (${kills.build} kills)`, async () => {
    const folder = at('site');
    const words = (state: string): string[] => ['--content', at(state), '--database', join(folder, 'c.sqlite'), '--out', join(folder, 'dist')];
    const build = (state: string): number => {
      const started = performance.now();
      expect(runScript('build', words(state), settings)).toMatchObject({ code: 0, stderr: '' });
      return performance.now() - started;
    };
    let whole = build('old');
    const oldSite = folderHash(join(folder, 'dist'));
    const next = seeded(12);
    const seen = new Set([oldSite]);
    let killed = 0;
    for (let n = 0; n < kills.build; n++) {
      const started = performance.now();
      if (await killAfter('build', words('new'), whole * (0.15 + 0.85 * next()), n % 2 === 0)) killed += 1;
      else whole = Math.min(whole, performance.now() - started);
      expect([oldHash, newHash]).toContain(hashOf(join(folder, 'c.sqlite')));
      seen.add(folderHash(join(folder, 'dist')));
      if (n % 10 === 9) build('old');
    }
    expect(killed).toBeGreaterThan(0);
    build('new');
    const newSite = folderHash(join(folder, 'dist'));
    expect(newSite).not.toBe(oldSite);
    expect([...seen].filter((hash) => hash !== oldSite && hash !== newSite)).toEqual([]);
    expect(litterIn(folder)).toEqual([]);
  }, 3_600_000);
});
