// The first record of a collection that begins: an example to type over. Its readings are invented.

import { recordText } from '#engine';
import type { TypedComplex } from '#engine';

export const exampleId = 'example-cr-am6';

/** A complete record; every number in it is invented. */
const example: TypedComplex = {
  formula: '[Cr(NH3)6]3+',
  name: 'Example to replace: its readings are invented',
  ion: 'Cr(III)',
  geometry: 'octahedral',
  ligands: { ammine: '6' },
  notes: 'This record came with the empty collection. Nothing in it was measured: delete its file once a record of your own stands beside it.',
  measurements: [{
    id: 'aq-295',
    sample: '[Cr(NH3)6](NO3)3',
    phase: 'solution',
    medium: 'water',
    temperature: '295 K',
    technique: 'absorption',
    scanned: '300 - 1100 nm',
    source: { notebook: 'invented example' },
    bands: [
      { position: '15300(20) cm-1', kind: 'line', epsilon: '0.5', term: '2Eg(G)' },
      { position: '21600(60) cm-1', kind: 'maximum', epsilon: '36', width: '3100 cm-1', term: '4T2g' },
      { position: '351.0(8) nm', kind: 'maximum', epsilon: '30', term: '4T1g(F)' },
    ],
  }],
};

const heading = [
  'An example to replace. Its readings are invented.',
  '',
  'To type your first record: copy this file to complexes/ID.yaml, where ID is the permanent id of your complex (small letters,',
  'digits and hyphens, such as cr-en3), type over what stands there, and delete this file. What you do not know is left out.',
  'A ligand that is not in ligands/ needs a record of its own there: copy a like one.',
  'npm run check says what is wrong and how to mend it; npm run dev shows the page as you type; content/README.md lists every field.',
];

/** The text of the example record. */
export function exampleText(): string {
  return recordText(example, { heading, explained: true });
}

/** The ligand that the example needs, for a folder that has not got it. */
export const exampleLigand = {
  path: 'ligands/ammine.yaml',
  text: 'name: ammine\nformula: NH3\nsynonyms: [ammonia]\ncharge: 0\ndenticity: 1\ndonors: [N]\nsmiles: "N"\n',
} as const;
