import type { SeriesParameter as Name } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import type { LeftOut } from './leftOut.ts';
import { complexPath } from './paths.ts';
import { parameterShown } from './show.ts';
import { type Cell, type Column, type Table, column, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';

const HEAD: Readonly<Record<Name, Column>> = { Delta: quantity('Δ', 'cm-1'), beta: quantity('β', null) };

/** The numbers of a series figure. @param letters brackets of each member, "a, b"; empty where it stands apart from both neighbours */
export function seriesTable(members: readonly MeasurementNode[], name: Name, letters: readonly string[]): Table {
  const head = HEAD[name];
  const withNote = (note: string): Column => ({ ...head, head: [...head.head, ...words(note)] });
  return {
    caption: 'Values in the figure, lowest first',
    columns: [rowColumn('Complex'), column('Measurement'), column('Ion'), withNote(', u in total'), withNote(', u of readings'), column('Bracket'), column('Standing'), column('Verdict')],
    rows: members.map((measurement, place): readonly Cell[] => {
      const shown = parameterShown(measurement.chosen.parameters[name]);
      return [
        { parts: measurement.complex.formula.parts, path: complexPath(measurement.complex.row.id) },
        measurement.row.id, measurement.complex.ion.name, shown.total.text ?? soft(shown.total.reason!), shown.own.text ?? soft(shown.own.reason!),
        letters[place] || soft('none'), shown.standing, measurement.chosen.row.verdict,
      ];
    }),
  };
}

/** Members and what was left out, in full precision: a member has no reason, what was left out has one. */
export function seriesCsv(members: readonly MeasurementNode[], name: Name, letters: readonly string[], leftOut: readonly LeftOut[]): string {
  const line = (measurement: MeasurementNode, bracket: string | null, reason: string | null): readonly (string | number | null)[] => {
    const row = measurement.chosen.parameters[name];
    const { complex } = measurement;
    return [complex.row.id, measurement.row.id, complex.ion.name, complex.row.geometry, complex.row.spin, row.value, row.u, row.u_total, row.standing, measurement.chosen.row.verdict, bracket, reason];
  };
  return csvText(['complex', 'measurement', 'ion', 'geometry', 'spin', name, `${name}_u`, `${name}_u_total`, 'standing', 'verdict', 'bracket', 'left_out'], [
    ...members.map((measurement, place) => line(measurement, letters[place] || null, null)),
    ...leftOut.map(({ measurement, reason }) => line(measurement, null, reason)),
  ]);
}
