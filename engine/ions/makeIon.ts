import { ionName } from './oxidation.ts';
import type { Metal } from './metals.ts';
import type { Ion } from './types.ts';

/**
 * The ion of a metal in an oxidation state, with its d count: electrons = group - oxidation.
 * Returns the reason in words where the metal has no such d^n ion: an oxidation state above the group number,
 * or more than ten d electrons.
 */
export function makeIon(metal: Metal, oxidation: number): Ion | { readonly reason: string } {
  const name = ionName(metal.symbol, oxidation);
  const electrons = metal.group - oxidation;
  if (electrons < 0) {
    return { reason: `${name} has no d count: ${metal.name} stands in group ${metal.group}, so its oxidation state goes up to ${metal.group}` };
  }
  if (electrons > 10) {
    return { reason: `${name} would have ${electrons} d electrons (group ${metal.group} less ${oxidation}); a d shell holds at most 10` };
  }
  return { name, metal: metal.symbol, oxidation, electrons, row: metal.row };
}
