import { describe, expect, test } from 'vitest';
import { defaultPolicy, freeIon, readWithRivals } from '#engine';
import type { Measurement, Reading } from '#engine';
import { codesOf } from '../readings/readSample.ts';
import { spectralCases } from './spectralCases.ts';

const chosen = (sample: Measurement): Reading => readWithRivals(sample, defaultPolicy, freeIon('published', sample.ion)).chosen;

describe.each(Object.entries(spectralCases))('%s', (code, { raise, spare }) => {
  test('is raised by its record, once, with a whole sentence', () => {
    const found = chosen(raise).cautions.filter((caution) => caution.code === code);
    expect(found.map((caution) => caution.code)).toEqual([code]);
    expect(found[0]!.text).toMatch(/^\S.*\.$/);
    expect(found[0]!.text).not.toMatch(/undefined|null|NaN|\(\)|: \.| {2}/);
  });

  test('is not raised by a record that comes near', () => {
    expect(codesOf(chosen(spare))).not.toContain(code);
  });
});

test('the bands of which a caution speaks are named as chemists write them', () => {
  const text = (code: string) => chosen(spectralCases[code]!.raise).cautions.find((caution) => caution.code === code)!.text;
  expect(text('BAND_RATIO_OUTSIDE')).toContain('4A2g/4T2g = 1.98 (2.00 to 2.25)');
  expect(text('STRONG_BAND_NOT_SCANNED')).toContain('b4T1g');
  expect(text('ROUGH_BAND_CARRIES_FIT')).toContain('a4T1g');
  expect(text('SOLVENT_OVERTONE_NEARBY')).toMatch(/water.*8500/);
  expect(text('BETTER_RIVAL')).toMatch(/3T2g 8\D?700/);
  expect(text('LOOSE_B')).toMatch(/12\D? ?%/);
});

test('a measurement that cannot be read still carries what is known of it', () => {
  const sample: Measurement = { ...spectralCases['EMISSION']!.raise, geometry: null, geometryName: 'square planar', innocenceDoubtful: true };
  expect(codesOf(chosen(sample))).toEqual(['LIGAND_INNOCENCE', 'EMISSION']);
});
