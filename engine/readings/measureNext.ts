import { shownLabel } from '../levels/labels.ts';
import { inversePositive } from '../linear/solveSymmetric.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Policy } from '../policy/types.ts';
import { helpfulBandSentence } from '../words/measureNext.ts';
import type { Gain } from '../words/measureNext.ts';
import type { ParameterName } from '../words/types.ts';
import { transitionsAt } from './evaluate.ts';
import type { Assigned, Fit } from './fitTypes.ts';
import { floorOf, transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { HelpfulBand, Parameter, PredictedBand } from './types.ts';

/** How well a further broad band, and a further line, would be read, cm-1. */
const readBroad = 80;
const readLine = 15;

/** A number counts as helped where less than this fraction of its uncertainty is left. */
const worthwhile = 0.8;
const listedAtMost = 4;
/** What fixing a withheld number is worth, against the logarithm of a smaller uncertainty. */
const fixesANumber = 3;

type Normal = number[][];

/** Weighted normal equations in (Delta, B, C), scaled by the parameters: bands of the fit and, unless C is to be free, what was assumed. */
function normalOf(assigned: readonly Assigned[], fit: Fit, cFree: boolean): Normal {
  const { at } = fit.solutions[0]!;
  const sizes = [at.delta, at.racahB, at.racahC];
  const normal: Normal = [[0, 0, 0], [0, 0, 0], [0, 0, 0]];
  assigned.forEach(({ observation }, k) => {
    if (!fit.used[k]) return;
    const { delta, racahB, racahC } = fit.calculated[k]!.gradient;
    addRow(normal, [delta, racahB, racahC], sizes, 1 / (symmetricU(observation) ** 2 + fit.floors[k]! ** 2));
  });
  if (fit.mode !== 'field, B, C' && !cFree) {
    // What was assumed enters as one more datum, C/B; a floor on its u keeps an exact ratio finite.
    const u = Math.max(fit.ratio.u, 1e-6 * fit.ratio.value);
    addRow(normal, [0, -at.racahC / at.racahB ** 2, 1 / at.racahB], sizes, 1 / u ** 2);
  }
  return normal;
}

function addRow(normal: Normal, slopes: readonly number[], sizes: readonly number[], weight: number): void {
  for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) normal[i]![j]! += weight * slopes[i]! * sizes[i]! * slopes[j]! * sizes[j]!;
}

/**
 * Unobserved bands ranked by how much they would shrink u(B), u(C) and u(Delta), most helpful first.
 *
 * Each is added to the weighted normal equations at the present solution with its own model floor; the assumed
 * C/B counts as a datum with its own uncertainty. As in the fit, a line helps where C becomes free and determined with it, or where
 * nothing else tells of B.
 */
export function helpfulBands(
  ion: GroundCase, assigned: readonly Assigned[], fit: Fit, parameters: readonly Parameter[], predicted: readonly PredictedBand[], policy: Policy,
): readonly HelpfulBand[] {
  const { at, ground } = fit.solutions[0]!;
  if (at.racahB <= 0) return [];
  const sizes = [at.delta, at.racahB, at.racahC];
  const ceilings = [policy.ceilings.delta, policy.ceilings.racahB, policy.ceilings.racahC];
  const now = parameters.slice(0, 3).map((parameter) => parameter.uTotal);
  const found = predicted.flatMap((band) => {
    const { sameConfiguration, spinAllowed } = transitionOf(ion, band.label);
    // Broad spin-forbidden bands are hardly ever seen under spin-allowed ones.
    if (!spinAllowed && !sameConfiguration) return [];
    const { gradient } = transitionsAt(ion, ground, [band.label], at)[0]!;
    const weight = 1 / ((spinAllowed ? readBroad : readLine) ** 2 + floorOf(ion, band.label, policy) ** 2);
    const uWith = (cFree: boolean): number[] | null => {
      const more = normalOf(assigned, fit, cFree);
      addRow(more, [gradient.delta, gradient.racahB, gradient.racahC], sizes, weight);
      return inversePositive(more)?.map((row, i) => Math.sqrt(row[i]!) * sizes[i]!) ?? null;
    };
    const free = uWith(true);
    const cIsFixed = (!spinAllowed || fit.mode === 'field, B, C') && free !== null && free[2]! <= ceilings[2]! * sizes[2]!;
    if (!spinAllowed && !cIsFixed && fit.mode !== 'field') return [];
    const then = cIsFixed ? free : uWith(false);
    if (!then) return [];
    const gains = (['Delta', 'B', 'C'] as const).flatMap((parameter: ParameterName, i): Gain[] => {
      const before = now[i] ?? null;
      const publishable = then[i]! <= ceilings[i]! * sizes[i]! && (i < 2 || cIsFixed);
      return publishable && (before === null || then[i]! < worthwhile * before) ? [{ parameter, uNow: before, uThen: then[i]! }] : [];
    });
    if (gains.length === 0) return [];
    const low = roundTo(band.position - 2 * band.u);
    const high = roundTo(band.position + 2 * band.u);
    const worth = gains.reduce((sum, gain) => sum + Math.log((gain.uNow ?? gain.uThen) / gain.uThen) + (gain.uNow === null ? fixesANumber : 0), 0);
    return [{ worth, band: { label: band.label, low, high, gains, sentence: helpfulBandSentence(shownLabel(band.label, ion.electrons), low, high, gains) } }];
  });
  return found.sort((a, b) => b.worth - a.worth).slice(0, listedAtMost).map((entry) => entry.band);
}

const roundTo = (value: number): number => Math.max(0, Math.round(value / 100) * 100);
