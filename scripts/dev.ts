// npm run dev: the site live, refitted whenever the content changes.

import { existsSync } from 'node:fs';
import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { refit } from './database/refit.ts';
import { exitCodes } from './exitCodes.ts';
import { readResults } from './export/results.ts';
import { cacheFile, places } from './places.ts';
import { portOf } from './port.ts';
import { addressOf } from './publish/address.ts';
import { startLiveSite } from './publish/liveSite.ts';
import { watchFolder } from './publish/watchFolder.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { duration, refitLines } from './report/summary.ts';
import { runCommand } from './runCommand.ts';

const table: CommandTable = {
  name: 'dev',
  summary: 'Serves the site live: a change in the content is fitted and shown at once. Faults are printed, and the last good results stay. Ctrl-C ends.',
  options: [
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'database', value: 'FILE', help: 'database file to write (.cache/collection.sqlite)' },
    { name: 'port', value: 'NUMBER', help: 'port to listen on (4321); the next free one where it is in use' },
  ],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const content = given.path('content', places.content);
  const database = given.path('database', places.database);
  const port = portOf(given.text('port'), 4321);

  /** true where the database is new. */
  const fitAgain = (): boolean => {
    const started = performance.now();
    const result = refit({ content, database, cache: cacheFile(content) });
    if (!result.ok) {
      stoppedByFaults(result.faults, content, existsSync(database) ? 'The last good results stay.' : 'There are no results yet.', false);
      return false;
    }
    process.stdout.write(`${refitLines(result.refit)[0]} ${duration(performance.now() - started)}\n`);
    return true;
  };

  if (!fitAgain() && !existsSync(database)) return exitCodes.faults;
  const address = addressOf(readResults(database).meta['group.url'] ?? 'https://example.org/');
  const site = await startLiveSite(database, address, port);
  process.stdout.write(`The site is at ${site.url}  (Ctrl-C ends)\nWatching ${content}\n`);

  const endWatch = watchFolder(content, async () => {
    try {
      if (fitAgain()) site.reload();
    } catch (error) {
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    }
  });
  return new Promise<number>((resolve) => {
    const stop = (): void => {
      endWatch();
      void site.stop().then(() => resolve(exitCodes.good));
    };
    process.once('SIGINT', stop).once('SIGTERM', stop);
  });
});
