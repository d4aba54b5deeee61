import { readStructure } from '../../scripts/structures/layout.ts';
import { structureFigure } from '../charts/structure.ts';
import { oncePerCollection } from './memo.ts';
import type { CollectionTree } from './tree.ts';

/** The structural formula of a ligand as SVG, laid out once a ligand; null without a SMILES that can be read. */
export const ligandStructure = oncePerCollection((tree, id): string | null => {
  const row = tree.ligands.find((ligand) => ligand.id === id);
  if (row === undefined || row.smiles === null) return null;
  const read = readStructure(row.smiles);
  return !read.ok ? null : structureFigure(read.structure, {
    id: `structure-of-${id}`, kind: 'structure', title: `Structure of ${row.name}`, description: `Structural formula of the free ligand, drawn from the SMILES ${row.smiles}.`,
  });
});

/** The same where it shows more than the formula does: not for a single atom or a hydride. */
export function tellingStructure(tree: CollectionTree, id: string): string | null {
  const svg = ligandStructure(tree, id);
  return svg !== null && /class="bond"/.test(svg) ? svg : null;
}
