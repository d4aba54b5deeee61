import type { Caution } from '../cautions/types.ts';
import type { Geometry } from '../ions/types.ts';
import type { FieldParameters } from '../levels/levels.ts';
import type { Gain } from '../words/measureNext.ts';
import type { ParameterName, Standing, Verdict } from '../words/types.ts';

/** A derived number. Where `standing` is "withheld" value and both u are null and `reason` says why. */
export interface Parameter {
  readonly name: ParameterName;
  readonly value: number | null;
  /** Standard uncertainty from the readings alone. */
  readonly u: number | null;
  /** With the model's floor and the uncertainty of an assumed C/B. */
  readonly uTotal: number | null;
  /** Limits of one standard uncertainty (total) from the chi2 profile, where the curve is not parabolic; else null. */
  readonly limits: { readonly low: number; readonly high: number } | null;
  readonly standing: Standing;
  readonly reason: string | null;
}

/** One transition of the reading with the band or merged bands assigned to it. */
export interface ReadingBand {
  /** Indices into `Measurement.bands`; more than one where components were merged. */
  readonly bands: readonly number[];
  /** Letter form, "b4T1g". */
  readonly label: string;
  readonly observed: number;
  readonly uMinus: number;
  readonly uPlus: number;
  readonly uAssumed: boolean;
  /** Model floor of the transition. */
  readonly floor: number;
  /** false: assigned but only compared with a prediction (a spin-flip line where C is assumed). */
  readonly used: boolean;
  /** null where no fit stands. */
  readonly calculated: number | null;
  /** observed - calculated. */
  readonly residual: number | null;
  /** How much of the fit hangs on this band, 0 to 1; null where it took no part. */
  readonly leverage: number | null;
  /** d(transition energy)/d(Delta, B, C) at the fit. */
  readonly gradient: { readonly delta: number; readonly racahB: number; readonly racahC: number } | null;
}

/** A transition that no band was assigned to. */
export interface PredictedBand {
  readonly label: string;
  readonly position: number;
  readonly u: number;
  readonly spinAllowed: boolean;
  /** Inside what was scanned, outside, or not recorded. */
  readonly looked: 'inside' | 'outside' | 'not recorded';
}

/** One local solution of a reading. */
export interface Branch {
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
  readonly chi2: number;
  readonly chosen: boolean;
}

/** What a reading says of C/B. */
export interface RatioUsed {
  readonly value: number;
  readonly u: number;
  readonly origin: 'policy' | 'policy for this ion' | 'fitted';
}

/** What speaks against a reading, on the scale of chi2. */
export type EvidenceCode =
  | 'misfit' | 'parameters' | 'left over' | 'gap' | 'unseen' | 'below' | 'line skipped' | 'beta' | 'absorptivity' | 'width' | 'forbidden and broad' | 'donors';

export interface Evidence {
  readonly code: EvidenceCode;
  /** At least 0; a higher score is a worse reading. */
  readonly penalty: number;
  /** What it concerns: a transition's label in letter form, or "" */
  readonly label: string;
  /** A number that goes with it: a position in cm-1, a beta, an absorptivity; null where none does. */
  readonly value: number | null;
}

/** Delta and B from two bands alone; null where no solution exists. */
export interface PairAlone {
  readonly labels: readonly [string, string];
  /** Their places among `Reading.bands`: one label may stand twice (the d5 pair). */
  readonly bands: readonly [number, number];
  readonly at: FieldParameters | null;
}

/** What the other bands say when one is left out. */
export interface LeftOut {
  readonly label: string;
  /** Its place among the bands of the reading. */
  readonly band: number;
  /** null where the others fix too little. */
  readonly at: FieldParameters | null;
  /** Where the others put the band that was left out. */
  readonly predicted: number | null;
  /** (observed - predicted) / combined u. */
  readonly z: number | null;
}

export interface Stress {
  readonly pairs: readonly PairAlone[];
  readonly leftOut: readonly LeftOut[];
}

/** What the bands of a fit can tell of Delta, B and C. */
export interface Identifiability {
  /** Singular values of the weighted Jacobian, columns scaled by the parameters, descending. */
  readonly singularValues: readonly number[];
  /** How many parameters the bands fix, by the singular values. */
  readonly rank: number;
  /** The combination that is fixed where the single numbers are not, in words; null where it adds nothing. */
  readonly combination: string | null;
}

/** What the fit says of the ground level. */
export interface GroundState {
  /** Delta/B at which the ground spin changes at this C/B; null where it never does. */
  readonly crossing: number | null;
  /** Field stabilisation of the ground level in units of Delta, negative; and in cm-1. */
  readonly stabilisationInDelta: number;
  readonly stabilisation: number;
}

/** E(4T2g) - E(2Eg) of octahedral d3, with its uncertainty; `decidable` only where C was fitted. */
export interface DoubletOrder {
  readonly gap: number;
  readonly u: number;
  readonly decidable: boolean;
}

/** A band worth looking for, with what it would do. */
export interface HelpfulBand {
  /** Letter form. */
  readonly label: string;
  /** Expected range, two standard uncertainties either way, cm-1. */
  readonly low: number;
  readonly high: number;
  readonly gains: readonly Gain[];
  readonly sentence: string;
}

/** One assignment of a measurement's bands with its fit, verdict and everything that may be said of it. */
export interface Reading {
  readonly verdict: Verdict;
  /** One sentence: why this verdict. */
  readonly reason: string;
  /** "typed", "proposed" or "none". */
  readonly assignment: 'typed' | 'proposed' | 'none';
  readonly geometry: Geometry | null;
  readonly multiplicity: number | null;
  /** Ground level in letter form, as declared; null where unknown. */
  readonly ground: string | null;
  readonly bands: readonly ReadingBand[];
  /** Bands (indices) that take no part, with the reason. */
  readonly notFitted: readonly { readonly band: number; readonly reason: string }[];
  readonly branches: readonly Branch[];
  /** Always four, in the order Delta, B, C, beta. */
  readonly parameters: readonly Parameter[];
  /** Correlations of the fitted parameters from the total covariance. */
  readonly correlations: readonly { readonly first: ParameterName; readonly second: ParameterName; readonly value: number }[];
  readonly deltaOverB: number | null;
  readonly chi2: number | null;
  readonly bandsUsed: number;
  readonly spareBands: number;
  readonly rmsResidual: number | null;
  readonly ratio: RatioUsed | null;
  readonly predicted: readonly PredictedBand[];
  readonly cautions: readonly Caution[];
  /** The band that would help most, in words; null where nothing is missing. */
  readonly measureNext: string | null;
  /** Every band worth looking for, most helpful first. */
  readonly helpfulBands: readonly HelpfulBand[];
  /** chi2 + 2 x free parameters + evidence; null where no fit stands. Lower is better. */
  readonly score: number | null;
  /** What speaks against this reading. */
  readonly evidence: readonly Evidence[];
  /** For a rival: why it ranks where it does against the chosen reading; null for the chosen one. */
  readonly ranking: string | null;
  readonly identifiability: Identifiability | null;
  readonly stress: Stress | null;
  readonly groundState: GroundState | null;
  readonly doubletOrder: DoubletOrder | null;
  /** Sentences about ground level, spin crossing and order of levels. */
  readonly remarks: readonly string[];
  /** One sentence for a thesis: bands, numbers, uncertainties, standing. */
  readonly sentence: string;
}

/** A measurement read: the chosen reading and its rivals, best first. */
export interface ReadMeasurement {
  readonly chosen: Reading;
  readonly rivals: readonly Reading[];
}
