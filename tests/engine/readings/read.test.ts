import { describe, expect, test, vi } from 'vitest';
import { defaultPolicy, freeIon, readMeasurement, readWithRivals } from '#engine';
import type { Measurement, Policy } from '#engine';
import { upperTail } from '../../../engine/readings/chiSquare.ts';
import { band, measurement, termBand } from '../measurement/sample.ts';
import { codesOf, parameter, read, numberOf } from './readSample.ts';

const nickelAqua = measurement('Ni(II)', [termBand(8700, '3T2g'), termBand(14_500, '3T1g(F)'), termBand(25_300, '3T1g(P)')]);
const chromiumPair = measurement('Cr(III)', [termBand(17_400, '4T2g'), termBand(24_600, '4T1g(F)')]);
const cobaltAmmine = measurement('Co(III)', [termBand(21_050, 'a1T1g'), termBand(29_500, 'a1T2g')], { multiplicity: 1 });
const cobaltFirstBand = measurement('Co(II)', [termBand(8100, '4T2g')], { multiplicity: 4 });
const rubyLike = measurement('Cr(III)', [termBand(18_000, '4T2g'), termBand(24_600, '4T1g(F)'), termBand(14_418, '2Eg', 5, { kind: 'line' })]);
const titaniumAqua = measurement('Ti(III)', [termBand(20_300, '2Eg', 300, { kind: 'envelope' })]);

/** Floors and reading uncertainties so small that only the model's arithmetic is left. */
const sharp: Policy = { ...defaultPolicy, floors: { general: 10, spinFlip: 10, twoElectron: 10 } };

describe('each verdict by an example', () => {
  test('tested: three bands of an octahedral Ni(II) aqua ion agree, Delta near 8750 and B near 900', () => {
    const reading = read(nickelAqua);
    expect(reading).toMatchObject({ verdict: 'tested', bandsUsed: 3, spareBands: 1, assignment: 'typed', ground: 'a3A2g' });
    expect(numberOf(reading, 'Delta')).toBeCloseTo(8746, -1);
    expect(numberOf(reading, 'B')).toBeCloseTo(902, -1);
    expect(reading.reason).toMatch(/^Tested: 3 bands with 1 spare agree/);
  });

  test('untested: two bands of Cr(III) give Delta and B, and nothing is spare', () => {
    const reading = read(chromiumPair);
    expect(reading).toMatchObject({ verdict: 'untested', spareBands: 0 });
    expect(numberOf(reading, 'Delta')).toBeCloseTo(17_400, 6);
    expect(reading.reason).toContain('none is spare');
  });

  test('strained: the same Ni(II) bands with the second 2000 too high', () => {
    const reading = read(measurement('Ni(II)', [termBand(8700, '3T2g'), termBand(16_500, '3T1g(F)'), termBand(25_300, '3T1g(P)')]));
    expect(reading.verdict).toBe('strained');
    expect(reading.reason).toMatch(/^Strained: .*disagree/);
    // Strained numbers are shown all the same: the verdict travels with them.
    expect(parameter(reading, 'Delta').value).not.toBeNull();
  });

  test('assumed: Delta of low-spin Co(III) from 1T1g and 1T2g moves with C/B by more than it can be read', () => {
    const reading = read(cobaltAmmine);
    expect(reading.verdict).toBe('assumed');
    expect(parameter(reading, 'Delta')).toMatchObject({ standing: 'assumed', reason: expect.stringContaining('C/B = 4.5(9)') });
    const { u, uTotal } = parameter(reading, 'Delta');
    expect(uTotal!).toBeGreaterThan(2 * u!);
    expect(codesOf(reading)).toContain('C_ASSUMED');
  });

  test('assumed: the first band of octahedral Co(II) alone, with beta = 0.75(12)', () => {
    const reading = read(cobaltFirstBand);
    expect(reading.verdict).toBe('assumed');
    expect(parameter(reading, 'Delta')).toMatchObject({ standing: 'assumed', reason: expect.stringContaining('beta = 0.75(12)') });
    expect(codesOf(reading)).toContain('B_ASSUMED');
  });

  test('not determinable: the level of Mn(II) that does not move with Delta', () => {
    const reading = read(measurement('Mn(II)', [termBand(24_960, '4A1g/4Eg', 20)], { multiplicity: 6 }));
    expect(reading.verdict).toBe('not determinable');
    expect(reading.reason).toContain('moves with Delta');
  });

  test.each([
    ['a d10 ion', measurement('Zn(II)', [band(25_000)]), 'd10'],
    ['a d0 ion', measurement('Ti(IV)', [band(25_000)]), 'd0'],
    ['a square planar complex', measurement('Ni(II)', [band(22_000)], { geometry: null, geometryName: 'square planar' }), 'square planar'],
    ['octahedral Fe(II) without a declared spin', measurement('Fe(II)', [band(10_400)]), 'spin state'],
    ['a measurement without a band', measurement('Cr(III)', []), 'no band'],
    ['nothing but charge transfer', measurement('Cr(III)', [band(38_000, { role: 'CT' })]), 'no band'],
  ])('not determinable: %s, and the reason names it', (_, sample, reason) => {
    const reading = read(sample);
    expect(reading.verdict).toBe('not determinable');
    expect(reading.reason).toContain(reason);
  });

  test('refused: a strong field of 23 000 with a high-spin ground declared for Co(III)', () => {
    const reading = read(measurement('Co(III)', [termBand(23_000, '5Eg')], { multiplicity: 5 }));
    expect(reading.verdict).toBe('refused');
    expect(reading.reason).toContain('another spin than the declared multiplicity 5');
    expect(codesOf(reading)).toContain('SPIN_CONTRADICTS_FIT');
  });

  test('the same strong field is no contradiction where the ion has one spin state: Cr(III)', () => {
    expect(read(measurement('Cr(III)', [termBand(23_000, '4T2g')])).verdict).toBe('untested');
  });
});

describe('between tested and strained stands a probability of 0.01, at the declared floors', () => {
  test.each([0, 500, 900, 1200, 1300, 1400, 1500, 2000])('second band of Ni(II) %i too high', (shift) => {
    const reading = read(measurement('Ni(II)', [termBand(8700, '3T2g'), termBand(14_500 + shift, '3T1g(F)'), termBand(25_300, '3T1g(P)')]));
    expect(reading.verdict).toBe(upperTail(reading.chi2!, 1) < 0.01 ? 'strained' : 'tested');
  });

  test('both sides of the threshold were met', () => {
    const verdicts = [0, 2000].map((shift) => read(measurement('Ni(II)', [termBand(8700, '3T2g'), termBand(14_500 + shift, '3T1g(F)'), termBand(25_300, '3T1g(P)')])).verdict);
    expect(verdicts).toEqual(['tested', 'strained']);
  });

  test('the declared floor decides: what strains at floors of 10 passes at 150', () => {
    const sample = measurement('Ni(II)', [termBand(8700, '3T2g', 20), termBand(14_700, '3T1g(F)', 20), termBand(25_300, '3T1g(P)', 20)]);
    expect(read(sample, sharp).verdict).toBe('strained');
    expect(read(sample).verdict).toBe('tested');
  });
});

describe('withheld, with the reason', () => {
  const all = { nickelAqua, chromiumPair, cobaltAmmine, cobaltFirstBand, rubyLike, titaniumAqua };

  test.each(Object.entries(all))('%s: a withheld number has no value, no u and a reason; a given one has value and both u', (_, sample) => {
    const reading = read(sample);
    expect(reading.parameters.map((one) => one.name)).toEqual(['Delta', 'B', 'C', 'beta']);
    for (const { standing, value, u, uTotal, reason } of reading.parameters) {
      if (standing === 'withheld') expect({ value, u, uTotal }).toEqual({ value: null, u: null, uTotal: null });
      if (standing === 'withheld') expect(reason).toMatch(/\w/);
      else {
        expect(value!).toBeGreaterThan(0);
        expect(u!).toBeGreaterThan(0);
        expect(uTotal!).toBeGreaterThanOrEqual(u!);
      }
    }
  });

  test('C is given where a spin-flip line frees it, and nowhere else', () => {
    expect(numberOf(read(rubyLike), 'C')).toBeGreaterThan(2500);
    for (const sample of [nickelAqua, chromiumPair, cobaltAmmine, cobaltFirstBand, titaniumAqua])
      expect(parameter(read(sample), 'C')).toMatchObject({ standing: 'withheld', reason: expect.stringContaining('assumed') });
  });

  test('B of one band: withheld, for d1 as for the first band of Cr(III)', () => {
    expect(parameter(read(titaniumAqua), 'B').value).toBeNull();
    expect(parameter(read(measurement('Cr(III)', [termBand(17_400, '4T2g')])), 'B')).toMatchObject({ standing: 'withheld', reason: expect.stringContaining('moves with B') });
  });

  test('B from the first band and 2Eg of Cr(III) is assumed, and beta is withheld', () => {
    const reading = read(measurement('Cr(III)', [termBand(17_400, '4T2g'), termBand(14_900, '2Eg', 15, { kind: 'line' })]));
    expect(reading.verdict).toBe('assumed');
    expect(parameter(reading, 'B').standing).toBe('assumed');
    expect(parameter(reading, 'beta')).toMatchObject({ value: null, reason: expect.stringContaining('spin-flip line') });
  });

  test('B of a T1g-ground ion from T2g and A2g alone stays above its ceiling; Delta is given', () => {
    for (const sample of [
      measurement('V(III)', [termBand(17_200, '3T2g'), termBand(36_000, '3A2g')]),
      measurement('Co(II)', [termBand(8100, '4T2g'), termBand(17_000, '4A2g')], { multiplicity: 4 }),
    ]) {
      const reading = read(sample);
      expect(parameter(reading, 'B')).toMatchObject({ value: null, reason: expect.stringContaining('ceiling') });
      expect(parameter(reading, 'beta').value).toBeNull();
      expect(parameter(reading, 'Delta').value).not.toBeNull();
      expect(reading.deltaOverB).toBeNull();
    }
  });

  test("a policy's ceiling is a ceiling: just above u(B)/B the number is given, just below withheld", () => {
    const { value, uTotal } = parameter(read(nickelAqua), 'B');
    const fraction = uTotal! / value!;
    const withCeiling = (racahB: number): Policy => ({ ...defaultPolicy, ceilings: { ...defaultPolicy.ceilings, racahB } });
    expect(parameter(read(nickelAqua, withCeiling(fraction * 1.001)), 'B').value).toBe(value);
    expect(parameter(read(nickelAqua, withCeiling(fraction * 0.999)), 'B').value).toBeNull();
  });

  test('beta is B over B0 of the declared set, with the same relative u', () => {
    const reading = read(nickelAqua);
    expect(numberOf(reading, 'beta')).toBeCloseTo(numberOf(reading, 'B') / 1030, 12);
    expect(parameter(reading, 'beta').uTotal! / numberOf(reading, 'beta')).toBeCloseTo(parameter(reading, 'B').uTotal! / numberOf(reading, 'B'), 12);
  });

  test('beta is withheld where the set has no row for the ion, never borrowed from another set', () => {
    const sample = measurement('Rh(III)', [termBand(32_700, 'a1T1g'), termBand(39_100, 'a1T2g')], { multiplicity: 1 });
    const policy: Policy = { ...defaultPolicy, freeIons: 'atomic-levels' };
    expect(freeIon('atomic-levels', sample.ion)).toBeNull();
    expect(parameter(read(sample, policy), 'B').value).not.toBeNull();
    expect(parameter(read(sample, policy), 'beta')).toMatchObject({ value: null, reason: expect.stringContaining('atomic-levels') });
    expect(parameter(read(sample), 'beta').value).not.toBeNull();
  });

  test('beta is withheld where the oxidation state is in doubt; Delta and B stand', () => {
    const reading = read({ ...nickelAqua, innocenceDoubtful: true });
    expect(parameter(reading, 'beta')).toMatchObject({ value: null, reason: expect.stringContaining('oxidation state') });
    expect(numberOf(reading, 'B')).toBe(numberOf(read(nickelAqua), 'B'));
  });

  test('a refused reading gives no number at all, and each is withheld with the reason of the refusal', () => {
    const reading = read(measurement('V(III)', [termBand(25_600, '3A2g'), termBand(17_200, '3T2g')]));
    expect(reading.verdict).toBe('refused');
    for (const one of reading.parameters) expect(one).toMatchObject({ value: null, standing: 'withheld', reason: expect.stringContaining('bands') });
  });
});

describe('what was assigned and what was left out', () => {
  test('bands that are no d-d transitions are kept with their reason, and change no digit', () => {
    const extra = [band(38_000, { role: 'CT' }), band(30_500, { leftOut: 'foot of the charge-transfer band' }), band(6900, { role: 'vibration' })];
    const reading = read({ ...nickelAqua, bands: [...nickelAqua.bands, ...extra] });
    expect(reading.notFitted.map(({ band: index }) => index)).toEqual([3, 4, 5]);
    expect(reading.notFitted[1]!.reason).toBe('foot of the charge-transfer band');
    expect(reading.parameters).toEqual(read(nickelAqua).parameters);
  });

  test('components enter as their weighted barycentre, one band for two', () => {
    const split = measurement('Ni(II)', [
      termBand(8500, '3T2g', 100, { kind: 'component', degeneracy: 1 }), termBand(8800, '3T2g', 100, { kind: 'component', degeneracy: 2 }),
      termBand(14_500, '3T1g(F)'), termBand(25_300, '3T1g(P)'),
    ]);
    const reading = read(split);
    const merged = reading.bands.find((one) => one.label === 'a3T2g')!;
    expect(merged.bands).toEqual([0, 1]);
    expect(merged.observed).toBeCloseTo(8700, 9);
    expect(codesOf(reading)).toContain('COMPONENTS_AVERAGED');
    expect(numberOf(reading, 'Delta')).toBeCloseTo(numberOf(read(nickelAqua), 'Delta'), -2);
  });

  test('residuals are observed less calculated, and their root mean square is given', () => {
    const reading = read(nickelAqua);
    for (const one of reading.bands) expect(one.residual).toBeCloseTo(one.observed - one.calculated!, 9);
    expect(reading.rmsResidual).toBeCloseTo(Math.sqrt(reading.bands.reduce((sum, one) => sum + one.residual! ** 2, 0) / 3), 9);
  });

  test('bands without a term are taken in the order of the spin-allowed transitions, and the reading says it proposes', () => {
    const untyped = measurement('Ni(II)', nickelAqua.bands.map((one) => ({ ...one, terms: [] })));
    const reading = read(untyped);
    expect(reading.assignment).toBe('proposed');
    expect(reading.bands.map((one) => one.label)).toEqual(['a3T2g', 'a3T1g', 'b3T1g']);
    expect(numberOf(reading, 'Delta')).toBeCloseTo(numberOf(read(nickelAqua), 'Delta'), 6);
  });

  test('an unobserved band is predicted with u = sqrt(j cov j + floor^2) and told whether it was looked for', () => {
    const predicted = (scanned: Measurement['scanned']) => read({ ...chromiumPair, scanned }).predicted.find((one) => one.label === 'b4T1g')!;
    const third = predicted([]);
    // 15B = nu2 + nu3 - 3 nu1.
    const racahB = numberOf(read(chromiumPair), 'B');
    expect(third.position).toBeCloseTo(15 * racahB + 3 * 17_400 - 24_600, 6);
    expect(third.u).toBeGreaterThan(600);
    expect(third.looked).toBe('not recorded');
    expect(predicted([{ low: 10_000, high: 45_000 }]).looked).toBe('inside');
    expect(predicted([{ low: 10_000, high: 30_000 }]).looked).toBe('outside');
  });
});

describe('traps of the trade end in the right refusal or caution', () => {
  test('Ni(II) 8500 and 15 400, ratio 1.81: no solution; read to 20 cm-1 it is refused, read to 100 Delta stands alone with a caution', () => {
    const pair = (u: number) => measurement('Ni(II)', [termBand(8500, '3T2g', u), termBand(15_400, '3T1g(F)', u)]);
    expect(read(pair(20), sharp)).toMatchObject({ verdict: 'refused' });
    const blurred = read(pair(100));
    expect(parameter(blurred, 'B').value).toBeNull();
    expect(codesOf(blurred)).toContain('BAND_RATIO_AT_EDGE');
  });

  test('V(III) 25 600 and 17 200 read as A2g and T2g: no solution', () => {
    expect(read(measurement('V(III)', [termBand(25_600, '3A2g'), termBand(17_200, '3T2g')])).verdict).toBe('refused');
  });

  test('V(III) the same bands read as T1g(P) and T2g: Delta near 18 540, B near 650', () => {
    const reading = read(measurement('V(III)', [termBand(25_600, '3T1g(P)'), termBand(17_200, '3T2g')]));
    expect(numberOf(reading, 'Delta')).toBeCloseTo(18_541, -2);
    expect(numberOf(reading, 'B')).toBeCloseTo(649, -1);
  });

  test('tetrahedral Co(II) 5460 and 14 700 read as octahedral: it looks plausible (6270, 670), so the other geometry is named', () => {
    const reading = read(measurement('Co(II)', [termBand(5460, '4T2g'), termBand(14_700, '4T1g(P)')], { multiplicity: 4 }));
    expect(numberOf(reading, 'Delta')).toBeCloseTo(6270, -1);
    expect(numberOf(reading, 'B')).toBeCloseTo(670, 0);
    expect(codesOf(reading)).toContain('GEOMETRY_RIVAL');
  });

  test('the same with absorptivities of 90 and 550 recorded: the other geometry is named, and ranks above the reading typed', () => {
    const sample = measurement('Co(II)', [termBand(5460, '4T2g', 100, { epsilon: 90 }), termBand(14_700, '4T1g(P)', 100, { epsilon: 550 })], { multiplicity: 4 });
    const { chosen, rivals } = readWithRivals(sample, defaultPolicy, freeIon('published', sample.ion));
    expect(codesOf(chosen)).toContain('GEOMETRY_RIVAL');
    expect(rivals[0]).toMatchObject({ geometry: 'tetrahedral', bands: [{ label: 'a4T1' }, { label: 'b4T1' }] });
    expect(rivals[0]!.score!).toBeLessThan(chosen.score!);
  });

  test('six donor atoms in the record speak against a tetrahedron, and bands as strong as a tetrahedron has outweigh them', () => {
    const told = (epsilon: readonly [number | null, number | null], donors: number | null): readonly string[] => codesOf(read(measurement('Co(II)', [
      termBand(5460, '4T2g', 100, { epsilon: epsilon[0] }), termBand(14_700, '4T1g(P)', 100, { epsilon: epsilon[1] }),
    ], { multiplicity: 4, donors })));
    expect(told([null, null], null)).toContain('GEOMETRY_RIVAL');
    expect(told([null, null], 6)).not.toContain('GEOMETRY_RIVAL');
    expect(told([90, 550], 6)).toContain('GEOMETRY_RIVAL');
    const strong = measurement('Co(II)', [termBand(5460, '4T2g', 100, { epsilon: 90 }), termBand(14_700, '4T1g(P)', 100, { epsilon: 550 })], { multiplicity: 4, donors: 6 });
    const rival = readWithRivals(strong, defaultPolicy, freeIon('published', strong.ion)).rivals.find(({ geometry }) => geometry === 'tetrahedral');
    expect(rival!.ranking).toContain('the record has 6 donor atoms');
  });

  test('a rival that only gives neighbouring lines other names is told quietly; one that moves Delta or B is not', () => {
    const lines = (wide: number) => read(measurement('Cr(III)', [termBand(14_893, '2Eg(G)', 10, { kind: 'line' }), termBand(17_920, '4T2g'), termBand(22_408, '2T2g(G)', 10, { kind: 'line' }), termBand(24_900, '4T1g(F)', wide)], { donors: 6 }));
    expect(lines(100).reason).toContain('Other names for these bands fit as well and leave Delta and B as they are');
    expect(lines(100).cautions.find(({ code }) => code === 'NEAR_RIVAL')!.text).toMatch(/^Other names for these bands .*: a2T1g 14\u2009893,/);
    const cobalt = read(measurement('Co(II)', [termBand(5460, '4T2g'), termBand(14_700, '4T1g(P)')], { multiplicity: 4 }));
    expect(cobalt.reason).toContain('Another reading fits these bands as well');
  });

  test('Cr(III) 24 600 and 37 800 alone, read as the two T1g: they move together, so neither number is given', () => {
    const reading = read(measurement('Cr(III)', [termBand(24_600, '4T1g(F)'), termBand(37_800, '4T1g(P)')]));
    expect(['refused', 'not determinable']).toContain(reading.verdict);
    expect(parameter(reading, 'Delta').value).toBeNull();
    expect(parameter(reading, 'B').value).toBeNull();
  });

  test('Ni(II) with 1Eg within reach of 3T1g carries the caution', () => {
    expect(codesOf(read(nickelAqua))).toContain('SINGLET_NEAR_TRIPLET');
  });
});

/** Freezes everything down to the last band: writing to an input then throws. */
function frozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null) {
    for (const part of Object.values(value)) frozen(part);
    Object.freeze(value);
  }
  return value;
}

/** Every text, number, boolean and null in a value, at any depth. */
function leaves(value: unknown): unknown[] {
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(leaves) : [value];
}

describe('a result depends on its measurement, the policy and the free ion, on nothing else', () => {
  const samples: readonly Measurement[] = [nickelAqua, chromiumPair, cobaltAmmine, cobaltFirstBand, rubyLike, titaniumAqua];

  test('the same digits whatever was read before, to the last bit', () => {
    const first = samples.map((sample) => JSON.stringify(read(sample)));
    const others: Policy[] = [sharp, { ...defaultPolicy, cOverB: { general: { value: 3.7, u: 0.4 }, perIon: {} } }];
    for (const policy of others) for (const sample of samples.toReversed()) read(sample, policy);
    expect(samples.toReversed().map((sample) => JSON.stringify(read(sample)))).toEqual(first.toReversed());
  });

  test('the same digits from an engine that has read nothing yet', async () => {
    const warm = samples.map((sample) => JSON.stringify(read(sample)));
    for (const [i, sample] of samples.entries()) {
      vi.resetModules();
      const cold = await import('#engine');
      expect(cold.readMeasurement).not.toBe(readMeasurement);
      expect(JSON.stringify(cold.readMeasurement(sample, cold.defaultPolicy, cold.freeIon('published', sample.ion)))).toBe(warm[i]);
    }
  });

  test('nothing that was handed in is written to', () => {
    for (const sample of samples) {
      const given = frozen(structuredClone(sample));
      expect(JSON.stringify(readMeasurement(given, frozen(structuredClone(defaultPolicy)), frozen(structuredClone(freeIon('published', sample.ion)))))).toBe(JSON.stringify(read(sample)));
    }
  });

  test('phase and temperature are recorded, not fitted', () => {
    for (const sample of samples) expect(read({ ...sample, phase: 'crystal', temperature: 77 }).parameters).toEqual(read(sample).parameters);
  });

  test('no sentence of a reading holds a gap where a value was meant', () => {
    const texts = samples.flatMap((sample) => leaves(read(sample))).filter((value) => typeof value === 'string');
    expect(texts.filter((text) => text.includes(' ')).length).toBeGreaterThan(40);
    expect(texts.filter((text) => /\b(null|NaN|undefined|Infinity)\b|\.\.$| {2}/.test(text))).toEqual([]);
  });

  test('no number of a reading is NaN or infinite, down to the last predicted band', () => {
    const numbers = samples.flatMap((sample) => leaves(read(sample))).filter((value) => typeof value === 'number');
    expect(numbers.length).toBeGreaterThan(200);
    expect(numbers.filter((value) => !Number.isFinite(value))).toEqual([]);
  });
});
