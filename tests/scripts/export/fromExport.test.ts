import { cpSync, readFileSync, writeFileSync } from 'node:fs';
import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { readContent } from '../../../scripts/release/readContent.ts';
import { freeze } from '../../../scripts/release/freeze.ts';
import { collectionFromRows } from '../../../scripts/export/collectionFromRows.ts';
import { rebuildFromExport } from '../../../scripts/export/fromExport.ts';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { rebuildLines } from '../../../scripts/report/rebuild.ts';
import { dataPage } from '../../../site/data/downloads.ts';
import { sampleTree } from '../../site/sample.ts';
import { runScript } from '../commands/runScript.ts';
import { sampleContent } from '../commands/sampleContent.ts';
import { exported } from './built.ts';

const full = join(projectFolder, 'tests/cases/good-full');
const demonstration = exported(join(projectFolder, 'content'));
const everyField = exported(full);

// A collection with a history: one release, then a changed reading.
const changed = sampleContent();
const frozen = freeze({ content: changed, cache: null, release: '1', date: '2026-02-01', who: 'T. Lind', cause: 'First', codeVersion: null });
writeFileSync(join(changed, 'complexes/cr-am6.yaml'), readFileSync(join(changed, 'complexes/cr-am6.yaml'), 'utf8').replace('21550(60)', '21600(60)'));
const withHistory = exported(changed);

afterAll(() => {
  for (const one of [demonstration, everyField, withHistory]) one.remove();
});

describe('a database rebuilt from the export alone', () => {
  it.each([['the demonstration', demonstration], ['a record with every field', everyField], ['a collection with a history', withHistory]])('has no difference: %s', (_, built) => {
    const rebuilt = rebuildFromExport({ from: built.data, database: join(built.folder, 'rebuilt.sqlite') });
    expect(rebuilt.comparison.differences).toEqual([]);
    expect(rebuilt.comparison.cells).toBe(built.tables.reduce((sum, { name, columns }) => sum + columns.length * built.rows[name]!.length, 0));
    expect(rebuilt.sameBytes).toBe(true);
    expect(readFileSync(join(built.folder, 'rebuilt.sqlite')).equals(readFileSync(built.database))).toBe(true);
  });

  it('comes from the collection that the records give', () => {
    expect(frozen.kind).toBe('frozen');
    const { collection } = readContent(full);
    expect(collectionFromRows(everyField.rows)).toEqual({ ...collection, complexes: collection!.complexes });
  });
});

/** A copy of an export with one file changed, its hash put right or left. */
function tampered(name: string, change: (text: string) => string, mendHash: boolean): string {
  const folder = join(everyField.folder, `tampered-${name.replaceAll('/', '-')}-${mendHash}`);
  cpSync(everyField.data, folder, { recursive: true });
  const before = readFileSync(join(folder, name), 'utf8');
  const after = change(before);
  expect(after).not.toBe(before);
  writeFileSync(join(folder, name), after);
  const hash = (text: string): string => createHash('sha256').update(text).digest('hex');
  const sums = readFileSync(join(folder, 'SHA256SUMS'), 'utf8');
  if (mendHash) writeFileSync(join(folder, 'SHA256SUMS'), sums.replace(hash(before), hash(after)));
  return folder;
}

describe('an export that was tampered with', () => {
  const database = join(everyField.folder, 'c.sqlite');
  it('is refused by its hashes', () => {
    const from = tampered('csv/parameter.csv', (text) => text.replace(/\d/, '7').replace('Delta', 'B'), false);
    expect(() => rebuildFromExport({ from, database })).toThrow('csv/parameter.csv is not as it was published');
  });

  it('shows the numbers that do not follow from its readings', () => {
    const fitted = everyField.rows['parameter']!.find(({ value }) => typeof value === 'number')!;
    const from = tampered('csv/parameter.csv', (text) => text.replace(String(fitted['value']), String(Number(fitted['value']) * 1.01)), true);
    const rebuilt = rebuildFromExport({ from, database });
    expect(rebuilt.comparison.differences).toEqual([{
      table: 'parameter', row: `${fitted['complex']} / ${fitted['measurement']} / ${fitted['reading']} / ${fitted['name']}`, column: 'value',
      published: Number(fitted['value']) * 1.01, rebuilt: fitted['value'],
    }]);
    expect(rebuilt.comparison.largest).toBeCloseTo(0.01, 3);
    expect(rebuildLines(rebuilt).join('\n')).toMatch(/1 difference\.\nLargest difference of a fitted parameter or its uncertainty: 0\.0099 of itself\./);
  });
});

describe('npm run refit -- --from-export', () => {
  it('says that there is no difference, to a person and to a program', () => {
    const words = ['--from-export', withHistory.data, '--database', join(withHistory.folder, 'd.sqlite')];
    const said = runScript('refit', words);
    expect([said.code, said.stderr]).toEqual([0, '']);
    expect(said.stdout).toMatch(/Compared \d+ cells with the export: 0 differences\.\nThe rebuilt database has the bytes of the published one\.\n$/);
    expect(JSON.parse(runScript('refit', [...words, '--json']).stdout)).toMatchObject({ ok: true, differences: [], sameBytes: true });
  });

  it('as the data page gives it, on the built demonstration, finds no difference', () => {
    const command = dataPage(sampleTree()).rebuild;
    expect(command).toMatch(/^npm run refit -- /);
    const words = command.replace(/^npm run refit -- /, '').replace('DIR', demonstration.data).split(' ');
    const { code, stdout } = runScript('refit', [...words, '--database', join(demonstration.folder, 'claim.sqlite'), '--json']);
    expect([code, JSON.parse(stdout)]).toEqual([0, expect.objectContaining({ ok: true, differences: [], sameBytes: true })]);
  });

  it('of a folder without an export ends with code 3 and a reason', () => {
    const { code, stderr } = runScript('refit', ['--from-export', full]);
    expect([code, stderr]).toEqual([3, `npm run refit failed: ${full} holds no export: there is no SHA256SUMS, here or in data/\n`]);
  });
});
