// The mended stretches that a scan for YAML traps can propose.

import { parseQuantity, parseRange } from '#engine';
import type { Finding } from '../report.ts';

/** A mended stretch of one line. `shown` is what the message offers, over shownFrom..shownTo where that is wider. */
export interface Edit {
  readonly start: number;
  readonly end: number;
  readonly replacement: string;
  readonly shown: string;
  readonly shownFrom?: number;
  readonly shownTo?: number;
  readonly finding: Finding;
}

/** Text in YAML's double quotes. */
export function quote(text: string): string {
  return `"${text.replaceAll('\\', '\\\\').replaceAll('"', '\\"')}"`;
}

export function unquotedFormula(line: string, start: number, end: number): Edit {
  const typed = line.slice(start, end);
  return {
    start, end, replacement: quote(typed), shown: quote(typed),
    finding: { code: 'UNQUOTED_FORMULA', found: typed, expected: 'a formula or SMILES in double quotes, because [ starts a list in YAML', mend: '' },
  };
}

export function specialStart(line: string, start: number, end: number): Edit {
  const typed = line.slice(start, end);
  return {
    start, end, replacement: quote(typed), shown: quote(typed),
    finding: { code: 'SPECIAL_START', found: typed, expected: `text in double quotes where it starts with ${typed[0]}, which has a meaning of its own in YAML`, mend: '' },
  };
}

export function colonInText(line: string, start: number, end: number): Edit {
  const typed = line.slice(start, end);
  return {
    start, end, replacement: quote(typed), shown: quote(typed),
    finding: { code: 'COLON_IN_TEXT', found: typed, expected: 'text in double quotes where it holds a colon and a space', mend: '' },
  };
}

/**
 * What stands behind " #" is a comment to YAML. The message offers the quoted text. For reading on, the text is quoted inside braces,
 * where the comment would swallow the rest of the line, and left a comment elsewhere.
 */
export function lostText(line: string, start: number, hash: number, end: number, inBraces = false): Edit {
  const quoted = quote(line.slice(start, end));
  return {
    ...(inBraces ? { start, end, replacement: quoted } : { start: hash, end: hash + 1, replacement: '# ' }),
    shown: quoted, shownFrom: start, shownTo: end,
    finding: {
      code: 'TEXT_LOST', found: line.slice(start, end), expected: 'text in double quotes where it holds " #": YAML drops what follows',
      mend: 'or put a space behind # where a comment is meant',
    },
  };
}

export function noSpaceAfterColon(line: string, start: number, key: string, entryEnd: number = line.length): Edit {
  const end = start + key.length + 1;
  return {
    start, end, replacement: `${key}: `, shown: `${key}: `,
    finding: { code: 'NO_SPACE_AFTER_COLON', found: line.slice(start, entryEnd).trim(), expected: `a space after the colon of "${key}"`, mend: '' },
  };
}

/** A value that a comma inside braces has cut in two. Numbers are joined, texts put in quotes. */
export function commaInBraces(line: string, start: number, cut: number, next: number, end: number, key: string): Edit {
  const typed = line.slice(start, end);
  const before = line.slice(start, cut);
  const after = line.slice(next, end);
  const joined = joinedNumber(before, after, key) ?? quote(typed);
  return {
    start, end, replacement: joined, shown: joined,
    finding: { code: 'COMMA_IN_BRACES', found: typed, expected: 'a value without a comma, or in double quotes: between { } a comma starts the next field', mend: '' },
  };
}

const bareNumberFields: ReadonlySet<string> = new Set(['epsilon', 'beta']);

/** "24500 cm-1" for "24" and "500 cm-1", "464.5 nm" for "464" and "5 nm"; null where the two are not parts of one number. */
function joinedNumber(before: string, after: string, key: string): string | null {
  if (!/\d$/.test(before) || !/^\d/.test(after)) return null;
  const kinds = bareNumberFields.has(key) ? (['number'] as const) : (['energy', 'temperature', 'percent'] as const);
  for (const wanted of kinds) {
    const parsed = parseQuantity(`${before},${after}`, wanted);
    if (!parsed.ok && parsed.corrected !== null && parsed.code.endsWith('_COMMA')) return parsed.corrected;
  }
  const range = parseRange(`${before},${after}`);
  return !range.ok && range.corrected !== null && range.code.endsWith('_COMMA') ? range.corrected : null;
}
