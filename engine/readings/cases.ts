import type { Measurement } from '../measurement/types.ts';
import type { GroundCase } from './transitions.ts';

/** The ground multiplicity of a measurement: as declared, or the highest where ion and geometry leave no choice; or why there is none. */
export function declaredCase(measurement: Measurement): GroundCase | string {
  const { ion, geometry, multiplicity } = measurement;
  if (geometry === null) return `${measurement.geometryName} complexes are stored and drawn, not fitted`;
  if (ion.electrons < 1 || ion.electrons > 9) return `a d${ion.electrons} ion has no d-d transitions`;
  if (multiplicity === null && hasSpinChoice(ion.electrons, geometry)) return 'the spin state is not declared';
  return { electrons: ion.electrons, geometry, multiplicity: multiplicity ?? highestMultiplicity(ion.electrons) };
}

const highestMultiplicity = (electrons: number): number => Math.min(electrons, 10 - electrons) + 1;

const hasSpinChoice = (electrons: number, geometry: GroundCase['geometry']): boolean => geometry === 'octahedral' && electrons >= 4 && electrons <= 7;

/** Multiplicity of the strong-field ground state of octahedral d4 to d7. */
const lowSpin: Readonly<Record<number, number>> = { 4: 3, 5: 2, 6: 1, 7: 2 };

/**
 * What else the ion might be: the other geometry of d2, d3, d7 and d8, where both have spin-allowed bands of
 * their own pattern; the other spin state of octahedral d4 to d7.
 */
export function rivalCases(declared: GroundCase): readonly GroundCase[] {
  const { electrons, geometry, multiplicity } = declared;
  const high = highestMultiplicity(electrons);
  const found: GroundCase[] = [];
  if ([2, 3, 7, 8].includes(electrons)) {
    const other = geometry === 'octahedral' ? 'tetrahedral' : 'octahedral';
    found.push({ electrons, geometry: other, multiplicity: high });
  }
  if (hasSpinChoice(electrons, geometry)) {
    const low = lowSpin[electrons]!;
    found.push({ electrons, geometry, multiplicity: multiplicity === high ? low : high });
  }
  return found;
}
