import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { allTables } from '../../../scripts/database/rows/tables.ts';
import { databaseBytes, writeDatabase } from '../../../scripts/database/write.ts';
import { collection, complexRecord, handMadeMeasurement, handMadeReading, measurementRecord } from './sample.ts';

const measurements = ['aq-295', 'aq-77'].map((id) => measurementRecord(id, handMadeMeasurement));
const complexes = ['cr-b', 'cr-a'].map((id) => complexRecord(id, measurements));
const readings = new Map(complexes.flatMap(({ id }) => measurements.map((m) => [`${id}/${m.id}`, [handMadeReading]] as const)));
const tables = allTables(collection(complexes), readings, 'engine-hash', 'bandstead 0');

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'bandstead-'));
});
afterEach(() => {
  rmSync(folder, { recursive: true });
});

function open(bytes: Buffer): Database.Database {
  return new Database(bytes);
}

describe('the database file', () => {
  it('is the same whatever the order in which rows arrive', () => {
    const reversed = Object.fromEntries(Object.entries(tables).reverse().map(([name, rows]) => [name, [...rows].reverse()]));
    expect(databaseBytes(reversed).equals(databaseBytes(tables))).toBe(true);
  });

  it('changes when a row changes', () => {
    const changed = { ...tables, person: [{ number: 1, name: 'Other', orcid: null, initials: null }] };
    expect(databaseBytes(changed).equals(databaseBytes(tables))).toBe(false);
  });

  it('keeps every foreign key and passes the integrity check', () => {
    const database = open(databaseBytes(tables));
    expect(database.pragma('foreign_key_check')).toEqual([]);
    expect(database.pragma('integrity_check', { simple: true })).toBe('ok');
  });

  it('has only strict tables without rowid', () => {
    const rows = open(databaseBytes(tables)).prepare("SELECT name, wr, strict FROM pragma_table_list WHERE type = 'table' AND name NOT LIKE 'sqlite_%'")
      .all() as { name: string; wr: number; strict: number }[];
    expect(rows.length).toBeGreaterThan(20);
    expect(rows.filter(({ wr, strict }) => wr !== 1 || strict !== 1)).toEqual([]);
  });

  it('holds no path and no time of day', () => {
    writeDatabase(join(folder, 'a.sqlite'), tables);
    const text = readFileSync(join(folder, 'a.sqlite')).toString('latin1');
    expect(text).not.toContain(folder);
    expect(text).not.toContain(process.cwd());
    expect(text).not.toMatch(/\d\d:\d\d:\d\d/);
  });

  it('leaves the old file and no litter where a row breaks a rule', () => {
    const file = join(folder, 'a.sqlite');
    writeFileSync(file, 'old');
    const orphan = { ...tables, complex_ligand: [{ complex: 'none', ligand: 'ammine', number: 1, count: 6, bound: 1 }] };
    expect(() => writeDatabase(file, orphan)).toThrow(/FOREIGN KEY/);
    expect(readFileSync(file, 'utf8')).toBe('old');
    expect(readdirSync(folder)).toEqual(['a.sqlite']);
  });

  it('refuses a row with a missing or an unknown column, and an unknown table', () => {
    expect(() => databaseBytes({ meta: [{ key: 'a' }] })).toThrow('no value for "value"');
    expect(() => databaseBytes({ meta: [{ key: 'a', value: 'b', extra: 1 }] })).toThrow('unknown columns: extra');
    expect(() => databaseBytes({ nothing: [] })).toThrow('no table "nothing"');
  });

  it('refuses a withheld number without a reason, and a number that is withheld', () => {
    const withParameter = (changes: object) => ({ ...tables, parameter: tables['parameter']!.map((row, i) => (i === 2 ? { ...row, ...changes } : row)) });
    expect(() => databaseBytes(withParameter({ reason: null }))).toThrow(/CHECK/);
    expect(() => databaseBytes(withParameter({ value: 3000 }))).toThrow(/CHECK/);
  });
});

describe('the result view', () => {
  const columns = 'complex measurement ion geometry spin phase temperature_K verdict Delta Delta_u Delta_u_total Delta_standing ' +
    'B B_u B_u_total B_standing C C_u C_u_total C_standing beta beta_u_total beta_standing corr_Delta_B Delta_over_B bands_used ' +
    'spare_bands rms_residual free_ion_set policy cautions';

  it('has the promised columns in the promised order', () => {
    const info = open(databaseBytes(tables)).prepare("SELECT name FROM pragma_table_info('result')").all() as { name: string }[];
    expect(info.map(({ name }) => name).join(' ')).toBe(columns);
  });

  it('has one row for each measurement, withheld numbers as NULL with their standing', () => {
    const rows = open(databaseBytes(tables)).prepare('SELECT * FROM result ORDER BY complex, measurement').all() as Record<string, unknown>[];
    expect(rows.map((row) => `${row['complex']}/${row['measurement']}`)).toEqual(['cr-a/aq-295', 'cr-a/aq-77', 'cr-b/aq-295', 'cr-b/aq-77']);
    expect(rows[0]).toMatchObject({
      ion: 'Cr(III)', spin: 'quartet', temperature_K: 295, verdict: 'untested', Delta: 21550, Delta_u_total: 161.5, B: 650.25, C: null, C_u: null,
      C_standing: 'withheld', beta: 0.708, beta_standing: 'fitted', corr_Delta_B: -0.62, bands_used: 2, cautions: 'PERCHLORATE NO_SPARE',
    });
  });

  it('shows the chosen reading and not its rivals', () => {
    const rival = { ...handMadeReading, verdict: 'refused' as const };
    const withRival = allTables(collection(complexes), new Map([...readings].map(([id, [first]]) => [id, [first!, rival]])), 'e', 's');
    const database = open(databaseBytes(withRival));
    expect(database.prepare('SELECT DISTINCT verdict FROM result').pluck().all()).toEqual(['untested']);
    expect(database.prepare('SELECT count(*) FROM reading').pluck().get()).toBe(8);
  });
});

describe('what was typed', () => {
  it('stands beside the parsed number, bands counted from 1', () => {
    const database = open(databaseBytes(tables));
    expect(database.prepare("SELECT number, position_typed, position FROM band WHERE complex = 'cr-a' AND measurement = 'aq-77'").raw().all())
      .toEqual([[1, '21550(60) cm-1', 21550], [2, '28400(60) cm-1', 28400], [3, '28670(60) cm-1', 28670], [4, '41000(60) cm-1', 41000]]);
    expect(database.prepare("SELECT reading_band, band FROM reading_band_member WHERE complex = 'cr-a' AND measurement = 'aq-77'").raw().all())
      .toEqual([[1, 1], [2, 2], [2, 3]]);
    expect(database.prepare("SELECT band FROM not_fitted WHERE complex = 'cr-a' AND measurement = 'aq-77'").pluck().all()).toEqual([4]);
  });

  it('keeps hazard cautions apart from spectral ones', () => {
    const rows = open(databaseBytes(tables)).prepare("SELECT subject, code, measurement, found_in FROM caution WHERE complex = 'cr-a' ORDER BY number").raw().all();
    expect(rows).toEqual([
      ['hazard', 'PERCHLORATE', null, 'the sample of aq-295; the sample of aq-77'],
      ['spectral', 'NO_SPARE', 'aq-295', null],
      ['spectral', 'NO_SPARE', 'aq-77', null],
    ]);
  });

  it('keeps an overridden hazard with its reason', () => {
    const one = collection([complexRecord('cr-a', measurements, { hazardOverrides: { PERCHLORATE: 'the sample was the chloride' } })]);
    const database = open(databaseBytes(allTables(one, readings, 'e', 's')));
    expect(database.prepare("SELECT count(*) FROM caution WHERE subject = 'hazard'").pluck().get()).toBe(0);
    expect(database.prepare('SELECT code, reason FROM hazard_override').raw().all()).toEqual([['PERCHLORATE', 'the sample was the chloride']]);
  });
});
