import type { Policy } from '../policy/types.ts';
import { difference } from './difference.ts';
import type { Comparable } from './comparable.ts';

/** Members `first` to `last` of a series (places from 0, both included) of which no two can be told apart. */
export interface IndistinguishableGroup {
  readonly first: number;
  readonly last: number;
}

/**
 * The longest runs of neighbours in a series of which no two can be told apart, each of two members or more, in the order of their
 * first members. Runs may overlap: A may be like B and B like C while A and C differ, so that an order is never read out of them.
 */
export function indistinguishableGroups({ members, parameter }: Pick<Comparable, 'members' | 'parameter'>, floor: Policy['differentialFloor']): readonly IndistinguishableGroup[] {
  const alike = (i: number, j: number): boolean => !(difference(members[i]!, members[j]!, parameter, floor)?.distinguishable ?? true);
  const groups: IndistinguishableGroup[] = [];
  let first = 0;
  for (let last = 0; last < members.length; last++) {
    // The run ending here begins behind the last earlier member that differs from this one.
    let start = last;
    while (start > first && alike(start - 1, last)) start--;
    if (start > first) {
      if (last - 1 > first) groups.push({ first, last: last - 1 });
      first = start;
    }
  }
  if (members.length - 1 > first) groups.push({ first, last: members.length - 1 });
  return groups;
}
