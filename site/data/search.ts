import { type CompactBand, type CompactCollection, KINDS } from '../client/compact.ts';
import { collectionPage, orderedResults, resultRowOf } from './collection.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import { groupBy } from './group.ts';

/** What the search in the page reads, in the order of the book. */
export function searchData(tree: CollectionTree): CompactCollection {
  const verdicts = [...new Set(tree.complexes.flatMap((complex) => complex.measurements.map((measurement) => measurement.chosen.row.verdict)))].sort();
  const ionPlace = new Map(tree.ions.map((row, place) => [row.name, place]));
  const ligandPlace = new Map(tree.ligands.map((row, place) => [row.id, place]));
  const byComplex = groupBy(orderedResults(tree), (measurement) => measurement.complex);
  return {
    counts: collectionPage(tree, 1).counts,
    words: verdicts,
    ions: tree.ions.map(({ name, metal, oxidation }) => ({ name, metal, oxidation })),
    ligands: tree.ligands.map((row) => ({
      name: row.name, formula: row.formula, abbreviation: row.abbreviation, synonyms: JSON.parse(row.synonyms) as string[], donors: JSON.parse(row.donors) as string[],
    })),
    complexes: [...byComplex].map(([complex, measurements]) => [
      complex.row.id, complex.row.formula, complex.row.isomer, complex.row.charge, ionPlace.get(complex.ion.name)!,
      complex.ligands.map(({ row }) => [ligandPlace.get(row.ligand)!, row.count]),
      [complex.row.name, complex.row.geometry, complex.row.spin].filter((text) => text !== null),
      measurements.map((measurement) => compactRow(measurement, verdicts)),
    ]),
  };
}

function compactRow(measurement: MeasurementNode, verdicts: readonly string[]): CompactCollection['complexes'][number][7][number] {
  const row = resultRowOf(measurement);
  const whole = (ranges: readonly { readonly low: number; readonly high: number }[]): (readonly [number, number])[] => ranges.map(({ low, high }) => [Math.round(low), Math.round(high)]);
  return [
    row.measurement, row.conditions, row.delta ?? 0, row.racahB ?? 0, row.beta ?? 0, verdicts.indexOf(row.verdict), whole(row.strip.scanned), whole(row.strip.absent),
    row.strip.bands.map((band): CompactBand => [
      Math.round(band.position), KINDS.indexOf(band.kind), band.side === 'higher' ? 1 : band.side === 'lower' ? -1 : 0, band.fitted ? 1 : 0, Math.round(band.width ?? 0),
    ]),
  ];
}
