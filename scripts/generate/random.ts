// Seeded random numbers: the same seed and key give the same numbers on every machine.

import { seededRandom } from '#engine';

export interface Random {
  /** Uniform in [low, high). */
  readonly between: (low: number, high: number) => number;
  /** Normal with mean and standard deviation. */
  readonly normal: (mean: number, deviation: number) => number;
  /** Uniform in the logarithm. */
  readonly logBetween: (low: number, high: number) => number;
  readonly chance: (probability: number) => boolean;
  readonly pick: <T>(list: readonly T[]) => T;
  /** Whole number from low to high, both included. */
  readonly whole: (low: number, high: number) => number;
}

/**
 * A stream of random numbers for one purpose. Streams of different keys do not disturb one another, so that a record
 * keeps its numbers when another record is added.
 *
 * Method: 32-bit FNV-1a of seed and key is the seed of the engine's own numbers.
 */
export function randomFrom(seed: number, key: string): Random {
  let state = 0x811c9dc5;
  for (const letter of `${seed}:${key}`) state = Math.imul(state ^ letter.codePointAt(0)!, 0x01000193);
  const { uniform, normal } = seededRandom(state);
  const between = (low: number, high: number): number => low + (high - low) * uniform();
  return {
    between,
    normal: (mean, deviation) => mean + deviation * normal(),
    logBetween: (low, high) => Math.exp(between(Math.log(low), Math.log(high))),
    chance: (probability) => uniform() < probability,
    pick: (list) => {
      if (list.length === 0) throw new RangeError('pick: an empty list');
      return list[Math.floor(uniform() * list.length)]!;
    },
    whole: (low, high) => Math.floor(between(low, high + 1)),
  };
}

/** The list in a random order; the list itself is left alone. */
export function shuffled<T>(list: readonly T[], random: Random): T[] {
  const result = [...list];
  for (let i = result.length - 1; i > 0; i -= 1) {
    const j = random.whole(0, i);
    [result[i], result[j]] = [result[j]!, result[i]!];
  }
  return result;
}
