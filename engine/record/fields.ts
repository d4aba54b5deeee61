// Values as they stand behind the name of their field: text, lists and braces on one line.

import { quotedText, typedText } from './quote.ts';

/** Fields that are always quoted, as the manual shows them: formulas and SMILES hold brackets sooner or later. */
const alwaysQuoted: ReadonlySet<string> = new Set(['formula', 'sample']);

/** A text, a list of texts, or fields with values, absent ones among them. */
export type TypedValue = string | null | undefined | readonly string[] | { readonly [field: string]: TypedValue };

/** The value of a field as it is typed on one line, "{ ammine: 6 }"; null where there is nothing to type. */
export function valueText(field: string, value: TypedValue): string | null {
  if (value === null || value === undefined) return null;
  if (typeof value === 'string') return value.trim() === '' ? null : alwaysQuoted.has(field) ? quotedText(value) : typedText(value);
  if (isList(value)) {
    const items = value.filter((item) => item.trim() !== '').map(typedText);
    return items.length === 0 ? null : `[${items.join(', ')}]`;
  }
  return flowText(value, Object.keys(value));
}

/**
 * Fields and values in braces, in the order given; null where all are absent.
 * @throws RangeError where the value holds a field that the order does not name: it would be lost
 */
export function flowText(value: Readonly<Record<string, TypedValue>>, order: readonly string[]): string | null {
  noOthers(value, order);
  const parts = order.flatMap((field) => {
    const text = valueText(field, value[field]);
    return text === null ? [] : [`${typedText(field)}: ${text}`];
  });
  return parts.length === 0 ? null : `{ ${parts.join(', ')} }`;
}

/** @throws RangeError where a record holds a field that nobody would write */
export function noOthers(value: object, order: readonly string[]): void {
  const other = Object.keys(value).find((field) => !order.includes(field));
  if (other !== undefined) throw new RangeError(`the record holds a field "${other}"; known here are ${order.join(', ')}`);
}

function isList(value: object): value is readonly string[] {
  return Array.isArray(value);
}
