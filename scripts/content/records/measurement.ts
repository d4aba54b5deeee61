// One typed spectrum turned into the measurement that the engine reads.

import { toWavenumber, widthToWavenumber } from '#engine';
import type { Band, BandRole, Measurement } from '#engine';
import { fittedGeometry, resolvedSpin } from '../spin.ts';
import type { ComplexFile, MeasurementFile } from './complex.ts';

type BandFile = Extract<MeasurementFile['bands'][number], { readonly position: unknown }>;

/** Words of `term` that say what a band is instead of naming a level. */
export const bandRoles: readonly string[] = ['CT', 'ligand', 'vibration', 'impurity'] satisfies readonly BandRole[];

/** @param donors donor atoms of all ligands of the complex together */
export function engineMeasurement(complex: ComplexFile, typed: MeasurementFile, donors: number): Measurement {
  const spin = resolvedSpin(complex.ion.electrons, complex.geometry, complex.spin ?? null);
  return {
    ion: complex.ion,
    geometry: fittedGeometry(complex.geometry),
    geometryName: complex.geometry,
    multiplicity: complex.spin === undefined ? null : spin.multiplicity,
    phase: typed.phase,
    medium: typed.medium ?? null,
    temperature: typed.temperature?.value ?? null,
    technique: typed.technique ?? null,
    bands: typed.bands.flatMap((band) => ('position' in band ? [engineBand(band)] : [])),
    absent: typed.bands.flatMap((band) => ('absent' in band ? band.absent.ranges : [])),
    scanned: typed.scanned === undefined ? [] : [typed.scanned].flat().flatMap((range) => range.ranges),
    innocenceDoubtful: complex.innocence === 'doubtful',
    nuclearity: complex.nuclearity ?? 1,
    donors: (complex.nuclearity ?? 1) === 1 ? donors : null,
  };
}

function engineBand(typed: BandFile): Band {
  const { position, uMinus, uPlus, halfDigit } = toWavenumber(typed.position);
  const terms = typed.term === undefined ? [] : [typed.term].flat();
  const role = terms.length === 1 && bandRoles.includes(terms[0]!) ? (terms[0] as BandRole) : 'transition';
  return {
    position, uMinus, uPlus, halfDigit,
    coverageNotStated: typed.position.coverage === 'plus-minus',
    kind: typed.kind ?? 'maximum',
    side: typed.side ?? null,
    width: typed.width === undefined ? null : widthToWavenumber(position, typed.width),
    epsilon: typed.epsilon?.value ?? null,
    strength: typed.strength ?? null,
    degeneracy: typed.degeneracy ?? null,
    deconvoluted: typed.deconvoluted ?? false,
    role,
    terms: role === 'transition' ? terms : [],
    leftOut: typed['left-out'] ?? null,
  };
}
