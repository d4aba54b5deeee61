import { type PublishedFigure, plateId } from './figure.ts';
import { diagramBackground, ionDiagramFigures, ionDiagrams } from './diagram.ts';
import { factorFigures } from './factorFigures.ts';
import { correlations } from './correlationFigures.ts';
import { inversionCsv, inversionsByKind } from './inversionTables.ts';
import { mapFigures } from './mapFigures.ts';
import { INVERSIONS } from './orders.ts';
import { residualFigures } from './residualFigures.ts';
import { ionSeries, ligandSeries } from './seriesFigures.ts';
import type { CollectionTree } from './tree.ts';
import { trends } from './trendFigures.ts';

/** Every figure of the collection that is kept as a file. */
export function publishedFigures(tree: CollectionTree): readonly PublishedFigure[] {
  return [
    ...tree.ions.flatMap(({ name }) => [...ionDiagramFigures(tree, name), ...ionSeries(tree, name).map(({ figure }) => figure)]),
    ...tree.ligands.flatMap((ligand) => ligandSeries(tree, ligand.id).map(({ figure }) => figure)),
    ...factorFigures(tree).flatMap(({ figures }) => figures), ...mapFigures(tree).flatMap(({ figures }) => figures),
    ...residualFigures(tree).flatMap(({ figure }) => figure ?? []), ...trends(tree).map(({ figure }) => figure), ...correlations(tree).map(({ figure }) => figure),
  ];
}

/** Every CSV file beside the figures: that of each figure, and of tables that are no figure. */
export function numberFiles(tree: CollectionTree): readonly { readonly id: string; readonly csv: string }[] {
  return [
    ...publishedFigures(tree).flatMap(({ id, csv }) => (csv === null ? [] : [{ id, csv }])),
    { id: INVERSIONS, csv: inversionCsv(tree, inversionsByKind(tree)) },
  ];
}

/** Figures that pages show as pictures and that follow the reader's theme: diagrams to lay marks over, and plates of the series page. */
export function pictures(tree: CollectionTree): readonly { readonly id: string; readonly svg: string }[] {
  const series = [...tree.ions.flatMap(({ name }) => ionSeries(tree, name)), ...tree.ligands.flatMap(({ id }) => ligandSeries(tree, id))].filter(({ part }) => part === 1);
  return [
    ...ionDiagrams(tree).map((one) => ({ id: `${one.id}-background`, svg: diagramBackground(one) })),
    ...[...series, ...correlations(tree)].map(({ figure }) => ({ id: plateId(figure.id), svg: figure.svg })),
    ...tree.ions.flatMap(({ name }) => ionDiagramFigures(tree, name)).filter(({ asPicture }) => asPicture).map(({ id, svg }) => ({ id: plateId(id), svg })),
  ];
}
