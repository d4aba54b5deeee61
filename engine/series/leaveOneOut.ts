import type { ScatterFit } from './scatter.ts';
import { effectiveDegrees } from './student.ts';

/** A complex at 1 - leverage below this decides its own fitted value: nothing is left to predict it from. */
export const fullLeverage = 1e-8;

/** Residual scatter and variance factor once one complex is taken out. */
export interface WithoutOne {
  /** Residual scatter s without the complex. */
  readonly scatter: number;
  /** What the variances of the factors are multiplied by. */
  readonly factor: number;
  readonly degrees: number | null;
}

/**
 * How the scatter falls when one complex is taken out, without fitting anew: its weighted squares, r^2 w/(1 - h), leave the sum and one
 * degree of freedom goes with them (R. D. Cook and S. Weisberg, Residuals and Influence in Regression (1982), section 2.2). Exact where
 * all uncertainties are equal. Without it a single outlier would hide in the scatter that it makes.
 *
 * @param squares r^2 w/(1 - h) of the complex
 */
export function scatterWithout(fit: ScatterFit, squares: number): WithoutOne {
  const { value, standing, spare } = fit.scatter;
  if (standing === 'assumed' || value === 0 || spare < 2) return { scatter: value, factor: 1, degrees: null };
  const mean = fit.meanVariance;
  const own = Math.max(0, mean - value ** 2);
  const remaining = Math.max(0, fit.chi2 - squares) / (spare - 1);
  const scatter = Math.sqrt(Math.max(0, remaining * mean - own));
  const left = own + scatter ** 2;
  return { scatter, factor: left / mean, degrees: left > 0 ? effectiveDegrees(scatter ** 2 / left, spare - 1) : null };
}
