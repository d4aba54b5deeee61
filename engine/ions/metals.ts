/** A d-block metal: symbol, English name, group of the periodic table (3 to 12) and row of d shell. */
export interface Metal {
  readonly symbol: string;
  readonly name: string;
  readonly group: number;
  readonly row: '3d' | '4d' | '5d';
}

const rows: readonly (readonly [Metal['row'], string])[] = [
  ['3d', 'Sc scandium, Ti titanium, V vanadium, Cr chromium, Mn manganese, Fe iron, Co cobalt, Ni nickel, Cu copper, Zn zinc'],
  ['4d', 'Y yttrium, Zr zirconium, Nb niobium, Mo molybdenum, Tc technetium, Ru ruthenium, Rh rhodium, Pd palladium, Ag silver, Cd cadmium'],
  ['5d', 'La lanthanum, Hf hafnium, Ta tantalum, W tungsten, Re rhenium, Os osmium, Ir iridium, Pt platinum, Au gold, Hg mercury'],
];

/**
 * The closed table of the thirty d-block metals, row by row in order of group.
 * Source: IUPAC periodic table; lanthanum stands for group 3 of the third row.
 */
export const metals: readonly Metal[] = rows.flatMap(([row, list]) =>
  list.split(', ').map((entry, place) => {
    const [symbol = '', name = ''] = entry.split(' ');
    return { symbol, name, group: place + 3, row };
  }));

const bySymbol = new Map(metals.map((metal) => [metal.symbol, metal]));

/** The metal of an element symbol as IUPAC writes it ("Cr"), or null for anything that is not in the table. */
export function metalOf(symbol: string): Metal | null {
  return bySymbol.get(symbol) ?? null;
}

/**
 * English name of a d-block metal, "chromium".
 * Throws RangeError for a symbol that is not in the table.
 */
export function elementName(symbol: string): string {
  const metal = metalOf(symbol);
  if (metal === null) throw new RangeError(`elementName: symbol "${symbol}" is not a d-block metal`);
  return metal.name;
}
