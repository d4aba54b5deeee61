import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, describe, expect, it } from 'vitest';
import { allTables } from '../../../scripts/database/rows/tables.ts';
import { databaseBytes, writeDatabase } from '../../../scripts/database/write.ts';
import { resultColumns } from '../../../scripts/export/columns.ts';
import { csvText } from '../../../scripts/export/csv.ts';
import { readResults, resultsCsv, resultsJson } from '../../../scripts/export/results.ts';
import { exportNames, writeExports } from '../../../scripts/export/writeExports.ts';
import { collection, complexRecord, handMadeMeasurement, handMadeReading, measurementRecord } from '../database/sample.ts';

const folder = mkdtempSync(join(tmpdir(), 'bandstead-'));
afterAll(() => rmSync(folder, { recursive: true }));
const database = join(folder, 'a.sqlite');
const complexes = ['cr-b', 'cr-a'].map((id) => complexRecord(id, [measurementRecord('aq', handMadeMeasurement)]));
const tables = allTables(collection(complexes), new Map(complexes.map(({ id }) => [`${id}/aq`, [handMadeReading]])), 'engine', 'software');
writeDatabase(database, tables);

/** Reads a CSV text back after RFC 4180, independently of the writer. */
function readCsv(text: string): string[][] {
  const rows: string[][] = [[]];
  for (const match of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/g)) {
    rows.at(-1)!.push(match[1]?.replaceAll('""', '"') ?? match[2] ?? '');
    if (match[3] === '\r\n') rows.push([]);
  }
  return rows.slice(0, -1);
}

describe('the columns of the results', () => {
  it('hold every column of the result view, in its order, among others', () => {
    const opened = new Database(databaseBytes(tables));
    const view = opened.prepare("SELECT name FROM pragma_table_info('result')").pluck().all();
    const names = resultColumns.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    expect(names.filter((name) => view.includes(name))).toEqual(view);
  });
  it('each have a meaning, and a unit where they hold numbers', () => {
    const [row] = readResults(database).rows;
    for (const { name, unit, meaning } of resultColumns) {
      expect([name, meaning.length > 3]).toEqual([name, true]);
      if (typeof row![name] === 'number') expect([name, typeof unit]).toEqual([name, 'string']);
    }
  });
});

describe('results.csv', () => {
  const [header, ...lines] = readCsv(resultsCsv(readResults(database)));

  it('has a header and one line for each result, in binary order of their ids', () => {
    expect(header).toEqual(resultColumns.map(({ name }) => name));
    expect(lines.map(([complex, measurement]) => `${complex}/${measurement}`)).toEqual(['cr-a/aq', 'cr-b/aq']);
  });
  it('keeps every digit and leaves withheld numbers empty', () => {
    const cell = (name: string) => lines[0]![header!.indexOf(name)];
    expect([cell('B'), cell('Delta_u_total'), cell('C'), cell('C_standing')]).toEqual(['650.25', '161.5', '', 'withheld']);
  });
  it('carries hazard cautions in words', () => {
    expect(lines[0]![header!.indexOf('hazards')]).toMatch(/^Caution: perchlorate\. .*qualified person\.$/);
  });
  it('quotes commas, quotes and line ends', () => {
    const awkward = [['a,b', 'say "x"', 'two\r\nlines', null, -0.5]];
    expect(readCsv(csvText(['1', '2', '3', '4', '5'], awkward))).toEqual([['1', '2', '3', '4', '5'], ['a,b', 'say "x"', 'two\r\nlines', '', '-0.5']]);
  });
});

describe('results.json', () => {
  it('holds the same values as the view, with their columns explained', () => {
    const document = JSON.parse(resultsJson(readResults(database))) as { demonstration: boolean; licence: string; columns: unknown[]; results: Record<string, unknown>[] };
    expect(document).toMatchObject({ title: 'Invented bands', licence: 'CC-BY-4.0', demonstration: true });
    expect(document.columns).toHaveLength(resultColumns.length);
    expect(document.results).toHaveLength(2);
    expect(document.results[0]).toMatchObject({ complex: 'cr-a', formula: '[Cr(NH3)6]3+', Delta: 21550, C: null, cautions: 'PERCHLORATE NO_SPARE' });
  });
});

describe('the files for download', () => {
  it('hold the database byte for byte, the CSV and the JSON', () => {
    const out = join(folder, 'deep', 'data');
    writeExports(database, out);
    expect(readdirSync(out)).toEqual(expect.arrayContaining(Object.values(exportNames)));
    expect(readFileSync(join(out, exportNames.database)).equals(readFileSync(database))).toBe(true);
    expect(readFileSync(join(out, exportNames.csv), 'utf8')).toBe(resultsCsv(readResults(database)));
  });
});
