import { shownLabel } from '../levels/labels.ts';
import { inversePositive } from '../linear/solveSymmetric.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Policy } from '../policy/types.ts';
import { transitionsAt } from './evaluate.ts';
import type { Assigned, Fit } from './fit.ts';
import { floorOf, transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { PredictedBand } from './types.ts';
import { helpfulBandSentence } from '../words/measureNext.ts';

/** How well a further maximum would be read, cm-1. */
const readTo = 80;

/** A band that leaves more than this fraction of u(B) does not help. */
const worthwhile = 0.8;

/**
 * The unobserved spin-allowed band that would shrink u(B) most, in words; null where none would.
 *
 * Each candidate is added to the weighted normal equations in (Delta, B) at the present solution, with its
 * own model floor and a reading of 80 cm-1.
 */
export function measureNext(ion: GroundCase, assigned: readonly Assigned[], fit: Fit, predicted: readonly PredictedBand[], policy: Policy): string | null {
  const { at, ground } = fit.solutions[0]!;
  if (at.racahB <= 0 || fit.mode === 'field, B, C') return null;
  const row = (label: string, u: number): { slopes: [number, number]; weight: number } => {
    const { gradient } = transitionsAt(ion, ground, [label], at)[0]!;
    return { slopes: [gradient.delta, gradient.racahB + fit.ratio.value * gradient.racahC], weight: 1 / (u ** 2 + floorOf(ion, label, policy) ** 2) };
  };
  const present = assigned.filter((_, k) => fit.used[k]).map((one) => row(one.label, symmetricU(one.observation)));
  const uNow = fit.mode === 'field, B' ? Math.sqrt(fit.total[1]![1]!) : null;
  let best: { band: PredictedBand; uThen: number } | null = null;
  for (const band of predicted) {
    if (!band.spinAllowed || !transitionOf(ion, band.label).spinAllowed) continue;
    const rows = [...present, row(band.label, readTo)];
    const normal = [0, 1].map((i) => [0, 1].map((j) => rows.reduce((sum, r) => sum + r.weight * r.slopes[i]! * r.slopes[j]! * (i === 0 ? at.delta : at.racahB) * (j === 0 ? at.delta : at.racahB), 0)));
    const spread = inversePositive(normal);
    if (!spread) continue;
    const uThen = Math.sqrt(spread[1]![1]!) * at.racahB;
    if (!best || uThen < best.uThen) best = { band, uThen };
  }
  if (!best || best.uThen > policy.ceilings.racahB * at.racahB || (uNow !== null && best.uThen > worthwhile * uNow)) return null;
  const { band, uThen } = best;
  return helpfulBandSentence({
    label: shownLabel(band.label, ion.electrons), low: roundTo(band.position - 2 * band.u), high: roundTo(band.position + 2 * band.u),
    parameter: 'B', uNow, uThen,
  });
}

const roundTo = (value: number): number => Math.max(0, Math.round(value / 100) * 100);
