import { propagate, singularValues, transform, withOuter } from './covariance.ts';
import { calculatedAll, labelsOf, leverageOf, ranked, rowsOf, targetsOf, usedFlags } from './fitTask.ts';
import type { FitTask } from './fitTask.ts';
import type { FitOutcome } from './fitTypes.ts';
import { minimaOnCurve } from './scan.ts';
import { levelTable, pointOnCurve } from './table.ts';

/** Two bands and two parameters leave no misfit where a solution exists; this much chi2 left means there is none. */
const missedPair = 4;

/** Fits Delta and B with C = (C/B) B. */
export function fitFieldAndB(task: FitTask, members: readonly number[], mode: 'field, B' | 'field, B by a line'): FitOutcome {
  const { ion, ratio } = task;
  const labels = labelsOf(task, members);
  const minima = minimaOnCurve(levelTable(ion, ratio.value), ion, labels, targetsOf(task, members));
  const solutions = ranked(
    minima.map(({ t, rho, chi2, ground }) => {
      const unit = pointOnCurve(t, ratio.value);
      return { at: { delta: rho * unit.delta, racahB: rho * unit.racahB, racahC: rho * unit.racahC }, chi2, ground };
    }),
    task.freeIon,
  );
  const best = solutions[0];
  if (!best)
    return { status: 'refused', reason: 'no positive Delta and B reproduce these bands as assigned: the misfit falls all the way to an end of the diagram' };
  const calculated = calculatedAll(task, best.ground, best.at);
  if (members.length === 2 && best.chi2 > missedPair) {
    const misses = members.map((k) => `${task.assigned[k]!.observation.position > calculated[k]!.energy ? '+' : '\u2212'}${Math.abs(Math.round(task.assigned[k]!.observation.position - calculated[k]!.energy))}`);
    return { status: 'refused', reason: `no Delta and B give both bands: the closest they come to misses them by ${misses.join(' and ')} cm⁻¹` };
  }
  const rows = rowsOf(task, members, (k) => {
    const { delta, racahB, racahC } = calculated[k]!.gradient;
    return [delta, racahB + ratio.value * racahC];
  });
  const scales = [best.at.delta, best.at.racahB];
  const singular = singularValues(rows, scales);
  if (!(singular[1]! > 1e-7 * singular[0]!))
    return { status: 'not determinable', reason: 'these bands move together with Delta and B, so they fix one combination of them and neither alone' };
  const { reading, total, gain, leverage } = propagate(rows, scales);
  // dp/dr = -G (d nu/dC) B, and C = rB follows.
  const [byDelta, byB] = gain.map((line) => -line.reduce((sum, value, i) => sum + value * calculated[members[i]!]!.gradient.racahC * best.at.racahB, 0));
  const toThree = [[1, 0], [0, 1], [0, ratio.value]];
  const byRatio = [byDelta!, byB!, best.at.racahB + ratio.value * byB!];
  return {
    mode, solutions, used: usedFlags(task, members), calculated, floors: task.floors, leverage: leverageOf(task, members, leverage),
    spare: members.length - 2, ratio, reading: transform(toThree, reading), total: withOuter(transform(toThree, total), byRatio, ratio.u ** 2),
    byRatio, assumedBeta: null,
  };
}
