import type { CollectionTree } from './tree.ts';
import { type Parts, formulaShown } from './typeset.ts';

/** Name of a ligand by its id. */
export const ligandName = (tree: CollectionTree, id: string): string => tree.ligands.find((row) => row.id === id)!.name;

/** The shortest that names a ligand in a narrow column: its symbol, else its formula, with the donor atom where its name says it. */
export function ligandSymbol(tree: CollectionTree, id: string): Parts {
  const row = tree.ligands.find((one) => one.id === id)!;
  const donor = /-κ([A-Z][a-z]?)$/.exec(row.name)?.[1];
  const symbol: Parts = row.abbreviation === null ? formulaShown(row.formula, 'none', tree.abbreviations).parts : [{ text: row.abbreviation, style: 'plain' }];
  return donor === undefined ? symbol : [...symbol, { text: '-κ', style: 'plain' }, { text: donor, style: 'italic' }];
}
