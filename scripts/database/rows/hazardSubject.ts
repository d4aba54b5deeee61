import type { HazardSubject } from '#engine';
import type { ComplexRecord, LigandRecord } from '../../content/types.ts';

/** All of a complex's record, and of its ligands' records, that may name something dangerous. */
export function hazardSubject(complex: ComplexRecord, ligands: readonly LigandRecord[]): HazardSubject {
  return {
    ion: complex.ion,
    formula: complex.formula,
    name: complex.name,
    ligands: ligands.filter(({ id }) => complex.ligands.some(({ ligand }) => ligand === id)),
    measurements: complex.measurements.map(({ id, sample, medium, host }) => ({ id, sample, medium, host })),
    overridden: Object.keys(complex.hazardOverrides),
  };
}
