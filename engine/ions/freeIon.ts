import { atomicLevelsSet } from './atomicLevels.ts';
import { publishedSet } from './publishedSet.ts';
import { termSource } from './terms.ts';
import type { FreeIon, FreeIonSetName, Ion } from './types.ts';

/** What a free-ion set is, for pages and exports. A change of any value in a set is a new version. */
export interface FreeIonSet {
  readonly name: FreeIonSetName;
  readonly version: string;
  readonly description: string;
  readonly sources: readonly string[];
}

/** The free-ion sets that a policy may name. */
export const freeIonSets: readonly FreeIonSet[] = [
  {
    name: 'published',
    version: '1',
    description: 'B0 of Jørgensen as printed, with C0/B0 as chosen by Tanabe and Sugano. Mn(IV), Cu(II), every C0/B0 and all 4d and 5d ions are from memory; 4d and 5d are good to about 10 %.',
    sources: [
      'C. K. Jørgensen, as printed in W. L. Jolly, Modern Inorganic Chemistry, table of Racah B',
      'Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 766 (1954): C0/B0, from memory',
    ],
  },
  {
    name: 'atomic-levels',
    version: '1',
    description: 'Computed here from the energies of free-ion terms: 15 B0 = E(P) - E(F) where the two terms of highest multiplicity exist (d2, d3, d7, d8), else B0 by unweighted least squares over all terms with a common offset; C0 by those least squares. 3d ions with a table of terms only.',
    sources: [termSource, 'G. Racah, Phys. Rev. 62, 438 (1942): the term formulas'],
  },
];

/** All rows of one set, in the order of the set's own table. */
export function freeIonsIn(set: FreeIonSetName): readonly FreeIon[] {
  return set === 'published' ? publishedSet : atomicLevelsSet();
}

/** B0 and C0 of an ion in a named set, or null where the set has no row for it: beta under that set is then withheld, never borrowed. */
export function freeIon(set: FreeIonSetName, ion: Pick<Ion, 'name'>): FreeIon | null {
  return freeIonsIn(set).find((row) => row.ion === ion.name) ?? null;
}
