import { describe, expect, it } from 'vitest';
import { randomFrom, shuffled } from '../../../scripts/generate/random.ts';

describe('seeded random numbers', () => {
  it('give the same numbers for the same seed and key, and others for another seed or key', () => {
    const first = (seed: number, key: string): number => randomFrom(seed, key).between(0, 1);
    expect(first(1, 'a')).toBe(first(1, 'a'));
    expect(new Set([first(1, 'a'), first(2, 'a'), first(1, 'b')]).size).toBe(3);
  });

  it('are uniform: mean 1/2 and variance 1/12 of 20 000, each tenth filled alike', () => {
    const random = randomFrom(7, 'uniform');
    const values = Array.from({ length: 20_000 }, () => random.between(0, 1));
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length;
    // Four standard deviations of the mean of 20 000.
    expect(Math.abs(mean - 0.5)).toBeLessThan(4 * Math.sqrt(1 / 12 / 20_000));
    expect(variance).toBeCloseTo(1 / 12, 2);
    const tenths = Array.from({ length: 10 }, (_, i) => values.filter((value) => Math.floor(value * 10) === i).length);
    for (const count of tenths) expect(Math.abs(count - 2000)).toBeLessThan(200);
  });

  it('are normal where asked: 68.3 % within one standard deviation, 95.4 % within two', () => {
    const random = randomFrom(7, 'normal');
    const values = Array.from({ length: 20_000 }, () => random.normal(100, 5));
    const share = (times: number): number => values.filter((value) => Math.abs(value - 100) < times * 5).length / values.length;
    expect(share(1)).toBeCloseTo(0.683, 1);
    expect(share(2)).toBeCloseTo(0.954, 1);
    expect(values.every(Number.isFinite)).toBe(true);
  });

  it('shuffle a list without losing or doubling anything', () => {
    const list = Array.from({ length: 100 }, (_, i) => i);
    const mixed = shuffled(list, randomFrom(3, 'cards'));
    expect(mixed).not.toEqual(list);
    expect([...mixed].sort((a, b) => a - b)).toEqual(list);
  });
});
