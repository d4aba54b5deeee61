import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

/** A small invented collection: one tested, one with components and nm readings, one low spin, one that cannot be fitted. */
const files: Readonly<Record<string, string>> = {
  'group.yaml': `title: Invented bands
group: An invented group
licence: CC0-1.0
url: https://bands.example/group/
release: "1"
started: 2026-01-05
demonstration: true
`,
  'policy.yaml': 'name: house\n',
  'ligands/ammine.yaml': 'name: ammine\nformula: NH3\ncharge: 0\ndenticity: 1\ndonors: [N]\n',
  'ligands/chlorido.yaml': 'name: chlorido\nformula: Cl\ncharge: -1\ndenticity: 1\ndonors: [Cl]\n',
  'complexes/cr-am6.yaml': `formula: "[Cr(NH3)6]3+"
ion: Cr(III)
geometry: octahedral
ligands: { ammine: 6 }
measurements:
  - id: aq-295
    sample: "[Cr(NH3)6](ClO4)3"
    phase: solution
    medium: water
    temperature: 295 K
    technique: absorption
    scanned: 250 - 1100 nm
    source: { notebook: "17, p. 42", by: TL, date: 2024-03-11 }
    bands:
      - { position: 21550(60) cm-1, kind: maximum, epsilon: 36, width: 3100 cm-1, term: 4T2g }
      - { position: 351.0(8) nm, kind: maximum, epsilon: 30, term: 4T1g(F) }
      - { position: 15300(20) cm-1, kind: line, epsilon: 0.5, term: 2Eg }
`,
  'complexes/co3-am6.yaml': `formula: "[Co(NH3)6]3+"
ion: Co(III)
geometry: octahedral
spin: low
ligands: { ammine: 6 }
measurements:
  - id: aq
    phase: solution
    medium: water
    source: { notebook: "3" }
    bands:
      - { position: 21050(60) cm-1, kind: maximum, term: 1T1g }
      - { position: 29500(80) cm-1, kind: maximum, term: 1T2g }
`,
  'complexes/co2-cl4.yaml': `formula: "[CoCl4]2-"
ion: Co(II)
geometry: tetrahedral
ligands: { chlorido: 4 }
measurements:
  - id: solid
    phase: solid
    source: { notebook: "4" }
    bands:
      - { position: 5600(100) cm-1, kind: maximum, term: 4T1(F) }
      - { position: 14700(100) cm-1, kind: maximum, term: 4T1(P) }
  - id: one-band
    phase: solid
    source: { notebook: "5" }
    bands:
      - { position: 14700(100) cm-1, kind: maximum, term: 4T1(P) }
`,
};

/** Writes the sample collection, with files changed, added or (null) left out, into a new folder and returns its path. */
export function sampleContent(changes: Readonly<Record<string, string | null>> = {}): string {
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-content-'));
  writeSample(folder, changes);
  return folder;
}

/** The same into a given folder. */
export function writeSample(folder: string, changes: Readonly<Record<string, string | null>> = {}): void {
  for (const [name, text] of Object.entries({ ...files, ...changes })) {
    if (text === null) continue;
    mkdirSync(dirname(join(folder, name)), { recursive: true });
    writeFileSync(join(folder, name), text);
  }
}

/** The text of one file of the sample. */
export function sampleFile(name: string): string {
  const text = files[name];
  if (text === undefined) throw new Error(`the sample has no file ${name}`);
  return text;
}

/** A folder that is removed when `remove` is called. */
export function temporaryFolder(): { readonly path: string; readonly remove: () => void } {
  const path = mkdtempSync(join(tmpdir(), 'bandstead-'));
  return { path, remove: () => rmSync(path, { recursive: true, force: true }) };
}

