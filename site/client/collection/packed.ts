import type { SearchedLigand } from '#engine';
import { composedFormula } from '../page/composedFormula.ts';
import { ofDigits, ofSignedDigits } from './digits.ts';

/**
 * What search, filters and sorting read of a collection, file data/search.json: columns in place of objects, in the order of the book,
 * so that ten thousand rows stay small. What a row shows comes from data/rows/.
 */
export interface PackedSearch {
  readonly counts: string;
  readonly ligands: readonly (Omit<SearchedLigand, 'count'> & { readonly charge: number })[];
  /** `racahB0`: of the policy's free-ion set, for beta; null where it has none. */
  readonly ions: readonly { readonly name: string; readonly metal: string; readonly oxidation: number; readonly electrons: number; readonly racahB0: number | null }[];
  /** Every word that a column names. */
  readonly words: readonly string[];
  /** Ligand and how many of it, alternately. */
  readonly sets: readonly (readonly number[])[];
  /** What often goes together is told once, sorted by ligand set. */
  readonly kinds: {
    readonly set: Column;
    /** A word. */
    readonly isomer: Column;
    /** What follows the first hyphen of the id, with a space between them. */
    readonly tail: string;
    /** Formulas that are not those that ion and ligands make, with * for the metal's symbol, by place of the kind. */
    readonly formula: readonly (readonly [kind: number, formula: string])[];
  };
  /** Ion, geometry and spin (words), and the beginning of the id. */
  readonly states: readonly (readonly [ion: number, geometry: number, spin: number, head: string])[];
  /** Id of the measurement, phase and medium, words. */
  readonly circumstances: readonly (readonly [measurement: number, phase: number, medium: number])[];
  /** Verdict (a word), whether C was fitted, whether beta is known, number of bands, terms observed (a place in `terms`). */
  readonly outcomes: readonly (readonly [verdict: number, cFitted: 0 | 1, beta: 0 | 1, bands: number, terms: number])[];
  /** Terms that the chosen readings take their bands for, as printed, words. */
  readonly terms: readonly (readonly number[])[];
  readonly complexes: {
    readonly state: Column;
    readonly kind: Column;
    /** How many measurements. */
    readonly rows: Column;
    /** Names typed in records, by place of the complex. */
    readonly names: readonly (readonly [complex: number, name: string])[];
  };
  readonly rows: {
    readonly circumstance: Column;
    readonly outcome: Column;
    /** In units of `deltaUnit`, each as the step from the row before, of either sign; 0 in all: withheld. */
    readonly deltaStep: Column;
    /** cm-1; 0: withheld. */
    readonly racahB: Column;
    /** All positions in units of `bandUnit`. */
    readonly bands: Column;
  };
}

/** Whole numbers as `digits` writes them. */
type Column = readonly string[];

/** Steps in which values are told for searching and sorting, cm-1. Rows show the exact ones. */
export const bandUnit = 50;
export const deltaUnit = 10;

/** A complex with the fields by which it is found and filtered. */
export interface FoundComplex {
  readonly id: string;
  readonly ion: PackedSearch['ions'][number];
  readonly formula: string;
  readonly name: string | null;
  readonly set: number;
  readonly geometry: string;
  readonly spin: string;
  readonly isomer: string;
  readonly firstRow: number;
}

/** A measurement with the fields by which it is found, filtered and sorted. Null: withheld. */
export interface FoundRow {
  readonly place: number;
  readonly complex: number;
  readonly measurement: string;
  readonly phase: string;
  readonly medium: string;
  readonly verdict: string;
  readonly cFitted: boolean;
  /** Terms observed, as printed. */
  readonly terms: readonly string[];
  readonly delta: number | null;
  readonly racahB: number | null;
  readonly beta: number | null;
  readonly bands: readonly number[];
}

export interface FoundCollection {
  readonly packed: PackedSearch;
  readonly complexes: readonly FoundComplex[];
  readonly rows: readonly FoundRow[];
}

/** Unpacks the columns. */
export function unpackSearch(packed: PackedSearch): FoundCollection {
  const { words, ions, sets, ligands, states, circumstances, outcomes } = packed;
  const terms = packed.terms.map((set) => set.map((word) => words[word]!));
  const [kindSet, kindIsomer, tails, formulas] = [ofDigits(packed.kinds.set), ofDigits(packed.kinds.isomer), packed.kinds.tail.split(' '), new Map(packed.kinds.formula)];
  const [stateOf, kindOf, rowsOf, names] = [ofDigits(packed.complexes.state), ofDigits(packed.complexes.kind), ofDigits(packed.complexes.rows), new Map(packed.complexes.names)];
  const [circumstance, outcome, deltaStep, racahB, bands] = [ofDigits(packed.rows.circumstance), ofDigits(packed.rows.outcome), ofSignedDigits(packed.rows.deltaStep), ofDigits(packed.rows.racahB), ofDigits(packed.rows.bands)];
  const complexes: FoundComplex[] = [];
  const rows: FoundRow[] = [];
  let delta = 0;
  let band = 0;
  kindOf.forEach((kind, complex) => {
    const set = kindSet[kind]!;
    const [ionPlace, geometry, spin, head] = states[stateOf[complex]!]!;
    const ion = ions[ionPlace]!;
    complexes.push({
      id: head + tails[kind]!, ion, formula: formulas.get(kind)?.replace('*', ion.metal) ?? usualFormula(ion, heldLigands(sets[set]!, ligands)), name: names.get(complex) ?? null, set,
      geometry: words[geometry]!, spin: words[spin]!, isomer: words[kindIsomer[kind]!]!, firstRow: rows.length,
    });
    for (let left = rowsOf[complex]!; left > 0; left -= 1) {
      const place = rows.length;
      const [measurement, phase, medium] = circumstances[circumstance[place]!]!;
      const [verdict, cFitted, beta, count, observed] = outcomes[outcome[place]!]!;
      delta += deltaStep[place]!;
      rows.push({
        place, complex, measurement: words[measurement]!, phase: words[phase]!, medium: words[medium]!, verdict: words[verdict]!, cFitted: cFitted === 1, terms: terms[observed]!,
        delta: delta === 0 ? null : delta * deltaUnit, racahB: racahB[place] || null, beta: beta === 1 && ion.racahB0 !== null ? racahB[place]! / ion.racahB0 : null,
        bands: bands.slice(band, band + count).map((step) => step * bandUnit),
      });
      band += count;
    }
  });
  return { packed, complexes, rows };
}

/** The ligands of a set with their numbers. */
export function heldLigands(set: readonly number[], ligands: PackedSearch['ligands']): readonly SearchedLigandOf[] {
  return Array.from({ length: set.length / 2 }, (_, place) => ({ ...ligands[set[2 * place]!]!, count: set[2 * place + 1]! }));
}

/** A ligand with its charge, which decides the charge of the complex. */
export type SearchedLigandOf = SearchedLigand & { readonly charge: number };

/** The formula that ion and ligands make, which most complexes are typed with. */
export function usualFormula(ion: { readonly metal: string; readonly oxidation: number }, held: readonly SearchedLigandOf[]): string {
  return composedFormula(ion.metal, ion.oxidation, held);
}
