import { geometryNames, spinNames } from '../../scripts/content/vocabulary.ts';
import type { CollectionTree } from './tree.ts';

/** What the compare page's forms offer. */
export interface ComparePage {
  readonly geometries: readonly string[];
  readonly spins: readonly string[];
  readonly ions: readonly string[];
  readonly ligands: readonly { readonly id: string; readonly text: string }[];
  /** The policy's floor on differences, for the picked measurements. */
  readonly floor: string;
  readonly policy: string;
  readonly empty: boolean;
}

export function comparePage(tree: CollectionTree): ComparePage {
  return {
    geometries: geometryNames, spins: spinNames, ions: tree.ions.map(({ name }) => name),
    ligands: tree.ligands.map(({ id, name, formula, abbreviation }) => ({ id, text: [name, abbreviation ?? formula].join(', ') })),
    floor: JSON.stringify({ delta: tree.policy.differential_Delta, racahB: tree.policy.differential_B }), policy: tree.policy.id, empty: tree.complexes.length === 0,
  };
}
