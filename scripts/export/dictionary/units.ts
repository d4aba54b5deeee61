/** A unit as UCUM codes it and as a page prints it. */
export interface UnitShown {
  readonly ucum: string;
  readonly shown: string;
  readonly name: string;
}

const units: readonly UnitShown[] = [
  { ucum: 'cm-1', shown: 'cm⁻¹', name: 'wavenumber' },
  { ucum: 'K', shown: 'K', name: 'kelvin' },
  { ucum: 'L.mol-1.cm-1', shown: 'L mol⁻¹ cm⁻¹', name: 'litre per mole and centimetre' },
  { ucum: '1', shown: '1', name: 'pure number' },
];

/** A unit by its UCUM code. Throws RangeError for a code that the data do not use. */
export function unitOf(ucum: string): UnitShown {
  const found = units.find((unit) => unit.ucum === ucum);
  if (found === undefined) throw new RangeError(`unit "${ucum}": expected one of ${units.map((unit) => unit.ucum).join(', ')}`);
  return found;
}
