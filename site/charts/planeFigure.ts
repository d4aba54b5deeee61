import * as Plot from '@observablehq/plot';
import { type Ellipse, ellipsePath, keyPlaces } from './ellipse.ts';
import { drawPlot, dressed } from './plot.ts';
import { type TextPart, coordinate as c, escapeText, spans } from './text.ts';
import { ticksBetween } from './ticks.ts';

/** A point of the plane with its error ellipse and its letter, empty where there are too many for letters. */
export interface PlaneMark extends Ellipse {
  readonly key: string;
}

/** What a correlation coefficient is seen against. null: too few points to say. */
export interface CoefficientShown {
  readonly r: number;
  readonly interval: { readonly low: number; readonly high: number } | null;
  readonly leaveOneOut: { readonly low: number; readonly high: number } | null;
  readonly nullBand: { readonly low: number; readonly high: number };
}

const WIDTH = 560;
const PLANE = 360;
const MARGIN = { left: 72, right: 16, top: 12, bottom: 46 };
const SCALE = 74;

/**
 * Two fitted numbers against each other with error ellipses of one standard uncertainty, and under the plane their correlation
 * coefficient on a scale of its own: the open bar is where it would lie by the fits' errors alone.
 */
export function planeFigure(
  marks: readonly PlaneMark[], axes: { readonly x: readonly TextPart[]; readonly y: readonly TextPart[] }, coefficient: CoefficientShown, document: Document,
  dress: { readonly id: string; readonly title: string; readonly description: string },
): string {
  const [xRange, yRange] = [reach(marks.flatMap(({ x, ux }) => [x - ux, x + ux])), reach(marks.flatMap(({ y, uy }) => [y - uy, y + uy]))];
  const [xTicks, yTicks] = [ticksBetween(...xRange), ticksBetween(...yRange)];
  const drawing = drawPlot(document, {
    width: WIDTH, height: PLANE + SCALE, marginLeft: MARGIN.left, marginRight: MARGIN.right, marginTop: MARGIN.top, marginBottom: MARGIN.bottom + SCALE,
    x: { domain: [...xRange], label: null }, y: { domain: [...yRange], label: null },
    marks: [
      Plot.axisX(xTicks.values, { tickSize: 5, label: null, tickFormat: xTicks.text }),
      Plot.axisY(yTicks.values, { tickSize: 5, label: null, tickFormat: yTicks.text }),
    ],
  });
  const base = PLANE - MARGIN.bottom;
  const places = marks.map((mark) => ({ x: drawing.x(mark.x), y: drawing.y(mark.y) }));
  const frame = { left: MARGIN.left, right: WIDTH - MARGIN.right, top: MARGIN.top, bottom: base };
  const keys = keyPlaces(places, marks.map(({ key }) => key), frame);
  const over = marks.map((mark) => `<path class="ellipse" d="${ellipsePath(mark, drawing)}"/>`).join('')
    + places.map(({ x, y }) => `<circle class="point" cx="${c(x)}" cy="${c(y)}" r="2.6"/>`).join('')
    + keys.map((at, index) => (at === null ? '' : `${at.far ? `<path class="leader" d="M${c(places[index]!.x)} ${c(places[index]!.y)}L${c(at.x)} ${c(at.y)}"/>` : ''}<text class="mark-text" x="${c(at.x)}" y="${c(at.y + 4)}" text-anchor="middle" font-size="12" font-style="italic">${escapeText(marks[index]!.key)}</text>`)).join('')
    + `<path class="axis" d="M${frame.left} ${frame.top}V${base}H${frame.right}"/>`
    + `<text x="${c((frame.left + frame.right) / 2)}" y="${base + 40}" text-anchor="middle" font-size="13.5">${spans(axes.x, 13.5)}</text>`
    + `<text transform="translate(14 ${c((frame.top + base) / 2)}) rotate(-90)" text-anchor="middle" font-size="13.5">${spans(axes.y, 13.5)}</text>`
    + coefficientScale(coefficient, PLANE + 22);
  return dressed(drawing, { ...dress, over });
}

function reach(ends: readonly number[]): [number, number] {
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const pad = 0.07 * (high - low) || 0.05 * Math.abs(high) || 1;
  return [low - pad, high + pad];
}

/** From -1 to 1: open bar the null band, thick bar the range with one left out, thin bar the 95 % interval, dot r. */
function coefficientScale({ r, interval, leaveOneOut, nullBand }: CoefficientShown, y: number): string {
  const [left, right] = [MARGIN.left + 60, WIDTH - MARGIN.right - 60];
  const x = (value: number): number => left + ((value + 1) / 2) * (right - left);
  const bar = (of: { readonly low: number; readonly high: number } | null, css: string): string => (of === null ? '' : `<path class="${css}" d="M${c(x(of.low))} ${y}H${c(x(of.high))}"/>`);
  const ticks = [-1, -0.5, 0, 0.5, 1].map((value) => `<path class="axis" d="M${c(x(value))} ${y + 16}v4"/><text x="${c(x(value))}" y="${y + 32}" text-anchor="middle" font-size="12">${String(value).replace('-', '−')}</text>`).join('');
  return `<path class="frame" d="M${c(x(nullBand.low))} ${y - 8}H${c(x(nullBand.high))}V${y + 8}H${c(x(nullBand.low))}Z"/>${bar(interval, 'error')}${bar(leaveOneOut, 'error own')}`
    + `<circle class="point" cx="${c(x(r))}" cy="${y}" r="3.6"/><path class="axis" d="M${left} ${y + 16}H${right}"/>${ticks}`
    + `<text x="${left - 14}" y="${y + 20}" text-anchor="end" font-size="13.5" font-style="italic">r</text>`;
}
