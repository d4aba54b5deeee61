import type { FreeIon } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { boundFor } from './bound.ts';
import { gatherItems } from './candidates.ts';
import type { Freedom, Item, NotFitted } from './candidates.ts';
import { bandEvidence, gatherEvidence, scoreOf } from './evidence.ts';
import { evidenceWeights } from './evidenceWeights.ts';
import { fitAssignment, isFit } from './fit.ts';
import type { Assigned, FitOutcome } from './fit.ts';
import { floorOf, transitionOf } from './transitions.ts';
import type { GroundCase } from './transitions.ts';
import type { Evidence, RatioUsed } from './types.ts';

/** One way to assign the bands, with what the fit made of it. */
export interface ScoredReading {
  readonly ion: GroundCase;
  readonly assigned: readonly Assigned[];
  /** Bands that stay out, with the reason. */
  readonly notFitted: readonly NotFitted[];
  readonly outcome: FitOutcome;
  readonly evidence: readonly Evidence[];
  /** chi2 + 2 x free parameters + evidence; infinite where no fit stands. Lower is better. */
  readonly score: number;
  readonly origin: 'typed' | 'proposed' | 'none';
}

/** Everything a search needs, gathered once. */
export interface SearchTask {
  readonly measurement: Measurement;
  readonly ion: GroundCase;
  readonly policy: Policy;
  readonly ratio: RatioUsed;
  readonly freeIon: FreeIon | null;
}

/** Readings that score worse than the best by more than this are not kept. */
export const keepWithin = 12;

/** How many of the best readings are wanted. */
export const readingsAtMost = 6;

/** A search stops after this many fits; no record of eight bands comes near. */
const fitsAtMost = 5000;

/** C0/B0 of the free ion, by which parents in typed labels are resolved. */
const parentRatioOf = (freeIon: FreeIon | null): number => (freeIon?.racahC0 ? freeIon.racahC0 / freeIon.racahB0 : 4.5);

interface Choice {
  readonly item: Item;
  readonly label: string | null;
}

function scored(task: SearchTask, choices: readonly Choice[], notFitted: readonly NotFitted[]): ScoredReading {
  const { measurement, ion, policy, ratio, freeIon } = task;
  const assigned: Assigned[] = [];
  const left = [...notFitted];
  let leftOver = 0;
  for (const { item, label } of choices) {
    if (label !== null) assigned.push({ label, observation: item.observation });
    else {
      if (item.leaveOut?.counts) leftOver++;
      for (const band of item.observation.bands) left.push({ band, reason: item.leaveOut?.reason ?? 'no transition is left for it' });
    }
  }
  assigned.sort((a, b) => a.observation.position - b.observation.position);
  const outcome = fitAssignment(ion, assigned, policy, ratio, freeIon);
  const legal = isFit(outcome) && keepsOrder(choices, assigned, outcome);
  const evidence = legal ? gatherEvidence(measurement, ion, assigned, leftOver, outcome, freeIon) : [];
  const origin = choices.length === 0 ? 'none' : choices.some(({ item }) => item.typed) ? 'typed' : 'proposed';
  return {
    ion, assigned, notFitted: left.sort((a, b) => a.band - b.band), outcome, evidence,
    score: legal ? scoreOf(evidence) : Number.POSITIVE_INFINITY, origin,
  };
}

/** Whether bands that the engine assigned keep the order of the calculated transitions. */
function keepsOrder(choices: readonly Choice[], assigned: readonly Assigned[], outcome: FitOutcome): boolean {
  if (!isFit(outcome)) return true;
  const open = new Set(choices.filter(({ item }) => item.candidates.length > 1).map(({ item }) => item.observation));
  let last = Number.NEGATIVE_INFINITY;
  return assigned.every(({ observation }, k) => {
    if (!open.has(observation)) return true;
    const calculated = outcome.calculated[k]!.energy;
    const keeps = calculated >= last - 1e-6;
    last = calculated;
    return keeps;
  });
}

/**
 * The best assignments of the bands within their candidates, at most `readingsAtMost` and within `keepWithin` of
 * the best score, each with its fit, best first.
 *
 * Depth first, broad bands before lines. A branch is cut where the least score it can reach lies beyond what is
 * kept: a lower bound of chi2 over the whole diagram (bound.ts), bands left over, and what a band's looks say
 * against its transition. Nothing within the bound is lost.
 *
 * @param known a score already reached elsewhere, against which `keepWithin` counts
 */
export function searchReadings(task: SearchTask, freedom: Freedom, known = Number.POSITIVE_INFINITY): readonly ScoredReading[] {
  const { measurement, ion, policy, ratio, freeIon } = task;
  const { items, notFitted } = gatherItems(measurement, ion, policy, parentRatioOf(freeIon), freedom);
  // Broad bands first: they fix Delta and B, against which lines are soon judged.
  const ordered = [...items].sort((a, b) => isLine(measurement, a) - isLine(measurement, b));
  const hasLines = ordered.some((item) => item.candidates.some((label) => !transitionOf(ion, label).spinAllowed));
  // With spin-forbidden bands C may become free, and with it every window that depends on it.
  const windowRatio = hasLines ? null : ratio.value;
  const bound = boundFor(ion, windowRatio);
  const found: ScoredReading[] = [];
  /** The best scores so far, ascending: nothing worse than the last of them is wanted. */
  const scores = Number.isFinite(known) ? [known] : [];
  let fits = 0;
  const chosen: Choice[] = [];

  const bandCost = (item: Item, label: string): number =>
    scoreOf(item.observation.bands.flatMap((index) => bandEvidence(ion, label, measurement.bands[index]!)));

  const cut = (): number => Math.min((scores[0] ?? Number.POSITIVE_INFINITY) + keepWithin, scores[readingsAtMost - 1] ?? Number.POSITIVE_INFINITY);

  const leaf = (): void => {
    fits++;
    const reading = scored(task, chosen, notFitted);
    found.push(reading);
    if (!Number.isFinite(reading.score)) return;
    scores.push(reading.score);
    scores.sort((a, b) => a - b);
    if (scores.length > readingsAtMost) scores.pop();
  };

  /** Everything the next item may be, with the sums and the least score that each leads to; the most promising first. */
  const branches = (item: Item, cost: number, sums: Float64Array | null) => {
    const next = item.candidates
      .filter((label) => label.includes('/') || !chosen.some((one) => one.label === label))
      .map((label) => {
        const { position, uMinus, uPlus } = item.observation;
        const variance = Math.max(uMinus, uPlus) ** 2 + floorOf(ion, label, policy) ** 2;
        const grown = bound.add(sums, label, position, variance);
        const paid = cost + bandCost(item, label);
        return { label: label as string | null, sums: grown as Float64Array | null, cost: paid, least: paid + bound.least(grown) };
      });
    if (item.leaveOut) {
      const paid = cost + (item.leaveOut.counts ? evidenceWeights.leftOver : 0);
      next.push({ label: null, sums, cost: paid, least: paid + bound.least(sums) });
    }
    return next.sort((a, b) => a.least - b.least);
  };

  const visit = (at: number, cost: number, sums: Float64Array | null): void => {
    if (at === ordered.length) {
      leaf();
      return;
    }
    const item = ordered[at]!;
    for (const branch of branches(item, cost, sums)) {
      if (fits >= fitsAtMost || branch.least > cut()) return;
      chosen.push({ item, label: branch.label });
      visit(at + 1, branch.cost, branch.sums);
      chosen.pop();
    }
  };
  visit(0, 0, null);
  // With nothing that fits, the reading that assigns most bands tells most about why.
  found.sort((a, b) => compareScores(a.score, b.score) || b.assigned.length - a.assigned.length);
  return found.filter((reading, i) => i === 0 || reading.score <= cut());
}

function isLine(measurement: Measurement, item: Item): number {
  return item.observation.bands.some((index) => measurement.bands[index]!.kind === 'line') ? 1 : 0;
}

function compareScores(a: number, b: number): number {
  return a === b ? 0 : a < b ? -1 : 1;
}
