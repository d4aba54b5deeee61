import type { SortKey, Sorting } from './order.ts';

/** Turns the heads of sortable columns into buttons. Heads are marked by `data-sort`; without scripts they stay plain words. */
export function sortButtons(table: HTMLTableElement, click: (key: SortKey) => void): (sorting: Sorting | null) => void {
  const heads = [...table.querySelectorAll<HTMLElement>('th[data-sort]')];
  for (const head of heads) {
    const button = document.createElement('button');
    button.type = 'button';
    button.className = 'sort';
    button.append(...head.childNodes);
    head.append(button);
    button.addEventListener('click', () => click(head.dataset['sort'] as SortKey));
  }
  return (sorting) => {
    for (const head of heads) {
      if (sorting?.key === head.dataset['sort']) head.setAttribute('aria-sort', sorting!.descending ? 'descending' : 'ascending');
      else head.removeAttribute('aria-sort');
    }
  };
}
