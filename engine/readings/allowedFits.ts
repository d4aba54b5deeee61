import { misfitOfOne, predictionOf } from './comparedLines.ts';
import type { Prediction } from './comparedLines.ts';
import { scoreOf } from './evidence.ts';
import { isFit } from './fitTypes.ts';
import { scoreChoices } from './scoring.ts';
import type { Choice, ScoredReading, SearchTask } from './scoring.ts';
import { floorOf, transitionOf } from './transitions.ts';

/** Evidence that no further band can take away. */
const lasting = new Set(['misfit', 'parameters', 'beta']);

interface Base {
  readonly reading: ScoredReading;
  readonly cost: number;
  readonly predictions: Map<string, Prediction>;
}

/**
 * The least misfit and parameters' cost of choices in which only the spin-allowed bands are fitted and the others compared
 * with that fit; infinite where the spin-allowed ones have none. Choices that differ in spin-forbidden bands share one fit.
 */
export function fitsOfAllowed(task: SearchTask): (choices: readonly Choice[]) => number {
  const { ion, policy } = task;
  const known = new Map<string, Base>();
  return (choices) => {
    const allowed = choices.filter(({ label }) => label !== null && transitionOf(ion, label).spinAllowed);
    const key = allowed.map(({ item, label }) => `${label}@${item.observation.bands.join('+')}`).join(' ');
    let base = known.get(key);
    if (!base) {
      const reading = scoreChoices(task, allowed, []);
      base = { reading, cost: scoreOf(reading.evidence.filter((one) => lasting.has(one.code))), predictions: new Map() };
      known.set(key, base);
    }
    const { reading, predictions } = base;
    if (!isFit(reading.outcome)) return Number.POSITIVE_INFINITY;
    let sum = base.cost;
    for (const { item, label } of choices) {
      if (label === null || transitionOf(ion, label).spinAllowed) continue;
      let prediction = predictions.get(label);
      if (!prediction) {
        prediction = predictionOf(ion, reading.outcome, label);
        predictions.set(label, prediction);
      }
      sum += misfitOfOne(item.observation, floorOf(ion, label, policy), prediction);
    }
    return sum;
  };
}
