// Which spin states a d^n ion can have in a geometry, and what a typed spin means.

import type { Geometry } from '#engine';
import { multiplicities } from './vocabulary.ts';
import type { SpinName } from './vocabulary.ts';

/** The geometry that the engine fits, or null. */
export function fittedGeometry(name: string): Geometry | null {
  return name === 'octahedral' || name === 'tetrahedral' ? name : null;
}

/** Multiplicities of d^n by Hund's rule and below, highest first: 5, 3, 1 for d6. */
export function possibleMultiplicities(electrons: number): number[] {
  const unpaired = Math.min(electrons, 10 - electrons);
  const result: number[] = [];
  for (let spin = unpaired; spin >= 0; spin -= 2) result.push(spin + 1);
  return result;
}

/**
 * Multiplicity of the ground state by "high" and "low" where the lower set of orbitals is filled first.
 * Octahedral: three orbitals (t2g) below; tetrahedral: two (e) below. null: the same as high, there is no choice.
 */
export function lowSpinMultiplicity(electrons: number, geometry: Geometry): number | null {
  const lower = geometry === 'octahedral' ? 3 : 2;
  const unpaired = (count: number, orbitals: number): number => (count <= orbitals ? count : 2 * orbitals - count);
  const below = Math.min(electrons, 2 * lower);
  const low = unpaired(below, lower) + unpaired(electrons - below, 5 - lower) + 1;
  return low === possibleMultiplicities(electrons)[0] ? null : low;
}

/** true where more than one spin state can be the ground state: octahedral d4 to d7, tetrahedral d3 to d6. */
export function hasSpinChoice(electrons: number, geometry: Geometry): boolean {
  return lowSpinMultiplicity(electrons, geometry) !== null;
}

export interface ResolvedSpin {
  /** null where the geometry is not fitted and no spin is typed, or where the typed one is impossible. */
  readonly multiplicity: number | null;
  /** true where high spin was assumed: tetrahedral d3 to d6 without a typed spin. */
  readonly assumed: boolean;
  /** The spins that the ion may have here, as a person types them; empty where the typed one is possible. */
  readonly possible: readonly string[];
}

const nameOf = (multiplicity: number): string =>
  Object.entries(multiplicities).find(([, value]) => value === multiplicity)?.[0] ?? String(multiplicity);

/** What a typed spin means for a d^n ion in a geometry. Octahedral d4 to d7 without a spin resolve to null. */
export function resolvedSpin(electrons: number, geometryName: string, typed: SpinName | null): ResolvedSpin {
  const geometry = fittedGeometry(geometryName);
  const all = possibleMultiplicities(electrons);
  const high = all[0]!;
  const low = geometry === null ? all.at(-1)! : (lowSpinMultiplicity(electrons, geometry) ?? high);
  const choice = geometry === null ? all.length > 1 : low !== high;
  if (typed === null) {
    if (geometry === null) return { multiplicity: choice ? null : high, assumed: false, possible: [] };
    if (!choice) return { multiplicity: high, assumed: false, possible: [] };
    return geometry === 'tetrahedral' ? { multiplicity: high, assumed: true, possible: [] } : { multiplicity: null, assumed: false, possible: [] };
  }
  const between = all.filter((multiplicity) => multiplicity < high && multiplicity > low);
  const allowed = new Map<string, number>([['high', high]]);
  if (choice) allowed.set('low', low);
  if (between.length === 1) allowed.set('intermediate', between[0]!);
  for (const multiplicity of geometry !== null && !choice ? [high] : all.filter((value) => value >= low)) allowed.set(nameOf(multiplicity), multiplicity);
  const multiplicity = allowed.get(typed);
  return multiplicity === undefined
    ? { multiplicity: null, assumed: false, possible: [...allowed.keys()] }
    : { multiplicity, assumed: false, possible: [] };
}
