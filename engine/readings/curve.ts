import { pointOfCurve } from './misfit.ts';
import type { Columns, CurvePoint } from './misfit.ts';
import type { Segment } from './segments.ts';
import type { GridLevel, LevelTable } from './table.ts';

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
export interface Curve {
  /** Distance of grid points. */
  readonly step: number;
  readonly transitions: readonly GridLevel[];
  readonly columns: Columns;
  /** Transition energies and slopes at the last point asked for, and what came of them. */
  readonly energies: Float64Array;
  readonly slopes: Float64Array;
  readonly point: CurvePoint;
}

export function curveOf(table: LevelTable, ground: string, labels: readonly string[], columns: Columns): Curve {
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

/** d chi2/dt at fraction s of the cell above grid point i, whatever the sign of the scale. */
export function slopeInCell(curve: Curve, i: number, s: number): number {
  pointInCell(curve, i, s);
  return curve.point.slope;
}

/** Energies, slopes and the best scale at fraction s of the cell above grid point i. */
function pointInCell({ step, transitions, columns, energies, slopes, point }: Curve, i: number, s: number): void {
  const out: [number, number] = [0, 0];
  for (let k = 0; k < transitions.length; k++) {
    const { energy, slope } = transitions[k]!;
    interpolate(energy, slope, i, s, step, out);
    energies[k] = out[0];
    slopes[k] = out[1];
  }
  pointOfCurve(columns, energies, slopes, point);
}

/** A stretch of one grid cell over which d chi2/dt turns from falling to rising: fractions of the cell, and the slopes there. */
export interface Turn {
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
 * a turn, the interpolant is sampled. Where the ground level changes a transition goes through zero, and the ratios of the
 * transitions run through all values within a part of a cell: there the cell is cut by ratios instead.
 */
export function turningCells(curve: Curve, { first: start, last: end, crossings }: Segment): Turn[] {
  const found: Turn[] = [];
  let earlier = Number.POSITIVE_INFINITY;
  let before = slopeOnGrid(curve, start);
  let after = start < end ? slopeOnGrid(curve, start + 1) : Number.NaN;
  for (let i = start; i < end; i++) {
    const later = i + 2 <= end ? slopeOnGrid(curve, i + 2) : Number.POSITIVE_INFINITY;
    const turns = before <= 0 && after > 0 && !(before === 0 && i === start);
    const nearsZero = Math.abs(before) <= Math.abs(earlier) && Math.abs(after) <= Math.abs(later) && before * after > 0;
    if (crossings.includes(i)) addTurnsByRatios(curve, i, found);
    else if (turns || nearsZero) addTurns(curve, i, before, after, found);
    earlier = before;
    before = after;
    after = later;
  }
  return found;
}

/** Ratios of the transitions turn by no more than this between two points of a cell that are compared, rad. */
const turnAtMost = 0.05;
/** A stretch this short, as a fraction of a cell, is not cut again: the interpolant is no truer. */
const shortest = 1e-9;

/** A point of a cell: its fraction, d chi2/dt there (NaN where no positive scale is best) and the direction of energy over observed position. */
interface Cut {
  readonly s: number;
  readonly slope: number;
  readonly direction: Float64Array;
}

function cutAt(curve: Curve, cell: number, s: number): Cut {
  pointInCell(curve, cell, s);
  const { energies, columns: { observed }, point } = curve;
  const direction = energies.map((energy, k) => energy / observed[k]!);
  const length = Math.hypot(...direction);
  return { s, slope: point.rho > 0 ? point.slope : Number.NaN, direction: direction.map((part) => part / length) };
}

function addTurnsByRatios(curve: Curve, cell: number, found: Turn[]): void {
  const between = (low: Cut, high: Cut): void => {
    const cosine = low.direction.reduce((sum, part, k) => sum + part * high.direction[k]!, 0);
    if (high.s - low.s > shortest && !(cosine > Math.cos(turnAtMost))) {
      const middle = cutAt(curve, cell, (low.s + high.s) / 2);
      between(low, middle);
      between(middle, high);
    } else if (low.slope <= 0 && high.slope > 0) found.push({ cell, low: low.s, high: high.s, atLow: low.slope, atHigh: high.slope });
  };
  const cuts = Array.from({ length: insideSamples + 1 }, (_, n) => cutAt(curve, cell, n / insideSamples));
  for (let n = 0; n < insideSamples; n++) between(cuts[n]!, cuts[n + 1]!);
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

/** d2 chi2/dt2 of the interpolant. */
export const curvatureInCell = (curve: Curve, i: number, s: number): number =>
  (slopeInCell(curve, i, s + nearby) - slopeInCell(curve, i, s - nearby)) / (2 * nearby * curve.step);

/** Fraction of a cell over which the curvature is taken. */
const nearby = 1e-3;

/** Fraction of a cell to which the interpolant is solved: it is no truer than this. */
const fractionTolerance = 1e-7;

/** Root of a function that is not positive at the low end of a stretch and positive at its high end (regula falsi, Illinois variant). */
export function rootOfRising(f: (s: number) => number, stretch: Turn): number {
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
