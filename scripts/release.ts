// npm run release: freezes the collection under a name.

import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { exitCodes } from './exitCodes.ts';
import { whileLocked } from './lock.ts';
import { cacheFile, places } from './places.ts';
import { freeze } from './release/freeze.ts';
import { revisionOf, today, userName } from './release/surroundings.ts';
import { progressLine } from './report/progress.ts';
import { releaseLines } from './report/release.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'release',
  summary: 'Freezes the collection as a release: writes its numbers, addresses, date and cause to content/releases/NAME.json and the name to group.yaml. A frozen release never changes.',
  values: [{ name: 'NAME', help: 'name of the release, 1.1.0 or 2026.1' }],
  options: [
    { name: 'cause', value: 'TEXT', help: 'why, in one sentence; must be given' },
    { name: 'who', value: 'NAME', help: 'who releases (the user of version control)' },
    { name: 'date', value: 'DATE', help: 'day of the release, year-month-day (today)' },
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'json', help: 'print what was frozen and what changed as JSON' },
  ],
  examples: ['1.1.0 --cause "The spectra of the winter term." --who "Tove Lind"'],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const content = given.path('content', places.content);
  const json = given.has('json');
  const release = nameOf(given.values[0]!);
  const cause = given.text('cause')?.trim() ?? '';
  if (cause === '') throw new UsageError('A release says why: give --cause "one sentence".');
  const who = given.text('who')?.trim() || userName(content);
  if (who === null) throw new UsageError('A release says who made it: give --who "name".');
  const date = dateOf(given.text('date') ?? today());

  const progress = progressLine('fitting', process.stderr);
  const result = await whileLocked(table.name, [content], () => freeze({ content, cache: cacheFile(content), progress: progress.update, release, date, who, cause, codeVersion: revisionOf(content) }));
  progress.end();
  if (result.kind === 'faults') return stoppedByFaults(result.faults, content, 'Nothing was frozen.', json);
  if (result.kind === 'refused') throw new UsageError(`Nothing was frozen: ${result.reason}.`);
  const { file, changes, first } = result;
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, release, date, who, cause, file, changes })}\n`);
  else process.stdout.write(`${[`Froze release ${release} of ${date} in ${file}; group.yaml names it.`, ...releaseLines(changes, first), 'Next: commit both files, run "npm run build", and keep dist/ with the release.'].join('\n')}\n`);
  return exitCodes.good;
});

function nameOf(typed: string): string {
  if (/^[A-Za-z0-9][A-Za-z0-9.-]{0,30}$/.test(typed)) return typed;
  throw new UsageError(`"${typed}" is no name of a release: write letters, digits, points and hyphens, as in 1.1.0`);
}

function dateOf(typed: string): string {
  const date = /^\d{4}-\d{2}-\d{2}$/.test(typed) ? new Date(`${typed}T00:00:00Z`) : null;
  if (date !== null && !Number.isNaN(date.getTime()) && date.toISOString().startsWith(typed)) return typed;
  throw new UsageError(`"${typed}" is no date: write year-month-day, as in 2026-03-02`);
}
