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

function unitAdvice(typed: string, { value, unit }: Quantity): string {
  const other = (meant: string) => typed.replace(/\s*[^\d\s().+\-±]+.*$/u, '').trim() + ` ${meant}`;
  if (unit === 'cm-1' && value >= 100 && value < lowestBand) return `this looks like nm; if it is a wavelength write ${other('nm')}`;
  if (unit === 'cm-1' && value < 100) return `if it is in kilokayser write ${other('kK')}; in electronvolt, ${other('eV')}`;
  if (unit === 'nm' && value > 10_000) return `this looks like cm-1; if it is a wavenumber write ${other('cm-1')}`;
  if (unit === 'nm' && value < 100) return `if it is in kilokayser write ${other('kK')}`;
  if ((unit === 'eV' || unit === 'kK') && value >= 100) return `if it is a wavelength write ${other('nm')}; if a wavenumber, ${other('cm-1')}`;
  return 'check the number and its unit; a band outside these limits is no d-d band';
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
