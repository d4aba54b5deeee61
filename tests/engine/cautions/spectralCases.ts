import type { Measurement } from '#engine';
import { band, measurement, termBand } from '../measurement/sample.ts';

/** A record that raises a caution, and one that comes near and does not. */
export interface CautionCase {
  readonly raise: Measurement;
  readonly spare: Measurement;
}

const high = { multiplicity: 4 } as const;
const tetrahedral = { geometry: 'tetrahedral', geometryName: 'tetrahedral' } as const;

const nickelBands = [termBand(8700, '3T2g'), termBand(14_500, '3T1g(F)'), termBand(25_300, '3T1g(P)')];
const nickel = measurement('Ni(II)', nickelBands);
const chromiumBands = [termBand(17_400, '4T2g'), termBand(24_600, '4T1g(F)')];
const chromium = measurement('Cr(III)', chromiumBands);
const cobaltLow = measurement('Co(III)', [termBand(21_050, 'a1T1g'), termBand(29_500, 'a1T2g')], { multiplicity: 1 });
const cobaltQuintet = (position: number): Measurement => measurement('Co(III)', [termBand(position, '5Eg')], { multiplicity: 5 });
const cobaltAqua = (a2: number): Measurement => measurement('Co(II)', [termBand(8100, '4T2g'), termBand(a2, '4A2g'), termBand(19_400, '4T1g(P)')], high);
const twoCobaltBands = (terms: readonly [string, string], given: Partial<Measurement>): Measurement =>
  measurement('Co(II)', [termBand(5460, terms[0]), termBand(14_700, terms[1])], given);
const chromiumRead = (u: number): Measurement => measurement('Cr(III)', [termBand(17_400, '4T2g', u), termBand(24_600, '4T1g(F)', u)]);
const chromiumSecond = (position: number): Measurement => measurement('Cr(III)', [termBand(26_700, '4T2g'), termBand(position, '4T1g(F)')]);
const vanadiumWithDip = (dip: number): Measurement =>
  measurement('V(III)', [termBand(17_200, '3T2g'), termBand(20_000, '3T1g(P)'), band(dip, { kind: 'dip', width: 200 })]);
const withKind = (kind: 'maximum' | 'shoulder', halfDigit = 0.5): Measurement =>
  measurement('Cr(III)', [chromiumBands[0]!, termBand(24_600, '4T1g(F)', 100, { kind, halfDigit })]);
const copperEnvelope = measurement('Cu(II)', [termBand(12_600, '2T2g', 300, { kind: 'envelope' })]);
const copperComponents = measurement('Cu(II)', [
  termBand(11_000, '2T2g', 80, { kind: 'component', degeneracy: 1 }), termBand(13_700, '2T2g', 80, { kind: 'component', degeneracy: 2 }),
]);
const chromiumComponents = (degeneracies: readonly [number, number] | null, leftOut: string | null = null): Measurement => measurement('Cr(III)', [
  termBand(16_740, '4T2g', 100, { kind: 'component', degeneracy: degeneracies?.[0] ?? null, leftOut }),
  termBand(20_890, '4T2g', 100, { kind: 'component', degeneracy: degeneracies?.[1] ?? null, leftOut }),
  termBand(26_000, '4T1g(F)'),
]);
const strong = (epsilon: number): Measurement => measurement('Cr(III)', [chromiumBands[0]!, termBand(24_600, '4T1g(F)', 100, { epsilon })]);
const inMedium = (medium: string, first: number): Measurement => ({ ...nickel, medium, bands: [termBand(first, '3T2g'), ...nickelBands.slice(1)] });

/** Low-spin Fe(III) at Delta 33 000, B 600, C 2700: computed by this engine, rounded. */
const ironLow = measurement('Fe(III)', [termBand(29_514, 'a2A2g'), termBand(31_445, 'b2T2g'), termBand(37_342, 'b2T1g')], { multiplicity: 2 });

/** By code, in the order of the list. What is near is named where it is not plain. */
export const spectralCases: Readonly<Record<string, CautionCase>> = {
  SPIN_CONTRADICTS_FIT: { raise: cobaltQuintet(23_000), spare: cobaltQuintet(13_100) },
  // The first two levels of Ni(II) typed the wrong way round.
  BETTER_RIVAL: { raise: measurement('Ni(II)', [termBand(8700, '3T1g(F)'), termBand(14_500, '3T2g'), termBand(25_300, '3T1g(P)')]), spare: nickel },
  // The one band of high-spin Co(III) might be 1T1g of the low-spin ion; the pair of Cr(III) has no such double.
  NEAR_RIVAL: { raise: cobaltQuintet(13_100), spare: chromium },
  GEOMETRY_RIVAL: { raise: twoCobaltBands(['4T2g', '4T1g(P)'], high), spare: cobaltAqua(17_000) },
  WEAK_FOR_SPIN_ALLOWED: { raise: strong(0.5), spare: strong(1.5) },
  STRONG_AS_CHARGE_TRANSFER: { raise: strong(1200), spare: strong(900) },
  SPIN_NEAR_CROSSING: { raise: cobaltQuintet(20_000), spare: cobaltQuintet(19_000) },
  // nu2 and nu3 of octahedral d8 alone have two roots.
  SECOND_SOLUTION: { raise: measurement('Ni(II)', nickelBands.slice(1)), spare: nickel },
  BAND_RATIO_AT_EDGE: { raise: measurement('Ni(II)', [termBand(8500, '3T2g'), termBand(15_400, '3T1g(F)')]), spare: measurement('Ni(II)', [termBand(8500, '3T2g'), termBand(14_400, '3T1g(F)')]) },
  BAND_RATIO_OUTSIDE: { raise: cobaltAqua(16_000), spare: cobaltAqua(16_300) },
  TWO_ELECTRON_BAND: { raise: measurement('Cr(III)', [...chromiumBands, termBand(37_800, '4T1g(P)')]), spare: nickel },
  LOOSE_B: { raise: chromiumRead(400), spare: chromiumRead(250) },
  SPARSE_LOW_SPIN: { raise: ironLow, spare: cobaltLow },
  COVERAGE_NOT_STATED: {
    raise: { ...chromium, bands: [chromiumBands[0]!, { ...chromiumBands[1]!, coverageNotStated: true }] },
    spare: chromium,
  },
  SINGLET_NEAR_TRIPLET: { raise: nickel, spare: measurement('Ni(II)', [termBand(11_200, '3T2g'), termBand(18_350, '3T1g(F)'), termBand(29_000, '3T1g(P)')]) },
  COBALT_GROUND_TERM: { raise: cobaltAqua(17_000), spare: twoCobaltBands(['4T1(F)', '4T1(P)'], tetrahedral) },
  HEAVY_METAL: { raise: measurement('Rh(III)', [termBand(32_700, 'a1T1g'), termBand(39_100, 'a1T2g')], { multiplicity: 1 }), spare: cobaltLow },
  JAHN_TELLER_ENVELOPE: { raise: copperEnvelope, spare: copperComponents },
  TETRAHEDRON_DISTORTS: { raise: measurement('Cu(II)', [termBand(9050, '2E')], tetrahedral), spare: measurement('V(IV)', [termBand(9010, '2T2')], tetrahedral) },
  COMPONENTS_AVERAGED: { raise: chromiumComponents([2, 1]), spare: chromiumComponents(null) },
  COMPONENT_ORDER_OPEN: { raise: chromiumComponents(null), spare: chromiumComponents(null, 'order not decided') },
  ROUGH_BAND_CARRIES_FIT: { raise: withKind('shoulder'), spare: withKind('maximum', 5) },
  DIP_READ_AS_TWO_BANDS: { raise: vanadiumWithDip(18_600), spare: vanadiumWithDip(20_900) },
  SOLVENT_OVERTONE_NEARBY: { raise: inMedium('water', 8500), spare: inMedium('D2O', 8500) },
  // The origin of the narrow 2Eg line is its maximum; that of a broad band is not.
  ORIGIN_MIXED_WITH_MAXIMA: {
    raise: measurement('Cr(III)', [termBand(16_200, '4T2g', 20, { kind: 'zero-phonon' }), chromiumBands[1]!]),
    spare: measurement('Cr(III)', [...chromiumBands, termBand(14_900, '2Eg', 15, { kind: 'zero-phonon' })]),
  },
  LIGAND_INNOCENCE: { raise: { ...chromium, innocenceDoubtful: true }, spare: chromium },
  MORE_THAN_ONE_METAL: { raise: { ...chromium, nuclearity: 2 }, spare: chromium },
  EMISSION: { raise: { ...chromium, technique: 'emission' }, spare: { ...chromium, technique: 'excitation' } },
  // Spin-allowed bands of Cr(III) do not feel C; those of low-spin Co(III) do.
  C_ASSUMED: { raise: cobaltLow, spare: chromium },
  B_ASSUMED: { raise: measurement('Co(II)', [termBand(8100, '4T2g')], high), spare: measurement('Cr(III)', [termBand(17_400, '4T2g')]) },
  BETA_ABOVE_ONE: { raise: measurement('Ni(II)', [termBand(8700, '3T2g'), termBand(14_900, '3T1g(F)'), termBand(28_500, '3T1g(P)')]), spare: nickel },
  BETA_VERY_LOW: { raise: chromiumSecond(29_500), spare: chromiumSecond(30_500) },
  STRONG_BAND_NOT_SCANNED: { raise: { ...chromium, scanned: [{ low: 9000, high: 30_000 }] }, spare: { ...chromium, scanned: [{ low: 9000, high: 45_000 }] } },
};
