import { compareIons } from './collection.ts';
import { ionPath, ligandPath } from './paths.ts';
import { type SeriesShown, ionSeries, ligandSeries } from './seriesFigures.ts';
import type { CollectionTree } from './tree.ts';

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
  readonly byLigand: readonly SeriesEntry[];
  readonly byMetal: readonly SeriesEntry[];
}

export function seriesPage(tree: CollectionTree): SeriesPage {
  const ions = [...Map.groupBy(tree.complexes, (complex) => complex.ion.name).values()].sort((a, b) => compareIons(a[0]!, b[0]!)).map((group) => group[0]!.ion.name);
  const ligands = [...tree.ligands].sort((a, b) => (a.name < b.name ? -1 : 1));
  return {
    byLigand: ions.flatMap((ion) => ionSeries(tree, ion).map((one) => entry(one, ionPath(ion), ion))),
    byMetal: ligands.flatMap((ligand) => ligandSeries(tree, ligand.id).map((one) => entry(one, ligandPath(ligand.id), ligand.name))),
  };
}

function entry({ figure, count }: SeriesShown, page: string, pageName: string): SeriesEntry {
  const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(figure.svg) ?? [];
  return { title: figure.title, image: `figures/${figure.id}.svg`, width: Number(width), height: Number(height), caption: `n = ${count}.`, page: `${page}#${figure.id}`, pageName };
}
