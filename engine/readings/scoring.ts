import type { FreeIon } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import type { Item, NotFitted } from './candidates.ts';
import { gatherEvidence, scoreOf } from './evidence.ts';
import { fitAssignment } from './fit.ts';
import { isFit } from './fitTypes.ts';
import type { Assigned, FitOutcome } from './fitTypes.ts';
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

/** What one band, or merged components, is taken for; null: it stays out. */
export interface Choice {
  readonly item: Item;
  readonly label: string | null;
}

/** Fits one way to assign the bands and gathers what speaks against it. */
export function scoreChoices(task: SearchTask, choices: readonly Choice[], notFitted: readonly NotFitted[]): ScoredReading {
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
