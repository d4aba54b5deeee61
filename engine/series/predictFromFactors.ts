import { noFactorPrediction } from '../words/factors.ts';
import { compositionOfComplex, factorModel, fromModelScale } from './factorModel.ts';
import type { FactorFit, FactorPrediction } from './factorTypes.ts';
import { isFixed } from './identifiable.ts';
import { ionWords } from './identity.ts';
import { isLoose } from './looseness.ts';
import { effectiveDegrees } from './student.ts';
import type { ComplexIdentity, SeriesParameter } from './types.ts';

/** A prediction, or the reason why there is none. */
export type Predicted = FactorPrediction | { readonly reason: string };

export const isPrediction = (predicted: Predicted): predicted is FactorPrediction => 'predicted' in predicted;

/**
 * A prediction, unless it is a beta at or below 0: beta = 1 - k h is linear, so factors from few complexes carried far leave what a
 * B in a complex can be. Delta, fitted by its logarithm, is always above 0.
 */
export function possiblePrediction<T extends FactorPrediction>(parameter: SeriesParameter, prediction: T): T | { readonly reason: string } {
  return parameter === 'beta' && prediction.predicted <= 0 ? { reason: noFactorPrediction.notPositive } : prediction;
}

/**
 * Delta or beta of a complex from the factors of a fit, with the uncertainty of the factors (their correlations included) and of the
 * residual scatter. The complex's own measurements must not be in the fit.
 *
 * @returns the reason in words where an ion or ligand has no factor, where they stand in different islands, where the fit
 * leaves the product open, and where it gives a beta at or below 0
 */
export function predictFromFactors(fit: FactorFit, complex: ComplexIdentity): Predicted {
  if (complex.geometry !== fit.geometry) return { reason: noFactorPrediction.geometry(complex.geometryName) };
  const { ion, shares } = compositionOfComplex(complex);
  const island = fit.islands.find(({ ions }) => ions.includes(ion));
  if (island === undefined) return { reason: noFactorPrediction.ionUnknown(ionWords(complex)) };
  const unseen = shares.map(({ ligand }) => ligand).filter((ligand) => !fit.islands.some(({ ligands }) => ligands.includes(ligand)));
  if (unseen.length > 0) return { reason: noFactorPrediction.ligandUnknown(unseen) };
  if (!shares.every(({ ligand }) => island.ligands.includes(ligand))) return { reason: noFactorPrediction.islands };
  const { names, values, covariance, open, scale } = island.solution;
  const placeOf = (kind: 'ion' | 'ligand', name: string): number => names.findIndex((one) => one.kind === kind && one.name === name);
  const { value, places, derivatives } = factorModel(fit.parameter, {
    ion: placeOf('ion', ion), ligands: Int32Array.from(shares, ({ ligand }) => placeOf('ligand', ligand)), shares: Float64Array.from(shares, ({ share }) => share),
  }, Float64Array.from(values));
  const all = new Array<number>(names.length).fill(0);
  places.forEach((place, i) => { all[place]! += derivatives[i]!; });
  if (!isFixed(all, { open, scale })) return { reason: noFactorPrediction.open };
  let variance = fit.scatter.value ** 2;
  for (const a of places) for (const b of places) variance += all[a]! * all[b]! * covariance[a]![b]!;
  if (isLoose(fit.parameter, 'prediction', Math.sqrt(variance))) return { reason: noFactorPrediction.loose };
  const scaled = fromModelScale(fit.parameter, value, Math.sqrt(variance));
  const { standing, share, spare } = fit.scatter;
  return possiblePrediction(fit.parameter, { predicted: scaled.value, u: scaled.u, degrees: standing === 'fitted' ? effectiveDegrees(share, spare) : null });
}
