import type { Coverage } from './types.ts';

/** A whole number or decimal without sign; spaces only between groups of three digits. */
export const numberPattern = String.raw`(?:\d{1,3}(?: \d{3})+|\d+)(?:\.(?:\d{3}(?: \d{3})*(?: \d{1,2})?(?!\d)|\d+))?`;

/** The pieces of a typed quantity; numbers as text without spaces. */
export interface Pieces {
  readonly negative: boolean;
  readonly number: string;
  /** Typed uncertainty towards each side, already in the unit of the number; null: none typed. */
  readonly minus: number | null;
  readonly plus: number | null;
  readonly unit: string;
  /** A unit typed beside the uncertainty too, "21550 cm-1 ± 60 cm-1". */
  readonly unitOfU: string;
  readonly k: string | null;
  readonly coverage: Coverage;
}

/** Where the grammar stops: the part that it cannot read. */
export type Split =
  | { readonly ok: true; readonly pieces: Pieces }
  | { readonly ok: false; readonly at: 'number' | 'brackets' | 'plus-minus'; readonly body: string };

const head = new RegExp(`^(-?) ?(${numberPattern})`);
const bare = new RegExp(`^${numberPattern}$`);
const coverageEnd = /^(.*?)[ ,;]*\(? ?k ?= ?([^()]*?) ?\)?$/i;
/** What cannot follow a number: more digits, an exponent, a second number. */
const digit = /^[\d.,'’_]|^[eE][+-]?\d|^ ?[x×*·] ?10|^ ?(-|to) ?\d/;

function close(text: string): string {
  return text.replace(/ /g, '');
}

/** Number of digits typed after the point. */
export function decimals(number: string): number {
  const point = number.indexOf('.');
  return point < 0 ? 0 : number.length - point - 1;
}

/** One side in brackets: without a point it counts the last digits of the number, with a point it is meant as it stands. */
function side(text: string, number: string): number | null {
  if (!bare.test(text)) return null;
  const typed = close(text);
  return typed.includes('.') ? Number(typed) : Number(`${typed}e-${decimals(number)}`);
}

function brackets(inside: string, number: string): { minus: number | null; plus: number | null } {
  const text = inside.trim();
  const up = /^\+ ?(.+?) ?[/,;]? ?- ?(.+)$/.exec(text);
  if (up) return { plus: side(up[1] ?? '', number), minus: side(up[2] ?? '', number) };
  const down = /^- ?(.+?) ?[/,;]? ?\+ ?(.+)$/.exec(text);
  if (down) return { minus: side(down[1] ?? '', number), plus: side(down[2] ?? '', number) };
  const both = side(text, number);
  return { minus: both, plus: both };
}

/** Splits typed text, in plain characters, into its pieces; checks neither units nor sizes. */
export function split(text: string): Split {
  const covered = coverageEnd.exec(text);
  let body = (covered?.[1] ?? text).trim();
  const k = covered ? (covered[2] ?? '').trim() : null;
  // "(21550 ± 60) cm-1" is the form of the SI Brochure: the brackets only gather.
  const gathered = /^\(([^()]*±[^()]*)\)(.*)$/.exec(body);
  if (gathered) body = `${(gathered[1] ?? '').trim()} ${(gathered[2] ?? '').trim()}`.trim();
  const [left = '', right, more] = body.split('±');
  if (more !== undefined) return { ok: false, at: 'plus-minus', body };
  const start = head.exec(left);
  const number = close(start?.[2] ?? '');
  let rest = left.slice(start?.[0].length ?? 0);
  if (!start || digit.test(rest) || /^ \d/.test(rest) && !/^ 1\/cm$/.test(rest.trimEnd())) return { ok: false, at: 'number', body };
  rest = rest.trim();
  const pieces = { negative: start[1] === '-', number, k, unitOfU: '' };
  if (right !== undefined) {
    const second = head.exec(right.trim());
    const after = right.trim().slice(second?.[0].length ?? 0);
    if (!second || second[1] === '-' || digit.test(after) || rest.startsWith('(')) return { ok: false, at: 'plus-minus', body };
    const u = Number(close(second[2] ?? ''));
    const last = after.trim();
    const coverage = k === null ? 'plus-minus' : 'k';
    return { ok: true, pieces: { ...pieces, minus: u, plus: u, unit: rest === '' ? last : rest, unitOfU: rest === '' ? '' : last, coverage } };
  }
  if (!rest.startsWith('(')) return { ok: true, pieces: { ...pieces, minus: null, plus: null, unit: rest, coverage: 'none' } };
  const end = rest.indexOf(')');
  const { minus, plus } = brackets(end < 0 ? '' : rest.slice(1, end), number);
  if (minus === null || plus === null) return { ok: false, at: 'brackets', body };
  return { ok: true, pieces: { ...pieces, minus, plus, unit: rest.slice(end + 1).trim(), coverage: k === null ? 'concise' : 'k' } };
}
