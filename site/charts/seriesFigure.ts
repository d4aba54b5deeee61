import * as Plot from '@observablehq/plot';
import { plain } from '#engine';
import { drawPlot, dressed } from './plot.ts';
import { type TextPart, coordinate as c, spans, textWidth } from './text.ts';

/** One row of a series: a value with the uncertainty of the readings alone and in total. */
export interface SeriesPoint {
  readonly label: readonly TextPart[];
  readonly value: number;
  readonly u: number | null;
  readonly uTotal: number | null;
  /** An assumed or otherwise weaker number is drawn open. */
  readonly open: boolean;
}

const WIDTH = 560;
const ROW = 22;
const SIZE = 13.5;

/**
 * Values in order along one axis, a line for each: the thick bar is one standard uncertainty of the readings alone, the thin
 * bar the total.
 * @param axis parts of the axis title, quantity / unit
 */
export function seriesFigure(points: readonly SeriesPoint[], axis: readonly TextPart[], document: Document, dress: { readonly id: string; readonly title: string; readonly description: string }): string {
  const rows = points.map((point, index) => ({ ...point, index: index + 0.5 }));
  const ends = rows.flatMap(({ value, uTotal, u }) => { const reach = uTotal ?? u ?? 0; return [value - reach, value + reach]; });
  const [low, high] = ends.length === 0 ? [0, 1] : [Math.min(...ends), Math.max(...ends)];
  const pad = 0.06 * (high - low) || 0.05 * Math.abs(high) || 1;
  const ticks = tickLabels(low - pad, high + pad);
  const left = Math.min(240, Math.max(80, 16 + Math.max(0, ...points.map(({ label }) => textWidth(label, SIZE)))));
  const bottom = 44;
  const drawing = drawPlot(document, {
    width: WIDTH, height: 12 + ROW * Math.max(1, points.length) + bottom,
    marginLeft: left, marginRight: 16, marginTop: 12, marginBottom: bottom,
    x: { domain: [low - pad, high + pad], label: null },
    y: { domain: [0, Math.max(1, points.length)], axis: null },
    marks: [
      Plot.axisX(ticks.values, { tickSize: 5, label: null, tickFormat: ticks.text }),
      Plot.ruleY(rows, { y: 'index', className: 'hairline', stroke: 'currentColor' }),
      Plot.ruleY(rows.filter((row) => row.uTotal !== null), { y: 'index', x1: (row: SeriesPoint) => row.value - row.uTotal!, x2: (row: SeriesPoint) => row.value + row.uTotal!, className: 'error', stroke: 'currentColor' }),
      Plot.ruleY(rows.filter((row) => row.u !== null), { y: 'index', x1: (row: SeriesPoint) => row.value - row.u!, x2: (row: SeriesPoint) => row.value + row.u!, className: 'error own', stroke: 'currentColor' }),
    ],
  });
  const { x, y } = drawing;
  const base = y(0);
  const over = rows.map((row) => `<circle class="${row.open ? 'calculated' : 'point'}" cx="${c(x(row.value))}" cy="${c(y(row.index))}" r="3.6"/>`
    + `<text x="${c(left - 10)}" y="${c(y(row.index) + 4.5)}" text-anchor="end" font-size="${SIZE}">${spans(row.label, SIZE)}</text>`).join('')
    + `<path class="axis" d="M${c(left)} ${c(base)}H${WIDTH - 16}"/>`
    + `<text x="${c((left + WIDTH - 16) / 2)}" y="${c(base + 38)}" text-anchor="middle" font-size="13.5">${spans(axis, 13.5)}</text>`;
  return dressed(drawing, { ...dress, over });
}

/** Tick labels with as many decimals as the step between ticks needs, all alike. */
function tickLabels(low: number, high: number): { readonly values: number[]; readonly text: (value: number) => string } {
  const rough = (high - low) / 5;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((candidate) => candidate >= rough)!;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const first = Math.ceil(low / step - 1e-9);
  const values = Array.from({ length: Math.floor(high / step + 1e-9) - first + 1 }, (_, index) => (first + index) * step);
  return { values, text: (value) => plain(value, decimals, 'page') };
}
