// npm run compare: where new complexes stand against the collection, without adding them.

import { fromUser, readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { readStoredCollection } from './compare/collection.ts';
import { compareFacts } from './compare/facts.ts';
import { groundLines, recordLines } from './compare/lines.ts';
import { readNewRecord, referable } from './compare/newRecord.ts';
import { placeRecord } from './compare/place.ts';
import type { ComplexRecord, Fault } from './content/types.ts';
import { exitCodes } from './exitCodes.ts';
import { places } from './places.ts';
import { faultReport } from './report/faults.ts';
import { runCommand } from './runCommand.ts';

const table: CommandTable = {
  name: 'compare',
  summary: 'Reads records of complexes that are not in the collection and says where they stand against it. Nothing in the collection changes.',
  values: [{ name: 'FILE', help: 'a record as content/complexes/ holds them', many: true }],
  options: [
    { name: 'database', value: 'FILE', help: 'the collection, as "npm run refit" wrote it (.cache/collection.sqlite)' },
    { name: 'content', value: 'DIR', help: 'folder with the ligands and sources that a record may name (content)' },
    { name: 'json', help: 'print everything as JSON' },
  ],
  examples: ['my-new-complex.yaml', 'a.yaml b.yaml --json'],
};

await runCommand(table.name, () => {
  const given = readArguments(table);
  const collection = readStoredCollection(given.path('database', places.database));
  const known = referable(given.path('content', places.content), collection);
  const records: ComplexRecord[] = [];
  const faults: Fault[] = [];
  for (const file of given.values) {
    const read = readNewRecord(fromUser(file), file, known, collection.policy);
    if (read.ok) records.push(read.record);
    else faults.push(...read.faults);
  }
  if (faults.length > 0) return stopped(faults, given.has('json'));
  const placed = records.map((record) => placeRecord(record, collection));
  process.stdout.write(given.has('json')
    ? `${JSON.stringify(compareFacts(placed, collection))}\n`
    : `${[groundLines(collection), ...placed.map(recordLines)].map((lines) => lines.join('\n')).join('\n\n')}\n`);
  return exitCodes.good;
});

function stopped(faults: readonly Fault[], json: boolean): number {
  if (json) process.stdout.write(`${JSON.stringify({ ok: false, faults })}\n`);
  else process.stderr.write(`${faultReport(faults, '')}No record was placed.\n`);
  return exitCodes.faults;
}
