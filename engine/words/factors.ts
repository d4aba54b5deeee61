import { listed } from './numbers.ts';

/** What a factor's place in the fit leaves to say; null: a value that other complexes test. */
export function factorReason(facts: {
  readonly gauge: boolean;
  readonly gaugeIsAqua: boolean;
  readonly complexes: number;
  readonly tested: boolean;
  /** Combinations that are fixed where the factor itself is not; null where it is. */
  readonly combinations: readonly string[] | null;
  /** true: fixed, but with an uncertainty that leaves nothing to say. */
  readonly loose: boolean;
}): string | null {
  if (facts.gauge) return facts.gaugeIsAqua ? 'set to 1: the others are counted from water' : 'set to 1: water is not in this island, and this ligand is in most of its complexes';
  if (facts.combinations !== null) return facts.combinations.length === 0 ? 'not fixed by these complexes' : `not fixed alone: only ${listed(facts.combinations)} ${facts.combinations.length === 1 ? 'is' : 'are'} fixed`;
  if (facts.loose) return 'these complexes hardly fix it: its uncertainty would be as large as itself';
  if (facts.complexes === 1) return 'from one complex: no test';
  return facts.tested ? null : 'no spare complex: no test';
}

/** "g(Cr(III) octahedral quartet) × (3 f(ammine) + 3 f(chlorido))/6": what a complex fixes of its factors. */
export function combinationShown(symbols: readonly [ion: string, ligand: string], ion: string, ligands: readonly { readonly name: string; readonly atoms: number }[]): string {
  const [g, f] = symbols;
  const [only] = ligands;
  if (ligands.length === 1) return `${g}(${ion}) × ${f}(${only!.name})`;
  const atoms = ligands.reduce((sum, one) => sum + one.atoms, 0);
  return `${g}(${ion}) × (${ligands.map((one) => `${one.atoms === 1 ? '' : `${one.atoms} `}${f}(${one.name})`).join(' + ')})/${atoms}`;
}

/** Why factors say nothing of a complex. */
export const noFactorPrediction = {
  ionUnknown: (ion: string): string => `no factor of ${ion}: no other complex of it is in the fit`,
  ligandUnknown: (ligands: readonly string[]): string => `no factor of ${listed(ligands)}: no complex with ${ligands.length === 1 ? 'it' : 'them'} is in the fit`,
  islands: 'its ion and ligands stand in different islands of the collection, whose factors cannot be multiplied',
  open: 'the complexes of the collection do not fix this product of factors',
  loose: 'the complexes of the collection hardly fix this product of factors',
  notPositive: 'the factors put beta at 0 or below, which no complex can have: carried so far, the rule does not hold',
  geometry: (geometry: string): string => `factors are fitted to octahedral and tetrahedral complexes, not to ${geometry} ones`,
} as const;

/** "s = 2.3 % over 14 spare complexes", or that it was assumed. */
export function scatterSentence(parameter: 'Delta' | 'beta', value: number, standing: 'fitted' | 'assumed', spare: number): string {
  const shown = parameter === 'Delta' ? `${(100 * value).toFixed(1)} %` : value.toFixed(3);
  if (standing === 'assumed') return `Residual scatter ${shown}, assumed: ${spare === 0 ? 'no complex is' : spare === 1 ? 'one complex is' : `${spare} complexes are`} spare, too few for an estimate.`;
  return `Residual scatter ${shown}, from ${spare} spare complexes.`;
}

/** Why the rule of average environment says nothing of a complex. */
export const averageEnvironmentReason = {
  oneLigand: 'it has one kind of ligand: there is nothing to average',
  noParent: (ion: string, ligands: readonly string[]): string => `no complex of ${ion} with ${listed(ligands)} alone is measured`,
} as const;
