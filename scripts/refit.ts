// npm run refit: content to database, or the story of one result.

import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { refit } from './database/refit.ts';
import { exitCodes } from './exitCodes.ts';
import { explain } from './explain/explain.ts';
import { rebuildFromExport } from './export/fromExport.ts';
import { whileLocked } from './lock.ts';
import { cacheFile, places } from './places.ts';
import { progressLine } from './report/progress.ts';
import { rebuildLines } from './report/rebuild.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { duration, refitFacts, refitLines } from './report/summary.ts';
import { runCommand } from './runCommand.ts';

const table: CommandTable = {
  name: 'refit',
  summary: 'Fits every measurement of the content anew and writes the database. Measurements that did not change are taken from a cache; the result is the same.',
  options: [
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'database', value: 'FILE', help: 'database file to write (.cache/collection.sqlite)' },
    { name: 'explain', value: 'ID', help: 'tell the story of one measurement (cr-am6/aq-295) or complex (cr-am6); writes nothing' },
    { name: 'from-export', value: 'DIR', help: 'rebuild from the files of an export alone (dist/data) and compare every value; writes .cache/from-export.sqlite' },
    { name: 'cold', help: 'fit everything, read and keep no cache' },
    { name: 'json', help: 'print the summary, or the story, as JSON' },
  ],
  examples: ['', '--from-export dist/data', '--explain cr-am6/aq-295', '--content ../our-bands --database our-bands.sqlite'],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const started = performance.now();
  const content = given.path('content', places.content);
  const database = given.path('database', places.database);
  const json = given.has('json');
  const story = given.text('explain');
  if (story !== null) return explain(content, story, json);
  if (given.text('from-export') !== null) return rebuild(given.path('from-export', places.site), given.path('database', places.rebuilt), json);

  const progress = progressLine('fitting', process.stderr);
  const result = await whileLocked(table.name, [database], () => refit({ content, database, cache: given.has('cold') ? null : cacheFile(content), progress: progress.update }));
  progress.end();
  if (!result.ok) return stoppedByFaults(result.faults, content, 'The database was left as it was.', json);
  const seconds = (performance.now() - started) / 1000;
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, ...refitFacts(result.refit), database, seconds })}\n`);
  else {
    const lines = [...refitLines(result.refit), `Wrote ${database} in ${duration(seconds * 1000)}.`];
    if (result.refit.measurements > 0) lines.push('Next: "npm run refit -- --explain ID" tells one result\'s story; "npm run build" makes the site.');
    process.stdout.write(`${lines.join('\n')}\n`);
  }
  return exitCodes.good;
});

/** Everything is fitted: a cache would prove nothing. */
function rebuild(from: string, database: string, json: boolean): number {
  const progress = progressLine('fitting', process.stderr);
  const result = rebuildFromExport({ from, database, progress: progress.update });
  progress.end();
  const { cells, differences, largest } = result.comparison;
  if (json) process.stdout.write(`${JSON.stringify({ ok: differences.length === 0, ...refitFacts(result.refit), database, cells, sameBytes: result.sameBytes, largest, differences })}\n`);
  else process.stdout.write(`${[...refitLines(result.refit), `Wrote ${database}.`, ...rebuildLines(result)].join('\n')}\n`);
  return differences.length === 0 ? exitCodes.good : exitCodes.failed;
}
