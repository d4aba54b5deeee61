import type { Geometry, Ion } from '../ions/types.ts';

/** How a position was read from the spectrum. */
export type BandKind =
  | 'maximum' | 'shoulder' | 'line' | 'zero-phonon' | 'dip' | 'centroid' | 'component' | 'envelope';

/** What a band is: a d-d transition to be assigned, or something kept and drawn but never fitted. */
export type BandRole = 'transition' | 'CT' | 'ligand' | 'vibration' | 'impurity';

export interface Range {
  readonly low: number;
  readonly high: number;
}

/** One band of a measurement. Energies in cm-1; u is one standard uncertainty. */
export interface Band {
  readonly position: number;
  /** u towards lower wavenumber; null: none was typed, the policy's default applies. */
  readonly uMinus: number | null;
  /** u towards higher wavenumber; null exactly where uMinus is null. */
  readonly uPlus: number | null;
  /** Half of the last typed digit, in cm-1: no default u falls below this / sqrt 3. */
  readonly halfDigit: number;
  /** true where u was typed as a plain plus-minus without a coverage factor. */
  readonly coverageNotStated: boolean;
  readonly kind: BandKind;
  /** For a shoulder: where the stronger band lies. */
  readonly side: 'higher' | 'lower' | null;
  /** Full width at half height. */
  readonly width: number | null;
  /** Molar absorption coefficient, L mol-1 cm-1. */
  readonly epsilon: number | null;
  readonly strength: 'strong' | 'medium' | 'weak' | null;
  /** For a component: how many states it holds. */
  readonly degeneracy: number | null;
  readonly deconvoluted: boolean;
  readonly role: BandRole;
  /** Typed term labels; several are candidates; none: the engine proposes. */
  readonly terms: readonly string[];
  /** The reason why the band is kept but not fitted, or null. */
  readonly leftOut: string | null;
}

/** One spectrum as the engine sees it: all that a reading depends on beside the policy and the free-ion set. */
export interface Measurement {
  readonly ion: Ion;
  /** null: a geometry that is stored and drawn but not fitted; `geometryName` says which. */
  readonly geometry: Geometry | null;
  readonly geometryName: string;
  /** Declared multiplicity of the ground state; null where the ion and geometry leave no choice or none was typed. */
  readonly multiplicity: number | null;
  readonly phase: 'solution' | 'solid' | 'crystal' | 'glass' | 'film';
  /** K, null: not recorded. */
  readonly temperature: number | null;
  readonly technique: 'absorption' | 'diffuse reflectance' | 'excitation' | 'emission' | 'MCD' | null;
  readonly bands: readonly Band[];
  /** Ranges where the group looked and saw nothing. */
  readonly absent: readonly Range[];
  /** What was looked at; empty: not recorded. */
  readonly scanned: readonly Range[];
  readonly innocenceDoubtful: boolean;
  /** Number of metal centres; 1 where not typed. */
  readonly nuclearity: number;
}

export type Standing = 'measured' | 'fitted' | 'assumed' | 'predicted' | 'quoted' | 'withheld';

export type Verdict = 'refused' | 'not determinable' | 'strained' | 'assumed' | 'untested' | 'tested';

export type ParameterName = 'Delta' | 'B' | 'C' | 'beta';

/** A derived number. Where `standing` is "withheld" value and both u are null and `reason` says why. */
export interface Parameter {
  readonly name: ParameterName;
  readonly value: number | null;
  /** Standard uncertainty from the readings alone. */
  readonly u: number | null;
  /** With the model's floor and the uncertainty of an assumed C/B. */
  readonly uTotal: number | null;
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

export interface Caution {
  /** Lasting code, "LOOSE_B". */
  readonly code: string;
  readonly text: string;
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
  /** Bands or a measurement that would help most, in words; null where nothing is missing. */
  readonly measureNext: string | null;
}
