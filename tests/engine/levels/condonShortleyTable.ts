/**
 * c^k(2 m, 2 m') of the d shell as printed: E. U. Condon and G. H. Shortley, The Theory of Atomic Spectra,
 * table 1^6 (from memory, page not seen). Each row is +-sqrt(numerator / denominator) with denominators 49 (k = 2)
 * and 441 (k = 4); the upper signs of m and m' go together, and so do the lower ones.
 */
const rows: readonly (readonly [m: number, mPrime: number, k2: number, k4: number])[] = [
  [2, 2, -4, 1],
  [2, 1, 6, -5],
  [2, 0, -4, 15],
  [1, 1, 1, -16],
  [1, 0, 1, 30],
  [0, 0, 4, 36],
  [2, -2, 0, 70],
  [2, -1, 0, -35],
  [1, -1, -6, -40],
];

const signedRoot = (numerator: number, denominator: number): number => Math.sign(numerator) * Math.sqrt(Math.abs(numerator) / denominator);

/** The table for any m and m', by c^k(m', m) = (-1)^(m - m') c^k(m, m') and c^k(-m, -m') = c^k(m, m'). */
export function condonShortleyTable(k: 0 | 2 | 4, m: number, mPrime: number): number {
  if (k === 0) return m === mPrime ? 1 : 0;
  const alike = ([a, b]: readonly [number, number]) => rows.find((row) => (row[0] === a && row[1] === b) || (row[0] === -a && row[1] === -b));
  const direct = alike([m, mPrime]);
  const row = direct ?? alike([mPrime, m])!;
  const sign = direct || (m - mPrime) % 2 === 0 ? 1 : -1;
  return sign * (k === 2 ? signedRoot(row[2], 49) : signedRoot(row[3], 441));
}
