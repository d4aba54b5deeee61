import { quantile, seededRandom } from './random.ts';
import type { SeriesResult } from './types.ts';

/** One complex in the plane of Delta and beta, with its error ellipse. */
export interface PlanePoint {
  readonly result: SeriesResult;
  readonly delta: number;
  readonly beta: number;
  readonly uDelta: number;
  readonly uBeta: number;
  /** Correlation of the two within the one fit. */
  readonly correlation: number;
}

/** Delta against beta over some complexes, and what the estimator alone would show. */
export interface PlaneCorrelation {
  readonly points: readonly PlanePoint[];
  /** Pearson's r. */
  readonly r: number;
  /** 95 % limits by R. A. Fisher's z, Metron 1, 3 (1921); null below four points. */
  readonly interval: { readonly low: number; readonly high: number } | null;
  /** Smallest and largest r with one complex taken out; null below four points. */
  readonly leaveOneOut: { readonly low: number; readonly high: number } | null;
  /** Where 95 of 100 r lie when beta is the same for all and only the fits' own errors move it. */
  readonly nullBand: { readonly low: number; readonly high: number };
  /** true where r lies inside the null band: the fits' errors alone would show as much. */
  readonly withinNull: boolean;
}

/** Members with both numbers and their correlation. */
export function planePoints(members: readonly SeriesResult[]): readonly PlanePoint[] {
  return members.flatMap((result) => {
    const { Delta, beta } = result.parameters;
    if (Delta.value === null || beta.value === null || Delta.uTotal === null || beta.uTotal === null || result.correlation === null) return [];
    return [{ result, delta: Delta.value, beta: beta.value, uDelta: Delta.uTotal, uBeta: beta.uTotal, correlation: result.correlation }];
  });
}

/**
 * Correlation of Delta with beta over a series. The null band refits every complex's bands, drawn anew at its own Delta and at the one
 * weighted mean beta; to first order that moves Delta and beta by their covariance, which is what is drawn here. The Delta from which
 * is drawn are first drawn together, so that with their errors anew they spread as the fitted ones do.
 *
 * @returns null below three points or where one of the two does not vary: there is no correlation to speak of
 */
export function planeCorrelation(members: readonly SeriesResult[], resampling: { readonly seed: number; readonly draws: number }): PlaneCorrelation | null {
  const points = planePoints(members);
  const r = pearson(points.map(({ delta }) => delta), points.map(({ beta }) => beta));
  if (points.length < 3 || r === null) return null;
  const weights = points.map(({ uBeta }) => 1 / uBeta ** 2);
  const mean = points.reduce((sum, { beta }, i) => sum + weights[i]! * beta, 0) / weights.reduce((a, b) => a + b);
  const trueDeltas = withoutNoise(points);
  const random = seededRandom(resampling.seed);
  const drawn: number[] = [];
  for (let i = 0; i < resampling.draws; i++) {
    const sample = points.map(({ uDelta, uBeta, correlation }, place) => {
      const [a, b] = [random.normal(), random.normal()];
      return [trueDeltas[place]! + uDelta * a, mean + uBeta * (correlation * a + Math.sqrt(Math.max(0, 1 - correlation ** 2)) * b)] as const;
    });
    drawn.push(pearson(sample.map(([x]) => x), sample.map(([, y]) => y)) ?? 0);
  }
  drawn.sort((a, b) => a - b);
  const nullBand = { low: quantile(drawn, 0.025), high: quantile(drawn, 0.975) };
  const enough = points.length >= 4;
  return {
    points, r, interval: enough ? fisherInterval(r, points.length) : null, leaveOneOut: enough ? leaveOneOutRange(points) : null,
    nullBand, withinNull: r >= nullBand.low && r <= nullBand.high,
  };
}

/** Every Delta moved towards their mean by so much as their uncertainties widen the spread. */
function withoutNoise(points: readonly PlanePoint[]): readonly number[] {
  const mean = points.reduce((sum, { delta }) => sum + delta, 0) / points.length;
  const spread = points.reduce((sum, { delta }) => sum + (delta - mean) ** 2, 0);
  const noise = points.reduce((sum, { uDelta }) => sum + uDelta ** 2, 0);
  const share = Math.sqrt(Math.max(0, 1 - noise / spread));
  return points.map(({ delta }) => mean + share * (delta - mean));
}

/** Pearson's r; null for fewer than two points or where a list does not vary. */
export function pearson(x: readonly number[], y: readonly number[]): number | null {
  if (x.length !== y.length) throw new RangeError(`y: ${y.length} values for ${x.length} of x`);
  const mean = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0) / list.length;
  const [mx, my] = [mean(x), mean(y)];
  let [xx, yy, xy] = [0, 0, 0];
  x.forEach((value, i) => {
    const [dx, dy] = [value - mx, y[i]! - my];
    xx += dx * dx;
    yy += dy * dy;
    xy += dx * dy;
  });
  return xx > 0 && yy > 0 ? Math.max(-1, Math.min(1, xy / Math.sqrt(xx * yy))) : null;
}

function fisherInterval(r: number, n: number): { readonly low: number; readonly high: number } {
  const z = Math.atanh(Math.max(-1 + 1e-15, Math.min(1 - 1e-15, r)));
  const half = 1.959964 / Math.sqrt(n - 3);
  return { low: Math.tanh(z - half), high: Math.tanh(z + half) };
}

function leaveOneOutRange(points: readonly PlanePoint[]): { readonly low: number; readonly high: number } | null {
  const each = points.flatMap((out) => {
    const rest = points.filter((one) => one !== out);
    return pearson(rest.map(({ delta }) => delta), rest.map(({ beta }) => beta)) ?? [];
  });
  return each.length === 0 ? null : { low: Math.min(...each), high: Math.max(...each) };
}
