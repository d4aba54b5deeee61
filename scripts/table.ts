// npm run table: old spreadsheets into records, and records out into a spreadsheet.

import { existsSync, statSync } from 'node:fs';
import { fromUser, readArguments } from './arguments.ts';
import type { Arguments, CommandTable } from './arguments.ts';
import { readCollection } from './content/readCollection.ts';
import { exitCodes } from './exitCodes.ts';
import { places } from './places.ts';
import { folderName } from './report/faults.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { runCommand, UsageError } from './runCommand.ts';
import { separators } from './table/csv.ts';
import { giveOut } from './table/giveOut.ts';
import { readMapping } from './table/mapping.ts';
import type { Mapping } from './table/mapping.ts';
import { takeIn } from './table/takeIn.ts';
import { givenOutText, takenInFacts, takenInText } from './table/words.ts';

const table: CommandTable = {
  name: 'table',
  summary: 'in: maps the columns of a CSV table to records. The mapping is guessed, shown and written beside the table; once you have confirmed it in that file, the records are written. out: writes the records as a table, in the form of such a mapping where there is one. No file is ever written over.',
  values: [{ name: 'in|out', help: 'in: a table into records; out: records into a table' }, { name: 'FILE.csv', help: 'the table' }],
  options: [
    { name: 'mapping', value: 'FILE', help: 'how columns become records (FILE.columns.yaml beside the table)' },
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'show', help: 'in: read and judge the table, and write nothing' },
    { name: 'partly', help: 'in: write the records that have no fault although others have some' },
    { name: 'rows', value: 'KIND', help: 'out, without a mapping: band (one row a band) or complex (one row a spectrum) (band)' },
    { name: 'separator', value: 'NAME', help: 'out, without a mapping: comma, semicolon or tab (comma)' },
    { name: 'decimal', value: 'NAME', help: 'out, without a mapping: point or comma (point)' },
    { name: 'json', help: 'print what was done as JSON' },
  ],
  examples: ['in old-bands.csv', 'out all-bands.csv --separator semicolon --decimal comma'],
};

/** Largest table that is read, bytes. */
const largestTable = 20_000_000;

await runCommand(table.name, () => {
  const given = readArguments(table);
  const [direction, file = ''] = given.values;
  if (direction !== 'in' && direction !== 'out') throw new UsageError(`"${direction}": say in or out.`);
  const content = given.path('content', places.content);
  const json = given.has('json');
  const { collection, faults } = readCollection(content);
  if (collection === null) return stoppedByFaults(faults, content, 'Nothing was read or written: mend the records first.', json);
  const files = { table: fromUser(file), mapping: given.text('mapping') === null ? beside(fromUser(file)) : given.path('mapping', ''), content };
  const names = { table: folderName(files.table), mapping: folderName(files.mapping) };

  if (direction === 'in') {
    const found = statSync(files.table, { throwIfNoEntry: false });
    if (found?.isFile() !== true) throw new UsageError(`There is no file ${names.table}.`);
    if (found.size > largestTable) throw new UsageError(`${names.table} has ${found.size} bytes; a table of at most ${largestTable} is read.`);
    const partly = given.has('partly');
    const taken = takeIn({ files, names, collection, partly, show: given.has('show') });
    process.stdout.write(json ? `${JSON.stringify(takenInFacts(taken, names))}\n` : takenInText(taken, names, folderName(content), partly));
    return taken.faults.length > 0 ? exitCodes.faults : exitCodes.good;
  }

  if (existsSync(files.table)) throw new UsageError(`${names.table} is there already, and no file is written over: name another one.`);
  const typed = readMapping(files.mapping, names.mapping);
  if (typed === null && given.text('mapping') !== null) throw new UsageError(`There is no mapping ${names.mapping}.`);
  if (typed?.ok === false) return stoppedByFaults(typed.faults, content, 'Nothing was written.', json);
  const out = giveOut(files.table, content, collection, typed === null ? settings(given) : typed.mapping);
  process.stdout.write(json
    ? `${JSON.stringify({ ok: true, file: files.table, ...out, lost: Object.fromEntries(out.lost) })}\n` : givenOutText(out, names.table, typed === null ? null : names.mapping));
  return exitCodes.good;
});

function beside(file: string): string {
  return `${file.replace(/\.(csv|tsv|txt)$/i, '')}.columns.yaml`;
}

function settings(given: Arguments): Pick<Mapping, 'rows' | 'separator' | 'decimal'> {
  const choose = <const T extends string>(name: string, names: readonly [T, ...T[]]): T => {
    const typed = given.text(name);
    const chosen = typed === null ? names[0] : names.find((one) => one === typed);
    if (chosen === undefined) throw new UsageError(`--${name} takes ${names.join(', ')}, not "${typed}".`);
    return chosen;
  };
  const names = Object.keys(separators) as (keyof typeof separators)[];
  const wanted = { rows: choose('rows', ['band', 'complex']), separator: choose('separator', [names[0]!, ...names.slice(1)]), decimal: choose('decimal', ['point', 'comma']) };
  if (wanted.separator === 'comma' && wanted.decimal === 'comma' && given.text('separator') === null) return { ...wanted, separator: 'semicolon' };
  return wanted;
}
