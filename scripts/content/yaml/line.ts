// Small readers of one line of YAML, and the state that a scan carries from line to line.

import type { Place } from '../node.ts';
import { fieldNames } from '../schema/names.ts';

/** One open brace or bracket. `key` is the field being read; `last` the plain value before the latest comma. */
export interface FlowFrame {
  readonly kind: '{' | '[';
  key: string | null;
  /** Line on which the key was read. */
  keyLine: number;
  last: PlainValue | null;
}

/** An unquoted value inside braces. */
export interface PlainValue {
  readonly line: string;
  readonly key: string;
  readonly start: number;
  readonly end: number;
}

export interface ScanState {
  /** Number of the line being read, from 1. */
  lineNumber: number;
  readonly flow: FlowFrame[];
  /** The quote that is open at the end of the line. */
  quote: '"' | "'" | null;
  /** Where the last quote that went on into another line was opened. */
  quotePlace: Place | null;
  /** Indentation of the key whose text block (| or >) is being read. */
  blockIndent: number | null;
  /** Indentation of the key whose unquoted text may go on in the next line. */
  plainIndent: number | null;
}

/** Fields that hold one text, never a list: what starts with [ there is a formula without quotes. */
export const textFields: ReadonlySet<string> = new Set(['formula', 'sample', 'smiles']);

export function skipSpaces(line: string, at: number): number {
  let end = at;
  while (line[end] === ' ' || line[end] === '\t') end += 1;
  return end;
}

/** Index behind the closing quote, or null where the line ends before it. `at` is the first index inside the quotes. */
export function skipQuoted(line: string, at: number, mark: '"' | "'"): number | null {
  for (let index = at; index < line.length; index += 1) {
    if (line[index] === '\\' && mark === '"') index += 1;
    else if (line[index] === mark) {
      if (mark === "'" && line[index + 1] === "'") index += 1;
      else return index + 1;
    }
  }
  return null;
}

/** Remembers a quote that the line leaves open. `at` is the index of the quote mark. */
export function openQuote(mark: '"' | "'", at: number, state: ScanState): void {
  state.quote = mark;
  state.quotePlace = { line: state.lineNumber, column: at + 1 };
}

/** Index of the # that starts a comment behind unquoted text, or null. */
export function inlineComment(line: string, from: number): number | null {
  for (let index = Math.max(from, 1); index < line.length; index += 1) {
    if (line[index] === '#' && /\s/.test(line[index - 1]!)) return index;
  }
  return null;
}

/** true where the colon at an index ends a key: a space or the end of the line follows. */
export function endsKey(line: string, colon: number): boolean {
  const next = line[colon + 1];
  return next === undefined || next === ' ' || next === '\t';
}

/** The key that starts at an index: its name and where its colon stands, or null where there is none. */
export function keyAt(line: string, at: number): { readonly name: string; readonly colon: number } | null {
  const mark = line[at];
  if (mark === '"' || mark === "'") {
    const end = skipQuoted(line, at + 1, mark);
    if (end === null || line[skipSpaces(line, end)] !== ':') return null;
    return { name: line.slice(at + 1, end - 1), colon: skipSpaces(line, end) };
  }
  if (mark === undefined || '[{#&*!|>%@`,'.includes(mark)) return null;
  for (let index = at; index < line.length; index += 1) {
    if (line[index] === ':' && endsKey(line, index)) return { name: line.slice(at, index).trim(), colon: index };
    if (line[index] === '#' && index > at && /\s/.test(line[index - 1]!)) return null;
  }
  return null;
}

/** Brackets within brackets that a formula or SMILES may have. */
const deepestFormula = 8;

/** true where the bracket at an index is closed on its line and something is glued behind it: "[Cr(NH3)6]3+". */
export function closesAsFormula(line: string, at: number): boolean {
  let open = 0;
  for (let index = at; index < line.length; index += 1) {
    // Brackets in an item's quotes belong to the item.
    if (/["']/.test(line[index]!) && /[[\s,]/.test(line[index - 1] ?? '')) {
      const end = skipQuoted(line, index + 1, line[index] as '"' | "'");
      if (end === null) return false;
      index = end;
    }
    if (line[index] === '[') open += 1;
    if (line[index] === ']') open -= 1;
    if (open > deepestFormula) return false;
    if (open === 0) return /[^\s,\]}]/.test(line[index + 1] ?? ' ');
  }
  return false;
}

export function isFieldName(name: string): boolean {
  return fieldNames.has(name) || fieldNames.has(name.toLowerCase());
}
