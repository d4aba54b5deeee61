import { elementName } from '#engine';
import { correlations } from './correlationFigures.ts';
import { ownFactors } from './ownFactors.ts';
import { type ListPage, listPage, mapped, seriesOnPage } from './listPages.ts';
import { compareIons, resultRowOf, orderedResults } from './collection.ts';
import type { ResultRow } from '../components/resultRow.ts';
import { ionDiagramFigures } from './diagram.ts';
import type { PublishedFigure } from './figure.ts';
import { ionPath } from './paths.ts';
import { counted, energy, ratio } from './show.ts';
import { type SeriesShown, ionSeries } from './seriesFigures.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import { type Parts, configuration } from './typeset.ts';
import { groupBy } from './group.ts';
import { oncePerCollection } from './memo.ts';

export interface IonPage {
  readonly name: string;
  readonly elementName: string;
  readonly configuration: Parts;
  readonly description: string;
  readonly sentence: string;
  readonly freeIon: Table | null;
  readonly diagrams: readonly PublishedFigure[];
  /** g and k of its states. */
  readonly factors: Table | null;
  readonly series: readonly SeriesShown[];
  /** Delta against beta of its states. */
  readonly planes: readonly PublishedFigure[];
  readonly list: ListPage<ResultRow>;
}

/** Results of one ion in the order of the book. */
export const ionResults = oncePerCollection((tree, name): readonly MeasurementNode[] => orderedResults(tree).filter(({ complex }) => complex.ion.name === name));

/** What belongs to the ion as a whole stands on its first page; further pages go on with its complexes and series. */
export function ionPage(tree: CollectionTree, name: string, number = 1): IonPage {
  const ion = tree.ions.find((row) => row.name === name)!;
  const results = ionResults(tree, name);
  const first = number === 1;
  const complexes = new Set(results.map((measurement) => measurement.complex.row.id)).size;
  return {
    name, elementName: elementName(ion.metal) ?? ion.metal, configuration: configuration(ion.electrons),
    description: `${name}: energy levels, complexes and series of the collection.`,
    sentence: `${counted(complexes, 'complex', 'complexes')}, ${counted(results.length, 'measurement')}.`,
    freeIon: first ? freeIonTable(tree, name) : null, diagrams: first ? ionDiagramFigures(tree, name) : [],
    factors: first ? ownFactors(tree, 'ion', (factor) => factor.startsWith(`${name} `)) : null,
    series: seriesOnPage(ionSeries(tree, name), number), planes: first ? correlations(tree).filter(({ ion: own }) => own === name).map(({ figure }) => figure) : [],
    list: mapped(listPage(results, ionSeries(tree, name), number, ionPath(name)), resultRowOf),
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
