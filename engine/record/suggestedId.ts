// Ids that a record could have; the person may choose others.

import { readRomanNumeral } from '../ions/oxidation.ts';
import type { TypedComplex, TypedMeasurement } from './types.ts';

/** Longest id of the record format. */
const longest = 41;

/**
 * An id for a complex out of its ion, ligands, isomer and geometry: "cr3-ammine5-chlorido", "co2-chlorido4", "ni2-chlorido4-square-planar";
 * out of its formula where ion or ligands are not known. Always a legal id; not always one that is free.
 */
export function suggestedId(complex: Pick<TypedComplex, 'formula' | 'ion' | 'geometry' | 'isomer' | 'ligands'>): string {
  const ligands = Object.entries(complex.ligands ?? {});
  const ion = /^([A-Z][a-z]?)\(([IVX]+)\)$/.exec(complex.ion?.trim() ?? '');
  if (ion === null || ligands.length === 0) return slug(complex.formula, 'complex');
  const counted = ligands.map(([id, typed]) => {
    const count = typeof typed === 'string' ? typed.trim() : typed.count.trim();
    return count === '1' ? id : `${id}${count}`;
  });
  const { isomer, geometry } = complex;
  const ending = [isomer === 'none' ? null : isomer, geometry === 'octahedral' || geometry === 'tetrahedral' ? null : geometry];
  return slug([`${ion[1]}${readRomanNumeral(ion[2]!) ?? ''}`, ...counted, ...ending.flatMap((part) => part ?? [])].join('-'), 'complex');
}

/** An id for a measurement out of its medium, host or phase and its temperature: "water-295", "solid". */
export function suggestedMeasurementId({ medium, host, phase, temperature }: Omit<TypedMeasurement, 'id'>): string {
  const kelvin = /^\d+/.exec(temperature?.trim() ?? '')?.[0] ?? '';
  return slug([medium ?? host ?? phase ?? '', kelvin].join('-'), 'spectrum');
}

/** Small letters, digits and single hyphens, a letter first; `otherwise` where nothing is left. */
export function slug(text: string, otherwise: string): string {
  const plain = text.toLowerCase().normalize('NFKD').replace(/[^a-z0-9]+/g, '-').replace(/^[^a-z]+/, '').slice(0, longest).replace(/-+$/, '');
  return plain.length < 2 || reserved.has(plain) ? otherwise : plain;
}

const reserved: ReadonlySet<string> = new Set(['no', 'yes', 'on', 'off', 'null', 'true', 'false', 'con', 'nul', 'aux', 'prn']);
