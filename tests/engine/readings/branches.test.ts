import { describe, expect, test } from 'vitest';
import { minimaOnCurve } from '../../../engine/readings/scan.ts';
import { levelTable } from '../../../engine/readings/table.ts';
import type { BranchCase, Configuration } from './branchCases.ts';
import { branchCases, configurations, kinds } from './branchCases.ts';
import { cancellationAt, energyAt, fineCurve, finePieces, inOneValley, lowestAt, misfitAt, roundingOf, trialMinima, trialMisfits } from './bruteForce.ts';
import type { FineCurve } from './bruteForce.ts';

const long = process.env['BANDSTEAD_LONG'] === '1';
const count = long ? 5000 : 300;

/**
 * The last quarter of a degree at each end, Delta/B below 0.09 and above 4500, is no ligand field: nothing need be found
 * there. A minimum that is none must not be told there either: an end of the curve means that the bands have no solution.
 */
const outermost = finePieces / 360;

const work = new Float64Array(finePieces + 1);
const degrees = (t: number): string => `${((180 / Math.PI) * t).toFixed(4)} degrees (Delta/B ${(20 * Math.tan(t)).toFixed(3)})`;

interface Comparison {
  readonly faults: readonly string[];
  readonly minima: number;
}

/** Minima found by trial and not by the scan, and the other way round. */
function compare(curve: FineCurve, { kind, labels, targets }: BranchCase): Comparison {
  const found = minimaOnCurve(levelTable(curve.ion, curve.ratio), curve.ion, labels, targets);
  const roundingAt = (i: number): number => roundingOf(targets, cancellationAt(curve, labels, Math.round(i)));
  const faults: string[] = [];
  const story = `${kind}: ${labels.map((label, k) => `${label} ${targets[k]!.observed.toFixed(1)}(-${(targets[k]!.weightBelow ** -0.5).toFixed(0)}+${(targets[k]!.weightAbove ** -0.5).toFixed(0)})`).join(', ')}`;
  const least = 10 * roundingOf(targets);
  const tried = trialMinima(curve, trialMisfits(curve, labels, targets, work), least).filter((i) => i > outermost && i < finePieces - outermost);
  for (const i of tried) {
    // Two solutions with less than rounding between them are one to any trial.
    const own = found.find((minimum) => Math.abs(minimum.t - i * curve.step) < 2 * curve.step) ?? found.find((minimum) => inOneValley(work, i, Math.round(minimum.t / curve.step), least));
    if (!own) faults.push(`${story}\n    missed at ${degrees(i * curve.step)}, chi2 ${work[i]}`);
    else if (own.ground !== curve.lowestLabel(i)) faults.push(`${story}\n    ground ${own.ground} for ${curve.lowestLabel(i)} at ${degrees(own.t)}`);
    else if (own.chi2 > work[i]! + roundingAt(i)) faults.push(`${story}\n    chi2 ${own.chi2} above a tried ${work[i]} at ${degrees(own.t)}`);
  }
  found.forEach((minimum, n) => {
    const { t, ground } = minimum;
    const rounding = roundingAt(t / curve.step);
    const here = misfitAt(curve, ground, labels, targets, t);
    const where = `at ${degrees(t)}, chi2 ${minimum.chi2}`;
    if (!(t > 0 && t < Math.PI / 2 && minimum.rho > 0)) faults.push(`${story}\n    not inside the curve, ${where}`);
    if (Math.abs(here.chi2 - minimum.chi2) > rounding || Math.abs(here.rho / minimum.rho - 1) > 1e-9) faults.push(`${story}\n    another chi2 or scale when tried, ${where}`);
    const lower = [1e-5, 3e-5, -1e-5, -3e-5].find((away) => misfitAt(curve, ground, labels, targets, t + away).chi2 < minimum.chi2 - rounding);
    if (lower !== undefined) faults.push(`${story}\n    no minimum: lower ${lower} away, ${where}`);
    if (energyAt(curve, ground, t) > lowestAt(curve, t) + 1e-9) faults.push(`${story}\n    ${ground} is not the lowest level, ${where}`);
    if (n > 0 && minimum.chi2 < found[n - 1]!.chi2) faults.push(`${story}\n    not in order of chi2, ${where}`);
    if (found.some((other, m) => m < n && other.ground === ground && Math.abs(other.t - t) < 1e-9)) faults.push(`${story}\n    told twice, ${where}`);
  });
  return { faults, minima: tried.length };
}

function run(configuration: Configuration, seed: number): void {
  const curve = fineCurve(configuration.ion, configuration.ratio, configuration.labels);
  const comparisons = branchCases(configuration, curve, count, seed).map((one) => compare(curve, one));
  const faults = comparisons.flatMap((comparison) => comparison.faults);
  if (faults.length > 0) throw new Error(`${faults.length} faults in ${count} cases:\n${faults.slice(0, 12).join('\n')}`);
  // The cases are worth their time: most have a solution, and some have several.
  expect(comparisons.filter(({ minima }) => minima >= 1).length).toBeGreaterThan(count / 4);
  expect(new Set(comparisons.map(({ minima }) => minima)).size).toBeGreaterThan(1);
}

describe(`every minimum of chi2 that 100 000 trials find, and no other: ${count} cases a configuration (${kinds.join('; ')})`, () => {
  test.each(configurations.map((configuration, n) => [configuration.name, configuration, 100 + n] as const))('%s', (_, configuration, seed) => {
    run(configuration, seed);
  }, 600_000);
});
