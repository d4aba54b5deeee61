import { escapeText } from '../../charts/text.ts';
import { partsMarkup } from '../../components/resultRow.ts';
import type { Cell, Column, Table } from '../../data/table.ts';
import type { Parts } from '../../data/typeset.ts';
import { url } from '../../url.ts';

/** A table as the build writes it, for tables that are made in the page. */
export function tableMarkup({ caption, columns, rows }: Table, hideCaption = false): string {
  const head = columns.map((column) => `<th scope="col"${column.figure ? ' class="figure"' : ''}>${partsMarkup(column.head)}</th>`).join('');
  const body = rows.map((row) => `<tr>${row.map((cell, place) => cellMarkup(cell, columns[place]!)).join('')}</tr>`).join('');
  return `<div class="scroll" role="group" aria-label="${escapeText(caption)}" tabindex="0"><table>`
    + `<caption${hideCaption ? ' class="unseen-text"' : ''}>${escapeText(caption)}</caption><thead><tr>${head}</tr></thead><tbody>${body}</tbody></table></div>`;
}

function cellMarkup(cell: Cell, { rowHead, figure, long }: Column): string {
  if (rowHead) return `<th scope="row">${inner(cell)}</th>`;
  const names = [figure ? 'figure' : '', long ? 'long' : '', typeof cell !== 'string' && cell.soft ? 'withheld' : ''].filter((name) => name !== '').join(' ');
  return `<td${names === '' ? '' : ` class="${names}"`}>${inner(cell)}</td>`;
}

function inner(cell: Cell): string {
  if (typeof cell === 'string') return escapeText(cell);
  const markup = partsMarkup(cell.parts);
  return cell.path === undefined ? markup : `<a class="formula" href="${escapeText(url(cell.path))}">${markup}</a>`;
}

/** A figure with its title and caption around a drawing. */
export function figureMarkup(svg: string, title: Parts, caption: Parts): string {
  return `<figure><div class="scroll" role="group" aria-label="${escapeText(title.map(({ text }) => text).join(''))}" tabindex="0">${svg}</div>`
    + `<figcaption><p><strong>${partsMarkup(title)}</strong> ${partsMarkup(caption)}</p></figcaption></figure>`;
}

export const paragraph = (parts: Parts, cls = ''): string => `<p${cls === '' ? '' : ` class="${cls}"`}>${partsMarkup(parts)}</p>`;
