/** Seeded random numbers: the same seed gives the same numbers in every run. */
export interface Random {
  /** Uniform in [0, 1). */
  readonly uniform: () => number;
  /** Normal with mean 0 and standard deviation 1. */
  readonly normal: () => number;
}

/**
 * A 32-bit Weyl sequence with the finaliser of MurmurHash3; normal numbers by G. E. P. Box and M. E. Muller, Ann. Math. Stat. 29, 610 (1958).
 *
 * @param seed a whole number
 */
export function seededRandom(seed: number): Random {
  let state = seed | 0;
  const uniform = (): number => {
    state = (state + 0x9e3779b9) | 0;
    let mixed = state ^ (state >>> 16);
    mixed = Math.imul(mixed, 0x85ebca6b);
    mixed ^= mixed >>> 13;
    mixed = Math.imul(mixed, 0xc2b2ae35);
    mixed ^= mixed >>> 16;
    return (mixed >>> 0) / 0x100000000;
  };
  return { uniform, normal: () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform()) };
}

/** The value below which a share of the sorted numbers lies, by linear interpolation between neighbours. */
export function quantile(sorted: readonly number[], share: number): number {
  if (sorted.length === 0) throw new RangeError('sorted: quantile of no numbers');
  const place = share * (sorted.length - 1);
  const below = Math.floor(place);
  const low = sorted[below]!;
  return low + (place - below) * ((sorted[below + 1] ?? low) - low);
}
