import { describe, expect, test } from 'vitest';
import { defaultPolicy } from '#engine';
import { mergedBands, setAside, singleBand, symmetricU } from '../../../engine/measurement/observation.ts';
import { band, measurement } from './sample.ts';

const component = (position: number, degeneracy: number | null, u: number | null = 100, uPlus = u) =>
  band(position, { kind: 'component', degeneracy, uMinus: u, uPlus });

describe('one band', () => {
  test('its position, both sides of u and whether u was assumed come through', () => {
    const sample = measurement('Cr(III)', [band(17_400, { uMinus: 40, uPlus: 60 }), band(24_600)]);
    expect(singleBand(sample, 0, defaultPolicy)).toEqual({ bands: [0], position: 17_400, uMinus: 40, uPlus: 60, uAssumed: false });
    expect(singleBand(sample, 1, defaultPolicy)).toEqual({ bands: [1], position: 24_600, uMinus: 80, uPlus: 80, uAssumed: true });
  });
});

describe('components of one term become their barycentre', () => {
  test('a 1:2 pair 1600 apart: two thirds of the way, neither the plain mean nor the lowest', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1), component(18_600, 2)]);
    const { position } = mergedBands(sample, [0, 1], defaultPolicy);
    expect(position).toBeCloseTo((17_000 + 2 * 18_600) / 3, 9);
    expect(position).not.toBeCloseTo(17_800, 0);
    expect(position).not.toBeCloseTo(17_000, 0);
  });

  test('a 2:1 pair: one third of the way', () => {
    const sample = measurement('Cr(III)', [component(17_000, 2), component(18_600, 1)]);
    expect(mergedBands(sample, [0, 1], defaultPolicy).position).toBeCloseTo(17_000 + 1600 / 3, 9);
  });

  test('three components of one state each: their mean, which here is the barycentre', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1), component(17_600, 1), component(18_100, 1)]);
    expect(mergedBands(sample, [0, 1, 2], defaultPolicy).position).toBeCloseTo(52_700 / 3, 9);
  });

  // u of a weighted mean of independent readings: sqrt(sum (n u)^2) / sum n.
  test('u is propagated with the same weights: readings of 60 and 90 in the ratio 1:2', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1, 60), component(18_600, 2, 90)]);
    const { uMinus, uPlus, uAssumed } = mergedBands(sample, [0, 1], defaultPolicy);
    expect(uMinus).toBeCloseTo(Math.hypot(60, 180) / 3, 9);
    expect(uPlus).toBe(uMinus);
    expect(uAssumed).toBe(false);
  });

  test('each side of u by itself', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1, 30, 60), component(18_600, 2, 40, 50)]);
    const { uMinus, uPlus } = mergedBands(sample, [0, 1], defaultPolicy);
    expect(uMinus).toBeCloseTo(Math.hypot(30, 80) / 3, 9);
    expect(uPlus).toBeCloseTo(Math.hypot(60, 100) / 3, 9);
  });

  test('one u assumed makes the barycentre assumed', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1, 60), component(18_600, 2, null)]);
    expect(mergedBands(sample, [0, 1], defaultPolicy).uAssumed).toBe(true);
  });

  test('a component without its degeneracy is refused by name, never guessed', () => {
    const sample = measurement('Cr(III)', [component(17_000, 1), component(18_600, null)]);
    expect(() => mergedBands(sample, [0, 1], defaultPolicy)).toThrow(/bands\[1\]\.degeneracy/);
  });
});

describe('the one u that stands for an asymmetric pair in a covariance', () => {
  test('the root mean square of both sides', () => {
    expect(symmetricU({ uMinus: 600, uPlus: 250 })).toBeCloseTo(Math.sqrt((600 ** 2 + 250 ** 2) / 2), 12);
    expect(symmetricU({ uMinus: 250, uPlus: 600 })).toBe(symmetricU({ uMinus: 600, uPlus: 250 }));
    expect(symmetricU({ uMinus: 80, uPlus: 80 })).toBeCloseTo(80, 12);
  });
});

describe('which bands take no part in any fit', () => {
  test('a d-d transition takes part', () => {
    expect(setAside(band(17_400))).toBeNull();
  });

  test.each([['CT', /charge transfer/], ['ligand', /ligand/], ['vibration', /vibration/], ['impurity', /impurity/]] as const)('%s: set aside, and the reason says so', (role, reason) => {
    expect(setAside(band(17_400, { role }))).toMatch(reason);
  });

  test('a typed reason is given back word for word, before any other', () => {
    expect(setAside(band(30_000, { role: 'CT', leftOut: 'foot of the charge-transfer band' }))).toBe('foot of the charge-transfer band');
  });
});
