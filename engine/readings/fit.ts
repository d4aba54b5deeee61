import type { FreeIon } from '../ions/types.ts';
import { groundLabel } from '../levels/labels.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Policy } from '../policy/types.ts';
import { feels } from './feels.ts';
import { fitFieldAlone, fitWithAssumedB } from './fitOne.ts';
import type { FitTask } from './fitTask.ts';
import { fitAllThree } from './fitThree.ts';
import { fitFieldAndB } from './fitTwo.ts';
import { isFit } from './fitTypes.ts';
import type { Assigned, FitOutcome } from './fitTypes.ts';
import { floorOf, transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { RatioUsed } from './types.ts';

/**
 * Fits an assignment: as many of Delta, B and C as its bands can fix.
 *
 * Spin-flip bands take part only where C is free and determined. Where they are not enough for that, they
 * are compared with the fit of the spin-allowed bands; where those give Delta alone, the lines may still
 * give B with C/B assumed.
 *
 * @param assigned one entry a transition, labels in letter form and all different, except that both bands of
 *   the d5 pair may name it
 */
export function fitAssignment(ion: GroundCase, assigned: readonly Assigned[], policy: Policy, ratio: RatioUsed, freeIon: FreeIon | null): FitOutcome {
  const ground = groundLabel(ion.electrons, ion.geometry, ion.multiplicity);
  if (!ground) return { status: 'refused', reason: `d${ion.electrons} has no state of the declared multiplicity` };
  if (assigned.length === 0) return { status: 'not determinable', reason: 'no band is assigned to a d-d transition' };
  const floors = assigned.map(({ label }) => floorOf(ion, label, policy));
  const task: FitTask = { ion, ground, assigned, floors, policy, ratio, freeIon };
  const all = assigned.map((_, k) => k);
  const allowed = all.filter((k) => transitionOf(ion, assigned[k]!.label).spinAllowed);
  const felt = assigned.map(({ label }) => feels(ion, ground, label, ratio.value));
  if (policy.cFitted && allowed.length < all.length) {
    const three = fitAllThree(task, all);
    if (three === 'no solution' && all.every((k) => felt[k]!.racahB && !felt[k]!.delta))
      return { status: 'not determinable', reason: 'none of the assigned bands moves with Delta: they fix B and C at best in one combination' };
    if (three === 'no solution')
      return { status: 'refused', reason: 'no Delta, B and C with C/B between 2 and 9 reproduce these bands as assigned' };
    if (three) return three;
  }
  if (allowed.length === 0)
    return {
      status: 'not determinable',
      reason: all.some((k) => felt[k]!.delta)
        ? 'spin-forbidden bands alone fix Delta, B and C only from three bands on that move differently'
        : 'none of the assigned bands moves with Delta',
    };
  if (allowed.every((k) => !felt[k]!.racahB)) {
    const lines = all.filter((k) => !allowed.includes(k) && felt[k]!.racahB);
    if (lines.length > 0) {
      const byLine = fitFieldAndB(task, all, 'field, B by a line');
      if (isFit(byLine)) return byLine;
    }
    return fitFieldAlone(task, allowed);
  }
  if (allowed.length === 1) return fitWithAssumedB(task, allowed[0]!);
  const fitted = fitFieldAndB(task, allowed, 'field, B');
  if (isFit(fitted) || fitted.status !== 'refused' || allowed.length > 2) return fitted;
  // At the edge of the ratio window B falls to zero within the readings' uncertainty: Delta still stands.
  const alone = allowed.filter((k) => !felt[k]!.racahB);
  return alone.length === 1 && isAtEdge(task, allowed) ? fitFieldAlone(task, alone) : fitted;
}

/** Whether two bands would have a solution if each moved by at most 2 u against the other. */
function isAtEdge(task: FitTask, members: readonly number[]): boolean {
  return [-2, 2].some((sign) => {
    const moved = members.map((k, i) => {
      const { label, observation } = task.assigned[k]!;
      const shift = (i === 0 ? sign : -sign) * Math.SQRT1_2 * symmetricU(observation);
      return { label, observation: { ...observation, position: observation.position + shift } };
    });
    return isFit(fitFieldAndB({ ...task, assigned: moved, floors: members.map((k) => task.floors[k]!) }, moved.map((_, i) => i), 'field, B'));
  });
}
