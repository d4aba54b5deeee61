// Where a complex that is not in the collection yet stands against all that is.

import { averageEnvironment, parentsOf } from './averageEnvironment.ts';
import type { Parents } from './averageEnvironment.ts';
import { difference } from './difference.ts';
import { fitFactors } from './factors.ts';
import type { FactorFit } from './factorTypes.ts';
import { complexKey, ligandSetKey, measurementId } from './identity.ts';
import { placedPrediction } from './memberPlacement.ts';
import type { PlacedPrediction } from './memberPlacement.ts';
import { nearestComplexes } from './nearest.ts';
import { placeInSeries } from './placeInSeries.ts';
import type { ComparedCollection, Placement, PlacingGround } from './placeTypes.ts';
import { placingCautions } from './placingCautions.ts';
import { predictFromFactors } from './predictFromFactors.ts';
import type { Predicted } from './predictFromFactors.ts';
import { seriesParameters } from './types.ts';
import type { ComplexIdentity, MeasurementId, SeriesParameter, SeriesResult } from './types.ts';

/**
 * Prepares the collection for placing a complex. Its own earlier measurements are set apart and its data are out of the factors.
 *
 * @param own full ids of the measurements to be placed: where the collection holds them already they are not compared with themselves
 */
export function placingGround(collection: ComparedCollection, complex: ComplexIdentity, own: readonly MeasurementId[]): PlacingGround {
  const key = complexKey(complex);
  const results = collection.results.filter((result) => !(own.includes(measurementId(result)) && complexKey(result.complex) === key));
  const earlier = results.filter((result) => complexKey(result.complex) === key);
  const others = results.filter((result) => complexKey(result.complex) !== key);
  const { geometry } = complex;
  const fit = (parameter: SeriesParameter): FactorFit | null => (geometry === null ? null : fitFactors(others, { parameter, geometry, policy: collection.policy.id, aqua: collection.aqua }));
  const [delta, beta] = [fit('Delta'), fit('beta')];
  const parents = (one: FactorFit | null): Parents => parentsOf(one?.complexes.map(({ result }) => result) ?? []);
  return {
    complex, collection, earlier, others,
    storedAs: collection.results.find((result) => complexKey(result.complex) === key)?.complex.id ?? null,
    idTaken: others.some((result) => result.complex.id === complex.id),
    candidates: {
      ion: others.filter((one) => one.complex.ion.name === complex.ion.name),
      ligands: others.filter((one) => ligandSetKey(one.complex) === ligandSetKey(complex)),
    },
    fits: delta === null || beta === null ? null : { Delta: delta, beta },
    parents: { Delta: parents(delta), beta: parents(beta) },
  };
}

/**
 * Places one new measurement of the complex for which the ground was prepared.
 *
 * @param siblings other new measurements of the same complex, set beside it like earlier ones
 */
export function placeResult(ground: PlacingGround, result: SeriesResult, siblings: readonly SeriesResult[] = []): Placement {
  const { policy } = ground.collection;
  const floor = policy.differentialFloor;
  const earlier = [...ground.earlier, ...siblings].map((one) => ({
    result: one, differences: { Delta: difference(result, one, 'Delta', floor), beta: difference(result, one, 'beta', floor) },
  }));
  const places = (['ion', 'ligands'] as const).flatMap((subject) => seriesParameters.map((parameter) => placeInSeries(result, subject, parameter, ground.candidates[subject], policy)));
  const predictions = seriesParameters.flatMap((parameter) => predictionsOf(ground, result, parameter));
  const nearest = nearestComplexes(result, ground.fits);
  return { result, earlier, places, predictions, nearest, cautions: placingCautions({ result, ground, earlier, places, predictions }) };
}

function predictionsOf({ complex, fits, parents }: PlacingGround, result: SeriesResult, parameter: SeriesParameter): readonly PlacedPrediction[] {
  if (fits === null) return [];
  const fit = fits[parameter];
  const methods: readonly (readonly [PlacedPrediction['method'], Predicted])[] = [
    ['average environment', averageEnvironment(complex, parameter, parents[parameter], fit.scatter)],
    ['factors', predictFromFactors(fit, complex)],
  ];
  return methods.map(([method, predicted]) => placedPrediction(result, parameter, method, predicted));
}
