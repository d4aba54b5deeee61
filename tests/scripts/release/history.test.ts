import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { readXml } from '../../schemas/readXml.ts';
import { refit } from '../../../scripts/database/refit.ts';
import { readPublished } from '../../../scripts/export/published.ts';
import { writeSiteFiles } from '../../../scripts/export/writeSiteFiles.ts';
import { freeze, withRelease } from '../../../scripts/release/freeze.ts';
import type { Freeze } from '../../../scripts/release/freeze.ts';
import { readContent } from '../../../scripts/release/readContent.ts';
import { historyFromRows } from '../../../scripts/release/rows.ts';
import { gonePages } from '../../../scripts/release/goneAddresses.ts';
import type { FrozenRelease } from '../../../scripts/release/types.ts';
import { runScript } from '../commands/runScript.ts';
import { sampleContent, sampleFile } from '../commands/sampleContent.ts';

const folders: string[] = [];
afterAll(() => {
  for (const folder of folders) rmSync(folder, { recursive: true, force: true });
});

/** A sample collection with the release "1" frozen. */
function released(): string {
  const content = sampleContent();
  folders.push(content);
  expect(frozen(content, '1', '2026-02-01').kind).toBe('frozen');
  return content;
}

function frozen(content: string, release: string, date: string): Freeze {
  return freeze({ content, cache: null, release, date, who: 'T. Lind', cause: 'A reason', codeVersion: null });
}

const put = (content: string, name: string, text: string): void => {
  mkdirSync(join(content, name, '..'), { recursive: true });
  writeFileSync(join(content, name), text);
};
const gone = (content: string, text: string): void => put(content, 'releases/gone.yaml', `gone:\n${text}`);
const codes = (content: string): string[] => readContent(content).faults.map(({ code, found }) => `${code} ${found}`);

describe('freezing a release', () => {
  it('writes its numbers, addresses, date and cause, and names it in group.yaml', () => {
    const content = released();
    const file = JSON.parse(readFileSync(join(content, 'releases/1.json'), 'utf8')) as FrozenRelease;
    expect(file).toMatchObject({ release: '1', number: 1, date: '2026-02-01', who: 'T. Lind', cause: 'A reason', licence: 'CC0-1.0', doi: null });
    expect(file.complexes.map(({ id }) => id)).toEqual(['co2-cl4', 'co3-am6', 'cr-am6']);
    expect(file.addresses).toEqual(expect.arrayContaining(['', 'complexes/cr-am6/', 'complexes/cr-am6/#aq-295', 'ligands/ammine/', 'ions/cr-iii/', 'data/results.csv']));
    const { value, u_total, standing } = file.complexes[2]!.measurements[0]!.numbers.Delta;
    expect([value! > 21000, u_total! > 0, standing]).toEqual([true, true, 'fitted']);
    expect(readContent(content).collection!.group.release).toBe('1');
  });

  it('keeps comments and line ends of group.yaml', () => {
    expect(withRelease('title: A\nrelease: 0.1.0   # the first\nstarted: x\n', '1.1.0')).toBe('title: A\nrelease: "1.1.0"   # the first\nstarted: x\n');
    expect(withRelease('release: "1"\r\nx: y\r\n', '2')).toBe('release: "2"\r\nx: y\r\n');
    expect(withRelease('title: A\n', '2')).toBeNull();
  });

  it('is refused for a name that is taken, a date before the last, and content with faults; nothing is written then', () => {
    const content = released();
    const before = readFileSync(join(content, 'releases/1.json'), 'utf8');
    expect(frozen(content, '1', '2026-03-01')).toMatchObject({ kind: 'refused', reason: expect.stringContaining('frozen already') as string });
    expect(frozen(content, '2', '2026-01-31')).toMatchObject({ kind: 'refused', reason: expect.stringContaining('before release 1') as string });
    put(content, 'complexes/cr-am6.yaml', 'formula: x\n');
    expect(frozen(content, '2', '2026-03-01').kind).toBe('faults');
    expect([readFileSync(join(content, 'releases/1.json'), 'utf8') === before, existsSync(join(content, 'releases/2.json')), readFileSync(join(content, 'group.yaml'), 'utf8').includes('"1"')]).toEqual([true, false, true]);
  });

  it('twice without a change gives the same numbers and no changes', () => {
    const content = released();
    const again = frozen(content, '2', '2026-02-01');
    const [one, two] = ['1', '2'].map((name) => JSON.parse(readFileSync(join(content, `releases/${name}.json`), 'utf8')) as FrozenRelease);
    expect(again).toMatchObject({ kind: 'frozen', changes: [], first: false });
    expect(two!.complexes).toEqual(one!.complexes);
  });
});

describe('the history in the database', () => {
  const content = released();
  put(content, 'complexes/cr-am6.yaml', sampleFile('complexes/cr-am6.yaml').replace('21550(60)', '21700(60)'));
  const second = frozen(content, '2', '2026-03-01');
  put(content, 'policy.yaml', 'name: house\nfloors: { general: 300 cm-1 }\n');
  const database = join(content, 'a.sqlite');
  const result = refit({ content, database, cache: null });
  const { rows, publication } = readPublished(database);

  it('holds frozen values of every release, changes with their release and cause, and addresses with their first', () => {
    expect(result.ok).toBe(true);
    expect(rows['frozen_release']!.map(({ id, number, complexes, measurements }) => [id, number, complexes, measurements])).toEqual([['1', 1, 3, 4], ['2', 2, 3, 4]]);
    expect(rows['frozen_value']).toHaveLength(2 * 4 * 4);
    const changes = rows['change']!.filter(({ parameter }) => parameter === 'Delta');
    expect(changes.map(({ release, complex, cause }) => [release, complex, cause]).slice(0, 1)).toEqual([['2', 'cr-am6', 'readings']]);
    expect(changes.filter(({ release }) => release === null).length).toBeGreaterThan(1);
    expect(new Set(changes.filter(({ release }) => release === null).map(({ cause }) => cause))).toEqual(new Set(['policy']));
    expect(new Set(rows['published_address']!.map(({ release }) => release))).toEqual(new Set(['1']));
    expect(second).toMatchObject({ kind: 'frozen' });
  });

  it('is read back from its rows', () => {
    const { history } = readContent(content);
    const back = historyFromRows(rows);
    expect(back.releases.map(({ addresses: _, ...rest }) => rest)).toEqual(history.releases.map(({ addresses: _, ...rest }) => rest));
    expect(new Set(back.releases.flatMap(({ addresses }) => addresses))).toEqual(new Set(history.releases.flatMap(({ addresses }) => addresses)));
  });

  it('dates the publication by the release, and says that it changed since', () => {
    expect(publication).toMatchObject({ release: '2', date: '2026-03-01', state: 'changed since' });
  });
});

describe('permanence', () => {
  it('has no fault while nothing vanished, and none for records that came', () => {
    const content = released();
    put(content, 'complexes/cr-new.yaml', sampleFile('complexes/cr-am6.yaml'));
    expect(codes(content)).toEqual([]);
  });

  it('holds a vanished record, measurement, ligand and ion until gone.yaml says what became of it', () => {
    const content = released();
    rmSync(join(content, 'complexes/co2-cl4.yaml'));
    rmSync(join(content, 'ligands/chlorido.yaml'));
    put(content, 'complexes/cr-am6.yaml', sampleFile('complexes/cr-am6.yaml').replace('aq-295', 'aq-298'));
    expect(codes(content)).toEqual(['complexes/co2-cl4/', 'complexes/cr-am6/#aq-295', 'ions/co-ii/', 'ligands/chlorido/'].map((address) => `ADDRESS_VANISHED nothing at ${address}, which release 1 published`));
    gone(content, `  - { address: complexes/co2-cl4/, reason: "The sample was another.", successor: complexes/co3-am6/ }
  - { address: "complexes/cr-am6/#aq-295", now: "complexes/cr-am6/#aq-298" }
  - { address: ions/co-ii/, reason: "No complex is left." }
  - { address: ligands/chlorido/, reason: "No complex is left." }
`);
    expect(codes(content)).toEqual([]);
  });

  it('refuses a gone id that is used again, and a target where there is nothing', () => {
    const content = released();
    gone(content, '  - { address: complexes/cr-am6/, reason: "x" }\n');
    expect(codes(content)).toEqual(['ID_REUSED a record at complexes/cr-am6/, which is declared gone']);
    rmSync(join(content, 'complexes/cr-am6.yaml'));
    gone(content, '  - { address: complexes/cr-am6/, now: complexes/nowhere/ }\n  - { address: ions/cr-iii/, reason: "x" }\n');
    expect(codes(content)).toEqual(['GONE_ADDRESS complexes/cr-am6/ leads to complexes/nowhere/, where there is nothing']);
  });

  it('refuses another complex under a published id, unless it is declared corrected', () => {
    const content = released();
    put(content, 'complexes/co3-am6.yaml', sampleFile('complexes/cr-am6.yaml'));
    gone(content, '  - { address: ions/co-iii/, reason: "x" }\n  - { address: "complexes/co3-am6/#aq", reason: "x" }\n');
    expect(codes(content)).toEqual(['IDENTITY_CHANGED [Cr(NH3)6]3+, Cr(III), octahedral']);
    gone(content, '  - { address: ions/co-iii/, reason: "x" }\n  - { address: "complexes/co3-am6/#aq", reason: "x" }\n  - { address: complexes/co3-am6/, corrected: "It was chromium." }\n');
    expect(codes(content)).toEqual([]);
  });

  it.each([
    ['an address that no release had', '  - { address: complexes/other/, reason: "x" }\n', 'GONE_ADDRESS'],
    ['neither reason nor new address', '  - { address: complexes/cr-am6/ }\n', 'GONE_ADDRESS'],
    ['a host', '  - { address: "https://bands.example/x", reason: "x" }\n', 'GONE_ADDRESS'],
    ['an unknown field', '  - { address: complexes/cr-am6/, because: x }\n', 'UNKNOWN_FIELD'],
    ['broken YAML', '  - { address: complexes/cr-am6/, reason: "x }\n', 'YAML_SYNTAX'],
  ])('reports an entry with %s at its place', (_, text, code) => {
    const content = released();
    gone(content, text);
    const { faults } = readContent(content);
    expect(faults.map((fault) => fault.code)).toContain(code);
    expect(faults.find((fault) => fault.code === code)).toMatchObject({ file: 'releases/gone.yaml', line: 2 });
  });

  it('refuses a release file that is damaged, renamed, missing or counted twice', () => {
    const content = released();
    const text = readFileSync(join(content, 'releases/1.json'), 'utf8');
    const faultOf = (name: string, changed: string): string[] => {
      put(content, `releases/${name}`, changed);
      const found = codes(content);
      if (name !== '1.json') rmSync(join(content, `releases/${name}`));
      return found;
    };
    expect(faultOf('2.json', text)[0]).toMatch(/^RELEASE_FILE the release 1/);
    expect(faultOf('2.json', text.replace('"release": "1"', '"release": "2"'))).toEqual(['RELEASE_FILE number 1']);
    expect(faultOf('1.json', text.slice(0, -20))).toEqual(['RELEASE_FILE text that is no JSON']);
    expect(faultOf('1.json', text.replace('"standing":"fitted"', '"standing":7'))[0]).toMatch(/^RELEASE_FILE at "complexes\./);
    expect(faultOf('1.json', text)).toEqual([]);
  });
});

describe('the pages of gone addresses', () => {
  const content = released();
  rmSync(join(content, 'complexes/co2-cl4.yaml'));
  put(content, 'complexes/cr-new.yaml', sampleFile('complexes/cr-am6.yaml'));
  rmSync(join(content, 'complexes/cr-am6.yaml'));
  gone(content, `  - { address: complexes/co2-cl4/, reason: "The sample was another." }
  - { address: complexes/cr-am6/, now: complexes/cr-new/ }
  - { address: ions/co-ii/, reason: "No complex is left." }
`);
  const database = join(content, 'a.sqlite');
  refit({ content, database, cache: null });
  const published = readPublished(database);
  const site = join(content, 'site');
  const page = (path: string): void => put(site, `${path}index.html`, '<p></p>');

  it('are held to be there as the pages of records are, and the sitemap leaves them out', () => {
    expect(() => gonePages(published, site)).toThrow(/^the site has nothing at its first page, changes\/, .* and \d+ more, published by an earlier release$/);
    for (const path of ['', 'ions/', 'ligands/', 'series/', 'methods/', 'data/', 'data/dictionary/', 'changes/', 'complexes/co3-am6/', 'complexes/cr-new/', 'ligands/ammine/', 'ligands/chlorido/', 'ions/co-iii/', 'ions/cr-iii/']) page(path);
    for (const { address } of published.rows['published_address']!) if (/^data\/[^/]+$/.test(String(address))) put(site, String(address), '');
    expect(() => gonePages(published, site)).toThrow('the site has nothing at complexes/co2-cl4/, complexes/cr-am6/, ions/co-ii/, published by an earlier release');
    for (const path of ['complexes/co2-cl4/', 'complexes/cr-am6/', 'ions/co-ii/']) page(path);
    const pages = gonePages(published, site);
    expect([...pages].sort()).toEqual(['complexes/co2-cl4/', 'complexes/cr-am6/', 'ions/co-ii/']);
    writeSiteFiles(published, site, pages);
    const listed = readXml(readFileSync(join(site, 'sitemap.xml'), 'utf8')).children.map((url) => url.children[0]!.text);
    expect(listed).toContain('https://bands.example/group/complexes/cr-new/');
    expect(listed.filter((address) => /co2-cl4|cr-am6|co-ii\//.test(address))).toEqual([]);
  });

});

describe('npm run release', () => {
  const content = sampleContent();
  folders.push(content);
  const release = (...words: string[]) => runScript('release', [...words, '--content', content], { BANDSTEAD_CACHE: content });

  it('freezes, tells what changed, and then refuses the same name', () => {
    const first = release('1.0.0', '--cause', 'The first.', '--who', 'T. Lind', '--date', '2026-02-01');
    expect([first.code, first.stderr]).toEqual([0, '']);
    expect(first.stdout).toMatch(/^Froze release 1\.0\.0 of 2026-02-01 in releases\/1\.0\.0\.json; group\.yaml names it\.\nIt is the first release\.\n/);
    put(content, 'complexes/cr-am6.yaml', sampleFile('complexes/cr-am6.yaml').replace('21550(60)', '21700(60)'));
    const second = release('1.1.0', '--cause', 'A misreading.', '--who', 'T. Lind', '--date', '2026-03-01', '--json');
    expect(JSON.parse(second.stdout)).toMatchObject({ ok: true, release: '1.1.0', file: 'releases/1.1.0.json' });
    expect((JSON.parse(second.stdout) as { changes: { text: string }[] }).changes[0]!.text).toMatch(/^cr-am6\/aq-295: Delta went from .* \(readings\)\.$/);
    expect(release('1.1.0', '--cause', 'x', '--who', 'T. Lind', '--date', '2026-03-02')).toMatchObject({ code: 2, stdout: '' });
  });

  it.each([
    ['no cause', ['1.2.0', '--who', 'x'], 'A release says why'],
    ['a name with a stroke', ['a/b', '--cause', 'x', '--who', 'x'], '"a/b" is no name of a release'],
    ['a day that is not in the calendar', ['1.2.0', '--cause', 'x', '--who', 'x', '--date', '2026-02-30'], '"2026-02-30" is no date'],
    ['no name', [], 'NAME is missing'],
  ])('with %s is wrong usage', (_, words, message) => {
    const { code, stderr } = release(...words);
    expect([code, stderr.includes(message)]).toEqual([2, true]);
  });
});
