import type { FreeIon } from '../ions/types.ts';
import { fitsOfAllowed } from './allowedFits.ts';
import { boundFor } from './bound.ts';
import type { Addition, BoundNode } from './bound.ts';
import { gatherItems } from './candidates.ts';
import type { Freedom } from './candidates.ts';
import { expectedTransitions } from './evidence.ts';
import { evidenceWeights } from './evidenceWeights.ts';
import { leastWithGaps } from './gaps.ts';
import type { WithGaps } from './gaps.ts';
import { scoreChoices } from './scoring.ts';
import type { Choice, ScoredReading, SearchTask } from './scoring.ts';
import { excludes, leastLeftOver, openItems, sequences } from './ways.ts';
import type { Way } from './ways.ts';

/** Readings that score worse than the best by more than this are not kept. */
export const keepWithin = 12;

/** How many of the best readings are wanted. */
export const readingsAtMost = 6;

/** Reach of the first pass of a search above the least conceivable score; each next one reaches twice as far, the last without limit. */
const firstPass = 3;
const furthestPass = 100;

/** A search stops after this many steps, and says so. Records of eight bands without any typed term take a few thousand. */
const stepsAtMost = 200_000;

/** C0/B0 of the free ion, by which parents in typed labels are resolved. */
const parentRatioOf = (freeIon: FreeIon | null): number => (freeIon?.racahC0 ? freeIon.racahC0 / freeIon.racahB0 : 4.5);

/** What a search found. */
export interface FoundReadings {
  /** Best first. */
  readonly readings: readonly ScoredReading[];
  /** false: the search stopped before all was tried. */
  readonly complete: boolean;
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

/**
 * The best assignments of the bands within their candidates, at most `readingsAtMost` and within `keepWithin` of
 * the best score, each with its fit. Where nothing fits, the one reading that tells most about why.
 *
 * Depth first. A branch is cut where the least score it can reach lies beyond what is kept: a lower bound of misfit and
 * parameters over the whole diagram (bound.ts), transitions skipped (gaps.ts), bands left over, and what a band's looks
 * say against its transition. Nothing within the bound is lost.
 *
 * @param known a score already reached elsewhere, against which `keepWithin` counts
 */
export function searchReadings(task: SearchTask, freedom: Freedom, known = Number.POSITIVE_INFINITY): FoundReadings {
  const { measurement, ion, policy, ratio, freeIon } = task;
  const { items, notFitted } = gatherItems(measurement, ion, policy, parentRatioOf(freeIon), freedom);
  const open = openItems(task, items);
  const inSequence = sequences(open);
  const allBands = open.flatMap(({ ways }) => ways.map((way) => way.band));
  const bound = boundFor(ion, ratio, allBands.some((band) => !band.spinAllowed), allBands.some((band) => band.spinAllowed), freeIon);
  const expected = expectedTransitions(ion).map((transition) => transition.label);
  const leastOfAllowed = fitsOfAllowed(task);
  const withRatioAssumed: SearchTask = { ...task, policy: { ...policy, cFitted: false } };

  const found: ScoredReading[] = [];
  const tried = new Set<string>();
  /** The best scores so far, ascending: nothing worse than the last of them is wanted. */
  const scores = Number.isFinite(known) ? [known] : [];
  /** Nothing beyond this is looked at in the present pass. */
  let ceiling = Number.POSITIVE_INFINITY;
  const cut = (): number => Math.min(ceiling, (scores[0] ?? Number.POSITIVE_INFINITY) + keepWithin, scores[readingsAtMost - 1] ?? Number.POSITIVE_INFINITY);

  let steps = 0;

  /** The choices on the way down to the present node, and the bands that are assigned by them. */
  const chosen: Choice[] = [];
  const bands: Addition[] = [];

  /** The bounds of what is assigned with what its skipped transitions add. */
  const withGaps = (node: BoundNode, limit: number): WithGaps => {
    const skipped = expected.filter((label) => !bands.some((band) => band.label === label));
    // One or two bands may be fitted by one of them alone, which then tells nothing of the other.
    if (skipped.length === 0 || bands.length < 3 || !Number.isFinite(limit)) return { ofAll: node.leastOfAll, ofSome: node.least };
    const lowest = bands.reduce((least, band) => (band.position < least.position ? band : least));
    const highest = bands.reduce((most, band) => (band.position > most.position ? band : most));
    return leastWithGaps(bound.cells, node, lowest, highest, skipped, limit);
  };

  /** Whether a whole assignment lies beyond what is kept, told without fitting all its bands. */
  const isBeyond = (cost: number, node: BoundNode): boolean => {
    const allAllowed = node.allowed === node.assigned;
    // Of two spin-allowed bands one may be left to be compared with the other.
    if (allAllowed && node.assigned <= 2) return false;
    const { ofAll, ofSome } = withGaps(node, cut() - cost);
    if (cost + ofAll <= cut()) return false;
    // No fit of all bands comes near; only one that leaves the spin-forbidden ones out might.
    return allAllowed || cost + ofSome > cut() || cost + leastOfAllowed(chosen) > cut() || scoreChoices(withRatioAssumed, chosen, notFitted).score > cut();
  };

  const tryChoices = (): void => {
    const key = chosen.map(({ label }) => label).join(' ');
    if (tried.has(key)) return;
    tried.add(key);
    const reading = scoreChoices(task, chosen, notFitted);
    if (!Number.isFinite(reading.score)) return;
    found.push(reading);
    scores.push(reading.score);
    scores.sort((a, b) => a - b);
    if (scores.length > readingsAtMost) scores.pop();
  };

  /** Everything the next item may be, with the least score that each leads to; the most promising first. */
  const branches = (at: number, cost: number, node: BoundNode): Branch[] => {
    const { item, ways } = open[at]!;
    const leftOver = leastLeftOver(open, at + 1, bands);
    const next: Branch[] = [];
    const add = (band: Addition | null, paid: number): void => {
      const later = leftOver(band);
      const grown = band ? bound.add(node, band, cut() - paid - later) : node;
      if (grown.cells.length > 0) next.push({ band, node: grown, cost: paid, least: paid + later + grown.least, promise: paid + later + grown.leastOfAll });
    };
    for (const { band, cost: ofLooks } of ways) if (!bands.some((one) => excludes(one, band))) add(band, cost + ofLooks);
    if (item.leaveOut) add(null, cost + (item.leaveOut.counts ? evidenceWeights.leftOver : 0));
    return next.sort((a, b) => a.promise - b.promise || a.least - b.least);
  };

  const visit = (at: number, cost: number, node: BoundNode): void => {
    steps += 1;
    if (at === open.length) {
      if (!isBeyond(cost, node)) tryChoices();
      return;
    }
    if (inSequence[at]) {
      const { ofAll, ofSome } = withGaps(node, cut() - cost);
      if (cost + Math.min(ofAll, ofSome) > cut()) return;
    }
    for (const { band, node: grown, cost: paid, least } of branches(at, cost, node)) {
      if (least > cut() || steps >= stepsAtMost) continue;
      chosen.push({ item: open[at]!.item, label: band?.label ?? null });
      if (band) bands.push(band);
      visit(at + 1, paid, grown);
      chosen.pop();
      if (band) bands.pop();
    }
  };

  /** The reading that assigns most bands, each to what the bound thinks best of. */
  const mostTelling = (): ScoredReading => {
    const taken: Addition[] = [];
    let node = bound.root;
    const choices = open.map(({ item, ways }): Choice => {
      let best: { readonly way: Way; readonly node: BoundNode; readonly least: number } | null = null;
      for (const way of ways) {
        if (taken.some((one) => excludes(one, way.band))) continue;
        const grown = bound.add(node, { ...way.band, keepsOrder: false }, Number.POSITIVE_INFINITY);
        if (!best || way.cost + grown.least < best.least) best = { way, node: grown, least: way.cost + grown.least };
      }
      if (!best) return { item, label: null };
      node = best.node;
      taken.push(best.way.band);
      return { item, label: best.way.band.label };
    });
    return scoreChoices(task, choices, notFitted);
  };

  // A good reading found early cuts off most of the others, so the first passes look no further than they must.
  const floor = bound.root.least + leastLeftOver(open, 0, [])(null);
  let passed = Number.NEGATIVE_INFINITY;
  for (let reach = firstPass; reach < furthestPass && scores.length === 0; reach *= 2) {
    passed = ceiling = floor + reach;
    visit(0, 0, bound.root);
  }
  ceiling = Number.POSITIVE_INFINITY;
  if (cut() > passed) visit(0, 0, bound.root);
  const complete = steps < stepsAtMost;
  if (found.length === 0 && !Number.isFinite(known)) return { readings: [mostTelling()], complete };
  return { readings: found.filter((reading) => reading.score <= cut()).sort((a, b) => a.score - b.score), complete };
}
