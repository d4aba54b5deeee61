import type { Ion } from '../ions/types.ts';
import type { BoundLigand, ComplexIdentity, MeasurementId, PhaseClass, SeriesResult } from './types.ts';

const spinNames = ['singlet', 'doublet', 'triplet', 'quartet', 'quintet', 'sextet'] as const;

/** A multiplicity 2S+1 as the trade says it, "quartet" for 4. Throws RangeError outside 1 to 6. */
export function spinName(multiplicity: number): string {
  const name = spinNames[multiplicity - 1];
  if (name === undefined) throw new RangeError(`multiplicity: ${multiplicity} is not a whole number from 1 to 6`);
  return name;
}

/** What names an ion in its geometry and spin state. */
export type IonState = Pick<ComplexIdentity, 'geometryName' | 'multiplicity'> & { readonly ion: Pick<Ion, 'name'> };

/** An ion in one geometry and spin state, "Cr(III) octahedral quartet": what has one g and one k. */
export function ionKey(complex: IonState): string {
  return [complex.ion.name, complex.geometryName, ...(complex.multiplicity === null ? [] : [spinName(complex.multiplicity)])].join(' ');
}

/** The same for sentences: "Cr(III), octahedral, quartet". */
export function ionWords(complex: IonState): string {
  return [complex.ion.name, complex.geometryName, ...(complex.multiplicity === null ? [] : [spinName(complex.multiplicity)])].join(', ');
}

/** Donor atoms that all of one ligand bind. */
export const donorAtoms = ({ count, bound }: BoundLigand): number => count * bound;

/** Ligands with their numbers, in the order of their ids: equal for complexes of one ligand set whatever the order typed. */
export function ligandSetKey({ ligands }: Pick<ComplexIdentity, 'ligands'>): string {
  return ligands.map(({ ligand, count, bound }) => `${ligand} ${count}x${bound}`).sort().join(' + ');
}

/** Equal exactly for records of one complex: ion, geometry, spin, isomer and ligands. The id and the way the formula is typed do not count. */
export function complexKey(complex: ComplexIdentity): string {
  return `${ionKey(complex)} | ${complex.isomer} | ${ligandSetKey(complex)}`;
}

/** The one ligand of a complex that has no other, else null. */
export function onlyLigand({ ligands }: Pick<ComplexIdentity, 'ligands'>): string | null {
  return ligands.length === 1 ? ligands[0]!.ligand : null;
}

export const phaseClass = ({ phase }: Pick<SeriesResult, 'phase'>): PhaseClass => (phase === 'solution' ? 'solution' : 'solid');

export const measurementId = ({ complex, measurement }: Pick<SeriesResult, 'complex' | 'measurement'>): MeasurementId => `${complex.id}/${measurement}`;
