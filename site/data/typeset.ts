import { formulaParts, parseFormula, plainFormula, shownLabel, spokenFormula, termParts } from '#engine';
import type { TextPart } from '../charts/text.ts';

export type { TextPart } from '../charts/text.ts';
export type Parts = readonly TextPart[];

/** A formula set for the page and said for a reader who hears it. */
export interface FormulaShown {
  readonly parts: Parts;
  /** One plain string, as it goes to the clipboard and into search. */
  readonly text: string;
  readonly spoken: string;
}

/**
 * A formula as typed, typeset; text that is no formula stays as it is. An isomer that the formula does not name stands before it.
 * @param abbreviations of the collection's ligands, which a formula may hold as symbols
 */
export function formulaShown(typed: string, isomer: string, abbreviations: readonly string[]): FormulaShown {
  const read = parseFormula(typed, { abbreviations });
  const named = isomer === 'none' || (read.ok && read.formula.isomer !== null) ? '' : isomer;
  const before: Parts = named === '' ? [] : [{ text: named, style: 'italic' }, { text: '-', style: 'plain' }];
  const prefix = named === '' ? '' : `${named}-`;
  if (!read.ok) return { parts: [...before, { text: typed, style: 'plain' }], text: prefix + typed, spoken: prefix + typed };
  return {
    parts: [...before, ...formulaParts(read.formula)], text: prefix + plainFormula(read.formula),
    spoken: (named === '' ? '' : `${named}, `) + spokenFormula(read.formula),
  };
}

/** A term label in letter form, set as chemists print it. */
export function termShown(label: string, electrons: number): Parts {
  return termParts(shownLabel(label, electrons));
}

/** d count of an ion, "d" with the number raised. */
export function configuration(electrons: number): Parts {
  return [{ text: 'd', style: 'plain' }, { text: String(electrons), style: 'super' }];
}

const INLINE = /(?<![\w[])([a-j]?[1-6](?:A1|A2|E|T1|T2)g?(?:\/[a-j]?[1-6](?:A1|A2|E|T1|T2)g?)?(?:\([SPDFGHI]'{0,2}\))?)(?![\w])|\b(Delta|beta)\b|(?<![\w.–−-])([BC])(?=₀?(?:[ ,;:)/]|\.(?: |$)|$))/g;
const GREEK: Readonly<Record<string, string>> = { Delta: 'Δ', beta: 'β' };

/** A stored sentence with its term labels and symbols typeset; numbers do not break, nor from their unit. */
export function sentenceShown(stored: string): Parts {
  const text = stored.replaceAll('\u2009', '\u202f').replaceAll(' cm⁻¹', '\u00a0cm⁻¹');
  const parts: TextPart[] = [];
  let reached = 0;
  for (const found of text.matchAll(INLINE)) {
    if (found.index > reached) parts.push({ text: text.slice(reached, found.index), style: 'plain' });
    const [whole, term, symbol, letter = ''] = found;
    if (term === undefined) parts.push({ text: symbol === undefined ? letter : GREEK[symbol]!, style: 'italic' });
    else parts.push(...termParts(term));
    reached = found.index + whole.length;
  }
  if (reached < text.length) parts.push({ text: text.slice(reached), style: 'plain' });
  return parts;
}

/**
 * A stored sentence as plain text to paste: symbols as letters of their alphabet, term labels in letter form, ordinary spaces.
 */
export function sentenceText(text: string): string {
  return text.replace(/\b(Delta|beta)\b/g, (name) => GREEK[name]!).replace(/[\u2009\u202f\u00a0]/g, ' ');
}

const LOW: Readonly<Record<string, string>> = Object.fromEntries([...'0123456789'].map((digit, index) => [digit, '₀₁₂₃₄₅₆₇₈₉'[index]!]));
const HIGH: Readonly<Record<string, string>> = { ...Object.fromEntries([...'0123456789'].map((digit, index) => [digit, '⁰¹²³⁴⁵⁶⁷⁸⁹'[index]!])), '+': '⁺', '\u2212': '⁻', '-': '⁻' };
const raised = (text: string, marks: Readonly<Record<string, string>>): string => [...text].map((sign) => marks[sign] ?? sign).join('');

/**
 * A medium or host as one line of text that keeps its typesetting where only plain text can stand: "mol L-1" and formulas
 * with raised and lowered figures.
 */
export function inlineText(typed: string): string {
  const units = typed.replace(/\b(mol|L|dm|cm|kg|g|mL)[-−](\d)/g, (_, unit: string, power: string) => `${unit}⁻${raised(power, HIGH)}`);
  return units.split(' ').map((word) => {
    if (!/[A-Z][a-z]?\d|[A-Z)\]]\d/.test(word)) return word;
    const read = parseFormula(word);
    return read.ok ? formulaParts(read.formula).map(({ text, style }) => style === 'sub' ? raised(text, LOW) : style === 'super' ? raised(text, HIGH) : text).join('') : word;
  }).join(' ');
}
