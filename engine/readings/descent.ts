import type { FieldParameters } from '../levels/levels.ts';
import { solveThree } from '../linear/solveSymmetric.ts';
import type { SymmetricThree } from '../linear/solveSymmetric.ts';
import type { Evaluator } from './evaluate.ts';
import { weightAt } from './misfit.ts';
import type { Target } from './misfit.ts';

/** Where a descent ended. */
export interface Bottom {
  readonly at: FieldParameters;
  readonly chi2: number;
}

/** chi2 at a point with half its first and second derivatives by the logarithms of Delta, B and C. */
interface Here {
  chi2: number;
  /** Downhill. */
  readonly fall: [number, number, number];
  /** Second derivatives without what the bending of the levels adds: never negative along any direction. */
  readonly gaussNewton: SymmetricThree;
  /** Second derivatives. */
  readonly curvature: SymmetricThree;
}

const emptyPoint = (): Here => ({ chi2: 0, fall: [0, 0, 0], gaussNewton: [0, 0, 0, 0, 0, 0], curvature: [0, 0, 0, 0, 0, 0] });

type Place = [number, number, number];

function evaluateAt(evaluator: Evaluator, targets: readonly Target[], [delta, racahB, racahC]: Place, into: Here): void {
  evaluator.evaluate(delta, racahB, racahC);
  const { energy, bends } = evaluator;
  const { fall, gaussNewton: square, curvature } = into;
  into.chi2 = 0;
  fall.fill(0);
  square.fill(0);
  const bent: SymmetricThree = [0, 0, 0, 0, 0, 0];
  for (let k = 0; k < targets.length; k++) {
    const target = targets[k]!;
    const weight = weightAt(target, energy[k]!);
    const residual = target.observed - energy[k]!;
    const d = evaluator.delta[k]! * delta;
    const b = evaluator.racahB[k]! * racahB;
    const c = evaluator.racahC[k]! * racahC;
    const pull = weight * residual;
    into.chi2 += pull * residual;
    fall[0] += pull * d;
    fall[1] += pull * b;
    fall[2] += pull * c;
    square[0] += weight * d * d;
    square[1] += weight * d * b;
    square[2] += weight * d * c;
    square[3] += weight * b * b;
    square[4] += weight * b * c;
    square[5] += weight * c * c;
    const bend = bends[k]!;
    bent[0] += pull * bend.fieldField;
    bent[1] += pull * bend.fieldB;
    bent[2] += pull * bend.fieldC;
    bent[3] += pull * bend.bB;
    bent[4] += pull * bend.bC;
    bent[5] += pull * bend.cC;
  }
  curvature[0] = square[0] - bent[0] * delta * delta;
  curvature[1] = square[1] - bent[1] * delta * racahB;
  curvature[2] = square[2] - bent[2] * delta * racahC;
  curvature[3] = square[3] - bent[3] * racahB * racahB;
  curvature[4] = square[4] - bent[4] * racahB * racahC;
  curvature[5] = square[5] - bent[5] * racahC * racahC;
}

/** After a Newton step this small the next one would be below rounding: convergence is quadratic. */
const lastStep = 1e-8;

/** A longer step leaves what the derivatives know of the curve. */
const longestStep = 0.5;

const stepsAtMost = 100;

/** Damping starts here where an undamped step does not go down; less than this changes nothing. */
const leastDamping = 1e-13;

/**
 * The local minimum of chi2 in Delta, B and C below a start: Newton's method, damped as Levenberg and Marquardt damp
 * the Gauss-Newton method wherever a step would not go down (K. Levenberg, Quart. Appl. Math. 2, 164 (1944);
 * D. W. Marquardt, J. SIAM 11, 431 (1963)). All three stay positive.
 *
 * @param evaluator the transitions of the targets, with second derivatives
 * @param isLost where no way leads back from: the descent is given up there
 * @returns null where no minimum is reached
 */
export function descend(evaluator: Evaluator, targets: readonly Target[], start: FieldParameters, isLost: (delta: number, racahB: number, racahC: number) => boolean): Bottom | null {
  let at: Place = [start.delta, start.racahB, start.racahC];
  let here = emptyPoint();
  let there = emptyPoint();
  const move: Place = [0, 0, 0];
  evaluateAt(evaluator, targets, at, here);
  let damping = 0;
  let growth = 10;
  for (let step = 0; step < stepsAtMost; step++) {
    const size = Math.max(here.gaussNewton[0], here.gaussNewton[3], here.gaussNewton[5]);
    const newton = solveThree(here.curvature, damping * size, here.fall, move);
    if (!newton && !solveThree(here.gaussNewton, Math.max(damping, 1e-8) * size, here.fall, move)) return null;
    const length = Math.max(Math.abs(move[0]), Math.abs(move[1]), Math.abs(move[2]));
    const shortened = length > longestStep ? longestStep / length : 1;
    const next: Place = [at[0] * (1 + shortened * move[0]), at[1] * (1 + shortened * move[1]), at[2] * (1 + shortened * move[2])];
    evaluateAt(evaluator, targets, next, there);
    // At the bottom rounding alone decides which of two points is lower.
    const atBottom = newton && damping === 0 && length < lastStep;
    if (there.chi2 <= here.chi2 || atBottom) {
      at = next;
      [here, there] = [there, here];
      if (atBottom) break;
      if (isLost(at[0], at[1], at[2])) return null;
      damping = damping <= leastDamping ? 0 : damping / 10;
      growth = 10;
    } else if (length < lastStep) break;
    else {
      damping = Math.max(damping, leastDamping) * growth;
      growth *= 10;
    }
  }
  const [delta, racahB, racahC] = at;
  return { at: { delta, racahB, racahC }, chi2: here.chi2 };
}
