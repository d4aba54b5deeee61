import type { FreeIon } from '../ions/types.ts';
import type { Policy } from '../policy/types.ts';
import { symmetricU } from '../measurement/observation.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import { fitAssignment } from './fit.ts';
import { fitFieldAndB } from './fitTwo.ts';
import { isFit } from './fitTypes.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import type { GroundCase } from './transitions.ts';
import type { LeftOut, PairAlone, RatioUsed, Stress } from './types.ts';

/** A table of more pairs than this says nothing a reader could take in. */
const pairsAtMost = 15;

/**
 * Each pair of bands alone, and each band left out.
 *
 * Where C was fitted, a pair holds C/B at the fitted value, so that it is two equations for two unknowns. With one band left
 * out the others must fix the same numbers as before: C is fitted anew where it was fitted, for a C/B that the band itself
 * helped to find would only give the band back.
 */
export function stressOf(ion: GroundCase, assigned: readonly Assigned[], fit: Fit, policy: Policy, freeIon: FreeIon | null): Stress {
  const used = assigned.filter((_, k) => fit.used[k]);
  if (used.length < 2 || fit.mode === 'field' || fit.mode === 'field, B assumed') return { pairs: [], leftOut: [] };
  const held: RatioUsed = { ...fit.ratio, u: 0 };
  const heldPolicy: Policy = { ...policy, ceilings: { ...policy.ceilings, racahC: 0 } };
  const pairs: PairAlone[] = [];
  if (used.length > 2)
    for (let i = 0; i < used.length; i++)
      for (let j = i + 1; j < used.length && pairs.length < pairsAtMost; j++) {
        const pair = [used[i]!, used[j]!];
        const bands = [assigned.indexOf(pair[0]!), assigned.indexOf(pair[1]!)] as const;
        const alone = fitFieldAndB({ ion, ground: fit.solutions[0]!.ground, assigned: pair, floors: bands.map((k) => fit.floors[k]!), policy, ratio: held, freeIon }, [0, 1], 'field, B');
        pairs.push({ labels: [pair[0]!.label, pair[1]!.label], bands, at: isFit(alone) ? alone.solutions[0]!.at : null });
      }
  const without = (band: Assigned): Fit | null => {
    const others = fitAssignment(ion, used.filter((one) => one !== band), fit.mode === 'field, B, C' ? policy : heldPolicy, fit.ratio, freeIon);
    return isFit(others) && others.mode === fit.mode && others.used.every(Boolean) ? others : null;
  };
  const leftOut = used.length < 3 ? [] : used.map((band) => leaveOut(ion, band, assigned.indexOf(band), without(band), fit.floors));
  return { pairs, leftOut };
}

function leaveOut(ion: GroundCase, { label, observation }: Assigned, band: number, fit: Fit | null, floors: readonly number[]): LeftOut {
  if (!fit) return { label, band, at: null, predicted: null, z: null };
  const { at, ground } = fit.solutions[0]!;
  const { energy, gradient } = transitionsAt(ion, ground, [label], at)[0]!;
  const variance = quadratic([gradient.delta, gradient.racahB, gradient.racahC], fit.total) + floors[band]! ** 2 + symmetricU(observation) ** 2;
  return { label, band, at, predicted: energy, z: (observation.position - energy) / Math.sqrt(variance) };
}
