import type { FreeIon } from '../ions/types.ts';
import type { FieldParameters } from '../levels/levels.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Observation } from '../measurement/observation.ts';
import type { Policy } from '../policy/types.ts';
import { betaPenalty } from './betaPenalty.ts';
import type { Row } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { TransitionAt } from './evaluate.ts';
import type { Assigned, Solution } from './fitTypes.ts';
import type { Target } from './misfit.ts';
import type { GroundCase } from './transitions.ts';
import type { RatioUsed } from './types.ts';

/** What a fit aims at: an observation with the weights of its uncertainty and the floor. */
export function targetOf(observation: Observation, floor: number): Target {
  return {
    observed: observation.position,
    weightBelow: 1 / (observation.uMinus ** 2 + floor ** 2),
    weightAbove: 1 / (observation.uPlus ** 2 + floor ** 2),
  };
}

/** Everything a fit needs, gathered once. */
export interface FitTask {
  readonly ion: GroundCase;
  readonly ground: string;
  readonly assigned: readonly Assigned[];
  readonly floors: readonly number[];
  readonly policy: Policy;
  readonly ratio: RatioUsed;
  readonly freeIon: FreeIon | null;
}

export function targetsOf(task: FitTask, members: readonly number[]): Target[] {
  return members.map((k) => targetOf(task.assigned[k]!.observation, task.floors[k]!));
}

export function labelsOf(task: FitTask, members: readonly number[]): string[] {
  return members.map((k) => task.assigned[k]!.label);
}

export function rowsOf(task: FitTask, members: readonly number[], slopes: (k: number) => readonly number[]): Row[] {
  return members.map((k) => ({ slopes: slopes(k), u: symmetricU(task.assigned[k]!.observation), floor: task.floors[k]! }));
}

export function calculatedAll(task: FitTask, ground: string, at: FieldParameters): TransitionAt[] {
  return transitionsAt(task.ion, ground, task.assigned.map((one) => one.label), at);
}

export function usedFlags(task: FitTask, members: readonly number[]): boolean[] {
  return task.assigned.map((_, k) => members.includes(k));
}

export function leverageOf(task: FitTask, members: readonly number[], leverage: readonly number[]): (number | null)[] {
  return task.assigned.map((_, k) => (members.includes(k) ? leverage[members.indexOf(k)]! : null));
}

/** Solutions in order of chi2 and plausibility of beta. */
export function ranked(solutions: readonly Solution[], freeIon: FreeIon | null): Solution[] {
  const score = (solution: Solution): number => solution.chi2 + betaPenalty(solution.at.racahB, freeIon);
  return [...solutions].sort((a, b) => score(a) - score(b));
}
