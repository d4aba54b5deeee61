import { type Dress, svgElement } from './svg.ts';
import { type TextPart, coordinate as c, spans, textWidth } from './text.ts';

/** What stands in a corner: a single ligand's symbol or a chelate's donor atom. */
export interface Corner {
  readonly parts: readonly TextPart[];
  /** Donors with the same number belong to one chelate ligand and are joined by an arc, one after the other; null: a ligand of its own. */
  readonly chelate: number | null;
}

type Depth = 'plain' | 'front' | 'back';

interface Place { readonly x: number; readonly y: number; readonly depth: Depth }

const SIZE = 13.5;

/** Above, below, then around from the right behind: two bonds come forward (wedges), two go back (rungs). */
const OCTAHEDRON: readonly Place[] = [
  { x: 0, y: -52, depth: 'plain' }, { x: 0, y: 52, depth: 'plain' },
  { x: 44, y: -22, depth: 'back' }, { x: 44, y: 22, depth: 'front' }, { x: -44, y: 22, depth: 'front' }, { x: -44, y: -22, depth: 'back' },
];
const TETRAHEDRON: readonly Place[] = [
  { x: 0, y: -48, depth: 'plain' }, { x: -44, y: 20, depth: 'plain' }, { x: 18, y: 42, depth: 'front' }, { x: 45, y: 10, depth: 'back' },
];

/**
 * Donors around a metal, octahedron or tetrahedron: wedges come forward, rungs go back, arcs join the donors of a chelate.
 * @param corners six (above, below, then around: right behind, right before, left before, left behind) or four
 * @throws RangeError for any other number
 */
export function schematicFigure(metal: string, corners: readonly Corner[], dress: Dress): string {
  const places = corners.length === 6 ? OCTAHEDRON : corners.length === 4 ? TETRAHEDRON : null;
  if (places === null) throw new RangeError(`a schematic has four or six corners, found ${corners.length}`);
  const bonds = places.map((place) => bond(place));
  const labels = corners.map(({ parts }, index) => label(parts, places[index]!));
  const arcs = chelateArcs(corners, places);
  const [left, right] = [Math.min(-64, ...labels.map((one) => one.left)), Math.max(64, ...labels.map((one) => one.right))].map((value) => Math.ceil(value)) as [number, number];
  const [top, bottom] = [-72, 74];
  const content = `<g transform="translate(${c(-left + 4)} ${c(-top)})">${arcs}${bonds.join('')}`
    + `<text x="0" y="${c(0.34 * SIZE)}" text-anchor="middle" font-size="${SIZE}">${spans([{ text: metal, style: 'plain' }], SIZE)}</text>${labels.map(({ markup }) => markup).join('')}</g>`;
  return svgElement(dress, right - left + 8, bottom - top, content);
}

function bond({ x, y, depth }: Place): string {
  const length = Math.hypot(x, y);
  const [ux, uy] = [x / length, y / length];
  const [start, end] = [12, length - 10];
  const at = (distance: number, offset: number): string => `${c(ux * distance - uy * offset)} ${c(uy * distance + ux * offset)}`;
  if (depth === 'plain') return `<path class="bond" d="M${at(start, 0)}L${at(end, 0)}"/>`;
  if (depth === 'front') return `<path class="wedge" d="M${at(start, 0)}L${at(end, 2.8)}L${at(end, -2.8)}Z"/>`;
  const rungs = Array.from({ length: 6 }, (_, rung) => [start + ((rung + 0.5) / 6) * (end - start), 0.6 + 2.2 * ((rung + 0.5) / 6)] as const);
  return `<path class="bond" d="${rungs.map(([distance, half]) => `M${at(distance, half)}L${at(distance, -half)}`).join('')}"/>`;
}

/** Beside its corner, away from the metal; above and below centred. */
function label(parts: readonly TextPart[], { x, y }: Place): { readonly markup: string; readonly left: number; readonly right: number } {
  const width = textWidth(parts, SIZE) + 4;
  const first = 0.36 * SIZE;
  // Centred on its first or last letter, so that the bond ends at the donor's end of a long symbol.
  const [anchor, at] = Math.abs(x) < 10 ? ['middle', x] : x > 0 ? ['start', x - first] : ['end', x + first];
  const baseline = y + 0.34 * SIZE + (Math.abs(x) < 10 ? Math.sign(y) * 3 : 0);
  const edges = anchor === 'middle' ? [at - width / 2, at + width / 2] : anchor === 'start' ? [at, at + width] : [at - width, at];
  return { markup: `<text x="${c(at)}" y="${c(baseline)}" text-anchor="${anchor}" font-size="${SIZE}">${spans(parts, SIZE)}</text>`, left: edges[0]!, right: edges[1]! };
}

/** An arc outside the corners from each donor of a chelate to its next. */
function chelateArcs(corners: readonly Corner[], places: readonly Place[]): string {
  const joined = corners.flatMap(({ chelate }, index) => (chelate === null ? [] : [{ chelate, index }]));
  const arcs: string[] = [];
  for (const number of new Set(joined.map(({ chelate }) => chelate))) {
    const members = joined.filter(({ chelate }) => chelate === number).map(({ index }) => index);
    for (const [from, to] of members.slice(1).map((member, step) => [members[step]!, member] as const)) arcs.push(arc(places[from]!, places[to]!));
  }
  return arcs.length === 0 ? '' : `<path class="chelate" d="${arcs.join('')}"/>`;
}

function arc(a: Place, b: Place): string {
  // Corners on one side bend out to that side, those across the front or the back bend down or up.
  const [mx, my] = [(a.x + b.x) / 2, (a.y + b.y) / 2];
  const distance = Math.hypot(mx, my) || 1;
  const out = 62;
  const [cx, cy] = [(mx / distance) * out * 1.3, (my / distance) * out * 1.3];
  const from = trimmed(a, cx, cy);
  const to = trimmed(b, cx, cy);
  return `M${from}Q${c(cx)} ${c(cy)} ${to}`;
}

const trimmed = ({ x, y }: Place, cx: number, cy: number): string => {
  const length = Math.hypot(cx - x, cy - y) || 1;
  return `${c(x + ((cx - x) / length) * 10)} ${c(y + ((cy - y) / length) * 10)}`;
};
