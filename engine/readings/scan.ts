import { groundLabel, levelNames } from '../levels/labels.ts';
import { evaluatorOf } from './evaluate.ts';
import type { Evaluator } from './evaluate.ts';
import { bestScale, columnsOf, misfitSlope, pointOfCurve } from './misfit.ts';
import type { Columns, CurvePoint, Target } from './misfit.ts';
import { levelPlace, pointOnCurve, slopeAt } from './table.ts';
import type { GridLevel, LevelTable } from './table.ts';
import type { GroundCase } from './transitions.ts';

/** A local minimum of chi2 along the curve, at one C/B. */
export interface Minimum {
  readonly t: number;
  readonly rho: number;
  readonly chi2: number;
  /** Letter form of the ground level within this branch. */
  readonly ground: string;
}

/** Part of the curve on which one level is the lowest of the declared multiplicity; grid indices, both ends included. */
interface Segment {
  readonly ground: string;
  readonly first: number;
  readonly last: number;
}

const segmentsHeld = new WeakMap<LevelTable, Map<number, readonly Segment[]>>();

/**
 * Where along the curve which level is lowest of the declared multiplicity. For most ions one level is
 * lowest everywhere; the doublets of d3 and d7 and the singlets of d4 change. The outermost cell at each end is
 * left out: Delta/B below 0.09 and above 4500 is no ligand field, and at the ends themselves rounding decides.
 */
function groundSegments(table: LevelTable, multiplicity: number): readonly Segment[] {
  let byMultiplicity = segmentsHeld.get(table);
  if (!byMultiplicity) {
    byMultiplicity = new Map();
    segmentsHeld.set(table, byMultiplicity);
  }
  const earlier = byMultiplicity.get(multiplicity);
  if (earlier) return earlier;
  const { electrons, geometry } = table.ion;
  const lowest = levelNames(electrons, geometry).filter(
    (label) => label.startsWith('a') && levelPlace(table.ion, label).block.multiplicity === multiplicity,
  );
  const levels = lowest.map((label) => table.grid(label));
  const strongest = groundLabel(electrons, geometry, multiplicity);
  const at = (i: number): number => {
    let best = Math.max(0, lowest.indexOf(strongest ?? ''));
    // Where levels coincide a difference of rounding is no crossing.
    for (let k = 0; k < levels.length; k++) if (levels[k]!.energy[i]! < levels[best]!.energy[i]! - 1e-9) best = k;
    return best;
  };
  const found: Segment[] = [];
  let first = 1;
  let current = at(1);
  for (let i = 2; i < table.points - 1; i++) {
    const next = at(i);
    if (next === current) continue;
    // Both neighbours cover the cell in which the crossing lies, so no minimum falls between them.
    found.push({ ground: lowest[current]!, first, last: i });
    first = i - 1;
    current = next;
  }
  found.push({ ground: lowest[current]!, first, last: table.points - 2 });
  byMultiplicity.set(multiplicity, found);
  return found;
}

/** Cubic Hermite interpolation in one grid cell: value and derivative by t at fraction s. */
function interpolate(energy: Float64Array, slope: Float64Array, i: number, s: number, step: number, out: [number, number]): void {
  const y0 = energy[i]!;
  const y1 = energy[i + 1]!;
  const m0 = slope[i]! * step;
  const m1 = slope[i + 1]! * step;
  const c = 3 * (y1 - y0) - 2 * m0 - m1;
  const d = m0 + m1 - 2 * (y1 - y0);
  out[0] = y0 + s * (m0 + s * (c + s * d));
  out[1] = (m0 + s * (2 * c + s * 3 * d)) / step;
}

/** Targets against the transitions of one segment, with the work space of a scan. */
interface Curve {
  /** Distance of grid points. */
  readonly step: number;
  readonly transitions: readonly GridLevel[];
  readonly columns: Columns;
  /** Transition energies and slopes at the last point asked for, and what came of them. */
  readonly energies: Float64Array;
  readonly slopes: Float64Array;
  readonly point: CurvePoint;
}

function curveOf(table: LevelTable, ground: string, labels: readonly string[], columns: Columns): Curve {
  return {
    step: table.step, transitions: labels.map((label) => table.transition(ground, label)), columns,
    energies: new Float64Array(labels.length), slopes: new Float64Array(labels.length), point: { rho: 0, slope: 0 },
  };
}

/** d chi2/dt at a grid point; NaN where no positive scale is best. */
function slopeOnGrid({ transitions, columns, energies, slopes, point }: Curve, i: number): number {
  for (let k = 0; k < transitions.length; k++) {
    const transition = transitions[k]!;
    energies[k] = transition.energy[i]!;
    slopes[k] = transition.slope[i]!;
  }
  pointOfCurve(columns, energies, slopes, point);
  return point.rho > 0 ? point.slope : Number.NaN;
}

/** d chi2/dt at fraction s of the cell above grid point i. */
function slopeInCell({ step, transitions, columns, energies, slopes, point }: Curve, i: number, s: number): number {
  const out: [number, number] = [0, 0];
  for (let k = 0; k < transitions.length; k++) {
    const { energy, slope } = transitions[k]!;
    interpolate(energy, slope, i, s, step, out);
    energies[k] = out[0];
    slopes[k] = out[1];
  }
  pointOfCurve(columns, energies, slopes, point);
  return point.slope;
}

/** A stretch of one grid cell over which d chi2/dt turns from falling to rising: fractions of the cell, and the slopes there. */
interface Turn {
  readonly cell: number;
  readonly low: number;
  readonly high: number;
  readonly atLow: number;
  readonly atHigh: number;
}

/** Points inside a suspect cell at which the interpolated slope is looked at. */
const insideSamples = 16;

/**
 * Where d chi2/dt turns from falling to rising. A cell whose ends differ in sign holds a turn; one whose ends do not may
 * hold two that lie close together, and then the slope comes near zero in it: there, as in every cell that holds
 * a turn, the interpolant is sampled.
 */
function turningCells(curve: Curve, { first, last }: Segment): Turn[] {
  // In the outermost cells levels coincide at the end point, and the slope there is rounding or that of another order.
  const start = Math.max(1, first);
  const end = Math.min(curve.transitions[0]!.energy.length - 2, last);
  const found: Turn[] = [];
  let earlier = Number.POSITIVE_INFINITY;
  let before = slopeOnGrid(curve, start);
  let after = start < end ? slopeOnGrid(curve, start + 1) : Number.NaN;
  for (let i = start; i < end; i++) {
    const later = i + 2 <= end ? slopeOnGrid(curve, i + 2) : Number.POSITIVE_INFINITY;
    const turns = before <= 0 && after > 0 && !(before === 0 && i === start);
    const nearsZero = Math.abs(before) <= Math.abs(earlier) && Math.abs(after) <= Math.abs(later) && before * after > 0;
    if (turns || nearsZero) addTurns(curve, i, before, after, found);
    earlier = before;
    before = after;
    after = later;
  }
  return found;
}

function addTurns(curve: Curve, cell: number, before: number, after: number, found: Turn[]): void {
  let low = 0;
  let atLow = before;
  for (let n = 1; n <= insideSamples; n++) {
    const high = n / insideSamples;
    const atHigh = n === insideSamples ? after : slopeInCell(curve, cell, high);
    if (atLow <= 0 && atHigh > 0) found.push({ cell, low, high, atLow, atHigh });
    low = high;
    atLow = atHigh;
  }
}

/**
 * All local minima of chi2 inside 0 < t < 90 degrees for transitions from the ground level, at the table's
 * C/B, to machine precision, ascending in chi2. Minima at an end of the curve are not solutions and are left out,
 * as is every point where the best scale is not positive.
 *
 * On the grid the sign of the exact d chi2/dt brackets each minimum; inside the cell it is found on the
 * Hermite interpolant and then corrected by Newton steps on exact levels.
 */
export function minimaOnCurve(table: LevelTable, ion: GroundCase, labels: readonly string[], targets: readonly Target[]): Minimum[] {
  const columns = columnsOf(targets);
  const found: Minimum[] = [];
  for (const segment of groundSegments(table, ion.multiplicity)) {
    const curve = curveOf(table, segment.ground, labels, columns);
    const cells = turningCells(curve, segment);
    if (cells.length === 0) continue;
    const evaluator = evaluatorOf(table.ion, segment.ground, labels);
    for (const turn of cells) {
      const i = turn.cell;
      const s = rootOfRising((fraction) => slopeInCell(curve, i, fraction), turn);
      const exact = correct(table, evaluator, segment.ground, targets, columns.weights !== null, (i + s) * table.step, curvatureInCell(curve, i, s));
      if (exact && isLowest(table, ion, segment.ground, exact.t)) found.push(exact);
    }
  }
  return found.sort((a, b) => a.chi2 - b.chi2);
}

/** A local minimum along the curve as the interpolated table has it, good to about 1e-5 in t. */
export interface RoughMinimum extends Minimum {
  /** d chi2 / d(C/B) with t and rho left to follow. */
  readonly byRatio: number;
  /** d t / d(C/B): how the minimum moves along the curve. */
  readonly drift: number;
}

/** As `minimaOnCurve`, from the table alone: starts for a search over C/B. In no order. */
export function roughMinimaOnCurve(table: LevelTable, ion: GroundCase, labels: readonly string[], columns: Columns): RoughMinimum[] {
  const found: RoughMinimum[] = [];
  for (const segment of groundSegments(table, ion.multiplicity)) {
    const curve = curveOf(table, segment.ground, labels, columns);
    for (const turn of turningCells(curve, segment)) {
      const s = rootOfRising((fraction) => slopeInCell(curve, turn.cell, fraction), turn);
      found.push(roughMinimum(curve, segment.ground, turn.cell, s));
    }
  }
  return found;
}

function roughMinimum(curve: Curve, ground: string, i: number, s: number): RoughMinimum {
  const { step, transitions, columns, energies, slopes, point } = curve;
  const curvature = curvatureInCell(curve, i, s);
  const atMinimum = slopeInCell(curve, i, s);
  const { rho } = point;
  const { chi2 } = bestScale(columns.targets, energies, columns.weights !== null);
  // At a minimum in t and rho the derivative is the one at constant t and rho.
  const rates = Float64Array.from(transitions, ({ byRatio }) => byRatio[i]! + s * (byRatio[i + 1]! - byRatio[i]!));
  const byRatio = misfitSlope(columns.targets, energies, rates, rho);
  for (let k = 0; k < transitions.length; k++) {
    const { byRatio: rate } = transitions[k]!;
    energies[k]! += smallRatio * rates[k]!;
    slopes[k]! += (smallRatio * (rate[i + 1]! - rate[i]!)) / step;
  }
  pointOfCurve(columns, energies, slopes, point);
  const drift = curvature > 0 ? (atMinimum - point.slope) / (smallRatio * curvature) : 0;
  return { t: (i + s) * step, rho, chi2, ground, byRatio, drift };
}

/** Change of C/B over which the drift of a minimum is taken. */
const smallRatio = 1e-3;

/** d2 chi2/dt2 of the interpolant. */
const curvatureInCell = (curve: Curve, i: number, s: number): number =>
  (slopeInCell(curve, i, s + nearby) - slopeInCell(curve, i, s - nearby)) / (2 * nearby * curve.step);

/** Fraction of a cell over which the curvature is taken. */
const nearby = 1e-3;

/** Fraction of a cell to which the interpolant is solved: it is no truer than this. */
const fractionTolerance = 1e-7;

/** Root of a function that is not positive at the low end of a stretch and positive at its high end (regula falsi, Illinois variant). */
function rootOfRising(f: (s: number) => number, stretch: Turn): number {
  let { low, high, atLow: fLow, atHigh: fHigh } = stretch;
  let side = 0;
  for (let step = 0; step < 60; step++) {
    const s = (low * fHigh - high * fLow) / (fHigh - fLow);
    const value = f(s);
    if (value === 0 || high - low < fractionTolerance) return s;
    if (value > 0) {
      if (high - s < fractionTolerance) return s;
      high = s;
      fHigh = value;
      if (side === 1) fLow /= 2;
      side = 1;
    } else {
      if (s - low < fractionTolerance) return s;
      low = s;
      fLow = value;
      if (side === -1) fHigh /= 2;
      side = -1;
    }
  }
  return (low + high) / 2;
}

/** Exact chi2 with its scale and its slope at t. */
interface ExactPoint extends CurvePoint {
  readonly chi2: number;
}

function exactAt(table: LevelTable, evaluator: Evaluator, targets: readonly Target[], symmetric: boolean, t: number): ExactPoint {
  const { delta, racahB, racahC } = pointOnCurve(t, table.ratio);
  evaluator.evaluate(delta, racahB, racahC);
  const { rho, chi2 } = bestScale(targets, evaluator.energy, symmetric);
  const slopes = Float64Array.from(targets, (_, k) => slopeAt(t, table.ratio, evaluator.delta[k]!, evaluator.racahB[k]!, evaluator.racahC[k]!));
  return { rho, chi2, slope: misfitSlope(targets, evaluator.energy, slopes, rho) };
}

/** A step shorter than this changes nothing but rounding after it: the curvature is known to a thousandth. */
const lastStep = 1e-13;

/** Exact refinement from an interpolated minimum: Newton steps, with the curvature of the interpolant and then of the secant. */
function correct(
  table: LevelTable, evaluator: Evaluator, ground: string, targets: readonly Target[], symmetric: boolean, start: number, interpolated: number,
): Minimum | null {
  let t = start;
  let here = exactAt(table, evaluator, targets, symmetric, t);
  let curvature = interpolated;
  for (let step = 0; step < 8; step++) {
    if (!(here.rho > 0)) return null;
    const move = curvature > 0 ? -here.slope / curvature : 0;
    // The interpolant is good to 1e-9 of the scale, so a step is tiny; a long one means a flat, undetermined curve.
    if (Math.abs(move) > table.step || Math.abs(move) < 1e-14) break;
    const next = exactAt(table, evaluator, targets, symmetric, t + move);
    if (Math.abs(next.slope) >= Math.abs(here.slope)) break;
    const secant = (next.slope - here.slope) / move;
    if (secant > 0) curvature = secant;
    t += move;
    here = next;
    if (Math.abs(move) < lastStep) break;
  }
  return here.rho > 0 ? { t, rho: here.rho, chi2: here.chi2, ground } : null;
}

/** Whether the branch's ground level is the lowest of its multiplicity at t (a crossing may lie within the cell). */
function isLowest(table: LevelTable, ion: GroundCase, ground: string, t: number): boolean {
  const segments = groundSegments(table, ion.multiplicity);
  if (segments.length === 1) return true;
  const others = [...new Set(segments.map((segment) => segment.ground))];
  const [own, ...rest] = table.exact([ground, ...others], t);
  return rest.every((level) => own!.energy <= level.energy + 1e-12);
}
