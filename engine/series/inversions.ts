import type { Policy } from '../policy/types.ts';
import type { Comparable } from './comparable.ts';
import { difference } from './difference.ts';
import type { Difference } from './difference.ts';
import { compositionOfComplex } from './factorModel.ts';
import type { FactorFit } from './factorTypes.ts';
import type { ComplexIdentity, SeriesResult } from './types.ts';

/** Two complexes of one ion that stand the other way round than the pooled order of their ligands. */
export interface Inversion {
  /** Higher in the series than the pooled order has it. */
  readonly higher: SeriesResult;
  readonly lower: SeriesResult;
  /** higher less lower. */
  readonly difference: Difference;
  /** By how much the pooled order puts `lower` above, as a ratio of average f less 1, or as a difference of average h. */
  readonly pooled: number;
}

/**
 * What a fit's ligand factors say of a complex's place among those of its ion: the average of f, or of h over the donor atoms.
 * null where a ligand has no factor in one island with the others.
 */
export function averageFactor(fit: FactorFit, complex: ComplexIdentity): number | null {
  let sum = 0;
  let island: number | null = null;
  for (const { ligand, share } of compositionOfComplex(complex).shares) {
    const factor = fit.factors.find((one) => one.kind === 'ligand' && one.name === ligand);
    if (factor === undefined || factor.value === null || (island !== null && factor.island !== island)) return null;
    island = factor.island;
    sum += share * factor.value;
  }
  return sum;
}

/**
 * Pairs of a series that stand against the pooled order of the ligands, the surest first. Delta rises with the average of f, beta falls with
 * that of h. Each carries the uncertainty of its own difference: below 2 u the pair cannot be told apart and its order says nothing.
 *
 * @param series complexes of one ion in one geometry and spin
 * @param fit the factors of the same parameter and geometry
 */
export function inversions(series: Pick<Comparable, 'members' | 'parameter'>, fit: FactorFit, floor: Policy['differentialFloor']): readonly Inversion[] {
  const { parameter } = series;
  const placed = series.members.flatMap((member) => {
    const average = averageFactor(fit, member.complex);
    return average === null ? [] : [{ member, average }];
  });
  const found: Inversion[] = [];
  // Members ascend by value, so the second of a pair is the higher.
  placed.forEach((lower, i) => {
    for (const higher of placed.slice(i + 1)) {
      const pooled = parameter === 'Delta' ? lower.average / higher.average - 1 : higher.average - lower.average;
      const measured = difference(higher.member, lower.member, parameter, floor);
      if (pooled > 1e-12 && measured !== null && measured.value > 0) found.push({ higher: higher.member, lower: lower.member, difference: measured, pooled });
    }
  });
  return found.sort((a, b) => b.difference.z - a.difference.z);
}
