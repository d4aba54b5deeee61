import type { Parts } from './typeset.ts';

/** A table cell: text, or typeset parts that may link to a page of the site; a small drawing may stand before them. */
export type Cell = string | { readonly parts: Parts; readonly path?: string; readonly soft?: boolean; readonly drawing?: string };

export interface Column {
  readonly head: Parts;
  /** Figures stand to the right. */
  readonly figure?: boolean;
  /** Holds running text that must not be squeezed. */
  readonly long?: boolean;
  /** Heads its row. */
  readonly rowHead?: boolean;
}

export interface Table {
  readonly caption: string;
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly Cell[])[];
}

export const words = (text: string): Parts => [{ text, style: 'plain' }];
export const soft = (text: string): Cell => ({ parts: words(text), soft: true });
export const column = (text: string): Column => ({ head: words(text) });
export const longColumn = (text: string): Column => ({ head: words(text), long: true });
export const rowColumn = (text: string): Column => ({ head: words(text), rowHead: true });

const INVERSE_CM: Parts = [{ text: 'cm', style: 'plain' }, { text: '−1', style: 'super' }];
const UNITS: Readonly<Record<string, Parts>> = {
  'cm-1': INVERSE_CM,
  nm: words('nm'),
  'L mol-1 cm-1': [{ text: '(L mol', style: 'plain' }, { text: '−1', style: 'super' }, { text: ' cm', style: 'plain' }, { text: '−1', style: 'super' }, { text: ')', style: 'plain' }],
};

/** Head of a column of figures as quantity / unit; several words stand upright, a symbol slanted. */
export function quantity(symbol: string, unit: string | null, upright = false): Column {
  const name: Parts = [{ text: symbol, style: upright ? 'plain' : 'italic' }];
  return { figure: true, head: unit === null ? name : [...name, { text: ' / ', style: 'plain' }, ...(UNITS[unit] ?? words(unit))] };
}
