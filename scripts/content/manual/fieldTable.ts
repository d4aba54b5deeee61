// The field tables and the list of codes of the manual, made from the record schemas.

import { z } from 'zod';
import { codeGroups } from '../codes.ts';
import { recordKinds } from '../schema/kinds.ts';
import { metaOf } from '../schema/meta.ts';

type Schema = z.core.$ZodType;

interface FieldRow {
  readonly path: string;
  readonly needed: boolean;
  readonly what: string;
  readonly example: string;
}

/** One table for each kind of record, in Markdown. */
export function fieldTables(): string {
  return recordKinds.map(({ files, schema }) => {
    // Two ways of typing an item may share a field.
    const rows = [...new Map(rowsOf(schema, '').reverse().map((row) => [row.path, row])).values()].reverse();
    return [`### \`${files}\``, '', '| field | needed | what | example |', '| --- | --- | --- | --- |', ...rows.map(tableLine)].join('\n');
  }).join('\n\n');
}

/** Every code with its sentence, in Markdown. */
export function codeTables(): string {
  return codeGroups.map(({ title, codes }) => [
    `### ${title}`, '', '| code | means |', '| --- | --- |', ...Object.entries(codes).map(([code, sentence]) => `| \`${code}\` | ${cell(sentence)} |`),
  ].join('\n')).join('\n\n');
}

function tableLine({ path, needed, what, example }: FieldRow): string {
  return `| \`${path}\` | ${needed ? 'yes' : ''} | ${cell(what)} | ${example === '' ? '' : `\`${cell(example)}\``} |`;
}

function cell(text: string): string {
  return text.replaceAll('|', '\\|');
}

function rowsOf(schema: Schema, prefix: string): FieldRow[] {
  if (!(schema instanceof z.ZodObject)) return [];
  return Object.entries(schema.shape as Record<string, Schema>).flatMap(([name, field]) => {
    const inner = unwrapped(field);
    const meta = metaOf(field);
    const words = choices(inner);
    const what = [meta.description ?? '', words].filter((part) => part !== '').join(': ');
    const path = `${prefix}${name}`;
    return [
      { path, needed: !(field instanceof z.ZodOptional), what, example: meta.examples?.[0] ?? '' },
      ...nested(inner, path),
    ];
  });
}

/** Fields within a field: of an object, of a list's items, of one way of typing it. */
function nested(schema: Schema, path: string): FieldRow[] {
  if (schema instanceof z.ZodObject) return rowsOf(schema, `${path}.`);
  if (schema instanceof z.ZodArray) return nested(unwrapped(schema.element), `${path}[]`);
  if (schema instanceof z.ZodRecord) return nested(unwrapped(schema.valueType), `${path}.ID`);
  if (schema instanceof z.ZodUnion) return (schema.options as Schema[]).flatMap((option) => nested(unwrapped(option), path));
  return [];
}

function choices(schema: Schema): string {
  return schema instanceof z.ZodEnum && schema.options.length > 1 ? schema.options.join(', ') : '';
}

function unwrapped(schema: Schema): Schema {
  return schema instanceof z.ZodOptional ? unwrapped(schema.unwrap()) : schema;
}
