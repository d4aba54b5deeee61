import { concise, type PrintForm, significant } from './print.ts';
import type { Quantity } from './types.ts';
import { isWavelength, wavenumberPerElectronvolt } from './units.ts';

/** An energy in cm-1 with one standard uncertainty towards each side; both are null where none was typed. */
export interface Wavenumber {
  readonly position: number;
  readonly uMinus: number | null;
  readonly uPlus: number | null;
  readonly halfDigit: number;
}

const linear: Readonly<Record<string, number>> = {
  'cm-1': 1,
  kK: 1000,
  eV: wavenumberPerElectronvolt,
  meV: wavenumberPerElectronvolt / 1000,
};

/** 1/lambda in cm-1 is this number over lambda in the unit. */
const reciprocal: Readonly<Record<string, number>> = { nm: 1e7, µm: 1e4 };

/**
 * An energy in cm-1. A wavelength becomes 1e7 nm / lambda and its uncertainty 1e7 u / lambda^2 (first order), with the two sides
 * exchanged; wavelengths are taken as typed, air and vacuum alike. 1 eV = 8065.543937 cm-1 (CODATA 2018).
 * @throws RangeError where the unit is not one of energy or a wavelength is not above 0.
 */
export function toWavenumber(quantity: Quantity): Wavenumber {
  const { value, uMinus, uPlus, halfDigit, unit } = quantity;
  const over = reciprocal[unit];
  if (over !== undefined) {
    if (!(value > 0)) throw new RangeError(`a wavelength must be above 0, got ${value} ${unit}`);
    const slope = over / (value * value);
    return {
      position: over / value,
      uMinus: uPlus === null ? null : uPlus * slope,
      uPlus: uMinus === null ? null : uMinus * slope,
      halfDigit: halfDigit * slope,
    };
  }
  const factor = linear[unit];
  if (factor === undefined) throw new RangeError(`unit must be one of energy, got "${unit}"`);
  return {
    position: value * factor,
    uMinus: uMinus === null ? null : uMinus * factor,
    uPlus: uPlus === null ? null : uPlus * factor,
    halfDigit: halfDigit * factor,
  };
}

/**
 * A full width at half height in cm-1. A width in wavelength is laid evenly about the band's position and both half-height points
 * are converted: 1e7/(lambda - w/2) - 1e7/(lambda + w/2).
 * @param position the band's position, cm-1, above 0
 * @returns null where a width in wavelength is so wide that its lower point would not be above 0
 * @throws RangeError where the position is not above 0 or the unit is not one of energy
 */
export function widthToWavenumber(position: number, width: Quantity): number | null {
  if (!(position > 0)) throw new RangeError(`position must be above 0 cm-1, got ${position}`);
  const over = reciprocal[width.unit];
  if (!isWavelength(width.unit) || over === undefined) return toWavenumber(width).position;
  const centre = over / position;
  const half = width.value / 2;
  return half < centre ? over / (centre - half) - over / (centre + half) : null;
}

/** A temperature in K with its standard uncertainty. @throws RangeError where the unit is not K or °C. */
export function toKelvin(quantity: Quantity): { readonly value: number; readonly u: number | null } {
  const { value, u, unit } = quantity;
  if (unit === 'K') return { value, u };
  // Rounded so that 22 °C is 295.15 K and not 295.15 with a tail of binary digits.
  if (unit === '°C') return { value: Math.round((value + 273.15) * 1e6) / 1e6, u };
  throw new RangeError(`unit must be K or °C, got "${unit}"`);
}

/** A percentage as a fraction, 15 % as 0.15. @throws RangeError where the unit is not %. */
export function toFraction(quantity: Quantity): { readonly value: number; readonly u: number | null } {
  if (quantity.unit !== '%') throw new RangeError(`unit must be %, got "${quantity.unit}"`);
  return { value: quantity.value / 100, u: quantity.u === null ? null : quantity.u / 100 };
}

/** The wavelength in nm of a position in cm-1. @throws RangeError where the position is not above 0. */
export function wavelength(position: number): number {
  if (!(position > 0)) throw new RangeError(`position must be above 0 cm-1, got ${position}`);
  return 1e7 / position;
}

/** The wavelength in nm of a position in cm-1, printed: concise where u (cm-1) is known, else with four significant digits. */
export function wavelengthShown(position: number, u: number | null, form: PrintForm = 'text'): string {
  const nanometres = wavelength(position);
  return u === null ? significant(nanometres, 4, form) : concise(nanometres, (u * nanometres) / position, form);
}
