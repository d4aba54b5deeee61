import Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import { databaseBytes } from '../../../scripts/database/write.ts';
import { resultColumns, resultTable } from '../../../scripts/export/columns.ts';
import { readComment } from '../../../scripts/export/dictionary/comment.ts';
import { parseSchema } from '../../../scripts/export/dictionary/parseSchema.ts';
import { databaseTables } from '../../../scripts/export/dictionary/schemaFile.ts';
import { dictionaryJson, rangeShown, typeShown, unitShown } from '../../../scripts/export/dictionary/show.ts';
import { unitOf } from '../../../scripts/export/dictionary/units.ts';

const tables = databaseTables();
const database = new Database(databaseBytes({}));
const inDatabase = (table: string) => database.prepare<[string], { name: string; type: string; notnull: number; pk: number }>('SELECT * FROM pragma_table_info(?)').all(table);
const all = tables.flatMap((table) => table.columns.map((column) => ({ where: `${table.name}.${column.name}`, column })));

describe('the data dictionary', () => {
  it('names every table of the database, and no other', () => {
    const found = database.prepare("SELECT name FROM sqlite_schema WHERE type = 'table' ORDER BY name").pluck().all();
    expect(tables.map(({ name }) => name).sort()).toEqual(found);
  });

  it.each(tables.map((table) => [table.name, table] as const))('has the columns of %s with their type, key and emptiness', (name, table) => {
    const found = inDatabase(name);
    expect(table.columns.map((column) => column.name)).toEqual(found.map((column) => column.name));
    expect(table.key).toEqual(found.filter(({ pk }) => pk > 0).sort((a, b) => a.pk - b.pk).map((column) => column.name));
    const sqlTypes = { text: 'TEXT', json: 'TEXT', integer: 'INTEGER', flag: 'INTEGER', real: 'REAL' } as const;
    expect(table.columns.map(({ type }) => sqlTypes[type])).toEqual(found.map(({ type }) => type));
    expect(table.columns.map(({ required }) => required)).toEqual(found.map(({ notnull }) => notnull === 1));
  });

  it('knows every foreign key', () => {
    for (const { name, references } of tables) {
      const found = database.prepare<[string], { id: number; seq: number; table: string; from: string; to: string }>('SELECT * FROM pragma_foreign_key_list(?) ORDER BY id, seq').all(name);
      const grouped = [...new Set(found.map(({ id }) => id))].map((id) => found.filter((row) => row.id === id));
      const text = (table: string, from: readonly string[], to: readonly string[]): string => `${from.join()} -> ${table} ${to.join()}`;
      expect([name, references.map(({ table, columns, targets }) => text(table, columns, targets)).sort()])
        .toEqual([name, grouped.map((rows) => text(rows[0]!.table, rows.map(({ from }) => from), rows.map(({ to }) => to))).sort()]);
    }
  });

  it('says of every table and column what it means', () => {
    expect(tables.filter(({ meaning }) => meaning.length < 15).map(({ name }) => name)).toEqual([]);
    expect(all.filter(({ column }) => column.meaning.length < 4).map(({ where }) => where)).toEqual([]);
  });

  it('gives a known unit to every number, and to nothing else', () => {
    const numbers = all.filter(({ column: { type } }) => type === 'real' || type === 'integer');
    expect(numbers.length).toBeGreaterThan(150);
    expect(numbers.filter(({ column }) => column.units.length === 0).map(({ where }) => where)).toEqual([]);
    expect(all.filter(({ column: { type, units } }) => units.length > 0 && type !== 'real' && type !== 'integer').map(({ where }) => where)).toEqual([]);
    for (const { column } of all) for (const unit of column.units) expect(unitOf(unit).ucum).toBe(unit);
  });

  it('holds the columns of the result view and of the wide file', () => {
    const view = inDatabase('result').map(({ name }) => name);
    const added = resultColumns.map(({ name }) => name).filter((name) => !view.includes(name));
    expect(resultColumns.map(({ name }) => name).filter((name) => view.includes(name))).toEqual(view);
    expect(added).toEqual(expect.arrayContaining(['formula', 'hazards', 'corr_Delta_C', 'corr_B_C', 'Delta_reason', 'address']));
    const file = JSON.parse(dictionaryJson([...tables, resultTable])) as { tables: { name: string; columns: unknown[] }[] };
    expect(file.tables.map(({ name, columns }) => [name, columns.length])).toEqual([...tables, resultTable].map(({ name, columns }) => [name, columns.length]));
  });
});

describe('the comments of the schema', () => {
  it('are read as unit, range and meaning', () => {
    expect(readComment('[cm-1, > 0] position')).toEqual({ units: ['cm-1'], limits: { above: 0, least: null, most: null }, meaning: 'position' });
    expect(readComment('[cm-1|1] value')).toMatchObject({ units: ['cm-1', '1'], limits: { above: null, least: null, most: null } });
    expect(readComment('[1, -1 to 1] correlation')).toMatchObject({ units: ['1'], limits: { least: -1, most: 1 } });
    expect(readComment('[>= 1] place')).toMatchObject({ units: [], limits: { least: 1 } });
    expect(readComment('a list [of texts]')).toMatchObject({ units: [], meaning: 'a list [of texts]' });
  });

  it('may be missing only where a column refers to another', () => {
    const parent = 'CREATE TABLE a (\n  id TEXT NOT NULL PRIMARY KEY  -- name of a\n) STRICT;\n';
    const child = (line: string) => `${parent}CREATE TABLE b (\n${line}\n) STRICT;\n`;
    expect(parseSchema(child('  a TEXT NOT NULL REFERENCES a (id)'))[1]!.columns[0]!.meaning).toBe('a: name of a');
    expect(() => parseSchema(child('  a TEXT NOT NULL'))).toThrow('schema.sql says nothing of the column b.a');
  });
});

describe('the dictionary in words', () => {
  const shown = (table: string, name: string) => {
    const column = tables.find((one) => one.name === table)!.columns.find((one) => one.name === name)!;
    return [typeShown(column), unitShown(column), rangeShown(column)];
  };
  it('says type, unit and range', () => {
    expect(shown('band', 'position')).toEqual(['number', 'cm⁻¹', '1000 to 100000']);
    expect(shown('parameter', 'value')).toEqual(['number, may be empty', 'cm⁻¹ or 1', null]);
    expect(shown('correlation', 'value')).toEqual(['number', '1', '−1 to 1']);
    expect(shown('complex', 'fitted')).toEqual(['flag', null, '0 or 1']);
    expect(shown('observed_range', 'kind')).toEqual(['text', null, 'scanned, absent']);
    expect(shown('ligand', 'denticity')).toEqual(['whole number', '1', 'above 0']);
  });
});
