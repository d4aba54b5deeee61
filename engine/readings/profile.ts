import type { FieldParameters } from '../levels/levels.ts';
import { solvePositive } from '../linear/solveSymmetric.ts';
import { transitionsAt } from './evaluate.ts';
import { weightAt } from './misfit.ts';
import type { Target } from './misfit.ts';
import type { GroundCase } from './transitions.ts';

/** What a profile runs over: the fit's own problem around one of its solutions. */
export interface ProfileTask {
  readonly ion: GroundCase;
  readonly ground: string;
  readonly labels: readonly string[];
  readonly targets: readonly Target[];
  /** C/B where it is assumed; null: C is free. */
  readonly ratio: number | null;
  /** The minimum. */
  readonly at: FieldParameters;
  readonly chi2: number;
}

export interface Limits {
  readonly low: number;
  readonly high: number;
}

const stepsAtMost = 60;

/** Parameters that vary: Delta and B, and C where it is free. */
function vectorOf(task: ProfileTask): number[] {
  const { delta, racahB, racahC } = task.at;
  return task.ratio === null ? [delta, racahB, racahC] : [delta, racahB];
}

function misfit(task: ProfileTask, p: readonly number[]) {
  const racahC = task.ratio === null ? p[2]! : task.ratio * p[1]!;
  const transitions = transitionsAt(task.ion, task.ground, task.labels, { delta: p[0]!, racahB: p[1]!, racahC });
  let chi2 = 0;
  const rows = transitions.map(({ energy, gradient }, k) => {
    const target = task.targets[k]!;
    const weight = weightAt(target, energy);
    const residual = target.observed - energy;
    chi2 += weight * residual ** 2;
    const slopes = task.ratio === null ? [gradient.delta, gradient.racahB, gradient.racahC] : [gradient.delta, gradient.racahB + task.ratio * gradient.racahC];
    return { weight, residual, slopes };
  });
  return { chi2, rows };
}

/** Least chi2 with one parameter held, from a start near it: damped Gauss-Newton over the others. */
function leastWithHeld(task: ProfileTask, start: readonly number[], held: number): { p: number[]; chi2: number } {
  const free = start.map((_, i) => i).filter((i) => i !== held);
  let p = [...start];
  let here = misfit(task, p);
  let damping = 1e-9;
  for (let step = 0; step < stepsAtMost; step++) {
    const scale = (i: number): number => Math.abs(vectorOf(task)[i]!);
    const normal = free.map((i) => free.map((j) => here.rows.reduce((sum, row) => sum + row.weight * row.slopes[i]! * row.slopes[j]! * scale(i) * scale(j), 0)));
    const right = free.map((i) => here.rows.reduce((sum, row) => sum + row.weight * row.slopes[i]! * scale(i) * row.residual, 0));
    const largest = Math.max(...normal.map((row, i) => row[i]!));
    for (let i = 0; i < free.length; i++) normal[i]![i]! += damping * largest;
    const move = solvePositive(normal, right);
    if (!move) break;
    const next = [...p];
    free.forEach((i, k) => {
      next[i]! += move[k]! * scale(i);
    });
    if (next.every((value) => value > 0)) {
      const there = misfit(task, next);
      if (there.chi2 <= here.chi2) {
        const small = Math.max(...move.map(Math.abs)) < 1e-9;
        p = next;
        here = there;
        damping = Math.max(1e-12, damping / 10);
        if (small) break;
        continue;
      }
    }
    damping = Math.max(damping, 1e-9) * 10;
    if (damping > 1e6) break;
  }
  return { p, chi2: here.chi2 };
}

/** Follows the profile outward from the minimum until chi2 has risen by `rise`; null where it does not within 20 u. */
function limitOnSide(task: ProfileTask, index: number, u: number, rise: number, side: 1 | -1): number | null {
  const best = vectorOf(task);
  let inner = { p: best, chi2: task.chi2 };
  const step = (u * Math.sqrt(rise)) / 4;
  for (let n = 1; n <= 80; n++) {
    const start = [...inner.p];
    start[index]! += side * step;
    if (start[index]! <= 0) return null;
    const outer = leastWithHeld(task, start, index);
    if (outer.chi2 - task.chi2 < rise) {
      inner = outer;
      continue;
    }
    return refine(task, index, inner, outer, rise);
  }
  return null;
}

/** Point between two profile points where chi2 has risen by exactly `rise`. */
function refine(task: ProfileTask, index: number, inner: { p: number[]; chi2: number }, outer: { p: number[]; chi2: number }, rise: number): number {
  let low = inner;
  let high = outer;
  for (let i = 0; i < 40; i++) {
    const risen = low.chi2 - task.chi2;
    const fraction = Math.min(0.95, Math.max(0.05, (rise - risen) / (high.chi2 - low.chi2)));
    const start = low.p.map((value, k) => value + fraction * (high.p[k]! - value));
    const middle = leastWithHeld(task, start, index);
    if (Math.abs(middle.chi2 - task.chi2 - rise) < 1e-6 * rise) return middle.p[index]!;
    if (middle.chi2 - task.chi2 < rise) low = middle;
    else high = middle;
  }
  return (low.p[index]! + high.p[index]!) / 2;
}

/**
 * Limits of one parameter where chi2, least over the others, has risen by `rise` above its minimum: 1 for one
 * standard uncertainty, 3.84 for 95 %.
 *
 * @param index 0 Delta, 1 B, 2 C (only where C is free)
 * @param u the parabolic standard uncertainty, by which steps are sized
 * @returns null where the curve does not rise that far on a side
 */
export function profileLimits(task: ProfileTask, index: number, u: number, rise: number): Limits | null {
  const low = limitOnSide(task, index, u, rise, -1);
  const high = limitOnSide(task, index, u, rise, 1);
  return low === null || high === null ? null : { low, high };
}

/** How far the curve may miss a parabola at one u before limits come from the profile. */
const bendAllowed = 0.1;

/**
 * Whether chi2 along the profile direction of a parameter departs from a parabola: at one u either way it
 * should have risen by 1.
 *
 * @param covariance of the varying parameters, from the same weights as `targets`
 */
export function isBent(task: ProfileTask, index: number, covariance: readonly (readonly number[])[]): boolean {
  const best = vectorOf(task);
  const u = Math.sqrt(covariance[index]![index]!);
  return ([1, -1] as const).some((side) => {
    const p = best.map((value, i) => value + (side * covariance[i]![index]!) / u);
    if (p.some((value) => value <= 0)) return true;
    return Math.abs(misfit(task, p).chi2 - task.chi2 - 1) > bendAllowed;
  });
}
