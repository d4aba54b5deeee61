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
/** Height of a line with names above it, and what names below it add. */
const LINE = 48;
const BELOW = 13;
const GAP = 4;
const AXIS = 28;
const SIZE = 11.5;
const SCALE = energyScale([MARGIN, WIDTH - 8]);

/**
 * Readings of the same bands one under the other on one axis: above each line the names the reading gives to the bands, under
 * it small triangles where its fit puts them, and named open triangles where it expects more.
 */
export function readingsFigure(lines: readonly ReadingLine[], dress: { readonly id: string; readonly title: string; readonly description: string }): string {
  let top = 0;
  const drawn = lines.map((line) => {
    const markup = readingLine(line, top);
    top += LINE + (line.expected.some(({ position }) => SCALE.holds(position)) ? BELOW : GAP);
    return markup;
  });
  return svgElement(dress, WIDTH, top + AXIS, drawn.join('') + axis(top));
}

function readingLine(line: ReadingLine, top: number): string {
  const place: StripPlace = { scale: SCALE, baseline: top + 36, top: top + 17, bottom: top + 42 };
  return `<text x="0" y="${top + 33}" font-size="12.5">${line.name}</text>${stripInk(line.strip, place)}`
    + names(line.named, top + 11, top + 16)
    + line.calculated.filter(SCALE.holds).map((position) => triangle(position, place.baseline, 'point')).join('')
    + line.expected.filter(({ position }) => SCALE.holds(position)).map(({ position }) => triangle(position, place.baseline, 'calculated')).join('')
    + names(line.expected, top + 56.5, null);
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

