import { describe, expect, it } from 'vitest';
import { ligandEntries } from '../../../scripts/generate/ligands.ts';
import type { LigandEntry } from '../../../scripts/generate/ligands.ts';

/** Atoms but hydrogen of a formula such as "C2O4 2-". */
function heavyAtomsOfFormula(formula: string): Record<string, number> {
  const atoms: Record<string, number> = {};
  for (const [, symbol, count] of formula.replace(/ ?\^?\d*[-+]$/, (charge) => (charge === '-' ? '' : charge.startsWith(' ') || charge.startsWith('^') ? '' : charge.slice(0, -1))).matchAll(/([A-Z][a-z]?)(\d*)/g)) {
    if (symbol !== 'H') atoms[symbol!] = (atoms[symbol!] ?? 0) + Number(count === '' ? 1 : count);
  }
  return atoms;
}

/** Atoms but hydrogen of a SMILES string of the organic subset and bracket atoms. */
function heavyAtomsOfSmiles(smiles: string): Record<string, number> {
  const atoms: Record<string, number> = {};
  for (const [token] of smiles.matchAll(/Cl|Br|[BCNOPSFI]|[cnops]/g)) {
    const symbol = token[0]!.toUpperCase() + token.slice(1);
    atoms[symbol] = (atoms[symbol] ?? 0) + 1;
  }
  return atoms;
}

const chargeOfSmiles = (smiles: string): number => (smiles.match(/\+\]/g)?.length ?? 0) - (smiles.match(/-\]/g)?.length ?? 0);

/** f and h as printed: C. K. Jorgensen, Absorption Spectra and Chemical Bonding (1962) p. 113; Modern Aspects of Ligand Field Theory (1971) p. 347. */
const printedF: Record<string, number> = {
  bromido: 0.72, chlorido: 0.78, azido: 0.83, fluorido: 0.9, 'dmso-o': 0.91, oxalato: 0.99, 'thiocyanato-n': 1.02, glycinato: 1.18,
  acetonitrile: 1.22, pyridine: 1.23, ammine: 1.25, en: 1.28, bpy: 1.33, 'nitrito-n': 1.4, cyanido: 1.7,
};
const printedH: Record<string, number> = { fluorido: 0.8, urea: 1.2, ammine: 1.4, en: 1.5, oxalato: 1.5, chlorido: 2, cyanido: 2, bromido: 2.3 };

describe('ligands of the generator', () => {
  it.each(ligandEntries.map((one): [string, LigandEntry] => [one.id, one]))('%s: SMILES, formula and charge hold the same', (_, ligand) => {
    expect(heavyAtomsOfSmiles(ligand.smiles)).toEqual(heavyAtomsOfFormula(ligand.formula));
    expect(chargeOfSmiles(ligand.smiles)).toBe(ligand.charge);
  });

  it('bind by atoms that they have', () => {
    for (const ligand of ligandEntries) {
      const atoms = heavyAtomsOfSmiles(ligand.smiles);
      for (const donor of new Set(ligand.donors)) {
        expect(atoms[donor], `${ligand.id}: ${donor}`).toBeGreaterThanOrEqual(ligand.donors.filter((one) => one === donor).length);
      }
    }
  });

  it('have ids, keys and symbols of their own', () => {
    for (const field of ['id', 'key', 'symbol'] as const) expect(new Set(ligandEntries.map((one) => one[field])).size).toBe(ligandEntries.length);
  });

  it('have invented factors within 10 % of the printed ones and equal to none', () => {
    for (const [printed, factor] of [[printedF, 'f'], [printedH, 'h']] as const) {
      for (const [id, value] of Object.entries(printed)) {
        const own = ligandEntries.find((one) => one.id === id)![factor];
        expect(own, `${factor} of ${id}`).not.toBe(value);
        expect(Math.abs(own / value - 1), `${factor} of ${id}`).toBeLessThanOrEqual(0.1);
      }
    }
  });
});
