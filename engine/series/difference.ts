import type { Policy } from '../policy/types.ts';
import { complexKey, ionKey } from './identity.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

/** A difference is told from nothing above this many standard uncertainties. */
export const distinguishableAbove = 2;

/**
 * Which uncertainty a difference carries.
 * "readings": two measurements of one complex, where the model's error is the same on both sides.
 * "readings and differential floor": like results, where it is nearly the same.
 * "total": everything else.
 */
export type DifferenceBasis = 'readings' | 'readings and differential floor' | 'total';

export interface Difference {
  /** First less second. */
  readonly value: number;
  /** One standard uncertainty. */
  readonly u: number;
  readonly basis: DifferenceBasis;
  readonly z: number;
  readonly distinguishable: boolean;
}

/**
 * How alike two results are: measurements of one complex; the same ion, geometry and spin read from the same transitions with C
 * standing alike, so that the model's error is common to both; or neither.
 */
export function differenceBasis(a: SeriesResult, b: SeriesResult): DifferenceBasis {
  if (a.policy !== b.policy) return 'total';
  if (complexKey(a.complex) === complexKey(b.complex)) return 'readings';
  const like = ionKey(a.complex) === ionKey(b.complex) && a.parameters.C.standing === b.parameters.C.standing
    && a.transitions.length === b.transitions.length && a.transitions.every((label, i) => label === b.transitions[i]);
  return like ? 'readings and differential floor' : 'total';
}

/**
 * Difference of two results in Delta (cm-1) or beta, first less second, with the uncertainty that belongs to it.
 *
 * @param floor the policy's floor on differences of like results: Delta in cm-1, B as a fraction; beta carries B's fraction
 * @returns null where one of the numbers is withheld
 */
export function difference(a: SeriesResult, b: SeriesResult, parameter: SeriesParameter, floor: Policy['differentialFloor']): Difference | null {
  const [first, second] = [a.parameters[parameter], b.parameters[parameter]];
  if (first.value === null || second.value === null) return null;
  const basis = differenceBasis(a, b);
  const extra = basis !== 'readings and differential floor' ? 0 : parameter === 'Delta' ? floor.delta : floor.racahB * (Math.abs(first.value) + Math.abs(second.value)) / 2;
  const u = basis === 'total' ? Math.hypot(first.uTotal!, second.uTotal!) : Math.hypot(first.u!, second.u!, extra);
  const value = first.value - second.value;
  const z = zOf(value, u);
  return { value, u, basis, z, distinguishable: Math.abs(z) > distinguishableAbove };
}

/** value/u; 0 for no difference at all, even where nothing is uncertain. */
export const zOf = (value: number, u: number): number => (value === 0 ? 0 : value / u);
