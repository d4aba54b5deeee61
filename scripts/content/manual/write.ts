// Rewrites what is generated in the content folder: the editors' schema, and the tables between the marks of its README.

import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { codeTables, fieldTables } from './fieldTable.ts';
import { jsonSchemaText } from './jsonSchema.ts';

const generated: Readonly<Record<string, () => string>> = { fields: fieldTables, codes: codeTables };

/** The manual's text with its generated parts renewed. @throws Error where a mark is missing */
export function renewedManual(text: string): string {
  let result = text;
  for (const [name, make] of Object.entries(generated)) {
    const open = `<!-- generated: ${name} -->`;
    const close = `<!-- end of generated: ${name} -->`;
    const start = result.indexOf(open);
    const end = result.indexOf(close);
    if (start < 0 || end < start) throw new Error(`the manual has no marks "${open}" and "${close}"`);
    result = `${result.slice(0, start + open.length)}\n${make()}\n${result.slice(end)}`;
  }
  return result;
}

/** Writes record.schema.json and renews README.md in a content folder; returns their names. */
export function writeManual(directory: string): string[] {
  const manual = join(directory, 'README.md');
  writeFileSync(manual, renewedManual(readFileSync(manual, 'utf8')));
  writeFileSync(join(directory, 'record.schema.json'), jsonSchemaText());
  return ['README.md', 'record.schema.json'];
}
