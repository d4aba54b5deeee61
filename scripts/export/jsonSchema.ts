// JSON Schema (2020-12) of collection.json and record.json, made from the data dictionary.

import type { ColumnEntry, TableEntry } from './dictionary/types.ts';
import { unitShown } from './dictionary/show.ts';
import type { Json, JsonObject } from './json.ts';
import { impliedColumns, recordLevel, sharedTables } from './record.ts';
import type { RecordLevel } from './record.ts';

const dialect = 'https://json-schema.org/draft/2020-12/schema';

/** What stands in front of the rows in both files. */
const aboutProperties: JsonObject = {
  title: { type: 'string' },
  group: { type: 'string' },
  address: { type: 'string', format: 'uri' },
  release: { type: 'string' },
  released: { type: 'string', description: 'date of the release, or the day on which the collection was started while none was frozen' },
  state: { enum: ['frozen', 'changed since', 'not frozen'], description: 'whether these numbers are those of the frozen release' },
  licence: { type: 'string', description: 'SPDX identifier' },
  doi: { type: ['string', 'null'], description: 'null: not yet assigned' },
  demonstration: { type: 'boolean', description: 'true: invented data' },
  note: { type: 'string' },
};

/** Schema of collection.json. */
export function collectionSchema(tables: readonly TableEntry[]): JsonObject {
  return {
    $schema: dialect,
    title: 'A collection: every row of every table',
    type: 'object',
    required: ['$schema', 'about', 'tables'],
    additionalProperties: false,
    properties: {
      $schema: { type: 'string' },
      about: objectOf(aboutProperties),
      tables: objectOf(Object.fromEntries(tables.map((table) => [table.name, arrayOf({ $ref: `#/$defs/${table.name}` }, table.meaning)]))),
    },
    $defs: Object.fromEntries(tables.map((table) => [table.name, rowSchema(table, [])])),
  };
}

/** Schema of record.json. */
export function recordSchema(tables: readonly TableEntry[]): JsonObject {
  const at = (level: RecordLevel): JsonObject => Object.fromEntries(tables.filter((table) => recordLevel(table) === level)
    .map((table) => [table.name, arrayOf(rowSchema(table, impliedColumns(level)), table.meaning)]));
  const entry = (name: string): TableEntry => tables.find((table) => table.name === name)!;
  const nested = (name: string, without: readonly string[], inner: JsonObject): Json => {
    const { meaning, columns } = entry(name);
    return arrayOf(objectOf({ ...columnProperties(columns, without), ...inner }), meaning);
  };
  return {
    $schema: dialect,
    title: 'One complex: everything that is known of it',
    ...objectOf({
      $schema: { type: 'string' },
      ...aboutProperties,
      complex: rowSchema(entry('complex'), []),
      ...at('complex'),
      measurement: nested('measurement', ['complex'], { ...at('measurement'), reading: nested('reading', ['complex', 'measurement'], at('reading')) }),
      ...Object.fromEntries(Object.keys(sharedTables).map((name) => [name, arrayOf(rowSchema(entry(name), []), entry(name).meaning)])),
    }),
  };
}

function objectOf(properties: JsonObject): JsonObject {
  return { type: 'object', required: Object.keys(properties), additionalProperties: false, properties };
}

function arrayOf(items: Json, description: string): JsonObject {
  return { type: 'array', description, items };
}

function rowSchema({ columns }: TableEntry, without: readonly string[]): JsonObject {
  return objectOf(columnProperties(columns, without));
}

function columnProperties(columns: readonly ColumnEntry[], without: readonly string[]): JsonObject {
  return Object.fromEntries(columns.filter(({ name }) => !without.includes(name)).map((column) => [column.name, columnSchema(column)]));
}

function columnSchema(column: ColumnEntry): JsonObject {
  const { type, required, values, limits: { above, least, most } } = column;
  const unit = unitShown(column);
  const description = unit === null || unit === '1' ? column.meaning : `${column.meaning}; in ${unit}`;
  if (type === 'flag') return { description, enum: required ? [0, 1] : [0, 1, null] };
  if (values !== null) return { description, enum: required ? values : [...values, null] };
  if (type === 'json') return { description, type: required ? ['array', 'object'] : ['array', 'object', 'null'] };
  const plain = type === 'text' ? 'string' : type === 'integer' ? 'integer' : 'number';
  return {
    description,
    type: required ? plain : [plain, 'null'],
    ...(above === null ? {} : { exclusiveMinimum: above }),
    ...(least === null ? {} : { minimum: least }),
    ...(most === null ? {} : { maximum: most }),
  };
}
