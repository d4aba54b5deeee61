import type { ResultRow } from '../components/resultRow.ts';
import { conditions } from './conditions.ts';
import { oncePerCollection } from './memo.ts';
import { collectionPath, ionPath } from './paths.ts';
import { counted, parameterShown } from './show.ts';
import { stripRow, stripTitle } from './strip.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { type Parts, configuration } from './typeset.ts';
import { groupBy } from './group.ts';

export const ROWS_A_PAGE = 200;

export interface CollectionPage {
  readonly number: number;
  readonly pages: readonly { readonly number: number; readonly path: string }[];
  readonly title: string;
  readonly about: string;
  readonly counts: string;
  /** Rows under the ion they belong to, ions by metal, as in a table of elements. */
  readonly sections: readonly { readonly ion: string; readonly path: string; readonly configuration: Parts; readonly rows: readonly ResultRow[] }[];
  readonly empty: boolean;
}

/** All results in the order of the book: by d count, metal, geometry and Delta; withheld last. */
export const orderedResults = oncePerCollection((tree): readonly MeasurementNode[] =>
  tree.complexes.flatMap((complex) => complex.measurements).sort((a, b) =>
    compareIons(a.complex, b.complex)
    || inOrder(a.complex.row.geometry, b.complex.row.geometry)
    || lowestDelta(a.complex) - lowestDelta(b.complex)
    || inOrder(a.complex.row.id, b.complex.row.id)
    || a.row.number - b.row.number));

/** Binary order, alike under every locale. */
const inOrder = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

const ROWS_OF_TABLE = ['3d', '4d', '5d'];

export function compareIons(a: ComplexNode, b: ComplexNode): number {
  return ROWS_OF_TABLE.indexOf(a.ion.shell) - ROWS_OF_TABLE.indexOf(b.ion.shell)
    || a.ion.electrons + a.ion.oxidation - (b.ion.electrons + b.ion.oxidation)
    || a.ion.oxidation - b.ion.oxidation;
}

function lowestDelta(complex: ComplexNode): number {
  const values = complex.measurements.map((measurement) => measurement.chosen.parameters.Delta.value).filter((value) => value !== null);
  return values.length === 0 ? Number.MAX_VALUE : Math.min(...values);
}

export function resultRowOf(measurement: MeasurementNode): ResultRow {
  const { complex, chosen } = measurement;
  return {
    complex: complex.row.id, measurement: measurement.row.id, formula: complex.formula,
    ion: complex.ion.name, conditions: conditions(measurement), strip: stripRow(measurement), stripTitle: stripTitle(measurement),
    delta: parameterShown(chosen.parameters.Delta).total.text, racahB: parameterShown(chosen.parameters.B).total.text,
    beta: parameterShown(chosen.parameters.beta).total.text, verdict: chosen.row.verdict,
  };
}

/** The numbers of pages that the collection fills; an empty collection fills one. */
export function collectionPages(tree: CollectionTree): readonly number[] {
  const rows = tree.complexes.reduce((sum, complex) => sum + complex.measurements.length, 0);
  return Array.from({ length: Math.max(1, Math.ceil(rows / ROWS_A_PAGE)) }, (_, index) => index + 1);
}

export function collectionPage(tree: CollectionTree, number: number): CollectionPage {
  const results = orderedResults(tree);
  const shownRows = results.slice((number - 1) * ROWS_A_PAGE, number * ROWS_A_PAGE);
  const sections = [...groupBy(shownRows, (measurement) => measurement.complex.ion)].map(([ion, rows]) => ({
    ion: ion.name, path: ionPath(ion.name), configuration: configuration(ion.electrons), rows: rows.map(resultRowOf),
  }));
  const ions = new Set(results.map((measurement) => measurement.complex.ion.name));
  return {
    number, sections, empty: results.length === 0,
    pages: collectionPages(tree).map((page) => ({ number: page, path: collectionPath(page) })),
    title: tree.meta.get('group.title') ?? 'Ligand-field parameters',
    about: tree.meta.get('group.description')
      ?? `Electronic spectra of transition-metal complexes read by ${tree.meta.get('group.name') ?? 'one group'}, and the ligand-field parameters refitted from the readings with one engine under one declared policy.`,
    counts: `${counted(tree.complexes.length, 'complex', 'complexes')} of ${counted(ions.size, 'ion')}, ${counted(results.length, 'measurement')}.`,
  };
}
