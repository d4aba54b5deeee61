import type { Geometry, Ion } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Parameter } from '../readings/types.ts';
import type { ParameterName, Verdict } from '../words/types.ts';

/** One ligand of a complex: how many of it, and how many donor atoms each of them binds. */
export interface BoundLigand {
  readonly ligand: string;
  readonly count: number;
  readonly bound: number;
}

/** What makes a complex this complex and no other, with the id and formula it is known by. */
export interface ComplexIdentity {
  readonly id: string;
  /** Plain text, "[Cr(NH3)6]3+". */
  readonly formula: string;
  readonly ion: Ion;
  /** null: a geometry that is stored and drawn, not fitted. */
  readonly geometry: Geometry | null;
  readonly geometryName: string;
  readonly multiplicity: number | null;
  readonly isomer: string;
  readonly ligands: readonly BoundLigand[];
}

/** A ligand as far as it must be recognised. */
export interface SeriesLigand {
  readonly id: string;
  readonly name: string;
  readonly formula: string;
  readonly charge: number;
  /** Donor atoms bound, element symbols. */
  readonly donors: readonly string[];
}

/** A derived number as a comparison needs it. */
export type SeriesNumber = Pick<Parameter, 'value' | 'u' | 'uTotal' | 'standing' | 'reason'>;

/** One measurement's chosen reading, as far as a comparison needs it. */
export interface SeriesResult {
  readonly complex: ComplexIdentity;
  readonly measurement: string;
  readonly phase: Measurement['phase'];
  /** K; null: not recorded. */
  readonly temperature: number | null;
  /** Id of the policy under which it was fitted. */
  readonly policy: string;
  readonly verdict: Verdict;
  readonly parameters: Readonly<Record<ParameterName, SeriesNumber>>;
  /** Correlation of Delta with B from the total covariance; null where one of them is withheld. */
  readonly correlation: number | null;
  /** Labels of the transitions in the fit, in alphabetical order. */
  readonly transitions: readonly string[];
  /** Codes of the reading's cautions that decide whether it may be compared; see `comparisonCautions`. */
  readonly cautions: readonly string[];
}

/** The two numbers of which series are made. */
export type SeriesParameter = 'Delta' | 'beta';
export const seriesParameters: readonly SeriesParameter[] = ['Delta', 'beta'];

/** The phase classes that a series keeps apart. */
export type PhaseClass = 'solution' | 'solid';

/** Full id of a measurement, "cr-am6/aq-295". */
export type MeasurementId = string;
