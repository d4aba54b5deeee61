import { cpSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { measurementId } from '#engine';
import { readStoredCollection } from '../../../scripts/compare/collection.ts';
import { readNewRecord, referable } from '../../../scripts/compare/newRecord.ts';
import { placeRecord } from '../../../scripts/compare/place.ts';
import { refit } from '../../../scripts/database/refit.ts';
import { places } from '../../../scripts/places.ts';
import { runScript } from '../commands/runScript.ts';
import type { Outcome } from '../commands/runScript.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';

const place = temporaryFolder();
const [content, database] = [join(place.path, 'content'), join(place.path, 'c.sqlite')];

beforeAll(() => {
  // A copy of the demonstration collection, since one test adds a ligand.
  cpSync(places.content, content, { recursive: true });
  const done = refit({ content, database, cache: null });
  if (!done.ok) throw new Error(JSON.stringify(done.faults));
});
afterAll(() => place.remove());

const record = (changes: { readonly ligands?: string; readonly formula?: string; readonly bands?: string; readonly more?: string; readonly ion?: string } = {}): string => `formula: "${changes.formula ?? '[Cr(NH3)4(H2O)2]3+'}"
ion: ${changes.ion ?? 'Cr(III)'}
geometry: octahedral
isomer: cis
ligands: ${changes.ligands ?? '{ ammine: 4, aqua: 2 }'}
measurements:
  - id: aq-295
    phase: solution
    medium: water
    temperature: 295 K
    source: { notebook: "20, p. 3" }
    bands:
${changes.bands ?? `      - { position: 20300(80) cm-1, kind: maximum, term: 4T2g }
      - { position: 27200(120) cm-1, kind: maximum, term: 4T1g(F) }`}
${changes.more ?? ''}`;

function file(name: string, text: string): string {
  const path = join(place.path, name);
  writeFileSync(path, text);
  return path;
}
const compare = (words: readonly string[]): Outcome => runScript('compare', [...words, '--database', database, '--content', content]);

interface Facts {
  readonly ok: boolean;
  readonly collection: { readonly complexes: number; readonly policy: string };
  readonly records: readonly {
    readonly id: string;
    readonly measurements: readonly {
      readonly id: string;
      readonly reading: { readonly verdict: string; readonly parameters: readonly { readonly name: string; readonly value: number | null }[] };
      readonly earlier: readonly { readonly measurement: string; readonly differences: { readonly Delta: { readonly value: number; readonly z: number; readonly basis: string } } }[];
      readonly places: readonly { readonly subject: string; readonly members: number; readonly sentence: string; readonly notDistinguishableFrom: readonly unknown[] }[];
      readonly predictions: readonly { readonly method: string; readonly predicted: number | null; readonly z: number | null; readonly reason: string | null }[];
      readonly nearest: { readonly complexes: readonly { readonly differs: readonly string[] }[] };
      readonly cautions: readonly { readonly code: string }[];
    }[];
  }[];
}
const facts = (words: readonly string[]): Facts => {
  const { code, stdout, stderr } = compare([...words, '--json']);
  expect([code, stderr]).toEqual([0, '']);
  return JSON.parse(stdout) as Facts;
};

describe('compare', () => {
  it('tells reading, verdict, place, predictions, nearest complexes and cautions of a new complex, and changes nothing', () => {
    const before = readFileSync(database);
    const { code, stdout, stderr } = compare([file('cr-new.yaml', record())]);
    expect([code, stderr]).toEqual([0, '']);
    for (const text of [
      'Placed against 1', '[Cr(NH3)4(H2O)2]3+  (cr-new)  Cr(III), octahedral, quartet', 'Verdict: ', 'Delta', 'Other measurements of this complex', 'Where it stands',
      'comparable complexes of Cr(III), octahedral, quartet', 'What the rest of the collection predicts', 'factors', 'Nearest earlier complexes in (Delta/g, beta)', 'Cautions',
    ]) expect(stdout).toContain(text);
    expect(stdout).not.toMatch(/NaN|undefined|null|\[object/);
    expect(readFileSync(database).equals(before)).toBe(true);
  });

  it('--json prints the same digits, and those of the engine', () => {
    const path = file('cr-new.yaml', record());
    const [one] = facts([path]).records;
    const stored = readStoredCollection(database);
    const read = readNewRecord(path, path, referable(content, stored), stored.policy);
    if (!read.ok) throw new Error('faults');
    const [placed] = placeRecord(read.record, stored).measurements;
    const [measurement] = one!.measurements;
    expect(measurement!.predictions).toEqual(placed!.placement.predictions);
    expect(measurement!.reading.parameters.map(({ value }) => value)).toEqual(placed!.reading.parameters.map(({ value }) => value));
    expect(measurement!.places.map(({ subject, members }) => [subject, members])).toEqual(placed!.placement.places.map(({ subject, members }) => [subject, members]));
  });

  it('takes several files and places each against the collection alone', () => {
    const [first, second] = [file('cr-one.yaml', record()), file('cr-two.yaml', record())];
    const both = facts([first, second]);
    expect(both.records.map(({ id }) => id)).toEqual(['cr-one', 'cr-two']);
    expect(both.records[0]!.measurements).toEqual(facts([first]).records[0]!.measurements);
    expect(both.records[1]!.measurements[0]!.earlier).toEqual([]);
  });

  it('sets measurements of one record side by side, and earlier ones of the same complex with z', () => {
    const twice = record({ more: `  - id: aq-again
    phase: solution
    medium: water
    temperature: 295 K
    source: { notebook: "20, p. 4" }
    bands:
      - { position: 20500(80) cm-1, kind: maximum, term: 4T2g }
      - { position: 27300(120) cm-1, kind: maximum, term: 4T1g(F) }
` });
    const [first, second] = facts([file('cr-twice.yaml', twice)]).records[0]!.measurements;
    expect(first!.earlier.map(({ measurement }) => measurement)).toEqual(['cr-twice/aq-again']);
    expect(second!.earlier[0]!.differences.Delta).toMatchObject({ value: -first!.earlier[0]!.differences.Delta.value, basis: 'readings' });
  });

  it('a record of the collection itself is placed against all the others', () => {
    const stored = readStoredCollection(database);
    const own = stored.compared.results.find(({ complex, parameters }) => complex.geometry === 'octahedral' && parameters.Delta.value !== null)!;
    const [one] = facts([join(content, 'complexes', `${own.complex.id}.yaml`)]).records;
    const measurement = one!.measurements.find(({ id }) => id === own.measurement)!;
    expect(measurement.cautions.map(({ code }) => code)).toContain('ALREADY_THERE');
    expect(measurement.reading.parameters.find(({ name }) => name === 'Delta')!.value).toBe(own.parameters.Delta.value);
    expect(measurement.earlier.map((each) => each.measurement)).not.toContain(measurementId(own));
  });

  it('an unknown ion of the collection and a reading without solution are honest answers, with code 0', () => {
    const lone = facts([file('re-new.yaml', record({ ion: 'Re(IV)', formula: '[ReCl6]2-', ligands: '{ chlorido: 6 }', bands: '      - { position: 27500(80) cm-1, kind: maximum, term: 4T2g }' }).replace('isomer: cis\n', ''))]);
    expect(lone.records[0]!.measurements[0]!.cautions.map(({ code }) => code)).toContain('NO_OTHER_RECORD');
    expect(lone.records[0]!.measurements[0]!.predictions.every(({ predicted, reason }) => predicted === null && reason !== null)).toBe(true);
    const refused = facts([file('cr-bad.yaml', record({ bands: `      - { position: 20300(20) cm-1, kind: maximum, term: 4T2g }
      - { position: 39000(20) cm-1, kind: maximum, term: 4T1g(F) }` }))]).records[0]!.measurements[0]!;
    expect(refused.reading.verdict).toBe('refused');
    expect(refused.places.every(({ sentence }) => sentence.includes('withheld'))).toBe(true);
    expect(refused.predictions.some(({ predicted, z }) => predicted !== null && z === null)).toBe(true);
  });

  it('faults come with line, field and how to mend, with code 1, and nothing is placed', () => {
    const good = file('cr-good.yaml', record());
    const bad = file('cr-faulty.yaml', record({ ligands: '{ amine: 4, aqua: 2 }' }).replace('20300(80) cm-1', '20300'));
    const { code, stdout, stderr } = compare([good, bad]);
    expect([code, stdout]).toEqual([1, '']);
    expect(stderr).toMatch(/cr-faulty\.yaml:5:\d+ {2}ligands\.amine {2}UNKNOWN_LIGAND[\s\S]*write ammine/);
    expect(stderr).toMatch(/bands\[0\]\.position/);
    expect(stderr).toContain('No record was placed.');
    expect(JSON.parse(compare([bad, '--json']).stdout)).toMatchObject({ ok: false, faults: [{ code: 'UNKNOWN_LIGAND', line: 5 }, {}] });
    expect(compare([file('empty.yaml', '')]).code).toBe(1);
    expect(compare([file('Bad Name.yaml', record())]).stderr).toContain('FILE_NAME');
    expect(compare([file('bytes.yaml', '')]).stderr).toContain('FILE_EMPTY');
  });

  it('wrong usage ends with code 2 and a plain line', () => {
    expect(compare([])).toMatchObject({ code: 2, stdout: '' });
    expect(compare([join(place.path, 'none.yaml')])).toMatchObject({ code: 2, stderr: expect.stringContaining('There is no file') });
    const missing = runScript('compare', [file('cr-new.yaml', record()), '--database', join(place.path, 'none.sqlite'), '--content', content]);
    expect([missing.code, missing.stderr]).toEqual([2, expect.stringContaining('npm run refit')]);
    expect(runScript('compare', ['--help']).stdout).toContain('npm run compare -- FILE [FILE ...] [options]');
  });

  it('a ligand newer than the database may be named once its record is in the content folder', () => {
    const path = file('cr-thio.yaml', record({ formula: '[Cr(CH4N2S)6]3+', ligands: '{ thiourea-s: 6 }' }).replace('isomer: cis\n', ''));
    expect(compare([path]).stderr).toContain('UNKNOWN_LIGAND');
    writeFileSync(join(content, 'ligands', 'thiourea-s.yaml'), 'name: thiourea-S\nformula: CH4N2S\ncharge: 0\ndenticity: 1\ndonors: [S]\n');
    expect(facts([path]).records[0]!.measurements[0]!.cautions.map(({ code }) => code)).toContain('LIGAND_NEVER_SEEN');
    writeFileSync(join(content, 'ligands', 'thiourea-s.yaml'), 'name: thiourea-S\nformula: CH4N2S\ncharge: 0\ndenticity: 2\ndonors: [S]\n');
    expect(compare([path])).toMatchObject({ code: 1, stderr: expect.stringContaining('LIGAND_DONORS') });
  });
});
