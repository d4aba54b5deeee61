import { averageEnvironment, parentsOf } from './averageEnvironment.ts';
import { zOf } from './difference.ts';
import { toModelScale } from './factorModel.ts';
import type { FactorFit } from './factorTypes.ts';
import { complexKey } from './identity.ts';
import { isPrediction, possiblePrediction, predictFromFactors } from './predictFromFactors.ts';
import type { Predicted } from './predictFromFactors.ts';
import { normalOfStudent } from './student.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

export type PredictionMethod = 'average environment' | 'factors';

/** A prediction beside what was found. */
export interface PlacedPrediction {
  readonly parameter: SeriesParameter;
  readonly method: PredictionMethod;
  /** null: `reason` says why there is none. */
  readonly predicted: number | null;
  readonly u: number | null;
  /** Found less predicted over the combined uncertainty; null where one of the two is missing. */
  readonly z: number | null;
  readonly reason: string | null;
}

/** |z| above this is put up for review. */
export const reviewAbove = 3;

/** A prediction with its z against a result's own number. Delta is compared by its logarithm, as it is fitted. */
export function placedPrediction(result: SeriesResult, parameter: SeriesParameter, method: PredictionMethod, one: Predicted): PlacedPrediction {
  if (!isPrediction(one)) return { parameter, method, predicted: null, u: null, z: null, reason: one.reason };
  const { value, uTotal } = result.parameters[parameter];
  const common = { parameter, method, predicted: one.predicted, u: one.u };
  if (value === null || uTotal === null) return { ...common, z: null, reason: null };
  const [found, expected] = [toModelScale(parameter, value, uTotal), toModelScale(parameter, one.predicted, one.u)];
  return { ...common, z: normalOfStudent(zOf(found.value - expected.value, Math.hypot(found.u, expected.u)), one.degrees), reason: null };
}

/**
 * What the rest of the collection predicts for every measurement of it, the complex's own data taken out: from the factors without a new
 * fit, and from the average environment. Measurements of a geometry other than the fit's are passed over.
 */
export function memberPlacements(results: readonly SeriesResult[], fit: FactorFit): readonly { readonly result: SeriesResult; readonly placed: readonly PlacedPrediction[] }[] {
  const inFit = new Map(fit.complexes.map((one) => [complexKey(one.result.complex), one]));
  // A parent has one kind of ligand, so no complex is ever averaged from its own data.
  const parents = parentsOf(fit.complexes.map(({ result }) => result));
  return results.filter(({ complex }) => complex.geometry === fit.geometry).map((result) => {
    const key = complexKey(result.complex);
    const own = inFit.get(key);
    const factors: Predicted = own === undefined
      ? (result.complex.multiplicity === null ? { reason: 'the spin state is not declared' } : predictFromFactors(fit, result.complex))
      : own.leftOut === null ? { reason: 'without its own data nothing fixes its factors' } : possiblePrediction(fit.parameter, own.leftOut);
    return {
      result,
      placed: [
        placedPrediction(result, fit.parameter, 'average environment', averageEnvironment(result.complex, fit.parameter, parents, fit.scatter)),
        placedPrediction(result, fit.parameter, 'factors', factors),
      ],
    };
  });
}
