/**
 * The best common scale rho of a set of transitions at one point of the curve, and the misfit there.
 *
 * chi2(rho) = sum w_k (nu_k - rho e_k)^2, where w_k = 1/(u^2 + tau^2) takes u towards lower wavenumber when
 * the calculated band lies below the observed one and u towards higher wavenumber when above. With equal
 * weights on both sides rho is a quotient of sums; otherwise chi2 is a convex, piecewise quadratic function
 * of rho and its minimum is found exactly, piece by piece.
 */
export interface Target {
  readonly observed: number;
  /** Weight while the calculated band lies below the observed one. */
  readonly weightBelow: number;
  /** Weight while it lies above. */
  readonly weightAbove: number;
}

export interface Scaled {
  readonly rho: number;
  readonly chi2: number;
}

export function isSymmetric(targets: readonly Target[]): boolean {
  return targets.every((target) => target.weightBelow === target.weightAbove);
}

/** Weight that applies at a calculated position. */
export function weightAt(target: Target, calculated: number): number {
  return calculated < target.observed ? target.weightBelow : target.weightAbove;
}

function misfitAt(targets: readonly Target[], energies: ArrayLike<number>, rho: number): number {
  let chi2 = 0;
  for (let k = 0; k < targets.length; k++) {
    const target = targets[k]!;
    const calculated = rho * energies[k]!;
    chi2 += weightAt(target, calculated) * (target.observed - calculated) ** 2;
  }
  return chi2;
}

/** Half the derivative of chi2 by rho: continuous and increasing. */
function halfSlope(targets: readonly Target[], energies: ArrayLike<number>, rho: number): number {
  let sum = 0;
  for (let k = 0; k < targets.length; k++) {
    const target = targets[k]!;
    const calculated = rho * energies[k]!;
    sum += weightAt(target, calculated) * (calculated - target.observed) * energies[k]!;
  }
  return sum;
}

function bestSymmetric(targets: readonly Target[], energies: ArrayLike<number>): Scaled {
  let squares = 0;
  let products = 0;
  for (let k = 0; k < targets.length; k++) {
    const { observed, weightBelow } = targets[k]!;
    const energy = energies[k]!;
    squares += weightBelow * energy * energy;
    products += weightBelow * energy * observed;
  }
  const rho = squares > 0 ? products / squares : 0;
  return { rho, chi2: misfitAt(targets, energies, rho) };
}

/** Steps in which the pieces are nearly always sorted out; a pair of pieces that send each other back and forth is left to the search. */
const stepsAtMost = 12;

/** Best rho for asymmetric weights, by steps from piece to piece: each to the minimum of the parabola that holds at the last rho. */
function bestAsymmetric(targets: readonly Target[], energies: ArrayLike<number>): Scaled {
  let rho = 0;
  for (let step = 0; step < stepsAtMost; step++) {
    let squares = 0;
    let products = 0;
    for (let k = 0; k < targets.length; k++) {
      const { observed, weightBelow, weightAbove } = targets[k]!;
      const energy = energies[k]!;
      const weighted = energy * (rho * energy < observed ? weightBelow : weightAbove);
      squares += weighted * energy;
      products += weighted * observed;
    }
    const next = squares > 0 ? products / squares : 0;
    if (Math.abs(next - rho) <= Number.EPSILON * Math.abs(next)) return { rho: next, chi2: misfitAt(targets, energies, next) };
    rho = next;
  }
  return bestByPieces(targets, energies);
}

/** Best rho for asymmetric weights: between two breakpoints chi2 is one parabola, so the minimum is closed form there. */
function bestByPieces(targets: readonly Target[], energies: ArrayLike<number>): Scaled {
  const breaks: number[] = [];
  for (let k = 0; k < targets.length; k++) if (energies[k]! !== 0) breaks.push(targets[k]!.observed / energies[k]!);
  if (breaks.length === 0) return { rho: 0, chi2: misfitAt(targets, energies, 0) };
  breaks.sort((a, b) => a - b);
  // The half slope increases with rho: the minimum lies just before the first breakpoint where it is not negative.
  let piece = breaks.findIndex((rho) => halfSlope(targets, energies, rho) >= 0);
  if (piece === -1) piece = breaks.length;
  const low = piece === 0 ? breaks[0]! - 1 : breaks[piece - 1]!;
  const high = piece === breaks.length ? breaks[piece - 1]! + 1 : breaks[piece]!;
  const inside = (low + high) / 2;
  let squares = 0;
  let products = 0;
  for (let k = 0; k < targets.length; k++) {
    const target = targets[k]!;
    const energy = energies[k]!;
    const weight = weightAt(target, inside * energy);
    squares += weight * energy * energy;
    products += weight * energy * target.observed;
  }
  const rho = products / squares;
  return { rho, chi2: misfitAt(targets, energies, rho) };
}

/** The best rho, which may be negative (then no parameters reproduce the bands there), with its misfit. */
export function bestScale(targets: readonly Target[], energies: ArrayLike<number>, symmetric: boolean): Scaled {
  return symmetric ? bestSymmetric(targets, energies) : bestAsymmetric(targets, energies);
}

/** d chi2 / dt at the best rho: by the envelope theorem the derivative at constant rho. */
export function misfitSlope(
  targets: readonly Target[], energies: ArrayLike<number>, slopes: ArrayLike<number>, rho: number,
): number {
  let sum = 0;
  for (let k = 0; k < targets.length; k++) {
    const target = targets[k]!;
    const calculated = rho * energies[k]!;
    sum += weightAt(target, calculated) * (target.observed - calculated) * slopes[k]!;
  }
  return -2 * rho * sum;
}

/** Targets in columns, for the inner loops. */
export interface Columns {
  readonly targets: readonly Target[];
  readonly observed: Float64Array;
  /** Weights where they are alike on both sides; null where some differ. */
  readonly weights: Float64Array | null;
}

export function columnsOf(targets: readonly Target[]): Columns {
  return {
    targets, observed: Float64Array.from(targets, (target) => target.observed),
    weights: isSymmetric(targets) ? Float64Array.from(targets, (target) => target.weightBelow) : null,
  };
}

/** d chi2/dt at the best scale, and that scale; written anew for every point of a curve. */
export interface CurvePoint {
  rho: number;
  slope: number;
}

/** The best scale at one point of the curve, and d chi2/dt there; `misfitSlope` in one pass where weights are symmetric. */
export function pointOfCurve({ targets, observed, weights }: Columns, energies: Float64Array, slopes: Float64Array, into: CurvePoint): void {
  if (!weights) {
    into.rho = bestAsymmetric(targets, energies).rho;
    into.slope = misfitSlope(targets, energies, slopes, into.rho);
    return;
  }
  let squares = 0;
  let products = 0;
  let squaresSlope = 0;
  let productsSlope = 0;
  for (let k = 0; k < observed.length; k++) {
    const energy = energies[k]!;
    const weighted = weights[k]! * energy;
    const weightedSlope = weights[k]! * slopes[k]!;
    squares += weighted * energy;
    products += weighted * observed[k]!;
    squaresSlope += weightedSlope * energy;
    productsSlope += weightedSlope * observed[k]!;
  }
  const rho = squares > 0 ? products / squares : 0;
  into.rho = rho;
  into.slope = -2 * rho * (productsSlope - rho * squaresSlope);
}
