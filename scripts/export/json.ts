// Rows as JSON: the database's values, with the texts that hold lists and objects unfolded.

import type { TableEntry } from './dictionary/types.ts';
import type { Row, TableRows } from './tableFiles.ts';

export type Json = string | number | boolean | null | readonly Json[] | { readonly [name: string]: Json };
export type JsonObject = { readonly [name: string]: Json };

/** A row as JSON; `without` names columns that the place already tells. */
export function jsonRow({ columns }: TableEntry, row: Row, without: readonly string[] = []): JsonObject {
  return Object.fromEntries(columns.filter(({ name }) => !without.includes(name)).map(({ name, type }) => {
    const cell = row[name] ?? null;
    return [name, type === 'json' && typeof cell === 'string' ? (JSON.parse(cell) as Json) : cell];
  }));
}

/** collection.json, table by table: every row of every table, one row a line. A large collection is more than one text can hold. */
export function* collectionJson(tables: readonly TableEntry[], rows: TableRows, about: JsonObject): Generator<string> {
  yield `{"$schema": "collection.schema.json",\n"about": ${JSON.stringify(about)},\n"tables": {`;
  for (const [index, table] of tables.entries()) {
    const lines = (rows[table.name] ?? []).map((row) => JSON.stringify(jsonRow(table, row)));
    yield `${index === 0 ? '' : ','}\n${JSON.stringify(table.name)}: [${lines.length === 0 ? '' : `\n${lines.join(',\n')}\n`}]`;
  }
  yield '\n}}\n';
}
