import { mapFigures } from './mapFigures.ts';
import type { PublishedFigure } from './figure.ts';
import { residualFigures } from './residualFigures.ts';
import type { CollectionTree } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** What is measured, what is predicted, and how far the two lie apart, for one parameter in one geometry. */
export interface PredictionSection {
  readonly id: string;
  readonly heading: Parts;
  readonly maps: readonly PublishedFigure[];
  readonly sentence: string;
  readonly residuals: PublishedFigure | null;
}

export function predictionsPage(tree: CollectionTree): readonly PredictionSection[] {
  return residualFigures(tree).map(({ parameter, geometry, sentence, figure }) => ({
    id: `${parameter.toLowerCase()}-${geometry}`, heading: sentenceShown(`${parameter} of ${geometry} complexes`),
    maps: mapFigures(tree).filter((one) => one.parameter === parameter && one.geometry === geometry).flatMap(({ figures }) => figures),
    sentence, residuals: figure,
  }));
}
