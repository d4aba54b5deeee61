import {
  type ComparedCollection, type ComplexIdentity, type Measurement, type MeasurementId, type Placement, type PlacingGround, type ReadMeasurement, type Reading,
  complexKey, placeResult, placingGround, readWithRivals, seriesResult,
} from '#engine';
import { type PackedCollection, unpackCollection } from './compareData.ts';

/** The collection ready for reading and placing, with the ground that was prepared last. */
export interface Reckoner {
  readonly packed: PackedCollection;
  readonly read: (measurement: Measurement) => ReadMeasurement;
  /** @param own full id of the measurement that is read otherwise; it is not compared with itself */
  readonly place: (identity: ComplexIdentity, measurementId: string, measurement: Measurement, reading: Reading, own: MeasurementId | null) => Placement;
}

/** Reads under the collection's policy and places against the collection, as `npm run compare` does. */
export function createReckoner(packed: PackedCollection): Reckoner {
  let collection: ComparedCollection | null = null;
  let prepared: { readonly key: string; readonly ground: PlacingGround } | null = null;
  const freeIons = new Map(packed.freeIons.map((one) => [one.ion, one]));
  return {
    packed,
    read: (measurement) => readWithRivals(measurement, packed.policy, freeIons.get(measurement.ion.name) ?? null),
    place: (identity, id, measurement, reading, own) => {
      collection ??= unpackCollection(packed);
      const complex = { ...identity, multiplicity: identity.multiplicity ?? reading.multiplicity };
      const key = [complexKey(complex), complex.id, own].join(' # ');
      if (prepared?.key !== key) prepared = { key, ground: placingGround(collection, complex, own === null ? [] : [own]) };
      return placeResult(prepared.ground, seriesResult(complex, id, measurement, packed.policyId, reading));
    },
  };
}
