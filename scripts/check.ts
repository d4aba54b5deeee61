// npm run check: reads the content and reports every fault.

import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { placeholderStart } from './begin/settings.ts';
import { writeManual } from './content/manual/write.ts';
import type { Collection } from './content/types.ts';
import { exitCodes } from './exitCodes.ts';
import { places } from './places.ts';
import { readContent } from './release/readContent.ts';
import { faultReport, folderName } from './report/faults.ts';
import { runCommand } from './runCommand.ts';

const table: CommandTable = {
  name: 'check',
  summary: 'Reads a group\'s records and reports every fault with its place and how to mend it. Fits nothing and writes nothing.',
  options: [
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'json', help: 'print the faults as JSON, and nothing else' },
    { name: 'write-manual', help: 'renew content/record.schema.json and the tables of content/README.md' },
  ],
  examples: ['', '--content ../our-records'],
};

await runCommand(table.name, () => {
  const given = readArguments(table);
  const directory = given.path('content', places.content);
  if (given.has('write-manual')) {
    process.stdout.write(`Renewed ${writeManual(directory).join(' and ')}.\n`);
    return exitCodes.good;
  }
  const { collection, faults, filesRead } = readContent(directory);
  const folder = folderName(directory);
  if (given.has('json')) process.stdout.write(`${JSON.stringify({ ok: collection !== null, content: folder, filesRead, faults }, null, 2)}\n`);
  else process.stdout.write(collection === null ? faultReport(faults, folder) : summary(collection, filesRead, folder));
  return collection === null ? exitCodes.faults : exitCodes.good;
});

function summary(collection: Collection, filesRead: number, folder: string): string {
  const measurements = collection.complexes.reduce((sum, complex) => sum + complex.measurements.length, 0);
  const line = `No faults in ${count(filesRead, 'file')}: ${count(collection.complexes.length, 'complex', 'complexes')}, ${count(measurements, 'measurement')}, ${count(collection.ligands.length, 'ligand')}, ${count(collection.sources.length, 'source')}.\n`;
  const next = collection.complexes.length === 0 ? `There is no complex yet: type the first record into ${folder}/complexes/, as content/README.md shows.\n` : '';
  const undrawn = collection.ligands.filter(({ smiles }) => smiles === null).map(({ id }) => id);
  const remark = undrawn.length === 0 ? '' : `Remark: no smiles: in ${undrawn.slice(0, 8).join(', ')}${undrawn.length > 8 ? ` and ${undrawn.length - 8} more` : ''}; the pages show no structure there.\n`;
  const start = collection.group.started === placeholderStart ? `Remark: started: in group.yaml is ${placeholderStart}, which stands for a day not typed yet; a release asks for it.\n` : '';
  return `${line}${remark}${start}${next}`;
}

function count(number: number, one: string, more = `${one}s`): string {
  return `${number} ${number === 1 ? one : more}`;
}
