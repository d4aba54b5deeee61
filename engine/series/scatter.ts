import { solveIsland } from './normalEquations.ts';
import type { IslandData } from './normalEquations.ts';
import type { FactorScatter } from './factorTypes.ts';
import type { SeriesParameter } from './types.ts';

/** Fewer spare complexes than this say too little of their scatter. */
export const spareForScatter = 4;

/**
 * Scatter taken where it cannot be estimated: of ln Delta, and of beta. The printed f and g miss published Delta by up to 5 %, root mean
 * square about 3 % (computed); 0.03 in beta is common practice, no source.
 */
export const assumedScatter: Readonly<Record<SeriesParameter, number>> = { Delta: 0.03, beta: 0.03 };

/** One island's data with the uncertainty of each complex in the scale of the model. */
export interface WeighedIsland {
  readonly data: IslandData;
  readonly u: Float64Array;
}

export interface ScatterFit {
  readonly scatter: FactorScatter;
  /** Unknowns by island. */
  readonly unknowns: readonly Float64Array[];
  /** Weights by island: 1/(u^2 + s^2). */
  readonly weights: readonly Float64Array[];
  /** Sum of weighted squares over all islands. */
  readonly chi2: number;
  /** Harmonic mean of the complexes' variances u^2 + s^2. */
  readonly meanVariance: number;
}

/** No complex weighs more than one known to this. */
const smallestU = 1e-9;

const weightsAt = ({ u }: WeighedIsland, scatter: number): Float64Array => u.map((one) => 1 / (Math.max(one, smallestU) ** 2 + scatter ** 2));

/**
 * Factors and residual scatter s together: s is what makes the weighted squares add up to the number of spare complexes, and 0 where
 * they do not reach it (R. C. Paule and J. Mandel, J. Res. Natl. Bur. Stand. 87, 377 (1982), carried over to a fit). One s serves all
 * islands: it belongs to the rule.
 *
 * @param spare complexes beyond the unknowns that they fix, over all islands
 */
export function fitWithScatter(islands: readonly WeighedIsland[], start: readonly Float64Array[], parameter: SeriesParameter, spare: number): ScatterFit {
  let unknowns = start;
  const at = (scatter: number): ScatterFit => {
    const weights = islands.map((island) => weightsAt(island, scatter));
    const solved = islands.map((island, i) => solveIsland(island.data, weights[i]!, unknowns[i]!));
    unknowns = solved.map((one) => one.unknowns);
    const mean = harmonicMean(weights);
    return {
      scatter: { value: scatter, share: Math.min(1, scatter ** 2 / mean), standing: 'fitted', spare },
      unknowns, weights, chi2: solved.reduce((sum, one) => sum + one.chi2, 0), meanVariance: mean,
    };
  };
  if (spare < spareForScatter) {
    const fit = at(assumedScatter[parameter]);
    return { ...fit, scatter: { ...fit.scatter, standing: 'assumed' } };
  }
  const none = at(0);
  if (none.chi2 <= spare) return none;
  // chi2 falls with s^2. Each trial treats all variances as moving alike, which is exact for equal u; the bracket guards it.
  let [low, high] = [0, Number.POSITIVE_INFINITY];
  let fit = none;
  for (let trial = 0; trial < 60; trial++) {
    const scatter2 = fit.scatter.value ** 2;
    const mean = fit.meanVariance;
    let next = mean * (fit.chi2 / spare) - (mean - scatter2);
    if (!(next > low && next < high)) next = Number.isFinite(high) ? (low + high) / 2 : 2 * (mean + low);
    fit = at(Math.sqrt(next));
    if (Math.abs(fit.chi2 / spare - 1) < 1e-9) break;
    if (fit.chi2 > spare) low = next;
    else high = next;
  }
  return fit;
}

/** The reciprocal of the mean weight. */
function harmonicMean(weights: readonly Float64Array[]): number {
  if (weights.length === 0) return 1;
  let sum = 0;
  let count = 0;
  for (const island of weights)
    for (const weight of island) {
      sum += weight;
      count += 1;
    }
  return count / sum;
}
