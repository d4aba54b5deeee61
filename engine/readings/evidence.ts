import type { FreeIon } from '../ions/types.ts';
import type { Band, Measurement } from '../measurement/types.ts';
import type { Range } from '../quantity/range.ts';
import { betaPenalty } from './betaPenalty.ts';
import { misfitOfOne } from './comparedLines.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import { absorptivityLimits, evidenceWeights, usualAbsorptivities, widthLimits } from './evidenceWeights.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import { transitionOf, transitionsOf } from './transitions.ts';
import type { GroundCase, Transition } from './transitions.ts';
import type { Evidence } from './types.ts';

/** Score of a reading: chi2 + 2 x free parameters + evidence. */
export const scoreOf = (evidence: readonly Evidence[]): number => evidence.reduce((sum, one) => sum + one.penalty, 0);

/** Charge transfer by its strength. */
export const isStrong = (band: Band): boolean => band.epsilon !== null && band.epsilon > absorptivityLimits.chargeTransfer;

export const looksNarrow = (band: Band): boolean => band.kind === 'line' || band.kind === 'zero-phonon' || band.kind === 'dip' || (band.width !== null && band.width < widthLimits.line);

export const looksWeak = (band: Band): boolean => band.epsilon !== null && band.epsilon < absorptivityLimits.spinAllowed;

/** Classes overlap in practice (chelates, low symmetry), so the penalty grows with the square of the decades off: one class is one decade. */
function absorptivityEvidence(ion: GroundCase, transition: Transition, band: Band): Evidence[] {
  const { epsilon } = band;
  if (epsilon === null || epsilon <= 0) return [];
  const { low, high } = usualAbsorptivities[ion.geometry][transition.spinAllowed ? 'spinAllowed' : 'spinForbidden'];
  const decades = epsilon > high ? Math.log10(epsilon / high) : epsilon < low ? Math.log10(low / epsilon) : 0;
  return decades === 0 ? [] : [{ code: 'absorptivity', penalty: evidenceWeights.absorptivityDecade * decades ** 2, label: transition.label, value: epsilon }];
}

function widthEvidence(transition: Transition, band: Band): Evidence[] {
  if (looksNarrow(band) && !transition.sameConfiguration && band.kind !== 'zero-phonon' && band.kind !== 'dip')
    return [{ code: 'width', penalty: evidenceWeights.width, label: transition.label, value: band.width }];
  if (transition.sameConfiguration && !transition.spinAllowed && band.width !== null && band.width > widthLimits.spinFlip)
    return [{ code: 'width', penalty: evidenceWeights.width, label: transition.label, value: band.width }];
  // A broad spin-forbidden band without a recorded strength is possible, not likely, where spin-allowed bands exist.
  if (!transition.spinAllowed && !transition.sameConfiguration && band.epsilon === null && !looksNarrow(band))
    return [{ code: 'forbidden and broad', penalty: evidenceWeights.forbiddenBroad, label: transition.label, value: null }];
  return [];
}

/** What a band's strength and width say against its being a transition. */
export function bandEvidence(ion: GroundCase, label: string, band: Band): Evidence[] {
  const transition = transitionOf(ion, label);
  const quartetsOnly = transitionsOf(ion).every((one) => !one.spinAllowed);
  const width = widthEvidence(transition, band).filter((one) => !(quartetsOnly && one.code === 'forbidden and broad'));
  return [...absorptivityEvidence(ion, transition, band), ...width];
}

/** Bands that are only compared with the fit count by how far they lie from where it puts them. */
function misfitOfCompared(assigned: readonly Assigned[], fit: Fit): number {
  return assigned.reduce((sum, { observation }, k) => {
    if (fit.used[k]) return sum;
    const { energy, gradient } = fit.calculated[k]!;
    return sum + misfitOfOne(observation, fit.floors[k]!, { energy, variance: quadratic([gradient.delta, gradient.racahB, gradient.racahC], fit.total) });
  }, 0);
}

/** An assumed B is a choice as much as a fitted one. */
const parametersOf = { field: 1, 'field, B assumed': 2, 'field, B': 2, 'field, B by a line': 2, 'field, B, C': 3 } as const;

const within = (ranges: readonly Range[], position: number): boolean => ranges.some((range) => position >= range.low && position <= range.high);

/** Transitions that are seen as bands where they lie inside what was scanned: the spin-allowed ones; of high-spin d5, which has none, those with one spin turned. */
export function expectedTransitions(ion: GroundCase): readonly Transition[] {
  const all = transitionsOf(ion);
  const allowed = all.filter((t) => t.spinAllowed);
  return allowed.length > 0 ? allowed : all.filter((t) => t.multiplicity === ion.multiplicity - 2);
}

/** Transitions that the fit predicts where a band should have been seen. */
function unseenEvidence(measurement: Measurement, ion: GroundCase, assigned: readonly Assigned[], fit: Fit): Evidence[] {
  const { at, ground } = fit.solutions[0]!;
  const positions = assigned.map((one) => one.observation.position);
  const lowest = Math.min(...positions);
  const highest = Math.max(...positions);
  const all = transitionsOf(ion);
  const awaited = expectedTransitions(ion);
  const expected = (t: Transition): boolean => awaited.includes(t);
  const open = all.filter((t) => (expected(t) || t.sameConfiguration) && !assigned.some((one) => one.label === t.label));
  const lines = assigned.filter((one) => !transitionOf(ion, one.label).spinAllowed).map((one) => one.observation.position);
  const looked = [...measurement.scanned, ...measurement.absent];
  const labels = open.map((t) => t.label);
  let twoElectronUnseen = false;
  return transitionsAt(ion, ground, labels, at).flatMap(({ energy, gradient }, i): Evidence[] => {
    const label = labels[i]!;
    // A spin-flip line below an assigned one is seldom missed: the lowest is the strongest.
    if (!expected(open[i]!)) return lines.some((position) => position > energy) ? [{ code: 'line skipped', penalty: evidenceWeights.lineSkipped, label, value: energy }] : [];
    // The derivative by Delta counts the electrons promoted to e (Hellmann-Feynman).
    const twoElectrons = Math.abs(gradient.delta) > 1.5;
    if (energy > lowest && energy <= highest) return [{ code: 'gap', penalty: twoElectrons ? evidenceWeights.twoElectronGap : evidenceWeights.gap, label, value: energy }];
    // Low-spin ions have a host of two-electron transitions in the ultraviolet: together they count once.
    if (!within(looked, energy)) return energy < lowest ? [{ code: 'below', penalty: evidenceWeights.below, label, value: energy }] : [];
    if (twoElectrons && twoElectronUnseen) return [];
    twoElectronUnseen ||= twoElectrons;
    return [{ code: 'unseen', penalty: twoElectrons ? evidenceWeights.twoElectronUnseen : evidenceWeights.unseen, label, value: energy }];
  });
}

/** The formula of the sample speaks against a geometry of another number of corners; what absorbs may be another species all the same. */
function donorEvidence({ donors }: Measurement, { geometry }: GroundCase): Evidence[] {
  return donors === null || donors === (geometry === 'octahedral' ? 6 : 4) ? [] : [{ code: 'donors', penalty: evidenceWeights.donors, label: '', value: donors }];
}

/** Everything that speaks against a fitted reading; entries without a penalty are left out. */
export function gatherEvidence(
  measurement: Measurement, ion: GroundCase, assigned: readonly Assigned[], leftOver: number, fit: Fit, freeIon: FreeIon | null,
): readonly Evidence[] {
  const { at, chi2 } = fit.solutions[0]!;
  const beta = fit.assumedBeta ? 0 : betaPenalty(at.racahB, freeIon);
  const all: Evidence[] = [
    { code: 'misfit', penalty: chi2 + misfitOfCompared(assigned, fit), label: '', value: null },
    { code: 'parameters', penalty: evidenceWeights.parameter * parametersOf[fit.mode], label: '', value: null },
    { code: 'left over', penalty: evidenceWeights.leftOver * leftOver, label: '', value: leftOver },
    ...donorEvidence(measurement, ion),
    { code: 'beta', penalty: beta, label: '', value: freeIon && beta > 0 ? at.racahB / freeIon.racahB0 : null },
    ...assigned.flatMap((one) => one.observation.bands.flatMap((index) => bandEvidence(ion, one.label, measurement.bands[index]!))),
    ...unseenEvidence(measurement, ion, assigned, fit),
  ];
  return all.filter((one) => one.penalty > 0);
}
