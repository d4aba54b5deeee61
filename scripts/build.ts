// npm run build: refit, pages, files for download.

import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { holdContent, stampContent } from './content/stamp.ts';
import { refit } from './database/refit.ts';
import { exitCodes } from './exitCodes.ts';
import { writePublication } from './export/writePublication.ts';
import { whileLocked } from './lock.ts';
import { cacheFile, places } from './places.ts';
import { addressOf } from './publish/address.ts';
import { buildPages, countPages } from './publish/pages.ts';
import { swapFolder } from './publish/swapFolder.ts';
import { counted } from './report/columns.ts';
import { progressLine } from './report/progress.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { duration, refitFacts, refitLines } from './report/summary.ts';
import { runCommand } from './runCommand.ts';

const table: CommandTable = {
  name: 'build',
  summary: 'Fits the collection and writes the site, with the database and the result files for download. A failed build leaves the old site as it was.',
  options: [
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'database', value: 'FILE', help: 'database file to write (.cache/collection.sqlite)' },
    { name: 'out', value: 'DIR', help: 'folder of the site (dist)' },
    { name: 'cold', help: 'fit everything, read and keep no cache' },
    { name: 'json', help: 'print the summary as JSON' },
  ],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const started = performance.now();
  const content = given.path('content', places.content);
  const database = given.path('database', places.database);
  const out = given.path('out', places.site);
  const json = given.has('json');

  const stages: Record<string, number> = {};
  const result = await whileLocked(table.name, [database, out], async () => {
    const stamp = stampContent(content);
    const progress = progressLine('fitting', process.stderr);
    const fitted = refit({ content, database, cache: given.has('cold') ? null : cacheFile(content), progress: progress.update });
    progress.end();
    if (!fitted.ok) return fitted;
    stages['refit'] = since(started);
    if (process.stderr.isTTY) process.stderr.write('drawing pages ...');
    await swapFolder(out, async (folder) => {
      const drawing = performance.now();
      await buildPages(database, addressOf(fitted.refit.frame.group.url), folder);
      stages['pages'] = since(drawing);
      const writing = performance.now();
      // The files for download take the records as typed, so they must be those that were fitted.
      holdContent(content, stamp);
      writePublication(database, content, folder);
      holdContent(content, stamp);
      stages['files'] = since(writing);
    });
    if (process.stderr.isTTY) process.stderr.write('\r\u001b[K');
    return fitted;
  });
  if (!result.ok) return stoppedByFaults(result.faults, content, 'The database and the site were left as they were.', json);

  const pages = countPages(out);
  const milliseconds = performance.now() - started;
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, ...refitFacts(result.refit), database, site: out, pages, seconds: milliseconds / 1000, stages })}\n`);
  else {
    process.stdout.write(`${[
      ...refitLines(result.refit),
      `Wrote ${counted(pages, 'page')} to ${out} in ${duration(milliseconds)}.`,
      'Next: "npm run preview" serves the site on this machine.',
    ].join('\n')}\n`);
  }
  return exitCodes.good;
});

/** Seconds. */
function since(moment: number): number {
  return (performance.now() - moment) / 1000;
}
