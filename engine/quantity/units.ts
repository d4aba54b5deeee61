import type { Unit, Wanted } from './types.ts';

/** e/(hc) in cm-1 per volt, exact in the SI of 2019 (CODATA 2018: 8065.543 937 ... cm-1 for 1 eV). */
export const wavenumberPerElectronvolt = 8065.543937349212;

const spellings: ReadonlyMap<string, Unit> = new Map<string, Unit>([
  ['cm-1', 'cm-1'], ['cm^-1', 'cm-1'], ['cm^(-1)', 'cm-1'], ['cm^{-1}', 'cm-1'], ['cm**-1', 'cm-1'], ['/cm', 'cm-1'], ['1/cm', 'cm-1'],
  ['kK', 'kK'], ['nm', 'nm'], ['µm', 'µm'], ['um', 'µm'], ['eV', 'eV'], ['meV', 'meV'],
  ['K', 'K'], ['°C', '°C'], ['° C', '°C'], ['%', '%'],
  ['L mol-1 cm-1', 'L mol-1 cm-1'], ['L/(mol cm)', 'L mol-1 cm-1'], ['L mol^-1 cm^-1', 'L mol-1 cm-1'],
  ['l mol-1 cm-1', 'L mol-1 cm-1'], ['dm3 mol-1 cm-1', 'L mol-1 cm-1'], ['M-1 cm-1', 'L mol-1 cm-1'],
]);

/** Spellings that are wrong but clear enough to name the unit that was meant. Keys are in lower case, without spaces. */
const meant: ReadonlyMap<string, Unit> = new Map<string, Unit>([
  ['cm-1', 'cm-1'], ['cm', 'cm-1'], ['cm1', 'cm-1'], ['cm+1', 'cm-1'], ['cm_1', 'cm-1'], ['cm-', 'cm-1'], ['cm^1', 'cm-1'], ['cm-l', 'cm-1'], ['percm', 'cm-1'],
  ['wavenumber', 'cm-1'], ['wavenumbers', 'cm-1'], ['kayser', 'cm-1'],
  ['kk', 'kK'], ['kilokayser', 'kK'], ['kcm-1', 'kK'],
  ['nm', 'nm'], ['nanometre', 'nm'], ['nanometres', 'nm'], ['nanometer', 'nm'], ['nanometers', 'nm'], ['mµ', 'nm'],
  ['µ', 'µm'], ['micron', 'µm'], ['microns', 'µm'], ['mum', 'µm'], ['µm', 'µm'], ['um', 'µm'],
  ['ev', 'eV'], ['mev', 'meV'],
  ['kelvin', 'K'], ['kelvins', 'K'], ['k', 'K'], ['°k', 'K'], ['degk', 'K'],
  ['c', '°C'], ['°c', '°C'], ['celsius', '°C'], ['degc', '°C'], ['°', '°C'],
  ['percent', '%'], ['pct', '%'], ['percents', '%'],
]);

const accepted: Readonly<Record<Wanted, readonly Unit[]>> = {
  energy: ['cm-1', 'kK', 'nm', 'µm', 'eV', 'meV'],
  temperature: ['K', '°C'],
  percent: ['%'],
  number: [''],
  'absorption-coefficient': ['', 'L mol-1 cm-1'],
  count: [''],
};

/** The units a field takes, the usual one first. */
export function unitsFor(wanted: Wanted): readonly Unit[] {
  return accepted[wanted];
}

/** The unit a spelling names, or null. Expects plain characters. */
export function unitOf(spelling: string): Unit | null {
  return spellings.get(spelling) ?? null;
}

/** The unit that a wrong spelling most likely means, among those a field takes, or null. Expects plain characters. */
export function unitMeant(spelling: string, wanted: Wanted): Unit | null {
  const unit = meant.get(spelling.toLowerCase().replace(/ /g, ''));
  return unit !== undefined && accepted[wanted].includes(unit) ? unit : null;
}

const shown: Readonly<Partial<Record<Unit, string>>> = {
  'cm-1': 'cm⁻¹',
  'L mol-1 cm-1': 'L mol⁻¹ cm⁻¹',
};

/** A unit as a page prints it, with real superscripts: "cm⁻¹". */
export function unitShown(unit: Unit): string {
  return shown[unit] ?? unit;
}

/** true for units that fall as the energy rises. */
export function isWavelength(unit: Unit): boolean {
  return unit === 'nm' || unit === 'µm';
}
