import { symmetricU } from '../measurement/observation.ts';
import type { Addition } from './bound.ts';
import type { Item } from './candidates.ts';
import { bandEvidence, scoreOf } from './evidence.ts';
import { evidenceWeights } from './evidenceWeights.ts';
import type { SearchTask } from './scoring.ts';
import { floorOf, transitionOf } from './transitions.ts';

/** One transition that an item may be, with what its looks say against it. */
export interface Way {
  readonly band: Addition;
  readonly cost: number;
}

/** One band, or merged components, with every transition that it may be. */
export interface OpenItem {
  readonly item: Item;
  readonly ways: readonly Way[];
}

/** The items in the order in which a search takes them: broad bands first, for they fix Delta and B, against which lines are soon judged. */
export function openItems(task: SearchTask, items: readonly Item[]): readonly OpenItem[] {
  const lines = items.filter((item) => isLine(task, item));
  return [...items.filter((item) => !lines.includes(item)), ...lines].map((item) => ({ item, ways: waysOf(task, item) }));
}

const isLine = ({ measurement }: SearchTask, { observation }: Item): boolean => observation.bands.some((index) => measurement.bands[index]!.kind === 'line');

function waysOf({ ion, measurement, policy }: SearchTask, { observation, candidates }: Item): readonly Way[] {
  return candidates.map((label) => {
    const { position, uMinus, uPlus } = observation;
    const variance = Math.max(uMinus, uPlus) ** 2 + floorOf(ion, label, policy) ** 2;
    const { spinAllowed } = transitionOf(ion, label);
    return {
      band: { label, position, variance, spinAllowed, forgiven: (2 * symmetricU(observation) ** 2) / variance, keepsOrder: candidates.length > 1 },
      cost: scoreOf(observation.bands.flatMap((index) => bandEvidence(ion, label, measurement.bands[index]!))),
    };
  });
}

/** Whether two bands cannot be given these transitions at once: one transition is one band, but both of the d5 pair may be seen. */
export const excludes = (one: Addition, other: Addition): boolean => one.label === other.label && !one.label.includes('/');

/** What it costs at least that fewer transitions are left than bands from a place on, by what is given to one band more (null: none). */
export function leastLeftOver(open: readonly OpenItem[], from: number, bands: readonly Addition[]): (next: Addition | null) => number {
  let counted = 0;
  const labels = new Set<string>();
  for (let at = from; at < open.length; at++) {
    const { item, ways } = open[at]!;
    if (item.leaveOut?.counts) counted++;
    for (const { band } of ways) {
      // The pair takes any number of bands.
      if (band.label.includes('/')) return () => 0;
      labels.add(band.label);
    }
  }
  for (const { label } of bands) labels.delete(label);
  return (next) => evidenceWeights.leftOver * Math.max(0, counted - labels.size + (next && labels.has(next.label) ? 1 : 0));
}

/** Whether the items from each place on all lie above those before it and keep the order. */
export function sequences(open: readonly OpenItem[]): readonly boolean[] {
  const position = ({ item }: OpenItem): number => item.observation.position;
  return open.map((_, at) => {
    const highest = Math.max(...open.slice(0, at).map(position));
    return open.slice(at).every((one) => one.item.candidates.length > 1 && position(one) > highest);
  });
}
