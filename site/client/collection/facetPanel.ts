import { escapeText } from '../../charts/text.ts';
import { partsMarkup } from '../../components/resultRow.ts';
import { sentenceShown } from '../../data/typeset.ts';
import type { Chosen, Facet } from './facets.ts';

/** Draws the facets with their counts as groups of checkboxes, and keeps both up to date. */
export interface FacetPanel {
  readonly show: (chosen: Chosen, counts: readonly (readonly number[])[]) => void;
}

export function createFacetPanel(panel: HTMLElement, facets: readonly Facet[], toggle: (facet: string, value: string) => void): FacetPanel {
  panel.innerHTML = facets.map(({ name, title, values }, place) =>
    `<fieldset><legend>${escapeText(title)}</legend><div class="values${values.length > 12 ? ' many' : ''}"${values.length > 12 ? ` tabindex="0" role="group" aria-label="${escapeText(title)}"` : ''}>`
    + values.map((value, index) => `<label><input type="checkbox" name="${escapeText(name)}" value="${escapeText(value)}"/> ${shownMarkup(name, value)} <span class="soft" data-count="${place}.${index}"></span></label>`).join('')
    + '</div></fieldset>').join('');
  panel.addEventListener('change', ({ target }) => { if (target instanceof HTMLInputElement) toggle(target.name, target.value); });
  const boxes = [...panel.querySelectorAll<HTMLInputElement>('input')];
  return {
    show: (chosen, counts) => {
      for (const box of boxes) box.checked = chosen.get(box.name)?.has(box.value) ?? false;
      for (const place of panel.querySelectorAll<HTMLElement>('[data-count]')) {
        const [facet = 0, value = 0] = place.dataset['count']!.split('.').map(Number);
        const count = counts[facet]![value]!;
        place.textContent = String(count);
        const label = place.parentElement!;
        label.classList.toggle('none', count === 0);
      }
    },
  };
}

/** A value as it is set: "d3" and terms with raised numbers, donor sets with lowered ones. */
export function shownMarkup(facet: string, value: string): string {
  if (facet === 'd') return `d<sup>${escapeText(value.slice(1))}</sup>`;
  if (facet === 'donors') return escapeText(value).replaceAll(/\d+/g, '<sub>$&</sub>');
  return facet === 'term' ? partsMarkup(sentenceShown(value)) : escapeText(value);
}
