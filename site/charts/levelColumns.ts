import type { SchemeBand, SchemeLevel } from './levelScheme.ts';
import { spreadLabels } from './spread.ts';
import { type Dress, svgElement } from './svg.ts';
import { type TextPart, coordinate as c, spans } from './text.ts';

/** The levels of one complex with its observed bands, under its name. */
export interface LevelColumn {
  readonly name: readonly TextPart[];
  readonly levels: readonly SchemeLevel[];
  readonly bands: readonly SchemeBand[];
}

const WIDTH = 760;
const [TOP, BOTTOM] = [14, 400];
const AXIS = 52;
const SIZE = 12;

/** The levels of several complexes side by side on one energy axis: strokes (spin-allowed full, others thin and dashed), observed bands as dots. */
export function levelColumns(columns: readonly LevelColumn[], dress: Dress): string {
  const energies = columns.flatMap(({ levels, bands }) => [...levels.map(({ energy }) => energy), ...bands.map(({ observed }) => observed)]);
  const top = 5000 * Math.ceil((1.04 * Math.max(1000, ...energies)) / 5000);
  const y = (energy: number): number => BOTTOM - ((BOTTOM - TOP) * energy) / top;
  const step = top > 30000 ? 10000 : 5000;
  const ticks = Array.from({ length: Math.floor(top / step) + 1 }, (_, index) => index * step).map((energy) =>
    `<path class="axis" d="M${AXIS} ${c(y(energy))}h-5"/><text x="${AXIS - 9}" y="${c(y(energy) + 4)}" text-anchor="end" font-size="12">${energy / 1000}</text>`);
  const axis = `<path class="axis" d="M${AXIS} ${TOP}V${BOTTOM}"/>${ticks.join('')}`
    + `<text transform="translate(14 ${(TOP + BOTTOM) / 2}) rotate(-90)" text-anchor="middle" font-size="12.5"><tspan font-style="italic">E</tspan> / 10³ cm⁻¹</text>`;
  const room = (WIDTH - AXIS - 12) / Math.max(2, columns.length);
  return svgElement(dress, WIDTH, BOTTOM + 30, axis + columns.map((column, index) => drawn(column, AXIS + 14 + room * index, room, y)).join(''));
}

function drawn({ name, levels, bands }: LevelColumn, left: number, room: number, y: (energy: number) => number): string {
  const [from, to] = [left + 12, left + Math.min(70, room * 0.5)];
  const places = spreadLabels(levels.map(({ energy }) => y(energy)), levels.map(() => SIZE + 1), [TOP - 6, BOTTOM + 8]);
  const strokes = levels.map(({ energy, parts, spinAllowed }, index) =>
    `<path class="level${spinAllowed ? '' : ' forbidden'}" d="M${c(from)} ${c(y(energy))}H${c(to)}"/>`
    + `<path class="leader" d="M${c(to + 2)} ${c(y(energy))}L${c(to + 10)} ${c(places[index]!)}"/>`
    + `<text x="${c(to + 13)}" y="${c(places[index]! + 4)}" font-size="${SIZE}">${spans(parts, SIZE)}</text>`);
  const dots = bands.map(({ observed, used }) => `<circle class="${used ? 'mark' : 'mark-open'}" cx="${c(left + 3)}" cy="${c(y(observed))}" r="3"/>`);
  return `${strokes.join('')}${dots.join('')}<text x="${c(left)}" y="${BOTTOM + 24}" font-size="12.5">${spans(name, 12.5)}</text>`;
}
