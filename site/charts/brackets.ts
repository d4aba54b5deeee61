import { coordinate as c, escapeText } from './text.ts';

/** A run of rows, from `first` to `last` (from 0, both included), with its letter. */
export interface Bracket {
  readonly first: number;
  readonly last: number;
  readonly letter: string;
  /** The run goes on before the first or behind the last row that is drawn. */
  readonly openBefore?: boolean;
  readonly openBehind?: boolean;
}

/** Width of a lane of brackets. */
export const LANE = 19;

/** Brackets in lanes, so that those that share a row stand side by side: each in the first lane that is free. */
export function bracketLanes(brackets: readonly Bracket[]): { readonly lanes: readonly number[]; readonly count: number } {
  const ends: number[] = [];
  const lanes = brackets.map(({ first, last }) => {
    const free = ends.findIndex((end) => end < first);
    const lane = free < 0 ? ends.length : free;
    ends[lane] = last;
    return lane;
  });
  return { lanes, count: ends.length };
}

/**
 * Brackets as SVG: an upright with a tick at each end towards the rows, and the letter beside its middle. An end that is not on the
 * drawing has no tick.
 * @param y of a place along the rows, 0 before the first
 * @param left where the first lane begins
 */
export function bracketMarks(brackets: readonly Bracket[], lanes: readonly number[], y: (place: number) => number, left: number): string {
  return brackets.map((one, index) => {
    const x = left + LANE * lanes[index]! + 5;
    const [from, to] = [y(one.first + (one.openBefore ? 0 : 0.22)), y(one.last + (one.openBehind ? 1 : 0.78))];
    const path = `M${c(x - (one.openBefore ? 0 : 4))} ${c(from)}H${c(x)}V${c(to)}${one.openBehind ? '' : `H${c(x - 4)}`}`;
    return `<path class="bracket" d="${path}"/><text x="${c(x + 3)}" y="${c((from + to) / 2 + 4)}" font-size="11.5" font-style="italic">${escapeText(one.letter)}</text>`;
  }).join('');
}
