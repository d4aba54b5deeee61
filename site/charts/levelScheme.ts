import { svgElement } from './svg.ts';
import { spreadLabels } from './spread.ts';
import { type TextPart, coordinate as c, spans } from './text.ts';

export interface SchemeLevel { readonly energy: number; readonly parts: readonly TextPart[]; readonly spinAllowed: boolean }
export interface SchemeBand { readonly observed: number; readonly used: boolean }

const WIDTH = 300;
const HEIGHT = 350;
const TOP = 14;
const BOTTOM = 330;
const AXIS = 52;
const [LEFT, RIGHT] = [150, 216];
const SIZE = 12.5;

/**
 * Energies of one complex at its fitted parameters: levels as strokes (spin-allowed full, others thin and dashed), the observed
 * bands as arrows from the ground level.
 * @param levels ascending, the ground level at 0 first
 */
export function levelScheme(levels: readonly SchemeLevel[], bands: readonly SchemeBand[], dress: { readonly id: string; readonly title: string; readonly description: string }): string {
  const top = 5000 * Math.ceil((1.04 * Math.max(1000, ...levels.map((level) => level.energy), ...bands.map((band) => band.observed))) / 5000);
  const y = (energy: number): number => BOTTOM - ((BOTTOM - TOP) * energy) / top;
  const step = top > 30000 ? 10000 : 5000;
  const ticks = Array.from({ length: Math.floor(top / step) + 1 }, (_, index) => index * step).map((energy) =>
    `<path class="axis" d="M${AXIS} ${c(y(energy))}h-5"/><text x="${AXIS - 9}" y="${c(y(energy) + 4)}" text-anchor="end" font-size="12">${energy / 1000}</text>`);
  const axis = `<path class="axis" d="M${AXIS} ${TOP}V${BOTTOM}"/>${ticks.join('')}`
    + `<text transform="translate(14 ${(TOP + BOTTOM) / 2}) rotate(-90)" text-anchor="middle" font-size="12.5"><tspan font-style="italic">E</tspan> / 10³ cm⁻¹</text>`;
  const places = spreadLabels(levels.map((level) => y(level.energy)), levels.map(() => SIZE + 1), [TOP - 8, BOTTOM + 10]);
  const strokes = levels.map((level, index) =>
    `<path class="level${level.spinAllowed ? '' : ' forbidden'}" d="M${LEFT} ${c(y(level.energy))}H${RIGHT}"/>`
    + `<path class="leader" d="M${RIGHT + 2} ${c(y(level.energy))}L${RIGHT + 12} ${c(places[index]!)}"/>`
    + `<text x="${RIGHT + 15}" y="${c(places[index]! + 4)}" font-size="${SIZE}">${spans(level.parts, SIZE)}</text>`);
  const width = Math.min(18, (LEFT - AXIS - 20) / Math.max(1, bands.length));
  const arrows = bands.map((band, index) => {
    const x = LEFT - 14 - width * (bands.length - 1 - index);
    const tip = y(band.observed);
    return `<path class="mark-line" d="M${c(x)} ${c(y(0))}V${c(tip + 5)}"${band.used ? '' : ' stroke-dasharray="2 2"'}/><path class="mark" d="M${c(x)} ${c(tip)}l3 7h-6Z"/>`;
  });
  return svgElement(dress, WIDTH, HEIGHT, axis + strokes.join('') + arrows.join(''));
}
