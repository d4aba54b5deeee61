import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runScript } from './runScript.ts';
import type { Outcome } from './runScript.ts';
import { sampleContent, sampleFile, temporaryFolder, writeSample } from './sampleContent.ts';

const [first, second] = [temporaryFolder(), temporaryFolder()];
afterAll(() => {
  first.remove();
  second.remove();
});

/** Every file of a folder by its path, as bytes in base64. */
function contents(folder: string): Map<string, string> {
  const names = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => statSync(join(folder, name)).isFile()).sort();
  return new Map(names.map((name) => [name, readFileSync(join(folder, name)).toString('base64')]));
}

/** Every process of the build believes that it is four hundred days later. */
const laterDay = `--import=data:text/javascript,${encodeURIComponent(
  'const Now = Date; const shift = 400 * 864e5; globalThis.Date = class extends Now { constructor(...given) { given.length ? super(...given) : super(Now.now() + shift); } static now() { return Now.now() + shift; } };',
)}`;

describe('a build', { timeout: 120_000 }, () => {
  let built: Outcome;
  const site = join(first.path, 'site');

  beforeAll(() => {
    writeSample(join(first.path, 'content'));
    const words = ['--content', join(first.path, 'content'), '--database', join(first.path, 'a.sqlite'), '--out', site];
    built = runScript('build', words, { TZ: 'UTC', LC_ALL: 'C', LANG: 'C', BANDSTEAD_CACHE: first.path, BASE_URL: '/misleading/' });
  }, 120_000);

  it('ends with a summary a person can read, and nothing on stderr', () => {
    expect([built.code, built.stderr]).toEqual([0, '']);
    const pages = [...contents(site).keys()].filter((name) => name.endsWith('.html')).length;
    expect(pages).toBeGreaterThan(5);
    expect(built.stdout).toMatch(/^Read 7 records: 3 complexes with 4 measurements/);
    expect(built.stdout).toContain(`Wrote ${pages} pages to ${site} in `);
    expect(built.stdout).toContain('npm run preview');
  });

  it('writes a page for each complex and the files for download', () => {
    for (const name of ['index.html', 'complexes/cr-am6/index.html', 'complexes/co2-cl4/index.html', 'data/collection.sqlite', 'data/results.csv', 'data/results.json']) {
      expect([name, existsSync(join(site, name))]).toEqual([name, true]);
    }
    expect(readFileSync(join(site, 'data/collection.sqlite')).equals(readFileSync(join(first.path, 'a.sqlite')))).toBe(true);
  });

  it('writes what machines look for at the top, and at most eight files a complex', () => {
    for (const name of ['sitemap.xml', 'robots.txt', 'changes.xml', 'data/datapackage.json', 'data/SHA256SUMS', 'data/csv/band.csv']) expect([name, existsSync(join(site, name))]).toEqual([name, true]);
    for (const id of readdirSync(join(site, 'complexes'))) {
      const files = readdirSync(join(site, 'complexes', id));
      expect(files).toEqual(expect.arrayContaining(['index.html', 'record.json', 'record.yaml', 'bands.csv', 'cite.bib', 'cite.ris']));
      expect(files.length).toBeLessThanOrEqual(8);
    }
    const rebuilt = runScript('refit', ['--from-export', site, '--database', join(first.path, 'rebuilt.sqlite'), '--json']);
    expect(JSON.parse(rebuilt.stdout)).toMatchObject({ ok: true, differences: [], sameBytes: true });
  });

  it('links under the base path of the group\'s URL', () => {
    const page = readFileSync(join(site, 'complexes/cr-am6/index.html'), 'utf8');
    const links = [...page.matchAll(/\b(?:href|src)="(\/[^"]*)"/g)].map((match) => match[1]!);
    expect(links.length).toBeGreaterThan(3);
    expect(links.filter((link) => !link.startsWith('/group/'))).toEqual([]);
  });

  it('gives the same bytes in another folder, time zone and locale, on another day and number of threads', () => {
    const content = join(second.path, 'records with another name');
    writeSample(content);
    const out = join(second.path, 'another site');
    const again = runScript('build', ['--content', content, '--database', join(second.path, 'b.sqlite'), '--out', out],
      { TZ: 'Pacific/Kiritimati', LC_ALL: 'tr_TR.UTF-8', LANG: 'sv_SE.UTF-8', BANDSTEAD_CACHE: second.path, BANDSTEAD_THREADS: '3', NODE_OPTIONS: laterDay });
    expect([again.code, again.stderr]).toEqual([0, '']);
    const [here, there] = [contents(site), contents(out)];
    expect([...there.keys()]).toEqual([...here.keys()]);
    expect([...here].filter(([name, bytes]) => there.get(name) !== bytes).map(([name]) => name)).toEqual([]);
  });

  it('that meets a fault leaves the old site and the old database, with code 1', () => {
    const before = contents(site);
    writeSample(join(first.path, 'content'), { 'complexes/co3-am6.yaml': sampleFile('complexes/co3-am6.yaml').replace('21050(60) cm-1', '21,050 cm-1') });
    const words = ['--content', join(first.path, 'content'), '--database', join(first.path, 'a.sqlite'), '--out', site];
    const failed = runScript('build', words, { BANDSTEAD_CACHE: first.path });
    expect([failed.code, failed.stdout]).toEqual([1, '']);
    expect(failed.stderr).toContain('The database and the site were left as they were.');
    expect(contents(site)).toEqual(before);
  });

  it('that cannot put the site in its place ends with code 3 and leaves no litter', () => {
    const place = join(second.path, 'blocked');
    mkdirSync(place);
    writeFileSync(join(place, 'file'), '');
    const words = ['--content', sampleContent(), '--database', join(place, 'c.sqlite'), '--out', join(place, 'file', 'site')];
    const failed = runScript('build', words, { BANDSTEAD_CACHE: second.path });
    expect(failed.code).toBe(3);
    expect(failed.stderr).toMatch(/^npm run build failed: a part of the path is a file, not a folder: .*\n$/);
    // Found before anything is fitted: no database without its site.
    expect(readdirSync(place)).toEqual(['file']);
  });

  it('of a collection without complexes makes a site and names the next step; --json says it to a program', () => {
    const content = sampleContent({ 'complexes/co2-cl4.yaml': null, 'complexes/co3-am6.yaml': null, 'complexes/cr-am6.yaml': null });
    const out = join(second.path, 'empty site');
    const words = ['--content', content, '--database', join(second.path, 'd.sqlite'), '--out', out];
    const { code, stdout } = runScript('build', words, { BANDSTEAD_CACHE: second.path });
    expect(code).toBe(0);
    expect(stdout).toContain('The collection has no complexes yet.');
    expect(existsSync(join(out, 'index.html'))).toBe(true);
    const json = runScript('build', [...words, '--json'], { BANDSTEAD_CACHE: second.path });
    expect(JSON.parse(json.stdout)).toMatchObject({ ok: true, complexes: 0, measurements: 0, site: out });
  });
});
