// Finds the places where YAML would read something else than the person meant, before YAML reads them.
// Each trap is reported with the mended line; the mended text is what the YAML reader then sees, so that one slip does
// not hide the other faults of the file. Lines are never added or removed.

import { typedText } from '../report.ts';
import type { Finding } from '../report.ts';
import type { Path, Place } from '../node.ts';
import { scanFlow } from './flow.ts';
import { colonInText, lostText, noSpaceAfterColon, specialStart, unquotedFormula } from './edits.ts';
import type { Edit } from './edits.ts';
import { closesAsFormula, inlineComment, isFieldName, keyAt, openQuote, skipQuoted, skipSpaces, textFields } from './line.ts';
import type { FlowFrame, ScanState } from './line.ts';
import { findTabs } from './tabs.ts';

export interface Trap {
  readonly place: Place;
  readonly finding: Finding;
  /** The field, where the reader knows it. */
  readonly path?: Path;
}

export interface ScannedText {
  /** The text with every trap mended. */
  readonly text: string;
  readonly traps: readonly Trap[];
  /** true where a tab stood in an indentation: how deep the line was meant to stand is then unknown. */
  readonly indentationUnknown: boolean;
  /** Where a quote was opened that nothing closes, or null. */
  readonly openQuote: Place | null;
  /** Deepest nesting of brackets or list marks in one place. */
  readonly depth: number;
}

/** Scans a whole file. Never throws. */
export function scanTraps(text: string): ScannedText {
  const state: ScanState = { lineNumber: 0, flow: [], quote: null, quotePlace: null, blockIndent: null, plainIndent: null };
  const traps: Trap[] = [];
  let indentationUnknown = false;
  let depth = 0;
  const lines = text.split('\n').map((whole, index) => {
    const line = whole.endsWith('\r') ? whole.slice(0, -1) : whole;
    const edits: Edit[] = [];
    state.lineNumber = index + 1;
    depth = Math.max(depth, scanLine(line, state, edits));
    if (edits.some((edit) => edit.finding.code === 'TAB' && /^\s*$/.test(line.slice(0, edit.start)))) indentationUnknown = true;
    if (edits.length === 0) return line;
    const mended = mendedLine(line, edits);
    for (const edit of edits) traps.push({ place: { line: index + 1, column: edit.start + 1 }, finding: withMendedLine(edit, mended) });
    return edited(line, edits);
  });
  return { text: lines.join('\n'), traps, indentationUnknown, openQuote: state.quote === null ? null : state.quotePlace, depth };
}

/** Scans one line, adds what it finds to `edits` and returns how deep the line nests. */
function scanLine(line: string, state: ScanState, edits: Edit[]): number {
  const indent = line.length - line.trimStart().length;
  if (state.quote !== null) {
    const end = skipQuoted(line, 0, state.quote);
    if (end === null) return state.flow.length;
    state.quote = null;
    return state.flow.length > 0 ? scanFlow(line, end, state, edits) : 0;
  }
  if (state.blockIndent !== null) {
    if (line.trim() === '' || indent > state.blockIndent) return 0;
    state.blockIndent = null;
  }
  findTabs(line, edits);
  if (state.flow.length > 0) return scanFlow(line, 0, state, edits);
  if (line.trim() === '' || line[indent] === '#') return 0;
  return scanBlockLine(line, indent, state, edits);
}

/** A line outside braces, brackets, quotes and text blocks: list marks, a key, a value. */
function scanBlockLine(line: string, indent: number, state: ScanState, edits: Edit[]): number {
  let at = indent;
  let dashes = 0;
  while (line[at] === '-' && (at + 1 >= line.length || line[at + 1] === ' ')) {
    at = skipSpaces(line, at + 1);
    dashes += 1;
  }
  if (at >= line.length) return dashes;
  const continues = state.plainIndent !== null && dashes === 0 && indent > state.plainIndent;
  if (!continues) state.plainIndent = null;
  if (dashes === 0 && /^-[A-Za-z{"'[]/.test(line.slice(at))) {
    edits.push({
      start: at, end: at + 1, replacement: '- ', shown: '- ',
      finding: { code: 'NO_SPACE_AFTER_DASH', found: line.trim(), expected: 'a space after the dash that starts a list item', mend: '' },
    });
    return 1;
  }
  const key = keyAt(line, at);
  if (key !== null) {
    const value = skipSpaces(line, key.colon + 1);
    return Math.max(dashes, scanValue(line, value, at, key.name, state, edits));
  }
  const glued = /^([A-Za-z][\w/-]*):(?=[^\s/])/.exec(line.slice(at));
  if (glued !== null && isFieldName(glued[1]!)) {
    edits.push(noSpaceAfterColon(line, at, glued[1]!));
    state.plainIndent = at;
    return dashes;
  }
  if (dashes > 0 || line[at] === '{' || line[at] === '[') return Math.max(dashes, scanValue(line, at, indent, null, state, edits));
  findLostText(line, at, edits);
  return dashes;
}

/** The value behind a key or a list mark. */
function scanValue(line: string, at: number, keyIndent: number, key: string | null, state: ScanState, edits: Edit[]): number {
  const first = line[at];
  if (first === undefined) return 0;
  if (first === '#') {
    if (/[A-Za-z0-9]/.test(line[at + 1] ?? '')) edits.push(lostText(line, at, at, line.trimEnd().length));
    return 0;
  }
  if (first === '"' || first === "'") {
    const end = skipQuoted(line, at + 1, first);
    if (end === null) openQuote(first, at, state);
    return 0;
  }
  if (first === '{') return openFlow('{', line, at, state, edits);
  if (first === '[') {
    const end = valueEnd(line, at);
    if (!(key !== null && textFields.has(key)) && !closesAsFormula(line, at)) return openFlow('[', line, at, state, edits);
    edits.push(unquotedFormula(line, at, end));
    return 0;
  }
  if (/^[>|][-+]?[1-9]?\s*(\s#.*)?$/.test(line.slice(at))) {
    state.blockIndent = keyIndent;
    return 0;
  }
  const end = valueEnd(line, at);
  if (/[>|*&!@%`]/.test(first)) {
    edits.push(specialStart(line, at, end));
    return 0;
  }
  state.plainIndent = keyIndent;
  const typed = line.slice(at, end);
  if (/:(\s|$)/.test(typed)) {
    edits.push(colonInText(line, at, end));
    return 0;
  }
  findLostText(line, at, edits);
  return 0;
}

function openFlow(kind: FlowFrame['kind'], line: string, at: number, state: ScanState, edits: Edit[]): number {
  state.flow.push({ kind, key: null, keyLine: 0, last: null });
  return scanFlow(line, at + 1, state, edits);
}

/** End of an unquoted value outside braces: before a comment, without the spaces behind it. */
function valueEnd(line: string, at: number): number {
  const comment = inlineComment(line, at);
  return at + line.slice(at, comment ?? line.length).trimEnd().length;
}

function findLostText(line: string, from: number, edits: Edit[]): void {
  const comment = inlineComment(line, from);
  if (comment === null || !/[A-Za-z0-9]/.test(line[comment + 1] ?? '')) return;
  edits.push(lostText(line, from, comment, line.trimEnd().length));
}

/** The line as it should be typed: all its slips mended. */
function mendedLine(line: string, edits: readonly Edit[]): string {
  return spliced(line, edits.map((edit) => ({ start: edit.shownFrom ?? edit.start, end: edit.shownTo ?? edit.end, text: edit.shown }))).trim();
}

function withMendedLine({ finding }: Edit, mended: string): Finding {
  const further = finding.mend === '' ? '' : `, ${finding.mend}`;
  return { ...finding, found: finding.code === 'TAB' ? finding.found : typedText(finding.found), mend: `write  ${mended}${further}` };
}

function edited(line: string, edits: readonly Edit[]): string {
  return spliced(line, edits.map((edit) => ({ start: edit.start, end: edit.end, text: edit.replacement })));
}

/** Replaces stretches of a line; where two overlap the first stands. */
function spliced(line: string, stretches: readonly { readonly start: number; readonly end: number; readonly text: string }[]): string {
  let result = '';
  let at = 0;
  for (const { start, end, text } of [...stretches].sort((a, b) => a.start - b.start)) {
    if (start < at) continue;
    result += line.slice(at, start) + text;
    at = end;
  }
  return result + line.slice(at);
}
