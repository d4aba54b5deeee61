import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { complexSchema } from '../../../scripts/content/schema/complex.ts';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { typedComplex } from '../../../scripts/content/typedRecord.ts';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { csvText, readCsv } from '../../../scripts/table/csv.ts';
import { tableFields } from '../../../scripts/table/fields.ts';
import { tableRows, wholeMapping } from '../../../scripts/table/give.ts';
import { typedRecords } from '../../../scripts/table/giveOut.ts';
import { guessMapping } from '../../../scripts/table/guess.ts';
import { lostTexts } from '../../../scripts/table/lost.ts';
import { readMapping } from '../../../scripts/table/mapping.ts';
import { readTable } from '../../../scripts/table/readTable.ts';
import { runScript } from '../commands/runScript.ts';
import { sampleContent, temporaryFolder } from '../commands/sampleContent.ts';
import { leafFields } from './leafFields.ts';

const place = temporaryFolder();
afterAll(() => place.remove());

let number = 0;
let folder = '';
const inFolder = (name: string): string => join(folder, name);
const text = (name: string): string => readFileSync(inFolder(name), 'utf8');
const table = (...words: string[]) => runScript('table', [...words, '--content', inFolder('content')]);
const edit = (name: string, ...changes: (readonly [string | RegExp, string])[]): void => {
  writeFileSync(inFolder(name), changes.reduce((all, [from, to]) => all.replace(from, to), text(name)));
};

beforeEach(() => {
  number += 1;
  folder = join(place.path, `table-${number}`);
  mkdirSync(folder, { recursive: true });
  // A collection with ligands and no complexes.
  const sample = sampleContent({ 'complexes/cr-am6.yaml': null, 'complexes/co3-am6.yaml': null, 'complexes/co2-cl4.yaml': null });
  mkdirSync(inFolder('content/ligands'), { recursive: true });
  for (const name of ['group.yaml', 'ligands/ammine.yaml', 'ligands/chlorido.yaml']) writeFileSync(inFolder(`content/${name}`), readFileSync(join(sample, name)));
});

/** One row a band, semicolons, decimal commas, Windows line ends, a byte order mark, a title above, blanks for "as above", a line end in quotes. */
const byBand = `\ufeff${[
  'From the old notebook;;;;;;;',
  'Complex;Solvent;T / K;λmax (nm);± ;ε;Assignment;Remarks',
  '[Cr(NH3)6]3+;water;295;464,5;0,5;36,5;4A2g → 4T2g;"broad,',
  'asymmetric"',
  ';;;351;;30;4T1g(F);',
  ';;;270 sh;;;;-',
  '[CrCl(NH3)5]2+;water;295;515;;;;',
].join('\r\n')}\r\n`;

const everyRow = [/#every-row:\n/, 'every-row:\n'] as const;
const confirmed = ['confirmed: no', 'confirmed: yes'] as const;
const uncommented = [/# {2}(?=geometry|phase|source)/g, '  '] as const;

describe('table in, one row a band', { timeout: 60_000 }, () => {
  it('guesses and shows the mapping, and writes nothing but it', () => {
    writeFileSync(inFolder('old.csv'), byBand);
    const { code, stdout, stderr } = table('in', inFolder('old.csv'));
    expect([code, stderr]).toEqual([1, '']);
    expect(stdout).toContain('One row a band; cells separated by semicolon; decimal comma; utf-8; nothing known: -.');
    expect(stdout).toMatch(/D {2}λmax \(nm\) +-> position +in nm/);
    expect(stdout).toContain('No column gives geometry, phase, source.notebook');
    expect(stdout).toContain('confirmed: yes  and run this command again');
    expect(text('old.columns.yaml')).toContain('header: 2 ');
    expect(readdirSync(folder).sort()).toEqual(['content', 'old.columns.yaml', 'old.csv']);
    expect(existsSync(inFolder('content/complexes'))).toBe(false);
  });

  it('once confirmed, writes records that check passes, with ion and ligands from the formula', () => {
    writeFileSync(inFolder('old.csv'), byBand);
    table('in', inFolder('old.csv'));
    edit('old.columns.yaml', confirmed, everyRow, uncommented);
    const { code, stdout, stderr } = table('in', inFolder('old.csv'));
    expect([stdout, stderr, code]).toEqual([expect.stringContaining('Wrote 2 records'), '', 0]);
    expect(readCollection(inFolder('content')).faults).toEqual([]);
    expect(text('content/complexes/cr3-ammine6.yaml')).toBe(`# From old.csv, rows 3 to 5. Ion and ligands were taken from the formula.
formula: "[Cr(NH3)6]3+"
ion: Cr(III)
geometry: octahedral
ligands: { ammine: 6 }
measurements:
  - id: water-295
    phase: solution
    medium: water
    temperature: 295 K
    source: { notebook: "old table, sheet 1" }
    bands:
      - { position: 464.5(5) nm, epsilon: 36.5, term: 4T2g, notes: "broad,\\nasymmetric" }
      - { position: 351 nm, epsilon: 30, term: 4T1g(F) }
      - { position: 270 nm, kind: shoulder }
`);
    expect(existsSync(inFolder('content/complexes/cr3-ammine5-chlorido.yaml'))).toBe(false);
    expect(existsSync(inFolder('content/complexes/cr3-chlorido-ammine5.yaml'))).toBe(true);
  });

  it('run again changes nothing, and never writes over a record that says something else', () => {
    writeFileSync(inFolder('old.csv'), byBand);
    table('in', inFolder('old.csv'));
    edit('old.columns.yaml', confirmed, everyRow, uncommented);
    table('in', inFolder('old.csv'));
    expect(table('in', inFolder('old.csv'))).toMatchObject({ code: 0, stdout: expect.stringContaining('2 records stand there already, word for word') });
    edit('content/complexes/cr3-ammine6.yaml', ['351 nm', '352 nm']);
    const mine = text('content/complexes/cr3-ammine6.yaml');
    const { code, stdout } = table('in', inFolder('old.csv'));
    expect([code, text('content/complexes/cr3-ammine6.yaml')]).toEqual([1, mine]);
    expect(stdout).toContain(`old.csv:3:1  row 3, id  RECORD_EXISTS\n  found     the id "cr3-ammine6"`);
  });

  it('gives the same table back', () => {
    writeFileSync(inFolder('old.csv'), byBand);
    table('in', inFolder('old.csv'));
    edit('old.columns.yaml', confirmed, everyRow, uncommented);
    table('in', inFolder('old.csv'));
    const { code, stdout } = table('out', inFolder('new.csv'), '--mapping', inFolder('old.columns.yaml'));
    expect([code, stdout]).toEqual([0, expect.stringContaining('It holds every field')]);
    // But for the title above, the arrow of an assignment, the word for nothing known, and the order, which is that of the ids.
    const expected = byBand.replace('From the old notebook', '').replace('4A2g → ', '').replace(';-', ';');
    const rows = (csv: string) => readCsv(csv.replace('\ufeff', ''), ';').rows.map((row) => row.join('|').replaceAll('\r', '')).sort();
    expect(rows(text('new.csv'))).toEqual(rows(expected.replace('± ', '±')));
  });

  it('tells every problem by row and column in the form of the house, and writes none of the records', () => {
    writeFileSync(inFolder('old.csv'), [
      'id;Complex;Ion;Geometry;Ligands;Phase;Notebook;ν / cm-1;Assignment;T',
      'good;[Cr(NH3)6]3+;Cr(III);octahedral;6 ammine;solid;1;21550;4T2g;295',
      'bad-one;[Cr(NH3)6]3+;Cr(III);octahedral;5 ammine;solid;2;21.550;4T2g;295',
      'bad-one;[Cr(NH3)6]3+;Cr(III);octahedral;6 ammine;solid;2;28500,5;9T2g;',
      'Bad Two;[CoCl4]2-;Co(II);tetrahedral;4 chlorido;solid;3;150;;',
      'bad-four;[CoCl4]2-;Co(II);tetrahedral;Cl (four);gas;3;15000;;',
    ].join('\n'));
    table('in', inFolder('old.csv'));
    edit('old.columns.yaml', confirmed);
    const { code, stdout } = table('in', inFolder('old.csv'));
    expect(code).toBe(1);
    const heads = stdout.split('\n').filter((line) => /old\.csv:\d/.test(line)).map((line) => line.replace(/^.*old\.csv/, 'old.csv'));
    expect(heads).toEqual([
      'old.csv:3:2  row 3, column B "Complex"  FORMULA_CONTENT',
      'old.csv:3:5  row 3, column E "Ligands"  DONOR_COUNT',
      'old.csv:3:8  row 3, column H "ν / cm-1"  TABLE_POINT',
      'old.csv:4:5  row 4, column E "Ligands"  TABLE_CONFLICT',
      'old.csv:4:9  row 4, column I "Assignment"  TERM_UNREADABLE',
      'old.csv:5:1  row 5, column A "id"  BAD_ID',
      'old.csv:5:8  row 5, column H "ν / cm-1"  BAND_RANGE',
      'old.csv:6:5  row 6, column E "Ligands"  TABLE_CELL',
      'old.csv:6:6  row 6, column F "Phase"  UNKNOWN_CHOICE',
    ]);
    expect(stdout).toContain('1 record has no fault: --partly');
    expect(existsSync(inFolder('content/complexes'))).toBe(false);
    expect(table('in', inFolder('old.csv'), '--partly').code).toBe(1);
    expect(readdirSync(inFolder('content/complexes'))).toEqual(['good.yaml']);
  });
});

describe('table in, one row a spectrum', { timeout: 60_000 }, () => {
  it('takes bands side by side, terms from the headers, and quoted values', () => {
    writeFileSync(inFolder('content/group.yaml'), text('content/group.yaml'));
    mkdirSync(inFolder('content/sources'));
    writeFileSync(inFolder('content/sources/thesis-1999.yaml'), 'reference: "An invented thesis, 1999"\n');
    writeFileSync(inFolder('old.csv'), [
      'Complex,Medium,4T2g / kK,ε,4T1g(F) / kK,ε,10Dq / cm-1,B / cm-1,Ref.',
      '[Cr(NH3)6]3+,water,21.55,36,28.5 sh,30,21550,650,thesis-1999',
      '[Cr(NH3)6]3+,glycerol,21.50,,,,,,thesis-1999',
    ].join('\n'));
    expect(table('in', inFolder('old.csv')).stdout).toContain('One row a spectrum');
    edit('old.columns.yaml', confirmed, [/#every-row:\n/, 'every-row:\n'], [/# {2}(?=geometry|phase)/g, '  '], ['#  quoted.cite: author-1999', '  quoted.cite: thesis-1999']);
    const { code, stdout } = table('in', inFolder('old.csv'));
    expect([code, stdout]).toEqual([0, expect.stringContaining('Wrote 1 record')]);
    expect(typedComplex(text('content/complexes/cr3-ammine6.yaml'))?.measurements).toEqual([
      {
        id: 'water', phase: 'solution', medium: 'water', source: { cite: 'thesis-1999' },
        bands: [{ position: '21.55 kK', epsilon: '36', term: '4T2g' }, { position: '28.5 kK', kind: 'shoulder', epsilon: '30', term: '4T1g(F)' }],
        quoted: [{ Delta: '21550 cm-1', B: '650 cm-1', cite: 'thesis-1999' }],
      },
      { id: 'glycerol', phase: 'solution', medium: 'glycerol', source: { cite: 'thesis-1999' }, bands: [{ position: '21.50 kK', term: '4T2g' }] },
    ]);
    table('out', inFolder('back.csv'), '--mapping', inFolder('old.columns.yaml'));
    expect(readCsv(text('back.csv').replace('\ufeff', ''), ',').rows).toEqual(readCsv(text('old.csv'), ',').rows);
  });
});

describe('wrong usage and wrong files', { timeout: 60_000 }, () => {
  it.each([
    [['in', 'nowhere.csv'], 'There is no file'],
    [['over', 'x.csv'], '"over": say in or out'],
    [['in'], 'FILE.csv is missing'],
    [['out', 'x.csv', '--mapping', 'nowhere.yaml'], 'There is no mapping'],
    [['out', 'x.csv', '--decimal', 'dot'], '--decimal takes point, comma, not "dot"'],
  ] as const)('%j', (words, message) => {
    const { code, stdout, stderr } = table(...words);
    expect([code, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });

  it('an empty table is wrong usage and gets no mapping', () => {
    writeFileSync(inFolder('empty.csv'), '\ufeff');
    expect(table('in', inFolder('empty.csv'))).toMatchObject({ code: 2, stderr: expect.stringContaining('holds no row') });
    expect(existsSync(inFolder('empty.columns.yaml'))).toBe(false);
  });

  it('out never writes over a file', () => {
    writeFileSync(inFolder('mine.csv'), 'mine');
    expect(table('out', inFolder('mine.csv')).code).toBe(2);
    expect(text('mine.csv')).toBe('mine');
  });

  it.each([
    ['a field that does not exist', 'field: formula', 'field: formulae', 'UNKNOWN_CHOICE'],
    ['a column that is not there', 'column: A', 'column: Q', 'TABLE_COLUMNS'],
    ['another header', 'header: Complex', 'header: Compound', 'TABLE_COLUMNS'],
    ['two columns for one field', 'field: medium', 'field: formula', 'TABLE_COLUMNS'],
    ['the wrong separator', 'separator: semicolon', 'separator: tab', 'TABLE_COLUMNS'],
    ['the wrong encoding', 'encoding: utf-8', 'encoding: utf-16', 'TABLE_COLUMNS'],
    ['a value that no field takes', '#every-row:', 'every-row:\n  colour: red', 'UNKNOWN_FIELD'],
  ])('a mapping with %s is a fault', (_, from, to, code) => {
    writeFileSync(inFolder('old.csv'), byBand.slice(0, -2));
    table('in', inFolder('old.csv'));
    edit('old.columns.yaml', confirmed, [from, to]);
    const outcome = table('in', inFolder('old.csv'), '--json');
    const facts = JSON.parse(outcome.stdout) as { faults: { code: string }[]; done: boolean };
    expect([outcome.code, facts.done, facts.faults.map((fault) => fault.code)]).toEqual([1, false, expect.arrayContaining([code])]);
  });

  it('bytes in another encoding than the declared one are told, and the guess finds the right one', () => {
    writeFileSync(inFolder('old.csv'), Buffer.from('Complex;\u03bb;L\u00f6sungsmittel\n'.replace('\u03bb', 'band'), 'latin1'));
    expect(table('in', inFolder('old.csv')).stdout).toContain('windows-1252');
    edit('old.columns.yaml', ['encoding: windows-1252', 'encoding: utf-8']);
    expect(table('in', inFolder('old.csv')).stdout).toContain('old.csv:1:1  row 1, column A  NOT_UTF8');
  });

  it('a quote that nothing closes is told with its row', () => {
    writeFileSync(inFolder('old.csv'), 'Complex,band\n[Cr(NH3)6]3+,"21550\n');
    expect(table('in', inFolder('old.csv')).stdout).toContain('old.csv:2:2  row 2, column B  TABLE_SYNTAX');
  });
});

describe('every field', () => {
  it('of the record format has a column, and no column a field that is none', () => {
    const columns = tableFields.filter(({ name }) => !['id', 'position.u'].includes(name)).map(({ level, path }) => [level, ...path].join(' '));
    expect(columns.sort()).toEqual(leafFields(complexSchema).sort());
  });

  it('and every code of a table stands in the manual, whose example is read', () => {
    const manual = readFileSync(join(projectFolder, 'content/README.md'), 'utf8').replace(/^[\s\S]*?\n## Tables\n/, '').replace(/\n## Limits[\s\S]*$/, '');
    const fields = tableFields.map(({ name }) => name).filter((name) => !name.startsWith('policy.'));
    const codes = readFileSync(join(projectFolder, 'scripts/table/places.ts'), 'utf8').match(/'(?:TABLE_\w+|RECORD_EXISTS)'/g) ?? [];
    expect(codes.length).toBeGreaterThan(4);
    writeFileSync(inFolder('example.yaml'), /```yaml\n([\s\S]*?)```/.exec(manual)?.[1] ?? '');
    expect(readMapping(inFolder('example.yaml'), 'example.yaml')).toMatchObject({ ok: true, mapping: { columns: expect.arrayContaining([expect.objectContaining({ field: 'position', unit: 'nm' })]) } });
    expect([...fields, ...codes.map((code) => code.slice(1, -1))].filter((name) => !manual.includes(`\`${name}\``))).toEqual([]);
  });

  const content = join(projectFolder, 'content');
  it.each([
    ['band', 'comma', 'point'],
    ['band', 'semicolon', 'comma'],
    ['complex', 'tab', 'comma'],
  ] as const)('of every record comes back from a table: one row a %s, %s, decimal %s', (rows, separator, decimal) => {
    const { collection } = readCollection(content);
    expect(collection).not.toBeNull();
    const records = typedRecords(content, collection!);
    const mapping = wholeMapping(records, { rows, separator, decimal });
    const cells = tableRows(records, mapping);
    const bytes = new TextEncoder().encode(csvText(cells, { comma: ',', semicolon: ';', tab: '\t' }[separator]));
    const guessed = guessMapping(bytes).mapping;
    expect(guessed.columns.map(({ field, number: one }) => [field, one])).toEqual(mapping.columns.map(({ field, number: one }) => [field, one]));
    const read = readTable(bytes, { ...guessed, decimal, columns: mapping.columns }, () => ({ line: 1, column: 1 }), collection!, { table: 'a.csv', mapping: 'a.yaml' });
    expect(read.faults).toEqual([]);
    const joined = (value: unknown): unknown => (Array.isArray(value) ? value.map(joined) : typeof value === 'object' && value !== null ? Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, key === 'scanned' && Array.isArray(inner) ? inner.join('; ') : joined(inner)])) : value);
    const byId = new Map(read.records.map(({ id, assembled }) => [id, assembled.complex]));
    for (const { id, complex } of records) expect(byId.get(id), id).toEqual(joined(complex));
    expect([...lostTexts(records, cells, mapping, collection!.ligands)]).toEqual([]);
  });
});
