import type { Geometry } from '../ions/types.ts';
import type { NotCompared } from './comparable.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

export type FactorKind = 'ion' | 'ligand';

/**
 * One factor: g (cm-1) or k of an ion in its geometry and spin state, f or h of a ligand.
 * Where it has no value, or where no spare complex tests it, `reason` says so.
 */
export interface Factor {
  readonly kind: FactorKind;
  /** Ligand id, or "Cr(III) octahedral quartet". */
  readonly name: string;
  readonly value: number | null;
  /** One standard uncertainty; 0 for the ligand that is set to 1; null where there is no value. */
  readonly u: number | null;
  /** Complexes that hold it. */
  readonly complexes: number;
  /** Counted from 1; factors of different islands cannot be compared. */
  readonly island: number;
  /** true: set to 1, so that the others have a meaning. */
  readonly gauge: boolean;
  /** true where at least one complex behind it is not needed to find it. */
  readonly tested: boolean;
  readonly reason: string | null;
}

/** A part of the collection within which ions and ligands are linked by complexes. */
export interface FactorIsland {
  readonly number: number;
  /** Id of the ligand set to 1. */
  readonly gauge: string;
  readonly gaugeIsAqua: boolean;
  readonly ions: readonly string[];
  readonly ligands: readonly string[];
  readonly complexes: number;
  readonly rank: number;
  /** Complexes beyond what the rank needs. */
  readonly spare: number;
  /** What prediction needs: the free unknowns in the scale of the model. */
  readonly solution: FactorSolution;
}

/** Free unknowns of an island: ln g and ln f, or k and h. */
export interface FactorSolution {
  readonly names: readonly { readonly kind: FactorKind; readonly name: string }[];
  readonly values: readonly number[];
  readonly covariance: readonly (readonly number[])[];
  /** Directions that the complexes leave open, each of length 1 after `scale`. */
  readonly open: readonly (readonly number[])[];
  /** Factor that brings each unknown to a common scale. */
  readonly scale: readonly number[];
}

/** What the rest of the collection says of a complex. */
export interface FactorPrediction {
  readonly predicted: number;
  /** One standard uncertainty: the factors' and the residual scatter. */
  readonly u: number;
  /** Degrees of freedom of `u` where it rests on an estimated scatter; null where it does not. */
  readonly degrees: number | null;
}

/** One complex in a factor fit. */
export interface FactorComplex {
  readonly result: SeriesResult;
  readonly island: number;
  /** What the factors of the whole fit give. */
  readonly fitted: number;
  /** Found against fitted in the scale of the model: ln(found/fitted) of Delta, found - fitted of beta. */
  readonly residual: number;
  /** 0: no say in its own fitted value; 1: alone decides it. */
  readonly leverage: number;
  /** From all complexes but this one; null where they do not fix it. */
  readonly leftOut: (FactorPrediction & { /** Studentised: found less predicted over the combined u, as a normal deviate. */ readonly z: number }) | null;
}

/** How far complexes scatter about the rule beyond their uncertainties: of ln Delta, or of beta. */
export interface FactorScatter {
  readonly value: number;
  /** Its share of the complexes' variances, 0 to 1. */
  readonly share: number;
  /** "assumed": fewer spare complexes than an estimate needs. */
  readonly standing: 'fitted' | 'assumed';
  /** Complexes beyond the unknowns, over all islands. */
  readonly spare: number;
}

export interface FactorFit {
  readonly parameter: SeriesParameter;
  readonly geometry: Geometry;
  readonly policy: string;
  readonly scatter: FactorScatter;
  /** Ascending by number; the island with most complexes is 1. */
  readonly islands: readonly FactorIsland[];
  /** Ions first, then ligands, each by name. */
  readonly factors: readonly Factor[];
  /** In the order of full measurement ids. */
  readonly complexes: readonly FactorComplex[];
  readonly leftOut: readonly NotCompared[];
}
