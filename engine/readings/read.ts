import { spectralCautions } from '../cautions/spectral.ts';
import type { FreeIon } from '../ions/types.ts';
import { groundLabel } from '../levels/labels.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { verdictSentence } from '../words/verdict.ts';
import { upperTail } from './chiSquare.ts';
import { spectralFacts } from './facts.ts';
import { deltaOverB, isFit, ratioFor } from './fit.ts';
import type { Fit } from './fit.ts';
import { checkGround } from './groundCheck.ts';
import type { GroundCheck } from './groundCheck.ts';
import { measureNext } from './measureNext.ts';
import { predictedBands } from './predicted.ts';
import { nothingPublished, publishedCorrelations, publishParameters, restingOn } from './publish.ts';
import { searchReadings } from './search.ts';
import type { ScoredReading } from './search.ts';
import type { GroundCase } from './transitions.ts';
import type { Branch, Parameter, Reading, ReadingBand } from './types.ts';
import type { Verdict } from '../words/types.ts';

/** Spare bands that disagree with a probability below this make a reading strained. */
const strainedBelow = 0.01;

/** The ground multiplicity of a measurement: as declared, or the highest where ion and geometry leave no choice. */
function groundCase(measurement: Measurement): GroundCase | string {
  const { ion, geometry, multiplicity } = measurement;
  if (geometry === null) return `${measurement.geometryName} complexes are stored and drawn, not fitted`;
  if (ion.electrons < 1 || ion.electrons > 9) return `a d${ion.electrons} ion has no d-d transitions`;
  const highest = Math.min(ion.electrons, 10 - ion.electrons) + 1;
  const choice = geometry === 'octahedral' && ion.electrons >= 4 && ion.electrons <= 7;
  if (multiplicity === null && choice) return 'the spin state is not declared';
  return { electrons: ion.electrons, geometry, multiplicity: multiplicity ?? highest };
}

/**
 * Reads one measurement: assigns its bands (as typed, or in the spin-allowed order where nothing is typed),
 * fits what they can fix, and says what may be published of it and what not.
 *
 * Depends on the measurement, the policy and the free ion alone.
 *
 * @param freeIon the ion's entry in the policy's free-ion set; null where the set has none
 */
export function readMeasurement(measurement: Measurement, policy: Policy, freeIon: FreeIon | null): Reading {
  const ion = groundCase(measurement);
  if (typeof ion === 'string') return unread(measurement, ion);
  const ratio = ratioFor(policy, measurement.ion.name);
  const [chosen] = searchReadings(measurement, ion, policy, ratio, freeIon);
  if (!chosen) return unread(measurement, 'no band can be assigned');
  const { outcome } = chosen;
  if (!isFit(outcome)) return withoutFit(measurement, ion, chosen, policy, outcome.status, outcome.reason);
  const ground = checkGround(ion, outcome, freeIon);
  if (ground === 'contradicts')
    return withoutFit(measurement, ion, chosen, policy, 'refused', groundContradiction(ion, outcome), outcome);
  return fitted(measurement, ion, chosen, outcome, ground, policy, freeIon);
}

function groundContradiction(ion: GroundCase, fit: Fit): string {
  const { at } = fit.solutions[0]!;
  const ratio = deltaOverB(at);
  const where = fit.mode === 'field' || ratio === null ? `Delta = ${Math.round(at.delta)} cm⁻¹` : `Delta/B = ${ratio.toFixed(1)}`;
  return `at ${where} the ground state has another spin than the declared multiplicity ${ion.multiplicity}`;
}

function readingBands(chosen: ScoredReading, fit: Fit | null, policy: Policy, floors: readonly number[]): readonly ReadingBand[] {
  return chosen.assigned.map(({ label, observation }, k) => {
    const calculated = fit?.calculated[k] ?? null;
    return {
      bands: observation.bands, label, observed: observation.position, uMinus: observation.uMinus, uPlus: observation.uPlus,
      uAssumed: observation.uAssumed, floor: fit?.floors[k] ?? floors[k] ?? policy.floors.general, used: fit?.used[k] ?? false,
      calculated: calculated?.energy ?? null, residual: calculated ? observation.position - calculated.energy : null,
      gradient: calculated?.gradient ?? null,
    };
  });
}

/** A reading of a measurement to which nothing can be assigned. */
function unread(measurement: Measurement, reason: string): Reading {
  return {
    verdict: 'not determinable', reason: verdictSentence({ ...noFacts, verdict: 'not determinable', reason }), assignment: 'none',
    geometry: measurement.geometry, multiplicity: measurement.multiplicity, ground: null, bands: [],
    notFitted: measurement.bands.map((_, band) => ({ band, reason })), branches: [], parameters: nothingPublished(reason), correlations: [],
    deltaOverB: null, chi2: null, bandsUsed: 0, spareBands: 0, rmsResidual: null, ratio: null, predicted: [],
    cautions: spectralCautions(spectralFacts({ measurement, ion: null, chosen: null, fit: null, parameters: [], ground: 'agrees', predicted: [] })),
    measureNext: null,
  };
}

const noFacts = { bandsUsed: 0, spareBands: 0, chi2: null, probability: null, reason: null, resting: [], assumed: null } as const;

function withoutFit(
  measurement: Measurement, ion: GroundCase, chosen: ScoredReading, policy: Policy, verdict: 'refused' | 'not determinable', reason: string, fit: Fit | null = null,
): Reading {
  return {
    verdict, reason: verdictSentence({ ...noFacts, verdict, reason }), assignment: chosen.origin, geometry: ion.geometry, multiplicity: ion.multiplicity,
    ground: groundLabel(ion.electrons, ion.geometry, ion.multiplicity), bands: readingBands(chosen, fit, policy, []), notFitted: chosen.notFitted,
    branches: fit ? branchesOf(fit, false) : [], parameters: nothingPublished(reason), correlations: [], deltaOverB: null, chi2: fit?.solutions[0]?.chi2 ?? null,
    bandsUsed: 0, spareBands: 0, rmsResidual: null, ratio: null, predicted: [],
    cautions: spectralCautions(spectralFacts({ measurement, ion, chosen, fit: null, parameters: [], ground: 'agrees', predicted: [] })),
    measureNext: null,
  };
}

function branchesOf(fit: Fit, firstIsChosen: boolean): readonly Branch[] {
  return fit.solutions.map(({ at, chi2 }, i) => ({ ...at, chi2, chosen: firstIsChosen && i === 0 }));
}

function fitted(
  measurement: Measurement, ion: GroundCase, chosen: ScoredReading, fit: Fit, ground: GroundCheck, policy: Policy, freeIon: FreeIon | null,
): Reading {
  const best = fit.solutions[0]!;
  const parameters = publishParameters(measurement, fit, policy, freeIon);
  const bands = readingBands(chosen, fit, policy, fit.floors);
  const used = bands.filter((band) => band.used);
  const probability = fit.spare > 0 ? upperTail(best.chi2, fit.spare) : null;
  const resting = restingOn(parameters, fit);
  const verdict = verdictOf(parameters, fit, probability, resting !== null);
  const predicted = predictedBands(measurement, ion, chosen.assigned, fit, policy);
  const helpful = measureNext(ion, chosen.assigned, fit, predicted, policy);
  return {
    verdict,
    reason: verdictSentence({
      verdict, bandsUsed: used.length, spareBands: fit.spare, chi2: best.chi2, probability,
      reason: verdict === 'not determinable' ? `no number stays under the policy's ceilings; Delta is withheld because ${parameters[0]!.reason}` : null,
      resting: resting?.names ?? [], assumed: resting?.assumed ?? null,
    }),
    assignment: chosen.origin, geometry: ion.geometry, multiplicity: ion.multiplicity, ground: best.ground, bands, notFitted: chosen.notFitted,
    branches: branchesOf(fit, true), parameters, correlations: publishedCorrelations(parameters, fit),
    deltaOverB: parameters[0]!.value !== null && parameters[1]!.value !== null ? deltaOverB(best.at) : null,
    chi2: best.chi2, bandsUsed: used.length, spareBands: fit.spare,
    rmsResidual: Math.sqrt(used.reduce((sum, band) => sum + band.residual! ** 2, 0) / used.length),
    ratio: fit.ratio, predicted,
    cautions: spectralCautions(spectralFacts({ measurement, ion, chosen, fit, parameters, ground, predicted })),
    measureNext: helpful,
  };
}

function verdictOf(parameters: readonly Parameter[], fit: Fit, probability: number | null, resting: boolean): Verdict {
  if (parameters.every((parameter) => parameter.value === null)) return 'not determinable';
  if (probability !== null && probability < strainedBelow) return 'strained';
  if (resting) return 'assumed';
  return fit.spare === 0 ? 'untested' : 'tested';
}

