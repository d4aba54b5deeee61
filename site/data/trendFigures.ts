import { type Expectation, type Geometry, type SeriesParameter, type TrendStep, expectations, trendSteps } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { newDocument } from '../charts/plot.ts';
import { type SeriesPoint, seriesFigure } from '../charts/seriesFigure.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { ligandSymbol } from './ligandNames.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath } from './paths.ts';
import { factorFitOf, floorOf, geometries, nodeOf } from './seriesFit.ts';
import { counted, energy, listed, parameterShown, plainNumber } from './show.ts';
import { slanted } from './slanted.ts';
import { type Cell, type Table, column, quantity, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** Steps that one figure shows; all stand in the CSV file. */
const MOST_ROWS = 50;

/** One expectation held against the collection. */
export interface TrendShown {
  readonly expectation: Expectation;
  readonly geometry: Geometry;
  readonly counts: string;
  /** Steps that go the other way beyond doubt. */
  readonly against: readonly { readonly from: Parts; readonly fromPath: string; readonly to: Parts; readonly toPath: string; readonly note: string }[];
  readonly figure: PublishedFigure;
}

/** Every expectation that the collection has steps for. */
export const trends = oncePerCollection((tree): readonly TrendShown[] => geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
  const steps = trendSteps(factorFitOf(tree, parameter, geometry).complexes.map(({ result }) => result), parameter, floorOf(tree));
  return expectations.filter((one) => one.parameter === parameter).flatMap((expectation) => {
    const own = steps.filter((step) => step.expectation === expectation);
    return own.length === 0 ? [] : [shownTrend(tree, geometry, expectation, own)];
  });
})));

function shownTrend(tree: CollectionTree, geometry: Geometry, expectation: Expectation, steps: readonly TrendStep[]): TrendShown {
  const count = (outcome: TrendStep['outcome']): number => steps.filter((step) => step.outcome === outcome).length;
  return {
    expectation, geometry,
    counts: `${counted(steps.length, 'step')}: ${count('as expected')} as expected, ${count('against')} against, ${count('not distinguishable')} not distinguishable.`,
    against: steps.filter(({ outcome }) => outcome === 'against').map(({ from, to, difference: { z }, spinDiffers }) => {
      const [first, second] = [nodeOf(tree, from), nodeOf(tree, to)];
      return {
        from: first.complex.formula.parts, fromPath: complexPath(first.complex.row.id), to: second.complex.formula.parts, toPath: complexPath(second.complex.row.id),
        note: `z = ${plainNumber(z, 1)}${spinDiffers ? ', the spin differs' : ''}`,
      };
    }),
    figure: trendFigure(tree, geometry, expectation, steps),
  };
}

const PLACE: Readonly<Record<Expectation['trend'], string>> = { 'oxidation state': 'along oxidation state', 'down the group': 'down the group', 'along 3d': 'along the 3d row' };

/** Delta is seen as a ratio, beta as a difference. */
function change({ expectation, from, to, ratio, difference }: TrendStep): { readonly value: number; readonly u: number } {
  if (expectation.parameter === 'beta') return { value: difference.value, u: difference.u };
  const share = (one: typeof from): number => one.parameters.Delta.uTotal! / one.parameters.Delta.value!;
  return { value: ratio, u: ratio * Math.hypot(share(from), share(to)) };
}

function trendFigure(tree: CollectionTree, geometry: Geometry, expectation: Expectation, steps: readonly TrendStep[]): PublishedFigure {
  const { trend, parameter, direction } = expectation;
  const id = `trend-${trend.replaceAll(' ', '-')}-${parameter.toLowerCase()}-${geometry}`;
  const surest = [...steps].sort((a, b) => Number(b.outcome === 'against') - Number(a.outcome === 'against') || Math.abs(b.difference.z) - Math.abs(a.difference.z)).slice(0, MOST_ROWS);
  const rows = [...surest].sort((a, b) => change(a).value - change(b).value);
  const points = rows.map((step): SeriesPoint => ({ label: stepLabel(tree, step), value: change(step).value, u: null, uTotal: change(step).u, open: step.outcome === 'not distinguishable' }));
  const symbol = parameter === 'Delta' ? 'Δ' : 'β';
  const title = `${symbol} ${PLACE[trend]}, ${geometry} complexes of the same ligands.`;
  const upright = parameter === 'Delta' ? 1 : 0;
  return {
    id, title, titleParts: slanted(title, ''),
    svg: seriesFigure(points, axisOf(parameter), newDocument(), { id, title, description: `${counted(points.length, 'step')} with error bars about an upright at ${upright}, from below in the order of the table under the figure.` }, { upright }),
    caption: [
      `n = ${rows.length}${rows.length < steps.length ? ` of ${steps.length}, those against the expectation first, then by |z|` : ''}. Expected to lie ${direction === 'rises' ? 'right' : 'left'} of the dotted line (${expectation.basis}).`,
      'Bar: combined total standard uncertainty. Open circle: not distinguishable.',
    ],
    source: `This collection, policy ${tree.policy.id}; conditions as for the factors.`,
    table: trendTable(tree, parameter, rows), files: figureFiles(id), csv: trendCsv(tree, steps),
  };
}

const axisOf = (parameter: SeriesParameter): Parts => [{ text: parameter === 'Delta' ? 'Δ' : 'β', style: 'italic' }, { text: parameter === 'Delta' ? ' of the second over that of the first' : ' of the second less that of the first', style: 'plain' }];

/** "Co(II) → Co(III), 6 NH3" */
function stepLabel(tree: CollectionTree, { from, to }: TrendStep): Parts {
  const several = from.complex.ligands.length > 1;
  const ligands = from.complex.ligands.flatMap(({ ligand, count }, index): Parts => [
    ...(index > 0 ? [{ text: ', ', style: 'plain' as const }] : []), ...(several || count > 1 ? [{ text: `${count} `, style: 'plain' as const }] : []), ...ligandSymbol(tree, ligand),
  ]);
  return [{ text: `${from.complex.ion.name} → ${to.complex.ion.name}, `, style: 'plain' }, ...ligands];
}

function trendTable(tree: CollectionTree, parameter: SeriesParameter, rows: readonly TrendStep[]): Table {
  const head = parameter === 'Delta' ? quantity('Δ', 'cm-1') : quantity('β', null);
  const withNote = (note: string) => ({ ...head, head: [...head.head, { text: note, style: 'plain' as const }] });
  return {
    caption: 'Steps in the figure, lowest first',
    columns: [rowColumn('From'), column('To'), withNote(' of the first'), withNote(' of the second'), quantity(parameter === 'Delta' ? 'ratio' : 'difference', null, true), column('Spin'), column('Outcome')],
    rows: rows.map((step): readonly Cell[] => {
      const [first, second] = [nodeOf(tree, step.from), nodeOf(tree, step.to)];
      const { value, u } = change(step);
      const number = (node: typeof first): string => parameterShown(node.chosen.parameters[parameter]).total.text!;
      return [
        { parts: first.complex.formula.parts, path: complexPath(first.complex.row.id) }, { parts: second.complex.formula.parts, path: complexPath(second.complex.row.id) },
        number(first), number(second), energy(value, u), step.spinDiffers ? 'differs' : 'same', step.outcome,
      ];
    }),
  };
}

function trendCsv(tree: CollectionTree, steps: readonly TrendStep[]): string {
  return csvText(['trend', 'parameter', 'expected', 'from', 'from_measurement', 'to', 'to_measurement', 'difference', 'difference_u', 'z', 'ratio', 'spin_differs', 'outcome'], steps.map((step) => {
    const [first, second] = [nodeOf(tree, step.from), nodeOf(tree, step.to)];
    const { value, u, z } = step.difference;
    return [
      step.expectation.trend, step.expectation.parameter, step.expectation.direction, first.complex.row.id, first.row.id, second.complex.row.id, second.row.id, value, u, z, step.ratio, step.spinDiffers ? 1 : 0, step.outcome,
    ];
  }));
}

/** "Δ rises along oxidation state, Δ falls ...": all expectations in words, with what each rests on. */
export const expectationSentences: readonly Parts[] = expectations.map(({ trend, parameter, direction, basis }) => sentenceShown(`${parameter} ${direction} ${PLACE[trend]} (${basis}).`));
export const trendsWithout = (shown: readonly TrendShown[]): string | null => {
  const without = expectations.filter((one) => !shown.some(({ expectation }) => expectation === one)).map(({ trend, parameter }) => `${parameter === 'Delta' ? 'Δ' : 'β'} ${PLACE[trend]}`);
  return without.length === 0 ? null : `No two complexes of the collection make a step for ${listed(without)}.`;
};
