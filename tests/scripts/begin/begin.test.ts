import { cpSync, existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { filesIn, fingerprint, fingerprintsOf, readManifest } from '../../../scripts/begin/demonstration.ts';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { freeze } from '../../../scripts/release/freeze.ts';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { runScript } from '../commands/runScript.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';

const demonstration = join(projectFolder, 'content');
const place = temporaryFolder();
afterAll(() => place.remove());

describe('beginning from the demonstration', { timeout: 60_000 }, () => {
  let number = 0;
  let folder = '';
  const file = (path: string): string => join(folder, path);
  const text = (path: string): string => readFileSync(file(path), 'utf8');
  const begin = (...words: string[]) => runScript('begin', ['--content', folder, ...words]);

  beforeEach(() => {
    number += 1;
    folder = join(place.path, `content-${number}`);
    cpSync(demonstration, folder, { recursive: true });
  });

  it('knows the demonstration as it stands (node scripts/begin/writeManifest.ts renews the list)', () => {
    expect(readManifest()).toEqual(fingerprintsOf(demonstration));
    expect(fingerprint('a\r\nb\r\n')).toBe(fingerprint('a\nb\n'));
  });

  it('leaves settings, one example record and the ligands, which check passes and a fit reads', () => {
    const ligands = filesIn(join(folder, 'ligands'));
    const { code, stdout, stderr } = begin('--group', 'Group: "A" #1', '--person', 'Åsa Öberg-Lund', '--contact', 'bands@example.org', '--licence', 'CC-BY-SA-4.0', '--url', 'https://example.org/a/b', '--started', '2004-09-01');
    expect([code, stderr]).toEqual([0, '']);
    expect(stdout).toContain('complexes/cr-am6.yaml');
    expect(filesIn(folder).filter((path) => !path.startsWith('ligands/'))).toEqual(['README.md', 'complexes/example-cr-am6.yaml', 'group.yaml', 'policy.yaml', 'record.schema.json', 'releases/README.md']);
    expect(filesIn(join(folder, 'ligands'))).toEqual(ligands);
    const { collection, faults } = readCollection(folder);
    expect(faults).toEqual([]);
    expect(collection?.group).toMatchObject({
      name: 'Group: "A" #1', title: 'Spectra of Group: "A" #1', licence: 'CC-BY-SA-4.0', url: 'https://example.org/a/b/', started: '2004-09-01',
      contact: 'bands@example.org', demonstration: false, people: [{ name: 'Åsa Öberg-Lund', initials: 'ÅÖL', orcid: null }],
    });
    expect(collection?.policy.name).toBe('house-2004');
    expect(collection?.complexes.map(({ id, name }) => [id, name])).toEqual([['example-cr-am6', 'Example to replace: its readings are invented']]);
    expect(text('README.md')).not.toContain('invented:');
    expect(text('README.md')).toContain('## All messages');
    const story = runScript('refit', ['--content', folder, '--explain', 'example-cr-am6/aq-295']);
    expect([story.code, story.stderr]).toEqual([0, '']);
  });

  it('typed out, the policy is the one that holds where nothing is typed', () => {
    begin('--group', 'A');
    const typed = readCollection(folder).collection?.policy;
    writeFileSync(file('policy.yaml'), `name: ${typed?.name}\n`);
    expect(readCollection(folder).collection?.policy).toEqual(typed);
  });

  it('keeps what is not the demonstration as it came, and the sources that it cites', () => {
    writeFileSync(file('complexes/cr-am6.yaml'), text('complexes/cr-am6.yaml').replace('22140(100)', '22150(100)'));
    writeFileSync(file('complexes/own.yaml'), text('complexes/co3-en3.yaml').replace(/ +quoted:[\s\S]*?(?= {2}- id|$)/, ''));
    writeFileSync(file('policy.yaml'), `${text('policy.yaml')}# ours\n`);
    const before = [text('complexes/cr-am6.yaml'), text('complexes/own.yaml'), text('policy.yaml')];
    const { code, stdout } = begin('--group', 'A', '--json');
    expect(code).toBe(0);
    expect(JSON.parse(stdout)).toMatchObject({ kept: ['complexes/cr-am6.yaml', 'complexes/own.yaml', 'sources/lindqvar-2013.yaml'], oldTexts: ['policy.yaml.before'] });
    expect([text('complexes/cr-am6.yaml'), text('complexes/own.yaml'), text('policy.yaml.before')]).toEqual(before);
    expect(existsSync(file('sources/quarle-2020.yaml'))).toBe(false);
    expect(readCollection(folder).faults).toEqual([]);
  });

  it('asks no clock: without --started a day that stands for none is typed, and a release is refused while it stands', () => {
    expect(begin('--group', 'A').stdout).toContain('started 1900-01-01 (stands for the day; type yours in group.yaml)');
    expect(text('group.yaml')).toContain('started: 1900-01-01 ');
    expect(runScript('check', ['--content', folder]).stdout).toContain('Remark: started: in group.yaml is 1900-01-01');
    const order = { content: folder, cache: null, release: '1.0.0', date: '2026-03-01', who: 'A', cause: 'The first.', codeVersion: null };
    expect(freeze(order)).toMatchObject({ kind: 'refused', reason: expect.stringContaining('type the day on which the collection was started') });
    writeFileSync(file('group.yaml'), text('group.yaml').replace('1900-01-01', '2019-09-01'));
    expect(freeze(order)).toMatchObject({ kind: 'frozen' });
  });

  it('changes nothing with --show', () => {
    const before = fingerprintsOf(folder);
    const { code, stdout } = begin('--group', 'A', '--show');
    expect([code, fingerprintsOf(folder)]).toEqual([0, before]);
    expect(stdout).toContain('Nothing was changed');
  });

  it('refuses once the collection has begun, and with --again loses neither records nor the old settings', () => {
    begin('--group', 'A');
    writeFileSync(file('complexes/own.yaml'), text('complexes/example-cr-am6.yaml'));
    writeFileSync(file('complexes/example-cr-am6.yaml'), text('complexes/example-cr-am6.yaml').replace('21600', '21610'));
    const before = fingerprintsOf(folder);
    const refused = begin('--group', 'B');
    expect([refused.code, refused.stdout, fingerprintsOf(folder)]).toEqual([2, '', before]);
    expect(refused.stderr).toContain('--again');
    expect(begin('--group', 'B', '--again').code).toBe(0);
    expect(begin('--group', 'C', '--again').code).toBe(0);
    const { 'group.yaml': _, ...others } = fingerprintsOf(folder);
    const { 'group.yaml': old, ...rest } = before;
    expect(others).toEqual({ ...rest, 'group.yaml.before': old, 'group.yaml.before-2': expect.any(String) });
    expect(readCollection(folder).collection?.group.name).toBe('C');
  });

  it.each([
    [[], '--group is missing'],
    [['--group', ' '], '--group is missing'],
    [['--group', 'A', '--licence', 'CC BY'], '--licence: found "CC BY"'],
    [['--group', 'A', '--url', 'example.org'], '--url: found "example.org"'],
    [['--group', 'A', '--started', '1.9.2004'], '--started: found "1.9.2004"'],
  ] as const)('%j is wrong usage, and nothing changes', (words, message) => {
    const before = fingerprintsOf(folder);
    const { code, stderr } = begin(...words);
    expect([code, fingerprintsOf(folder)]).toEqual([2, before]);
    expect(stderr).toContain(message);
  });
});
