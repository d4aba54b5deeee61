import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { plainEnvironment } from './runScript.ts';
import { sampleFile, temporaryFolder, writeSample } from './sampleContent.ts';

const place = temporaryFolder();
const content = join(place.path, 'content');
let running: ChildProcess;
let said = '';
let address = '';

/** Waits until `found` gives something, at most half a minute. */
async function until<T>(found: () => T | null | Promise<T | null>): Promise<T> {
  for (let i = 0; i < 150; i += 1) {
    const value = await found();
    if (value !== null) return value;
    await wait(200);
  }
  throw new Error(`it did not come; what was said so far:\n${said}`);
}

async function page(path: string): Promise<string> {
  return (await fetch(address + path)).text();
}

function changeChromium(position: string): void {
  writeSample(content, { 'complexes/cr-am6.yaml': sampleFile('complexes/cr-am6.yaml').replace('21550(60) cm-1', position) });
}

beforeAll(async () => {
  writeSample(content);
  const words = ['scripts/require-node.mjs', 'scripts/dev.ts', '--content', content, '--database', join(place.path, 'a.sqlite'), '--port', '0'];
  running = spawn(process.execPath, words, { cwd: projectFolder, env: plainEnvironment({ BANDSTEAD_CACHE: place.path, BASE_URL: '/misleading/' }) });
  for (const stream of [running.stdout, running.stderr]) stream?.setEncoding('utf8').on('data', (text: string) => { said += text; });
  address = await until(() => /The site is at (http:\S+)/.exec(said)?.[1] ?? null);
}, 60_000);

afterAll(async () => {
  if (running.exitCode === null) {
    running.kill('SIGINT');
    await once(running, 'exit');
  }
  place.remove();
}, 30_000);

describe('dev', { timeout: 60_000 }, () => {
  it('serves the pages under the base path of the group\'s URL', async () => {
    expect(address).toMatch(/\/group\/$/);
    expect(await page('complexes/cr-am6/')).toContain('21550(60) cm-1');
  });

  it('shows a changed reading on the page, having fitted that one only', async () => {
    changeChromium('21610(60) cm-1');
    await until(() => (/\(1 fitted now, 3 unchanged\)/.test(said) ? true : null));
    await until(async () => ((await page('complexes/cr-am6/')).includes('21610(60) cm-1') ? true : null));
  });

  it('gives a new record a page, and draws its figure files anew', async () => {
    const type = (position: string): void => writeFileSync(join(content, 'complexes', 'cr-new.yaml'), sampleFile('complexes/cr-am6.yaml').replace('21550(60) cm-1', position));
    type('21710(60) cm-1');
    await until(async () => ((await page('complexes/cr-new/')).includes('21710(60) cm-1') ? true : null));
    expect(await page('complexes/cr-new/strip.svg')).toMatch(/<svg[\s\S]*21.710/u);
    type('22710(60) cm-1');
    await until(async () => (/22.710/u.test(await page('complexes/cr-new/strip.svg')) ? true : null));
  });

  it('prints a fault with its place and keeps the last good results', async () => {
    changeChromium('21610');
    await until(() => (/cr-am6\.yaml:\d+:\d+ {2}measurements\[0\]\.bands\[0\]\.position/.test(said) && said.includes('The last good results stay.') ? true : null));
    expect(await page('complexes/cr-am6/')).toContain('21610(60) cm-1');
  });

  it('goes on when the fault is mended', async () => {
    changeChromium('21620(60) cm-1');
    await until(async () => ((await page('complexes/cr-am6/')).includes('21620(60) cm-1') ? true : null));
  });

  it('ends with code 0 on Ctrl-C', async () => {
    running.kill('SIGINT');
    expect((await once(running, 'exit'))[0]).toBe(0);
  });
});
