import { symmetricU } from '../measurement/observation.ts';
import { singularValues } from './covariance.ts';
import type { Row } from './covariance.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import type { Identifiability, Parameter } from './types.ts';
import type { ParameterName } from '../words/types.ts';
import { combinationSentence } from '../words/combination.ts';

const rankTolerance = 1e-7;

/** Assumed numbers move together along this direction: which parameters, and by how much against the last. */
interface Direction {
  readonly first: ParameterName;
  readonly second: ParameterName;
  readonly slope: number;
  readonly value: number;
  readonly u: number;
}

/** Rank and the determinable combination of a fit. */
export function identify(assigned: readonly Assigned[], fit: Fit, parameters: readonly Parameter[]): Identifiability {
  const { at } = fit.solutions[0]!;
  const rows: Row[] = assigned.flatMap(({ observation }, k) => {
    if (!fit.used[k]) return [];
    const { delta, racahB, racahC } = fit.calculated[k]!.gradient;
    return [{ slopes: [delta, racahB, racahC], u: symmetricU(observation), floor: fit.floors[k]! }];
  });
  const sizes = [at.delta, at.racahB || 1, at.racahC || 1];
  const values = singularValues(rows, sizes);
  const rank = values.filter((value) => value > rankTolerance * values[0]!).length;
  const direction = fixedCombination(fit, parameters);
  return { singularValues: values, rank, combination: direction && combinationSentence(direction) };
}

/** Delta against C where C was assumed; Delta against B where B was, or where B stays above its ceiling. */
function fixedCombination(fit: Fit, parameters: readonly Parameter[]): Direction | null {
  const { at } = fit.solutions[0]!;
  const withoutRatio = (i: number, j: number): number => fit.total[i]![j]! - fit.byRatio[i]! * fit.byRatio[j]! * fit.ratio.u ** 2;
  const combine = (first: number, second: number, slope: number): { value: number; u: number } => {
    const p = [at.delta, at.racahB, at.racahC];
    const variance = withoutRatio(first, first) + 2 * slope * withoutRatio(first, second) + slope ** 2 * withoutRatio(second, second);
    return { value: p[first]! + slope * p[second]!, u: Math.sqrt(Math.max(0, variance)) };
  };
  if (fit.mode === 'field, B' && Math.abs(fit.byRatio[0]!) * fit.ratio.u > Math.sqrt(fit.reading[0]![0]!) && fit.byRatio[2]) {
    const slope = -fit.byRatio[0]! / fit.byRatio[2];
    return { first: 'Delta', second: 'C', slope, ...combine(0, 2, slope) };
  }
  const bIsOpen = fit.mode === 'field, B assumed' || (fit.mode === 'field, B' && parameters[1]!.value === null);
  if (!bIsOpen || !(fit.total[1]![1]! > 0)) return null;
  // The direction with least spread: Delta + a B with a = -cov(Delta, B)/var(B).
  const slope = -withoutRatio(0, 1) / withoutRatio(1, 1);
  return { first: 'Delta', second: 'B', slope, ...combine(0, 1, slope) };
}
