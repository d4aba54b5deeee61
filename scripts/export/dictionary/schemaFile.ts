import { readFileSync } from 'node:fs';
import { parseSchema } from './parseSchema.ts';
import type { TableEntry } from './types.ts';

/** The data dictionary of the database, read from its commented schema. */
export function databaseTables(): readonly TableEntry[] {
  return parseSchema(readFileSync(new URL('../../database/schema.sql', import.meta.url), 'utf8'));
}
