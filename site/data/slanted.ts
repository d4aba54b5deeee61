import type { Parts, TextPart } from './typeset.ts';

/**
 * A sentence with its symbols slanted: Δ and β everywhere, and single letters that stand alone as words.
 * @param letters of factors, "f" or "gk"
 */
export function slanted(text: string, letters: string): Parts {
  const symbols = new RegExp(letters === '' ? '[Δβ]' : `[Δβ]|(?<![\\w’-])[${letters}](?![\\w’-])`, 'g');
  const parts: TextPart[] = [];
  let reached = 0;
  for (const { index, 0: symbol } of text.matchAll(symbols)) {
    if (index > reached) parts.push({ text: text.slice(reached, index), style: 'plain' });
    parts.push({ text: symbol, style: 'italic' });
    reached = index + symbol.length;
  }
  if (reached < text.length) parts.push({ text: text.slice(reached), style: 'plain' });
  return parts;
}
