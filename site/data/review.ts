import { groupBy } from './group.ts';
import { floorFactorTable } from './policyTables.ts';
import { pageLinks, rowsOfPage } from './paging.ts';
import { complexPath, reviewPath } from './paths.ts';
import { counted, listed } from './show.ts';
import { type Cell, type Table, column, longColumn, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { sentenceShown } from './typeset.ts';

/** What needs a person, by kind, most pressing first: the list that `npm run review` prints. */
export interface ReviewPage {
  readonly sentence: string;
  readonly sections: readonly { readonly kind: string; readonly about: string; readonly table: Table }[];
  readonly floors: Table | null;
  readonly number: number;
  readonly pages: readonly { readonly number: number; readonly path: string }[];
}

const ABOUT: Readonly<Record<string, { readonly one: string; readonly many: string; readonly about: string }>> = {
  refused: { one: 'refused reading', many: 'refused readings', about: 'No parameters reproduce the assignment, or it contradicts the declared ground state.' },
  'better rival': { one: 'better rival', many: 'better rivals', about: 'Another reading scores better than the chosen one by more than the policy’s margin.' },
  strained: { one: 'strained reading', many: 'strained readings', about: 'Spare bands disagree by more than readings and model floors allow.' },
  'quoted value': { one: 'quoted value that disagrees', many: 'quoted values that disagree', about: 'A number printed elsewhere differs from the refitted one by more than twice the combined uncertainty.' },
  'repeats disagree': { one: 'disagreement of repeats', many: 'disagreements of repeats', about: 'Measurements of one complex under like conditions differ by more than twice the uncertainty of their readings.' },
  'near rival': { one: 'near rival', many: 'near rivals', about: 'Another reading scores within the policy’s margin of the chosen one.' },
};

export function reviewPage(tree: CollectionTree, number: number): ReviewPage {
  const { review } = tree;
  const formulas = new Map(tree.complexes.map(({ row, formula }) => [row.id, formula.parts]));
  const counts = [...groupBy(review, ({ kind }) => kind)].map(([kind, rows]) => counted(rows.length, ABOUT[kind]?.one ?? kind, ABOUT[kind]?.many ?? kind));
  return {
    sentence: review.length === 0 ? 'Nothing needs a person: no refused or strained reading, no near rival, no disagreement.' : `In all: ${listed(counts)}.`,
    sections: [...groupBy(rowsOfPage(review, number), ({ kind }) => kind)].map(([kind, rows]) => ({
      kind, about: ABOUT[kind]?.about ?? '',
      table: {
        caption: kind, columns: [rowColumn('Complex'), column('Measurement'), longColumn('Why')],
        rows: rows.map(({ complex, measurement, text }): readonly Cell[] => [
          { parts: formulas.get(complex) ?? [{ text: complex, style: 'plain' }], path: `${complexPath(complex)}#${measurement}` },
          `${complex}/${measurement}`, { parts: sentenceShown(text) },
        ]),
      },
    })),
    floors: floorFactorTable(tree), number, pages: pageLinks(review.length, reviewPath),
  };
}

/** How many rows the list has over all its pages. */
export const reviewCount = (tree: CollectionTree): number => tree.review.length;
