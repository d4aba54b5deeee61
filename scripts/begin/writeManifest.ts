// Renews demonstration.json, the list by which "begin" knows the demonstration's files; run it after the demonstration was edited:
// node scripts/begin/writeManifest.ts

import { writeFileSync } from 'node:fs';
import { places } from '../places.ts';
import { fingerprintsOf, manifestFile } from './demonstration.ts';

const found = fingerprintsOf(places.content);
writeFileSync(manifestFile, `${JSON.stringify(found, null, 1)}\n`);
console.log(`${Object.keys(found).length} files listed`);
