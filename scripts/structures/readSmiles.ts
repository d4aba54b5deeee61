// SMILES as typed, read into a molecule.

import { Molecule } from 'openchemlib';

export type SmilesRead =
  | { readonly ok: true; readonly molecule: Molecule }
  | { readonly ok: false; readonly reason: string };

/** More atoms than this are no ligand that one could draw small. */
const MOST_ATOMS = 120;

/** Reads a SMILES; hydrogen atoms become counts of their neighbours, but for a molecule of hydrogen alone. The reason is a half sentence. */
export function readSmiles(smiles: string): SmilesRead {
  if (smiles.trim() === '') return { ok: false, reason: 'no atom' };
  // The reader lets an open branch pass.
  if ((smiles.match(/\(/g) ?? []).length !== (smiles.match(/\)/g) ?? []).length) return { ok: false, reason: 'a branch that is not closed, or closed twice' };
  try {
    const molecule = Molecule.fromSmiles(smiles.trim());
    molecule.removeExplicitHydrogens();
    if (molecule.getAllAtoms() === 0) return { ok: false, reason: 'no atom' };
    if (molecule.getAllAtoms() > MOST_ATOMS) return { ok: false, reason: `more than ${MOST_ATOMS} atoms` };
    return { ok: true, molecule };
  } catch (error) {
    const said = String(error).split('\n')[0]!.replace(/^.*SmilesParser:\s*/, '').replace(/[.;]?\s*position:\s*(\d+).*$/i, (_, place: string) => ` at character ${Number(place) + 1}`).trim();
    return { ok: false, reason: said === '' ? 'not readable' : said };
  }
}
