import { concise, conciseTwoSided, plain, significant, wavelengthShown } from '#engine';
import type { ParameterRow } from './rows.ts';
import type { Parts } from './typeset.ts';

export const NOT_RECORDED = 'not recorded';

/** A number for the page, or why there is none. */
export interface Shown {
  /** Printed form with thin spaces; null where there is no number. */
  readonly text: string | null;
  /** Where there is no number: the reason. */
  readonly reason: string | null;
}

export const shown = (text: string): Shown => ({ text, reason: null });
export const missing = (reason: string = NOT_RECORDED): Shown => ({ text: null, reason });

/** Wavenumber with its uncertainty, cm-1. */
export const energy = (value: number, u: number | null): string => u === null ? plain(value, 0, 'page') : concise(value, u, 'page');

/** Wavenumber with an uncertainty for each side. */
export const energyTwoSided = (value: number, uMinus: number, uPlus: number): string =>
  uMinus > 0 && uPlus > 0 ? conciseTwoSided(value, uMinus, uPlus, 'page') : plain(value, 0, 'page');

/** Wavelength in nm of a wavenumber. */
export const nanometres = (value: number, u: number | null): string => wavelengthShown(value, u, 'page');

/** Signed difference in cm-1, with a plus sign. */
export const difference = (value: number): string => {
  const text = plain(value, 0, 'page');
  return text.startsWith('\u2212') || text === '0' ? text : `+${text}`;
};

export const plainNumber = (value: number, decimals: number): string => plain(value, decimals, 'page');
export const ratio = plainNumber;
export const figures = (value: number, count: number): string => significant(value, count, 'page');

/** A temperature, "295(5) K", or that none was recorded. */
export function temperature(kelvin: number | null, u: number | null): string {
  return kelvin === null ? 'temperature not recorded' : `${concise(kelvin, u, 'page')}\u00a0K`;
}

/** Delta, B, C or beta as it is printed: with total uncertainty, and with that of the readings alone. */
export interface ParameterShown {
  readonly name: ParameterRow['name'];
  readonly symbol: Parts;
  readonly unit: string;
  readonly total: Shown;
  readonly own: Shown;
  /** Limits of one total standard uncertainty where the curve is not parabolic: "503 to 595". */
  readonly limits: string | null;
  readonly standing: string;
  /** What a number that is not withheld rests on. */
  readonly restsOn: string | null;
}

const SYMBOLS: Readonly<Record<ParameterRow['name'], { readonly text: string; readonly unit: string }>> = {
  Delta: { text: 'Δ', unit: 'cm⁻¹' }, B: { text: 'B', unit: 'cm⁻¹' }, C: { text: 'C', unit: 'cm⁻¹' }, beta: { text: 'β', unit: '1' },
};

export function parameterShown(row: ParameterRow): ParameterShown {
  const { text, unit } = SYMBOLS[row.name];
  return {
    name: row.name, symbol: [{ text, style: 'italic' }], unit, standing: row.standing,
    total: parameterNumber(row, row.u_total), own: parameterNumber(row, row.u), limits: profileLimits(row), restsOn: row.value === null ? null : row.reason,
  };
}

/** Limits carry the digits that the total uncertainty gives the value. */
function profileLimits({ name, low, high }: ParameterRow): string | null {
  if (low === null || high === null) return null;
  const round = (value: number): string => name === 'beta' ? plain(value, 2, 'page') : plain(Math.abs(value) < 2000 ? value : 10 * Math.round(value / 10), 0, 'page');
  return `${round(low)} to ${round(high)}`;
}

function parameterNumber({ value, reason }: ParameterRow, u: number | null): Shown {
  if (value === null) return missing(reason ?? 'withheld');
  return u === null ? missing('u not determined') : shown(concise(value, u, 'page'));
}

/** Counts with their noun: "1 complex", "24 complexes". */
export const counted = (count: number, one: string, many: string = `${one}s`): string => `${count === 1 ? '1' : plain(count, 0, 'page')} ${count === 1 ? one : many}`;

/** "a, b and c" */
export function listed(items: readonly string[]): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}
