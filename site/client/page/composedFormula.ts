import { complexCharge } from '#engine';

/** A ligand as a formula writes it. */
export interface WrittenLigand {
  readonly formula: string;
  readonly abbreviation: string | null;
  readonly charge: number;
  readonly count: number;
}

/** The formula that a metal and its ligands make, "[Cr(NH3)4(H2O)2]3+": ligands in alphabetical order of their symbols (Red Book 2005, IR-4.4.3.2). */
export function composedFormula(metal: string, oxidation: number, ligands: readonly WrittenLigand[], metals = 1): string {
  const symbols = ligands.map(({ abbreviation, formula, count }) => {
    const bare = formula.replace(/[\s^]*\d*[+\-−]$/, '');
    return { symbol: abbreviation ?? bare, one: abbreviation === null && /^[A-Z][a-z]?$/.test(bare), count };
  }).sort((a, b) => (a.symbol < b.symbol ? -1 : a.symbol > b.symbol ? 1 : 0));
  const inner = symbols.map(({ symbol, one, count }) => `${one ? symbol : `(${symbol})`}${count === 1 ? '' : count}`).join('');
  const charge = complexCharge(oxidation, ligands, metals);
  const size = Math.abs(charge);
  return `[${metal}${metals === 1 ? '' : metals}${inner}]${charge === 0 ? '' : `${size === 1 ? '' : size}${charge > 0 ? '+' : '-'}`}`;
}
