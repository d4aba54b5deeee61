import { svgElement } from './svg.ts';
import { type TextPart, coordinate as c, escapeText, spans, textWidth } from './text.ts';

/** One cell of a map. What it is shows by its form: in a frame, slanted without one, a ring, or a mere dot. */
export interface MapMark {
  readonly form: 'framed' | 'slanted' | 'ring' | 'dot';
  /** Printed in a framed or slanted cell. */
  readonly text: string;
  /** A triangle at the corner: found above or below what was predicted; full where far. */
  readonly flag: 'above' | 'far above' | 'below' | 'far below' | null;
}

const CELL = 37;
const ROW = 22;
const SIZE = 11;
const HEAD = 12.5;

/** A grid of marks, rows against columns, with a hairline for each row; it reads in grey and without colour. */
export function mapFigure(
  rows: readonly { readonly label: readonly TextPart[]; readonly cells: readonly MapMark[] }[], columns: readonly (readonly TextPart[])[],
  dress: { readonly id: string; readonly title: string; readonly description: string },
): string {
  const left = 14 + Math.max(40, ...rows.map(({ label }) => textWidth(label, HEAD)));
  const top = 14 + Math.max(20, ...columns.map((label) => textWidth(label, HEAD)));
  const [width, height] = [left + CELL * columns.length + 8, top + ROW * rows.length + 8];
  const heads = columns.map((label, index) => `<text transform="translate(${c(left + CELL * (index + 0.5) + 4)} ${c(top - 6)}) rotate(-90)" font-size="${HEAD}">${spans(label, HEAD)}</text>`).join('');
  const body = rows.map(({ label, cells }, row) => {
    const middle = top + ROW * (row + 0.5);
    return `<path class="hairline" d="M${c(left)} ${c(top + ROW * (row + 1))}H${c(width - 8)}"/>`
      + `<text x="${c(left - 8)}" y="${c(middle + 4.3)}" text-anchor="end" font-size="${HEAD}">${spans(label, HEAD)}</text>`
      + cells.map((cell, column) => mark(cell, left + CELL * (column + 0.5), middle)).join('');
  }).join('');
  return svgElement(dress, Math.ceil(width), Math.ceil(height), `<path class="axis" d="M${c(left)} ${c(top)}H${c(width - 8)}"/>${heads}${body}`);
}

function mark({ form, text, flag }: MapMark, x: number, y: number): string {
  if (form === 'dot') return `<circle class="leader" cx="${c(x)}" cy="${c(y)}" r="0.9"/>`;
  if (form === 'ring') return `<circle class="calculated" cx="${c(x)}" cy="${c(y)}" r="3.2"/>`;
  const number = `<text x="${c(x)}" y="${c(y + 3.9)}" text-anchor="middle" font-size="${SIZE}"${form === 'slanted' ? ' font-style="italic" class="note-text"' : ''}>${escapeText(text)}</text>`;
  if (form === 'slanted') return number;
  return `<path class="frame" d="M${c(x - CELL / 2 + 1.5)} ${c(y - ROW / 2 + 2)}h${c(CELL - 3)}v${c(ROW - 4)}h${c(3 - CELL)}z"/>${number}${flag === null ? '' : triangle(flag, x + CELL / 2 - 1.5, y)}`;
}

/** In the upper corner of the cell for above, in the lower for below. */
function triangle(flag: NonNullable<MapMark['flag']>, right: number, y: number): string {
  const up = flag === 'above' || flag === 'far above';
  const [corner, inner] = up ? [y - ROW / 2 + 2, y - ROW / 2 + 9] : [y + ROW / 2 - 2, y + ROW / 2 - 9];
  return `<path class="${flag.startsWith('far') ? 'point' : 'flag'}" d="M${c(right)} ${c(corner)}H${c(right - 7)}L${c(right)} ${c(inner)}Z"/>`;
}
