// Leaves for a band's position and for a temperature.

import { parseQuantity, toKelvin, toWavenumber } from '#engine';
import type { Quantity } from '#engine';
import { leaf } from './leaves.ts';
import type { Finding } from '../report.ts';

/** Limits of a band position, cm-1. */
export const lowestBand = 1000;
export const highestBand = 100_000;

/** A band's position, 1000 to 100 000 cm-1, in any unit of energy or wavelength. */
export const bandPosition = () =>
  leaf<Quantity>((typed) => {
    const parsed = parseQuantity(typed, 'energy');
    if (!parsed.ok) return { code: parsed.code, found: parsed.found, expected: parsed.expected, mend: parsed.mend };
    return outsideBands(typed, parsed.quantity) ?? { value: parsed.quantity };
  });

/** What is wrong with a position outside the limits, or null where it lies inside. */
export function outsideBands(typed: string, quantity: Quantity): Finding | null {
  const { position } = toWavenumber(quantity);
  if (position >= lowestBand && position <= highestBand) return null;
  return { code: 'BAND_RANGE', found: typed, expected: 'a position from 1000 to 100 000 cm-1 (100 to 10 000 nm)', mend: unitAdvice(typed, quantity) };
}

/** The other units in which the number would be a band position. */
function unitAdvice(typed: string, quantity: Quantity): string {
  const number = typed.replace(/\s*(cm|\/cm|1\/cm|kK|nm|µm|μm|um|eV|meV).*$/u, '').trim();
  const fitting = (['nm', 'cm-1', 'kK', 'eV'] as const).filter((unit) => {
    if (unit === quantity.unit) return false;
    const { position } = toWavenumber({ ...quantity, unit });
    return position >= lowestBand && position <= highestBand;
  });
  if (fitting.length === 0) return 'check the number and its unit; a band outside these limits is no d-d band';
  const meant = { nm: 'a wavelength', 'cm-1': 'a wavenumber', kK: 'in kilokayser', eV: 'in electronvolt' };
  return `this looks like ${fitting[0]}; ${fitting.map((unit) => `if it is ${meant[unit]} write ${number} ${unit}`).join(', ')}`;
}

export interface Temperature {
  readonly typed: string;
  /** K. */
  readonly value: number;
  readonly u: number | null;
  /** true for "room". */
  readonly assumed: boolean;
}

/** A temperature, or the word "room": 295(5) K, common practice, marked as assumed. */
export const temperature = () =>
  leaf<Temperature>((typed) => {
    if (/^(room|room temperature|rt)$/i.test(typed.trim())) return { value: { typed: typed.trim(), value: 295, u: 5, assumed: true } };
    const parsed = parseQuantity(typed, 'temperature');
    if (!parsed.ok) {
      const expected = `${parsed.expected}, or the word room`;
      return { code: parsed.code, found: parsed.found, expected, mend: parsed.mend };
    }
    return { value: { typed: typed.trim(), ...toKelvin(parsed.quantity), assumed: false } };
  });
