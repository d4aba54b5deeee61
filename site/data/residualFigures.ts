import { type FactorComplex, type FactorFit, type Geometry, type SeriesParameter, distinguishableAbove, reviewAbove } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { newDocument } from '../charts/plot.ts';
import { type SeriesPoint, seriesFigure } from '../charts/seriesFigure.ts';
import { departure } from './factorTables.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath } from './paths.ts';
import { factorFitOf, geometries, nodeOf } from './seriesFit.ts';
import { counted, energy, parameterShown, plainNumber, ratio } from './show.ts';
import { slanted } from './slanted.ts';
import { type Cell, type Column, type Table, column, quantity, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';
import type { Parts } from './typeset.ts';

/** Complexes that the figure and its table show; all stand in the CSV file. */
const MOST_ROWS = 30;

export interface ResidualsShown {
  readonly parameter: SeriesParameter;
  readonly geometry: Geometry;
  readonly sentence: string;
  readonly figure: PublishedFigure | null;
}

/** A complex that the others predict. */
type Predicted = FactorComplex & { readonly leftOut: NonNullable<FactorComplex['leftOut']> };

/** Complexes against what the rest of the collection predicts for them, their own data taken out. */
export const residualFigures = oncePerCollection((tree): readonly ResidualsShown[] =>
  geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
    const fit = factorFitOf(tree, parameter, geometry);
    return fit.complexes.length === 0 ? [] : [shownResiduals(tree, fit)];
  })));

function shownResiduals(tree: CollectionTree, fit: FactorFit): ResidualsShown {
  const { parameter, geometry, complexes } = fit;
  const predicted = complexes.filter((one): one is Predicted => one.leftOut !== null);
  const beyond = (limit: number): number => predicted.filter(({ leftOut }) => Math.abs(leftOut.z) > limit).length;
  const byChance = (share: number): string => plainNumber(share * predicted.length, 1);
  return {
    parameter, geometry,
    sentence: predicted.length === 0
      ? `None of ${counted(complexes.length, 'complex', 'complexes')} is predicted by the others: no test.`
      : `${predicted.length} of ${counted(complexes.length, 'complex', 'complexes')} are predicted by the others. ${beyond(distinguishableAbove)} lie beyond |z| = ${distinguishableAbove} and ${beyond(reviewAbove)} beyond ${reviewAbove}; by chance alone it would be about ${byChance(0.0455)} and ${byChance(0.0027)}.`,
    figure: predicted.length < 2 ? null : residualFigure(tree, fit, predicted),
  };
}

/** Share of the whole, or difference, of found against predicted, with the uncertainty of both. */
function apart({ result, leftOut }: Predicted, parameter: SeriesParameter): { readonly value: number; readonly u: number } {
  const { value, uTotal } = result.parameters[parameter];
  if (parameter === 'beta') return { value: value! - leftOut.predicted, u: Math.hypot(uTotal!, leftOut.u) };
  const share = value! / leftOut.predicted;
  return { value: 100 * (share - 1), u: 100 * share * Math.hypot(uTotal! / value!, leftOut.u / leftOut.predicted) };
}

function residualFigure(tree: CollectionTree, fit: FactorFit, predicted: readonly Predicted[]): PublishedFigure {
  const { parameter, geometry } = fit;
  const id = `residuals-${parameter.toLowerCase()}-${geometry}`;
  const surest = [...predicted].sort((a, b) => Math.abs(b.leftOut.z) - Math.abs(a.leftOut.z)).slice(0, MOST_ROWS);
  const shown = [...surest].sort((a, b) => apart(a, parameter).value - apart(b, parameter).value);
  const points = shown.map((one): SeriesPoint => {
    const { value, u } = apart(one, parameter);
    return { label: nodeOf(tree, one.result).complex.formula.parts, value, u: null, uTotal: u, open: Math.abs(one.leftOut.z) <= distinguishableAbove, note: plainNumber(one.leftOut.z, 1) };
  });
  const symbol = parameter === 'Delta' ? 'Δ' : 'β';
  const title = `${symbol} found against predicted by the other ${geometry} complexes${predicted.length > shown.length ? `, the ${shown.length} furthest` : ''}.`;
  return {
    id, title, titleParts: slanted(title, ''),
    svg: seriesFigure(points, axisOf(parameter), newDocument(), { id, title, description: `${counted(points.length, 'complex', 'complexes')} with error bars about an upright at 0, from below in the order of the table under the figure.` },
      { upright: 0, noteHead: [{ text: 'z', style: 'italic' }] }),
    caption: [
      `n = ${shown.length} of ${predicted.length}, by |z|. Each is predicted from factors fitted without its own data.`,
      `Bar: combined standard uncertainty of both, the residual scatter included. Full circle: beyond |z| = ${distinguishableAbove}.`,
    ],
    source: `This collection, policy ${tree.policy.id}; conditions as for the factors.`,
    table: residualTable(tree, parameter, shown), files: figureFiles(id), csv: residualCsv(tree, fit),
  };
}

const axisOf = (parameter: SeriesParameter): Parts => parameter === 'Delta'
  ? [{ text: 'Δ', style: 'italic' }, { text: ' found over predicted, less 1 / %', style: 'plain' }]
  : [{ text: 'β', style: 'italic' }, { text: ' found less predicted', style: 'plain' }];

function residualTable(tree: CollectionTree, parameter: SeriesParameter, rows: readonly Predicted[]): Table {
  const head = (text: string): Column => (parameter === 'Delta' ? quantity(text, 'cm-1', true) : quantity(text, null, true));
  return {
    caption: 'Complexes in the figure, lowest first',
    columns: [rowColumn('Complex'), column('Measurement'), head('found'), head('predicted'), quantity('apart', null, true), quantity('z', null)],
    rows: rows.map((one): readonly Cell[] => {
      const { complex, row, chosen } = nodeOf(tree, one.result);
      const { value } = apart(one, parameter);
      return [
        { parts: complex.formula.parts, path: complexPath(complex.row.id) }, row.id, parameterShown(chosen.parameters[parameter]).total.text!,
        energy(one.leftOut.predicted, one.leftOut.u), parameter === 'Delta' ? departure(value / 100) : `${value > 0 ? '+' : ''}${plainNumber(value, 3)}`, ratio(one.leftOut.z, 1),
      ];
    }),
  };
}

/** Every complex of the fit in full precision. */
function residualCsv(tree: CollectionTree, { parameter, geometry, complexes }: FactorFit): string {
  return csvText(['parameter', 'geometry', 'complex', 'measurement', 'ion', 'found', 'found_u_total', 'fitted', 'residual', 'leverage', 'predicted_without_it', 'predicted_u', 'z'], complexes.map((one) => {
    const { complex, row } = nodeOf(tree, one.result);
    const { value, uTotal } = one.result.parameters[parameter];
    return [
      parameter, geometry, complex.row.id, row.id, complex.ion.name, value, uTotal, one.fitted, one.residual, one.leverage, one.leftOut?.predicted ?? null, one.leftOut?.u ?? null, one.leftOut?.z ?? null,
    ];
  }));
}
