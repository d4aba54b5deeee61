import { groundLabel, levelNames } from '../levels/labels.ts';
import { levelPlace } from './table.ts';
import type { LevelTable } from './table.ts';

/** Part of the curve on which one level is the lowest of the declared multiplicity; grid indices, both ends included. */
export interface Segment {
  readonly ground: string;
  readonly first: number;
  readonly last: number;
  /** Cells, by their lower grid index, in which another level becomes lowest: at most the first and the last of the segment. */
  readonly crossings: readonly number[];
}

const segmentsHeld = new WeakMap<LevelTable, Map<number, readonly Segment[]>>();

/** The segments on which none of the transitions leads from the ground level to itself: that is no transition, and no band lies at zero. */
export function segmentsOf(table: LevelTable, multiplicity: number, labels: readonly string[]): readonly Segment[] {
  const all = groundSegments(table, multiplicity);
  return all.length === 1 ? all : all.filter(({ ground }) => !labels.includes(ground));
}

/**
 * Where along the curve which level is lowest of the declared multiplicity. For most ions one level is
 * lowest everywhere; the doublets of d3 and d7 and the singlets of d4 change. The outermost cell at each end is
 * left out: Delta/B below 0.09 and above 4500 is no ligand field, and at the ends themselves rounding decides.
 */
export function groundSegments(table: LevelTable, multiplicity: number): readonly Segment[] {
  let byMultiplicity = segmentsHeld.get(table);
  if (!byMultiplicity) {
    byMultiplicity = new Map();
    segmentsHeld.set(table, byMultiplicity);
  }
  const earlier = byMultiplicity.get(multiplicity);
  if (earlier) return earlier;
  const { electrons, geometry } = table.ion;
  const lowest = levelNames(electrons, geometry).filter(
    (label) => label.startsWith('a') && levelPlace(table.ion, label).block.multiplicity === multiplicity,
  );
  const levels = lowest.map((label) => table.grid(label));
  const strongest = groundLabel(electrons, geometry, multiplicity);
  const at = (i: number): number => {
    let best = Math.max(0, lowest.indexOf(strongest ?? ''));
    // Where levels coincide a difference of rounding is no crossing.
    for (let k = 0; k < levels.length; k++) if (levels[k]!.energy[i]! < levels[best]!.energy[i]! - 1e-9) best = k;
    return best;
  };
  const found: Segment[] = [];
  let first = 1;
  let current = at(1);
  for (let i = 2; i < table.points - 1; i++) {
    const next = at(i);
    if (next === current) continue;
    // Both neighbours cover the cell in which the crossing lies, so no minimum falls between them.
    found.push({ ground: lowest[current]!, first, last: i, crossings: first === 1 ? [i - 1] : [first, i - 1] });
    first = i - 1;
    current = next;
  }
  found.push({ ground: lowest[current]!, first, last: table.points - 2, crossings: first === 1 ? [] : [first] });
  byMultiplicity.set(multiplicity, found);
  return found;
}
