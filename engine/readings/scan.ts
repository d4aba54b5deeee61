import { curvatureInCell, curveOf, rootOfRising, slopeInCell, turningCells } from './curve.ts';
import { evaluatorOf } from './evaluate.ts';
import type { Evaluator } from './evaluate.ts';
import { bestScale, columnsOf, misfitSlope } from './misfit.ts';
import type { CurvePoint, Target } from './misfit.ts';
import { groundSegments, segmentsOf } from './segments.ts';
import { pointOnCurve, slopeAt } from './table.ts';
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
  for (const segment of segmentsOf(table, ion.multiplicity, labels)) {
    const curve = curveOf(table, segment.ground, labels, columns);
    const cells = turningCells(curve, segment);
    if (cells.length === 0) continue;
    const evaluator = evaluatorOf(table.ion, segment.ground, labels);
    for (const turn of cells) {
      const i = turn.cell;
      const s = rootOfRising((fraction) => slopeInCell(curve, i, fraction), turn);
      const exact = correct(table, evaluator, segment.ground, targets, columns.weights !== null, (i + s) * table.step, curvatureInCell(curve, i, s));
      // The outermost cells are not scanned: a step that leads there leads to an end, which is no solution.
      if (exact && exact.t > table.step / 2 && exact.t < Math.PI / 2 - table.step / 2 && isLowest(table, ion, segment.ground, exact.t)) found.push(exact);
    }
  }
  return found.sort((a, b) => a.chi2 - b.chi2);
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
