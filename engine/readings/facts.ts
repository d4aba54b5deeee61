import { isOutside, ratioWindows } from '../cautions/ratioWindows.ts';
import type { RatioWindow } from '../cautions/ratioWindows.ts';
import type { SpectralFacts } from '../cautions/spectral.ts';
import { shownLabel } from '../levels/labels.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { concise } from '../quantity/print.ts';
import { transitionsAt } from './evaluate.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import type { GroundCheck } from './groundCheck.ts';
import type { ScoredReading } from './scoring.ts';
import { transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { Parameter, PredictedBand } from './types.ts';

/** One reading with what it was made of. */
export interface ReadingParts {
  readonly measurement: Measurement;
  /** null where the measurement could not be read at all. */
  readonly ion: GroundCase | null;
  readonly chosen: ScoredReading | null;
  readonly fit: Fit | null;
  readonly parameters: readonly Parameter[];
  readonly ground: GroundCheck;
  readonly predicted: readonly PredictedBand[];
  readonly policy: Policy;
  readonly rivals: { readonly best: 'near' | 'better' | null; readonly otherGeometry: boolean; readonly sameNumbers: boolean; readonly words: string };
}

/** Ions whose octahedral ground level is an E level: their one spin-allowed band is split by a Jahn-Teller distortion. */
function isJahnTeller(ion: GroundCase): boolean {
  if (ion.geometry !== 'octahedral') return false;
  return (ion.electrons === 4 && ion.multiplicity === 5) || ion.electrons === 9;
}

/** Ions whose tetrahedral ground level is T2: a Jahn-Teller distortion flattens their site (common practice, no source). */
function distortsTetrahedron(ion: GroundCase): boolean {
  return ion.geometry === 'tetrahedral' && ((ion.electrons === 4 && ion.multiplicity === 5) || ion.electrons === 9);
}

/** 1Eg minus the nearest 3T1g of octahedral Ni(II) at the fit, cm-1. */
function singletGap(ion: GroundCase, fit: Fit): number | null {
  if (ion.electrons !== 8 || ion.geometry !== 'octahedral' || fit.mode === 'field') return null;
  const { at, ground } = fit.solutions[0]!;
  const [singlet, triplet] = transitionsAt(ion, ground, ['a1Eg', 'a3T1g'], at);
  return singlet!.energy - triplet!.energy;
}

/** Molar absorption coefficients, L mol-1 cm-1: below the first hardly spin-allowed, above the second charge transfer (common practice, no source). */
const weakBelow = 1;
const strongAbove = 1000;

/** Fitted bands whose strength does not go with a spin-allowed d-d transition, as printed. */
function strengthMismatch(
  measurement: Measurement, ion: GroundCase, fitted: readonly Assigned[], isOff: (spinAllowed: boolean, epsilon: number) => boolean,
): string[] {
  return fitted
    .filter(({ label, observation }) => observation.bands.some((index) => {
      const { epsilon } = measurement.bands[index]!;
      return epsilon !== null && isOff(transitionOf(ion, label).spinAllowed, epsilon);
    }))
    .map(({ label }) => shownLabel(label, ion.electrons));
}

/** An interference dip lies on one broad band: maxima within this of it on both sides are its two edges. */
const dipReach = 2500;

function dipBetween(measurement: Measurement, usedIndices: readonly number[]): boolean {
  const maxima = usedIndices.map((index) => measurement.bands[index]!).filter((band) => band.kind === 'maximum' || band.kind === 'shoulder');
  return measurement.bands.some((dip) => dip.kind === 'dip' &&
    maxima.some((band) => band.position < dip.position && dip.position - band.position < dipReach) &&
    maxima.some((band) => band.position > dip.position && band.position - dip.position < dipReach));
}

function windowWords({ least, most }: RatioWindow): string {
  const [low, high] = [least, most].map((limit) => limit?.toFixed(2));
  return high === undefined ? `at least ${low}` : `${low} to ${high}`;
}

/** Ratios of fitted bands outside their windows, as printed. */
function ratiosOutside(ion: GroundCase, fitted: readonly Assigned[]): string[] {
  const positionOf = (label: string): number | undefined => fitted.find((one) => one.label === label)?.observation.position;
  return ratioWindows(ion).flatMap((window) => {
    const [upper, lower] = [positionOf(window.upper), positionOf(window.lower)];
    if (upper === undefined || lower === undefined || !isOutside(window, upper / lower)) return [];
    const names = [window.upper, window.lower].map((label) => shownLabel(label, ion.electrons)).join('/');
    return [`${names} = ${(upper / lower).toFixed(2)} (${windowWords(window)})`];
  });
}

/** Low-spin ions whose bands are rarely enough for B: octahedral d4, d5 and d7. */
const isSparseLowSpin = ({ electrons, geometry, multiplicity }: GroundCase): boolean =>
  geometry === 'octahedral' && [4, 5, 7].includes(electrons) && multiplicity < Math.min(electrons, 10 - electrons) + 1;

/** Half of the last digit from which a position counts as rounded, cm-1. */
const roundedFrom = 50;

/** Roughly read band on which more than half of a tested fit, or any of an untested one with better bands beside it, hangs. */
function roughBand(measurement: Measurement, ion: GroundCase | null, chosen: ScoredReading | null, fit: Fit | null): string | null {
  if (!ion || !chosen || !fit) return null;
  const rough = chosen.assigned.find(({ observation }, k) => fit.used[k] && (fit.leverage[k] ?? 0) > 0.5 &&
    observation.bands.some((index) => doubtfulKinds.has(measurement.bands[index]!.kind) || measurement.bands[index]!.halfDigit >= roundedFrom));
  return rough ? shownLabel(rough.label, ion.electrons) : null;
}

/**
 * Overtones and combinations of common solvents in the near infrared, cm-1 (common practice, from memory): water
 * 5180, 6900, 8350, 10 250; alcohols 4800, 6850; C-H stretches of organic solvents 5800 and 8500.
 */
const solventBands: readonly { readonly words: RegExp; readonly name: string; readonly positions: readonly number[] }[] = [
  { words: /water|aqueous|acid|buffer/i, name: 'water', positions: [5180, 6900, 8350, 10_250] },
  { words: /methanol|ethanol|alcohol|glycol/i, name: 'alcohol', positions: [4800, 5800, 6850, 8500] },
  { words: /acetonitrile|acetone|toluene|hexane|dichloromethane|chloroform|dimethyl|formamide|nitromethane|tetrahydrofuran/i, name: 'C–H of the solvent', positions: [5800, 8500] },
];
const overtoneReach = 200;

function solventOvertone(measurement: Measurement, usedIndices: readonly number[]): { band: number; solvent: string } | null {
  const { medium } = measurement;
  if (medium === null || measurement.phase !== 'solution' || /D2O|deuter/i.test(medium)) return null;
  for (const { words, name, positions } of solventBands) {
    if (!words.test(medium)) continue;
    const hit = usedIndices.map((index) => measurement.bands[index]!).find((band) => positions.some((position) => Math.abs(position - band.position) < overtoneReach));
    if (hit) return { band: Math.round(hit.position), solvent: name };
  }
  return null;
}

const splitKinds = new Set(['component']);
const doubtfulKinds = new Set(['shoulder', 'dip', 'envelope']);

/** Whether Delta or B moves with the assumed C/B by more than rounding. */
const movesWithRatio = (fit: Fit): boolean => Math.abs(fit.byRatio[0]!) + Math.abs(fit.byRatio[1]!) > 1e-6 * fit.solutions[0]!.at.delta;

/** Gathers what the spectral cautions are decided on. */
export function spectralFacts({ measurement, ion, chosen, fit, parameters, ground, predicted, rivals }: ReadingParts): SpectralFacts {
  const fittedBands = (chosen?.assigned ?? []).filter((_, k) => fit?.used[k] ?? false);
  const usedIndices = fittedBands.flatMap((one) => one.observation.bands);
  const usedBands = usedIndices.map((index) => measurement.bands[index]!);
  const twoElectron = ion ? fittedBands.find((one) => transitionOf(ion, one.label).floorClass === 'twoElectron') : undefined;
  const [, racahB, , beta] = parameters;
  const merged = fittedBands.some((one) => one.observation.bands.length > 1);
  const broadOrigin = (index: number, label: string): boolean =>
    measurement.bands[index]!.kind === 'zero-phonon' && ion !== null && !transitionOf(ion, label).sameConfiguration;
  const origins = fittedBands.filter((one) => one.observation.bands.some((index) => broadOrigin(index, one.label))).length;
  return {
    electrons: measurement.ion.electrons,
    octahedral: measurement.geometry === 'octahedral',
    row: measurement.ion.row,
    jahnTellerEnvelope: ion !== null && fit !== null && isJahnTeller(ion) && !merged && usedBands.every((band) => !splitKinds.has(band.kind)),
    tetrahedronDistorts: ion !== null && fit !== null && distortsTetrahedron(ion),
    twoElectronBandUsed: twoElectron && ion ? shownLabel(twoElectron.label, ion.electrons) : null,
    relativeUB: racahB?.value != null && racahB.uTotal != null ? racahB.uTotal / racahB.value : null,
    coverageNotStated: measurement.bands.some((band) => band.coverageNotStated),
    componentsMerged: merged,
    componentWithoutDegeneracy: measurement.bands.some((band) => band.kind === 'component' && band.degeneracy === null && band.leftOut === null),
    mixesOriginsAndMaxima: origins > 0 && origins < fittedBands.length,
    innocenceDoubtful: measurement.innocenceDoubtful,
    nuclearity: measurement.nuclearity,
    emission: measurement.technique === 'emission',
    // Only where C/B moves a published number does it matter that it was assumed.
    ratioAssumed: fit && fit.ratio.origin !== 'fitted' && fit.mode !== 'field' && movesWithRatio(fit) ? concise(fit.ratio.value, fit.ratio.u) : null,
    betaAssumed: fit?.mode === 'field, B assumed' && fit.assumedBeta ? concise(fit.assumedBeta.value, fit.assumedBeta.u) : null,
    beta: beta?.value ?? null,
    uBeta: beta?.uTotal ?? null,
    groundNearCrossing: ground === 'near',
    ratioAtEdge: fit?.mode === 'field' && (chosen?.assigned ?? []).filter((one) => ion && transitionOf(ion, one.label).spinAllowed).length > 1,
    ratiosOutside: ion && fit ? ratiosOutside(ion, fittedBands) : [],
    sparseLowSpin: ion !== null && racahB?.value != null && isSparseLowSpin(ion),
    singletGap: ion && fit ? singletGap(ion, fit) : null,
    octahedralCobaltTwo: measurement.ion.name === 'Co(II)' && measurement.geometry === 'octahedral' && ion?.multiplicity === 4 && fit !== null,
    notScanned: ion ? predicted.filter((band) => band.spinAllowed && band.looked === 'outside').map((band) => shownLabel(band.label, ion.electrons)) : [],
    groundContradicted: ground === 'contradicts',
    rival: rivals.best,
    rivalGeometry: rivals.otherGeometry,
    rivalSameNumbers: rivals.sameNumbers,
    rivalWords: rivals.words,
    forbiddenUsedAsAllowed: ion ? strengthMismatch(measurement, ion, fittedBands, (expected, epsilon) => expected && epsilon < weakBelow) : [],
    chargeTransferUsed: ion ? strengthMismatch(measurement, ion, fittedBands, (_, epsilon) => epsilon > strongAbove) : [],
    dipBetweenMaxima: dipBetween(measurement, usedIndices),
    roughBandCarriesFit: roughBand(measurement, ion, chosen, fit),
    nearSolventOvertone: solventOvertone(measurement, usedIndices),
    equallyGoodBranch: fit !== null && fit.solutions.length > 1 && fit.solutions[1]!.chi2 - fit.solutions[0]!.chi2 < 1,
  };
}
