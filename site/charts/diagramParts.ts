import { shownLabel, termParts } from '#engine';
import { type LevelCurve, type LevelDiagram, below } from './levelCurves.ts';
import { spreadLabels } from './spread.ts';
import { svgElement } from './svg.ts';
import { type TextPart, coordinate as c, escapeText, spans } from './text.ts';

/** Where a diagram's Delta/B and E/B lie in its drawing, in pixels. */
export interface DiagramScales {
  readonly x: (value: number) => number;
  readonly y: (value: number) => number;
}

/** A complex at its fitted Delta/B with its observed bands. */
export interface DiagramMark {
  /** Short key printed above the diagram, "a". */
  readonly key: string;
  readonly x: number;
  /** E/B of each observed band; `used` false: not in the fit, drawn open. */
  readonly bands: readonly { readonly y: number; readonly used: boolean }[];
}

export const DIAGRAM_WIDTH = 760;
export const DIAGRAM_HEIGHT = 620;
export const DIAGRAM_MARGIN = { left: 46, right: 84, top: 76, bottom: 46 };
export const DIAGRAM_GUTTER = 34;
const LABEL = 12.5;
/** What a term label takes across its line: the raised multiplicity of one must clear the lowered g of the next. */
const PITCH = 1.26;

/** Upper end of the E/B axis: room for every mark and for the spin-allowed levels over most of the field axis. */
export function diagramCeiling(reach: number, marks: readonly DiagramMark[]): number {
  const highest = Math.max(0, ...marks.flatMap((mark) => mark.bands.map((band) => band.y)));
  return Math.min(120, Math.max(40, 10 * Math.ceil(Math.max(1.12 * highest, 1.5 * reach) / 10)));
}

/** All that lies over the level lines: frame, changes of the ground level, labels, complexes. */
export function diagramOver(scales: DiagramScales, diagram: LevelDiagram, ceiling: number, marks: readonly DiagramMark[]): string {
  return [frame(scales, diagram), crossingLines(scales, diagram), termLabels(scales, diagram, ceiling), levelLabels(scales, diagram, ceiling), complexMarks(scales, marks)].join('');
}

function frame({ x, y }: DiagramScales, { reach }: LevelDiagram): string {
  const [left, right, bottom] = [DIAGRAM_MARGIN.left, x(reach), y(0)];
  const middle = (x(0) + right) / 2;
  const upright = (DIAGRAM_MARGIN.top + bottom) / 2;
  return `<path class="axis" d="M${c(left)} ${DIAGRAM_MARGIN.top}V${c(bottom)}M${c(x(0))} ${c(bottom)}H${c(right)}M${c(x(0))} ${DIAGRAM_MARGIN.top}V${c(bottom)}"/>`
    + `<text x="${c(middle)}" y="${DIAGRAM_HEIGHT - 6}" text-anchor="middle" font-size="14"><tspan font-style="italic">Δ</tspan>/<tspan font-style="italic">B</tspan></text>`
    + `<text transform="translate(13 ${c(upright)}) rotate(-90)" text-anchor="middle" font-size="14"><tspan font-style="italic">E</tspan>/<tspan font-style="italic">B</tspan></text>`;
}

function crossingLines({ x, y }: DiagramScales, { grounds }: LevelDiagram): string {
  return grounds.slice(1).map(({ from }) => `<path class="crossing" d="M${c(x(from))} ${DIAGRAM_MARGIN.top}V${c(y(0))}"/>`).join('');
}

/** Free-ion terms in the gutter between the axis and Delta = 0. */
function termLabels({ x, y }: DiagramScales, { terms }: LevelDiagram, ceiling: number): string {
  const shown = terms.filter((term) => term.y <= ceiling);
  const placed = spreadLabels(shown.map((term) => y(term.y)), shown.map(() => LABEL + 1), [DIAGRAM_MARGIN.top, y(0) + 6]);
  return shown.map((term, index) => {
    const parts: TextPart[] = [{ text: String(term.multiplicity), style: 'super' }, { text: term.letter ?? '…', style: 'plain' }];
    return label(parts, x(0) - 5, placed[index]!, 'end', leader(x(0) - 4, placed[index]!, x(0), y(term.y)), LABEL);
  }).join('');
}

/** One label a level: at the right end, or above the top edge where the level leaves through it. */
function levelLabels({ x, y }: DiagramScales, diagram: LevelDiagram, ceiling: number): string {
  const ends = diagram.curves.map((curve) => ({ curve, piece: below(curve.points, ceiling).at(-1) }))
    .filter((end): end is { curve: LevelCurve; piece: readonly { x: number; y: number }[] } => end.piece !== undefined);
  const right = ends.filter(({ piece }) => piece.at(-1)!.x === diagram.reach);
  const top = ends.filter(({ piece }) => piece.at(-1)!.x < diagram.reach);
  // Where there are many labels at an edge, they are set smaller rather than on each other.
  const [upper, lower] = [DIAGRAM_MARGIN.top - 6, y(0) + 8];
  const pitch = Math.min(PITCH * LABEL, (lower - upper) / Math.max(1, right.length));
  const heights = spreadLabels(right.map(({ piece }) => y(piece.at(-1)!.y)), right.map(() => pitch), [upper, lower]);
  const [from, to] = [x(0) - 20, x(diagram.reach) + 10];
  const extent = Math.min(PITCH * LABEL, (to - from) / Math.max(1, top.length));
  const places = spreadLabels(top.map(({ piece }) => x(piece.at(-1)!.x)), top.map(() => extent), [from, to]);
  return right.map(({ curve, piece }, index) => label(labelParts(curve, diagram), x(diagram.reach) + 13, heights[index]!, 'start',
    leader(x(diagram.reach), y(piece.at(-1)!.y), x(diagram.reach) + 11, heights[index]!), pitch / PITCH)).join('')
    + top.map(({ curve, piece }, index) => label(labelParts(curve, diagram), places[index]!, DIAGRAM_MARGIN.top - 19, 'turned',
      leader(x(piece.at(-1)!.x), DIAGRAM_MARGIN.top, places[index]!, DIAGRAM_MARGIN.top - 16), extent / PITCH)).join('');
}

function labelParts(curve: LevelCurve, { ion }: LevelDiagram): readonly TextPart[] {
  return curve.labels.flatMap((one, index) => [...(index > 0 ? [{ text: ', ', style: 'plain' as const }] : []), ...termParts(shownLabel(one, ion.electrons))]);
}

function leader(fromX: number, fromY: number, toX: number, toY: number): string {
  return `<path class="leader" d="M${c(fromX)} ${c(fromY)}L${c(toX)} ${c(toY)}"/>`;
}

function label(parts: readonly TextPart[], x: number, y: number, anchor: 'start' | 'end' | 'turned', line: string, size: number): string {
  const place = anchor === 'turned'
    ? `transform="translate(${c(x + 4)} ${c(y)}) rotate(-90)"`
    : `x="${c(x)}" y="${c(y + 4)}" text-anchor="${anchor}"`;
  return `${line}<text ${place} font-size="${c(size)}">${spans(parts, size)}</text>`;
}

/** Where Delta/B and E/B lie in the drawing: the scales that Plot makes, so that marks can be laid over a finished diagram. */
export function diagramPlace(reach: number, ceiling: number): DiagramScales {
  const left = DIAGRAM_MARGIN.left + DIAGRAM_GUTTER;
  const bottom = DIAGRAM_HEIGHT - DIAGRAM_MARGIN.bottom;
  return {
    x: (value) => left + ((DIAGRAM_WIDTH - DIAGRAM_MARGIN.right - left) * value) / reach,
    y: (value) => bottom - ((bottom - DIAGRAM_MARGIN.top) * value) / ceiling,
  };
}

/** Marks alone, to be laid over the diagram of the same reach and ceiling. */
export function diagramOverlay(reach: number, ceiling: number, marks: readonly DiagramMark[], dress: { readonly id: string; readonly title: string; readonly description: string }): string {
  return svgElement(dress, DIAGRAM_WIDTH, DIAGRAM_HEIGHT, complexMarks(diagramPlace(reach, ceiling), marks));
}

/** More complexes than this, and their uprights shrink to ticks. */
const MOST_UPRIGHTS = 12;
const KEY_SIZE = 12.5;

/** Complexes in the accent colour: an upright at Delta/B, dots at observed bands, the key above the field axis. */
function complexMarks({ x, y }: DiagramScales, marks: readonly DiagramMark[]): string {
  const keyed = marks.filter((mark) => mark.key !== '');
  const places = spreadLabels(keyed.map((mark) => x(mark.x)), keyed.map((mark) => 5 + 7 * mark.key.length), [x(0), DIAGRAM_WIDTH]);
  const base = y(0);
  const uprights = marks.map((mark) => `M${c(x(mark.x))} ${c(base)}V${c(marks.length > MOST_UPRIGHTS ? base - 5 : DIAGRAM_MARGIN.top)}`).join('');
  const dots = marks.flatMap((mark) => mark.bands.map((band) => `<circle class="${band.used ? 'mark' : 'mark-open'}" cx="${c(x(mark.x))}" cy="${c(y(band.y))}" r="${marks.length > MOST_UPRIGHTS ? 2.6 : 3.2}"/>`)).join('');
  const keys = keyed.map((mark, index) => {
    const [at, place] = [x(mark.x), places[index]!];
    const line = marks.length > MOST_UPRIGHTS || Math.abs(at - place) > 3 ? `<path class="mark-thin" d="M${c(at)} ${c(base - 5)}L${c(place)} ${c(base - 16)}"/>` : '';
    return `${line}<text class="mark-text" x="${c(place)}" y="${c(base - 19)}" text-anchor="middle" font-size="${KEY_SIZE}" font-style="italic">${escapeText(mark.key)}</text>`;
  }).join('');
  return `<path class="mark-thin" d="${uprights}"/>${dots}${keys}`;
}
