// One cell read into the text that a record would hold, and back.

import { parseIon, plainCharacters, readIonLoosely } from '#engine';
import type { CellKind } from './fields.ts';
import type { Column, Mapping } from './mapping.ts';

export type Settings = Pick<Mapping, 'decimal' | 'missing'>;

/** A point where the table declares decimal commas: thousands, or a slip. */
export interface PointFound {
  readonly found: string;
  readonly mended: string;
}

const numeric: ReadonlySet<CellKind> = new Set(['energy', 'temperature', 'coefficient', 'number', 'with-unit', 'range', 'uncertainty']);

/** The content of a cell without blanks around it, null where it says that nothing is known. */
export function contentOf(cell: string, { missing }: Pick<Settings, 'missing'>): string | null {
  const text = cell.replace(/\r\n?/g, '\n').trim();
  return text === '' || missing.includes(text) ? null : text;
}

/** A point in a number of a table with decimal commas, or null. */
export function pointFound(text: string, kind: CellKind, { decimal }: Pick<Settings, 'decimal'>): PointFound | null {
  if (decimal !== 'comma' || !numeric.has(kind) || !/\d\.\d/.test(text)) return null;
  return { found: text, mended: text.replace(/(\d)\.(?=\d)/g, /\d\.\d{3}(?!\d)/.test(text) ? '$1' : '$1,') };
}

/** The text that a record holds for a cell's content. Numbers get points and the column's unit, terms and ions their usual spelling. */
export function typedFromCell(content: string, kind: CellKind, unit: string | null, { decimal }: Pick<Settings, 'decimal'>): string {
  if (!numeric.has(kind)) return wordFromCell(content, kind);
  const pointed = decimal === 'comma' ? content.replace(/(\d),(?=\d)/g, '$1.') : content;
  if (unit === null || kind === 'uncertainty' || hasUnit(pointed) || (kind === 'temperature' && /^[a-z ]+$/i.test(pointed))) return pointed;
  const coverage = /[ ,;]*\(? ?k ?= ?[\d.]+ ?\)?$/i.exec(pointed)?.[0] ?? '';
  return `${pointed.slice(0, pointed.length - coverage.length)} ${unitTyped(unit)}${coverage}`;
}

/** The content of a cell for a record's text: the reverse of typedFromCell. */
export function cellFromTyped(typed: string, kind: CellKind, unit: string | null, { decimal }: Pick<Settings, 'decimal'>): string {
  if (!numeric.has(kind)) return typed;
  const coverage = /[ ,;]*\(? ?k ?= ?[\d.]+ ?\)?$/i.exec(typed)?.[0] ?? '';
  const body = typed.slice(0, typed.length - coverage.length);
  const ending = unit === null ? '' : ` ${unitTyped(unit)}`;
  const bare = ending !== '' && body.endsWith(ending) && !hasUnit(body.slice(0, -ending.length)) ? body.slice(0, -ending.length) : body;
  return decimal === 'comma' ? `${bare}${coverage}`.replace(/(\d)\.(?=\d)/g, '$1,') : `${bare}${coverage}`;
}

/** A unit as records type it: 1000 cm-1 is kK. */
export function unitTyped(unit: string): string {
  const plain = plainCharacters(unit).replace(/\s+/g, ' ');
  return /^(10\^?3|1000|k) ?cm\^?-1$/.test(plain) ? 'kK' : plain;
}

function hasUnit(text: string): boolean {
  return /[a-z°%]/i.test(plainCharacters(text).replace(/\(? ?k ?= ?[\d.]+ ?\)?$/i, '').replace(/ to /g, ' ').replaceAll('µ', 'u'));
}

function wordFromCell(content: string, kind: CellKind): string {
  if (kind === 'term') return termFromCell(content);
  if (kind === 'ion') return parseIon(content).ion === null ? (readIonLoosely(content)?.name ?? content) : content;
  if (kind === 'geometry') return geometries.find(([pattern]) => pattern.test(content))?.[1] ?? content;
  if (kind === 'spin') return /^(hs|high[ -]?spin)$/i.test(content) ? 'high' : /^(ls|low[ -]?spin)$/i.test(content) ? 'low' : content;
  return content;
}

const geometries: readonly (readonly [RegExp, string])[] = [[/^(oh|oct\.?|octahedron)$/i, 'octahedral'], [/^(td|tet\.?|tetr\.?|tetrahedron)$/i, 'tetrahedral']];

/** The upper level of "4A2g → 4T2g" and "4T2g ← 4A2g", with plain digits and letters; anything else stays as it is. */
function termFromCell(content: string): string {
  const [from, to] = content.split(/→|->|=>/);
  const upper = to ?? content.split(/←|<-|<=/)[0] ?? from ?? content;
  return upper.trim().replace(/[₀-₉]/g, (digit) => String('₀₁₂₃₄₅₆₇₈₉'.indexOf(digit))).replace(/[⁰¹²³⁴-⁹]/g, (digit) => String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit))).replaceAll('ᵍ', 'g');
}

/** A position's cell taken apart. */
export interface PositionCell {
  readonly number: string;
  readonly shoulder: boolean;
  readonly epsilon: string | null;
}

/** "28600 sh" is a shoulder; brackets hold the epsilon where the column says so. */
export function positionParts(content: string, brackets: Column['brackets']): PositionCell {
  const bracketed = brackets === 'epsilon' ? /^(.*?)\s*[([]([^()[\]]*)[)\]](.*)$/.exec(content) : null;
  const inside = bracketed === null ? '' : /^(?:ε|e|eps\.?|epsilon)?\s*=?\s*(.*)$/i.exec(bracketed[2]!.trim())![1]!;
  const rest = bracketed === null ? content : `${bracketed[1]} ${bracketed[3]!.trim()}`.trim();
  const sh = /^(.*?)[ ,;]*\(?\bsh\b\.?\)?$/i.exec(rest);
  const shInside = /^sh\.?$/i.test(inside);
  return { number: (sh?.[1] ?? rest).trim(), shoulder: sh !== null || shInside, epsilon: inside === '' || shInside ? null : inside };
}

/** A position with the uncertainty of a column of its own, "21550(60) cm-1"; both with points already. */
export function withUncertainty(position: string, u: string): string {
  const found = /^([\d ]*\d(?:\.\d+)?)(.*)$/.exec(position);
  if (found === null || !/^\d+(\.\d+)?$/.test(u)) return `${position} ± ${u}`;
  const [, number = '', rest = ''] = found;
  return `${number}(${inBrackets(number, u)})${rest}`;
}

/** Digits of u in the last place of the number where they fit; with a point of its own, as it stands, where u is finer. */
function inBrackets(number: string, u: string): string {
  const places = decimals(number);
  if (decimals(u) > places) return u;
  const digits = `${u.replace('.', '')}${'0'.repeat(places - decimals(u))}`.replace(/^0+(?=\d)/, '');
  return digits;
}

/** The reverse: number with unit, and the uncertainty as a decimal; null where there is none in brackets or it has two sides. */
export function withoutUncertainty(position: string): { readonly position: string; readonly u: string | null } {
  const found = /^([\d ]*\d(?:\.\d+)?) ?\((\d+(?:\.\d+)?)\)(.*)$/.exec(position);
  if (found === null || /k ?=/.test(position)) return { position, u: null };
  const [, number = '', bracket = '', rest = ''] = found;
  const places = decimals(number);
  if (bracket.includes('.') || places === 0) return { position: `${number}${rest}`, u: bracket };
  const padded = bracket.padStart(places + 1, '0');
  return { position: `${number}${rest}`, u: `${padded.slice(0, -places)}.${padded.slice(-places)}` };
}

function decimals(number: string): number {
  const point = number.indexOf('.');
  return point < 0 ? 0 : number.length - point - 1;
}
