import { compareIons } from './collection.ts';
import { groupBy } from './group.ts';
import { ionPath, ligandPath } from './paths.ts';
import { type SeriesEntry, pictureEntry } from './seriesEntry.ts';
import { type SeriesShown, ionSeries, ligandSeries } from './seriesFigures.ts';
import type { CollectionTree } from './tree.ts';

export interface SeriesPage {
  /** Figures that belong together, Delta and beta of one ion or ligand in one geometry and spin, stand side by side. */
  readonly byLigand: readonly (readonly SeriesEntry[])[];
  readonly byMetal: readonly (readonly SeriesEntry[])[];
}

export function seriesPage(tree: CollectionTree): SeriesPage {
  const ions = [...groupBy(tree.complexes, (complex) => complex.ion.name).values()].sort((a, b) => compareIons(a[0]!, b[0]!)).map((group) => group[0]!.ion.name);
  const ligands = [...tree.ligands].sort((a, b) => (a.name < b.name ? -1 : 1));
  return {
    byLigand: ions.flatMap((ion) => paired(ionSeries(tree, ion), ionPath(ion), ion)),
    byMetal: ligands.flatMap((ligand) => paired(ligandSeries(tree, ligand.id), ligandPath(ligand.id), ligand.name)),
  };
}

/** The first part of each figure stands for the whole. */
function paired(series: readonly SeriesShown[], page: string, pageName: string): readonly (readonly SeriesEntry[])[] {
  return [...groupBy(series.filter(({ part }) => part === 1), ({ figure }) => figure.id.replace(/-(delta|beta)$/, '')).values()]
    .map((group) => group.map(({ figure, count }) => pictureEntry(figure, count, page, pageName)));
}
