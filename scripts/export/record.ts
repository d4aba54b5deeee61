// record.json: all rows that concern one complex, nested as complex, measurement, reading.

import type { TableEntry } from './dictionary/types.ts';
import { jsonRow } from './json.ts';
import type { Json, JsonObject } from './json.ts';
import type { Row, TableRows } from './tableFiles.ts';

/** Where rows of a table stand in a record; `shared` rows are the few that the complex refers to. */
export type RecordLevel = 'complex' | 'measurement' | 'reading';

/** Tables that a record quotes because its rows refer to them, and the column by which they are found. */
export const sharedTables = { ion: 'name', free_ion: 'ion', ligand: 'id', source: 'id', policy: 'id' } as const;

/** The level of a table within a record; null for tables that concern no single complex. */
export function recordLevel({ name, columns }: TableEntry): RecordLevel | null {
  const has = (column: string): boolean => columns.some((one) => one.name === column && one.required);
  if (!has('complex') || ['complex', 'measurement', 'reading'].includes(name)) return null;
  // Rows of earlier releases and cautions stay together: their measurement may be gone, or be none.
  if (columns.some((column) => column.name === 'release') || !has('measurement')) return 'complex';
  return has('reading') ? 'reading' : 'measurement';
}

/** Columns that the place within the record already tells. */
export function impliedColumns(level: RecordLevel): readonly string[] {
  return level === 'complex' ? ['complex'] : level === 'measurement' ? ['complex', 'measurement'] : ['complex', 'measurement', 'reading'];
}

/** Finds rows by complex, measurement and reading without walking all of them for each record. */
export type RowFinder = (table: string, key: string) => readonly Row[];

/** Groups the rows of every table by the key of their level: "cr-am6", "cr-am6/aq", "cr-am6/aq/1". */
export function rowFinder(tables: readonly TableEntry[], rows: TableRows): RowFinder {
  const found = new Map<string, Map<string, Row[]>>();
  for (const table of tables) {
    const level = table.name === 'measurement' || table.name === 'reading' ? null : recordLevel(table);
    const columns = table.name === 'measurement' ? ['complex'] : table.name === 'reading' ? ['complex', 'measurement'] : level === null ? null : impliedColumns(level);
    if (columns === null) continue;
    const groups = new Map<string, Row[]>();
    for (const row of rows[table.name] ?? []) {
      const key = columns.map((column) => row[column]).join('/');
      const group = groups.get(key);
      if (group === undefined) groups.set(key, [row]);
      else group.push(row);
    }
    found.set(table.name, groups);
  }
  return (table, key) => found.get(table)?.get(key) ?? [];
}

/** record.json of one complex: the rows of every table that concern it, with `about` (release, licence, address, notes) in front. */
export function recordJson(tables: readonly TableEntry[], rows: TableRows, find: RowFinder, complex: Row, about: JsonObject): JsonObject {
  const id = String(complex['id']);
  const level = (wanted: RecordLevel, key: string): JsonObject => Object.fromEntries(
    tables.filter((table) => recordLevel(table) === wanted).map((table) => [table.name, find(table.name, key).map((row) => jsonRow(table, row, impliedColumns(wanted)))]),
  );
  const entry = (name: string): TableEntry => tables.find((table) => table.name === name)!;
  const inOrder = (list: readonly Row[]): Row[] => [...list].sort((a, b) => Number(a['number']) - Number(b['number']));
  const measurements = inOrder(find('measurement', id));
  return {
    ...about,
    complex: jsonRow(entry('complex'), complex),
    ...level('complex', id),
    measurement: measurements.map((measurement) => ({
      ...jsonRow(entry('measurement'), measurement, ['complex']),
      ...level('measurement', `${id}/${measurement['id']}`),
      reading: find('reading', `${id}/${measurement['id']}`).map((reading) => ({
        ...jsonRow(entry('reading'), reading, ['complex', 'measurement']),
        ...level('reading', `${id}/${measurement['id']}/${reading['number']}`),
      })),
    })),
    ...shared(tables, rows, complex, find('complex_ligand', id), measurements, measurements.flatMap(({ id: one }) => find('quoted', `${id}/${one}`))),
  };
}

function shared(
  tables: readonly TableEntry[], rows: TableRows, complex: Row, ligands: readonly Row[], measurements: readonly Row[], quoted: readonly Row[],
): JsonObject {
  const wanted: Readonly<Record<string, ReadonlySet<unknown>>> = {
    ion: new Set([complex['ion']]),
    free_ion: new Set([complex['ion']]),
    ligand: new Set(ligands.map(({ ligand }) => ligand)),
    source: new Set([...measurements, ...quoted].map(({ source }) => source)),
    policy: new Set(measurements.map(({ policy }) => policy)),
  };
  return Object.fromEntries(Object.entries(sharedTables).map(([name, column]): [string, Json] => {
    const table = tables.find((one) => one.name === name)!;
    return [name, (rows[name] ?? []).filter((row) => wanted[name]!.has(row[column])).map((row) => jsonRow(table, row))];
  }));
}
