import { type IndistinguishableGroup, indistinguishableGroups, type SeriesParameter as Name, seriesParameters } from '#engine';
import type { Bracket } from '../charts/brackets.ts';
import { newDocument } from '../charts/plot.ts';
import { type SeriesPoint, seriesFigure, seriesRange } from '../charts/seriesFigure.ts';
import { type Series, kinds, resultOf, seriesByMetal, seriesOfKind } from './comparable.ts';
import { letterKey } from './diagram.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { groupBy } from './group.ts';
import { type LeftOutShown, leftOutShown } from './leftOut.ts';
import { oncePerCollection } from './memo.ts';
import { inParts } from './parts.ts';
import { ionSlug } from './paths.ts';
import { floorOf } from './seriesFit.ts';
import { seriesCsv, seriesTable } from './seriesTables.ts';
import { counted } from './show.ts';
import { slanted } from './slanted.ts';
import { type Column, quantity } from './table.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import type { Parts } from './typeset.ts';

export const SYMBOL: Readonly<Record<Name, { readonly column: Column; readonly words: string }>> = {
  Delta: { column: quantity('Δ', 'cm-1'), words: 'Field splitting Δ' },
  beta: { column: quantity('β', null), words: 'Nephelauxetic ratio β' },
};

/** Rows that one figure of a series holds; a longer series goes on in further parts. */
export const ROWS_A_FIGURE = 50;

/** A series figure with the measurements that could not stand in it. */
export interface SeriesShown {
  readonly figure: PublishedFigure;
  /** Said once, with the first part. */
  readonly leftOut: LeftOutShown | null;
  /** Members of the whole series. */
  readonly count: number;
  /** Counted from 1. */
  readonly part: number;
}

/** Delta and beta by ligand set, for each geometry and spin of an ion that has two or more complexes to compare. */
export const ionSeries = oncePerCollection((tree, ion): readonly SeriesShown[] =>
  kinds(tree).filter((kind) => kind.ion === ion).flatMap((kind) => seriesParameters.flatMap((name) =>
    shownSeries(tree, seriesOfKind(tree, kind, name), name, `${ionSlug(kind.key)}-${name.toLowerCase()}`, `${SYMBOL[name].words} of ${kind.words}, by ligand set`, (m) => m.complex.formula.parts))));

/** Delta and beta by metal ion for complexes that hold one kind of ligand only, octahedral and tetrahedral apart. */
export const ligandSeries = oncePerCollection((tree, ligand): readonly SeriesShown[] => {
  const alone = tree.complexes.filter((complex) => complex.row.fitted === 1 && complex.ligands.length === 1 && complex.ligands[0]!.row.ligand === ligand);
  return [...groupBy(alone, (complex) => complex.row.geometry)].flatMap(([geometry, complexes]) => seriesParameters.flatMap((name) => {
    const text = tree.ligands.find((row) => row.id === ligand)!.name;
    return shownSeries(tree, seriesByMetal(tree, complexes, name), name, `ligand-${ligand}-${geometry}-${name.toLowerCase()}`, `${SYMBOL[name].words} of ${geometry} complexes with ${text} alone, by metal ion`,
      (m) => [{ text: m.complex.ion.name, style: 'plain' }, ...(m.complex.row.spin ? [{ text: ` ${m.complex.row.spin}`, style: 'plain' as const }] : [])]);
  }));
});

/** Members ascend by value. */
function shownSeries(tree: CollectionTree, series: Series, name: Name, id: string, title: string, label: (m: MeasurementNode) => Parts): readonly SeriesShown[] {
  const { members } = series;
  if (members.length < 2) return [];
  const points = members.map((measurement): SeriesPoint => {
    const row = measurement.chosen.parameters[name];
    return { label: label(measurement), value: row.value!, u: row.u, uTotal: row.u_total, open: row.standing === 'assumed' };
  });
  const groups = indistinguishableGroups({ members: members.map((node) => resultOf(tree, node)), parameter: name }, floorOf(tree));
  const letters = members.map((_, place) => groups.flatMap(({ first, last }, index) => (first <= place && place <= last ? [letterKey(index)] : [])).join(', '));
  const range = seriesRange(points);
  const leftOut = leftOutShown(series.leftOut);
  const parts = inParts(members, ROWS_A_FIGURE);
  return parts.map(({ rows, start }, index): SeriesShown => {
    const own = index === 0 ? id : `${id}-part-${index + 1}`;
    const ownTitle = parts.length === 1 ? `${title}.` : `${title}, part ${index + 1} of ${parts.length}.`;
    const figure: PublishedFigure = {
      id: own, title: ownTitle, titleParts: slanted(ownTitle, ''),
      svg: seriesFigure(points.slice(start, start + rows.length), SYMBOL[name].column.head, newDocument(), {
        id: own, title: ownTitle, description: `${counted(rows.length, 'value')} with error bars, from below in the order of the table under the figure. ${bracketSentence(groups)}`,
      }, { brackets: bracketsWithin(groups, start, rows.length), range }),
      caption: caption(tree, series, name, points, groups),
      source: `This collection, policy ${tree.policy.id}.`,
      table: seriesTable(rows, name, letters.slice(start, start + rows.length)),
      files: figureFiles(own, id), csv: index === 0 ? seriesCsv(members, name, letters, series.leftOut) : null,
    };
    return { figure, count: members.length, leftOut: index === 0 ? leftOut : null, part: index + 1 };
  });
}

function caption(tree: CollectionTree, { members, conditions, leftOut }: Series, name: Name, points: readonly SeriesPoint[], groups: readonly IndistinguishableGroup[]): readonly string[] {
  return [
    `n = ${members.length}; ${conditions}${name === 'beta' ? `; free-ion set “${tree.policy.free_ion_set}”` : ''}.`,
    'Thick bar: one standard uncertainty of the readings alone; thin bar: in total.',
    ...(points.some((point) => point.open) ? ['Open circle: assumed.'] : []),
    bracketSentence(groups),
    ...(leftOut.length > 0 ? [`${counted(leftOut.length, 'measurement')} left out, named below.`] : []),
  ];
}

/** What brackets beside a figure mean, or that there are none. */
export function bracketSentence(groups: readonly IndistinguishableGroup[]): string {
  if (groups.length === 0) return 'All neighbours can be told apart.';
  const which = groups.length === 1 ? 'Bracket a' : `Brackets a ${groups.length === 2 ? 'and' : 'to'} ${letterKey(groups.length - 1)}`;
  return `${which}: not distinguishable, no two within one differ by more than two standard uncertainties of their difference.`;
}

/** Brackets of the rows that a part holds. */
export function bracketsWithin(groups: readonly IndistinguishableGroup[], start: number, count: number): readonly Bracket[] {
  return groups.flatMap(({ first, last }, index): readonly Bracket[] => {
    if (last < start || first >= start + count) return [];
    return [{
      first: Math.max(0, first - start), last: Math.min(count - 1, last - start), letter: letterKey(index), openBefore: first < start, openBehind: last >= start + count,
    }];
  });
}
