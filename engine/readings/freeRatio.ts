import type { FieldParameters } from '../levels/levels.ts';
import { descend } from './descent.ts';
import { columnsOf } from './misfit.ts';
import type { Target } from './misfit.ts';
import { evaluatorOf } from './evaluate.ts';
import type { Evaluator } from './evaluate.ts';
import { roughMinimaOnCurve } from './roughMinima.ts';
import type { RoughMinimum } from './roughMinima.ts';
import { coarsePoints, levelTable, pointOnCurve } from './table.ts';
import type { GroundCase } from './transitions.ts';

/** A local minimum of chi2 in Delta, B and C. */
export interface FreeMinimum {
  readonly at: FieldParameters;
  readonly chi2: number;
  readonly ground: string;
}

/** C/B is looked for between these bounds; fitted values of real complexes lie between 3 and 6.5. */
export const lowestRatio = 2;
export const highestRatio = 9;
const ratioStep = 0.5;

/** What two minima of one valley may miss each other by, half way between the C/B at which they were found. */
const near = 0.06;

/** No ligand field: Delta/B at the ends of the curve, where a minimum is none; or C/B that far outside that no descent comes back. */
function isLost(delta: number, racahB: number, racahC: number): boolean {
  return delta < 1e-3 * racahB || delta > 1e6 * racahB || racahC < 0.25 * lowestRatio * racahB || racahC > 4 * highestRatio * racahB;
}

/** Where a descent starts. */
interface Start extends FieldParameters {
  readonly ground: string;
}

/**
 * All local minima of chi2 in Delta, B and C with C/B strictly inside 2 to 9, ascending in chi2.
 *
 * The curve is scanned at fifteen values of C/B, a degree a step. Its minima form valleys; wherever the floor of a valley turns from
 * falling to rising between two of them, or ends while it falls, a descent starts that uses exact levels with their
 * first and second derivatives.
 */
export function minimaWithFreeRatio(ion: GroundCase, labels: readonly string[], targets: readonly Target[]): FreeMinimum[] {
  const evaluators = new Map<string, Evaluator>();
  const found: FreeMinimum[] = [];
  for (const { ground, ...start } of startsOf(ion, labels, targets)) {
    let evaluator = evaluators.get(ground);
    if (!evaluator) {
      evaluator = evaluatorOf(ion, ground, labels, true);
      evaluators.set(ground, evaluator);
    }
    const end = descend(evaluator, targets, start, isLost);
    if (!end || !(end.at.racahC > lowestRatio * end.at.racahB && end.at.racahC < highestRatio * end.at.racahB)) continue;
    const minimum = { ...end, ground };
    if (!found.some((other) => isSame(other, minimum))) found.push(minimum);
  }
  return found.sort((a, b) => a.chi2 - b.chi2);
}

function isSame(a: FreeMinimum, b: FreeMinimum): boolean {
  const close = (x: number, y: number): boolean => Math.abs(x - y) <= 1e-6 * Math.max(Math.abs(x), Math.abs(y));
  return a.ground === b.ground && close(a.at.delta, b.at.delta) && close(a.at.racahB, b.at.racahB) && close(a.at.racahC, b.at.racahC);
}

function startsOf(ion: GroundCase, labels: readonly string[], targets: readonly Target[]): Start[] {
  const columns = columnsOf(targets);
  const rows: RoughMinimum[][] = [];
  for (let ratio = lowestRatio; ratio <= highestRatio; ratio += ratioStep) rows.push(roughMinimaOnCurve(levelTable(ion, ratio, coarsePoints), ion, labels, columns));
  return rows.flatMap((row, i) => row.flatMap((minimum) => startsFrom(minimum, lowestRatio + i * ratioStep, rows[i - 1], rows[i + 1])));
}

/**
 * The starts that one minimum at one C/B calls for.
 *
 * @param lower, higher the minima at the next C/B on either side; undefined at the ends of the range, beyond which nothing is
 *   looked for
 */
function startsFrom(minimum: RoughMinimum, ratio: number, lower: readonly RoughMinimum[] | undefined, higher: readonly RoughMinimum[] | undefined): Start[] {
  const next = higher && sameValley(minimum, higher, ratioStep);
  const starts: Start[] = [];
  if (next) {
    const part = turn(minimum, next);
    if (part !== null) starts.push(between(minimum, next, part, ratio));
  }
  // Where the valley ends while it falls, there is a minimum on the way.
  const ends = minimum.byRatio < 0 ? higher && !next : lower && !sameValley(minimum, lower, -ratioStep);
  if (ends) starts.push(placeOf(minimum, ratio));
  return starts;
}

/**
 * Where between two minima of a valley its floor turns from falling to rising, as a fraction of the way; null where it does
 * not. The floor is taken as the cubic that has both heights and both slopes.
 */
function turn(from: RoughMinimum, to: RoughMinimum): number | null {
  const first = from.byRatio * ratioStep;
  const last = to.byRatio * ratioStep;
  const rise = to.chi2 - from.chi2;
  const square = 3 * (first + last - 2 * rise);
  const linear = 2 * (3 * rise - 2 * first - last);
  // The root of square s^2 + linear s + first at which it rises.
  const root = Math.sqrt(linear * linear - 4 * square * first);
  const part = linear > 0 ? (-2 * first) / (linear + root) : (root - linear) / (2 * square);
  if (part > 0 && part < 1) return part;
  return first < 0 && last > 0 ? first / (first - last) : null;
}

/** The minimum in which a valley goes on at the next C/B: both drifts lead to one place half way. */
function sameValley(minimum: RoughMinimum, row: readonly RoughMinimum[], step: number): RoughMinimum | null {
  let best: RoughMinimum | null = null;
  let least = near;
  for (const other of row) {
    const apart = Math.abs(other.t - minimum.t - (step / 2) * (other.drift + minimum.drift));
    if (other.ground !== minimum.ground || !(apart < least)) continue;
    least = apart;
    best = other;
  }
  return best;
}

function placeOf({ t, rho, ground }: { readonly t: number; readonly rho: number; readonly ground: string }, ratio: number): Start {
  const unit = pointOnCurve(t, ratio);
  return { delta: rho * unit.delta, racahB: rho * unit.racahB, racahC: rho * unit.racahC, ground };
}

/** The place at a fraction of the way between two minima of one valley; t on the cubic that has both drifts. */
function between(from: RoughMinimum, to: RoughMinimum, part: number, ratio: number): Start {
  const way = to.t - from.t;
  const bend = part * (1 - part) * ((1 - part) * (from.drift * ratioStep - way) - part * (to.drift * ratioStep - way));
  return placeOf({ t: from.t + part * way + bend, rho: from.rho + part * (to.rho - from.rho), ground: from.ground }, ratio + part * ratioStep);
}
