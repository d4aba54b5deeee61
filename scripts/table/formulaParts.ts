// Ion and ligands of a complex out of its formula, for tables that name the complex by its formula alone.

import { compositionOf, elementCounts, entitiesOf, groupsOf, ionName, metalOf, parseFormula } from '#engine';
import type { Abbreviation } from '#engine';
import type { LigandRecord } from '../content/types.ts';

export interface FormulaParts {
  readonly ion: string;
  readonly ligands: Readonly<Record<string, string>>;
}

/**
 * The ion and the ligands that a formula names, or null where it leaves a choice: a group that no ligand record or more than one
 * explains, more than one metal, an oxidation state that the charge does not give.
 */
export function partsOfFormula(typed: string, ligands: readonly LigandRecord[]): FormulaParts | null {
  const words: Abbreviation[] = ligands.flatMap(({ id, name, abbreviation, formula }) => [...new Set([abbreviation, id, name])].flatMap((word) => (word === null ? [] : [{ abbreviation: word, formula }])));
  const parsed = parseFormula(typed, { abbreviations: words.filter(({ abbreviation }) => typed.includes(abbreviation)).map(({ abbreviation }) => abbreviation) });
  if (!parsed.ok || parsed.formula.parts.length !== 1) return null;
  // A salt's charge says nothing about the complex.
  const { nodes: whole } = parsed.formula.parts[0]!;
  if (whole.length !== 1 && whole.some((node) => node.kind === 'group' && node.bracket === '[')) return null;
  const entity = entitiesOf(parsed.formula)[0] ?? [];
  const metals = entity.flatMap((node) => (node.kind === 'element' && metalOf(node.symbol) !== null ? [node] : []));
  if (metals.length !== 1 || metals[0]!.count !== 1) return null;
  const metal = metals[0]!.symbol;
  const found: Record<string, string> = {};
  let charge = parsed.formula.charge ?? 0;
  for (const { nodes, count } of groupsOf(entity)) {
    const named = nodes.length === 1 && nodes[0]!.kind === 'ligand' ? nodes[0]!.symbol : null;
    const key = keyOf(compositionOf(nodes, words));
    const fitting = ligands.filter((ligand) => (named !== null && [ligand.abbreviation, ligand.id, ligand.name].includes(named)) || (named === null && keyOfFormula(ligand.formula) === key));
    if (fitting.length !== 1) return null;
    const ligand = fitting[0]!;
    found[ligand.id] = String(count + Number(found[ligand.id] ?? 0));
    charge -= ligand.charge * count;
  }
  if (Object.keys(found).length === 0 || charge < -12 || charge > 12) return null;
  return { ion: ionName(metal, charge), ligands: found };
}

function keyOf(composition: ReadonlyMap<string, number>): string {
  return [...composition].map(([symbol, count]) => `${symbol}${count}`).join(' ');
}

function keyOfFormula(formula: string): string | null {
  const parsed = parseFormula(formula);
  return parsed.ok ? keyOf(elementCounts(parsed.formula)) : null;
}
