import { bandStrip, type StripRow } from '../charts/strip.ts';
import { escapeText } from '../charts/text.ts';
import type { FormulaShown, Parts } from '../data/typeset.ts';
import { url } from '../url.ts';

/** One measurement's chosen reading as the collection's table shows it. */
export interface ResultRow {
  readonly complex: string;
  readonly measurement: string;
  readonly formula: FormulaShown;
  readonly ion: string;
  readonly conditions: string;
  readonly strip: StripRow;
  readonly stripTitle: string;
  /** Printed numbers; null: withheld. */
  readonly delta: string | null;
  readonly racahB: string | null;
  readonly beta: string | null;
  readonly verdict: string;
}

/** Typeset parts as HTML. */
export function partsMarkup(parts: Parts): string {
  return parts.map(({ text, style }) => {
    const safe = escapeText(text);
    if (style === 'plain') return safe;
    const tag = style === 'sub' ? 'sub' : style === 'super' ? 'sup' : 'i';
    return `<${tag}>${safe}</${tag}>`;
  }).join('');
}

/** What a row says beside its numbers in a table that is made in the page. */
export interface RowNotes {
  /** Why it was found; null: nothing was looked for. */
  readonly why: string | null;
  /** Its number among all rows, where only some are drawn. */
  readonly index: number | null;
}

/**
 * A row of the collection's table. The build and the search in the page both call this, so that a row looks the same
 * wherever it was made.
 * @param id unique on the page
 */
export function resultRow(row: ResultRow, id: string, { why, index }: RowNotes = { why: null, index: null }): string {
  const address = url(`complexes/${row.complex}/`);
  return `<tr${index === null ? '' : ` aria-rowindex="${index}"`}><th scope="row"><a class="formula" href="${escapeText(address)}#${escapeText(row.measurement)}">${partsMarkup(row.formula.parts)}</a>${why === null ? '' : `<span class="why">${escapeText(why)}</span>`}</th>`
    + `<td class="strip-cell">${bandStrip(row.strip, row.stripTitle, id)}</td>`
    + `<td>${escapeText(row.conditions)}</td>`
    + number(row.delta) + number(row.racahB) + number(row.beta)
    + `<td>${escapeText(row.verdict)}</td></tr>`;
}

function number(text: string | null): string {
  return text === null ? '<td class="figure withheld">withheld</td>' : `<td class="figure">${escapeText(text)}</td>`;
}
