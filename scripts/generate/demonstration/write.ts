// Writes the ligand records and the draft complex records of the demonstration into a folder:
// node scripts/generate/demonstration/write.ts FOLDER. It never runs in a build; the records in content/ were edited by hand afterwards.

import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { ligandEntries } from '../ligands.ts';
import { ligandText } from '../records.ts';
import { demonstrationSeed, draftDemonstration } from './draft.ts';

const folder = process.argv[2];
if (folder === undefined) {
  console.error('usage: node scripts/generate/demonstration/write.ts FOLDER');
  process.exitCode = 2;
} else {
  const files = [...ligandEntries.map((one) => ({ path: `ligands/${one.id}.yaml`, text: ligandText(one) })), ...draftDemonstration(demonstrationSeed)];
  for (const file of files) {
    const target = join(resolve(process.env.INIT_CWD ?? '.', folder), file.path);
    mkdirSync(dirname(target), { recursive: true });
    writeFileSync(target, file.text);
  }
  console.log(`${files.length} files written`);
}
