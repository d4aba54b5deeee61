import { compareIons } from './collection.ts';
import { ionPath, ligandPath } from './paths.ts';
import { type SeriesShown, ionSeries, ligandSeries } from './seriesFigures.ts';
import type { CollectionTree } from './tree.ts';
import { plateId } from './figure.ts';
import { groupBy } from './group.ts';

/** A figure as it stands on the series page: a picture file with the page that holds it in full. */
export interface SeriesEntry {
  readonly title: string;
  readonly image: string;
  readonly width: number;
  readonly height: number;
  readonly caption: string;
  readonly page: string;
  readonly pageName: string;
}

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

function paired(series: readonly SeriesShown[], page: string, pageName: string): readonly (readonly SeriesEntry[])[] {
  return [...groupBy(series, ({ figure }) => figure.id.replace(/-(delta|beta)$/, '')).values()].map((group) => group.map((one) => entry(one, page, pageName)));
}

function entry({ figure, count }: SeriesShown, page: string, pageName: string): SeriesEntry {
  const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(figure.svg) ?? [];
  return { title: figure.title, image: `figures/${plateId(figure.id)}.svg`, width: Number(width), height: Number(height), caption: `n = ${count}.`, page: `${page}#${figure.id}`, pageName };
}
