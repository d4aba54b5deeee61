import { lowestLevel } from '../levels/crossings.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Estimate } from '../policy/types.ts';
import { propagate, withOuter } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import { fieldsForPosition } from './fieldRoots.ts';
import { calculatedAll, labelsOf, leverageOf, rowsOf, usedFlags } from './fitTask.ts';
import type { FitTask } from './fitTask.ts';
import type { Fit, FitOutcome } from './fitTypes.ts';
import { pointOnCurve } from './table.ts';

/** beta taken where one band has to give Delta although it feels B. */
const usualBeta: Estimate = { value: 0.75, u: 0.12 };

/** Delta from bands that do not feel B: a weighted mean. B is the usual one and serves for predictions only. */
export function fitFieldAlone(task: FitTask, members: readonly number[]): Fit {
  const { ion, ratio, freeIon } = task;
  const slopes = transitionsAt(ion, task.ground, labelsOf(task, members), pointOnCurve(Math.PI / 4, ratio.value)).map((transition) => transition.gradient.delta);
  const rows = rowsOf(task, members, (k) => [slopes[members.indexOf(k)]!]);
  const { reading, total, gain, leverage } = propagate(rows, [1]);
  const delta = members.reduce((sum, k, i) => sum + gain[0]![i]! * task.assigned[k]!.observation.position, 0);
  const racahB = freeIon ? usualBeta.value * freeIon.racahB0 : 0;
  const at = { delta, racahB, racahC: ratio.value * racahB };
  const chi2 = members.reduce((sum, k, i) => sum + (task.assigned[k]!.observation.position - slopes[i]! * delta) ** 2 / (rows[i]!.u ** 2 + rows[i]!.floor ** 2), 0);
  const uB = freeIon ? usualBeta.u * freeIon.racahB0 : 0;
  const onlyDelta = (variance: number): number[][] => [[variance, 0, 0], [0, 0, 0], [0, 0, 0]];
  return {
    mode: 'field', solutions: [{ at, chi2, ground: task.ground }], used: usedFlags(task, members),
    calculated: calculatedAll(task, task.ground, at), floors: task.floors, leverage: leverageOf(task, members, leverage),
    spare: members.length - 1, ratio, reading: onlyDelta(reading[0]![0]!),
    total: withOuter(withOuter(onlyDelta(total[0]![0]!), [0, 1, ratio.value], uB ** 2), [0, 0, racahB], ratio.u ** 2),
    byRatio: [0, 0, racahB], assumedBeta: freeIon ? usualBeta : null,
  };
}

/** Delta from one band that feels B, with beta and C/B assumed: every Delta at which the band falls where it was read. */
export function fitWithAssumedB(task: FitTask, member: number): FitOutcome {
  const { ion, ratio, freeIon } = task;
  if (!freeIon) return { status: 'not determinable', reason: 'one band that moves with Delta and B fixes neither, and no free-ion B is known by which B could be assumed' };
  const racahB = usualBeta.value * freeIon.racahB0;
  const racahC = ratio.value * racahB;
  const { label, observation } = task.assigned[member]!;
  const roots = fieldsForPosition(ion, task.ground, label, observation.position, racahB, ratio.value);
  // Where several fields put it there, the one with the declared spin is meant.
  const inSpin = roots.length > 1 ? roots.filter((root) => lowestLevel(ion.electrons, ion.geometry, root, racahB, racahC).multiplicity === ion.multiplicity) : roots;
  const delta = inSpin[0] ?? roots[0];
  if (delta === undefined)
    return { status: 'refused', reason: `no Delta puts this transition at the band's position with beta near ${usualBeta.value}` };
  const at = { delta, racahB, racahC };
  const calculated = calculatedAll(task, task.ground, at);
  const { gradient } = calculated[member]!;
  const u = symmetricU(observation);
  const variance = (value: number): number => value / gradient.delta ** 2;
  const byB = -(gradient.racahB + ratio.value * gradient.racahC) / gradient.delta;
  const byRatio = [(-gradient.racahC * racahB) / gradient.delta, 0, racahB];
  const onlyDelta = (value: number): number[][] => [[value, 0, 0], [0, 0, 0], [0, 0, 0]];
  const others = roots.filter((root) => root !== delta);
  return {
    mode: 'field, B assumed',
    solutions: [delta, ...others].map((root) => ({ at: { delta: root, racahB, racahC }, chi2: 0, ground: task.ground })),
    used: usedFlags(task, [member]), calculated, floors: task.floors, leverage: leverageOf(task, [member], [1]), spare: 0, ratio,
    reading: onlyDelta(variance(u ** 2)),
    total: withOuter(
      withOuter(onlyDelta(variance(u ** 2 + task.floors[member]! ** 2)), [byB, 1, ratio.value], (usualBeta.u * freeIon.racahB0) ** 2),
      byRatio, ratio.u ** 2,
    ),
    byRatio, assumedBeta: usualBeta,
  };
}
