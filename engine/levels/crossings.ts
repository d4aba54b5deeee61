import type { Geometry } from '../ions/types.ts';
import { shellBlocks } from '../shell/blocks.ts';
import { fieldSign, levelLabel } from './levels.ts';
import { solveBlock } from './solve.ts';

/** The lowest level of the whole configuration, or of one multiplicity, in letter form with its absolute energy. */
export function lowestLevel(
  electrons: number, geometry: Geometry, delta: number, racahB: number, racahC: number, multiplicity?: number,
): { readonly label: string; readonly multiplicity: number; readonly energy: number } {
  let lowest: { label: string; multiplicity: number; energy: number } | null = null;
  for (const block of shellBlocks(electrons)) {
    if (multiplicity !== undefined && block.multiplicity !== multiplicity) continue;
    const energy = solveBlock(block, fieldSign(geometry), delta, racahB, racahC).energy[0]!;
    if (!lowest || energy < lowest.energy) lowest = { label: levelLabel(block, 1, geometry), multiplicity: block.multiplicity, energy };
  }
  if (!lowest) throw new RangeError(`multiplicity: d${electrons} has no level of multiplicity ${multiplicity}`);
  return lowest;
}

/** Where the ground level changes as Delta/B grows. */
export interface GroundCrossing {
  readonly deltaOverB: number;
  /** Letter form of the ground level below and above. */
  readonly below: string;
  readonly above: string;
}

/**
 * Crossings of the ground level for 0 < Delta/B <= `limit` at a given C/B, ascending; good to 1e-9 in Delta/B.
 *
 * @param ratio C/B
 */
export function groundCrossings(electrons: number, geometry: Geometry, ratio: number, limit = 60): readonly GroundCrossing[] {
  const at = (x: number): string => lowestLevel(electrons, geometry, x, 1, ratio).label;
  const found: GroundCrossing[] = [];
  const step = 0.25;
  let label = at(step);
  for (let x = step; x < limit; x += step) {
    const next = at(x + step);
    if (next === label) continue;
    let low = x;
    let high = x + step;
    while (high - low > 1e-10 * high) {
      const middle = (low + high) / 2;
      if (at(middle) === label) low = middle;
      else high = middle;
    }
    found.push({ deltaOverB: (low + high) / 2, below: label, above: next });
    label = next;
  }
  return found;
}
