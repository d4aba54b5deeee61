import { type FactorFit, type FactorKind, type FactorSeries, type Geometry, type SeriesParameter, factorSeries } from '#engine';
import { newDocument } from '../charts/plot.ts';
import { type SeriesPoint, seriesFigure, seriesRange } from '../charts/seriesFigure.ts';
import { letterKey } from './diagram.ts';
import { FACTORS, factorLabel, printedBeside } from './factorNames.ts';
import { factorCsv, factorTable } from './factorTables.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { oncePerCollection } from './memo.ts';
import { inParts } from './parts.ts';
import { ROWS_A_FIGURE, bracketSentence, bracketsWithin } from './seriesFigures.ts';
import { factorFitOf, geometries } from './seriesFit.ts';
import { counted } from './show.ts';
import { slanted } from './slanted.ts';
import type { CollectionTree } from './tree.ts';

/** Factors of one kind and island with what is printed of them elsewhere. */
export interface FactorsShown {
  readonly parameter: SeriesParameter;
  readonly geometry: Geometry;
  readonly kind: FactorKind;
  readonly island: number;
  readonly figures: readonly PublishedFigure[];
}

/** Every figure of factors of the collection. An island of one ion and one ligand has nothing to order. */
export const factorFigures = oncePerCollection((tree): readonly FactorsShown[] =>
  geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
    const fit = factorFitOf(tree, parameter, geometry);
    return factorSeries(fit).filter(({ factors }) => factors.length >= 2).map((series) => shownFactors(tree, fit, series));
  })));

function shownFactors(tree: CollectionTree, fit: FactorFit, series: FactorSeries): FactorsShown {
  const { parameter, geometry } = fit;
  const { kind, island, factors, groups } = series;
  const { letter, head } = FACTORS[parameter][kind];
  const id = `factors-${letter}-${geometry}${island === 1 ? '' : `-island-${island}`}`;
  const title = `${kind === 'ligand' ? 'Ligand' : 'Ion'} factors ${letter} of ${geometry} complexes${fit.islands.length > 1 ? `, island ${island}` : ''}`;
  const points = factors.map((factor): SeriesPoint => ({
    label: factorLabel(tree, factor, geometry), value: factor.value!, u: null, uTotal: factor.u, open: !factor.tested, beside: printedBeside(tree, fit, factor), note: String(factor.complexes),
  }));
  const letters = factors.map((_, place) => groups.flatMap(({ first, last }, index) => (first <= place && place <= last ? [letterKey(index)] : [])).join(', '));
  const complexes = fit.islands.find(({ number }) => number === island)!.complexes;
  const printed = points.filter(({ beside }) => beside != null).length;
  const range = seriesRange(points);
  const parts = inParts(factors, ROWS_A_FIGURE);
  return {
    parameter, geometry, kind, island,
    figures: parts.map(({ rows, start }, index): PublishedFigure => {
      const own = index === 0 ? id : `${id}-part-${index + 1}`;
      const ownTitle = parts.length === 1 ? `${title}.` : `${title}, part ${index + 1} of ${parts.length}.`;
      return {
        id: own, title: ownTitle, titleParts: slanted(ownTitle, letter),
        svg: seriesFigure(points.slice(start, start + rows.length), head.head, newDocument(), {
          id: own, title: ownTitle, description: `${counted(rows.length, 'factor')} with error bars, from below in the order of the table under the figure.${printed > 0 ? ' Diamonds are printed values.' : ''}`,
        }, { brackets: bracketsWithin(groups, start, rows.length), range, noteHead: [{ text: 'n', style: 'italic' }] }),
        caption: [
          `n = ${complexes}; the column n: complexes behind each factor. Bar: one standard uncertainty.`,
          ...(points.some(({ open }) => open) ? ['Open circle: no spare complex tests it.'] : []),
          ...(printed > 0 ? ['Diamond: printed by Jørgensen, drawn beside, never used in the fit.'] : []),
          bracketSentence(groups),
        ],
        source: `This collection, policy ${tree.policy.id}.`,
        table: factorTable(tree, fit, rows, letters.slice(start, start + rows.length)),
        files: figureFiles(own, id), csv: index === 0 ? factorCsv(tree, fit, series, letters) : null,
      };
    }),
  };
}
