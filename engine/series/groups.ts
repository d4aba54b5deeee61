import type { Policy } from '../policy/types.ts';
import { difference } from './difference.ts';
import type { Comparable } from './comparable.ts';

/** Members `first` to `last` of a series (places from 0, both included) of which no two can be told apart. */
export interface IndistinguishableGroup {
  readonly first: number;
  readonly last: number;
}

/**
 * The longest runs of neighbours of which every two are `alike`, each of two or more, in the order of their first.
 * Runs may overlap.
 *
 * @param count how many stand in the order
 * @param alike of two places from 0, the lower first: whether they cannot be told apart
 */
export function runsAlike(count: number, alike: (lower: number, upper: number) => boolean): readonly IndistinguishableGroup[] {
  const groups: IndistinguishableGroup[] = [];
  let first = 0;
  for (let last = 0; last < count; last++) {
    // The run ending here begins behind the last earlier member that differs from this one.
    let start = last;
    while (start > first && alike(start - 1, last)) start--;
    if (start > first) {
      if (last - 1 > first) groups.push({ first, last: last - 1 });
      first = start;
    }
  }
  if (count - 1 > first) groups.push({ first, last: count - 1 });
  return groups;
}

/**
 * The longest runs of neighbours in a series of which no two can be told apart, each of two members or more, in the order of their
 * first members. Runs may overlap: A may be like B and B like C while A and C differ, so that an order is never read out of them.
 */
export function indistinguishableGroups({ members, parameter }: Pick<Comparable, 'members' | 'parameter'>, floor: Policy['differentialFloor']): readonly IndistinguishableGroup[] {
  return runsAlike(members.length, (i, j) => !(difference(members[i]!, members[j]!, parameter, floor)?.distinguishable ?? true));
}
