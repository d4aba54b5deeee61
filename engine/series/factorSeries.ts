import { toModelScale } from './factorModel.ts';
import type { Factor, FactorFit, FactorKind } from './factorTypes.ts';
import { distinguishableAbove } from './difference.ts';
import { runsAlike } from './groups.ts';
import type { IndistinguishableGroup } from './groups.ts';

/** Factors of one kind in one island, with the runs of neighbours of which no two can be told apart. */
export interface FactorSeries {
  readonly kind: FactorKind;
  /** Counted from 1. */
  readonly island: number;
  /** Those that have a value, ascending; where equal by name. */
  readonly factors: readonly Factor[];
  readonly groups: readonly IndistinguishableGroup[];
}

/**
 * The factors of a fit in their orders: ions and ligands apart, islands apart. Two factors can be told apart where their difference in
 * the scale of the model (ln f, ln g; h, k) exceeds 2 u of that difference, their covariance included: factors of one fit lean on common
 * complexes, so that u of each alone would say too little or too much.
 */
export function factorSeries(fit: FactorFit): readonly FactorSeries[] {
  return fit.islands.flatMap((island) => (['ligand', 'ion'] as const).map((kind): FactorSeries => {
    const factors = fit.factors.filter((one) => one.kind === kind && one.island === island.number && one.value !== null)
      .sort((a, b) => a.value! - b.value! || (a.name < b.name ? -1 : 1));
    const { names, covariance } = island.solution;
    const places = factors.map(({ name }) => names.findIndex((one) => one.kind === kind && one.name === name));
    // The ligand that is set to 1 has no place among the unknowns and no uncertainty.
    const shared = (i: number, j: number): number => (places[i] === -1 || places[j] === -1 ? 0 : covariance[places[i]!]![places[j]!]!);
    const scaled = factors.map(({ value, u }) => toModelScale(fit.parameter, value!, u!).value);
    const alike = (i: number, j: number): boolean =>
      Math.abs(scaled[i]! - scaled[j]!) <= distinguishableAbove * Math.sqrt(Math.max(0, shared(i, i) + shared(j, j) - 2 * shared(i, j)));
    return { kind, island: island.number, factors, groups: runsAlike(factors.length, alike) };
  })).filter(({ factors }) => factors.length > 0);
}
