import type { FieldParameters } from '../levels/levels.ts';
import { solvePositive } from '../linear/solveSymmetric.ts';
import { transitionsAt } from './evaluate.ts';
import { weightAt } from './misfit.ts';
import type { Target } from './misfit.ts';
import { minimaOnCurve } from './scan.ts';
import type { Minimum } from './scan.ts';
import { levelTable, pointOnCurve } from './table.ts';
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

/**
 * All local minima of chi2 in Delta, B and C with C/B strictly inside 2 to 9, ascending in chi2.
 *
 * The curve is scanned at fifteen values of C/B; every minimum that no neighbour at the next C/B undercuts
 * starts a damped Gauss-Newton descent with exact derivatives.
 */
export function minimaWithFreeRatio(ion: GroundCase, labels: readonly string[], targets: readonly Target[]): FreeMinimum[] {
  const rows: { ratio: number; minima: Minimum[] }[] = [];
  for (let ratio = lowestRatio; ratio <= highestRatio; ratio += ratioStep)
    rows.push({ ratio, minima: minimaOnCurve(levelTable(ion, ratio), ion, labels, targets, 'grid') });
  const near = 0.06;
  const undercut = (minimum: Minimum, row: { minima: Minimum[] } | undefined): boolean =>
    row?.minima.some((other) => Math.abs(other.t - minimum.t) < near && other.ground === minimum.ground && other.chi2 < minimum.chi2) ?? false;
  const found: FreeMinimum[] = [];
  rows.forEach(({ ratio, minima }, i) => {
    for (const minimum of minima) {
      if (undercut(minimum, rows[i - 1]) || undercut(minimum, rows[i + 1])) continue;
      const unit = pointOnCurve(minimum.t, ratio);
      const start = { delta: unit.delta * minimum.rho, racahB: unit.racahB * minimum.rho, racahC: unit.racahC * minimum.rho };
      const end = descend(ion, minimum.ground, labels, targets, start);
      if (end && !found.some((other) => isSame(other, end))) found.push(end);
    }
  });
  return found.sort((a, b) => a.chi2 - b.chi2);
}

function isSame(a: FreeMinimum, b: FreeMinimum): boolean {
  const close = (x: number, y: number): boolean => Math.abs(x - y) <= 1e-6 * Math.max(Math.abs(x), Math.abs(y));
  return a.ground === b.ground && close(a.at.delta, b.at.delta) && close(a.at.racahB, b.at.racahB) && close(a.at.racahC, b.at.racahC);
}

function misfit(ion: GroundCase, ground: string, labels: readonly string[], targets: readonly Target[], at: FieldParameters) {
  const transitions = transitionsAt(ion, ground, labels, at);
  let chi2 = 0;
  const rows = transitions.map(({ energy, gradient }, k) => {
    const target = targets[k]!;
    const weight = weightAt(target, energy);
    const residual = target.observed - energy;
    chi2 += weight * residual ** 2;
    return { weight, residual, slopes: [gradient.delta, gradient.racahB, gradient.racahC] as const };
  });
  return { chi2, rows };
}

/** Levenberg's damped Gauss-Newton from one start; null where it leaves the allowed region. */
function descend(ion: GroundCase, ground: string, labels: readonly string[], targets: readonly Target[], start: FieldParameters): FreeMinimum | null {
  let at = [start.delta, start.racahB, start.racahC] as const;
  const named = (p: readonly number[]): FieldParameters => ({ delta: p[0]!, racahB: p[1]!, racahC: p[2]! });
  const allowed = (p: readonly number[]): boolean => p[0]! > 0 && p[1]! > 0 && p[2]! > lowestRatio * p[1]! && p[2]! < highestRatio * p[1]!;
  let here = misfit(ion, ground, labels, targets, start);
  let damping = 1e-6;
  let stuck = 0;
  for (let step = 0; step < 200 && stuck < 12; step++) {
    const normal = [0, 1, 2].map((i) => [0, 1, 2].map((j) => here.rows.reduce((sum, row) => sum + row.weight * row.slopes[i]! * row.slopes[j]! * at[i]! * at[j]!, 0)));
    const right = [0, 1, 2].map((i) => here.rows.reduce((sum, row) => sum + row.weight * row.slopes[i]! * at[i]! * row.residual, 0));
    const size = Math.max(normal[0]![0]!, normal[1]![1]!, normal[2]![2]!);
    for (let i = 0; i < 3; i++) normal[i]![i]! += damping * size;
    // Parameters are scaled by their own values, so a step is a relative change.
    const move = solvePositive(normal, right);
    if (!move) return null;
    const next = at.map((p, i) => p * (1 + move[i]!)) as unknown as readonly [number, number, number];
    if (next.every((p) => p > 0)) {
      const there = misfit(ion, ground, labels, targets, named(next));
      if (there.chi2 <= here.chi2) {
        const small = Math.max(...move.map(Math.abs)) < 1e-13;
        at = next;
        here = there;
        damping = Math.max(1e-15, damping / 10);
        stuck = small ? stuck + 6 : 0;
        continue;
      }
    }
    damping = Math.max(damping, 1e-12) * 10;
    stuck++;
  }
  return allowed(at) ? { at: named(at), chi2: here.chi2, ground } : null;
}
