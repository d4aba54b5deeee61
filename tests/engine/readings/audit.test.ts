import { describe, expect, test } from 'vitest';
import { auditQuoted, defaultPolicy, disagreesFrom, freeIon } from '#engine';
import type { AuditRow, Measurement, Policy, Quoted } from '#engine';
import { measurement, termBand } from '../measurement/sample.ts';
import { numberOf, read } from './readSample.ts';

const nothing: Quoted = { Delta: null, Dq: null, B: null, C: null, beta: null };

function audit(sample: Measurement, quoted: Partial<Quoted>, policy: Policy = defaultPolicy): readonly AuditRow[] {
  return auditQuoted(sample, policy, freeIon(policy.freeIons, sample.ion), read(sample, policy), { ...nothing, ...quoted });
}

/** The one row of one quoted number. */
function only(sample: Measurement, quoted: Partial<Quoted>, policy: Policy = defaultPolicy): AuditRow {
  const rows = audit(sample, quoted, policy);
  expect(rows).toHaveLength(1);
  return rows[0]!;
}

/** The cause named for one quoted number that disagrees. */
function causeOf(sample: Measurement, quoted: Partial<Quoted>, policy: Policy = defaultPolicy): string | null {
  const row = only(sample, quoted, policy);
  expect(Math.abs(row.z!)).toBeGreaterThan(disagreesFrom);
  return row.cause;
}

const chromium = measurement('Cr(III)', [termBand(17_400, '4T2g', 50), termBand(24_600, '4T1g(F)', 50)]);
const nickel = measurement('Ni(II)', [termBand(8500, '3T2g'), termBand(13_800, '3T1g(F)'), termBand(25_300, '3T1g(P)')]);
const cobaltic = measurement('Co(III)', [termBand(21_050, 'a1T1g', 50), termBand(29_500, 'a1T2g', 50)], { multiplicity: 1 });

/** Floors low enough for small mistakes to stand out. */
const low: Policy = { ...defaultPolicy, floors: { general: 30, spinFlip: 30, twoElectron: 30 } };
const none: Policy = { ...defaultPolicy, floors: { general: 0, spinFlip: 0, twoElectron: 0 } };
const withRatio = (value: number): Policy => ({ ...low, cOverB: { general: { value, u: 0 }, perIon: {} } });

describe('a planted mistake is named', () => {
  const delta = Math.round(numberOf(read(chromium), 'Delta'));
  const racahB = Math.round(numberOf(read(chromium), 'B'));

  test('Dq printed as Delta, and Delta as Dq', () => {
    expect(causeOf(chromium, { Delta: delta / 10 })).toBe('Likely Dq was printed as Delta.');
    expect(causeOf(chromium, { Dq: delta })).toBe('Likely Delta was printed as Dq.');
  });

  test('a factor of ten, of a thousand (kK for cm-1), of two', () => {
    expect(causeOf(chromium, { B: 10 * racahB })).toBe('Likely off by a factor of 10.');
    expect(causeOf(chromium, { Delta: delta / 1000 })).toBe('Likely off by a factor of 1000.');
    expect(causeOf(chromium, { B: racahB / 2 })).toBe('Likely off by a factor of 2.');
  });

  test('two digits swapped', () => {
    expect(String(delta)).toBe('17400');
    expect(causeOf(chromium, { Delta: 14_700 })).toMatch(/^Likely two digits were swapped: 17\D?400\.$/);
  });

  test('another pair of bands: B of Ni(II) aqua from the first two alone', () => {
    // 754 by an independent program.
    expect(causeOf(nickel, { B: 754 })).toBe('Likely taken from 3T2g and a3T1g alone.');
  });

  test('another C/B: Delta of low-spin Co(III) from C/B 4 where the policy has 5', () => {
    const quoted = Math.round(numberOf(read(cobaltic, withRatio(4)), 'Delta'));
    expect(causeOf(cobaltic, { Delta: quoted }, withRatio(5))).toBe('Likely fitted with C/B = 4.');
  });

  test('another free-ion set: beta against B0 of the atomic levels', () => {
    const sharp = measurement('Ni(II)', [termBand(8500, '3T2g', 20), termBand(13_900, '3T1g(F)', 20), termBand(25_000, '3T1g(P)', 20)]);
    const quoted = numberOf(read(sharp, { ...low, freeIons: 'atomic-levels' }), 'beta');
    expect(causeOf(sharp, { beta: Number(quoted.toFixed(3)) }, low)).toMatch(/free-ion set .*atomic-levels/);
  });

  test('the plain mean of components', () => {
    const component = (position: number, degeneracy: number) => termBand(position, '3T2g', 30, { kind: 'component', degeneracy });
    const split = measurement('Ni(II)', [component(8300, 1), component(9500, 2), termBand(15_000, '3T1g(F)', 60)]);
    expect(causeOf(split, { Delta: (8300 + 9500) / 2 }, low)).toMatch(/^Likely the plain mean of the components/);
  });

  // Sharp readings in the near ultraviolet, where a nanometre is 70 to 100 cm-1: elsewhere rounding hides within the uncertainty.
  test('positions rounded to whole nanometres', () => {
    const fine = measurement('Cr(III)', [termBand(26_631, '4T2g', 2), termBand(31_696, '4T1g(F)', 2)]);
    const rounded = { ...fine, bands: fine.bands.map((band) => ({ ...band, position: 1e7 / Math.round(1e7 / band.position) })) };
    expect(causeOf(fine, { B: numberOf(read(rounded, none), 'B') }, none)).toBe('Likely fitted to positions rounded to whole nanometres.');
  });
});

describe('no cause is made up', () => {
  test('where nothing tried explains the number: it disagrees, and that is all that is said', () => {
    expect(causeOf(chromium, { Delta: 19_100 })).toBeNull();
    expect(causeOf(chromium, { B: 617 })).toBeNull();
    expect(causeOf(nickel, { B: 612 })).toBeNull();
  });

  test('where the number agrees', () => {
    const row = only(nickel, { B: 958 });
    expect(Math.abs(row.z!)).toBeLessThan(disagreesFrom);
    expect(row.cause).toBeNull();
  });

  test('where ours is withheld there is no difference, no z and no cause', () => {
    expect(only(chromium, { C: 3200 })).toEqual({ parameter: 'C', quoted: 3200, refitted: null, uTotal: null, difference: null, z: null, cause: null });
  });
});

test('every quoted number gets one row, with quoted less refitted and z = difference over u(total)', () => {
  const rows = audit(chromium, { Dq: 1750, B: 700, C: 3200, beta: 0.76 });
  expect(rows.map(({ parameter, quoted }) => [parameter, quoted])).toEqual([['Delta', 17_500], ['B', 700], ['C', 3200], ['beta', 0.76]]);
  for (const { quoted, refitted, uTotal, difference, z } of rows.filter((row) => row.refitted !== null)) {
    expect(difference).toBeCloseTo(quoted - refitted!, 9);
    expect(z).toBeCloseTo((quoted - refitted!) / uTotal!, 9);
  }
});

test('Delta typed beside Dq wins: one number, one row', () => {
  expect(only(chromium, { Delta: 17_500, Dq: 1000 }).quoted).toBe(17_500);
});
