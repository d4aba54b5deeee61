import { MOST_IN_FILE, inversionTable, inversionsByKind, moreInversions, surestInversions } from './inversionTables.ts';
import { counted, plainNumber } from './show.ts';
import type { Table } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { type TrendShown, expectationSentences, trends, trendsWithout } from './trendFigures.ts';
import { type Parts, sentenceShown } from './typeset.ts';

export interface OrdersPage {
  readonly inversions: readonly { readonly sentence: Parts; readonly table: Table | null; readonly more: number }[];
  readonly inversionsFile: { readonly path: string; readonly text: string };
  readonly trends: readonly TrendShown[];
  readonly expectations: readonly Parts[];
  readonly without: string | null;
}

/** How many pairs contradict an order that is itself known. */
const contradiction = (sure: number, all: number): string => sure === 0
  ? `The factors’ own order is not known that well for any of those ${all}: none contradicts it beyond doubt.`
  : `The factors’ own order is known that well for ${sure} of those ${all}: these contradict it.`;

/** Name of the file with every inversion. */
export const INVERSIONS = 'inversions';

export function ordersPage(tree: CollectionTree): OrdersPage {
  const all = inversionsByKind(tree);
  const shown = trends(tree);
  const every = all.reduce((sum, { found }) => sum + found.length, 0);
  return {
    inversions: (['Delta', 'beta'] as const).map((parameter) => {
      const own = all.filter((one) => one.parameter === parameter);
      const pairs = own.reduce((sum, one) => sum + one.pairs, 0);
      const found = own.reduce((sum, one) => sum + one.found.length, 0);
      const rows = surestInversions(all, parameter);
      return {
        sentence: sentenceShown(pairs === 0
          ? `${parameter}: no ion has two comparable complexes whose ligands all have factors.`
          : `${parameter}: ${counted(pairs, 'pair')} of complexes of one ion, ${found} the other way round than the factors have it; ${rows.length} of these beyond two standard uncertainties of their difference, ${found - rows.length} not distinguishable. ${rows.length === 0 ? '' : contradiction(rows.filter(({ distinguishable }) => distinguishable).length, rows.length)}`.trim()),
        table: rows.length === 0 ? null : inversionTable(tree, rows, parameter), more: moreInversions(rows),
      };
    }),
    inversionsFile: { path: `figures/${INVERSIONS}.csv`, text: every > MOST_IN_FILE ? `The ${plainNumber(MOST_IN_FILE, 0)} surest pairs as CSV` : 'All these pairs as CSV' }, trends: shown, expectations: expectationSentences, without: trendsWithout(shown),
  };
}
