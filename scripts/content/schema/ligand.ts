// The record of a ligand: content/ligands/ID.yaml. One record for each way of binding.

import { z } from 'zod';
import { charge, count, leaf, text } from './leaves.ts';

/** Element symbols, "N, N" or "N N". */
const donorText = () =>
  leaf<string[]>((typed) => {
    const donors = typed.split(/[\s,]+/).filter((symbol) => symbol !== '');
    if (donors.length > 0 && donors.length <= 12 && donors.every((symbol) => /^[A-Z][a-z]?$/.test(symbol))) return { value: donors };
    return { code: 'LIGAND_DONORS', found: typed, expected: 'the element symbols of the donor atoms, e.g. N or N, N', mend: 'write one symbol for each donor atom' };
  });

export const ligandSchema = z.strictObject({
  name: text().meta({ description: 'name in the complex', examples: ['ammine'] }),
  formula: text().meta({ description: 'formula, without or with its charge', examples: ['NH3'] }),
  abbreviation: text().optional().meta({ description: 'abbreviation that may stand for it in formulas', examples: ['en'] }),
  synonyms: z.array(text()).max(50).optional().meta({ description: 'other names; search finds them', examples: ['[ammonia]'] }),
  charge: charge().meta({ description: 'charge of one free ligand', examples: ['0', '-2'] }),
  denticity: count(1, 12).meta({ description: 'donor atoms that one ligand binds', examples: ['1'] }),
  donors: z.union([donorText(), z.array(donorText()).min(1).max(12)]).meta({ description: 'donor atoms, as many as the denticity', examples: ['N', '[N, N]'] }),
  smiles: text().optional().meta({ description: 'SMILES of the free ligand, in double quotes', examples: ['"N"'] }),
  notes: text().optional().meta({ description: 'anything else', examples: ['"bound by N"'] }),
});
