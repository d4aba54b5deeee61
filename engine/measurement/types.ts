import type { Geometry, Ion } from '../ions/types.ts';
import type { Range } from '../quantity/range.ts';

/** How a position was read from the spectrum. */
export type BandKind =
  | 'maximum' | 'shoulder' | 'line' | 'zero-phonon' | 'dip' | 'centroid' | 'component' | 'envelope';

/** What a band is: a d-d transition to be assigned, or something kept and drawn but never fitted. */
export type BandRole = 'transition' | 'CT' | 'ligand' | 'vibration' | 'impurity';

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
  /** Solvent or matrix as typed; null: not recorded. */
  readonly medium: string | null;
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
  /** Donor atoms about the one metal centre, counted from its ligands; null: not known, or more than one centre. */
  readonly donors: number | null;
}
