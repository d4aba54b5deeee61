import { describe, expect, test } from 'vitest';
import { spectralCautions } from '../../../engine/cautions/spectral.ts';
import type { SpectralFacts } from '../../../engine/cautions/spectral.ts';
import { defaultPolicy, freeIon, readWithRivals } from '#engine';
import type { Measurement, Reading } from '#engine';
import { codesOf } from '../readings/readSample.ts';
import { spectralCases } from './spectralCases.ts';

const chosen = (sample: Measurement): Reading => readWithRivals(sample, defaultPolicy, freeIon('published', sample.ion)).chosen;

/** Facts that raise everything at once; two cautions stand for one another. */
const everything: SpectralFacts = {
  electrons: 8, octahedral: true, row: '4d', jahnTellerEnvelope: true, tetrahedronDistorts: true, twoElectronBandUsed: '4A2g', relativeUB: 0.12, coverageNotStated: true,
  componentsMerged: true, componentWithoutDegeneracy: true, mixesOriginsAndMaxima: true, innocenceDoubtful: true, nuclearity: 2, emission: true,
  ratioAssumed: '4.5(9)', betaAssumed: '0.75(12)', beta: 1.2, uBeta: 0.01, groundNearCrossing: true, ratioAtEdge: true, ratiosOutside: ['4A2g/4T2g = 1.98 (2.00 to 2.25)'],
  sparseLowSpin: true, singletGap: 100, octahedralCobaltTwo: true, notScanned: ['4T1g'], equallyGoodBranch: true, groundContradicted: true, rival: 'near', rivalGeometry: true,
  rivalWords: 'a rival', rivalSameNumbers: false, forbiddenUsedAsAllowed: ['4T2g'], chargeTransferUsed: ['4T1g'], dipBetweenMaxima: true, roughBandCarriesFit: '4T2g',
  nearSolventOvertone: { band: 8500, solvent: 'water' },
};

test('every spectral caution has a case, and no case is for another', () => {
  const raised = [everything, { ...everything, rival: 'better' as const }, { ...everything, beta: 0.2 }].flatMap((facts) => spectralCautions(facts));
  expect(Object.keys(spectralCases).sort()).toEqual([...new Set(raised.map(({ code }) => code))].sort());
});

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
