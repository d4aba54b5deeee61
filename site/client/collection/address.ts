import type { Chosen } from './facets.ts';
import { SORT_KEYS, type Sorting } from './order.ts';

/** What the reader asks of the table; all of it stands in the address. */
export interface TableState {
  readonly query: string;
  readonly sorting: Sorting | null;
  readonly chosen: Chosen;
  /** Columns that are not shown. */
  readonly hidden: ReadonlySet<Column>;
}

/** Columns that may be left out; the complex always stands. */
export const COLUMNS = ['bands', 'conditions', 'Delta', 'B', 'beta', 'verdict'] as const;
export type Column = (typeof COLUMNS)[number];

/** The state in an address: ?q=Cr(NH3)6&sort=-Delta&ion=Cr(III)&ion=Co(III)&without=beta. Names of facets that are not known are left alone. */
export function stateOf(query: URLSearchParams, facets: readonly string[]): TableState {
  const sort = query.get('sort') ?? '';
  const key = SORT_KEYS.find((one) => one === sort.replace(/^-/, ''));
  return {
    query: query.get('q') ?? '', sorting: key === undefined ? null : { key, descending: sort.startsWith('-') },
    chosen: new Map(facets.flatMap((name) => query.has(name) ? [[name, new Set(query.getAll(name))] as const] : [])),
    hidden: new Set(COLUMNS.filter((name) => query.getAll('without').includes(name))),
  };
}

/** The address's query with a state in it. */
export function withState(query: URLSearchParams, { query: text, sorting, chosen, hidden }: TableState, facets: readonly string[]): URLSearchParams {
  const next = new URLSearchParams(query);
  for (const name of ['q', 'sort', 'without', ...facets]) next.delete(name);
  if (text.trim() !== '') next.set('q', text);
  if (sorting !== null) next.set('sort', `${sorting.descending ? '-' : ''}${sorting.key}`);
  for (const [name, values] of chosen) for (const value of values) next.append(name, value);
  for (const name of hidden) next.append('without', name);
  return next;
}

export const isEmpty = ({ query, sorting, chosen }: TableState): boolean => query.trim() === '' && sorting === null && [...chosen.values()].every((values) => values.size === 0);

/** A state with one column shown or left out. */
export function withColumn(state: TableState, name: Column): TableState {
  const hidden = new Set(state.hidden);
  if (!hidden.delete(name)) hidden.add(name);
  return { ...state, hidden };
}

/** A state with one value of a facet chosen or let go. */
export function toggled(state: TableState, facet: string, value: string): TableState {
  const values = new Set(state.chosen.get(facet) ?? []);
  if (!values.delete(value)) values.add(value);
  return { ...state, chosen: new Map([...state.chosen].filter(([name]) => name !== facet).concat(values.size === 0 ? [] : [[facet, values]])) };
}
