import { symmetricU } from '../measurement/observation.ts';
import type { Observation } from '../measurement/observation.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { Fit } from './fitTypes.ts';
import type { GroundCase } from './transitions.ts';

/** Where a fit puts a transition that takes no part in it. */
export interface Prediction {
  readonly energy: number;
  /** Variance from the fit's total covariance, cm-2. */
  readonly variance: number;
}

/** Position of one transition at the chosen solution of a fit. */
export function predictionOf(ion: GroundCase, fit: Fit, label: string): Prediction {
  const { at, ground } = fit.solutions[0]!;
  const { energy, gradient } = transitionsAt(ion, ground, [label], at)[0]!;
  return { energy, variance: quadratic([gradient.delta, gradient.racahB, gradient.racahC], fit.total) };
}

/** What a band that is only compared with a fit adds to its misfit: the square of how many u it lies from where the fit puts it. */
export function misfitOfOne(observation: Observation, floor: number, { energy, variance }: Prediction): number {
  return (observation.position - energy) ** 2 / (symmetricU(observation) ** 2 + floor ** 2 + variance);
}
