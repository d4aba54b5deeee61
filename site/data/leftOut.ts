import { type UnlikeKind, leftOutWords } from '#engine';
import { complexPath } from './paths.ts';
import { counted, listed } from './show.ts';
import type { MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** What a series left out. */
export interface LeftOutShown {
  /** "12 measurements left out: 6 in other phases, 4 withheld and 2 repeats." */
  readonly summary: string;
  readonly rows: readonly { readonly formula: Parts; readonly path: string; readonly measurement: string; readonly reason: Parts }[];
  /** How many more the CSV file names. */
  readonly more: number;
}

export interface LeftOut {
  readonly measurement: MeasurementNode;
  readonly kind: UnlikeKind;
  readonly reason: string;
}

/** Rows that a page lists; the rest is in the figure's CSV file. */
const MOST_ROWS = 100;

export function leftOutShown(leftOut: readonly LeftOut[]): LeftOutShown | null {
  if (leftOut.length === 0) return null;
  const counts = new Map<UnlikeKind, number>();
  for (const { kind } of leftOut) counts.set(kind, (counts.get(kind) ?? 0) + 1);
  const byCount = [...counts].sort(([a, m], [b, n]) => n - m || (a < b ? -1 : 1));
  return {
    summary: `${counted(leftOut.length, 'measurement')} left out: ${listed(byCount.map(([kind, count]) => leftOutWords(kind, count)))}.`,
    rows: leftOut.slice(0, MOST_ROWS).map(({ measurement, reason }) => ({
      formula: measurement.complex.formula.parts, path: `${complexPath(measurement.complex.row.id)}#${measurement.row.id}`, measurement: measurement.row.id, reason: sentenceShown(reason),
    })),
    more: Math.max(0, leftOut.length - MOST_ROWS),
  };
}
