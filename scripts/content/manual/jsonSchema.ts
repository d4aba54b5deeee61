// The JSON Schema by which a YAML editor completes and underlines, made from the record schemas.

import { z } from 'zod';
import { recordKinds } from '../schema/kinds.ts';
import { metaOf } from '../schema/meta.ts';

/**
 * The text of record.schema.json (JSON Schema draft 7, which YAML editors read). One file for all kinds of record: an editor
 * takes the kind that fits best. A field whose value an editor may show as a number or a truth value allows that beside text.
 */
export function jsonSchemaText(): string {
  const definitions = Object.fromEntries(recordKinds.map(({ name, schema }) => [name, recordJsonSchema(schema)]));
  const whole = {
    $schema: 'http://json-schema.org/draft-07/schema#',
    title: 'Bandstead records',
    description: 'Completes and underlines while typing. npm run check is the judge: it also reads numbers, terms and formulas.',
    anyOf: recordKinds.map(({ name }) => ({ $ref: `#/definitions/${name}` })),
    definitions,
  };
  return `${JSON.stringify(whole, null, 2)}\n`;
}

function recordJsonSchema(schema: z.ZodObject): unknown {
  const made = z.toJSONSchema(schema, {
    io: 'input',
    target: 'draft-7',
    reused: 'inline',
    override: ({ zodSchema, jsonSchema }) => {
      const node = jsonSchema as Record<string, unknown>;
      const { bare, examples } = metaOf(zodSchema);
      delete node['bare'];
      if (examples !== undefined) node['examples'] = examples;
      delete node['propertyNames'];
      if (bare === 'number') node['type'] = ['string', 'number'];
      if (bare === 'boolean') node['type'] = ['string', 'boolean'];
    },
  });
  delete (made as Record<string, unknown>)['$schema'];
  return made;
}
