// What a generated complex is: metal, ligands, geometry; its formula and the salt that was weighed.

import type { Geometry } from '#engine';
import { ligandEntry } from './ligands.ts';
import { ionNamed } from './metalIons.ts';
import type { Spin } from './metalIons.ts';

export interface Recipe {
  readonly id: string;
  readonly ion: string;
  readonly geometry: Geometry;
  readonly spin: Spin;
  /** Ligand id and how many. */
  readonly ligands: readonly (readonly [string, number])[];
  readonly isomer: 'none' | 'cis' | 'trans' | 'fac' | 'mer';
}

/** Charge of the complex: oxidation state and ligand charges. */
export function chargeOf(recipe: Pick<Recipe, 'ion' | 'ligands'>): number {
  return recipe.ligands.reduce((sum, [id, count]) => sum + count * ligandEntry(id).charge, ionNamed(recipe.ion).oxidation);
}

/** "3+", "2-", "" for a neutral complex, "+" for one charge. */
function chargeText(charge: number): string {
  if (charge === 0) return '';
  const size = Math.abs(charge) === 1 ? '' : String(Math.abs(charge));
  return `${size}${charge > 0 ? '+' : '-'}`;
}

/** The entity in square brackets, ligand symbols in alphabetical order (IUPAC Red Book 2005, IR-4.4.3.2, IR-9.2.3.1). */
function entity(recipe: Pick<Recipe, 'ion' | 'ligands'>): string {
  const parts = recipe.ligands
    .map(([id, count]) => ({ symbol: ligandEntry(id).symbol, count }))
    .sort((a, b) => (a.symbol.toLowerCase() < b.symbol.toLowerCase() ? -1 : 1))
    .map(({ symbol, count }) => {
      const oneAtom = /^[A-Z][a-z]?$/.test(symbol);
      if (oneAtom) return `${symbol}${count === 1 ? '' : count}`;
      return `(${symbol})${count === 1 ? '' : count}`;
    });
  return `[${ionNamed(recipe.ion).metal}${parts.join('')}]`;
}

/** "[CrCl2(en)2]+". */
export function formulaOf(recipe: Pick<Recipe, 'ion' | 'ligands'>): string {
  return `${entity(recipe)}${chargeText(chargeOf(recipe))}`;
}

const counterCharge: Readonly<Record<string, number>> = {
  NO3: -1, ClO4: -1, Cl: -1, Br: -1, I: -1, BF4: -1, PF6: -1, SO4: -2, K: 1, Na: 1, NH4: 1, NEt4: 1, PPh4: 1, Cs: 1, Rb: 1,
};

const oneAtomIon = /^[A-Z][a-z]?$/;

function times(symbol: string, count: number): string {
  if (count === 1) return symbol;
  return oneAtomIon.test(symbol) ? `${symbol}${count}` : `(${symbol})${count}`;
}

/** The salt "[Cr(NH3)6](NO3)3", "K3[Cr(CN)6]"; a neutral complex stands alone. Throws RangeError for an unknown counter-ion. */
export function sampleOf(recipe: Pick<Recipe, 'ion' | 'ligands'>, counter: string, water = 0): string {
  const charge = chargeOf(recipe);
  const hydrate = water === 0 ? '' : `.${water === 1 ? '' : water}H2O`;
  if (charge === 0) return `${entity(recipe)}${hydrate}`;
  const other = counterCharge[counter];
  if (other === undefined || other * charge > 0) throw new RangeError(`sampleOf: ${counter} does not balance a charge of ${charge}`);
  const least = commonMultiple(Math.abs(charge), Math.abs(other));
  const complexes = least / Math.abs(charge);
  const counters = least / Math.abs(other);
  const inner = complexes === 1 ? entity(recipe) : `${entity(recipe)}${complexes}`;
  return (charge > 0 ? `${inner}${times(counter, counters)}` : `${times(counter, counters)}${inner}`) + hydrate;
}

function commonMultiple(a: number, b: number): number {
  let result = a;
  while (result % b !== 0) result += a;
  return result;
}
