import figureStyles from '../styles/figures.css?raw';
import bookStyles from '../styles/book.css?raw';
import type { PublishedFigure } from './figure.ts';
import { diagramBackground, ionDiagramFigures, ionDiagrams } from './diagram.ts';
import { ionSeries, ligandSeries } from './seriesFigures.ts';
import type { CollectionTree } from './tree.ts';

/** Every figure of the collection that is kept as a file. */
export function publishedFigures(tree: CollectionTree): readonly PublishedFigure[] {
  return [
    ...tree.ions.flatMap(({ name }) => [...ionDiagramFigures(tree, name), ...ionSeries(tree, name).map(({ figure }) => figure)]),
    ...tree.ligands.flatMap((ligand) => ligandSeries(tree, ligand.id).map(({ figure }) => figure)),
  ];
}

/** Diagrams without marks, on which complex pages lay theirs. */
export function backgrounds(tree: CollectionTree): readonly { readonly id: string; readonly svg: string }[] {
  return ionDiagrams(tree).map((one) => ({ id: `${one.id}-background`, svg: diagramBackground(one) }));
}

/** The colours of the book, by day and by night, and the rules for figures: what a figure needs to stand by itself. */
function ownStyles(): string {
  const rules = [...bookStyles.matchAll(/(?::root \{[^}]*\}|@media \(prefers-color-scheme: dark\) \{\s*:root \{[^}]*\}\s*\})/g)].map(([rule]) => rule);
  return `${rules.join('\n')}\n${figureStyles}`;
}

/** A figure as a file: its own namespace and styles, and the paper behind it where it is to be kept. */
export function standalone(svg: string, paper: boolean): string {
  const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg) ?? [];
  const ground = paper ? `<rect width="${width}" height="${height}" fill="var(--paper)"/>` : '';
  const scheme = paper ? ':root { color-scheme: light; }' : '';
  const styles = paper ? ownStyles().replace(/@media \(prefers-color-scheme: dark\) \{\s*:root \{[^}]*\}\s*\}/, '') : ownStyles();
  return `<?xml version="1.0" encoding="UTF-8"?>\n${svg.replace('<svg ', '<svg xmlns="http://www.w3.org/2000/svg" ').replace('>', `><style>${styles}${scheme}</style>${ground}`)}\n`;
}
