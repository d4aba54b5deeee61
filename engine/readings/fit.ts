import type { FreeIon } from '../ions/types.ts';
import type { FieldParameters } from '../levels/levels.ts';
import { lowestLevel } from '../levels/crossings.ts';
import { groundLabel } from '../levels/labels.ts';
import type { Estimate, Policy } from '../policy/types.ts';
import { propagate, quadratic, singularValues, transform, withOuter } from './covariance.ts';
import type { Covariance, Row } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { TransitionAt } from './evaluate.ts';
import { betaPenalty } from './betaPenalty.ts';
import { fieldsForPosition } from './fieldRoots.ts';
import { minimaWithFreeRatio } from './freeRatio.ts';
import type { Target } from './misfit.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Observation } from '../measurement/observation.ts';
import { minimaOnCurve } from './scan.ts';
import { levelTable, pointOnCurve } from './table.ts';
import type { LevelTable } from './table.ts';
import { floorOf, transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
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

/** beta taken where one band has to give Delta although it feels B. */
const usualBeta: Estimate = { value: 0.75, u: 0.12 };

/** Two bands and two parameters leave no misfit where a solution exists; this much chi2 left means there is none. */
const missedPair = 4;

/** What the policy says of C/B for an ion. */
export function ratioFor(policy: Policy, ionName: string): RatioUsed {
  const own = policy.cOverB.perIon[ionName];
  return own ? { ...own, origin: 'policy for this ion' } : { ...policy.cOverB.general, origin: 'policy' };
}

/** What a fit aims at: an observation with the weights of its uncertainty and the floor. */
export function targetOf(observation: Observation, floor: number): Target {
  return {
    observed: observation.position,
    weightBelow: 1 / (observation.uMinus ** 2 + floor ** 2),
    weightAbove: 1 / (observation.uPlus ** 2 + floor ** 2),
  };
}

/** Which parameters a transition can feel at all, by its sensitivities at an ordinary field. */
interface Feels {
  readonly delta: boolean;
  readonly racahB: boolean;
}

const feltHeld = new WeakMap<LevelTable, Map<string, Feels>>();

function feels(ion: GroundCase, ground: string, label: string, ratio: number): Feels {
  const table = levelTable(ion, ratio);
  let held = feltHeld.get(table);
  if (!held) {
    held = new Map();
    feltHeld.set(table, held);
  }
  const key = `${ground} ${label}`;
  let found = held.get(key);
  if (!found) {
    const { gradient } = transitionsAt(ion, ground, [label], pointOnCurve(Math.PI / 4, ratio))[0]!;
    found = { delta: Math.abs(gradient.delta) > 1e-9, racahB: Math.abs(gradient.racahB) > 1e-9 || Math.abs(gradient.racahC) > 1e-9 };
    held.set(key, found);
  }
  return found;
}

/** Everything a fit needs, gathered once. */
interface Task {
  readonly ion: GroundCase;
  readonly ground: string;
  readonly assigned: readonly Assigned[];
  readonly floors: readonly number[];
  readonly policy: Policy;
  readonly ratio: RatioUsed;
  readonly freeIon: FreeIon | null;
}

function targetsOf(task: Task, members: readonly number[]): Target[] {
  return members.map((k) => targetOf(task.assigned[k]!.observation, task.floors[k]!));
}

function labelsOf(task: Task, members: readonly number[]): string[] {
  return members.map((k) => task.assigned[k]!.label);
}

function rowsOf(task: Task, members: readonly number[], slopes: (k: number) => readonly number[]): Row[] {
  return members.map((k) => ({ slopes: slopes(k), u: symmetricU(task.assigned[k]!.observation), floor: task.floors[k]! }));
}

function calculatedAll(task: Task, ground: string, at: FieldParameters): TransitionAt[] {
  return transitionsAt(task.ion, ground, task.assigned.map((one) => one.label), at);
}

function usedFlags(task: Task, members: readonly number[]): boolean[] {
  return task.assigned.map((_, k) => members.includes(k));
}

function leverageOf(task: Task, members: readonly number[], leverage: readonly number[]): (number | null)[] {
  return task.assigned.map((_, k) => (members.includes(k) ? leverage[members.indexOf(k)]! : null));
}

/** Solutions in order of chi2 and plausibility of beta. */
function ranked(solutions: readonly Solution[], freeIon: FreeIon | null): Solution[] {
  const score = (solution: Solution): number => solution.chi2 + betaPenalty(solution.at.racahB, freeIon);
  return [...solutions].sort((a, b) => score(a) - score(b));
}

/**
 * Fits Delta, B and C to all members. Null where fewer than three, no solution, a rank deficiency, or a C
 * that stays above the policy's ceiling.
 */
function fitAllThree(task: Task, members: readonly number[]): Fit | 'no solution' | null {
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

/** Fits Delta and B with C = (C/B) B. */
function fitFieldAndB(task: Task, members: readonly number[], mode: 'field, B' | 'field, B by a line'): FitOutcome {
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

/** Delta from bands that do not feel B: a weighted mean. B is the usual one and serves for predictions only. */
function fitFieldAlone(task: Task, members: readonly number[]): Fit {
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
function fitWithAssumedB(task: Task, member: number): FitOutcome {
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
  const task: Task = { ion, ground, assigned, floors, policy, ratio, freeIon };
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
function isAtEdge(task: Task, members: readonly number[]): boolean {
  return [-2, 2].some((sign) => {
    const moved = members.map((k, i) => {
      const { label, observation } = task.assigned[k]!;
      const shift = (i === 0 ? sign : -sign) * Math.SQRT1_2 * symmetricU(observation);
      return { label, observation: { ...observation, position: observation.position + shift } };
    });
    return isFit(fitFieldAndB({ ...task, assigned: moved, floors: members.map((k) => task.floors[k]!) }, moved.map((_, i) => i), 'field, B'));
  });
}

/** Delta/B of a point, where B is positive. */
export function deltaOverB(at: FieldParameters): number | null {
  return at.racahB > 0 ? at.delta / at.racahB : null;
}

