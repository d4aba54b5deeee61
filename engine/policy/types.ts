import type { FreeIonSetName } from '../ions/types.ts';

/** A number with one standard uncertainty, in the unit its place implies. */
export interface Estimate {
  readonly value: number;
  readonly u: number;
}

/** The transitions between which the model's floor differs. */
export type FloorClass = 'general' | 'spinFlip' | 'twoElectron';

/** A group's declared fitting choices. Energies in cm-1, ceilings as fractions. */
export interface Policy {
  readonly name: string;
  /** C/B used where C is not fitted; `perIon` is keyed by ion name and wins over `general`. */
  readonly cOverB: { readonly general: Estimate; readonly perIon: Readonly<Record<string, Estimate>> };
  /** Whether C is fitted where spin-flip bands determine it; false: C/B is assumed always. */
  readonly cFitted: boolean;
  /** Model floor tau by class of transition, one standard uncertainty. */
  readonly floors: Readonly<Record<FloorClass, number>>;
  /** A parameter is published only where u(total)/value stays under its ceiling. */
  readonly ceilings: { readonly delta: number; readonly racahB: number; readonly racahC: number };
  /** Floor on differences between like results: Delta in cm-1, B as a fraction. */
  readonly differentialFloor: { readonly delta: number; readonly racahB: number };
  readonly freeIons: FreeIonSetName;
  readonly rivalMargin: number;
  /** u assumed for a reading typed without one and without a width. */
  readonly defaultUncertainties: { readonly maximum: number; readonly line: number };
}
