import { groupBy } from './group.ts';
import { oncePerCollection } from './memo.ts';
import { pageLinks, rowsOfPage } from './paging.ts';
import { changesPath, complexPath } from './paths.ts';
import type { ChangeRow, GoneRow } from './rows.ts';
import { counted } from './show.ts';
import { type Cell, type Table, column, longColumn, rowColumn, soft, words } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { sentenceShown } from './typeset.ts';

/** What changed since the last release and from release to release, newest first. */
export interface ChangesPage {
  readonly sentence: string;
  readonly sections: readonly { readonly title: string; /** Place on the page that the feed leads to. */ readonly anchor: string; readonly about: string; readonly table: Table | null }[];
  readonly gone: Table | null;
  readonly number: number;
  readonly pages: readonly { readonly number: number; readonly path: string }[];
}

/** Changes, newest release first; within a release as stored. */
const ordered = oncePerCollection(({ history: { releases, changes } }): readonly ChangeRow[] => {
  const place = new Map(releases.map(({ id, number }) => [id, number]));
  const of = ({ release }: ChangeRow): number => release === null ? Number.POSITIVE_INFINITY : place.get(release)!;
  return [...changes].sort((a, b) => of(a) === of(b) ? a.number - b.number : of(b) - of(a));
});

export const changeCount = (tree: CollectionTree): number => ordered(tree).length;

export function changesPage(tree: CollectionTree, number: number): ChangesPage {
  const { releases, gone } = tree.history;
  const newest = [...releases].sort((a, b) => b.number - a.number);
  const rows = groupBy(rowsOfPage(ordered(tree), number), ({ release }) => release);
  const last = newest[0];
  return {
    sentence: last === undefined
      ? `No release has been frozen yet. The collection was started on ${tree.meta.get('group.started') ?? 'a date not recorded'}; from the first release on this page says what changed, number by number.`
      : `${counted(releases.length, 'release')}, the last ${last.id} of ${last.date}.`,
    sections: [
      ...(last === undefined || (number > 1 && !rows.has(null)) ? [] : [{ title: `Since release ${last.id}`, anchor: 'since', about: rows.has(null) ? '' : 'Nothing changed.', table: table(tree, rows.get(null) ?? []) }]),
      ...newest.filter(({ id }) => number === 1 || rows.has(id)).map((release) => ({
        title: `Release ${release.id}`, anchor: `release-${release.id}`, about: `${release.date}, ${release.who}. ${release.cause} ${counted(release.complexes, 'complex', 'complexes')}, ${counted(release.measurements, 'measurement')}. DOI: ${release.doi ?? 'not yet assigned'}.`,
        table: table(tree, rows.get(release.id) ?? []),
      })),
    ],
    gone: number === 1 ? goneTable(gone) : null, number, pages: pageLinks(changeCount(tree), changesPath),
  };
}

function table(tree: CollectionTree, rows: readonly ChangeRow[]): Table | null {
  if (rows.length === 0) return null;
  const formulas = new Map(tree.complexes.map(({ row, formula }) => [row.id, formula.parts]));
  return {
    caption: 'Changes', columns: [rowColumn('Record'), longColumn('What changed'), column('Brought by')],
    rows: rows.map(({ complex, measurement, text, cause }): readonly Cell[] => [
      formulas.has(complex) ? { parts: formulas.get(complex)!, path: `${complexPath(complex)}${measurement === null ? '' : `#${measurement}`}` } : { parts: words(complex) },
      { parts: sentenceShown(text) }, cause,
    ]),
  };
}

const KIND: Readonly<Record<GoneRow['kind'], string>> = { tombstone: 'withdrawn', redirect: 'renamed', corrected: 'identity corrected' };

function goneTable(gone: readonly GoneRow[]): Table | null {
  if (gone.length === 0) return null;
  return {
    caption: 'Published addresses that are no longer what they were', columns: [rowColumn('Address'), column('What happened'), column('See instead'), longColumn('Why')],
    rows: gone.map(({ address, kind, target, reason }): readonly Cell[] => [
      { parts: words(address) }, KIND[kind], target === null ? soft('nothing') : { parts: words(target), path: target }, reason ?? soft('no reason recorded'),
    ]),
  };
}
