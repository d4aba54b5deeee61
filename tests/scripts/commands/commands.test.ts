import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { runScript } from './runScript.ts';
import { sampleContent, sampleFile, temporaryFolder } from './sampleContent.ts';

const place = temporaryFolder();
const settings = { BANDSTEAD_CACHE: place.path };
afterAll(() => place.remove());

const commands = ['check', 'refit', 'build', 'dev', 'preview', 'predict', 'test', 'bench'];

describe('every command', { timeout: 60_000 }, () => {
  for (const name of commands) {
    it(`${name} --help says how it is called, on stdout, with code 0`, () => {
      const { code, stdout, stderr } = runScript(name, ['--help']);
      expect([code, stderr]).toEqual([0, '']);
      expect(stdout).toContain(`npm run ${name} --`);
      expect(stdout).toContain('Exit codes');
    });
    it(`${name} refuses an unknown option with code 2 and no stack trace`, () => {
      const { code, stdout, stderr } = runScript(name, ['--nonsense']);
      expect([code, stdout]).toEqual([2, '']);
      expect(stderr).toContain('--nonsense');
      expect(stderr).not.toMatch(/\n\s+at /);
    });
  }
});

describe('refit', { timeout: 60_000 }, () => {
  const database = join(place.path, 'a.sqlite');

  it('ends with a summary: records, each verdict, time, the next step', () => {
    const { code, stdout, stderr } = runScript('refit', ['--content', sampleContent(), '--database', database], settings);
    expect([code, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/^Read 7 records: 3 complexes with 4 measurements \(4 fitted now, 0 unchanged\)\.\n/);
    for (const verdict of ['tested', 'untested', 'assumed', 'strained', 'not determinable', 'refused']) expect(stdout).toMatch(new RegExp(`\\d +${verdict} `));
    expect(stdout).toMatch(/Wrote .*a\.sqlite in \d+\.\d s\.\nNext: /);
  });

  it('--json prints one JSON document and nothing else', () => {
    const { code, stdout, stderr } = runScript('refit', ['--json', '--content', sampleContent(), '--database', database], settings);
    expect([code, stderr]).toEqual([0, '']);
    const facts = JSON.parse(stdout) as { ok: boolean; measurements: number; verdicts: Record<string, number> };
    expect(facts).toMatchObject({ ok: true, records: 7, complexes: 3, measurements: 4 });
    expect(Object.values(facts.verdicts).reduce((sum, count) => sum + count, 0)).toBe(4);
  });

  it('with a fault says file, line and column, leaves the database, and ends with code 1', () => {
    writeFileSync(database, 'old');
    const content = sampleContent({ 'complexes/co3-am6.yaml': sampleFile('complexes/co3-am6.yaml').replace('21050(60) cm-1', '21050') });
    const { code, stdout, stderr } = runScript('refit', ['--content', content, '--database', database], settings);
    expect([code, stdout]).toEqual([1, '']);
    expect(stderr).toMatch(/co3-am6\.yaml:12:\d+ {2}measurements\[0\]\.bands\[0\]\.position/);
    expect(stderr).toContain('1 fault in 1 file');
    expect(readFileSync(database, 'utf8')).toBe('old');
    const json = runScript('refit', ['--json', '--content', content, '--database', database], settings);
    expect([json.code, json.stderr]).toEqual([1, '']);
    expect(JSON.parse(json.stdout)).toMatchObject({ ok: false, faults: [{ file: 'complexes/co3-am6.yaml', line: 12 }] });
  });

  it('that cannot write ends with code 3 and one plain line', () => {
    writeFileSync(join(place.path, 'a-file'), '');
    const { code, stderr } = runScript('refit', ['--content', sampleContent(), '--database', join(place.path, 'a-file', 'x.sqlite')], settings);
    expect(code).toBe(3);
    expect(stderr).toMatch(/^npm run refit failed: .*\n$/);
  });

  it('takes a file from where the user stands', () => {
    const { code, stdout } = runScript('refit', ['--content', sampleContent(), '--database', 'mine.sqlite'], { ...settings, INIT_CWD: place.path });
    expect(code).toBe(0);
    expect(stdout).toContain(join(place.path, 'mine.sqlite'));
    expect(readFileSync(join(place.path, 'mine.sqlite')).subarray(0, 15).toString()).toBe('SQLite format 3');
  });

  it('of a collection without complexes names the next step', () => {
    const empty = sampleContent({ 'complexes/co2-cl4.yaml': null, 'complexes/co3-am6.yaml': null, 'complexes/cr-am6.yaml': null });
    const { code, stdout } = runScript('refit', ['--content', empty, '--database', database], settings);
    expect(code).toBe(0);
    expect(stdout).toContain('The collection has no complexes yet.');
    expect(stdout).toContain('content/README.md');
  });
});

describe('refit --explain', { timeout: 60_000 }, () => {
  const content = sampleContent();

  it('tells what was read, how it was fitted, what it means and what to watch', () => {
    const { code, stdout } = runScript('refit', ['--content', content, '--explain', 'cr-am6/aq-295']);
    expect(code).toBe(0);
    for (const text of ['[Cr(NH3)6]3+', 'Caution: perchlorate', 'typed 351.0(8) nm', '4A2g to 4T2g', 'Delta', 'readings alone', 'Verdict: ', 'house-']) expect(stdout).toContain(text);
    expect(stdout).not.toMatch(/NaN|undefined|null/);
  });

  it('tells how the fit stands without each band, what each pair gives alone and which bands would help most', () => {
    const { stdout } = runScript('refit', ['--content', content, '--explain', 'cr-am6/aq-295']);
    expect(stdout).toContain('Each band under stress: its weight in the fit, then the fit without it and where that puts it');
    expect(stdout).toMatch(/\n {2}to +leverage +d\/dDelta +d\/dB.*\n(?:.*\n)? {2}4T2g +1\.00 +1\.00 /);
    expect(stdout).toMatch(/Each pair alone: Δ; B, in cm⁻¹\n {2}\S+ and \S+ +(?:none|\d+; \d+)/);
    expect(runScript('refit', ['--content', content, '--explain', 'co2-cl4']).stdout).toMatch(/To measure next, most helpful first\n {2}\S+, expected \d/);
  });

  it('tells every measurement of a complex', () => {
    const { stdout } = runScript('refit', ['--content', content, '--explain', 'co2-cl4']);
    expect(stdout).toContain('co2-cl4/solid: ');
    expect(stdout).toContain('co2-cl4/one-band: ');
    expect(stdout).toContain('withheld');
  });

  it('--json gives the readings whole', () => {
    const { stdout } = runScript('refit', ['--content', content, '--explain', 'cr-am6', '--json']);
    const { stories } = JSON.parse(stdout) as { stories: { complex: string; readings: { parameters: unknown[] }[] }[] };
    expect(stories.map(({ complex, readings }) => [complex, readings[0]!.parameters.length])).toEqual([['cr-am6', 4]]);
  });

  it('of an unknown id offers near names and ends with code 2', () => {
    const { code, stdout, stderr } = runScript('refit', ['--content', content, '--explain', 'cr-an6']);
    expect([code, stdout]).toEqual([2, '']);
    expect(stderr).toContain('Did you mean cr-am6?');
    expect(runScript('refit', ['--content', content, '--explain', 'cr-am6/x']).stderr).toContain('There are cr-am6/aq-295.');
  });
});

describe('predict', { timeout: 60_000 }, () => {
  it('puts the spin-allowed bands first and says what it assumed', () => {
    const { code, stdout, stderr } = runScript('predict', ['Co(II)', '--Delta', '9200', '--B', '850']);
    expect([code, stderr]).toEqual([0, '']);
    expect(stdout).toContain('Assumed: octahedral; C/B 4.5');
    const [allowed, forbidden] = [stdout.indexOf('Spin-allowed bands'), stdout.indexOf('Spin-forbidden bands')];
    expect(allowed).toBeGreaterThan(0);
    expect(forbidden).toBeGreaterThan(allowed);
    expect(stdout.slice(allowed, forbidden)).toMatch(/4T2g[^\n]*\n +4A2g[^\n]*\n +b4T1g/);
  });

  it('of an A2 ion puts the first band at Delta, and a T1 ion\'s A2 band Delta above its T2 band', () => {
    const bands = (words: readonly string[]) => {
      const facts = JSON.parse(runScript('predict', [...words, '--json']).stdout) as { bands: { label: string; position: number; spinAllowed: boolean }[] };
      return new Map(facts.bands.map(({ label, position }) => [label, position]));
    };
    expect(bands(['Cr(III)', '--Delta', '21550', '--B', '650']).get('a4T2g')).toBeCloseTo(21550, 6);
    const cobalt = bands(['Co(II)', '--Delta', '9200', '--B', '850']);
    expect(cobalt.get('a4A2g')! - cobalt.get('a4T2g')!).toBeCloseTo(9200, 6);
    const tetrahedral = bands(['Co(II)', '--Delta', '3200', '--B', '700', '--geometry', 'tetrahedral']);
    expect(tetrahedral.get('a4T2')).toBeCloseTo(3200, 6);
  });

  it('takes C, C/B, energies with units, geometry and spin', () => {
    const facts = (words: readonly string[]) => JSON.parse(runScript('predict', [...words, '--json']).stdout) as { C: number; Delta: number; ground: string; lowest: string; assumed: string[] };
    expect(facts(['Fe(II)', '--Delta', '33000', '--B', '420', '--C/B', '4.6', '--spin', 'low', '--geometry', 'octahedral'])).toMatchObject({ C: expect.closeTo(1932, 9), ground: 'a1A1g', assumed: [] });
    expect(facts(['Fe(II)', '--Delta', '10000', '--B', '900', '--C', '4000', '--spin', 'low'])).toMatchObject({ C: 4000, ground: 'a1A1g', lowest: 'a5T2g' });
    expect(facts(['Cr(III)', '--Delta', '21.55 kK', '--B', '650'])).toMatchObject({ Delta: 21550 });
  });

  it('refuses with code 2 and a plain reason', () => {
    const cases: readonly (readonly [readonly string[], string])[] = [
      [['Cr3+', '--Delta', '1', '--B', '1'], 'Did you mean Cr(III)?'],
      [['Zn(II)', '--Delta', '10000', '--B', '800'], 'it has no d-d bands'],
      [['Cr(III)', '--B', '650'], '--Delta is missing'],
      [['Cr(III)', '--Delta', 'x', '--B', '650'], '--Delta: found'],
      [['Cr(III)', '--Delta', '-5', '--B', '650'], '--Delta'],
      [['Cr(III)', '--Delta', '20000', '--B', '650', '--C', '3000', '--C/B', '4'], 'not both'],
      [['Cr(III)', '--Delta', '20000', '--B', '650', '--geometry', 'cubic'], 'octahedral or tetrahedral'],
      [['Cr(III)', '--Delta', '20000', '--B', '650', '--spin', 'low'], 'cannot be "low"'],
      [[], 'ION is missing'],
    ];
    for (const [words, text] of cases) {
      const { code, stdout, stderr } = runScript('predict', words);
      expect([words, code, stdout]).toEqual([words, 2, '']);
      expect(stderr).toContain(text);
    }
  });
});

describe('preview', { timeout: 60_000 }, () => {
  it('without a built site says what to do, with code 2', () => {
    const { code, stderr } = runScript('preview', ['--site', place.path]);
    expect(code).toBe(2);
    expect(stderr).toContain('npm run build');
  });
  it('refuses a port that is none', () => {
    expect(runScript('preview', ['--port', '99999'])).toMatchObject({ code: 2, stdout: '' });
  });
});
