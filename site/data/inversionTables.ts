import { type Inversion, type SeriesParameter, averageFactor, concise, inversions } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { type Kind, kinds, resultOf, seriesOfKind } from './comparable.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath } from './paths.ts';
import { factorFitOf, floorOf, nodeOf } from './seriesFit.ts';
import { energy, ratio } from './show.ts';
import { type Cell, type Table, column, quantity, rowColumn, words } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** Pairs of one ion's series that stand against the pooled order of the ligands. */
export interface KindInversions {
  readonly kind: Kind;
  readonly parameter: SeriesParameter;
  /** Pairs whose ligands all have factors, so that they could be held against the order. */
  readonly pairs: number;
  /** The surest first. */
  readonly found: readonly Inversion[];
}

export const inversionsByKind = oncePerCollection((tree): readonly KindInversions[] => kinds(tree).flatMap((kind) => (['Delta', 'beta'] as const).flatMap((parameter) => {
  const { geometry } = resultOf(tree, kind.measurements[0]!).complex;
  const { members } = seriesOfKind(tree, kind, parameter);
  if (geometry === null || members.length < 2) return [];
  const results = members.map((node) => resultOf(tree, node));
  const fit = factorFitOf(tree, parameter, geometry);
  const placed = results.filter(({ complex }) => averageFactor(fit, complex) !== null).length;
  return placed < 2 ? [] : [{ kind, parameter, pairs: (placed * (placed - 1)) / 2, found: inversions({ members: results, parameter }, fit, floorOf(tree)) }];
})));

/** Inversions that a page lists. */
const MOST_ROWS = 60;

/** Those whose difference is measured beyond doubt, the surest first. */
export function surestInversions(all: readonly KindInversions[], parameter: SeriesParameter): readonly Inversion[] {
  return all.filter((one) => one.parameter === parameter).flatMap(({ found }) => found).filter(({ difference }) => difference.distinguishable).sort((a, b) => b.z - a.z);
}

export function inversionTable(tree: CollectionTree, rows: readonly Inversion[], parameter: SeriesParameter): Table {
  return {
    caption: `${parameter === 'Delta' ? 'Δ' : 'β'}: pairs against the pooled order, the surest first`,
    columns: [column('Ion'), rowColumn('Found higher'), column('Found lower'), quantity('difference', parameter === 'Delta' ? 'cm-1' : null, true), quantity('z', null), quantity(parameter === 'Delta' ? 'by the factors lower / %' : 'by the factors h higher', null, true), { figure: true, head: [{ text: 'z', style: 'italic' }, ...words(' of that order')] }],
    rows: rows.slice(0, MOST_ROWS).map(({ higher, lower, difference, pooled, uPooled, zPooled }): readonly Cell[] => {
      const [above, below] = [nodeOf(tree, higher), nodeOf(tree, lower)];
      return [
        above.complex.ion.name, { parts: above.complex.formula.parts, path: complexPath(above.complex.row.id) }, { parts: below.complex.formula.parts, path: complexPath(below.complex.row.id) },
        energy(difference.value, difference.u), ratio(difference.z, 1), parameter === 'Delta' ? concise((100 * pooled) / (1 + pooled), (100 * uPooled) / (1 + pooled) ** 2, 'page') : concise(pooled, uPooled, 'page'), ratio(zPooled, 1),
      ];
    }),
  };
}

export const moreInversions = (rows: readonly Inversion[]): number => Math.max(0, rows.length - MOST_ROWS);

/** Pairs grow with the square of the complexes: the file keeps so many. */
export const MOST_IN_FILE = 5000;

/** Inversions of both parameters, the surest first, also those that cannot be told apart. */
export function inversionCsv(tree: CollectionTree, all: readonly KindInversions[]): string {
  const rows = all.flatMap(({ kind, parameter, found }) => found.map((inversion) => ({ kind, parameter, inversion })))
    .sort((a, b) => b.inversion.z - a.inversion.z).slice(0, MOST_IN_FILE);
  return csvText(['parameter', 'ion', 'higher', 'higher_measurement', 'lower', 'lower_measurement', 'difference', 'difference_u', 'difference_z', 'pooled', 'pooled_u', 'pooled_z', 'z', 'distinguishable'],
    rows.map(({ kind, parameter, inversion: { higher, lower, difference, pooled, uPooled, zPooled, z, distinguishable } }) => {
      const [above, below] = [nodeOf(tree, higher), nodeOf(tree, lower)];
      return [parameter, kind.ion, above.complex.row.id, above.row.id, below.complex.row.id, below.row.id, difference.value, difference.u, difference.z, pooled, uPooled, zPooled, z, distinguishable ? 1 : 0];
    }));
}
