import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import type { Range } from '../quantity/range.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import { floorOf, transitionsOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { PredictedBand } from './types.ts';

/** Nothing above this is predicted: charge transfer hides it in every complex. */
const highestPredicted = 50_000;

/** How many spin-forbidden bands are listed, lowest first. */
const forbiddenAtMost = 6;

const covers = (ranges: readonly Range[], position: number): boolean => ranges.some((range) => position >= range.low && position <= range.high);

/**
 * Transitions that no band was assigned to, ascending: every spin-allowed one below 50 000 cm-1 and the
 * lowest spin-forbidden ones, with u^2 = j' cov j + tau^2.
 */
export function predictedBands(measurement: Measurement, ion: GroundCase, assigned: readonly Assigned[], fit: Fit, policy: Policy): readonly PredictedBand[] {
  // Without a B, assumed or fitted, nothing but Delta can be said.
  const { at, ground } = fit.solutions[0]!;
  if (at.racahB <= 0) return [];
  const open = transitionsOf(ion).filter((transition) => !assigned.some((one) => one.label === transition.label));
  const found = transitionsAt(ion, ground, open.map((transition) => transition.label), at).map(({ energy, gradient }, i): PredictedBand => {
    const { label, spinAllowed } = open[i]!;
    const variance = quadratic([gradient.delta, gradient.racahB, gradient.racahC], fit.total) + floorOf(ion, label, policy) ** 2;
    const looked = measurement.scanned.length === 0 ? 'not recorded' : covers(measurement.scanned, energy) ? 'inside' : 'outside';
    return { label, position: energy, u: Math.sqrt(variance), spinAllowed, looked };
  });
  const inReach = found.filter((band) => band.position > 0 && band.position < highestPredicted).sort((a, b) => a.position - b.position);
  const forbidden = inReach.filter((band) => !band.spinAllowed).slice(0, forbiddenAtMost);
  return inReach.filter((band) => band.spinAllowed || forbidden.includes(band));
}
