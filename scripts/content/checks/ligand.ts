// What must fit together within a ligand record.

import { elementCounts, parseFormula } from '#engine';
import type { FormulaNode } from '#engine';
import type { Draft } from '../draft.ts';
import { typedText } from '../report.ts';
import type { Reporter } from '../report.ts';
import type { ligandSchema } from '../schema/ligand.ts';
import { heavyAtoms, readStructure } from '../../structures/layout.ts';
import { chargeText, formulaFinding } from './formula.ts';

export function checkLigand(ligand: Draft<typeof ligandSchema>, report: Reporter): void {
  if (ligand === undefined) return;
  const donors = [ligand.donors ?? []].flat(2).filter((donor) => donor !== undefined);
  const parsed = ligand.formula === undefined ? null : parseFormula(ligand.formula);
  if (parsed !== null && !parsed.ok) report.at(['formula'], formulaFinding(ligand.formula ?? '', parsed));
  if (parsed?.ok === true) {
    const { formula } = parsed;
    if (formula.charge !== null && ligand.charge !== undefined && formula.charge !== ligand.charge) {
      report.at(['charge'], {
        code: 'CHARGE_SUM', found: `charge ${chargeText(ligand.charge)} beside the formula ${typedText(ligand.formula ?? '')}`, expected: 'the charge that the formula carries',
        mend: `write charge: ${formula.charge}, or correct the formula`,
      });
    }
    const atoms = elementCounts(formula);
    const stranger = donors.find((donor) => !atoms.has(donor));
    if (stranger !== undefined) {
      report.at(['donors'], { code: 'LIGAND_DONORS', found: typedText(stranger), expected: `donor atoms of ${ligand.formula}: ${[...atoms.keys()].join(', ')}`, mend: 'write the element that binds the metal, or correct the formula' });
    }
  }
  if (ligand.smiles !== undefined) checkSmiles(ligand.smiles, parsed?.ok === true && parsed.formula.parts.every(({ nodes }) => onlyElements(nodes)) ? elementCounts(parsed.formula) : null, report);
  if (ligand.denticity !== undefined && donors.length > 0 && donors.length !== ligand.denticity) {
    report.at(['donors'], {
      code: 'LIGAND_DONORS', found: `${donors.join(', ')} (${donors.length})`, expected: `${ligand.denticity} donor atom${ligand.denticity === 1 ? '' : 's'}, as many as the denticity`,
      mend: 'list each donor atom that one ligand binds, or correct the denticity',
    });
  }
}

/** Whether a formula counts its atoms: abbreviations and residues hide some. */
const onlyElements = (nodes: readonly FormulaNode[]): boolean =>
  nodes.every((node) => (node.kind === 'group' ? onlyElements(node.nodes) : node.kind === 'element' || node.kind === 'mark'));

/** A salt or a protonated form is the group's choice: hydrogen and charge may differ from the formula's, other atoms may not. */
function checkSmiles(smiles: string, atoms: ReadonlyMap<string, number> | null, report: Reporter): void {
  const read = readStructure(smiles);
  if (!read.ok) {
    report.at(['smiles'], { code: 'LIGAND_SMILES', found: `${typedText(smiles)}: ${read.reason}`, expected: 'the SMILES of the free ligand, e.g. "NCCN"', mend: 'correct it, or leave smiles: out; without it the ligand has no drawing' });
    return;
  }
  if (atoms === null) return;
  const counted = (counts: ReadonlyMap<string, number>): string => [...counts].filter(([symbol]) => symbol !== 'H' && symbol !== 'D').sort(([a], [b]) => (a < b ? -1 : 1)).map(([symbol, count]) => `${symbol}${count === 1 ? '' : count}`).join(' ');
  const [drawn, typed] = [counted(heavyAtoms(read.structure)), counted(atoms)];
  if (drawn !== typed) report.at(['smiles'], { code: 'LIGAND_SMILES', found: `${typedText(smiles)} with the atoms ${drawn}`, expected: `the atoms of the formula: ${typed} (hydrogen aside)`, mend: 'correct the SMILES or the formula' });
}
