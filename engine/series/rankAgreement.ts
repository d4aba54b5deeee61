import { quantile, seededRandom } from './random.ts';

/** A number with one standard uncertainty; 0 where it is taken as exact. */
export interface Ranked {
  readonly value: number;
  readonly u: number;
}

/**
 * Kendall's tau-b of two lists: (concordant - discordant pairs)/sqrt((n0 - ties in x)(n0 - ties in y)), n0 = n(n - 1)/2
 * (M. G. Kendall, Rank Correlation Methods (1948)). From -1 to 1.
 *
 * @returns null for fewer than two pairs and where one list is all ties: there is no order to agree with
 * @throws RangeError where the lists differ in length
 */
export function kendallTauB(x: readonly number[], y: readonly number[]): number | null {
  if (x.length !== y.length) throw new RangeError(`y: ${y.length} values for ${x.length} of x`);
  let [score, tiesX, tiesY] = [0, 0, 0];
  for (let i = 0; i < x.length; i++)
    for (let j = i + 1; j < x.length; j++) {
      const [dx, dy] = [Math.sign(x[i]! - x[j]!), Math.sign(y[i]! - y[j]!)];
      score += dx * dy;
      if (dx === 0) tiesX++;
      if (dy === 0) tiesY++;
    }
  const pairs = (x.length * (x.length - 1)) / 2;
  const scale = Math.sqrt((pairs - tiesX) * (pairs - tiesY));
  return scale > 0 ? score / scale : null;
}

export interface RankAgreement {
  readonly tau: number;
  /** Limits between which 95 of 100 resampled orders lie. */
  readonly low: number;
  readonly high: number;
  readonly pairs: number;
}

/**
 * Agreement of two orders by Kendall's tau-b, with the interval that their uncertainties leave: both lists are drawn anew within u.
 *
 * @returns null for fewer than two pairs and where one list is all ties
 */
export function rankAgreement(pairs: readonly (readonly [Ranked, Ranked])[], resampling: { readonly seed: number; readonly draws: number }): RankAgreement | null {
  const tau = kendallTauB(pairs.map(([a]) => a.value), pairs.map(([, b]) => b.value));
  if (tau === null) return null;
  const random = seededRandom(resampling.seed);
  const draw = (one: Ranked): number => one.value + (one.u > 0 ? one.u * random.normal() : 0);
  const drawn: number[] = [];
  for (let i = 0; i < resampling.draws; i++) {
    const sample = pairs.map(([a, b]) => [draw(a), draw(b)] as const);
    drawn.push(kendallTauB(sample.map(([a]) => a), sample.map(([, b]) => b)) ?? tau);
  }
  drawn.sort((a, b) => a - b);
  const limits = drawn.length === 0 ? [tau, tau] : [quantile(drawn, 0.025), quantile(drawn, 0.975)];
  return { tau, low: limits[0]!, high: limits[1]!, pairs: pairs.length };
}
