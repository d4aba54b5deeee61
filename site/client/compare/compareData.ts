import type { ComparedCollection, ComplexIdentity, FreeIon, Geometry, Ion, Policy, SeriesNumber, SeriesResult, TypedComplex } from '#engine';
import type { StripRow } from '../../charts/strip.ts';
import type { FormulaShown } from '../../data/typeset.ts';

/** A ligand as the form offers it. */
export interface OfferedLigand {
  readonly id: string;
  readonly name: string;
  readonly formula: string;
  readonly abbreviation: string | null;
  readonly charge: number;
  readonly denticity: number;
  readonly donors: readonly string[];
}

/** The collection as placing a complex needs it, packed: words once, lists in place of objects. No number is rounded. */
export interface PackedCollection {
  readonly policy: Policy;
  readonly policyId: string;
  readonly aqua: string | null;
  /** The policy's free-ion set, for every ion that it holds. */
  readonly freeIons: readonly FreeIon[];
  /** C0/B0 by which a typed parent in parentheses is understood, by ion. */
  readonly parentRatios: Readonly<Record<string, number>>;
  readonly ligands: readonly OfferedLigand[];
  readonly sources: readonly string[];
  readonly ions: readonly Ion[];
  readonly words: readonly string[];
  readonly complexes: readonly PackedComplex[];
  readonly results: readonly PackedResult[];
}

/** id, formula, ion, geometry's name (a word), fitted, multiplicity, isomer (a word), [ligand, count, bound]. */
export type PackedComplex = readonly [
  id: string, formula: string, ion: number, geometry: number, fitted: 0 | 1, multiplicity: number | null, isomer: number,
  ligands: readonly (readonly [ligand: number, count: number, bound: number])[],
];

/** Value, u of the readings, total u, standing and reason (words; -1: none). */
export type PackedNumber = readonly [value: number | null, u: number | null, uTotal: number | null, standing: number, reason: number];

export type PackedResult = readonly [
  complex: number, measurement: string, phase: number, temperature: number | null, policy: number, verdict: number,
  Delta: PackedNumber, B: PackedNumber, C: PackedNumber, beta: PackedNumber, correlation: number | null, transitions: readonly number[], cautions: readonly number[],
];

const NUMBERS = ['Delta', 'B', 'C', 'beta'] as const;

/** Packs the results of a collection. */
export function packResults(results: readonly SeriesResult[], ligands: readonly { readonly id: string }[], ions: readonly Ion[]): Pick<PackedCollection, 'words' | 'complexes' | 'results'> {
  const words = new Map<string, number>();
  const word = (text: string): number => {
    const place = words.get(text) ?? words.size;
    words.set(text, place);
    return place;
  };
  const ligandPlace = new Map(ligands.map(({ id }, place) => [id, place]));
  const ionPlace = new Map(ions.map(({ name }, place) => [name, place]));
  const complexPlace = new Map<string, number>();
  const complexes: PackedComplex[] = [];
  const number = ({ value, u, uTotal, standing, reason }: SeriesNumber): PackedNumber => [value, u, uTotal, word(standing), reason === null ? -1 : word(reason)];
  const packed = results.map(({ complex, measurement, phase, temperature, policy, verdict, parameters, correlation, transitions, cautions }): PackedResult => {
    if (!complexPlace.has(complex.id)) {
      complexPlace.set(complex.id, complexes.length);
      complexes.push([
        complex.id, complex.formula, ionPlace.get(complex.ion.name)!, word(complex.geometryName), complex.geometry === null ? 0 : 1, complex.multiplicity, word(complex.isomer),
        complex.ligands.map(({ ligand, count, bound }) => [ligandPlace.get(ligand)!, count, bound] as const),
      ]);
    }
    return [
      complexPlace.get(complex.id)!, measurement, word(phase), temperature, word(policy), word(verdict),
      number(parameters.Delta), number(parameters.B), number(parameters.C), number(parameters.beta), correlation, transitions.map(word), cautions.map(word),
    ];
  });
  return { words: [...words.keys()], complexes, results: packed };
}

/** The collection as the engine compares with it. */
export function unpackCollection(packed: PackedCollection): ComparedCollection {
  const { words, ligands, ions, policy, policyId, aqua } = packed;
  const complexes = packed.complexes.map(([id, formula, ion, geometry, fitted, multiplicity, isomer, held]): ComplexIdentity => ({
    id, formula, ion: ions[ion]!, geometry: fitted === 1 ? words[geometry] as Geometry : null, geometryName: words[geometry]!, multiplicity, isomer: words[isomer]!,
    ligands: held.map(([ligand, count, bound]) => ({ ligand: ligands[ligand]!.id, count, bound })),
  }));
  const number = ([value, u, uTotal, standing, reason]: PackedNumber): SeriesNumber => ({
    value, u, uTotal, standing: words[standing] as SeriesNumber['standing'], reason: reason < 0 ? null : words[reason]!,
  });
  const results = packed.results.map(([complex, measurement, phase, temperature, policyWord, verdict, ...rest]): SeriesResult => {
    const numbers = rest.slice(0, NUMBERS.length) as unknown as readonly PackedNumber[];
    const [correlation, transitions, cautions] = rest.slice(NUMBERS.length) as [number | null, readonly number[], readonly number[]];
    return {
      complex: complexes[complex]!, measurement, phase: words[phase] as SeriesResult['phase'], temperature, policy: words[policyWord]!, verdict: words[verdict] as SeriesResult['verdict'],
      parameters: Object.fromEntries(NUMBERS.map((name, place) => [name, number(numbers[place]!)])) as unknown as SeriesResult['parameters'],
      correlation, transitions: transitions.map((place) => words[place]!), cautions: cautions.map((place) => words[place]!),
    };
  });
  return { policy: { id: policyId, differentialFloor: policy.differentialFloor }, aqua, results };
}

/** One complex of the collection as the compare page needs it: file data/compare/ID.json. */
export interface ComparedComplex {
  readonly formula: FormulaShown;
  /** As a record, as far as the database keeps what was typed; one measurement each. */
  readonly typed: readonly TypedComplex[];
  readonly measurements: readonly ComparedMeasurement[];
}

export interface ComparedMeasurement {
  readonly id: string;
  readonly conditions: string;
  readonly result: SeriesResult;
  readonly strip: StripRow;
  readonly stripTitle: string;
  /** Parameters of the chosen solution for drawing its levels; null where B is withheld. Energies in cm-1. */
  readonly solution: { readonly delta: number; readonly racahB: number; readonly racahC: number } | null;
  /** Ground level in letter form. */
  readonly ground: string | null;
  /** The chosen assignment: label in letter form and observed position. */
  readonly transitions: readonly { readonly label: string; readonly observed: number; readonly used: boolean }[];
  readonly reason: string;
}
