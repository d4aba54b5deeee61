import { angularMomentum, harmonics, orbitalCount } from './orbitals.ts';

/**
 * Two-electron integrals <ab|cd> over the real d orbitals (electron 1 in a and c, electron 2 in b and d),
 * as 5^4 arrays indexed ((a * 5 + b) * 5 + c) * 5 + d.
 *
 * Repulsion is linear in Racah's B and C. With Slater's F^k and Racah's A dropped,
 * F^0 = 7C/5, F^2 = 49B + 7C, F^4 = 63C/5 (G. Racah, Phys. Rev. 62, 438 (1942)), and
 * <m1 m2|m3 m4> = delta(m1 + m2, m3 + m4) sum_k c^k(m1, m3) c^k(m4, m2) F^k
 * (E. U. Condon and G. H. Shortley, The Theory of Atomic Spectra, chapter 6).
 */
export interface PairIntegrals {
  /** Coefficient of Racah's B. */
  readonly racahB: Float64Array;
  /** Coefficient of Racah's C. */
  readonly racahC: Float64Array;
  /** 2 l1.l2: with l^2 = 6 an electron it makes the square of the total orbital angular momentum. */
  readonly angular: Float64Array;
}

function factorial(n: number): number {
  let product = 1;
  for (let i = 2; i <= n; i++) product *= i;
  return product;
}

/** Wigner 3j symbol for whole j by Racah's sum; 0 where a selection rule forbids it. */
export function wigner3j(j1: number, j2: number, j3: number, m1: number, m2: number, m3: number): number {
  if (m1 + m2 + m3 !== 0 || j3 < Math.abs(j1 - j2) || j3 > j1 + j2) return 0;
  if (Math.abs(m1) > j1 || Math.abs(m2) > j2 || Math.abs(m3) > j3) return 0;
  const triangle =
    (factorial(j1 + j2 - j3) * factorial(j1 - j2 + j3) * factorial(-j1 + j2 + j3)) / factorial(j1 + j2 + j3 + 1);
  const states = [j1 + m1, j1 - m1, j2 + m2, j2 - m2, j3 + m3, j3 - m3].reduce((p, n) => p * factorial(n), 1);
  let sum = 0;
  for (let t = 0; t <= j1 + j2 - j3; t++) {
    const terms = [t, j3 - j2 + t + m1, j3 - j1 + t - m2, j1 + j2 - j3 - t, j1 - t - m1, j2 - t + m2];
    if (terms.some((n) => n < 0)) continue;
    sum += (t % 2 === 0 ? 1 : -1) / terms.reduce((p, n) => p * factorial(n), 1);
  }
  const sign = Math.abs(j1 - j2 - m3) % 2 === 0 ? 1 : -1;
  return sign * Math.sqrt(triangle * states) * sum;
}

/** Condon and Shortley's c^k(2 m, 2 m'). */
export function condonShortley(k: number, m: number, mPrime: number): number {
  const sign = Math.abs(m) % 2 === 0 ? 1 : -1;
  return sign * 5 * wigner3j(2, k, 2, 0, 0, 0) * wigner3j(2, k, 2, -m, m - mPrime, mPrime);
}

/** <m1 m2|m3 m4> as coefficients of [B, C], for m1 + m2 = m3 + m4. */
function sphericalIntegral(coefficients: readonly (readonly number[])[], m1: number, m2: number, m3: number, m4: number): [number, number] {
  const [rank0, rank2, rank4] = coefficients.map((c) => c[(m1 + 2) * 5 + m3 + 2]! * c[(m4 + 2) * 5 + m2 + 2]!);
  return [49 * rank2!, (7 / 5) * rank0! + 7 * rank2! + (63 / 5) * rank4!];
}

function derive(): PairIntegrals {
  const racahB = new Float64Array(orbitalCount ** 4);
  const racahC = new Float64Array(orbitalCount ** 4);
  const angular = new Float64Array(orbitalCount ** 4);
  const projections = [-2, -1, 0, 1, 2];
  const coefficients = [0, 2, 4].map((k) => projections.flatMap((m) => projections.map((n) => condonShortley(k, m, n))));
  const components = angularMomentum();
  let at = 0;
  for (let a = 0; a < orbitalCount; a++)
    for (let b = 0; b < orbitalCount; b++)
      for (let c = 0; c < orbitalCount; c++)
        for (let d = 0; d < orbitalCount; d++, at++) {
          for (const [m1, re1, im1] of harmonics[a]!)
            for (const [m3, re3, im3] of harmonics[c]!) {
              const re13 = re1 * re3 + im1 * im3;
              const im13 = re1 * im3 - im1 * re3;
              for (const [m2, re2, im2] of harmonics[b]!)
                for (const [m4, re4, im4] of harmonics[d]!) {
                  if (m1 + m2 !== m3 + m4) continue;
                  // Only the real part survives: the orbitals are real.
                  const weight = re13 * (re2 * re4 + im2 * im4) - im13 * (re2 * im4 - im2 * re4);
                  if (weight === 0) continue;
                  const [partB, partC] = sphericalIntegral(coefficients, m1, m2, m3, m4);
                  racahB[at]! += weight * partB;
                  racahC[at]! += weight * partC;
                }
            }
          // (i l)(i l) = -1 times the product of the real antisymmetric matrices.
          for (const l of components) angular[at]! -= 2 * l[a * 5 + c]! * l[b * 5 + d]!;
        }
  return { racahB, racahC, angular };
}

let held: PairIntegrals | null = null;

/** The integrals, derived once on first use. */
export function pairIntegrals(): PairIntegrals {
  held ??= derive();
  return held;
}
