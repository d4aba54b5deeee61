import { COLUMNS, type Column } from './address.ts';

/**
 * Checkboxes by which columns of the results table are left out. The table carries a class for each; what is drawn and what is saved stay whole.
 */
export function createColumnChoice(panel: HTMLElement, table: HTMLTableElement, toggle: (name: Column) => void): { readonly show: (hidden: ReadonlySet<Column>) => void } {
  const boxes = [...panel.querySelectorAll('input')];
  panel.addEventListener('change', ({ target }) => { if (target instanceof HTMLInputElement) toggle(target.value as Column); });
  return {
    show: (hidden) => {
      for (const box of boxes) box.checked = !hidden.has(box.value as Column);
      for (const name of COLUMNS) table.classList.toggle(`without-${name}`, hidden.has(name));
    },
  };
}
