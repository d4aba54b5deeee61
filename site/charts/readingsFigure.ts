import { energyScale, energyTicks } from './energyAxis.ts';
import { spreadLabels } from './spread.ts';
import { type StripPlace, type StripRow, stripInk } from './strip.ts';
import { svgElement } from './svg.ts';
import { type TextPart, coordinate as c, spans, textWidth } from './text.ts';

/** One reading of the bands: which names it gives them, and where its fit puts transitions. */
export interface ReadingLine {
  /** "chosen", "rival 1" */
  readonly name: string;
  readonly strip: StripRow;
  readonly named: readonly { readonly position: number; readonly parts: readonly TextPart[] }[];
  /** Transitions of the reading's bands where the fit puts them. */
  readonly calculated: readonly number[];
  /** Transitions that no band was given to. */
  readonly expected: readonly { readonly position: number; readonly parts: readonly TextPart[] }[];
}

const WIDTH = 760;
const MARGIN = 62;
const LINE = 62;
const AXIS = 30;
const SIZE = 11.5;
const SCALE = energyScale([MARGIN, WIDTH - 8]);

/**
 * Readings of the same bands one under the other on one axis: above each line the names the reading gives to the bands, under
 * it small triangles where its fit puts them, and named open triangles where it expects more.
 */
export function readingsFigure(lines: readonly ReadingLine[], dress: { readonly id: string; readonly title: string; readonly description: string }): string {
  const height = lines.length * LINE + AXIS;
  return svgElement(dress, WIDTH, height, lines.map((line, index) => readingLine(line, index * LINE)).join('') + axis(lines.length * LINE));
}

function readingLine(line: ReadingLine, top: number): string {
  const place: StripPlace = { scale: SCALE, baseline: top + 40, top: top + 19, bottom: top + 46 };
  return `<text x="0" y="${top + 37}" font-size="12.5">${line.name}</text>${stripInk(line.strip, place)}`
    + names(line.named, top + 13, top + 18)
    + line.calculated.filter(SCALE.holds).map((position) => triangle(position, place.baseline, 'point')).join('')
    + line.expected.filter(({ position }) => SCALE.holds(position)).map(({ position }) => triangle(position, place.baseline, 'calculated')).join('')
    + names(line.expected, top + 59, null);
}

function names(all: ReadingLine['named'], baseline: number, leaderTo: number | null): string {
  const inside = all.filter(({ position }) => SCALE.holds(position));
  const centres = spreadLabels(inside.map(({ position }) => SCALE.at(position)), inside.map(({ parts }) => textWidth(parts, SIZE) + 7), SCALE.range);
  return inside.map(({ position, parts }, index) => {
    const [x, at] = [SCALE.at(position), centres[index]!];
    const leader = leaderTo !== null && Math.abs(at - x) > 3 ? `<path class="leader" d="M${c(at)} ${baseline + 1.5}L${c(x)} ${leaderTo}"/>` : '';
    return `${leader}<text${leaderTo === null ? ' class="note-text"' : ''} x="${c(at)}" y="${baseline}" text-anchor="middle" font-size="${SIZE}">${spans(parts, SIZE)}</text>`;
  }).join('');
}

function triangle(position: number, baseline: number, kind: 'point' | 'calculated'): string {
  return `<path class="${kind}" d="M${c(SCALE.at(position))} ${c(baseline + 2)}l2.9 5.4h-5.8Z"/>`;
}

function axis(top: number): string {
  const ticks = energyTicks(5000).map((wavenumber) =>
    `<path class="axis" d="M${c(SCALE.at(wavenumber))} ${top + 3}v4"/><text x="${c(SCALE.at(wavenumber))}" y="${top + 19}" text-anchor="middle" font-size="12">${wavenumber / 1000}</text>`);
  return `<path class="axis" d="M${SCALE.range[0]} ${top + 3}H${SCALE.range[1]}"/>${ticks.join('')}`
    + `<text x="0" y="${top + 19}" font-size="12"><tspan font-style="italic">ν̃</tspan> / 10³ cm⁻¹</text>`;
}

