import { energyScale, energyTicks } from './energyAxis.ts';
import { svgElement } from './svg.ts';
import { spreadLabels } from './spread.ts';
import { type StripPlace, type StripRow, stripInk } from './strip.ts';
import { type TextPart, coordinate as c, spans, textWidth } from './text.ts';

/** A name to print above a band, or a calculated position to mark below the line. */
export interface StripLabel { readonly position: number; readonly parts: readonly TextPart[] }

const WIDTH = 760;
const HEIGHT = 142;
const PLACE: StripPlace = { scale: energyScale([8, WIDTH - 8]), baseline: 88, top: 52, bottom: 96 };
const WAVELENGTHS = [250, 300, 350, 400, 500, 600, 700, 1000, 2000];
const SIZE = 13;

/**
 * The large band strip: wavelength above, wavenumber below, each band named, and a small triangle under the line wherever
 * the fit puts a transition.
 */
export function stripFigure(
  row: StripRow, names: readonly StripLabel[], calculated: readonly number[],
  dress: { readonly id: string; readonly title: string; readonly description: string },
): string {
  return svgElement(dress, WIDTH, HEIGHT, [
    wavelengthAxis(), stripInk(row, PLACE), bandNames(names), ...calculated.filter(PLACE.scale.holds).map(triangle), wavenumberAxis(),
  ].join(''));
}

function wavelengthAxis(): string {
  const y = 18;
  const ticks = WAVELENGTHS.map((nm) => {
    const x = c(PLACE.scale.at(1e7 / nm));
    return `<path class="axis" d="M${x} ${y}v4"/><text class="note-text" x="${x}" y="${y - 4}" text-anchor="middle" font-size="11.5">${nm}</text>`;
  });
  return ticks.join('') + `<text class="note-text" x="${c(PLACE.scale.range[1])}" y="${y - 4}" text-anchor="end" font-size="11.5"><tspan font-style="italic">λ</tspan> / nm</text>`;
}

function wavenumberAxis(): string {
  const y = 106;
  const ticks = energyTicks(5000).map((wavenumber) => {
    const x = c(PLACE.scale.at(wavenumber));
    return `<path class="axis" d="M${x} ${y}v4"/><text x="${x}" y="${y + 17}" text-anchor="middle" font-size="12.5">${wavenumber / 1000}</text>`;
  });
  return `<path class="axis" d="M${c(PLACE.scale.range[0])} ${y}H${c(PLACE.scale.range[1])}"/>${ticks.join('')}`
    + `<text x="${WIDTH / 2}" y="${HEIGHT - 3}" text-anchor="middle" font-size="12.5"><tspan font-style="italic">ν̃</tspan> / 10³ cm⁻¹</text>`;
}

function bandNames(names: readonly StripLabel[]): string {
  const inside = names.filter(({ position }) => PLACE.scale.holds(position));
  const centres = spreadLabels(inside.map(({ position }) => PLACE.scale.at(position)), inside.map(({ parts }) => textWidth(parts, SIZE) + 8), PLACE.scale.range);
  return inside.map(({ position, parts }, index) => {
    const x = PLACE.scale.at(position);
    const at = centres[index]!;
    const leader = Math.abs(at - x) > 3 ? `<path class="leader" d="M${c(at)} 44L${c(x)} ${PLACE.top - 1}"/>` : '';
    return `${leader}<text x="${c(at)}" y="41" text-anchor="middle" font-size="${SIZE}">${spans(parts, SIZE)}</text>`;
  }).join('');
}

function triangle(position: number): string {
  const x = PLACE.scale.at(position);
  const y = PLACE.baseline + 2.5;
  return `<path class="calculated" d="M${c(x)} ${y}l3.4 6.4h-6.8Z"/>`;
}
