import { groundLabel, levelNames } from '../levels/labels.ts';
import { bestScale, isSymmetric, misfitSlope } from './misfit.ts';
import type { Target } from './misfit.ts';
import { gridPoints, gridStep, levelPlace } from './table.ts';
import type { LevelTable } from './table.ts';
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
 * lowest everywhere; the doublets of d3 and d7 and the singlets of d4 change.
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
    // At the ends of the curve levels coincide; a difference of rounding is no crossing.
    for (let k = 0; k < levels.length; k++) if (levels[k]!.energy[i]! < levels[best]!.energy[i]! - 1e-9) best = k;
    return best;
  };
  const found: Segment[] = [];
  let first = 0;
  let current = at(1);
  for (let i = 2; i < gridPoints; i++) {
    const next = i === gridPoints - 1 ? current : at(i);
    if (next === current) continue;
    // Both neighbours cover the cell in which the crossing lies, so no minimum falls between them.
    found.push({ ground: lowest[current]!, first, last: i });
    first = i - 1;
    current = next;
  }
  found.push({ ground: lowest[current]!, first, last: gridPoints - 1 });
  byMultiplicity.set(multiplicity, found);
  return found;
}

/** Grid points passed over in a coarse scan: half a degree. */
const coarseStride = 2;

/** Cubic Hermite interpolation in one grid cell: value and derivative at fraction s. */
function interpolate(energy: Float64Array, slope: Float64Array, i: number, s: number, out: [number, number]): void {
  const y0 = energy[i]!;
  const y1 = energy[i + 1]!;
  const m0 = slope[i]! * gridStep;
  const m1 = slope[i + 1]! * gridStep;
  const c = 3 * (y1 - y0) - 2 * m0 - m1;
  const d = m0 + m1 - 2 * (y1 - y0);
  out[0] = y0 + s * (m0 + s * (c + s * d));
  out[1] = (m0 + s * (2 * c + s * 3 * d)) / gridStep;
}

/** Work space of one scan: transition energies and slopes at one t. */
interface Point {
  readonly energies: Float64Array;
  readonly slopes: Float64Array;
}

/**
 * All local minima of chi2 inside 0 < t < 90 degrees for transitions from the ground level, at the table's
 * C/B, ascending in chi2. Minima at an end of the curve are not solutions and are left out, as is every
 * point where the best scale is not positive.
 *
 * @param precision `exact`: to machine precision; `grid`: the better end of the bracketing cell, for starts
 *
 * On the grid the sign of the exact d chi2/dt brackets each minimum; inside the cell it is found on the
 * Hermite interpolant and then corrected by Newton steps on exact levels.
 */
export function minimaOnCurve(
  table: LevelTable, ion: GroundCase, labels: readonly string[], targets: readonly Target[], precision: 'exact' | 'grid' = 'exact',
): Minimum[] {
  const symmetric = isSymmetric(targets);
  const upper = labels.map((label) => table.grid(label));
  const count = labels.length;
  const point: Point = { energies: new Float64Array(count), slopes: new Float64Array(count) };
  const found: Minimum[] = [];
  for (const segment of groundSegments(table, ion.multiplicity)) {
    const lower = table.grid(segment.ground);
    const slopeOnGrid = (i: number): number => {
      for (let k = 0; k < count; k++) {
        point.energies[k] = upper[k]!.energy[i]! - lower.energy[i]!;
        point.slopes[k] = upper[k]!.slope[i]! - lower.slope[i]!;
      }
      const { rho } = bestScale(targets, point.energies, symmetric);
      return rho > 0 ? misfitSlope(targets, point.energies, point.slopes, rho) : Number.NaN;
    };
    const out: [number, number] = [0, 0];
    const slopeInCell = (i: number, s: number): number => {
      for (let k = 0; k < count; k++) {
        interpolate(upper[k]!.energy, upper[k]!.slope, i, s, out);
        const [energy, slope] = out;
        interpolate(lower.energy, lower.slope, i, s, out);
        point.energies[k] = energy - out[0];
        point.slopes[k] = slope - out[1];
      }
      const { rho } = bestScale(targets, point.energies, symmetric);
      return misfitSlope(targets, point.energies, point.slopes, rho);
    };
    const stride = precision === 'grid' ? coarseStride : 1;
    let before = slopeOnGrid(segment.first);
    for (let i = segment.first; i < segment.last; i += stride) {
      const next = Math.min(i + stride, segment.last);
      const after = slopeOnGrid(next);
      const bracketed = before <= 0 && after > 0 && !(before === 0 && i === segment.first);
      if (bracketed && precision === 'grid') {
        const nearer = -before < after ? i : next;
        slopeOnGrid(nearer);
        found.push({ t: nearer * gridStep, ...bestScale(targets, point.energies, symmetric), ground: segment.ground });
      } else if (bracketed) {
        const s = rootOfRising((fraction) => slopeInCell(i, fraction), before, after);
        const exact = correct(table, segment.ground, labels, targets, symmetric, (i + s) * gridStep);
        if (exact && isLowest(table, ion, segment.ground, exact.t)) found.push(exact);
      }
      before = after;
    }
  }
  return found.sort((a, b) => a.chi2 - b.chi2);
}

/** Root in (0, 1) of a function that is not positive at 0 and positive at 1 (regula falsi, Illinois variant). */
function rootOfRising(f: (s: number) => number, atZero: number, atOne: number): number {
  let low = 0;
  let high = 1;
  let fLow = atZero;
  let fHigh = atOne;
  let side = 0;
  for (let step = 0; step < 60; step++) {
    const s = (low * fHigh - high * fLow) / (fHigh - fLow);
    const value = f(s);
    if (value === 0 || high - low < 1e-13) return s;
    if (value > 0) {
      if (high - s < 1e-13) return s;
      high = s;
      fHigh = value;
      if (side === 1) fLow /= 2;
      side = 1;
    } else {
      if (s - low < 1e-13) return s;
      low = s;
      fLow = value;
      if (side === -1) fHigh /= 2;
      side = -1;
    }
  }
  return (low + high) / 2;
}

/** chi2 and its slope from exact levels at t. */
function exactAt(
  table: LevelTable, ground: string, labels: readonly string[], targets: readonly Target[], symmetric: boolean, t: number,
): { rho: number; chi2: number; slope: number; curvature: number } {
  const [lower, ...upper] = table.exact([ground, ...labels], t);
  const energies = upper.map((level) => level.energy - lower!.energy);
  const slopes = upper.map((level) => level.slope - lower!.slope);
  const { rho, chi2 } = bestScale(targets, energies, symmetric);
  return { rho, chi2, slope: misfitSlope(targets, energies, slopes, rho), curvature: gaussNewtonCurvature(targets, energies, slopes, rho) };
}

/** Second derivative of chi2 by t with rho eliminated, residual terms left out. */
function gaussNewtonCurvature(targets: readonly Target[], energies: readonly number[], slopes: readonly number[], rho: number): number {
  let tt = 0;
  let tr = 0;
  let rr = 0;
  for (let k = 0; k < targets.length; k++) {
    const weight = targets[k]!.observed > rho * energies[k]! ? targets[k]!.weightBelow : targets[k]!.weightAbove;
    tt += weight * (rho * slopes[k]!) ** 2;
    tr += weight * rho * slopes[k]! * energies[k]!;
    rr += weight * energies[k]! ** 2;
  }
  return 2 * (tt - (tr * tr) / rr);
}

/** Exact refinement from an interpolated minimum: Newton with a secant slope after the first step. */
function correct(
  table: LevelTable, ground: string, labels: readonly string[], targets: readonly Target[], symmetric: boolean, start: number,
): Minimum | null {
  let t = start;
  let here = exactAt(table, ground, labels, targets, symmetric, t);
  let curvature = here.curvature;
  for (let step = 0; step < 8; step++) {
    if (!(here.rho > 0)) return null;
    const move = curvature > 0 ? -here.slope / curvature : 0;
    // The interpolant is good to 1e-9 of the scale, so a step is tiny; a long one means a flat, undetermined curve.
    if (Math.abs(move) > gridStep || Math.abs(move) < 1e-14) break;
    const next = exactAt(table, ground, labels, targets, symmetric, t + move);
    if (Math.abs(next.slope) >= Math.abs(here.slope)) break;
    const secant = (next.slope - here.slope) / move;
    if (secant > 0) curvature = secant;
    t += move;
    here = next;
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
