import { createHash } from 'node:crypto';
import { readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, describe, expect, it } from 'vitest';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { resultColumns, resultTable } from '../../../scripts/export/columns.ts';
import type { ColumnEntry } from '../../../scripts/export/dictionary/types.ts';
import { mainFiles, recordFiles } from '../../../scripts/export/files.ts';
import { readCsv } from '../../../scripts/export/readCsv.ts';
import { readTableCsv } from '../../../scripts/export/tableFiles.ts';
import type { Cell, Row } from '../../../scripts/export/tableFiles.ts';
import { writeExports } from '../../../scripts/export/writeExports.ts';
import { writeRecords } from '../../../scripts/export/writeRecords.ts';
import { problemsUnder, problemsUnderOwn } from '../../schemas/check.ts';
import { type TableResource, rowProblems } from '../../schemas/tableRows.ts';
import { exported } from './built.ts';

const content = join(projectFolder, 'content');
const built = exported(content);
const database = new Database(built.database, { readonly: true });
const site = join(built.folder, 'site');
writeRecords(built.published, content, site);
afterAll(() => {
  database.close();
  built.remove();
});

const filesIn = (folder: string): string[] => readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => statSync(join(folder, name)).isFile()).sort();

/** A JSON value as the database holds it. */
const flat = (value: unknown): Cell => (typeof value === 'object' && value !== null ? JSON.stringify(value) : (value as Cell));

describe('the demonstration exported', () => {
  const collection = built.json('collection.json') as { about: Record<string, unknown>; tables: Record<string, Record<string, unknown>[]> };

  it('consists of the listed files and one CSV file a table', () => {
    expect(filesIn(built.data)).toEqual([...mainFiles.map(({ name }) => name), ...built.tables.map(({ name }) => `csv/${name}.csv`), 'SHA256SUMS'].sort());
  });

  it('holds the same values in the database, in CSV and in JSON, every row and every digit', () => {
    let cells = 0;
    for (const table of built.tables) {
      const order = table.key.map((name) => `"${name}"`).join(', ');
      const inDatabase = database.prepare<[], Row>(`SELECT * FROM "${table.name}" ORDER BY ${order}`).all();
      const inCsv = readTableCsv(table, built.read(`csv/${table.name}.csv`));
      const inJson = collection.tables[table.name]!.map((row) => Object.fromEntries(Object.entries(row).map(([name, value]) => [name, flat(value)])));
      expect([table.name, inCsv]).toEqual([table.name, inDatabase]);
      expect([table.name, inJson]).toEqual([table.name, inDatabase]);
      cells += inDatabase.length * table.columns.length;
    }
    expect(cells).toBeGreaterThan(100_000);
  });

  it('holds the result view in results.csv and results.json', () => {
    const view = database.prepare<[], Row>('SELECT * FROM result ORDER BY complex, measurement').all();
    const inCsv = readTableCsv(resultTable, built.read('results.csv'));
    const inJson = (built.json('results.json') as { results: Row[] }).results;
    const only = (row: Row): Row => Object.fromEntries(Object.keys(view[0]!).map((name) => [name, row[name] ?? null]));
    expect(inCsv.map(only)).toEqual(view);
    expect(inJson).toEqual(inCsv);
    expect(view.length).toBeGreaterThan(100);
  });

  it('gives uncertainties, standings, reasons and correlations in the wide file', () => {
    const rows = readTableCsv(resultTable, built.read('results.csv'));
    for (const name of ['Delta', 'B', 'C', 'beta']) {
      for (const row of rows) {
        expect([row[name] === null, row[`${name}_standing`] === 'withheld']).toEqual(row[name] === null ? [true, true] : [false, false]);
        if (row[name] === null) expect(row[`${name}_reason`]).toMatch(/\w/);
        else expect(row[`${name}_u_total`]).toBeGreaterThan(0);
      }
    }
    const correlations = database.prepare('SELECT count(*) FROM correlation x JOIN reading r ON r.complex = x.complex AND r.measurement = x.measurement AND r.number = x.reading WHERE r.chosen = 1').pluck().get();
    expect(rows.flatMap((row) => [row['corr_Delta_B'], row['corr_Delta_C'], row['corr_B_C']]).filter((cell) => cell !== null)).toHaveLength(correlations as number);
  });

  it('carries every hazard caution in CSV, JSON and beside each complex', () => {
    const hazards = database.prepare<[], { complex: string; text: string }>("SELECT complex, text FROM caution WHERE subject = 'hazard'").all();
    expect(hazards.length).toBeGreaterThan(5);
    const wide = readTableCsv(resultTable, built.read('results.csv'));
    for (const { complex, text } of hazards) {
      for (const row of wide.filter((one) => one['complex'] === complex)) expect(row['hazards']).toContain(text);
      expect(collection.tables['caution']!.some((row) => row['complex'] === complex && row['text'] === text)).toBe(true);
      expect(readFileSync(join(site, 'complexes', complex, 'record.json'), 'utf8')).toContain(JSON.stringify(text));
      expect(readFileSync(join(site, 'complexes', complex, 'bands.csv'), 'utf8')).toContain(text.slice(0, 40));
    }
  });

  it('keeps every number within the range and every word within the list of the dictionary', () => {
    const outside = (column: ColumnEntry, cell: Cell): boolean => {
      const { limits: { above, least, most }, values, type, units } = column;
      if (cell === null) return column.required;
      if (typeof cell === 'number') return (above !== null && cell <= above) || (least !== null && cell < least) || (most !== null && cell > most) || (units.length === 0 && type !== 'flag');
      return values !== null && !values.includes(cell);
    };
    const results = { results: readTableCsv(resultTable, built.read('results.csv')) };
    const found = [...built.tables, resultTable].flatMap((table) => ({ ...built.rows, ...results } as Record<string, readonly Row[]>)[table.name]!.flatMap((row) =>
      table.columns.filter((column) => outside(column, row[column.name] ?? null)).map(({ name }) => `${table.name}.${name} = ${row[name]}`)));
    expect(found).toEqual([]);
    expect(outside(resultColumns.find(({ name }) => name === 'Delta')!, 0)).toBe(true);
    expect(outside(resultColumns.find(({ name }) => name === 'verdict')!, 'good')).toBe(true);
  });

  it('passes its own JSON Schema, and a changed one does not', () => {
    const schema = built.json('collection.schema.json') as object;
    expect(problemsUnderOwn(schema, collection)).toEqual([]);
    const broken = structuredClone(collection);
    broken.tables['band']![0]!['position'] = 5;
    delete broken.tables['complex']![0]!['formula'];
    expect(problemsUnderOwn(schema, broken)).toHaveLength(2);
  });

  it('has a hash for every file in SHA256SUMS that is the file\'s', () => {
    const lines = built.read('SHA256SUMS').trimEnd().split('\n').map((line) => line.split('  '));
    expect(lines.map(([, name]) => name)).toEqual(filesIn(built.data).filter((name) => name !== 'SHA256SUMS'));
    for (const [hash, name] of lines) expect([name, createHash('sha256').update(readFileSync(join(built.data, name!))).digest('hex')]).toEqual([name, hash]);
  });

  it('is a data package: descriptor, hashes, sizes, keys', () => {
    const descriptor = built.json('datapackage.json') as { resources: { name: string; path: string; hash: string; bytes: number; schema?: { fields: { name: string; type: string; constraints?: Record<string, unknown> }[]; primaryKey: string[]; foreignKeys?: { fields: string[]; reference: { resource: string; fields: string[] } }[] } }[] };
    expect(problemsUnder('datapackage.json', descriptor)).toEqual([]);
    expect(descriptor.resources.map(({ path }) => path).sort()).toEqual(filesIn(built.data).filter((name) => !['SHA256SUMS', 'datapackage.json', 'ro-crate-metadata.json'].includes(name)));
    const byName = new Map(descriptor.resources.map((resource) => [resource.name, resource]));
    expect(byName.size).toBe(descriptor.resources.length);
    for (const { path, hash, bytes, schema } of descriptor.resources) {
      const file = readFileSync(join(built.data, path));
      expect([path, `sha256:${createHash('sha256').update(file).digest('hex')}`, file.length]).toEqual([path, hash, bytes]);
      for (const { fields, reference } of schema?.foreignKeys ?? []) {
        expect(schema!.fields.map(({ name }) => name)).toEqual(expect.arrayContaining(fields));
        expect(byName.get(reference.resource)?.schema?.fields.map(({ name }) => name)).toEqual(expect.arrayContaining(reference.fields));
      }
    }
    expect(problemsUnder('datapackage.json', { ...descriptor, resources: [{ name: 'x' }] })).not.toEqual([]);
  });

  it('is a data package whose rows are what its table schemas say: types, constraints, keys', () => {
    const { resources } = built.json('datapackage.json') as { resources: readonly TableResource[] };
    const tabular = resources.filter(({ schema }) => schema !== undefined);
    expect(tabular).toHaveLength(built.tables.length + 1);
    const rows = new Map(tabular.map(({ name, path }) => [name, readCsv(built.read(path))]));
    expect(rowProblems(tabular, rows)).toEqual([]);
    const spoilt = (table: string, change: (line: (string | null)[]) => (string | null)[]): readonly string[] => {
      const [header, first, ...rest] = rows.get(table)!;
      return rowProblems(tabular, new Map(rows).set(table, [header!, change([...first!]), ...rest]));
    };
    const place = (table: string, column: string): number => rows.get(table)![0]!.indexOf(column);
    const put = (table: string, column: string, text: string | null) => spoilt(table, (line) => line.with(place(table, column), text));
    expect(put('band', 'position', '999')).toEqual(['band, row 1, position: 999 is below 1000']);
    expect(put('band', 'position', '1e4x')).toEqual(['band, row 1, position: "1e4x" is no number']);
    expect(put('band', 'kind', 'hump')).toEqual(['band, row 1, kind: "hump" is not in the list']);
    expect(put('measurement', 'phase', null)).toEqual(['measurement, row 1, phase: empty']);
    expect(put('complex', 'ion', 'Xx(I)')).toEqual(['complex, row 1: ion Xx(I) is not in ion']);
    expect(put('person', 'number', '2')).toEqual(['person, row 2: the key 2 stands twice']);
  });

  it('is written alike twice', () => {
    const again = join(built.folder, 'again');
    writeExports(built.database, again);
    expect(filesIn(again)).toEqual(filesIn(built.data));
    expect(filesIn(again).filter((name) => !readFileSync(join(again, name)).equals(readFileSync(join(built.data, name))))).toEqual([]);
  });
});

describe('the files beside each complex', () => {
  it('are the listed ones, five of at most eight, for every complex', () => {
    const complexes = built.rows['complex']!.map(({ id }) => String(id));
    expect(readdirSync(join(site, 'complexes')).sort()).toEqual(complexes);
    for (const id of complexes) expect(readdirSync(join(site, 'complexes', id)).sort()).toEqual(recordFiles.map(({ name }) => name).sort());
  });

  it('hold the record as it was typed', () => {
    expect(readFileSync(join(site, 'complexes/cr-am6/record.yaml')).equals(readFileSync(join(content, 'complexes/cr-am6.yaml')))).toBe(true);
  });

  it('hold every row that concerns the complex, under the published schema', () => {
    const schema = built.json('record.schema.json') as object;
    const counted = { reading: 0, band: 0, parameter: 0, evidence: 0 };
    for (const { id } of built.rows['complex']!) {
      const record = JSON.parse(readFileSync(join(site, 'complexes', String(id), 'record.json'), 'utf8')) as { measurement: { band: unknown[]; reading: { parameter: unknown[]; evidence: unknown[] }[] }[] };
      expect([id, problemsUnderOwn(schema, record)]).toEqual([id, []]);
      for (const { band, reading } of record.measurement) {
        counted.band += band.length;
        counted.reading += reading.length;
        for (const { parameter, evidence } of reading) {
          counted.parameter += parameter.length;
          counted.evidence += evidence.length;
        }
      }
    }
    expect(counted).toEqual(Object.fromEntries(Object.keys(counted).map((name) => [name, built.rows[name]!.length])));
  });

  it('hold every band with what the chosen reading makes of it', () => {
    const lines = readFileSync(join(site, 'complexes/cr-am6/bands.csv'), 'utf8').trimEnd().split('\r\n');
    const bands = built.rows['band']!.filter(({ complex }) => complex === 'cr-am6');
    expect(lines).toHaveLength(1 + bands.length);
    for (const [index, band] of bands.entries()) expect(lines.some((line) => line.includes(`,${String(band['position'])},`)), `band ${index + 1}`).toBe(true);
  });

  it('are refused where a record was changed after it was fitted', () => {
    expect(() => writeRecords(built.published, join(projectFolder, 'tests/cases/good-full'), site)).toThrow();
  });
});
