import { isMetal } from './elements.ts';
import { parseFormula } from './parse.ts';
import type { Formula, FormulaNode } from './types.ts';

/** What an abbreviation stands for: its ligand record's own formula. */
export interface Abbreviation {
  readonly abbreviation: string;
  readonly formula: string;
}

/** Counts by symbol, in alphabetical order. Abbreviations that nothing explains keep an entry of their own. */
export type Composition = ReadonlyMap<string, number>;

type Meanings = ReadonlyMap<string, readonly FormulaNode[]>;

function meanings(abbreviations: readonly Abbreviation[]): Meanings {
  const map = new Map<string, readonly FormulaNode[]>();
  for (const { abbreviation, formula } of abbreviations) {
    const parsed = parseFormula(formula);
    if (parsed.ok && parsed.formula.parts.length === 1) map.set(abbreviation, parsed.formula.parts[0]?.nodes ?? []);
  }
  return map;
}

function add(total: Map<string, number>, nodes: readonly FormulaNode[], times: number, known: Meanings, depth: number): void {
  for (const node of nodes) {
    if (node.kind === 'mark') continue;
    const many = node.count * times;
    if (node.kind === 'group') add(total, node.nodes, many, known, depth);
    else {
      const inside = node.kind === 'ligand' && depth < 3 ? known.get(node.symbol) : undefined;
      if (inside) add(total, inside, many, known, depth + 1);
      else total.set(node.symbol, (total.get(node.symbol) ?? 0) + many);
    }
  }
}

function sorted(total: ReadonlyMap<string, number>): Composition {
  return new Map([...total].sort(([a], [b]) => (a < b ? -1 : 1)));
}

/** How many of each element some nodes hold; explained abbreviations are opened. */
export function compositionOf(nodes: readonly FormulaNode[], abbreviations: readonly Abbreviation[] = []): Composition {
  const total = new Map<string, number>();
  add(total, nodes, 1, meanings(abbreviations), 0);
  return sorted(total);
}

/** How many of each element a formula holds, its waters of crystallisation included; an unknown number of them counts none. */
export function elementCounts(formula: Formula, abbreviations: readonly Abbreviation[] = []): Composition {
  const total = new Map<string, number>();
  const known = meanings(abbreviations);
  for (const part of formula.parts) add(total, part.nodes, part.multiplier ?? 0, known, 0);
  return sorted(total);
}

function squares(nodes: readonly FormulaNode[]): readonly (FormulaNode & { kind: 'group' })[] {
  return nodes.flatMap((node) => (node.kind !== 'group' ? [] : node.bracket === '[' ? [node] : squares(node.nodes)));
}

function holdsMetal(nodes: readonly FormulaNode[]): boolean {
  return nodes.some((node) => (node.kind === 'element' && isMetal(node.symbol)) || (node.kind === 'group' && holdsMetal(node.nodes)));
}

/** The coordination entities of a formula: the insides of its square brackets that hold a metal; without any, the whole first part. */
export function entitiesOf(formula: Formula): readonly (readonly FormulaNode[])[] {
  const found = formula.parts.flatMap((part) => squares(part.nodes)).map((node) => node.nodes).filter(holdsMetal);
  return found.length > 0 ? found : [formula.parts[0]?.nodes ?? []];
}

/** The groups around the metals of an entity, with how often each stands there; equal groups are gathered. */
export function groupsOf(entity: readonly FormulaNode[]): readonly { readonly nodes: readonly FormulaNode[]; readonly count: number }[] {
  const groups = new Map<string, { nodes: readonly FormulaNode[]; count: number }>();
  for (const node of entity) {
    if (node.kind === 'mark' || (node.kind === 'element' && isMetal(node.symbol))) continue;
    const nodes = node.kind === 'group' ? node.nodes.filter((inner) => inner.kind !== 'mark') : [{ ...node, count: 1 }];
    const key = JSON.stringify([...compositionOf(nodes)]);
    groups.set(key, { nodes, count: (groups.get(key)?.count ?? 0) + node.count });
  }
  return [...groups.values()];
}

function same(one: Composition, other: Composition): boolean {
  return one.size === other.size && [...one].every(([symbol, count]) => other.get(symbol) === count);
}

/**
 * true where one of the sample's entities has the composition of the complex's, whatever the order and the spelling of its ligands;
 * a complex written without brackets in the sample counts too.
 */
export function containsComplex(sample: Formula, complex: Formula, abbreviations: readonly Abbreviation[] = []): boolean {
  const wanted = compositionOf(entitiesOf(complex)[0] ?? [], abbreviations);
  return entitiesOf(sample).some((entity) => same(compositionOf(entity, abbreviations), wanted));
}
