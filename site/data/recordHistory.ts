import { concise } from '#engine';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { FrozenValueRow } from './rows.ts';
import { groupBy } from './group.ts';
import { oncePerCollection } from './memo.ts';
import { changesPath, complexPath } from './paths.ts';
import type { CollectionTree, ComplexNode } from './tree.ts';
import { sentenceShown } from './typeset.ts';

/** What became of a record from release to release. */
export interface RecordHistory {
  readonly sentence: string;
  /** Newest first: what changed, by whom, when and why; null before the first release. */
  readonly changes: Table | null;
  /** The numbers as each release froze them; null before the first release. */
  readonly frozen: Table | null;
  /** Published places of the page that are gone: links to them lead here. */
  readonly places: readonly { readonly id: string; readonly text: string; readonly now: { readonly text: string; readonly path: string } | null }[];
}

const changesByComplex = oncePerCollection(({ history }) => groupBy(history.changes, ({ complex }) => complex));
const frozenByComplex = oncePerCollection(({ history }) => groupBy(history.frozen, ({ complex }) => complex));

export function recordHistory(tree: CollectionTree, complex: ComplexNode): RecordHistory {
  return { ...ofReleases(tree, complex), places: gonePlaces(tree, complex) };
}

function gonePlaces(tree: CollectionTree, { row }: ComplexNode): RecordHistory['places'] {
  const start = `${complexPath(row.id)}#`;
  return tree.history.gone.filter(({ address, kind }) => address.startsWith(start) && kind !== 'corrected').map(({ address, target, reason }) => {
    const id = address.slice(start.length);
    return { id, text: reason === null ? `${id} has a new address` : `${id} was taken away: ${reason}`, now: target === null ? null : { text: target.replace(start, ''), path: target } };
  });
}

function ofReleases(tree: CollectionTree, { row }: ComplexNode): Omit<RecordHistory, 'places'> {
  const releases = [...tree.history.releases].sort((a, b) => b.number - a.number);
  if (releases.length === 0) {
    return { sentence: `No release holds this record yet; the collection was started on ${tree.meta.get('group.started') ?? 'a date not recorded'}.`, changes: null, frozen: null };
  }
  const own = groupBy(changesByComplex(tree).get(row.id) ?? [], ({ release }) => release);
  const frozen = frozenByComplex(tree).get(row.id) ?? [];
  const holding = new Set(frozen.map(({ release }) => release));
  const first = releases.findLast(({ id }) => holding.has(id));
  const later = own.get(null) ?? [];
  const told = releases.filter((release) => own.has(release.id) || release === first);
  return {
    sentence: first === undefined ? `No release holds this record yet; it came after release ${releases[0]!.id}.`
      : `First in release ${first.id} of ${first.date}. ${later.length === 0 ? `As it was in release ${releases[0]!.id}.` : `Changed since release ${releases[0]!.id}.`}`,
    changes: {
      caption: 'History of this record',
      columns: [rowColumn('Release'), column('Date'), column('By'), longColumn('What changed'), column('Brought by'), longColumn('Why released')],
      rows: [
        ...later.map(({ text, cause }): readonly Cell[] => [soft('not frozen yet'), soft('no date yet'), soft('nobody yet'), { parts: sentenceShown(text) }, cause, soft('not released')]),
        ...told.flatMap((release) => {
          const head = [{ parts: [{ text: release.id, style: 'plain' as const }], path: `${changesPath(1)}#release-${release.id}` }, release.date, release.who];
          const changes = own.get(release.id) ?? [];
          return changes.length === 0 ? [[...head, 'The record as it was first released.', 'record', release.cause]]
            : changes.map(({ text, cause }): readonly Cell[] => [...head, { parts: sentenceShown(text) }, cause, release.cause]);
        }),
      ],
    },
    frozen: frozen.length === 0 ? null : frozenTable(releases.map(({ id }) => id), frozen),
  };
}

function frozenTable(releases: readonly string[], rows: readonly FrozenValueRow[]): Table {
  const byRelease = groupBy(rows, ({ release }) => release);
  return {
    caption: 'Numbers as each release froze them, with total standard uncertainty',
    columns: [rowColumn('Release'), column('Measurement'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('C', 'cm-1'), quantity('β', null)],
    rows: releases.flatMap((release) => [...groupBy(byRelease.get(release) ?? [], ({ measurement }) => measurement)].map(([measurement, values]): readonly Cell[] => [
      release, measurement, ...(['Delta', 'B', 'C', 'beta'] as const).map((name): Cell => {
        const value = values.find(({ parameter }) => parameter === name);
        return value === undefined || value.value === null ? soft('withheld') : concise(value.value, value.u_total, 'page');
      }),
    ])),
  };
}
