import { bestScale, misfitSlope, pointOfCurve } from './misfit.ts';
import type { Columns } from './misfit.ts';
import { curvatureInCell, curveOf, rootOfRising, slopeInCell, turningCells } from './curve.ts';
import type { Curve } from './curve.ts';
import type { Minimum } from './scan.ts';
import { segmentsOf } from './segments.ts';
import type { LevelTable } from './table.ts';
import type { GroundCase } from './transitions.ts';

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
  for (const segment of segmentsOf(table, ion.multiplicity, labels)) {
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
