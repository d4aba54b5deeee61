import { hazardCautions } from '#engine';
import type { Reading } from '#engine';
import type { Collection, ComplexRecord, LigandRecord } from '../../content/types.ts';
import { collectionRows } from './collection.ts';
import { complexRows } from './complex.ts';
import { hazardSubject } from './hazardSubject.ts';
import { cautionRows, readingRows } from './reading.ts';
import { mergeTables } from './row.ts';
import type { Tables } from './row.ts';

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
  return mergeTables([
    collectionRows(collection, engineHash, software),
    ...collection.complexes.map((complex) => tablesOfComplex(complex, collection.ligands, readings)),
  ]);
}

function tablesOfComplex(
  complex: ComplexRecord, ligands: readonly LigandRecord[], readings: ReadonlyMap<string, readonly Reading[]>,
): Tables {
  const hazards = hazardCautions(hazardSubject(complex, ligands));
  const read = complex.measurements.map((measurement) => {
    const found = readings.get(measurementKey(complex.id, measurement.id));
    if (found === undefined || found.length === 0) throw new Error(`no reading for ${complex.id}/${measurement.id}`);
    return { measurement, found };
  });
  const multiplicity = complex.multiplicity ?? read[0]?.found[0]?.multiplicity ?? null;
  let cautions = hazards.length;
  const parts: Tables[] = [complexRows(complex, multiplicity, hazards)];
  for (const { measurement, found } of read) {
    for (const [index, reading] of found.entries()) {
      const rows = cautionRows(complex.id, measurement.id, index + 1, reading, cautions);
      cautions += rows.length;
      parts.push(readingRows(complex.id, measurement.id, index + 1, reading, measurement.policy), { caution: rows });
    }
  }
  return mergeTables(parts);
}
