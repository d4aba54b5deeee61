import { elementSymbols, residueSymbols } from './elements.ts';
import { highCharge, lowDigits, plainDigits } from './scripts.ts';

/** A piece of formula text; `at` and `end` are its place in the text as typed. */
export interface Token {
  readonly kind: 'element' | 'residue' | 'ligand' | 'mark' | 'open' | 'close' | 'digits' | 'low' | 'sign' | 'charge' | 'dot' | 'multiplier' | 'isomer' | 'space' | 'unknown';
  readonly text: string;
  readonly at: number;
  readonly end: number;
}

const closers: Readonly<Record<string, string>> = { '(': ')', '[': ']', '{': '}' };

interface Rule {
  readonly kind: Token['kind'];
  readonly pattern: RegExp;
  /** The rule holds only right behind a token of this kind. */
  readonly after?: Token['kind'] | 'nothing';
}

// Sticky patterns, tried in order at each place.
const rules: readonly Rule[] = [
  { kind: 'space', pattern: /[\s\u00a0\u2000-\u200d\u202f\u2060\ufeff]+/y },
  { kind: 'isomer', pattern: /(all-cis|cis|trans|fac|mer|rac|meso|Δ|Λ|α|β)-/y, after: 'nothing' },
  { kind: 'multiplier', pattern: /\d+\.\d+|\d+|½|[nx](?=[A-Z([])/y, after: 'dot' },
  { kind: 'multiplier', pattern: /\d+(?=[A-Z([])/y, after: 'nothing' },
  { kind: 'mark', pattern: /(?:[μµηκ]|mu)[₀-₉\d]*-/y, after: 'open' },
  { kind: 'ligand', pattern: /\d+['′]*(?:,\d+['′]*)*-[a-z]+/y, after: 'open' },
  { kind: 'low', pattern: lowDigits },
  { kind: 'charge', pattern: highCharge },
  { kind: 'charge', pattern: /[⁰]|\^\{?0\}?/y },
  { kind: 'sign', pattern: /[+\-−–]/y },
  { kind: 'digits', pattern: /\d+/y },
  { kind: 'open', pattern: /[([{]/y },
  { kind: 'close', pattern: /[)\]}]/y },
  { kind: 'dot', pattern: /[.·•⋅∙]\s*/y },
  { kind: 'ligand', pattern: /[a-z]+(?:-κ?[A-Z][a-z]?(?=\)))?/y },
];

function symbolAt(text: string, at: number): Token | null {
  const two = /^[A-Z][a-z]/.test(text.slice(at, at + 2)) ? text.slice(at, at + 2) : '';
  for (const symbol of [two, text.charAt(at)]) {
    if (residueSymbols.has(symbol)) return { kind: 'residue', text: symbol, at, end: at + symbol.length };
    if (elementSymbols.has(symbol)) return { kind: 'element', text: symbol, at, end: at + symbol.length };
  }
  return null;
}

/** A whole bracket's content where it is one of the abbreviations known, "(DMSO)". */
function abbreviationAt(text: string, at: number, open: string, known: ReadonlySet<string>): Token | null {
  const close = text.indexOf(closers[open] ?? '', at);
  const inside = text.slice(at, close);
  return close > at && known.has(inside) ? { kind: 'ligand', text: inside, at, end: close } : null;
}

function content(kind: Token['kind'], match: RegExpExecArray): string {
  if (kind === 'low') return plainDigits(match[1] ?? match[2] ?? '');
  if (kind === 'charge') return plainDigits(match[1] ?? match[3] ?? '') + (/[+⁺]/.test(match[2] ?? match[4] ?? '') ? '+' : match[2] || match[4] ? '-' : '0');
  if (kind === 'sign') return match[0] === '+' ? '+' : '-';
  if (kind === 'isomer') return match[1] ?? '';
  return match[0];
}

/** Cuts formula text into tokens; what no rule knows becomes "unknown". The abbreviations are tried on whole brackets first. */
export function tokenise(text: string, abbreviations: ReadonlySet<string>): readonly Token[] {
  const tokens: Token[] = [];
  let at = 0;
  while (at < text.length) {
    const previous = tokens.at(-1);
    let token = previous?.kind === 'open' ? abbreviationAt(text, at, previous.text, abbreviations) : null;
    token ??= symbolAt(text, at);
    for (const rule of rules) {
      if (token) break;
      if (rule.after && rule.after !== (previous?.kind ?? 'nothing')) continue;
      rule.pattern.lastIndex = at;
      const match = rule.pattern.exec(text);
      if (match) token = { kind: rule.kind, text: content(rule.kind, match), at, end: at + match[0].length };
    }
    token ??= { kind: 'unknown', text: String.fromCodePoint(text.codePointAt(at) ?? 0), at, end: at + ((text.codePointAt(at) ?? 0) > 0xffff ? 2 : 1) };
    tokens.push(token);
    at = token.end;
  }
  return tokens;
}
