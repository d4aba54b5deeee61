import type { Caution } from '../cautions/types.ts';
import type { Geometry } from '../ions/types.ts';
import type { Evidence } from './evidence.ts';
import type { DoubletOrder, GroundState } from './groundState.ts';
import type { Identifiability } from './identifiability.ts';
import type { HelpfulBand } from './measureNext.ts';
import type { Stress } from './stress.ts';
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
