// Scans what stands between { } and [ ] for the traps that belong there.

import { colonInText, commaInBraces, lostText, noSpaceAfterColon, specialStart, unquotedFormula } from './edits.ts';
import type { Edit } from './edits.ts';
import { closesAsFormula, endsKey, isFieldName, openQuote, skipQuoted, skipSpaces, textFields } from './line.ts';
import type { FlowFrame, ScanState } from './line.ts';

const mostOpen = 50;

/** Farthest that the end of a value is looked for, characters. */
const longestValue = 5000;

/** Scans one line from an index while braces or brackets are open. Returns the deepest nesting met. */
export function scanFlow(line: string, from: number, state: ScanState, edits: Edit[]): number {
  let at = from;
  let depth = state.flow.length;
  while (at < line.length) {
    const frame = state.flow.at(-1);
    // Nested deeper than any record: the reader refuses the file for its depth.
    if (frame === undefined || state.flow.length > mostOpen) return depth;
    const letter = line[at]!;
    if (/\s/.test(letter)) at += 1;
    else if (letter === '#' && (at === 0 || /\s/.test(line[at - 1]!))) return depth;
    else if (letter === ',') {
      frame.key = null;
      at += 1;
    } else if (letter === '{' || (letter === '[' && !startsFormula(line, at, frame))) {
      frame.last = null;
      state.flow.push({ kind: letter, key: null, keyLine: 0, last: null });
      depth = Math.max(depth, state.flow.length);
      at += 1;
    } else if (letter === '}' || letter === ']') {
      state.flow.pop();
      at += 1;
    } else if (letter === '"' || letter === "'") {
      const end = skipQuoted(line, at + 1, letter);
      if (end === null) {
        openQuote(letter, at, state);
        return depth;
      }
      const next = skipSpaces(line, end);
      if (frame.kind === '{' && frame.key === null && line[next] === ':') {
        frame.key = line.slice(at + 1, end - 1);
        frame.keyLine = state.lineNumber;
        at = next + 1;
      } else at = end;
      frame.last = null;
    } else if (letter === ':') at += 1;
    else at = scanPlain(line, at, frame, state, edits);
  }
  return depth;
}

function startsFormula(line: string, at: number, frame: FlowFrame): boolean {
  return (frame.key !== null && textFields.has(frame.key)) || closesAsFormula(line, at);
}

/** Reads an unquoted key or value and returns the index behind it. */
function scanPlain(line: string, at: number, frame: FlowFrame, state: ScanState, edits: Edit[]): number {
  const end = plainEnd(line, at);
  if (frame.kind === '{' && frame.key === null) {
    if (line[end] === ':') {
      frame.key = line.slice(at, end).trim();
      frame.keyLine = state.lineNumber;
      return end + 1;
    }
    return scanEntryWithoutColon(line, at, end, frame, state, edits);
  }
  const first = line[at]!;
  const whole = Math.max(wholeValueEnd(line, at), at + 1);
  const stop = line[end];
  frame.last = null;
  if (first === '[' || stop === '[' || stop === '{') {
    edits.push(unquotedFormula(line, at, whole));
    return whole;
  }
  if ('>|*&!@%`'.includes(first)) {
    edits.push(specialStart(line, at, whole));
    return whole;
  }
  // A key on a later line than the one before it: a brace or a comma is missing, and YAML will say so.
  if (stop === ':' && frame.kind === '{' && frame.keyLine === state.lineNumber) {
    edits.push(colonInText(line, at, whole));
    return whole;
  }
  if (stop === '#' && /[A-Za-z0-9]/.test(line[end + 1] ?? '')) {
    edits.push(lostText(line, at, end, whole, true));
    return whole;
  }
  if (frame.kind === '{' && frame.key !== null) frame.last = { line, key: frame.key, start: at, end: at + line.slice(at, end).trimEnd().length };
  return stop === ':' ? end + 1 : Math.max(end, at + 1);
}

/** An entry such as "500 cm-1" behind "position: 24,", or "kind:maximum". */
function scanEntryWithoutColon(line: string, at: number, end: number, frame: FlowFrame, state: ScanState, edits: Edit[]): number {
  const entryEnd = at + line.slice(at, end).trimEnd().length;
  const glued = /^([A-Za-z][\w/-]*):(?=[^\s/])/.exec(line.slice(at, entryEnd));
  const before = frame.last?.line === line ? frame.last : null;
  // Behind a text that a comma may have cut, only a known field counts as one.
  if (glued !== null && (isFieldName(glued[1]!) || before === null)) {
    edits.push(noSpaceAfterColon(line, at, glued[1]!, entryEnd));
    frame.key = glued[1]!;
    frame.keyLine = state.lineNumber;
    return at + glued[0].length;
  }
  if (before === null) return Math.max(end, at + 1);
  const whole = Math.max(wholeValueEnd(line, at), entryEnd, at + 1);
  const previous = edits.at(-1);
  if (previous?.start === before.start && previous.finding.code === 'COMMA_IN_BRACES') edits.pop();
  edits.push(commaInBraces(line, before.start, before.end, at, whole, before.key));
  frame.last = { ...before, end: whole };
  return whole;
}

/** Index of the character that ends an unquoted text inside braces: , [ ] { } a key's colon, or the # of a comment. */
function plainEnd(line: string, at: number): number {
  for (let index = at; index < line.length; index += 1) {
    const letter = line[index]!;
    if (',[]{}'.includes(letter)) return index;
    if (letter === ':' && (endsKey(line, index) || ',[]{}'.includes(line[index + 1]!))) return index;
    if (letter === '#' && index > at && /\s/.test(line[index - 1]!)) return index;
  }
  return line.length;
}

/** Where a value that was meant as one text ends: before a comma or a closing brace that it did not open. */
function wholeValueEnd(line: string, at: number): number {
  let open = 0;
  const last = Math.min(line.length, at + longestValue);
  for (let index = at; index < last; index += 1) {
    const letter = line[index]!;
    if ('[({'.includes(letter)) open += 1;
    else if (')]}'.includes(letter)) {
      if (open === 0) return at + line.slice(at, index).trimEnd().length;
      open -= 1;
    } else if (letter === ',' && open === 0) return at + line.slice(at, index).trimEnd().length;
  }
  return at + line.slice(at, last).trimEnd().length;
}
