import { type Band, type BandRole, type Geometry, type Ion, degeneratePair, readLabel, shownLabel } from '#engine';

export interface TermContext {
  readonly ion: Ion;
  readonly geometry: Geometry;
  readonly multiplicity: number | null;
  /** C0/B0 of the free ion; null where the published set has none. */
  readonly ratio: number | null;
}

/** Words that say what a band is in place of a level. */
export const ROLES: readonly string[] = ['CT', 'ligand', 'vibration', 'impurity'] satisfies readonly BandRole[];

/** C/B by which parents are told apart where the free-ion set has no C0 for an ion: the middle of fitted values, as the record's checks take it. */
const usualRatio = 4.5;

/**
 * Checks the terms that bands claim, as the checks of a record do: each is a level of the ion, no dip is spin-allowed, and only
 * components share a level. Says each fault by its field.
 * @param places place of each band in the form
 */
export function readTerms(bands: readonly Band[], places: readonly number[], context: TermContext, say: (field: string, text: string) => null): void {
  const { ion: { electrons, name }, geometry, multiplicity } = context;
  const claims = new Map<string, number[]>();
  bands.forEach((band, index) => {
    const field = `bands.${places[index]}.term`;
    if (band.terms.length > 0 && (electrons < 1 || electrons > 9)) return say(field, `${name} is d${electrons} and has no d-d transition: write CT, ligand, vibration or impurity`);
    for (const term of band.terms) {
      if (ROLES.includes(term)) continue;
      const read = readLabel(term, { electrons, geometry, multiplicity, ratio: context.ratio ?? usualRatio });
      if (!read.ok) {
        say(field, `expected ${read.expected}; ${read.mend}`);
        continue;
      }
      const ground = multiplicity ?? Math.min(electrons, 10 - electrons) + 1;
      if (band.kind === 'dip' && read.labels.some((label) => Number(/[1-6]/.exec(label)?.[0]) === ground)) say(field, 'a dip is a narrow spin-forbidden line on a broad band: write a level of another multiplicity than the ground level');
      else if (band.terms.length === 1 && read.labels.length === 1 && band.leftOut === null) claims.set(read.labels[0]!, [...claims.get(read.labels[0]!) ?? [], index]);
    }
    return null;
  });
  const pair = degeneratePair(electrons, geometry)?.label ?? null;
  for (const [label, claimants] of claims) {
    const components = claimants.every((index) => bands[index]!.kind === 'component');
    const most = label === pair ? 2 : components ? 3 : 1;
    if (claimants.length <= most) {
      if (components) readComponents(label, claimants.map((index) => ({ field: `bands.${places[index]}.degeneracy`, states: bands[index]!.degeneracy })), context, say);
    } else say(`bands.${places[claimants.at(-1)!]}.term`, `${shownLabel(label, electrons)} is claimed by ${claimants.length} bands: only components share a term`);
  }
}

/** Orbital states of a level in letter form; the d5 pair holds 3. */
function orbitalStates(label: string, { ion, geometry }: TermContext): number {
  if (label === degeneratePair(ion.electrons, geometry)?.label) return 3;
  return label.includes('T') ? 3 : label.includes('E') ? 2 : 1;
}

/** Components together hold all states of their level, or none says how many it holds: then their order is not decided and they stay out of the fit. */
function readComponents(label: string, components: readonly { readonly field: string; readonly states: number | null }[], context: TermContext, say: (field: string, text: string) => null): void {
  const typed = components.filter(({ states }) => states !== null);
  if (typed.length === 0) return;
  const orbital = orbitalStates(label, context);
  const missing = components.find(({ states }) => states === null);
  const sum = typed.reduce((total, { states }) => total + states!, 0);
  if (missing !== undefined) say(missing.field, `each component of ${shownLabel(label, context.ion.electrons)} needs its number of states, ${orbital} in all, or none has one`);
  else if (sum !== orbital && sum !== orbital * Number(/[1-6]/.exec(label)?.[0])) say(typed.at(-1)!.field, `the components hold ${sum} states; the level holds ${orbital}: without all of them there is no barycentre`);
}
