// Reads a tree of typed texts by a zod schema, field by field, and keeps what can be read where something cannot:
// one fault in a record does not hide the others. zod holds the fields and judges each value; this file walks.

import { z } from 'zod';
import { plainValue } from './node.ts';
import type { ContentNode, MapNode, Path } from './node.ts';
import { nearNames, orList } from './nearest.ts';
import { typedText } from './report.ts';
import type { Finding, Reporter } from './report.ts';
import { metaOf } from './schema/meta.ts';
import { homesOf } from './schema/names.ts';

type Schema = z.core.$ZodType;

/** What is left of a record in which any part may have been faulty. */
export type Draft<S extends Schema> =
  S extends z.ZodOptional<infer Inner extends Schema> ? Draft<Inner> | undefined
  : S extends z.ZodObject<infer Shape> ? { readonly [K in keyof Shape]?: Shape[K] extends Schema ? Draft<Shape[K]> : never } | undefined
  : S extends z.ZodArray<infer Item extends Schema> ? readonly Draft<Item>[] | undefined
  : S extends z.ZodRecord<z.core.$ZodRecordKey, infer Value extends Schema> ? Readonly<Record<string, Draft<Value>>> | undefined
  : S extends z.ZodUnion<infer Options extends readonly Schema[]> ? Draft<Options[number]>
  : z.output<S> | undefined;

/** Reads a node by a schema. What is faulty is reported and left out (in lists: undefined in its place). */
export function readDraft<S extends Schema>(schema: S, node: ContentNode, report: Reporter): Draft<S> {
  return walk(schema, schema, node, [], report) as Draft<S>;
}

/** `described` is the schema as its field carries it, with description and examples. */
function walk(schema: Schema, described: Schema, node: ContentNode, path: Path, report: Reporter): unknown {
  if (schema instanceof z.ZodOptional) return walk(schema.unwrap(), described, node, path, report);
  if (node.kind === 'text' && node.text.trim() === '' && path.length > 0) {
    report.at(path, { code: 'EMPTY_VALUE', found: typeof path.at(-1) === 'number' ? 'nothing behind the dash' : 'nothing behind the colon', expected: expectation(described), mend: 'type a value, or delete the field where nothing is known: missing is left out' });
    return undefined;
  }
  if (schema instanceof z.ZodUnion) {
    const options = schema.options as readonly Schema[];
    const fitting = options.filter((option) => nodeKind(option) === node.kind);
    return walk(closest(fitting, node) ?? options[0]!, described, node, path, report);
  }
  if (nodeKind(schema) !== node.kind) {
    report.at(path, wrongShape(schema, described, node, path));
    return undefined;
  }
  if (schema instanceof z.ZodObject && node.kind === 'map') return walkObject(schema, node, path, report);
  if (schema instanceof z.ZodRecord && node.kind === 'map') return walkRecord(schema, node, path, report);
  if (schema instanceof z.ZodArray && node.kind === 'list') {
    const most = limitOf(schema, 'max_length');
    if (node.items.length === 0) report.at(path, { code: 'EMPTY_VALUE', found: 'an empty list', expected: 'at least one item', mend: 'add an item, or leave the field out' });
    if (most !== null && node.items.length > most) {
      report.at(path, { code: 'TOO_MANY', found: `${node.items.length} items`, expected: `at most ${most}`, mend: 'split the record, or leave out what is not needed' });
    }
    return node.items.slice(0, most ?? node.items.length).map((item, index) => walk(schema.element, schema.element, item, [...path, index], report));
  }
  return readLeaf(schema, node, path, report);
}

function walkObject(schema: z.ZodObject, node: MapNode, path: Path, report: Reporter): unknown {
  const shape = schema.shape as Readonly<Record<string, Schema>>;
  const result: Record<string, unknown> = {};
  for (const { key, keyPlace, value } of node.entries) {
    const field = Object.hasOwn(shape, key) ? shape[key] : undefined;
    if (field !== undefined) result[key] = walk(field, field, value, [...path, key], report);
    else report.atPlace(keyPlace, [...path, key], unknownField(key, Object.keys(shape), node));
  }
  for (const [key, field] of Object.entries(shape)) {
    if (field instanceof z.ZodOptional || node.entries.some((entry) => entry.key === key)) continue;
    const example = exampleOf(field);
    report.at([...path, key], { code: 'MISSING_FIELD', found: `no "${key}"`, expected: `"${key}": ${expectation(field)}`, mend: example === null ? `add ${key}` : `add a line such as  ${key}: ${example}` });
  }
  return result;
}

function walkRecord(schema: z.ZodRecord, node: MapNode, path: Path, report: Reporter): unknown {
  const result: Record<string, unknown> = {};
  for (const { key, keyPlace, value } of node.entries) {
    const name = z.safeParse(schema.keyType, key);
    if (!name.success) report.atPlace(keyPlace, [...path, key], findingOf(name.error.issues[0]!, key));
    // Own keys only: a field typed "__proto__" is a name like any other.
    Object.defineProperty(result, key, { value: walk(schema.valueType as Schema, schema.valueType as Schema, value, [...path, key], report), enumerable: true, configurable: true, writable: true });
  }
  return result;
}

function readLeaf(schema: Schema, node: ContentNode, path: Path, report: Reporter): unknown {
  const parsed = z.safeParse(schema, plainValue(node));
  if (parsed.success) return parsed.data;
  report.at(path, findingOf(parsed.error.issues[0]!, node.kind === 'text' ? node.text : node.kind));
  return undefined;
}

/** The finding that a leaf put into its issue, or one made from zod's own. */
function findingOf(issue: z.core.$ZodIssue, typed: string): Finding {
  if (issue.code === 'custom' && issue.params?.['finding'] !== undefined) {
    const finding = issue.params['finding'] as Finding;
    return isTyped(finding.found, typed) ? { ...finding, found: typedText(finding.found.trim()) } : finding;
  }
  if (issue.code === 'invalid_value') {
    const names = issue.values.map(String);
    const near = nearNames(typed, names, 2);
    return { code: 'UNKNOWN_CHOICE', found: typedText(typed), expected: names.length === 1 ? `the word ${names[0]}` : `one of ${orList(names)}`, mend: near.length > 0 ? `write ${orList(near)}` : names.length === 1 ? `write ${names[0]}, or leave the field out` : 'write one of these words' };
  }
  return { code: 'WRONG_SHAPE', found: typedText(typed), expected: issue.message, mend: 'compare with the example record of content/README.md' };
}

/** true where a leaf repeats what was typed, whole or cut short, instead of describing it. */
function isTyped(found: string, typed: string): boolean {
  const start = found.trim().replace(/(\.\.\.|…)$/, '').trimEnd();
  return start !== '' && typed.includes(start) && !/^\d+ characters$/.test(found);
}

function unknownField(key: string, known: readonly string[], node: MapNode): Finding {
  const near = nearNames(key, known, 2);
  const typed = near.find((name) => node.entries.some((entry) => entry.key === name));
  const homes = homesOf(key);
  const mend = typed !== undefined ? `delete it, or join it with "${typed}", which is there already`
    : near.length > 0 ? `write ${orList(near)}`
    : homes.length > 0 ? `move it to ${orList(homes)}`
    : 'delete the field, or move what it says to notes';
  return { code: 'UNKNOWN_FIELD', found: typedText(key), expected: `one of ${known.join(', ')}`, mend };
}

function wrongShape(schema: Schema, described: Schema, node: ContentNode, path: Path): Finding {
  const found = node.kind === 'text' ? typedText(node.text) : node.kind === 'list' ? 'a list' : 'fields with values';
  const wanted = nodeKind(schema);
  const last = path.at(-1);
  const name = typeof last === 'string' ? last : 'value';
  const example = exampleOf(described);
  if (wanted === 'list') return { code: 'WRONG_SHAPE', found, expected: 'a list', mend: `start each item on a line of its own with a dash and a space, or write [first, second]` };
  if (wanted === 'map') return { code: 'WRONG_SHAPE', found, expected: 'fields with values', mend: example === null ? 'write  name: value  for each field' : `write  ${typeof last === 'string' ? `${name}: ` : ''}${example}` };
  return { code: 'WRONG_SHAPE', found, expected: expectation(described), mend: example === null ? 'write one value; a text with brackets goes in double quotes' : `write one value, as in  ${name}: ${example}; a text with brackets goes in double quotes` };
}

function nodeKind(schema: Schema): ContentNode['kind'] {
  if (schema instanceof z.ZodOptional) return nodeKind(schema.unwrap());
  if (schema instanceof z.ZodObject || schema instanceof z.ZodRecord) return 'map';
  return schema instanceof z.ZodArray ? 'list' : 'text';
}

/** Among maps, the one that knows most of the typed fields: a band or an absent range. */
function closest(options: readonly Schema[], node: ContentNode): Schema | undefined {
  if (node.kind !== 'map' || options.length < 2) return options[0];
  const known = (schema: Schema) => (schema instanceof z.ZodObject ? node.entries.filter((entry) => Object.hasOwn(schema.shape, entry.key)).length : 0);
  return options.reduce((best, option) => (known(option) > known(best) ? option : best));
}

function limitOf(schema: z.ZodArray, check: 'max_length'): number | null {
  for (const item of schema.def.checks ?? []) {
    const def = item._zod.def as { readonly check?: string; readonly maximum?: number };
    if (def.check === check && def.maximum !== undefined) return def.maximum;
  }
  return null;
}

function expectation(schema: Schema): string {
  const meta = metaOf(schema);
  const example = exampleOf(schema);
  const description = meta.description ?? 'a value';
  return example === null ? description : `${description}, e.g. ${example}`;
}

function exampleOf(schema: Schema): string | null {
  return metaOf(schema).examples?.[0] ?? null;
}
