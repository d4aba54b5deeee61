import { type PlaneCorrelation, planeCorrelation } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { planeFigure } from '../charts/planeFigure.ts';
import { newDocument } from '../charts/plot.ts';
import { type Kind, kinds, resultOf, seriesOfKind } from './comparable.ts';
import { letterKey } from './diagram.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath, ionSlug } from './paths.ts';
import { nodeOf } from './seriesFit.ts';
import { energy, plainNumber, ratio } from './show.ts';
import { slanted } from './slanted.ts';
import { type Cell, type Table, column, quantity, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** Delta against beta of one ion in one geometry and spin state. */
export interface CorrelationShown {
  readonly ion: string;
  readonly words: string;
  readonly correlation: PlaneCorrelation;
  readonly figure: PublishedFigure;
}

/** Fixed, so that every build draws the same numbers. */
const RESAMPLING = { seed: 1921, draws: 1000 } as const;

/** Letters beside more points than this could not be told apart. */
const MOST_KEYS = 40;

/** Every kind with three or more comparable complexes that have both numbers. */
export const correlations = oncePerCollection((tree): readonly CorrelationShown[] => kinds(tree).flatMap((kind) => {
  const { members, conditions } = seriesOfKind(tree, kind, 'beta');
  const correlation = planeCorrelation(members.map((node) => resultOf(tree, node)), RESAMPLING);
  return correlation === null ? [] : [{ ion: kind.ion, words: kind.words, correlation, figure: correlationFigure(tree, kind, correlation, conditions) }];
}));

/** "−0.52" */
export const coefficient = (value: number): string => plainNumber(value, 2);
export const limits = (range: { readonly low: number; readonly high: number } | null): string => (range === null ? 'too few' : `${coefficient(range.low)} to ${coefficient(range.high)}`);

/** What r says, seen against the null band. */
export const correlationVerdict = ({ withinNull }: PlaneCorrelation): string => withinNull
  ? 'within the null band: the errors of the fits alone would show as much'
  : 'outside the null band: more than the errors of the fits alone would show';

/** Rows of the table on a page. */
const MOST_ROWS = 100;

function correlationFigure(tree: CollectionTree, kind: Kind, correlation: PlaneCorrelation, conditions: string): PublishedFigure {
  const { points, r, interval, leaveOneOut, nullBand } = correlation;
  const id = `${ionSlug(kind.key)}-correlation`;
  const title = `Δ against β of ${kind.words}.`;
  const keyed = points.length <= MOST_KEYS;
  const keys = points.map((_, index) => (keyed ? letterKey(index) : ''));
  return {
    id, title, titleParts: slanted(title, ''), asPicture: !keyed,
    svg: planeFigure(points.map((point, index) => ({ x: point.beta, y: point.delta, ux: point.uBeta, uy: point.uDelta, correlation: point.correlation, key: keys[index]! })), {
      x: quantity('β', null).head, y: quantity('Δ', 'cm-1').head,
    }, correlation, newDocument(), {
      id, title, description: `${points.length} points with error ellipses; correlation coefficient ${coefficient(r)}, null band ${limits(nullBand)}. The numbers stand in the table under the figure.`,
    }),
    caption: [
      `n = ${points.length}; ${conditions}; free-ion set “${tree.policy.free_ion_set}”. Ellipses: one total standard uncertainty, with the correlation of Δ and β within each fit.`,
      `Below: r = ${coefficient(r)} (dot), ${correlationVerdict(correlation)} (open bar, ${limits(nullBand)}: 95 of 100 sets in which β is the same for all).`,
      ...(interval === null ? ['Too few complexes for an interval.'] : [`Thin bar: 95 % interval ${limits(interval)}; thick bar: one complex left out, ${limits(leaveOneOut)}.`]),
    ],
    keys: keyed ? points.map(({ result }, index) => {
      const { complex, row } = nodeOf(tree, result);
      return { key: keys[index]!, formula: complex.formula.parts, path: `${complexPath(complex.row.id)}#${row.id}`, measurement: row.id };
    }) : [],
    source: `This collection, policy ${tree.policy.id}. Interval by Fisher’s z, Metron 1, 3 (1921).`,
    table: correlationTable(tree, correlation, keys), files: figureFiles(id), csv: correlationCsv(tree, correlation),
  };
}

function correlationTable(tree: CollectionTree, { points }: PlaneCorrelation, keys: readonly string[]): Table {
  const keyed = keys.some((key) => key !== '');
  return {
    caption: points.length > MOST_ROWS ? `Points of the figure, the first ${MOST_ROWS} of ${points.length}, u in total; all stand in the CSV file` : 'Points of the figure, u in total',
    columns: [...(keyed ? [column('Key')] : []), rowColumn('Complex'), column('Measurement'), quantity('Δ', 'cm-1'), quantity('β', null), quantity('correlation', null, true)],
    rows: points.slice(0, MOST_ROWS).map(({ result, delta, uDelta, beta, uBeta, correlation }, index): readonly Cell[] => {
      const { complex, row } = nodeOf(tree, result);
      return [...(keyed ? [keys[index]!] : []), { parts: complex.formula.parts, path: complexPath(complex.row.id) }, row.id, energy(delta, uDelta), energy(beta, uBeta), ratio(correlation, 2)];
    }),
  };
}

function correlationCsv(tree: CollectionTree, { points }: PlaneCorrelation): string {
  return csvText(['complex', 'measurement', 'ion', 'Delta', 'Delta_u_total', 'beta', 'beta_u_total', 'corr_Delta_beta'], points.map(({ result, delta, uDelta, beta, uBeta, correlation }) => {
    const { complex, row } = nodeOf(tree, result);
    return [complex.row.id, row.id, complex.ion.name, delta, uDelta, beta, uBeta, correlation];
  }));
}
