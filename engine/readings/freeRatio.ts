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
const ratioStep = 1;

/**
 * All local minima of chi2 in Delta, B and C with C/B strictly inside 2 to 9, ascending in chi2.
 *
 * The curve is scanned at eight values of C/B; every minimum that no neighbour at the next C/B undercuts
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

/** chi2 with the normal equations of one Gauss-Newton step, parameters scaled by their own values. */
interface Here {
  readonly chi2: number;
  readonly normal: number[][];
  readonly right: number[];
}

function linearise(ion: GroundCase, ground: string, labels: readonly string[], targets: readonly Target[], at: readonly [number, number, number]): Here {
  const transitions = transitionsAt(ion, ground, labels, { delta: at[0], racahB: at[1], racahC: at[2] });
  let chi2 = 0;
  let dd = 0;
  let db = 0;
  let dc = 0;
  let bb = 0;
  let bc = 0;
  let cc = 0;
  let rd = 0;
  let rb = 0;
  let rc = 0;
  for (let k = 0; k < transitions.length; k++) {
    const { energy, gradient } = transitions[k]!;
    const target = targets[k]!;
    const weight = weightAt(target, energy);
    const residual = target.observed - energy;
    chi2 += weight * residual * residual;
    const d = gradient.delta * at[0];
    const b = gradient.racahB * at[1];
    const c = gradient.racahC * at[2];
    dd += weight * d * d;
    db += weight * d * b;
    dc += weight * d * c;
    bb += weight * b * b;
    bc += weight * b * c;
    cc += weight * c * c;
    rd += weight * d * residual;
    rb += weight * b * residual;
    rc += weight * c * residual;
  }
  return { chi2, normal: [[dd, db, dc], [db, bb, bc], [dc, bc, cc]], right: [rd, rb, rc] };
}

/** A relative step below this moves nothing that could be measured; a fit with large residuals creeps to it slowly. */
const smallestStep = 1e-12;

/** Levenberg's damped Gauss-Newton from one start; null where it leaves the allowed region. */
function descend(ion: GroundCase, ground: string, labels: readonly string[], targets: readonly Target[], start: FieldParameters): FreeMinimum | null {
  let at: readonly [number, number, number] = [start.delta, start.racahB, start.racahC];
  let here = linearise(ion, ground, labels, targets, at);
  let damping = 1e-8;
  for (let step = 0, refused = 0; step < 100 && refused < 10; step++) {
    const { normal, right } = here;
    const size = Math.max(normal[0]![0]!, normal[1]![1]!, normal[2]![2]!);
    const damped = normal.map((row, i) => row.map((value, j) => (i === j ? value + damping * size : value)));
    const move = solvePositive(damped, right);
    if (!move) return null;
    const next: readonly [number, number, number] = [at[0] * (1 + move[0]!), at[1] * (1 + move[1]!), at[2] * (1 + move[2]!)];
    const length = Math.max(Math.abs(move[0]!), Math.abs(move[1]!), Math.abs(move[2]!));
    if (next[0] > 0 && next[1] > 0 && next[2] > 0) {
      const there = linearise(ion, ground, labels, targets, next);
      if (there.chi2 <= here.chi2) {
        at = next;
        here = there;
        refused = 0;
        damping = Math.max(1e-15, damping / 10);
        if (length < smallestStep) break;
        continue;
      }
      // At the bottom rounding alone decides which of two points is lower.
      if (length < 1e-9) break;
    }
    damping = Math.max(damping, 1e-12) * 10;
    refused++;
  }
  const [delta, racahB, racahC] = at;
  if (!(racahC > lowestRatio * racahB && racahC < highestRatio * racahB)) return null;
  return { at: { delta, racahB, racahC }, chi2: here.chi2, ground };
}
