import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { refit } from '../../scripts/database/refit.ts';
import { places } from '../../scripts/places.ts';

/** The demonstration collection refitted into a database of its own. */
export interface Refitted {
  readonly database: string;
  readonly folder: string;
  readonly remove: () => void;
}

/** Refits the demonstration without a cache, inside the project, where the page builder may write too. */
export function refittedDemonstration(): Refitted {
  mkdirSync(resolve('.cache'), { recursive: true });
  const folder = mkdtempSync(resolve('.cache', 'demonstration-'));
  const database = join(folder, 'collection.sqlite');
  const done = refit({ content: places.content, database, cache: null });
  if (!done.ok) throw new Error(JSON.stringify(done.faults));
  return { database, folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}
