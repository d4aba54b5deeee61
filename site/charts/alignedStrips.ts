import { energyScale, energyTicks } from './energyAxis.ts';
import { type StripRow, stripInk } from './strip.ts';
import { type Dress, svgElement } from './svg.ts';
import { type TextPart, coordinate as c, spans } from './text.ts';

/** One strip of several with what it is called. */
export interface NamedStrip {
  readonly name: readonly TextPart[];
  readonly row: StripRow;
}

const WIDTH = 760;
const TOP = 26;
const STEP = 62;
const SCALE = energyScale([8, WIDTH - 8]);
const WAVELENGTHS = [250, 300, 350, 400, 500, 600, 700, 1000, 2000];

/** Several band strips over one another on one energy axis, wavelength above and wavenumber below. */
export function alignedStrips(strips: readonly NamedStrip[], dress: Dress): string {
  const bottom = TOP + STEP * strips.length + 6;
  const rows = strips.map(({ name, row }, index) => {
    const y = TOP + STEP * index;
    return `<text x="8" y="${y + 15}" font-size="13">${spans(name, 13)}</text>` + stripInk(row, { scale: SCALE, baseline: y + 54, top: y + 22, bottom: y + 62 });
  });
  return svgElement(dress, WIDTH, bottom + 40, wavelengthAxis() + rows.join('') + wavenumberAxis(bottom));
}

function wavelengthAxis(): string {
  const ticks = WAVELENGTHS.map((nm) => {
    const x = c(SCALE.at(1e7 / nm));
    return `<path class="axis" d="M${x} 17v4"/><text class="note-text" x="${x}" y="13" text-anchor="middle" font-size="11.5">${nm}</text>`;
  });
  return `${ticks.join('')}<text class="note-text" x="${c(SCALE.range[1])}" y="13" text-anchor="end" font-size="11.5"><tspan font-style="italic">λ</tspan> / nm</text>`;
}

function wavenumberAxis(y: number): string {
  const ticks = energyTicks(5000).map((wavenumber) => {
    const x = c(SCALE.at(wavenumber));
    return `<path class="axis" d="M${x} ${y}v4"/><text x="${x}" y="${y + 17}" text-anchor="middle" font-size="12.5">${wavenumber / 1000}</text>`;
  });
  return `<path class="axis" d="M${c(SCALE.range[0])} ${y}H${c(SCALE.range[1])}"/>${ticks.join('')}`
    + `<text x="${WIDTH / 2}" y="${y + 36}" text-anchor="middle" font-size="12.5"><tspan font-style="italic">ν̃</tspan> / 10³ cm⁻¹</text>`;
}
