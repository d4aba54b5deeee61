import type { Policy } from '../policy/types.ts';
import type { Comparable } from './comparable.ts';
import { difference, distinguishableAbove, zOf } from './difference.ts';
import type { Difference } from './difference.ts';
import { compositionOfComplex } from './factorModel.ts';
import type { Factor, FactorFit } from './factorTypes.ts';
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
  /** One standard uncertainty of `pooled`: the ligand factors', their covariance included. */
  readonly uPooled: number;
  readonly zPooled: number;
  /** The smaller of the z of the difference and of the pooled order: an order is contradicted no more surely than it is known itself. */
  readonly z: number;
  readonly distinguishable: boolean;
}

const factorOf = (fit: FactorFit, ligand: string): Factor | undefined => fit.factors.find((one) => one.kind === 'ligand' && one.name === ligand);

/**
 * What a fit's ligand factors say of a complex's place among those of its ion: the average of f, or of h over the donor atoms.
 * null where a ligand has no factor in one island with the others.
 */
export function averageFactor(fit: FactorFit, complex: ComplexIdentity): number | null {
  let sum = 0;
  let island: number | null = null;
  for (const { ligand, share } of compositionOfComplex(complex).shares) {
    const factor = factorOf(fit, ligand);
    if (factor === undefined || factor.value === null || (island !== null && factor.island !== island)) return null;
    island = factor.island;
    sum += share * factor.value;
  }
  return sum;
}

/** u of the pooled order of two complexes whose ligands all have factors: of the ratio of average f, or of the difference of average h. */
function pooledUncertainty(fit: FactorFit, higher: ComplexIdentity, lower: ComplexIdentity): number {
  const slopes = new Map<string, number>();
  for (const [complex, sign] of [[lower, 1], [higher, -1]] as const) {
    const average = averageFactor(fit, complex)!;
    for (const { ligand, share } of compositionOfComplex(complex).shares) {
      // The unknowns are ln f and h: d(a/b)/(a/b) = da/a - db/b, with da = share f d(ln f).
      const slope = fit.parameter === 'Delta' ? (share * factorOf(fit, ligand)!.value!) / average : -share;
      slopes.set(ligand, (slopes.get(ligand) ?? 0) + sign * slope);
    }
  }
  const [first] = slopes.keys();
  const { names, covariance } = fit.islands.find(({ number }) => number === factorOf(fit, first!)!.island)!.solution;
  const places = names.flatMap(({ kind, name }, place) => (kind === 'ligand' && slopes.has(name) ? [{ place, slope: slopes.get(name)! }] : []));
  const variance = places.reduce((sum, a) => sum + places.reduce((inner, b) => inner + a.slope * b.slope * covariance[a.place]![b.place]!, 0), 0);
  return (fit.parameter === 'Delta' ? averageFactor(fit, lower)! / averageFactor(fit, higher)! : 1) * Math.sqrt(Math.max(0, variance));
}

/**
 * Pairs of a series that stand against the pooled order of the ligands, the surest first. Delta rises with the average of f, beta falls with
 * that of h. Each carries the uncertainty of its own difference and that of the pooled order: where either is below 2 u, the pair
 * contradicts nothing.
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
      if (pooled <= 1e-12 || measured === null || measured.value <= 0) continue;
      const uPooled = pooledUncertainty(fit, higher.member.complex, lower.member.complex);
      const zPooled = zOf(pooled, uPooled);
      const z = Math.min(measured.z, zPooled);
      found.push({ higher: higher.member, lower: lower.member, difference: measured, pooled, uPooled, zPooled, z, distinguishable: z > distinguishableAbove });
    }
  });
  return found.sort((a, b) => b.z - a.z);
}
