// The record of a complex: content/complexes/ID.yaml. This schema is the only source of its fields.

import { z } from 'zod';
import { parseIon } from '#engine';
import type { Ion } from '#engine';
import { choice, count, energy, flag, leaf, number, quantity, ranges, text, withUnit } from './leaves.ts';
import { bandPosition, temperature } from './physical.ts';
import { overrideSchema } from './policy.ts';
import { date, id, reference, sha256 } from './references.ts';
import { geometryNames, spinNames } from '../vocabulary.ts';

export const ion = () =>
  leaf<Ion>((typed) => {
    const parsed = parseIon(typed.trim());
    if (parsed.ion !== null) return { value: parsed.ion };
    const near = parsed.near.length > 0 ? `write ${parsed.near.join(' or ')}` : 'write the element symbol and the oxidation state, as in Cr(III)';
    const impossible = /has no d count|would have/.test(parsed.reason);
    return { code: impossible ? 'ION_D_COUNT' : 'ION_UNKNOWN', found: typed, expected: parsed.reason, mend: near };
  });

const ligandCount = z.union([
  count(1, 12),
  z.strictObject({
    count: count(1, 12).meta({ description: 'how many of this ligand', examples: ['2'] }),
    bound: count(1, 12).optional().meta({ description: 'donor atoms that each of them binds, where fewer than its denticity', examples: ['1'] }),
  }),
]);

const source = z.strictObject({
  notebook: text().optional().meta({ description: 'notebook and page', examples: ['"17, p. 42"'] }),
  by: text().optional().meta({ description: 'initials of who measured, as in group.yaml', examples: ['TL'] }),
  date: date().optional().meta({ description: 'day of the measurement', examples: ['2024-03-11'] }),
  cite: reference().optional().meta({ description: 'id of a record in sources/', examples: ['author-1999'] }),
  where: text().optional().meta({ description: 'page, table or figure in that source', examples: ['Table 2'] }),
});

const observedBand = z.strictObject({
  position: bandPosition().meta({ description: 'where the band lies, 1000 to 100 000 cm-1; cm-1, kK, nm, µm or eV', examples: ['21550(60) cm-1', '351.0(8) nm'] }),
  kind: choice(['maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope']).optional().meta({ description: 'how the position was read; a maximum where nothing is typed', examples: ['maximum'] }),
  side: choice(['higher', 'lower']).optional().meta({ description: 'of a shoulder: where the stronger band lies', examples: ['higher'] }),
  width: quantity('energy').optional().meta({ description: 'full width at half height', examples: ['3100 cm-1'] }),
  epsilon: quantity('absorption-coefficient').optional().meta({ description: 'molar absorption coefficient, L mol-1 cm-1', examples: ['36'], bare: 'number' }),
  strength: choice(['strong', 'medium', 'weak']).optional().meta({ description: 'where no coefficient is known', examples: ['weak'] }),
  degeneracy: count(1, 6).optional().meta({ description: 'of a component: how many states it holds', examples: ['2'] }),
  deconvoluted: flag().optional().meta({ description: 'true where the position comes from a fitted line shape', examples: ['true'] }),
  term: z.union([text(), z.array(text()).min(1).max(20)]).optional().meta({ description: 'upper level of the transition, a list of candidates, or CT, ligand, vibration, impurity; absent: the engine proposes', examples: ['4T2g', '[4T1g(F), CT]'] }),
  'left-out': text().optional().meta({ description: 'the reason why the band is kept and drawn but not fitted', examples: ['"foot of the charge-transfer band"'] }),
  notes: text().optional().meta({ description: 'anything else', examples: ['"slightly asymmetric"'] }),
});

const absentRange = z.strictObject({
  absent: ranges().meta({ description: 'in an item of its own, without position: a range where the group looked and saw no band', examples: ['28600 - 33300 cm-1'] }),
  notes: text().optional().meta({ description: 'anything else', examples: ['"10 cm cell"'] }),
});

const quoted = z.strictObject({
  Delta: energy().optional().meta({ description: 'printed field splitting', examples: ['21600 cm-1'] }),
  Dq: energy().optional().meta({ description: 'printed Dq, a tenth of it', examples: ['2160 cm-1'] }),
  B: energy().optional().meta({ description: 'printed Racah B', examples: ['650 cm-1'] }),
  C: energy().optional().meta({ description: 'printed Racah C', examples: ['3200 cm-1'] }),
  beta: number().optional().meta({ description: 'printed nephelauxetic ratio', examples: ['0.71'] }),
  cite: reference().meta({ description: 'id of a record in sources/', examples: ['author-1999'] }),
  where: text().optional().meta({ description: 'page, table or figure in that source', examples: ['p. 12'] }),
});

const measurement = z.strictObject({
  id: id().meta({ description: 'id within the record; the full id is complex/measurement', examples: ['aq-295'] }),
  sample: text().optional().meta({ description: 'what was weighed; contains the complex', examples: ['"[Cr(NH3)6](NO3)3"'] }),
  phase: choice(['solution', 'solid', 'crystal', 'glass', 'film']).meta({ description: 'phase of the sample', examples: ['solution'] }),
  medium: text().optional().meta({ description: 'solvent, or what the sample was diluted in', examples: ['water'] }),
  host: text().optional().meta({ description: 'host lattice of a doped crystal', examples: ['Al2O3'] }),
  temperature: temperature().optional().meta({ description: 'K or °C; room is taken as 295(5) K and marked as assumed', examples: ['295 K', 'room'] }),
  technique: choice(['absorption', 'diffuse reflectance', 'excitation', 'emission', 'MCD']).optional().meta({ description: 'how the spectrum was taken', examples: ['absorption'] }),
  scanned: z.union([ranges(), z.array(ranges()).min(1).max(20)]).optional().meta({ description: 'what was looked at; ranges separated by semicolons', examples: ['300 - 1100 nm'] }),
  concentration: withUnit('0.010 mol/L').optional().meta({ description: 'concentration of the solution' }),
  'path-length': withUnit('1.0 cm').optional().meta({ description: 'path length of the cell' }),
  batch: text().optional().meta({ description: 'batch of the sample', examples: ['B7'] }),
  raw: z.strictObject({
    file: text().meta({ description: 'name of the raw file', examples: ['240311-cr-am6.csv'] }),
    sha256: sha256().optional().meta({ description: 'its SHA-256 sum', examples: ['e3b0c442...'] }),
  }).optional().meta({ description: 'the raw file behind the readings', examples: ['{ file: 240311-cr-am6.csv }'] }),
  'magnetic-moment': withUnit('3.85 BM').optional().meta({ description: 'effective magnetic moment' }),
  'epr-g': text().optional().meta({ description: 'g values of electron paramagnetic resonance', examples: ['1.98'] }),
  source: source.meta({ description: 'notebook or cite; where the readings come from', examples: ['{ notebook: "17, p. 42", by: TL }'] }),
  bands: z.array(z.union([observedBand, absentRange])).min(1).max(200).meta({ description: 'bands, and ranges without a band', examples: ['[{ position: 21550(60) cm-1, term: 4T2g }]'] }),
  quoted: z.array(quoted).min(1).max(50).optional().meta({ description: 'parameters printed before; audited, never fitted', examples: ['[{ Delta: 21600 cm-1, cite: author-1999 }]'] }),
  policy: overrideSchema.optional().meta({ description: 'one policy value that holds for this measurement only, with the reason', examples: ['{ C/B: 4.0(3), because: "fitted in the parent compound" }'] }),
  notes: text().optional().meta({ description: 'anything else', examples: ['"second crop"'] }),
});

export const complexSchema = z.strictObject({
  formula: text().meta({ description: 'the complex with its charge, in double quotes; equals ion and ligands', examples: ['"[Cr(NH3)6]3+"'] }),
  name: text().optional().meta({ description: 'a name, where one is wanted', examples: ['hexaamminechromium(III)'] }),
  ion: ion().meta({ description: 'metal and oxidation state', examples: ['Cr(III)'] }),
  geometry: choice(geometryNames).meta({ description: 'geometry around the metal; octahedral and tetrahedral are fitted, the others stored and drawn', examples: ['octahedral'] }),
  isomer: choice(['none', 'cis', 'trans', 'fac', 'mer']).optional().meta({ description: 'part of the identity; none where nothing is typed', examples: ['none'] }),
  ligands: z.record(text(), ligandCount).meta({ description: 'ids of records in ligands/ and how many of each', examples: ['{ ammine: 6 }', '{ oxalato: { count: 2, bound: 1 } }'] }),
  spin: choice(spinNames).optional().meta({ description: 'needed for octahedral d4 to d7, else derived', examples: ['quartet'] }),
  nuclearity: count(1, 12).optional().meta({ description: 'number of metal centres; 1 where nothing is typed', examples: ['1'] }),
  innocence: choice(['doubtful']).optional().meta({ description: 'the word doubtful, where a ligand may share its electrons; beta is then withheld', examples: ['doubtful'] }),
  'charge-note': text().optional().meta({ description: 'a remark on how the charge was assigned', examples: ['"from the EPR spectrum"'] }),
  hazards: z.record(text(), text().meta({ description: 'the reason why it does not apply', examples: ['"never in contact with perchlorate"'] })).optional().meta({ description: 'hazard cautions that do not apply, each with the reason', examples: ['{ PERCHLORATE: "never in contact with perchlorate" }'] }),
  notes: text().optional().meta({ description: 'anything else', examples: ['"made by the old route"'] }),
  measurements: z.array(measurement).max(200).optional().meta({ description: 'spectra of this complex', examples: ['[{ id: aq-295, ... }]'] }),
});
