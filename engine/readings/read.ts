import { spectralCautions } from '../cautions/spectral.ts';
import type { FreeIon } from '../ions/types.ts';
import { groundLabel, shownLabel } from '../levels/labels.ts';
import type { Measurement } from '../measurement/types.ts';
import { policyId } from '../policy/policy.ts';
import type { Policy } from '../policy/types.ts';
import { wholeNumber } from '../words/numbers.ts';
import { rankingSentence } from '../words/ranking.ts';
import { doubletSentence, groundSentence, rivalSentence, searchStopped } from '../words/remarks.ts';
import { thesisSentence } from '../words/thesis.ts';
import type { Verdict } from '../words/types.ts';
import { verdictSentence } from '../words/verdict.ts';
import { declaredCase } from './cases.ts';
import { upperTail } from './chiSquare.ts';
import { spectralFacts } from './facts.ts';
import { deltaOverB } from './deltaOverB.ts';
import { isFit } from './fitTypes.ts';
import type { Fit } from './fitTypes.ts';
import { checkGround } from './groundCheck.ts';
import type { GroundCheck } from './groundCheck.ts';
import { doubletOrder, groundStateOf } from './groundState.ts';
import { identify } from './identifiability.ts';
import { withLimits } from './limits.ts';
import { helpfulBands } from './measureNext.ts';
import { predictedBands } from './predicted.ts';
import { nothingPublished, publishedCorrelations, publishParameters, restingOn } from './publish.ts';
import { contest } from './rivals.ts';
import type { ScoredReading } from './scoring.ts';
import { stressOf } from './stress.ts';
import type { GroundCase } from './transitions.ts';
import type { Branch, Evidence, Parameter, Reading, ReadingBand, ReadMeasurement } from './types.ts';
import { equalWithin, strainedBelow } from './verdictLimits.ts';

/** What a reading is written from. */
interface Context {
  readonly measurement: Measurement;
  readonly policy: Policy;
  readonly freeIon: FreeIon | null;
  readonly rivals: Rivalry;
  /** A rival is not stressed, its limits stay parabolic, and nothing is looked for that would help it. */
  readonly isRival: boolean;
}

/** How the rivals stand to the chosen reading. */
export interface Rivalry {
  readonly best: 'near' | 'better' | null;
  readonly otherGeometry: boolean;
  /** true where every rival within the margin has the Delta and B of the chosen reading, within their total uncertainty. */
  readonly sameNumbers: boolean;
  /** The best rival in words: "4T2g 17 400, a4T1g 24 600 (octahedral, quartet)". */
  readonly words: string;
}

const noRivalry: Rivalry = { best: null, otherGeometry: false, sameNumbers: false, words: '' };

/**
 * Reads one measurement: assigns its bands (as typed, or the best assignment where nothing is typed), fits
 * what they can fix, says what may be published of it and what not, and sets its rivals beside it.
 *
 * Depends on the measurement, the policy and the free ion alone.
 *
 * @param freeIon the ion's entry in the policy's free-ion set; null where the set has none
 */
export function readWithRivals(measurement: Measurement, policy: Policy, freeIon: FreeIon | null): ReadMeasurement {
  const ion = declaredCase(measurement);
  if (typeof ion === 'string') return { chosen: unread(measurement, policy, ion), rivals: [] };
  const { chosen, rivals, complete } = contest(measurement, ion, policy, freeIon);
  if (!chosen) return { chosen: unread(measurement, policy, 'no band can be assigned'), rivals: [] };
  const context: Context = { measurement, policy, freeIon, rivals: rivalry(chosen, rivals, policy), isRival: false };
  const written = write(context, chosen);
  const first = complete ? written : { ...written, remarks: [...written.remarks, searchStopped] };
  const fitStands = first.score !== null;
  return {
    chosen: first,
    rivals: rivals.map((rival) => ({
      ...write({ ...context, rivals: noRivalry, isRival: true }, rival),
      ranking: rankingSentence(inWords(rival.evidence, rival.ion), inWords(chosen.evidence, chosen.ion), fitStands ? rival.score - chosen.score : null, policy.rivalMargin),
    })),
  };
}

/** The chosen reading of a measurement; see `readWithRivals`. */
export function readMeasurement(measurement: Measurement, policy: Policy, freeIon: FreeIon | null): Reading {
  return readWithRivals(measurement, policy, freeIon).chosen;
}

function rivalry(chosen: ScoredReading, rivals: readonly ScoredReading[], policy: Policy): Rivalry {
  const [best] = rivals;
  // A reading that fixes too little is not beaten by one that fixes more; one that no parameters reproduce is.
  if (!best || !(isFit(chosen.outcome) || chosen.outcome.status === 'refused')) return noRivalry;
  const difference = best.score - chosen.score;
  if (!(difference <= policy.rivalMargin)) return noRivalry;
  const near = rivals.filter((rival) => rival.score - chosen.score <= policy.rivalMargin);
  return {
    best: difference < -policy.rivalMargin ? 'better' : 'near', otherGeometry: near.some((rival) => rival.ion.geometry !== chosen.ion.geometry),
    sameNumbers: near.every((rival) => hasSameNumbers(rival, chosen)), words: rivalWords(best, chosen),
  };
}

/** Whether two readings of one geometry and spin differ in the names of bands only: their Delta and B agree within one total uncertainty. */
function hasSameNumbers(rival: ScoredReading, chosen: ScoredReading): boolean {
  const alike = rival.ion.geometry === chosen.ion.geometry && rival.ion.multiplicity === chosen.ion.multiplicity;
  if (!alike || !isFit(rival.outcome) || !isFit(chosen.outcome)) return false;
  const [theirs, own] = [rival.outcome.solutions[0]!.at, chosen.outcome.solutions[0]!.at];
  const { total } = chosen.outcome;
  return (theirs.delta - own.delta) ** 2 <= total[0]![0]! && (theirs.racahB - own.racahB) ** 2 <= total[1]![1]!;
}

/** What a rival makes of the bands, and of what ion where that differs from the declared one. */
function rivalWords(rival: ScoredReading, chosen: ScoredReading): string {
  const bands = rival.assigned.map(({ label, observation }) => `${shownLabel(label, rival.ion.electrons)} ${wholeNumber(observation.position)}`).join(', ');
  const other = [
    ...(rival.ion.geometry === chosen.ion.geometry ? [] : [rival.ion.geometry]),
    ...(rival.ion.multiplicity === chosen.ion.multiplicity ? [] : [`multiplicity ${rival.ion.multiplicity}`]),
  ];
  return `${bands}${other.length === 0 ? '' : ` (${other.join(', ')})`}`;
}

function inWords(evidence: readonly Evidence[], ion: GroundCase): { code: string; penalty: number; label: string; value: number | null }[] {
  return evidence.map((one) => ({ ...one, label: one.label === '' ? '' : shownLabel(one.label, ion.electrons) }));
}

/** Writes the reading of one assignment: with its fit, or with the reason why none stands. */
function write(context: Context, reading: ScoredReading): Reading {
  const { outcome, ion } = reading;
  if (!isFit(outcome)) return withoutFit(context, reading, outcome.status, outcome.reason, null);
  const ground = checkGround(ion, outcome, context.freeIon);
  if (ground === 'contradicts') return withoutFit(context, reading, 'refused', groundContradiction(ion, outcome), outcome);
  return fitted(context, reading, outcome, ground);
}

function groundContradiction(ion: GroundCase, fit: Fit): string {
  const { at } = fit.solutions[0]!;
  const ratio = deltaOverB(at);
  const where = fit.mode === 'field' || ratio === null ? `Delta = ${Math.round(at.delta)} cm⁻¹` : `Delta/B = ${ratio.toFixed(1)}`;
  return `at ${where} the ground state has another spin than the declared multiplicity ${ion.multiplicity}`;
}

function readingBands(reading: ScoredReading, fit: Fit | null, policy: Policy): readonly ReadingBand[] {
  return reading.assigned.map(({ label, observation }, k) => {
    const calculated = fit?.calculated[k] ?? null;
    return {
      bands: observation.bands, label, observed: observation.position, uMinus: observation.uMinus, uPlus: observation.uPlus,
      uAssumed: observation.uAssumed, floor: fit?.floors[k] ?? policy.floors.general, used: fit?.used[k] ?? false,
      calculated: calculated?.energy ?? null, residual: calculated ? observation.position - calculated.energy : null,
      leverage: fit?.leverage[k] ?? null, gradient: calculated?.gradient ?? null,
    };
  });
}

const noFacts = { bandsUsed: 0, spareBands: 0, chi2: null, probability: null, reason: null, resting: [], assumed: null } as const;

/** The parts of a reading that need a fit, where there is none. */
const nothingFitted = {
  correlations: [], deltaOverB: null, bandsUsed: 0, spareBands: 0, rmsResidual: null, ratio: null, predicted: [], measureNext: null, helpfulBands: [],
  score: null, evidence: [], ranking: null, identifiability: null, stress: null, groundState: null, doubletOrder: null, remarks: [],
} as const;

function thesisWithout(reason: string, verdict: Verdict, policy: Policy): string {
  return thesisSentence({ verdict, bands: [], parameters: [], freeIon: null, spareBands: 0, assumed: null, reason, policy: policyId(policy) });
}

/** A reading of a measurement to which nothing can be assigned. */
function unread(measurement: Measurement, policy: Policy, reason: string): Reading {
  return {
    ...nothingFitted, verdict: 'not determinable', reason: verdictSentence({ ...noFacts, verdict: 'not determinable', reason }), assignment: 'none',
    geometry: measurement.geometry, multiplicity: measurement.multiplicity, ground: null, bands: [],
    notFitted: measurement.bands.map((_, band) => ({ band, reason })), branches: [], parameters: nothingPublished(reason), chi2: null,
    cautions: spectralCautions(spectralFacts({ measurement, policy, ion: null, chosen: null, fit: null, parameters: [], ground: 'agrees', predicted: [], rivals: noRivalry })),
    sentence: thesisWithout(reason, 'not determinable', policy),
  };
}

function withoutFit(context: Context, reading: ScoredReading, verdict: 'refused' | 'not determinable', reason: string, fit: Fit | null): Reading {
  const { measurement, policy, rivals } = context;
  const { ion } = reading;
  const contradicted = fit !== null;
  return {
    ...nothingFitted, verdict, reason: verdictSentence({ ...noFacts, verdict, reason }) + rivalSentence(rivals, false), assignment: reading.origin,
    geometry: ion.geometry, multiplicity: ion.multiplicity, ground: groundLabel(ion.electrons, ion.geometry, ion.multiplicity),
    bands: readingBands(reading, fit, policy), notFitted: reading.notFitted, branches: fit ? branchesOf(fit, false) : [],
    parameters: nothingPublished(reason), chi2: fit?.solutions[0]?.chi2 ?? null,
    cautions: spectralCautions(spectralFacts({
      measurement, policy, ion, chosen: reading, fit: null, parameters: [], ground: contradicted ? 'contradicts' : 'agrees', predicted: [], rivals,
    })),
    sentence: thesisWithout(reason, verdict, policy),
  };
}

function branchesOf(fit: Fit, firstIsChosen: boolean): readonly Branch[] {
  return fit.solutions.map(({ at, chi2 }, i) => ({ ...at, chi2, chosen: firstIsChosen && i === 0 }));
}

function fitted(context: Context, reading: ScoredReading, fit: Fit, ground: GroundCheck): Reading {
  const { measurement, policy, freeIon, rivals, isRival } = context;
  const { ion, assigned } = reading;
  const best = fit.solutions[0]!;
  const published = publishParameters(measurement, fit, policy, freeIon);
  const parameters = isRival ? published : withLimits(ion, assigned, fit, published);
  const bands = readingBands(reading, fit, policy);
  const used = bands.filter((band) => band.used);
  const probability = fit.spare > 0 ? upperTail(best.chi2, fit.spare) : null;
  const resting = restingOn(parameters, fit);
  const verdict = verdictOf(parameters, fit, probability, resting !== null);
  const predicted = predictedBands(measurement, ion, assigned, fit, policy);
  const helpful = isRival ? [] : helpfulBands(ion, assigned, fit, parameters, predicted, policy);
  const second = fit.solutions[1];
  const secondSolution = second !== undefined && second.chi2 - best.chi2 < equalWithin;
  const reason =
    verdictSentence({
      verdict, bandsUsed: used.length, spareBands: fit.spare, chi2: best.chi2, probability,
      reason: verdict === 'not determinable' ? `no number stays under the policy's ceilings; Delta is withheld because ${parameters[0]!.reason}` : null,
      resting: resting?.names ?? [], assumed: resting?.assumed ?? null,
    }) + rivalSentence(rivals, secondSolution);
  const groundState = groundStateOf(ion, fit);
  const order = doubletOrder(ion, fit, freeIon);
  const ratioText = resting ? resting.assumed.replace('the assumed ', '') : null;
  const ratioShown = parameters[1]!.value !== null && parameters[0]!.value !== null ? deltaOverB(best.at) : null;
  return {
    verdict, reason, assignment: reading.origin, geometry: ion.geometry, multiplicity: ion.multiplicity, ground: best.ground, bands,
    notFitted: reading.notFitted, branches: branchesOf(fit, true), parameters, correlations: publishedCorrelations(parameters, fit), deltaOverB: ratioShown,
    chi2: best.chi2, bandsUsed: used.length, spareBands: fit.spare,
    rmsResidual: Math.sqrt(used.reduce((sum, band) => sum + band.residual! ** 2, 0) / used.length), ratio: fit.ratio, predicted,
    cautions: spectralCautions(spectralFacts({ measurement, policy, ion, chosen: reading, fit, parameters, ground, predicted, rivals })),
    measureNext: helpful[0]?.sentence ?? null, helpfulBands: helpful, score: Number.isFinite(reading.score) ? reading.score : null,
    evidence: reading.evidence, ranking: null, identifiability: identify(assigned, fit, parameters),
    stress: isRival ? null : stressOf(ion, assigned, fit, policy, freeIon), groundState, doubletOrder: order,
    remarks: [
      groundSentence({ ...groundState, deltaOverB: ratioShown, ground: shownLabel(best.ground, ion.electrons) }),
      ...(order ? [doubletSentence(order)] : []),
    ],
    sentence: thesisSentence({
      verdict, bands: used.map((band) => ({ observed: band.observed, label: shownLabel(band.label, ion.electrons) })), parameters,
      freeIon: freeIon && parameters[3]!.value !== null ? { racahB0: freeIon.racahB0, set: freeIon.set } : null, spareBands: fit.spare,
      assumed: ratioText,
      reason: parameters[0]!.reason, policy: policyId(policy),
    }),
  };
}

function verdictOf(parameters: readonly Parameter[], fit: Fit, probability: number | null, resting: boolean): Verdict {
  if (parameters.every((parameter) => parameter.value === null)) return 'not determinable';
  if (probability !== null && probability < strainedBelow) return 'strained';
  if (resting) return 'assumed';
  return fit.spare === 0 ? 'untested' : 'tested';
}
