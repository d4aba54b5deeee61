import type { SpectralFacts } from '../cautions/spectral.ts';
import { shownLabel } from '../levels/labels.ts';
import type { Measurement } from '../measurement/types.ts';
import { concise } from '../quantity/print.ts';
import { transitionsAt } from './evaluate.ts';
import type { Fit } from './fit.ts';
import type { GroundCheck } from './groundCheck.ts';
import type { ScoredReading } from './search.ts';
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
}

/** Ions whose octahedral ground level is an E level: their one spin-allowed band is split by a Jahn-Teller distortion. */
function isJahnTeller(ion: GroundCase): boolean {
  if (ion.geometry !== 'octahedral') return false;
  return (ion.electrons === 4 && ion.multiplicity === 5) || ion.electrons === 9;
}

/** 1Eg minus the nearest 3T1g of octahedral Ni(II) at the fit, cm-1. */
function singletGap(ion: GroundCase, fit: Fit): number | null {
  if (ion.electrons !== 8 || ion.geometry !== 'octahedral' || fit.mode === 'field') return null;
  const { at, ground } = fit.solutions[0]!;
  const [singlet, triplet] = transitionsAt(ion, ground, ['a1Eg', 'a3T1g'], at);
  return singlet!.energy - triplet!.energy;
}

const splitKinds = new Set(['component']);
const doubtfulKinds = new Set(['shoulder', 'dip', 'envelope']);

/** Gathers what the spectral cautions are decided on. */
export function spectralFacts({ measurement, ion, chosen, fit, parameters, ground, predicted }: ReadingParts): SpectralFacts {
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
    twoElectronBandUsed: twoElectron && ion ? shownLabel(twoElectron.label, ion.electrons) : null,
    relativeUB: racahB?.value != null && racahB.uTotal != null ? racahB.uTotal / racahB.value : null,
    coverageNotStated: measurement.bands.some((band) => band.coverageNotStated),
    componentsMerged: merged,
    componentWithoutDegeneracy: measurement.bands.some((band) => band.kind === 'component' && band.degeneracy === null && band.leftOut === null),
    doubtfulReadingUsed: usedBands.some((band) => doubtfulKinds.has(band.kind)),
    mixesOriginsAndMaxima: origins > 0 && origins < fittedBands.length,
    innocenceDoubtful: measurement.innocenceDoubtful,
    nuclearity: measurement.nuclearity,
    emission: measurement.technique === 'emission',
    // Only where C/B moves a published number does it matter that it was assumed.
    ratioAssumed: fit && fit.ratio.origin !== 'fitted' && (fit.byRatio[0] !== 0 || fit.byRatio[1] !== 0) && fit.mode !== 'field' ? concise(fit.ratio.value, fit.ratio.u) : null,
    betaAssumed: fit?.mode === 'field, B assumed' && fit.assumedBeta ? concise(fit.assumedBeta.value, fit.assumedBeta.u) : null,
    beta: beta?.value ?? null,
    uBeta: beta?.uTotal ?? null,
    groundNearCrossing: ground === 'near',
    ratioAtEdge: fit?.mode === 'field' && (chosen?.assigned ?? []).filter((one) => ion && transitionOf(ion, one.label).spinAllowed).length > 1,
    singletGap: ion && fit ? singletGap(ion, fit) : null,
    octahedralCobaltTwo: measurement.ion.name === 'Co(II)' && measurement.geometry === 'octahedral' && ion?.multiplicity === 4 && fit !== null,
    notScanned: ion ? predicted.filter((band) => band.spinAllowed && band.looked === 'outside').map((band) => shownLabel(band.label, ion.electrons)) : [],
    equallyGoodBranch: fit !== null && fit.solutions.length > 1 && fit.solutions[1]!.chi2 - fit.solutions[0]!.chi2 < 1,
  };
}
