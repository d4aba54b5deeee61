import { escapeText } from '../../charts/text.ts';
import { counted } from '../../data/show.ts';
import { fetchJson } from '../page/fetchJson.ts';
import { keepFile } from '../page/keepFile.ts';
import { url } from '../../url.ts';
import { type TableState, isEmpty, stateOf, toggled, withColumn, withState } from './address.ts';
import { createColumnChoice } from './columns.ts';
import { createFacetPanel, shownMarkup } from './facetPanel.ts';
import { type Facet, facetsOf, filtered } from './facets.ts';
import { csvOf, jsonOf } from './files.ts';
import { nextSorting, ordered } from './order.ts';
import { type FoundCollection, type PackedSearch, unpackSearch } from './packed.ts';
import { createRowStore } from './rowStore.ts';
import { type Hit, search } from './search.ts';
import { type SearchIndex, buildIndex } from './searchIndex.ts';
import { sortButtons } from './sortButtons.ts';
import { type TableBody, createTableBody } from './tableBody.ts';

/** All that the table works on, once its data are there. */
interface Loaded {
  readonly collection: FoundCollection;
  readonly facets: readonly Facet[];
  readonly index: () => Promise<SearchIndex>;
  readonly body: TableBody;
  readonly panel: ReturnType<typeof createFacetPanel>;
}

/** Names of facets in the address, known before the data are there. */
const FACETS = ['ion', 'd', 'geometry', 'spin', 'donors', 'ligand', 'phase', 'verdict', 'term', 'C'];

const breathe = (): Promise<void> => new Promise((done) => { setTimeout(done, 0); });

/** Starts search, filters and sorting of the collection's table; everything asked stands in the address, and the built table stays until something is asked. */
function startCollection(tools: HTMLElement, table: HTMLTableElement, status: HTMLElement): void {
  const input = tools.querySelector<HTMLInputElement>('input[type=search]')!;
  const filters = tools.querySelector<HTMLDetailsElement>('details')!;
  const chips = tools.querySelector<HTMLElement>('[data-place=chips]')!;
  const keep = document.getElementById('keep')!;
  const pages = document.querySelector<HTMLElement>('nav.pages');
  const built = [...table.tBodies];
  const counts = status.textContent ?? '';
  let loaded: Promise<Loaded> | null = null;
  let wanted: ReadonlySet<string> | null = null;
  let turn = 0;
  let typing = false;

  const columns = createColumnChoice(tools.querySelector<HTMLElement>('[data-place=columns]')!, table, (name) => ask(withColumn(state(), name), 'push'));

  const state = (): TableState => stateOf(new URL(location.href).searchParams, FACETS);

  const ask = (next: TableState, how: 'push' | 'replace'): void => {
    const address = new URL(location.href);
    address.search = withState(address.searchParams, next, FACETS).toString();
    address.hash = '';
    if (address.href !== location.href) history[how === 'push' ? 'pushState' : 'replaceState'](null, '', address);
    void show();
  };

  const showSorting = sortButtons(table, (key) => { typing = false; ask({ ...state(), sorting: nextSorting(state().sorting, key) }, 'push'); });

  const load = (): Promise<Loaded> => {
    loaded ??= fetchJson<PackedSearch>('data/search.json').then((packed) => {
      const collection = unpackSearch(packed);
      const facets = facetsOf(collection);
      const store = createRowStore(collection);
      let index: Promise<SearchIndex> | null = null;
      const panel = createFacetPanel(filters.querySelector<HTMLElement>('[data-place=facets]')!, facets, (facet, value) => { typing = false; ask(toggled(state(), facet, value), 'push'); });
      return { collection, facets, index: () => index ??= buildIndex(collection, breathe), body: createTableBody(table, store, unavailable), panel };
    });
    loaded.catch(() => { loaded = null; });
    return loaded;
  };

  const unavailable = (): void => { status.textContent = 'The data for searching could not be loaded. The whole list stands below.'; };

  const showBuilt = (): void => {
    for (const body of built) if (!body.isConnected) table.append(body);
    status.textContent = counts;
    table.hidden = false;
    if (pages) pages.hidden = false;
    wanted = null;
    keep.hidden = false;
  };

  const show = async (): Promise<void> => {
    const mine = ++turn;
    const now = state();
    showSorting(now.sorting);
    showChips(now);
    columns.show(now.hidden);
    if (isEmpty(now) && pages === null) {
      showBuilt();
      const ready = loaded === null ? null : await loaded.catch(() => null);
      if (ready === null || mine !== turn) return;
      ready.body.clear();
      ready.panel.show(now.chosen, filtered(ready.facets, now.chosen, ready.collection.rows.map(({ place }) => place)).counts);
      return;
    }
    try {
      const ready = await load();
      const answer = await found(ready, now);
      if (mine !== turn) return;
      const passing = filtered(ready.facets, now.chosen, answer.rows);
      const rows = now.sorting === null ? passing.rows : ordered(ready.collection, passing.rows, now.sorting);
      const { collection } = ready;
      await ready.body.show(rows.length, (place) => ({ row: rows[place]!, why: answer.why?.get(rows[place]!)?.() ?? null }));
      if (mine !== turn) return;
      for (const body of built) body.remove();
      if (pages) pages.hidden = true;
      table.hidden = rows.length === 0;
      ready.panel.show(now.chosen, passing.counts);
      wanted = new Set(rows.map((row) => { const { complex, measurement } = collection.rows[row]!; return `${collection.complexes[complex]!.id}/${measurement}`; }));
      keep.hidden = rows.length === 0;
      const complexes = new Set(rows.map((row) => collection.rows[row]!.complex)).size;
      status.textContent = isEmpty(now) ? counts : sentence(now, answer, complexes, rows.length);
    } catch {
      if (mine === turn) {
        showBuilt();
        unavailable();
      }
    }
  };

  const showChips = ({ chosen }: TableState): void => {
    const list = [...chosen].flatMap(([facet, values]) => [...values].map((value) => ({ facet, value })));
    chips.innerHTML = list.map(({ facet, value }) => `<li><button type="button" data-facet="${escapeText(facet)}" data-value="${escapeText(value)}" aria-label="Take away the filter ${escapeText(value)}">${shownMarkup(facet, value)} ×</button></li>`).join('')
      + (list.length > 1 ? '<li><button type="button" data-clear>all filters ×</button></li>' : '');
  };

  input.addEventListener('focus', () => { load().then(({ index }) => index()).catch(() => {}); }, { once: true });
  input.addEventListener('input', () => {
    // One step back takes away what was typed in one go.
    ask({ ...state(), query: input.value }, typing ? 'replace' : 'push');
    typing = true;
  });
  filters.addEventListener('toggle', () => { if (filters.open) load().then(() => show(), unavailable); });
  chips.addEventListener('click', ({ target }) => {
    const button = target instanceof Element ? target.closest<HTMLElement>('button') : null;
    if (button === null) return;
    typing = false;
    const { facet, value } = button.dataset;
    ask(facet === undefined ? { ...state(), chosen: new Map() } : toggled(state(), facet, value!), 'push');
    input.focus();
  });
  keep.addEventListener('click', ({ target }) => {
    const kind = target instanceof HTMLElement ? target.dataset['keep'] : undefined;
    if (kind === 'csv' || kind === 'json') void keepRows(kind, wanted, status);
  });
  const fromAddress = (): void => {
    typing = false;
    input.value = state().query;
    void show();
  };
  addEventListener('popstate', fromAddress);
  tools.hidden = false;
  keep.hidden = false;
  fromAddress();
}

interface Answer {
  readonly rows: readonly number[];
  readonly why: ReadonlyMap<number, Hit['why']> | null;
  readonly nearest: boolean;
}

/** The rows that answer the query, best first; all of them where nothing is asked. */
async function found({ collection, index }: Loaded, { query }: TableState): Promise<Answer> {
  if (query.trim() === '') return { rows: collection.rows.map(({ place }) => place), why: null, nearest: false };
  const { hits, nearest } = search(collection, await index(), query);
  return { rows: hits.map(({ row }) => row), why: new Map(hits.map(({ row, why }) => [row, why])), nearest };
}

function sentence({ query }: TableState, { nearest, rows: answers }: Answer, complexes: number, rows: number): string {
  const asked = query.trim();
  if (nearest && answers.length === 0) return `Nothing found for “${asked}”. Try the metal, a ligand, a formula such as Cr(NH3)6, a band such as 21500 cm-1 or a range such as Delta 20000-23000.`;
  if (nearest) return `Nothing found for “${asked}”. ${rows === 0 ? 'What lies nearest is filtered out.' : 'The nearest:'}`;
  if (rows === 0) return answers.length > 0 ? `${counted(answers.length, 'measurement')} answer “${asked}”, but the filters leave none.` : 'The filters leave no measurement.';
  return `${counted(complexes, 'complex', 'complexes')} found, ${counted(rows, 'measurement')}.`;
}

/** Saves the rows shown, with the columns and digits of the whole download. */
async function keepRows(kind: 'csv' | 'json', wanted: ReadonlySet<string> | null, status: HTMLElement): Promise<void> {
  try {
    const answer = await fetch(url(`data/results.${kind}`));
    if (!answer.ok) throw new Error(String(answer.status));
    const whole = await answer.text();
    const part = wanted === null ? whole : kind === 'csv' ? csvOf(whole, wanted) : jsonOf(whole, wanted);
    keepFile(`results.${kind}`, part, kind === 'csv' ? 'text/csv' : 'application/json');
  } catch {
    status.textContent = `The file data/results.${kind} could not be loaded, so nothing was saved.`;
  }
}

const tools = document.getElementById('tools');
const table = document.querySelector<HTMLTableElement>('table.results');
const status = document.getElementById('count');
if (tools && table && status) startCollection(tools, table, status);
