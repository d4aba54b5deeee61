import type { Policy } from '../policy/types.ts';
import type { Parents } from './averageEnvironment.ts';
import type { Difference } from './difference.ts';
import type { FactorFit } from './factorTypes.ts';
import type { PlacedPrediction } from './memberPlacement.ts';
import type { NearestComplexes } from './nearest.ts';
import type { PlaceInSeries } from './placeInSeries.ts';
import type { ComplexIdentity, SeriesParameter, SeriesResult } from './types.ts';

/** The collection as a comparison needs it: plain data, the same in the command and in the page. */
export interface ComparedCollection {
  readonly policy: { readonly id: string; readonly differentialFloor: Policy['differentialFloor'] };
  /** Id of the ligand that is water, as `aquaLigand` finds it; null where the collection has none. */
  readonly aqua: string | null;
  /** One for each measurement. */
  readonly results: readonly SeriesResult[];
}

/** What of the collection a complex is placed against: worked out once for a complex, whatever its bands. */
export interface PlacingGround {
  readonly complex: ComplexIdentity;
  readonly collection: ComparedCollection;
  /** Id under which the collection holds the complex; null where it is new. */
  readonly storedAs: string | null;
  /** true where the collection holds another complex under the new one's id. */
  readonly idTaken: boolean;
  /** Measurements of the same complex. */
  readonly earlier: readonly SeriesResult[];
  /** All other measurements. */
  readonly others: readonly SeriesResult[];
  /** Of these, the ones of its ion, and the ones with its set of ligands. */
  readonly candidates: Readonly<Record<'ion' | 'ligands', readonly SeriesResult[]>>;
  /** Factors without this complex's own data; null for a geometry that is not fitted. */
  readonly fits: Readonly<Record<SeriesParameter, FactorFit>> | null;
  readonly parents: Readonly<Record<SeriesParameter, Parents>>;
}

/** An earlier measurement of the same complex beside the new one. */
export interface EarlierMeasurement {
  readonly result: SeriesResult;
  /** New less earlier; null where one of the two is withheld. */
  readonly differences: Readonly<Record<SeriesParameter, Difference | null>>;
}

/** Where one new measurement stands. */
export interface Placement {
  readonly result: SeriesResult;
  readonly earlier: readonly EarlierMeasurement[];
  /** Series of its ion, then of its set of ligands; Delta before beta. */
  readonly places: readonly PlaceInSeries[];
  readonly predictions: readonly PlacedPrediction[];
  readonly nearest: NearestComplexes;
  readonly cautions: readonly PlacingCaution[];
}

/** A coded warning that belongs to a comparison, not to a result. */
export interface PlacingCaution {
  readonly code: string;
  readonly text: string;
}
