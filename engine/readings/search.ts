import type { FreeIon } from '../ions/types.ts';
import { symmetricU } from '../measurement/observation.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { boundFor } from './bound.ts';
import type { Addition, BoundNode } from './bound.ts';
import { gatherItems } from './candidates.ts';
import type { Freedom, Item, NotFitted } from './candidates.ts';
import { bandEvidence, expectedTransitions, gatherEvidence, scoreOf } from './evidence.ts';
import { misfitOfOne, predictionOf } from './comparedLines.ts';
import type { Prediction } from './comparedLines.ts';
import { evidenceWeights } from './evidenceWeights.ts';
import { fitAssignment, isFit } from './fit.ts';
import type { Assigned, FitOutcome } from './fit.ts';
import { leastWithGaps } from './gaps.ts';
import type { WithGaps } from './gaps.ts';
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

/** What one band, or merged components, is taken for; null: it stays out. */
export interface Choice {
  readonly item: Item;
  readonly label: string | null;
}

export function scored(task: SearchTask, choices: readonly Choice[], notFitted: readonly NotFitted[]): ScoredReading {
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
 * kept: a lower bound of misfit and parameters over the whole diagram (bound.ts), bands left over, and what a band's
 * looks say against its transition. Nothing within the bound is lost.
 *
 * @param known a score already reached elsewhere, against which `keepWithin` counts
 */
export function searchReadings(task: SearchTask, freedom: Freedom, known = Number.POSITIVE_INFINITY): readonly ScoredReading[] {
  const { measurement, ion, policy, ratio, freeIon } = task;
  const { items, notFitted } = gatherItems(measurement, ion, policy, parentRatioOf(freeIon), freedom);
  // Broad bands first: they fix Delta and B, against which lines are soon judged.
  const ordered = [...items].sort((a, b) => isLine(measurement, a) - isLine(measurement, b)).map((item) => ({ item, ways: waysOf(task, item) }));
  const transitions = ordered.flatMap(({ item }) => item.candidates.map((label) => transitionOf(ion, label)));
  const bound = boundFor(ion, ratio, transitions.some((one) => !one.spinAllowed), transitions.some((one) => one.spinAllowed), freeIon);
  const leastOfAllowed = fitsOfAllowed(task);
  const withRatioAssumed: SearchTask = { ...task, policy: { ...policy, cFitted: false } };
  const found: ScoredReading[] = [];
  /** The best scores so far, ascending: nothing worse than the last of them is wanted. */
  const scores = Number.isFinite(known) ? [known] : [];
  let fits = 0;
  const chosen: Choice[] = [];
  const bands: Addition[] = [];
  /** Whether the items from here on lie above all before and keep the order. */
  const isSequence = ordered.map((_, at) => ordered.slice(at).every(({ item }) => item.candidates.length > 1 && ordered.slice(0, at).every((earlier) => earlier.item.observation.position < item.observation.position)));
  const expected = expectedTransitions(ion).map((transition) => transition.label);

  const cut = (): number => Math.min((scores[0] ?? Number.POSITIVE_INFINITY) + keepWithin, scores[readingsAtMost - 1] ?? Number.POSITIVE_INFINITY);

  /** The bounds of what is assigned with what its skipped transitions add. */
  const withGaps = (node: BoundNode, limit: number): WithGaps => {
    const skipped = expected.filter((label) => !bands.some((band) => band.label === label));
    // One or two bands may be fitted by one of them alone, which then tells nothing of the other.
    if (skipped.length === 0 || bands.length < 3 || !Number.isFinite(limit)) return { ofAll: node.leastOfAll, ofSome: node.least };
    const lowest = bands.reduce((least, band) => (band.position < least.position ? band : least));
    const highest = bands.reduce((most, band) => (band.position > most.position ? band : most));
    return leastWithGaps(bound.cells, node, lowest, highest, skipped, limit);
  };

  const leaf = (cost: number, node: BoundNode): void => {
    if (mayBeCut(node) && cost + withGaps(node, cut() - cost).ofAll > cut()) {
      // No fit of all bands comes near; only one that leaves the spin-forbidden ones out might.
      if (node.allowed === node.assigned || cost + leastOfAllowed(chosen) > cut() || scored(withRatioAssumed, chosen, notFitted).score > cut()) return;
    }
    fits++;
    const reading = scored(task, chosen, notFitted);
    found.push(reading);
    if (!Number.isFinite(reading.score)) return;
    scores.push(reading.score);
    scores.sort((a, b) => a - b);
    if (scores.length > readingsAtMost) scores.pop();
  };

  /** Everything the next item may be, with the least score that each leads to; the most promising first. */
  const branches = (at: number, cost: number, node: BoundNode): Branch[] => {
    const { item, ways } = ordered[at]!;
    const next: Branch[] = [];
    const add = (band: Addition | null, paid: number): void => {
      const later = leastLeftOver(ordered, at + 1, bands, band);
      const grown = band ? bound.add(node, band, cut() - paid - later) : node;
      if (grown.cells.length > 0) next.push({ band, node: grown, cost: paid, least: paid + later + grown.least, promise: paid + later + grown.leastOfAll });
    };
    for (const { band, cost: ofLooks } of ways) if (!bands.some((one) => excludes(one, band))) add(band, cost + ofLooks);
    if (item.leaveOut) add(null, cost + (item.leaveOut.counts ? evidenceWeights.leftOver : 0));
    return next.sort((a, b) => a.promise - b.promise || a.least - b.least);
  };

  const visit = (at: number, cost: number, node: BoundNode): void => {
    const next = ordered[at];
    if (!next) {
      leaf(cost, node);
      return;
    }
    if (isSequence[at] && bands.length > 0) {
      const { ofAll, ofSome } = withGaps(node, cut() - cost);
      if (cost + Math.min(ofAll, ofSome) > cut()) return;
    }
    for (const branch of branches(at, cost, node)) {
      if (fits >= fitsAtMost) return;
      if (branch.least > cut()) continue;
      chosen.push({ item: next.item, label: branch.band?.label ?? null });
      if (branch.band) bands.push(branch.band);
      visit(at + 1, branch.cost, branch.node);
      chosen.pop();
      if (branch.band) bands.pop();
    }
  };
  /** Where nothing fits, the reading that assigns most bands tells most about why. */
  const mostTelling = (): ScoredReading => {
    const taken: Addition[] = [];
    let node = bound.root;
    const choices = ordered.map(({ item, ways }): Choice => {
      const open = ways.filter(({ band }) => !taken.some((one) => excludes(one, band)));
      const grown = open.map((way) => ({ way, node: bound.add(node, { ...way.band, keepsOrder: false }, Number.POSITIVE_INFINITY) }));
      const best = grown.reduce<(typeof grown)[number] | null>((least, one) => (least && least.way.cost + least.node.least <= one.way.cost + one.node.least ? least : one), null);
      if (!best) return { item, label: null };
      node = best.node;
      taken.push(best.way.band);
      return { item, label: best.way.band.label };
    });
    return scored(task, choices, notFitted);
  };

  visit(0, 0, bound.root);
  if (!Number.isFinite(known) && !found.some((reading) => Number.isFinite(reading.score))) return [mostTelling()];
  return found.filter((reading) => reading.score <= cut()).sort((a, b) => a.score - b.score);
}

/** Whether every band of a whole assignment is fitted, or every spin-allowed one: one or two bands may be fitted by one of them alone. */
const mayBeCut = ({ assigned, allowed }: BoundNode): boolean => assigned > allowed || assigned > 2;

/** Evidence that no further band can take away. */
const lasting = new Set(['misfit', 'parameters', 'beta']);

/**
 * The least misfit and parameters' cost of choices in which only the spin-allowed bands are fitted and the others compared
 * with that fit. Choices that differ in spin-forbidden bands share one fit.
 */
function fitsOfAllowed(task: SearchTask): (choices: readonly Choice[]) => number {
  const { ion, policy } = task;
  const known = new Map<string, { readonly reading: ScoredReading; readonly cost: number; readonly predictions: Map<string, Prediction> }>();
  return (choices) => {
    const allowed = choices.filter(({ label }) => label !== null && transitionOf(ion, label).spinAllowed);
    const key = allowed.map(({ item, label }) => `${label}@${item.observation.bands.join('+')}`).join(' ');
    let base = known.get(key);
    if (!base) {
      const reading = scored(task, allowed, []);
      base = { reading, cost: scoreOf(reading.evidence.filter((one) => lasting.has(one.code))), predictions: new Map() };
      known.set(key, base);
    }
    const { reading, predictions } = base;
    if (!isFit(reading.outcome)) return Number.POSITIVE_INFINITY;
    let sum = base.cost;
    for (const { item, label } of choices) {
      if (label === null || transitionOf(ion, label).spinAllowed) continue;
      let prediction = predictions.get(label);
      if (!prediction) predictions.set(label, (prediction = predictionOf(ion, reading.outcome, label)));
      sum += misfitOfOne(item.observation, floorOf(ion, label, policy), prediction);
    }
    return sum;
  };
}

/** Whether two bands cannot be given these transitions at once: one transition is one band, but both of the d5 pair may be seen. */
const excludes = (one: Addition, other: Addition): boolean => one.label === other.label && !one.label.includes('/');

/** What it costs at least that there are fewer transitions left than bands. */
function leastLeftOver(ordered: readonly Ordered[], from: number, bands: readonly Addition[], next: Addition | null): number {
  let open = 0;
  const labels = new Set<string>();
  for (let at = from; at < ordered.length; at++) {
    const { item, ways } = ordered[at]!;
    if (item.leaveOut?.counts) open++;
    for (const { band } of ways) {
      if (band.label.includes('/')) return 0;
      if (band.label !== next?.label && !bands.some((one) => one.label === band.label)) labels.add(band.label);
    }
  }
  return evidenceWeights.leftOver * Math.max(0, open - labels.size);
}

/** One transition that an item may be, with what its looks say against it. */
interface Way {
  readonly band: Addition;
  readonly cost: number;
}

/** One band, or merged components, with every transition that it may be. */
interface Ordered {
  readonly item: Item;
  readonly ways: readonly Way[];
}

/** A step down the search. */
interface Branch {
  /** null: the item stays out. */
  readonly band: Addition | null;
  readonly node: BoundNode;
  readonly cost: number;
  readonly least: number;
  /** The bound of fits with all bands: what comes first. */
  readonly promise: number;
}

function waysOf({ ion, measurement, policy }: SearchTask, { observation, candidates }: Item): readonly Way[] {
  return candidates.map((label) => {
    const { position, uMinus, uPlus } = observation;
    const variance = Math.max(uMinus, uPlus) ** 2 + floorOf(ion, label, policy) ** 2;
    return {
      band: { label, position, variance, spinAllowed: transitionOf(ion, label).spinAllowed, forgiven: (2 * symmetricU(observation) ** 2) / variance, keepsOrder: candidates.length > 1 },
      cost: scoreOf(observation.bands.flatMap((index) => bandEvidence(ion, label, measurement.bands[index]!))),
    };
  });
}

function isLine(measurement: Measurement, item: Item): number {
  return item.observation.bands.some((index) => measurement.bands[index]!.kind === 'line') ? 1 : 0;
}
