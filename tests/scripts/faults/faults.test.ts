import { spawn, spawnSync } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ContentChangedError } from '../../../scripts/content/stamp.ts';
import { refit } from '../../../scripts/database/refit.ts';
import { LockedError, lockOf, whileLocked } from '../../../scripts/lock.ts';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { plainEnvironment, runScript } from '../commands/runScript.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';
import { copyOf, folderHash, hashOf, litterIn, writeState } from './contents.ts';

const place = temporaryFolder();
afterAll(() => place.remove());
const at = (...names: string[]): string => join(place.path, ...names);
const settings = { BANDSTEAD_CACHE: place.path };
const refitInto = (database: string) => runScript('refit', ['--content', at('new'), '--database', database], settings);

beforeAll(() => {
  writeState(at('old'), 21550);
  writeState(at('new'), 21700);
  expect(runScript('refit', ['--content', at('old'), '--database', at('old.sqlite')], settings).code).toBe(0);
}, 60_000);

/** A folder with the old database in it. */
function withOld(name: string): string {
  mkdirSync(at(name));
  copyOf(at('old.sqlite'), at(name, 'c.sqlite'));
  return at(name, 'c.sqlite');
}

describe('two runs at once', { timeout: 60_000 }, () => {
  test('the second ends at once with code 3, says who is at work and how to go on, and changes nothing', () => {
    const database = withOld('locked');
    writeFileSync(lockOf(database), `${process.pid} npm run build\n`);
    const { code, stdout, stderr } = refitInto(database);
    expect([code, stdout]).toEqual([3, '']);
    expect(stderr).toBe(`npm run refit failed: npm run build (process ${process.pid}) is writing ${database}. Wait until it has ended; if no such run exists, delete ${lockOf(database)} and start again\n`);
    expect(hashOf(database)).toBe(hashOf(at('old.sqlite')));
    expect(readFileSync(lockOf(database), 'utf8')).toContain(String(process.pid));
  });

  test.each([
    ['release', ['1.0.0', '--cause', 'The first.', '--who', 'A', '--date', '2026-03-02']],
    ['begin', ['--group', 'A group']],
  ] as const)('%s writes records of its own and waits for nobody either', (command, words) => {
    const content = at(`content-${command}`);
    writeState(content, 21550);
    const before = folderHash(content);
    writeFileSync(lockOf(content), `${process.pid} npm run release\n`);
    const { code, stderr } = runScript(command, [...words, '--content', content], settings);
    expect([code, stderr]).toEqual([3, `npm run ${command} failed: npm run release (process ${process.pid}) is writing ${content}. Wait until it has ended; if no such run exists, delete ${lockOf(content)} and start again\n`]);
    expect(folderHash(content)).toBe(before);
  });

  test('the lock of a run that is gone, or half a lock, is taken over', () => {
    const database = withOld('stale');
    const gone = spawnSync(process.execPath, ['--version']).pid;
    for (const text of [`${gone} npm run refit\n`, '']) {
      writeFileSync(lockOf(database), text);
      expect(refitInto(database)).toMatchObject({ code: 0, stderr: '' });
      expect(litterIn(at('stale'))).toEqual([]);
    }
    expect(hashOf(database)).not.toBe(hashOf(at('old.sqlite')));
  });

  test('of many that take over one stale lock together only one at a time is at work', async () => {
    const target = at('many.sqlite');
    writeFileSync(lockOf(target), '999999999 npm run refit\n');
    let inside = 0;
    let done = 0;
    const outcomes = await Promise.all(Array.from({ length: 8 }, () => whileLocked('refit', [target], async () => {
      inside += 1;
      expect(inside).toBe(1);
      await wait(20);
      inside -= 1;
      done += 1;
    }).catch((error: unknown) => error)));
    expect(done).toBe(1);
    expect(outcomes.filter((outcome) => outcome instanceof LockedError)).toHaveLength(7);
    expect(existsSync(lockOf(target))).toBe(false);
  });
});

describe('content that changes during the run', { timeout: 60_000 }, () => {
  test('is found before the database is replaced', () => {
    const database = withOld('changing');
    writeState(at('changing-content'), 21700);
    const edit = (): void => { writeState(at('changing-content'), 21800); };
    expect(() => refit({ content: at('changing-content'), database, cache: null, progress: edit })).toThrow(ContentChangedError);
    expect(() => refit({ content: at('changing-content'), database, cache: null, progress: () => writeFileSync(at('changing-content', 'complexes', 'more.yaml'), '') })).toThrow(/complexes\/more\.yaml/);
    expect(hashOf(database)).toBe(hashOf(at('old.sqlite')));
  });

  test('is found before the site is replaced: the old site stays, with code 3 and a plain message', async () => {
    mkdirSync(at('site', 'dist'), { recursive: true });
    writeFileSync(at('site', 'dist', 'index.html'), 'the old site');
    const before = folderHash(at('site', 'dist'));
    writeState(at('site-content'), 21550);
    const child = spawn(process.execPath, ['scripts/require-node.mjs', 'scripts/build.ts', '--content', at('site-content'), '--database', at('site', 'c.sqlite'), '--out', at('site', 'dist')],
      { cwd: projectFolder, env: plainEnvironment(settings), stdio: ['ignore', 'ignore', 'pipe'] });
    let said = '';
    child.stderr.setEncoding('utf8').on('data', (text: string) => { said += text; });
    const ended = new Promise<number | null>((resolve) => { child.once('exit', resolve); });
    while (!readdirSync(at('site')).some((name) => name.endsWith('.new'))) await wait(10);
    writeState(at('site-content'), 21600);
    expect(await ended).toBe(3);
    expect(said).toBe('npm run build failed: the content changed during the run: complexes/co2-cl4.yaml, complexes/co3-am6.yaml, complexes/cr-am6.yaml and 4 more. What was being written was dropped; start again\n');
    expect(folderHash(at('site', 'dist'))).toBe(before);
    expect(litterIn(at('site'))).toEqual([]);
  });
});

describe('a disk that does not take the result', { timeout: 60_000 }, () => {
  test('a file that may not grow: code 3, one line, the old database whole, nothing left beside it', () => {
    const database = withOld('full');
    // A limit of 64 blocks of 1024 bytes stands for a full disk: the write fails half way.
    const run = spawnSync('bash', ['-c', `trap '' XFSZ; ulimit -f 64; exec "$0" scripts/require-node.mjs scripts/refit.ts --content "$1" --database "$2" --cold`, process.execPath, at('new'), database],
      { cwd: projectFolder, encoding: 'utf8', env: plainEnvironment(settings) });
    expect([run.status, run.stdout]).toEqual([3, '']);
    expect(run.stderr).toMatch(/^npm run refit failed: the system does not let the file grow so large(?:: .*)?\n$/);
    expect(hashOf(database)).toBe(hashOf(at('old.sqlite')));
    expect(litterIn(at('full'))).toEqual([]);
  });

  test('a folder without the right to write in it: code 3 and one line', () => {
    const database = withOld('closed');
    chmodSync(at('closed'), 0o555);
    chmodSync(place.path, 0o755);
    // The superuser writes everywhere: the run is given to another user then.
    const other = process.getuid?.() === 0 ? { uid: 65_534, gid: 65_534 } : {};
    const run = spawnSync(process.execPath, ['scripts/require-node.mjs', 'scripts/refit.ts', '--content', at('new'), '--database', database],
      { cwd: projectFolder, encoding: 'utf8', env: plainEnvironment({ BANDSTEAD_CACHE: at('no-cache') }), ...other });
    chmodSync(at('closed'), 0o755);
    expect([run.status, run.stdout]).toEqual([3, '']);
    expect(run.stderr).toMatch(/^npm run refit failed: there is no right to write there: .*\n$/);
    expect(hashOf(database)).toBe(hashOf(at('old.sqlite')));
  });

  test('a path that leads through a file, and a folder where the database should be', () => {
    writeFileSync(at('a-file'), 'text');
    expect(refitInto(at('a-file', 'c.sqlite'))).toMatchObject({ code: 3, stdout: '', stderr: expect.stringMatching(/^npm run refit failed: .*a-file.*\n$/) });
    mkdirSync(at('a-folder', 'c.sqlite', 'kept'), { recursive: true });
    expect(refitInto(at('a-folder', 'c.sqlite'))).toMatchObject({ code: 3, stdout: '', stderr: expect.stringMatching(/^npm run refit failed: .*c\.sqlite.*\n$/) });
    expect(existsSync(at('a-folder', 'c.sqlite', 'kept'))).toBe(true);
  });
});
