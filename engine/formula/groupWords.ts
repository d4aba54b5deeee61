import { compositionOf, entitiesOf, groupsOf } from './composition.ts';
import { isMetal } from './elements.ts';
import { parseFormula } from './parse.ts';
import { folded } from './words.ts';
import type { Formula, FormulaNode } from './types.ts';

/** A symbol of an abbreviated ligand without locants and donor: "2,2'-bpy" and "dmso-O" are "bpy" and "dmso". */
function bareSymbol(symbol: string): string {
  return symbol.replace(/^\d+['′]*(?:,\d+['′]*)*-/, '').replace(/-κ?[A-Z][a-z]?$/, '');
}

/** One spelling for all orders of writing: NH3 and H3N are "h3n", H2O and OH2 "h2o". */
export function groupWord(nodes: readonly FormulaNode[]): string {
  return folded([...compositionOf(nodes)].map(([symbol, count]) => bareSymbol(symbol) + (count === 1 ? '' : String(count))).join(''));
}

/** A group with how often it stands there, "h3n:6"; once is not said. */
export function countedWord(word: string, count: number): string {
  return count === 1 ? word : `${word}:${count}`;
}

/** The words of the first coordination entity of a formula: "=cr" for a metal, "h3n:6" for its groups. */
export function entityWords(formula: Formula): readonly string[] {
  const entity = entitiesOf(formula)[0] ?? [];
  const metals = entity.flatMap((node) => (node.kind === 'element' && isMetal(node.symbol) ? [`=${node.symbol.toLowerCase()}`] : []));
  return [...metals, ...groupsOf(entity).map(({ nodes, count }) => countedWord(groupWord(nodes), count))];
}

/** The group word of a ligand's formula or abbreviation as text; null where it is no formula. */
export function groupWordOf(text: string): string | null {
  const parsed = parseFormula(text);
  return parsed.ok && parsed.formula.parts.length === 1 ? groupWord(parsed.formula.parts[0]?.nodes ?? []) : null;
}
