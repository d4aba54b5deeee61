import { hazardCautions } from '#engine';
import type { Reading } from '#engine';
import type { Collection, ComplexRecord, LigandRecord } from '../../content/types.ts';
import { collectionRows } from './collection.ts';
import { auditRows, cautionsOfComplex, readRecord } from './complexFacts.ts';
import { complexRows } from './complex.ts';
import { hazardSubject } from './hazardSubject.ts';
import { cautionRows, readingRows } from './reading.ts';
import { floorFactorRows, reviewRows } from './review.ts';
import type { ReviewedComplex } from './review.ts';
import { mergeTables } from './row.ts';
import type { Tables } from './row.ts';
import { collectionSeriesResults, seriesRows } from './series.ts';

/** The full id of a measurement, "cr-am6/aq-295". */
export function measurementKey(complex: string, measurement: string): string {
  return `${complex}/${measurement}`;
}

/**
 * Every row of the database for a collection and its readings, by full measurement id; the first reading of each is the chosen one.
 * Throws where a measurement has no reading.
 */
export function allTables(
  collection: Collection, readings: ReadonlyMap<string, readonly Reading[]>, engineHash: string, software: string,
): Tables {
  const reviewed = collection.complexes.map((complex) => reviewedComplex(complex, collection.ligands, readings));
  return mergeTables([
    collectionRows(collection, engineHash, software),
    ...reviewed.map((one) => tablesOfComplex(one, collection.ligands, readings)),
    { review: reviewRows(reviewed) },
    floorFactorRows(reviewed),
    seriesRows(collectionSeriesResults(collection, readings), collection.ligands, collection.policyId),
  ]);
}

function readingsOf(complex: ComplexRecord, measurement: string, readings: ReadonlyMap<string, readonly Reading[]>): readonly Reading[] {
  const found = readings.get(measurementKey(complex.id, measurement));
  if (found === undefined || found.length === 0) throw new Error(`no reading for ${complex.id}/${measurement}`);
  return found;
}

function reviewedComplex(complex: ComplexRecord, ligands: readonly LigandRecord[], readings: ReadonlyMap<string, readonly Reading[]>): ReviewedComplex {
  const records = complex.measurements.map((measurement) => readRecord(measurement, readingsOf(complex, measurement.id, readings)[0]!));
  return { complex, records, cautions: cautionsOfComplex(complex, ligands, records) };
}

function tablesOfComplex(
  { complex, records, cautions: ofComplex }: ReviewedComplex, ligands: readonly LigandRecord[], readings: ReadonlyMap<string, readonly Reading[]>,
): Tables {
  const hazards = hazardCautions(hazardSubject(complex, ligands));
  const read = complex.measurements.map((measurement) => ({ measurement, found: readingsOf(complex, measurement.id, readings) }));
  const multiplicity = complex.multiplicity ?? read[0]?.found[0]?.multiplicity ?? null;
  let cautions = hazards.length;
  const parts: Tables[] = [complexRows(complex, multiplicity, hazards), { audit: records.flatMap((record) => auditRows(complex.id, record)) }];
  for (const { measurement, found } of read) {
    for (const [index, reading] of found.entries()) {
      const all = index === 0 ? [...reading.cautions, ...(ofComplex.get(measurement.id) ?? [])] : reading.cautions;
      const rows = cautionRows(complex.id, measurement.id, index + 1, all, cautions);
      cautions += rows.length;
      parts.push(readingRows(complex.id, measurement.id, index + 1, reading, measurement.policy, complex.ion.electrons), { caution: rows });
    }
  }
  return mergeTables(parts);
}
