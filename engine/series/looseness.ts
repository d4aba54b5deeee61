import type { FactorKind } from './factorTypes.ts';
import type { SeriesParameter } from './types.ts';

/**
 * Uncertainties above which a factor, or what factors predict, says nothing and is withheld: of ln g, ln f and ln Delta; of k, h and beta.
 * Far above what any comparison needs; they stop numbers that drift where hardly anything holds them. Common practice, no source.
 */
const ceilings: Readonly<Record<SeriesParameter, Readonly<Record<FactorKind | 'prediction', number>>>> = {
  Delta: { ion: 0.5, ligand: 0.5, prediction: 0.5 },
  beta: { ion: 0.25, ligand: 1, prediction: 0.25 },
};

/** true where an uncertainty in the scale of the model is too large for the number to say anything. */
export function isLoose(parameter: SeriesParameter, what: FactorKind | 'prediction', u: number): boolean {
  return !(u <= ceilings[parameter][what]);
}
