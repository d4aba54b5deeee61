import type { FieldParameters } from '../levels/levels.ts';
import type { Observation } from '../measurement/observation.ts';
import type { Estimate } from '../policy/types.ts';
import type { Covariance } from './covariance.ts';
import type { TransitionAt } from './evaluate.ts';
import type { RatioUsed } from './types.ts';

/** One transition with what was observed of it. */
export interface Assigned {
  readonly label: string;
  readonly observation: Observation;
}

/**
 * What was fitted:
 * `field, B, C` all three; `field, B` with C/B by the policy; `field` alone, from bands that do not feel B;
 * `field, B by a line`: Delta from spin-allowed bands, B from spin-flip lines with C/B assumed;
 * `field, B assumed`: one band that feels B, with beta assumed.
 */
export type FitMode = 'field, B, C' | 'field, B' | 'field' | 'field, B by a line' | 'field, B assumed';

/** One local solution. */
export interface Solution {
  readonly at: FieldParameters;
  readonly chi2: number;
  /** Ground level of the branch, letter form. */
  readonly ground: string;
}

/** A fit that stands. */
export interface Fit {
  readonly mode: FitMode;
  /** The chosen solution is the first. */
  readonly solutions: readonly Solution[];
  /** For each assigned transition, in the order given: whether it took part. */
  readonly used: readonly boolean[];
  /** Calculated transitions at the chosen solution, in the order given. */
  readonly calculated: readonly TransitionAt[];
  readonly floors: readonly number[];
  readonly leverage: readonly (number | null)[];
  readonly spare: number;
  readonly ratio: RatioUsed;
  /** Covariance of (Delta, B, C) from the readings alone. */
  readonly reading: Covariance;
  /** With the model's floors and the uncertainty of what was assumed. */
  readonly total: Covariance;
  /** d(Delta, B, C) / d(C/B) where C/B was assumed, else zeros. */
  readonly byRatio: readonly number[];
  /** beta assumed in mode `field, B assumed`, and for predictions in mode `field`; null elsewhere or without a free ion. */
  readonly assumedBeta: Estimate | null;
}

/** Why no fit stands. */
export interface NoFit {
  readonly status: 'refused' | 'not determinable';
  readonly reason: string;
}

export type FitOutcome = Fit | NoFit;

export const isFit = (outcome: FitOutcome): outcome is Fit => !('status' in outcome);
