import { resultRow } from '../components/resultRow.ts';
import { type CompactCollection, type SearchEntry, searchEntry } from './compact.ts';
import { find } from './find.ts';

const MOST_ROWS = 200;

/** Starts the search of the collection's page: the query lives in the address, the built list stays until something is typed. */
function startSearch(box: HTMLElement): void {
  const input = box.querySelector('input');
  const status = document.getElementById('count');
  const table = document.querySelector<HTMLTableElement>('table.results');
  if (!input || !status || !table) return;
  const built = [...table.tBodies];
  const counts = status.textContent ?? '';
  const pages = document.querySelector<HTMLElement>('nav.pages');
  let entries: Promise<readonly SearchEntry[]> | null = null;
  const load = (): Promise<readonly SearchEntry[]> => entries ??= fetchEntries(box.dataset['index'] ?? '');

  const show = (found: readonly SearchEntry[] | null, query: string): void => {
    for (const body of [...table.tBodies]) body.remove();
    if (found === null) {
      table.append(...built);
      status.textContent = counts;
    } else {
      const rows = found.flatMap((entry) => entry.rows);
      const body = table.createTBody();
      body.innerHTML = rows.slice(0, MOST_ROWS).map((row, place) => resultRow(row, `found-${place}`)).join('');
      status.textContent = sentence(found.length, rows.length, query);
    }
    table.hidden = found !== null && found.length === 0;
    if (pages) pages.hidden = found !== null;
  };

  const search = async (): Promise<void> => {
    const query = input.value;
    if (query.trim() === '') return show(null, '');
    try {
      const all = await load();
      if (input.value === query) show(find(all, query), query);
    } catch {
      status.textContent = 'The list for searching could not be loaded. The whole list stands below.';
    }
  };

  const fromAddress = (): void => {
    input.value = new URL(location.href).searchParams.get('q') ?? '';
    void search();
  };

  input.addEventListener('focus', () => { load().catch(() => { entries = null; }); }, { once: true });
  input.addEventListener('input', () => {
    const address = new URL(location.href);
    if (input.value.trim() === '') address.searchParams.delete('q');
    else address.searchParams.set('q', input.value);
    history.replaceState(null, '', address);
    void search();
  });
  addEventListener('popstate', fromAddress);
  box.hidden = false;
  fromAddress();
}

async function fetchEntries(address: string): Promise<readonly SearchEntry[]> {
  const answer = await fetch(address);
  if (!answer.ok) throw new Error(`the search list answered ${answer.status}`);
  const collection = await answer.json() as CompactCollection;
  return collection.complexes.map((complex) => searchEntry(collection, complex));
}

function sentence(complexes: number, rows: number, query: string): string {
  if (complexes === 0) return `Nothing found for “${query.trim()}”. Try the metal, a ligand, or a formula such as Cr(NH3)6.`;
  const cut = rows > MOST_ROWS ? ` The first ${MOST_ROWS} measurements are shown.` : '';
  return `${complexes} ${complexes === 1 ? 'complex' : 'complexes'} found, ${rows} ${rows === 1 ? 'measurement' : 'measurements'}.${cut}`;
}

const box = document.getElementById('search');
if (box) startSearch(box);
