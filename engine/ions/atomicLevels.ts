import { fitTerms } from './fitTerms.ts';
import { termSource, termTables } from './terms.ts';
import type { TermFit } from './fitTerms.ts';
import type { TermTable } from './terms.ts';
import type { FreeIon } from './types.ts';

/**
 * B of the two terms of highest multiplicity: 15 B = E(P) - E(F), in cm-1.
 * d2, d3, d7 and d8 have such a pair (3F, 3P or 4F, 4P); null for any other ion and where a term is missing.
 * Source: G. Racah, Phys. Rev. 62, 438 (1942).
 */
export function racahBOfTwoTerms({ electrons, terms }: Pick<TermTable, 'electrons' | 'terms'>): number | null {
  const multiplicity = { 2: '3', 3: '4', 7: '4', 8: '3' }[electrons];
  const lower = terms.find(({ term }) => term === `${multiplicity}F`);
  const upper = terms.find(({ term }) => term === `${multiplicity}P`);
  return lower === undefined || upper === undefined ? null : (upper.energy - lower.energy) / 15;
}

/**
 * B0 and C0 of one spectrum, in cm-1: B0 from the two terms of highest multiplicity where they exist, else by unweighted least squares
 * over all terms with a common offset; C0 always by those least squares. Both are given to 0.1, as the levels are,
 * so that a reader who divides by the printed B0 gets the printed beta.
 */
export function freeIonOfTerms(table: TermTable): FreeIon {
  const fit = fitTerms(table.electrons, table.terms);
  const twoTerms = racahBOfTwoTerms(table);
  return {
    set: 'atomic-levels',
    ion: table.ion,
    racahB0: toTenth(twoTerms ?? fit.racahB),
    racahC0: toTenth(fit.racahC),
    kind: twoTerms === null ? 'least squares over all terms' : 'two highest-multiplicity terms',
    source: `${termSource}; spectrum ${table.spectrum}, ${table.terms.length} terms; C0 ${describeFit(table, fit)}`,
  };
}

function describeFit({ terms }: TermTable, { racahB, racahC, rms }: TermFit): string {
  if (terms.length === 3) return 'from three terms, with nothing spare to judge it by';
  return `by least squares over all of them (B ${Math.round(racahB)}, C ${Math.round(racahC)}, root-mean-square misfit ${Math.round(rms)} cm-1)`;
}

let computed: readonly FreeIon[] | null = null;

/** The set `atomic-levels`, computed from the term tables on first use: one row for each spectrum. */
export function atomicLevelsSet(): readonly FreeIon[] {
  computed ??= termTables.map(freeIonOfTerms);
  return computed;
}

const toTenth = (value: number): number => Math.round(value * 10) / 10;
