import * as Plot from '@observablehq/plot';
import { type Bracket, LANE, bracketLanes, bracketMarks } from './brackets.ts';
import { drawPlot, dressed } from './plot.ts';
import { type TextPart, coordinate as c, escapeText, spans, textWidth } from './text.ts';
import { ticksBetween } from './ticks.ts';

/** One row of a series: a value with the uncertainty of the readings alone and in total. */
export interface SeriesPoint {
  readonly label: readonly TextPart[];
  readonly value: number;
  readonly u: number | null;
  readonly uTotal: number | null;
  /** An assumed or otherwise weaker number is drawn open. */
  readonly open: boolean;
  /** A value from elsewhere on the same row, drawn as an open diamond: printed, or predicted. */
  readonly beside?: number | null;
  /** Printed small at the right end of the row. */
  readonly note?: string;
}

/** What a figure of rows has besides its rows. */
export interface SeriesExtras {
  /** Runs of rows that cannot be told apart. */
  readonly brackets?: readonly Bracket[];
  /** Upright line at a value that means "no difference". */
  readonly upright?: number;
  /** Ends of the axis, where several figures share one. */
  readonly range?: readonly [low: number, high: number];
  /** What the notes at the ends of the rows are. */
  readonly noteHead?: readonly TextPart[];
}

const WIDTH = 560;
const ROW = 22;
const SIZE = 13.5;
const RIGHT = 16;
const NOTE = 11.5;

/**
 * Values in order along one axis, a line for each: the thick bar is one standard uncertainty of the readings alone, the thin
 * bar the total.
 * @param axis parts of the axis title, quantity / unit
 */
export function seriesFigure(
  points: readonly SeriesPoint[], axis: readonly TextPart[], document: Document, dress: { readonly id: string; readonly title: string; readonly description: string }, extras: SeriesExtras = {},
): string {
  const rows = points.map((point, index) => ({ ...point, index: index + 0.5 }));
  const [low, high] = extras.range ?? seriesRange(points, extras.upright);
  const ticks = ticksBetween(low, high);
  const left = Math.min(250, Math.max(80, 16 + Math.max(0, ...points.map(({ label }) => textWidth(label, SIZE)))));
  const lanes = bracketLanes(extras.brackets ?? []);
  const noted = Math.max(0, ...points.map(({ note }) => (note === undefined ? 0 : textWidth([{ text: note, style: 'plain' }], NOTE) + 10)));
  const right = RIGHT + noted + LANE * lanes.count;
  const top = extras.noteHead === undefined ? 12 : 26;
  const bottom = 44;
  const drawing = drawPlot(document, {
    width: WIDTH, height: top + ROW * Math.max(1, points.length) + bottom,
    marginLeft: left, marginRight: right, marginTop: top, marginBottom: bottom,
    x: { domain: [low, high], label: null },
    y: { domain: [0, Math.max(1, points.length)], axis: null },
    marks: [
      Plot.axisX(ticks.values, { tickSize: 5, label: null, tickFormat: ticks.text }),
      Plot.ruleY(rows, { y: 'index', className: 'hairline', stroke: 'currentColor' }),
      ...(extras.upright === undefined ? [] : [Plot.ruleX([extras.upright], { className: 'crossing', stroke: 'currentColor' })]),
      Plot.ruleY(rows.filter((row) => row.uTotal !== null), { y: 'index', x1: (row: SeriesPoint) => row.value - row.uTotal!, x2: (row: SeriesPoint) => row.value + row.uTotal!, className: 'error', stroke: 'currentColor' }),
      Plot.ruleY(rows.filter((row) => row.u !== null), { y: 'index', x1: (row: SeriesPoint) => row.value - row.u!, x2: (row: SeriesPoint) => row.value + row.u!, className: 'error own', stroke: 'currentColor' }),
    ],
  });
  const { x, y } = drawing;
  const base = y(0);
  const over = rows.map((row) => (row.beside == null ? '' : `<path class="beside" d="${diamond(x(row.beside), y(row.index))}"/>`)
    + `<circle class="${row.open ? 'calculated' : 'point'}" cx="${c(x(row.value))}" cy="${c(y(row.index))}" r="3.6"/>`
    + `<text x="${c(left - 10)}" y="${c(y(row.index) + 4.5)}" text-anchor="end" font-size="${c(fitting(row.label, left - 14))}">${spans(row.label, fitting(row.label, left - 14))}</text>`).join('')
    + rows.map((row) => (row.note === undefined ? '' : `<text class="note-text" x="${c(WIDTH - right + noted)}" y="${c(y(row.index) + 4)}" text-anchor="end" font-size="${NOTE}">${escapeText(row.note)}</text>`)).join('')
    + (extras.noteHead === undefined ? '' : `<text class="note-text" x="${c(WIDTH - right + noted)}" y="${c(top - 10)}" text-anchor="end" font-size="${NOTE}">${spans(extras.noteHead, NOTE)}</text>`)
    + bracketMarks(extras.brackets ?? [], lanes.lanes, (place) => y(place), WIDTH - right + noted + 8)
    + `<path class="axis" d="M${c(left)} ${c(base)}H${c(WIDTH - right)}"/>`
    + `<text x="${c((left + WIDTH - right) / 2)}" y="${c(base + 38)}" text-anchor="middle" font-size="13.5">${spans(axis, 13.5)}</text>`;
  return dressed(drawing, { ...dress, over });
}

/** Size of a label: smaller where it would run out of its margin. */
const fitting = (label: readonly TextPart[], room: number): number => Math.min(SIZE, (SIZE * room) / textWidth(label, SIZE));

/** Ends of an axis that holds every value with its total uncertainty, what stands beside it and the upright line, with a little room. */
export function seriesRange(points: readonly SeriesPoint[], upright?: number): readonly [low: number, high: number] {
  const ends = points.flatMap(({ value, uTotal, u, beside }) => {
    const reach = uTotal ?? u ?? 0;
    return [value - reach, value + reach, ...(beside == null ? [] : [beside])];
  });
  if (upright !== undefined) ends.push(upright);
  const [low, high] = ends.length === 0 ? [0, 1] : [Math.min(...ends), Math.max(...ends)];
  const pad = 0.06 * (high - low) || 0.05 * Math.abs(high) || 1;
  return [low - pad, high + pad];
}

const HALF = 5.8;
const diamond = (x: number, y: number): string => `M${c(x - HALF)} ${c(y)}L${c(x)} ${c(y - HALF)}L${c(x + HALF)} ${c(y)}L${c(x)} ${c(y + HALF)}Z`;
