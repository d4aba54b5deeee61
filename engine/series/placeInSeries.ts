import type { Policy } from '../policy/types.ts';
import { leftOutWords } from '../words/series.ts';
import type { UnlikeKind } from '../words/series.ts';
import { ionSubject, ligandSubject, roomTemperature, selectComparable } from './comparable.ts';
import type { Comparable, Frame, Subject } from './comparable.ts';
import { difference } from './difference.ts';
import type { Difference } from './difference.ts';
import { phaseClass } from './identity.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

/** A member of a series beside the new result. */
export interface SeriesNeighbour {
  readonly result: SeriesResult;
  /** New less member. */
  readonly difference: Difference;
}

/** How far the conditions were opened to find anything to compare with. */
export type Widened = 'none' | 'temperature' | 'phase';

/**
 * A result's place among like ones. There is no rank: what matters is what it is above, what it is below, and what it cannot be told from.
 */
export interface PlaceInSeries {
  /** Complexes of its ion by ligands, or of its set of ligands by ion. */
  readonly subject: 'ion' | 'ligands';
  readonly parameter: SeriesParameter;
  readonly frame: Frame;
  readonly widened: Widened;
  /** Complexes that it could be compared with. */
  readonly members: number;
  /** Nearest member that it stands distinguishably above, and number of those. */
  readonly above: SeriesNeighbour | null;
  readonly aboveCount: number;
  /** Nearest member that it stands distinguishably below, and number of those. */
  readonly below: SeriesNeighbour | null;
  readonly belowCount: number;
  /** Members that it cannot be told from, nearest first. */
  readonly alike: readonly SeriesNeighbour[];
  /** Candidates of the same subject that were not compared: how many for each kind of reason, most first. */
  readonly leftOut: readonly { readonly kind: UnlikeKind; readonly count: number; /** "6 in other phases" */ readonly words: string }[];
  /** true where the new result's own number is withheld. */
  readonly withheld: boolean;
}

/**
 * The place of a result in the series of its ion, geometry and spin, or of its set of ligands. Compared is what was measured in the same
 * phase class within 50 K; where nothing was, conditions are opened step by step, and `widened` says how far.
 *
 * @param candidates of the collection's results those of its ion, or of its ligands, without those of the same complex
 * @param policy the one in force: a result fitted under another is set against it with total uncertainties
 */
export function placeInSeries(
  result: SeriesResult, subject: PlaceInSeries['subject'], parameter: SeriesParameter, candidates: readonly SeriesResult[],
  policy: { readonly id: string; readonly differentialFloor: Policy['differentialFloor'] },
): PlaceInSeries {
  const { complex } = result;
  const base = subject === 'ion' ? ionSubject(complex, policy.id) : ligandSubject(complex, policy.id);
  const { comparable, widened } = widening(result, parameter, candidates, base);
  const neighbours = comparable.members.flatMap((member) => {
    const found = difference(result, member, parameter, policy.differentialFloor);
    return found === null ? [] : [{ result: member, difference: found }];
  });
  const nearestFirst = (a: SeriesNeighbour, b: SeriesNeighbour): number => Math.abs(a.difference.value) - Math.abs(b.difference.value);
  const above = neighbours.filter((one) => one.difference.distinguishable && one.difference.value > 0).sort(nearestFirst);
  const below = neighbours.filter((one) => one.difference.distinguishable && one.difference.value < 0).sort(nearestFirst);
  return {
    subject, parameter, frame: comparable.frame, widened, members: comparable.members.length,
    above: above[0] ?? null, aboveCount: above.length, below: below[0] ?? null, belowCount: below.length,
    alike: neighbours.filter((one) => !one.difference.distinguishable).sort(nearestFirst),
    leftOut: leftOutCounts(comparable), withheld: result.parameters[parameter].value === null,
  };
}

function widening(
  result: SeriesResult, parameter: SeriesParameter, candidates: readonly SeriesResult[], base: Subject,
): { readonly comparable: Comparable; readonly widened: Widened } {
  const phase = phaseClass(result);
  const near = result.temperature ?? roomTemperature;
  const steps: readonly (readonly [Widened, Pick<Frame, 'phase' | 'temperature'>])[] = [
    ['none', { phase, temperature: { near, orNotRecorded: false } }],
    ['temperature', { phase, temperature: { near, orNotRecorded: true } }],
    ['phase', { phase: null, temperature: { near, orNotRecorded: true } }],
  ];
  let first: Comparable | null = null;
  for (const [widened, conditions] of steps) {
    const comparable = selectComparable(candidates, parameter, { ...base, ...conditions });
    first ??= comparable;
    if (comparable.members.length > 0) return { comparable, widened };
  }
  return { comparable: first!, widened: 'none' };
}

/** How many were left out for each kind of reason, the most frequent first. */
function leftOutCounts({ leftOut }: Comparable): PlaceInSeries['leftOut'] {
  const counts = new Map<UnlikeKind, number>();
  for (const { kind } of leftOut) counts.set(kind, (counts.get(kind) ?? 0) + 1);
  return [...counts].map(([kind, count]) => ({ kind, count, words: leftOutWords(kind, count) })).sort((a, b) => b.count - a.count || (a.kind < b.kind ? -1 : 1));
}
