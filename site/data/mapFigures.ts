import { type FactorFit, type Geometry, type MapCell, type SeriesParameter, distinguishableAbove, factorMap, isPrediction, reviewAbove } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { type MapMark, mapFigure } from '../charts/mapFigure.ts';
import { ionWithoutGeometry } from './factorNames.ts';
import { type PublishedFigure, figureFiles } from './figure.ts';
import { ligandSymbol } from './ligandNames.ts';
import { oncePerCollection } from './memo.ts';
import { inParts } from './parts.ts';
import { factorFitOf, geometries, nodeOf } from './seriesFit.ts';
import { complexPath, ionPath } from './paths.ts';
import { energy, parameterShown, plainNumber } from './show.ts';
import { slanted } from './slanted.ts';
import { type Cell, type Table, rowColumn, soft, words } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** Ligands that one map holds beside each other. */
const COLUMNS = 22;

export interface MapShown {
  readonly parameter: SeriesParameter;
  readonly geometry: Geometry;
  readonly figures: readonly PublishedFigure[];
}

/** Maps of ions against ligands: what is measured, what the factors predict, what is missing. */
export const mapFigures = oncePerCollection((tree): readonly MapShown[] =>
  geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
    const fit = factorFitOf(tree, parameter, geometry);
    return fit.complexes.length < 2 ? [] : [shownMap(tree, fit)];
  })));

function shownMap(tree: CollectionTree, fit: FactorFit): MapShown {
  const { parameter, geometry } = fit;
  const { ions, ligands, rows } = factorMap(fit);
  const id = `map-${parameter.toLowerCase()}-${geometry}`;
  const title = `${parameter === 'Delta' ? 'Δ' : 'β'} of ${geometry} complexes with one kind of ligand`;
  const cells = rows.flat();
  const found = cells.filter((cell) => cell.found !== null).length;
  const predicted = cells.filter((cell) => cell.found === null && isPrediction(cell.predicted)).length;
  const parts = inParts(ligands, COLUMNS);
  return {
    parameter, geometry,
    figures: parts.map(({ rows: columns, start }, index): PublishedFigure => {
      const own = index === 0 ? id : `${id}-part-${index + 1}`;
      const ownTitle = parts.length === 1 ? `${title}.` : `${title}, part ${index + 1} of ${parts.length}.`;
      const within = rows.map((row) => row.slice(start, start + columns.length));
      return {
        id: own, title: ownTitle, titleParts: slanted(ownTitle, ''),
        svg: mapFigure(ions.map((ion, place) => ({ label: words(ionWithoutGeometry(ion, geometry)), cells: within[place]!.map((cell) => markOf(cell, parameter)) })), columns.map((ligand) => ligandSymbol(tree, ligand)), {
          id: own, title: ownTitle, description: `${ions.length} ions in rows, ${columns.length} ligands in columns, each in the order of its factor. The numbers stand in the table under the figure.`,
        }),
        caption: [
          `${parameter === 'Delta' ? 'In 1000 cm⁻¹. ' : ''}Framed: measured, n = ${found}. Slanted: not measured, predicted by the factors of the collection, ${predicted}. Dot: neither, ${cells.length - found - predicted}; the CSV file says why.`,
          `Triangle at the upper right: found above what the other complexes predict by more than ${distinguishableAbove} combined standard uncertainties; at the lower right: below; full: by more than ${reviewAbove}.`,
          'Ions and ligands in the order of their factors; complexes with several kinds of ligand are in the fit but have no cell. The rule knows nothing of spin: a prediction does not say that the complex would have the spin of its row.',
        ],
        source: `This collection, policy ${tree.policy.id}; conditions as for the factors.`,
        table: mapTable(tree, parameter, geometry, columns, within),
        files: figureFiles(own, id), csv: index === 0 ? mapCsv(tree, fit, cells) : null,
      };
    }),
  };
}

function markOf({ found, predicted }: MapCell, parameter: SeriesParameter): MapMark {
  const text = (value: number): string => (parameter === 'Delta' ? plainNumber(value / 1000, 1) : plainNumber(value, 2));
  if (found === null) return isPrediction(predicted) ? { form: 'slanted', text: text(predicted.predicted), flag: null } : { form: 'dot', text: '', flag: null };
  return { form: 'framed', text: text(found.result.parameters[parameter].value!), flag: flagOf(found.leftOut?.z ?? 0) };
}

function flagOf(z: number): MapMark['flag'] {
  if (Math.abs(z) <= distinguishableAbove) return null;
  const where = z > 0 ? 'above' : 'below';
  return Math.abs(z) > reviewAbove ? `far ${where}` : where;
}

function mapTable(tree: CollectionTree, parameter: SeriesParameter, geometry: Geometry, columns: readonly string[], rows: readonly (readonly MapCell[])[]): Table {
  return {
    caption: `Values in the map${parameter === 'Delta' ? ', in cm⁻¹' : ''}, u in total; p: predicted`,
    columns: [rowColumn('Ion'), ...columns.map((ligand) => ({ head: ligandSymbol(tree, ligand), figure: true }))],
    rows: rows.map((cells): readonly Cell[] => [
      { parts: words(ionWithoutGeometry(cells[0]!.ion, geometry)), path: ionPath(cells[0]!.ion.split(' ')[0]!) },
      ...cells.map(({ found, predicted }): Cell => {
        if (found === null) return isPrediction(predicted) ? soft(`p ${energy(predicted.predicted, predicted.u)}`) : soft('–');
        const node = nodeOf(tree, found.result);
        return { parts: words(parameterShown(node.chosen.parameters[parameter]).total.text!), path: complexPath(node.complex.row.id) };
      }),
    ]),
  };
}

/** Every cell in full precision; a cell without a number says why. */
function mapCsv(tree: CollectionTree, { parameter, geometry }: FactorFit, cells: readonly MapCell[]): string {
  return csvText(['parameter', 'geometry', 'ion', 'ligand', 'complex', 'measurement', 'found', 'found_u_total', 'predicted', 'predicted_u', 'z', 'reason'], cells.map(({ ion, ligand, found, predicted }) => {
    const node = found === null ? null : nodeOf(tree, found.result);
    const row = node?.chosen.parameters[parameter];
    return [
      parameter, geometry, ion, ligand, node?.complex.row.id ?? null, node?.row.id ?? null, row?.value ?? null, row?.u_total ?? null,
      ...(isPrediction(predicted) ? [predicted.predicted, predicted.u, found?.leftOut?.z ?? null, null] : [null, null, null, predicted.reason]),
    ];
  }));
}
