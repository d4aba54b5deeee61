import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { expect, test } from 'vitest';
import { databaseBytes } from '../../../scripts/database/write.ts';
import { resultTable } from '../../../scripts/export/columns.ts';
import { databaseTables as tablesOfTheFile } from '../../../scripts/export/dictionary/schemaFile.ts';
import { dictionaryJson } from '../../../scripts/export/dictionary/show.ts';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { databaseTables, dictionaryPage } from '../../../site/data/dictionary.ts';
import type { Cell } from '../../../site/data/table.ts';

const page = dictionaryPage();
const text = (cell: Cell): string => typeof cell === 'string' ? cell : cell.parts.map((part) => part.text).join('');

test('the page describes every column of every table, and nothing that is not there', () => {
  const database = new Database(databaseBytes({}));
  const inDatabase = database.prepare<[], { table: string; column: string }>(`SELECT t.name AS "table", c.name AS "column" FROM sqlite_schema t, pragma_table_info(t.name) c WHERE t.type = 'table'`).all()
    .map(({ table, column }) => `${table}.${column}`);
  const described = page.flatMap(({ name, columns }) => columns.rows.map(([column]) => `${name}.${text(column!)}`));
  expect(new Set(described).size).toBe(described.length);
  expect(described.filter((name) => !name.startsWith(`${resultTable.name}.`)).sort()).toEqual(inDatabase.sort());
  expect(described.filter((name) => name.startsWith(`${resultTable.name}.`))).toEqual(resultTable.columns.map(({ name }) => `${resultTable.name}.${name}`));
  expect(inDatabase.length).toBeGreaterThan(250);
});

test('it comes from the same source as dictionary.json, column by column', () => {
  expect(databaseTables).toEqual(tablesOfTheFile());
  const file = JSON.parse(dictionaryJson([resultTable, ...databaseTables])) as { tables: { name: string; meaning: string; columns: { name: string; meaning: string; units: string[] }[] }[] };
  expect(page.map(({ name, meaning }) => [name, meaning])).toEqual(file.tables.map(({ name, meaning }) => [name, meaning]));
  const shown = page.flatMap(({ columns }) => columns.rows.map(([name, meaning, , ucum]) => [name, meaning, text(ucum!)].join('|')));
  expect(shown).toEqual(file.tables.flatMap(({ columns }) => columns.map(({ name, meaning, units }) => [name, meaning, units.length === 0 ? 'none' : units.join(' or ')].join('|'))));
});

test('it is drawn from the schema that the database is made of, and leads from table to table', () => {
  expect(readFileSync(join(projectFolder, 'site/data/dictionary.ts'), 'utf8')).toContain('scripts/database/schema.sql?raw');
  const ids = page.map(({ id }) => id);
  expect(new Set(ids).size).toBe(ids.length);
  const led = page.flatMap(({ references }) => references.map(({ id }) => id));
  expect(led.length).toBeGreaterThan(20);
  expect(led.filter((id) => !ids.includes(id))).toEqual([]);
});
