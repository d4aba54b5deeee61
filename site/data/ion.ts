import { elementName } from '#engine';
import { compareIons, resultRowOf, orderedResults } from './collection.ts';
import type { ResultRow } from '../components/resultRow.ts';
import { ionDiagramFigures } from './diagram.ts';
import type { PublishedFigure } from './figure.ts';
import { ionPath } from './paths.ts';
import { counted, energy, ratio } from './show.ts';
import { type SeriesShown, ionSeries } from './seriesFigures.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { type Parts, configuration } from './typeset.ts';
import { groupBy } from './group.ts';

export interface IonPage {
  readonly name: string;
  readonly elementName: string;
  readonly configuration: Parts;
  readonly description: string;
  readonly sentence: string;
  readonly freeIon: Table | null;
  readonly diagrams: readonly PublishedFigure[];
  readonly series: readonly SeriesShown[];
  readonly rows: readonly ResultRow[];
}

export function ionPage(tree: CollectionTree, name: string): IonPage {
  const ion = tree.ions.find((row) => row.name === name)!;
  const results = orderedResults(tree).filter((measurement) => measurement.complex.ion.name === name);
  const complexes = new Set(results.map((measurement) => measurement.complex.row.id)).size;
  return {
    name, elementName: elementName(ion.metal) ?? ion.metal, configuration: configuration(ion.electrons),
    description: `${name}: energy levels, complexes and series of the collection.`,
    sentence: `${counted(complexes, 'complex', 'complexes')}, ${counted(results.length, 'measurement')}.`,
    freeIon: freeIonTable(tree, name), diagrams: ionDiagramFigures(tree, name), series: ionSeries(tree, name), rows: results.map(resultRowOf),
  };
}

function freeIonTable(tree: CollectionTree, name: string): Table | null {
  const rows = tree.freeIons.filter((row) => row.ion === name);
  if (rows.length === 0) return null;
  return {
    caption: 'The free ion',
    columns: [rowColumn('Set'), quantity('B₀', 'cm-1'), quantity('C₀', 'cm-1'), column('How obtained'), longColumn('Source')],
    rows: rows.map((row): readonly Cell[] => [
      `${row.set_name}${row.set_name === tree.policy.free_ion_set ? ' (in use)' : ''}`, energy(row.B0, null), row.C0 === null ? soft('none in this set') : energy(row.C0, null), row.kind, row.source,
    ]),
  };
}

export interface IonList {
  readonly table: Table;
}

/** Every ion of the collection, in the order of the table of elements. */
export function ionList(tree: CollectionTree): IonList {
  const groups = [...groupBy(tree.complexes, (complex) => complex.ion.name).values()].sort((a, b) => compareIons(a[0]!, b[0]!));
  return {
    table: {
      caption: 'Ions of the collection',
      columns: [rowColumn('Ion'), column('Configuration'), column('Geometries'), quantity('complexes', null, true), quantity('measurements', null, true), quantity('Δ', 'cm-1')],
      rows: groups.map((complexes): readonly Cell[] => {
        const { ion } = complexes[0]!;
        const measurements = complexes.flatMap((complex) => complex.measurements);
        const values = measurements.map((measurement) => measurement.chosen.parameters.Delta.value).filter((value) => value !== null);
        return [
          { parts: [{ text: ion.name, style: 'plain' }], path: ionPath(ion.name) }, { parts: configuration(ion.electrons) },
          [...new Set(complexes.map((complex) => complex.row.geometry))].join(', '), ratio(complexes.length, 0), ratio(measurements.length, 0), range(values),
        ];
      }),
    },
  };
}

function range(values: readonly number[]): Cell {
  if (values.length === 0) return soft('withheld');
  const [low, high] = [Math.min(...values), Math.max(...values)].map((value) => ratio(Math.round(value / 100) * 100, 0)) as [string, string];
  return low === high ? low : `${low} to ${high}`;
}
