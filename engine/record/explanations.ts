// What a person is told beside each field of a record to be filled in.

/** By field of the record's top. */
export const complexExplanations: Readonly<Record<string, string>> = {
  formula: 'the complex with its charge; equals ion and ligands',
  ion: 'metal and oxidation state',
  geometry: 'octahedral and tetrahedral are fitted, others stored and drawn',
  isomer: 'none, cis, trans, fac or mer',
  ligands: 'id of a record in ligands/, and how many',
  spin: 'high or low; needed for octahedral d4 to d7',
  measurements: 'one item a spectrum',
};

/** By field of a measurement. */
export const measurementExplanations: Readonly<Record<string, string>> = {
  id: 'its full id is FILE/ID and lasts for ever',
  sample: 'what was weighed; contains the complex',
  phase: 'solution, solid, crystal, glass or film',
  medium: 'solvent, or what the sample was diluted in',
  temperature: 'or: room',
  technique: 'absorption, diffuse reflectance, excitation, emission or MCD',
  scanned: 'what was looked at: an absent band outside it means nothing',
  source: 'or { cite: ID of a record in sources/, where: Table 2 }',
  bands: 'number, standard uncertainty in the last digits, unit; term may be left out',
  quoted: 'printed before; audited, never fitted',
};
