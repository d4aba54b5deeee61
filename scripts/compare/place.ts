import { freeIon, measurementId, placeResult, placingGround, policyId, readMeasurement, seriesResult } from '#engine';
import type { Placement, Reading } from '#engine';
import type { ComplexRecord, MeasurementRecord } from '../content/types.ts';
import { identityOf } from '../database/rows/series.ts';
import type { StoredCollection } from './collection.ts';

/** One measurement of a new record with its reading and its place. */
export interface PlacedMeasurement {
  readonly measurement: MeasurementRecord;
  readonly reading: Reading;
  readonly placement: Placement;
}

export interface PlacedRecord {
  readonly record: ComplexRecord;
  readonly measurements: readonly PlacedMeasurement[];
}

/** Reads every measurement of a new record and places it against the collection. New records are not compared with one another. */
export function placeRecord(record: ComplexRecord, collection: StoredCollection): PlacedRecord {
  const readings = record.measurements.map((measurement) => ({
    measurement, reading: readMeasurement(measurement.engine, measurement.policy, freeIon(measurement.policy.freeIons, record.ion)),
  }));
  const complex = { ...identityOf(record), multiplicity: record.multiplicity ?? readings[0]?.reading.multiplicity ?? null };
  const ground = placingGround(collection.compared, complex, record.measurements.map(({ id }) => measurementId({ complex, measurement: id })));
  const results = readings.map(({ measurement, reading }) => seriesResult(complex, measurement.id, measurement.engine, policyId(measurement.policy), reading));
  return {
    record,
    measurements: readings.map((one, i) => ({ ...one, placement: placeResult(ground, results[i]!, results.filter((other) => other !== results[i])) })),
  };
}
