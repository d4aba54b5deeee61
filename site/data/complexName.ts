import { additiveName, elementName, romanNumeral } from '#engine';
import type { ComplexNode } from './tree.ts';

/** The name in the record, else the additive name built from the ligand records. */
export function complexName({ row, ion, ligands }: ComplexNode): string {
  if (row.name !== null) return row.name;
  const name = additiveName(ion.metal, elementName(ion.metal) ?? ion.metal, romanNumeral(ion.oxidation), ligands.map(({ row: link, ligand }) => ({ name: ligand.name, count: link.count })), row.charge);
  return row.isomer === 'none' ? name : `${row.isomer}-${name}`;
}
