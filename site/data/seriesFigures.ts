import { newDocument } from '../charts/plot.ts';
import { type SeriesPoint, seriesFigure } from '../charts/seriesFigure.ts';
import { type SeriesParameter as Name, seriesParameters } from '#engine';
import { type Series, kinds, seriesByMetal, seriesOfKind } from './comparable.ts';
import { csvText } from '../../scripts/export/csv.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { compareIons } from './collection.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath, ionSlug } from './paths.ts';
import { counted, parameterShown } from './show.ts';
import { type Cell, type Column, type Table, column, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import type { Parts } from './typeset.ts';
import { groupBy } from './group.ts';

const SYMBOL: Readonly<Record<Name, { readonly column: Column; readonly words: string }>> = {
  Delta: { column: quantity('Δ', 'cm-1'), words: 'Field splitting Δ' },
  beta: { column: quantity('β', null), words: 'Nephelauxetic ratio β' },
};

/** A series figure with the measurements that could not stand in it. */
export interface SeriesShown {
  readonly figure: PublishedFigure;
  readonly leftOut: readonly { readonly formula: Parts; readonly path: string; readonly measurement: string; readonly reason: string }[];
  readonly count: number;
}

/** Delta and beta by ligand set, for each geometry and spin of an ion that has two or more complexes to compare. */
export const ionSeries = oncePerCollection((tree, ion): readonly SeriesShown[] =>
  kinds(tree).filter((kind) => kind.ion === ion).flatMap((kind) => seriesParameters.flatMap((name) => {
    const series = seriesOfKind(tree, kind, name);
    if (series.members.length < 2) return [];
    return [shownSeries(tree, series, name, `${ionSlug(kind.key)}-${name.toLowerCase()}`, `${SYMBOL[name].words} of ${kind.words}, by ligand set.`, (m) => m.complex.formula.parts)];
  })));

/** Delta and beta by metal ion for complexes that hold one kind of ligand only, octahedral and tetrahedral apart. */
export const ligandSeries = oncePerCollection((tree, ligand): readonly SeriesShown[] => {
  const alone = tree.complexes.filter((complex) => complex.row.fitted === 1 && complex.ligands.length === 1 && complex.ligands[0]!.row.ligand === ligand);
  return [...groupBy(alone, (complex) => complex.row.geometry)].flatMap(([geometry, complexes]) => seriesParameters.flatMap((name) => {
    const series = seriesByMetal(tree, complexes, name);
    const members = [...series.members].sort((a, b) => compareIons(a.complex, b.complex));
    if (members.length < 2) return [];
    const text = tree.ligands.find((row) => row.id === ligand)!.name;
    return [shownSeries(tree, { ...series, members }, name, `ligand-${ligand}-${geometry}-${name.toLowerCase()}`, `${SYMBOL[name].words} of ${geometry} complexes with ${text} alone, by metal ion.`,
      (m) => [{ text: m.complex.ion.name, style: 'plain' }, ...(m.complex.row.spin ? [{ text: ` ${m.complex.row.spin}`, style: 'plain' as const }] : [])])];
  }));
});

function shownSeries(tree: CollectionTree, { members, leftOut, conditions }: Series, name: Name, id: string, title: string, label: (m: MeasurementNode) => Parts): SeriesShown {
  const points = members.map((measurement): SeriesPoint => {
    const row = measurement.chosen.parameters[name];
    return { label: label(measurement), value: row.value!, u: row.u, uTotal: row.u_total, open: row.standing === 'assumed' };
  });
  const set = tree.policy.free_ion_set;
  const figure: PublishedFigure = {
    id, title,
    svg: seriesFigure(points, SYMBOL[name].column.head, newDocument(), { id, title, description: `${counted(points.length, 'value')} with error bars, in the order of the table below the figure.` }),
    caption: [
      `n = ${members.length}; ${conditions}${name === 'beta' ? `; free-ion set “${set}”` : ''}.`,
      'Thick bar: one standard uncertainty of the readings alone; thin bar: in total.',
      ...(points.some((point) => point.open) ? ['Open circle: assumed.'] : []),
      ...(leftOut.length > 0 ? [`${counted(leftOut.length, 'measurement')} left out, listed below.`] : []),
    ],
    source: `This collection, policy ${tree.policy.id}.`,
    table: seriesTable(members, name), files: figureFiles(id), csv: seriesCsv(members, name),
  };
  return {
    figure, count: members.length,
    leftOut: leftOut.map(({ measurement, reason }) => ({
      formula: measurement.complex.formula.parts, path: complexPath(measurement.complex.row.id),
      measurement: measurement.row.id, reason,
    })),
  };
}

function seriesTable(members: readonly MeasurementNode[], name: Name): Table {
  const head = SYMBOL[name].column;
  return {
    caption: 'Values in the figure',
    columns: [rowColumn('Complex'), column('Measurement'), column('Ion'), { ...head, head: [...head.head, { text: ', u in total', style: 'plain' }] }, { ...head, head: [...head.head, { text: ', u of readings', style: 'plain' }] }, column('Standing'), column('Verdict')],
    rows: members.map((measurement): readonly Cell[] => {
      const shown = parameterShown(measurement.chosen.parameters[name]);
      return [
        { parts: measurement.complex.formula.parts, path: complexPath(measurement.complex.row.id) },
        measurement.row.id, measurement.complex.ion.name, shown.total.text ?? soft(shown.total.reason!), shown.own.text ?? soft(shown.own.reason!), shown.standing, measurement.chosen.row.verdict,
      ];
    }),
  };
}

function seriesCsv(members: readonly MeasurementNode[], name: Name): string {
  return csvText(['complex', 'measurement', 'ion', 'geometry', 'spin', name, `${name}_u`, `${name}_u_total`, 'standing', 'verdict'], members.map((measurement) => {
    const row = measurement.chosen.parameters[name];
    const { complex } = measurement;
    return [complex.row.id, measurement.row.id, complex.ion.name, complex.row.geometry, complex.row.spin, row.value, row.u, row.u_total, row.standing, measurement.chosen.row.verdict];
  }));
}
