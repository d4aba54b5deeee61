/**
 * Upper-tail probability of the chi-square distribution, Q(nu/2, x/2).
 *
 * Closed forms for whole degrees of freedom (M. Abramowitz and I. A. Stegun, Handbook of Mathematical
 * Functions, 26.4.4 and 26.4.5); good to 1e-7 relative for odd degrees of freedom, to rounding for even.
 *
 * @param x chi2, at least 0
 * @param degrees degrees of freedom, a whole number of at least 1
 */
export function upperTail(x: number, degrees: number): number {
  if (!(x >= 0) || !Number.isInteger(degrees) || degrees < 1) throw new RangeError(`chi2 ${x} with ${degrees} degrees of freedom`);
  const half = x / 2;
  if (degrees % 2 === 0) {
    let term = 1;
    let sum = 1;
    for (let k = 1; k < degrees / 2; k++) {
      term *= half / k;
      sum += term;
    }
    return Math.exp(-half) * sum;
  }
  const root = Math.sqrt(x);
  let term = root;
  let sum = degrees > 1 ? root : 0;
  for (let k = 1; k < (degrees - 1) / 2; k++) {
    term *= x / (2 * k + 1);
    sum += term;
  }
  const density = Math.exp(-half) / Math.sqrt(2 * Math.PI);
  return Math.min(1, complementaryError(root / Math.SQRT2) + 2 * density * sum);
}

/** erfc for x >= 0: series near 0, continued fraction beyond (Abramowitz and Stegun 7.1.5 and 7.1.14). */
export function complementaryError(x: number): number {
  if (x < 2.5) {
    let term = x;
    let sum = x;
    for (let n = 1; Math.abs(term) > 1e-17 * Math.abs(sum) && n < 200; n++) {
      term *= (-x * x) / n;
      sum += term / (2 * n + 1);
    }
    return 1 - (2 / Math.sqrt(Math.PI)) * sum;
  }
  let fraction = x;
  for (let n = 60; n >= 1; n--) fraction = x + n / 2 / fraction;
  return Math.exp(-x * x) / Math.sqrt(Math.PI) / fraction;
}
