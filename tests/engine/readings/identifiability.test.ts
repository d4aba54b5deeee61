import { describe, expect, test } from 'vitest';
import { defaultPolicy, shownLabel } from '#engine';
import type { Measurement, Policy } from '#engine';
import { measurement, termBand } from '../measurement/sample.ts';
import { numberOf, parameter, read } from './readSample.ts';

const cobalt = measurement('Co(III)', [termBand(21_050, 'a1T1g'), termBand(29_500, 'a1T2g')], { multiplicity: 1 });
const withRatio = (value: number): Policy => ({ ...defaultPolicy, cOverB: { ...defaultPolicy.cOverB, general: { value, u: 0.9 } } });

describe('what two bands of low-spin Co(III) fix', () => {
  test('two of three numbers, and the combination of Delta and C is said', () => {
    const { identifiability } = read(cobalt);
    expect(identifiability!.rank).toBe(2);
    expect(identifiability!.singularValues).toHaveLength(3);
    expect(identifiability!.combination).toMatch(/^Delta − 0\.[56]\d C is fixed to \d\d\u2009\d+\(\d+\) cm⁻¹ for any C nearby\.$/);
  });

  test('another C/B moves Delta and leaves the combination where it is, within its own uncertainty', () => {
    const told = [4.2, 4.8].map((ratio) => {
      const reading = read(cobalt, withRatio(ratio));
      const [, value, u] = /fixed to ([\d\u2009]+)\((\d+)\)/.exec(reading.identifiability!.combination!)!;
      return { delta: numberOf(reading, 'Delta'), combination: Number(value!.replace('\u2009', '')), u: Number(u) };
    });
    expect(Math.abs(told[0]!.delta - told[1]!.delta)).toBeGreaterThan(150);
    expect(Math.abs(told[0]!.combination - told[1]!.combination)).toBeLessThan(told[0]!.u);
  });

  test('bands that fix all they are asked for leave no combination', () => {
    expect(read(measurement('Cr(III)', [termBand(17_400, '4T2g'), termBand(24_600, '4T1g(F)')])).identifiability!.combination).toBeNull();
  });
});

describe('what to measure next does what it says', () => {
  const cases: readonly (readonly [string, Measurement])[] = [
    ['Ni(II), the third band', measurement('Ni(II)', [termBand(8700, '3T2g', 300), termBand(14_500, '3T1g(F)', 300)])],
    ['Co(II) without its third band', measurement('Co(II)', [termBand(8100, '4T2g'), termBand(17_000, '4A2g')], { multiplicity: 4 })],
    ['Cr(III) with two loose bands', measurement('Cr(III)', [termBand(17_400, '4T2g', 300), termBand(24_600, '4T1g(F)', 300)])],
    ['Cr(III) with its first band alone: a line gives B', measurement('Cr(III)', [termBand(17_400, '4T2g')])],
  ];

  test('a line is not promised to fix what it cannot: C stays assumed where B is not fixed without it', () => {
    const looseB = read(measurement('Co(II)', [termBand(8100, '4T2g'), termBand(17_000, '4A2g')], { multiplicity: 4 }));
    expect(looseB.helpfulBands.map(({ label }) => label)).toEqual(['b4T1g']);
  });

  test.each(cases)('%s: seen where it is expected, the band gives the u that was promised', (_, sample) => {
    const before = read(sample);
    const help = before.helpfulBands[0]!;
    const expected = before.predicted.find(({ label }) => label === help.label)!;
    const line = !expected.spinAllowed;
    const after = read({ ...sample, bands: [...sample.bands, termBand(expected.position, shownLabel(help.label, sample.ion.electrons), line ? 15 : 80, { kind: line ? 'line' : 'maximum' })] });
    expect(expected.position).toBeGreaterThan(help.low);
    expect(expected.position).toBeLessThan(help.high);
    for (const { parameter: name, uNow, uThen } of help.gains) {
      expect(Math.abs(parameter(after, name).uTotal! / uThen - 1), name).toBeLessThan(0.03);
      expect(uNow).toBe(parameter(before, name).uTotal);
    }
    expect(before.helpfulBands[0]!.sentence).toBe(before.measureNext);
  });
});
