import type { BoundNode } from './bound.ts';
import { isAbove, promoted } from './cells.ts';
import type { Cells } from './cells.ts';
import { evidenceWeights } from './evidenceWeights.ts';

/** An assigned band at an end of what is assigned. */
export interface End {
  readonly label: string;
  /** u^2 + floor^2. */
  readonly variance: number;
  readonly spinAllowed: boolean;
}

/** Lower bounds of misfit, parameters' cost and what skipped transitions add. */
export interface WithGaps {
  /** Over fits in which every band takes part. */
  readonly ofAll: number;
  /** Over those that leave spin-forbidden bands out. */
  readonly ofSome: number;
}

/** Above this a transition may count as one of two electrons (the score draws the line at 1.5). */
const perhapsTwoElectrons = 1.4;

/**
 * The bounds of a node with what the skipped transitions add.
 *
 * A transition that is expected and not assigned costs something wherever it lies between the assigned ones or below them.
 * Which side of an assigned transition it lies on is told in each cell by their difference, with room for the misfit that the
 * limit leaves.
 *
 * @param skipped labels of the transitions expected and not assigned; where bands are still to come, they must all lie above
 *   those assigned and keep the order, so that nothing below the highest can be assigned any more
 * @param limit of misfit and parameters' cost
 */
export function leastWithGaps(cells: Cells, node: BoundNode, lowest: End, highest: End, skipped: readonly string[], limit: number): WithGaps {
  const low = cells.transition(lowest.label);
  const high = cells.transition(highest.label);
  const open = skipped.map((label) => cells.transition(label));
  const miss = Math.sqrt(Math.max(0, limit));
  const missLow = miss * Math.sqrt(lowest.variance);
  const missHigh = miss * Math.sqrt(highest.variance);
  // Bands that are only compared may miss by more than the limit tells.
  const tellsOfSome = lowest.spinAllowed && highest.spinAllowed;
  let ofAll = Number.POSITIVE_INFINITY;
  let ofSome = Number.POSITIVE_INFINITY;
  for (let n = 0; n < node.cells.length; n++) {
    const i = node.cells[n]!;
    const scale = node.scales[n]!;
    let added = 0;
    for (let k = 0; k < open.length && scale > 0; k++) {
      const transition = open[k]!;
      if (!isAbove(cells, i, high, transition, missHigh / scale)) continue;
      const between = isAbove(cells, i, transition, low, missLow / scale);
      if (Math.abs(promoted(cells, i, transition)) > perhapsTwoElectrons) added += between ? evidenceWeights.twoElectronGap : 0;
      else added += between ? evidenceWeights.gap : Math.min(evidenceWeights.below, evidenceWeights.unseen);
    }
    ofAll = Math.min(ofAll, node.values[n]! + added);
    ofSome = Math.min(ofSome, node.valuesOfSome[n]! + (tellsOfSome ? added : 0));
  }
  return { ofAll, ofSome };
}
