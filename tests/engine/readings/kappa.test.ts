import { describe, expect, test } from 'vitest';
import { fewestSpare, floorFactor } from '#engine';
import { seeded } from '../../published/random.ts';

/** So many bands read to 50 with a floor of 150, each missed by what floors of `factor` times that lead one to expect. */
const missedBy = (factor: number, count: number) => Array.from({ length: count }, (_, k) => ({ residual: (k % 2 === 0 ? 1 : -1) * Math.hypot(50, factor * 150), u: 50, floor: 150 }));

describe('the factor on the floors that the records of an ion suggest', () => {
  test.each([[2, 16], [0.5, 24], [1, 40], [3, 8]])('misses of %d times the floors in %i spare bands: that factor, drawn towards 1 with the weight of eight', (factor, spare) => {
    const found = floorFactor(missedBy(factor, spare), spare)!;
    expect(found.kappa).toBeCloseTo((spare * factor + 8) / (spare + 8), 9);
    expect(found.u).toBeCloseTo(found.kappa / Math.sqrt(2 * spare), 9);
    expect(found.spareBands).toBe(spare);
  });

  test('bands that miss by less than they can be read need no floor: only what 1 is worth is left', () => {
    expect(floorFactor(missedBy(0, 16).map((row) => ({ ...row, residual: row.residual / 2 })), 16)!.kappa).toBeCloseTo(8 / 24, 9);
  });

  test('nothing is said from fewer than eight spare bands', () => {
    expect(fewestSpare).toBe(8);
    expect(floorFactor(missedBy(2, 30), 7)).toBeNull();
  });

  test('misses as the declared floors say give 1 within its own uncertainty', () => {
    const next = seeded(12);
    const normal = (): number => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
    const rows = Array.from({ length: 400 }, () => ({ residual: normal() * Math.hypot(50, 150), u: 50, floor: 150 }));
    const { kappa, u } = floorFactor(rows, 400)!;
    expect(Math.abs(kappa - 1)).toBeLessThan(3 * u);
    expect(u).toBeLessThan(0.05);
  });
});
