// Every field name of every record and where it belongs, for the reader of YAML traps and for advice.

import { z } from 'zod';
import { recordKinds } from './kinds.ts';

const homes = new Map<string, string[]>();
for (const { name, schema } of recordKinds) collect(schema, name, []);

/** The names of all fields. */
export const fieldNames: ReadonlySet<string> = new Set(homes.keys());

/** Where a field belongs, "a band of a complex", at most three places; empty where no record has it. */
export function homesOf(field: string): readonly string[] {
  return (homes.get(field) ?? []).slice(0, 3);
}

function collect(schema: z.core.$ZodType, kind: string, path: readonly string[]): void {
  if (schema instanceof z.ZodOptional) collect(schema.unwrap(), kind, path);
  else if (schema instanceof z.ZodArray) collect(schema.element, kind, [...path.slice(0, -1), `an item of ${path.at(-1)}`]);
  else if (schema instanceof z.ZodRecord) collect(schema.valueType, kind, path);
  else if (schema instanceof z.ZodUnion) for (const option of schema.options) collect(option, kind, path);
  else if (schema instanceof z.ZodObject) {
    const last = path.at(-1);
    const home = last === undefined ? `the top of a ${kind} record` : `${last} of a ${kind} record`;
    for (const [name, field] of Object.entries(schema.shape)) {
      const known = homes.get(name) ?? [];
      if (!known.includes(home)) homes.set(name, [...known, home]);
      collect(field, kind, [...path, name]);
    }
  }
}
