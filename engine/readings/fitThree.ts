import { propagate, quadratic, singularValues } from './covariance.ts';
import { calculatedAll, labelsOf, leverageOf, ranked, rowsOf, targetsOf, usedFlags } from './fitTask.ts';
import type { FitTask } from './fitTask.ts';
import type { Fit } from './fitTypes.ts';
import { minimaWithFreeRatio } from './freeRatio.ts';

/**
 * Fits Delta, B and C to all members. Null where fewer than three, no solution, a rank deficiency, or a C
 * that stays above the policy's ceiling.
 */
export function fitAllThree(task: FitTask, members: readonly number[]): Fit | 'no solution' | null {
  const labels = labelsOf(task, members);
  // Two bands may name the d5 pair; they are one transition.
  if (new Set(labels).size < 3) return null;
  const solutions = ranked(minimaWithFreeRatio(task.ion, labels, targetsOf(task, members)), task.freeIon);
  const best = solutions[0];
  if (!best) return 'no solution';
  const calculated = calculatedAll(task, best.ground, best.at);
  const rows = rowsOf(task, members, (k) => {
    const { delta, racahB, racahC } = calculated[k]!.gradient;
    return [delta, racahB, racahC];
  });
  const scales = [best.at.delta, best.at.racahB, best.at.racahC];
  const singular = singularValues(rows, scales);
  if (!(singular[2]! > 1e-7 * singular[0]!)) return null;
  const { reading, total, leverage } = propagate(rows, scales);
  if (Math.sqrt(total[2]![2]!) > task.policy.ceilings.racahC * best.at.racahC) return null;
  const ratio = best.at.racahC / best.at.racahB;
  const relative = [0, -ratio / best.at.racahB, 1 / best.at.racahB];
  return {
    mode: 'field, B, C', solutions, used: usedFlags(task, members), calculated, floors: task.floors,
    leverage: leverageOf(task, members, leverage), spare: members.length - 3,
    ratio: { value: ratio, u: Math.sqrt(quadratic(relative, total)), origin: 'fitted' },
    reading, total, byRatio: [0, 0, 0], assumedBeta: null,
  };
}
