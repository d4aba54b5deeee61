// npm run review: what needs a person, most pressing first. The review page shows the same list.

import Database from 'better-sqlite3';
import { existsSync } from 'node:fs';
import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { exitCodes } from './exitCodes.ts';
import { places } from './places.ts';
import { reviewLines } from './report/review.ts';
import type { FloorFactorRow, ReviewRow } from './report/review.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'review',
  summary: 'What needs a person: refused and strained readings, better and near rivals, quoted values and repeats that disagree.',
  values: [],
  options: [
    { name: 'database', value: 'FILE', help: 'the collection, as "npm run refit" wrote it (.cache/collection.sqlite)' },
    { name: 'json', help: 'print everything as JSON' },
  ],
  examples: ['', '--json'],
};

await runCommand(table.name, () => {
  const given = readArguments(table);
  const path = given.path('database', places.database);
  if (!existsSync(path)) throw new UsageError('There is no database yet: run  npm run refit  first.');
  const database = new Database(path, { readonly: true });
  try {
    const review = database.prepare<[], ReviewRow>('SELECT number, kind, complex, measurement, text FROM review ORDER BY number').all();
    const floorFactors = database.prepare<[], FloorFactorRow>('SELECT ion, geometry, kappa, u, spare_bands AS spareBands FROM floor_factor ORDER BY ion, geometry').all();
    process.stdout.write(given.has('json') ? `${JSON.stringify({ review, floorFactors })}\n` : `${reviewLines(review, floorFactors).join('\n')}\n`);
  } finally {
    database.close();
  }
  return exitCodes.good;
});
