import type { FieldParameters } from '#engine';

/** A repeatable stream of numbers from 0 to 1. Source: the additive "mulberry32" generator, public domain. */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Parameter sets over all of chemistry and a little beyond: Delta 0 to 45 000, B 200 to 1400, C/B 2 to 7, in cm-1. */
export function parameterSets(count: number, seed: number): readonly FieldParameters[] {
  const next = seeded(seed);
  return Array.from({ length: count }, () => {
    const racahB = 200 + 1200 * next();
    return { delta: 45_000 * next(), racahB, racahC: racahB * (2 + 5 * next()) };
  });
}
