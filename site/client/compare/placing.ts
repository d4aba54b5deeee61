// Fetched when a place is first asked for: the series and their matrices are as large as all that reads bands.

import {
  type ComplexIdentity, type Measurement, type MeasurementId, type Placement, type PlacingGround, type Reading, complexKey, placeResult, placingGround, seriesResult,
} from '#engine';
import { type PackedCollection, unpackCollection } from './compareData.ts';

export { placementMarkup } from './placementMarkup.ts';

/** @param own full id of the measurement that is read otherwise; it is not compared with itself */
export type Placer = (identity: ComplexIdentity, measurementId: string, measurement: Measurement, reading: Reading, own: MeasurementId | null) => Placement;

/** Places against the collection, as `npm run compare` does; holds the ground that was prepared last. */
export function createPlacer(packed: PackedCollection): Placer {
  const collection = unpackCollection(packed);
  let prepared: { readonly key: string; readonly ground: PlacingGround } | null = null;
  return (identity, id, measurement, reading, own) => {
    const complex = { ...identity, multiplicity: identity.multiplicity ?? reading.multiplicity };
    const key = [complexKey(complex), complex.id, own].join(' # ');
    if (prepared?.key !== key) prepared = { key, ground: placingGround(collection, complex, own === null ? [] : [own]) };
    return placeResult(prepared.ground, seriesResult(complex, id, measurement, packed.policyId, reading));
  };
}
