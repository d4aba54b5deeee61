import type { RowStore } from './rowStore.ts';

/** A row to be drawn. */
export interface DrawnRow {
  readonly row: number;
  readonly why: string | null;
}

/** More rows than this, and only those in view are drawn. */
const MOST_DRAWN = 200;
/** Rows drawn above and below what is in view, so that keys and screen readers find the next ones. */
const MARGIN = 20;

/** The body of the results table: all rows where they are few, else those in view between two spacers. */
export interface TableBody {
  readonly show: (count: number, at: (place: number) => DrawnRow) => Promise<void>;
  readonly clear: () => void;
}

/**
 * @param table the results table, whose built bodies the caller has taken out
 * @param failed told where rows could not be fetched
 */
export function createTableBody(table: HTMLTableElement, store: RowStore, failed: () => void): TableBody {
  let body: HTMLTableSectionElement | null = null;
  let showing: { readonly count: number; readonly at: (place: number) => DrawnRow } | null = null;
  let drawnRange = '';
  let rowHeight = 38;
  let waiting = false;

  const spacer = (height: number): HTMLTableRowElement => {
    const row = document.createElement('tr');
    row.className = 'spacer';
    row.setAttribute('aria-hidden', 'true');
    const cell = row.insertCell();
    cell.colSpan = 7;
    // Set as a property: the content security policy lets no style attribute in.
    cell.style.height = `${height}px`;
    return row;
  };

  const inView = (count: number): readonly [number, number] => {
    if (count <= MOST_DRAWN || body === null) return [0, count];
    const top = -body.getBoundingClientRect().top;
    const first = Math.floor(top / rowHeight) - MARGIN;
    const last = Math.ceil((top + innerHeight) / rowHeight) + MARGIN;
    return [Math.max(0, Math.min(first, count - 1)), Math.min(count, Math.max(last, 2 * MARGIN))];
  };

  const draw = (force: boolean): void => {
    if (showing === null || body === null) return;
    const { count, at } = showing;
    const [first, last] = inView(count);
    const range = `${first} ${last}`;
    if (!force && range === drawnRange) return;
    drawnRange = range;
    const rows = Array.from({ length: last - first }, (_, offset) => at(first + offset));
    const focused = body.contains(document.activeElement) ? document.activeElement?.getAttribute('href') : null;
    const virtual = count > MOST_DRAWN;
    body.innerHTML = rows.map(({ row, why }, offset) => store.markup(row, `strip-row-${row}`, why, virtual ? first + offset + 2 : null)).join('');
    if (virtual) {
      const [drawn] = body.rows;
      if (drawn !== undefined && drawn.offsetHeight > 0) rowHeight = drawn.offsetHeight;
      body.prepend(spacer(first * rowHeight));
      body.append(spacer((count - last) * rowHeight));
    }
    if (focused != null) body.querySelector<HTMLElement>(`a[href="${CSS.escape(focused)}"]`)?.focus({ preventScroll: true });
    store.load(rows.map(({ row }) => row)).then(() => { if (drawnRange === range && body?.querySelector('td[colspan="6"]') !== null) draw(true); }, failed);
  };

  const onScroll = (): void => {
    if (waiting || showing === null || showing.count <= MOST_DRAWN) return;
    waiting = true;
    requestAnimationFrame(() => {
      waiting = false;
      draw(false);
    });
  };
  addEventListener('scroll', onScroll, { passive: true });
  addEventListener('resize', onScroll, { passive: true });

  return {
    show: async (count, at) => {
      const mine = { count, at };
      showing = mine;
      // Few rows come all at once, so that the table does not flicker.
      if (count <= MOST_DRAWN) await store.load(Array.from({ length: count }, (_, place) => at(place).row));
      if (showing !== mine) return;
      body ??= table.createTBody();
      const virtual = count > MOST_DRAWN;
      table.classList.toggle('virtual', virtual);
      if (virtual) table.setAttribute('aria-rowcount', String(count + 1));
      else table.removeAttribute('aria-rowcount');
      draw(true);
    },
    clear: () => {
      showing = null;
      drawnRange = '';
      body?.remove();
      body = null;
      table.classList.remove('virtual');
      table.removeAttribute('aria-rowcount');
    },
  };
}
