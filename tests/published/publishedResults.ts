import { join } from 'node:path';
import { freeIon, policyId, readMeasurement, seriesResult } from '#engine';
import type { Reading, SeriesLigand, SeriesResult } from '#engine';
import { readCollection } from '../../scripts/content/readCollection.ts';

/** The refitted measurements of tests/published/complexes with the given ids, as a comparison needs them. */
export function publishedResults(wanted: readonly string[]): { readonly results: readonly SeriesResult[]; readonly ligands: readonly SeriesLigand[]; readonly policy: string } {
  const { collection, faults } = readCollection(join(import.meta.dirname, 'complexes'));
  if (collection === null) throw new Error(faults.map((fault) => `${fault.file}:${fault.line} ${fault.code}`).join('\n'));
  const results = collection.complexes.flatMap((complex) => complex.measurements.flatMap((measurement) => {
    if (!wanted.includes(`${complex.id}/${measurement.id}`)) return [];
    const readings: Reading | readonly Reading[] = readMeasurement(measurement.engine, measurement.policy, freeIon(measurement.policy.freeIons, complex.ion));
    return [seriesResult(complex, measurement.id, measurement.engine, policyId(measurement.policy), [readings].flat()[0]!)];
  }));
  if (results.length !== wanted.length) throw new Error(`${results.length} results for ${wanted.length} ids`);
  return { results, ligands: collection.ligands, policy: collection.policyId };
}
