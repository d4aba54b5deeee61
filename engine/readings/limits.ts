import type { Assigned, Fit } from './fitTypes.ts';
import { targetOf } from './fitTask.ts';
import { isBent, profileLimits } from './profile.ts';
import type { Limits, ProfileTask } from './profile.ts';
import type { GroundCase } from './transitions.ts';
import type { Parameter } from './types.ts';

/** Above this u/value limits always come from the profile. */
const looseFrom = 0.1;

/** The fit's own problem, for profiles; null where a profile has no meaning (one free parameter). */
export function profileTaskOf(ion: GroundCase, assigned: readonly Assigned[], fit: Fit): ProfileTask | null {
  if (fit.mode === 'field' || fit.mode === 'field, B assumed') return null;
  const used = assigned.map((_, k) => k).filter((k) => fit.used[k]);
  const { at, chi2, ground } = fit.solutions[0]!;
  return {
    ion, ground, labels: used.map((k) => assigned[k]!.label), targets: used.map((k) => targetOf(assigned[k]!.observation, fit.floors[k]!)),
    ratio: fit.mode === 'field, B, C' ? null : fit.ratio.value, at, chi2,
  };
}

/** Covariance of the varying parameters without what was assumed: what the profile at fixed C/B sees. */
function bandCovariance(fit: Fit): number[][] {
  const size = fit.mode === 'field, B, C' ? 3 : 2;
  return Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => fit.total[i]![j]! - fit.byRatio[i]! * fit.byRatio[j]! * fit.ratio.u ** 2));
}

/** Widens profile limits by the uncertainty of an assumed C/B, in quadrature on each side. */
function widened(limits: Limits, value: number, byRatio: number): Limits {
  return {
    low: value - Math.hypot(value - limits.low, byRatio),
    high: value + Math.hypot(limits.high - value, byRatio),
  };
}

/**
 * Sets limits from the chi2 profile on the published numbers whose uncertainty exceeds 10 % or whose curve
 * bends; the others stay parabolic and have none. Limits of beta follow those of B.
 */
export function withLimits(ion: GroundCase, assigned: readonly Assigned[], fit: Fit, parameters: readonly Parameter[]): readonly Parameter[] {
  const task = profileTaskOf(ion, assigned, fit);
  if (!task) return parameters;
  const covariance = bandCovariance(fit);
  const found = parameters.slice(0, 3).map((parameter, i): Limits | null => {
    if (parameter.value === null || i >= covariance.length) return null;
    const u = Math.sqrt(covariance[i]![i]!);
    if (!(u > 0) || (parameter.uTotal! / parameter.value <= looseFrom && !isBent(task, i, covariance))) return null;
    const limits = profileLimits(task, i, u, 1);
    return limits && widened(limits, parameter.value, fit.byRatio[i]! * fit.ratio.u);
  });
  const [, racahB] = parameters;
  return parameters.map((parameter, i) => {
    if (i < 3) return { ...parameter, limits: found[i]! };
    const limits = found[1];
    if (!limits || parameter.value === null || !racahB?.value) return parameter;
    const factor = parameter.value / racahB.value;
    return { ...parameter, limits: { low: limits.low * factor, high: limits.high * factor } };
  });
}
