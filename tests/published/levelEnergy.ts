import { levels } from '#engine';
import type { FieldIon, FieldParameters } from '#engine';

/**
 * Energy of one level above another, in cm-1, both named by multiplicity, irrep (without g) and place in the block from 1:
 * "4T1 2" is the second 4T1. Throws where the ion has no such level.
 */
export function energyAbove(ion: FieldIon, parameters: FieldParameters, upper: string, lower: string): number {
  const all = levels(ion, parameters);
  const energyOf = (name: string): number => {
    const [symbol = '', place = '1'] = name.split(' ');
    const found = all.find((level) => `${level.multiplicity}${level.irrep.replace('g', '')}` === symbol && level.index === Number(place));
    if (found === undefined) throw new Error(`d${ion.electrons} ${ion.geometry} has no level ${name}`);
    return found.energy;
  };
  return energyOf(upper) - energyOf(lower);
}
