import { type Factor, type FactorFit, type FactorKind, type Geometry, type SeriesParameter, publishedFactor } from '#engine';
import { ligandName } from './ligandNames.ts';
import { seriesLigand } from './seriesFit.ts';
import { type Column, quantity } from './table.ts';
import type { CollectionTree } from './tree.ts';
import type { Parts } from './typeset.ts';

/** Letter and head of a factor: f, g, h or k. */
export const FACTORS: Readonly<Record<SeriesParameter, Readonly<Record<FactorKind, { readonly letter: string; readonly head: Column }>>>> = {
  Delta: { ligand: { letter: 'f', head: quantity('f', null) }, ion: { letter: 'g', head: quantity('g', 'cm-1') } },
  beta: { ligand: { letter: 'h', head: quantity('h', null) }, ion: { letter: 'k', head: quantity('k', null) } },
};

/** "Cr(III) octahedral quartet" without the geometry, which the title names. */
export const ionWithoutGeometry = (name: string, geometry: Geometry): string => name.replace(` ${geometry}`, '');

/** The printed value that stands beside a factor: of octahedral complexes counted from water alone, as the printed ones are. */
export function printedBeside(tree: CollectionTree, fit: FactorFit, factor: Factor): number | null {
  if (fit.islands.find(({ number }) => number === factor.island)?.gaugeIsAqua !== true) return null;
  return publishedFactor(factor, fit.parameter, tree.ligands.map(seriesLigand));
}

export function factorLabel(tree: CollectionTree, { kind, name }: Pick<Factor, 'kind' | 'name'>, geometry: Geometry): Parts {
  return [{ text: kind === 'ion' ? ionWithoutGeometry(name, geometry) : ligandName(tree, name), style: 'plain' }];
}
