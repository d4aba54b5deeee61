// Pages for published addresses whose record was taken away or renamed, and the check that every published address is there.

import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Publication } from '../export/metadata/publication.ts';
import { xmlText } from '../export/metadata/xml.ts';
import type { Published } from '../export/published.ts';
import { historyFromRows } from './rows.ts';
import type { Gone, History } from './types.ts';

/**
 * Writes a page for every address that is gone and that the site itself did not draw. Returns the pages of gone addresses.
 * @throws Error where a published address has neither its page nor one of these
 */
export function writeTombstones({ rows, publication }: Published, site: string): ReadonlySet<string> {
  const history = historyFromRows(rows);
  const pages = history.gone.filter(({ address, kind }) => kind !== 'corrected' && address.endsWith('/'));
  for (const gone of pages) {
    const file = join(site, gone.address, 'index.html');
    if (existsSync(file)) continue;
    mkdirSync(join(site, gone.address), { recursive: true });
    writeFileSync(file, tombstonePage(publication, gone));
  }
  holdPublished(history, site);
  return new Set(pages.map(({ address }) => address));
}

function holdPublished({ releases, gone }: History, site: string): void {
  const left = new Set(gone.map(({ address }) => address));
  const published = new Set(releases.flatMap(({ addresses }) => addresses).filter((address) => !address.includes('#')));
  const missing = [...published].filter((address) => !existsSync(join(site, address, address === '' || address.endsWith('/') ? 'index.html' : '')) && !left.has(address));
  if (missing.length > 0) throw new Error(`the site has nothing at ${missing.slice(0, 5).map((address) => (address === '' ? 'its first page' : address)).join(', ')}${missing.length > 5 ? ` and ${missing.length - 5} more` : ''}, published by an earlier release`);
}

/** A page that says what became of an address. A redirect also takes the reader there at once. */
export function tombstonePage({ address: base, title, licence }: Publication, { address, kind, target, reason }: Gone): string {
  const path = new URL(base).pathname;
  const link = target === null ? null : `${path}${target}`;
  const heading = kind === 'redirect' ? 'This page has a new address' : 'This page was taken away';
  return [
    '<!doctype html>', '<html lang="en-GB">', '<head>', '<meta charset="utf-8">',
    '<meta http-equiv="Content-Security-Policy" content="default-src \'none\'; base-uri \'none\'; form-action \'none\'">',
    '<meta name="viewport" content="width=device-width, initial-scale=1">',
    ...(kind === 'redirect' && link !== null ? [`<meta http-equiv="refresh" content="0; url=${xmlText(link)}">`] : []),
    '<meta name="robots" content="noindex">',
    ...(link === null ? [] : [`<link rel="${kind === 'redirect' ? 'canonical' : 'successor-version'}" href="${xmlText(`${base}${target}`)}">`]),
    `<title>${xmlText(`${heading} · ${title}`)}</title>`, '</head>', '<body>', '<main>',
    `<h1>${heading}</h1>`, `<p><code>${xmlText(address)}</code></p>`,
    ...(reason === null ? [] : [`<p>${xmlText(reason)}</p>`]),
    ...(link === null ? [] : [`<p>${kind === 'redirect' ? 'It is now' : 'Its place is taken by'} <a href="${xmlText(link)}">${xmlText(target!)}</a>.</p>`]),
    '<p>What earlier releases said of it stays readable in the files of the collection: tables <code>frozen_complex</code> and <code>frozen_value</code>.</p>',
    `<p><a href="${xmlText(path)}">${xmlText(title)}</a>. Content: ${xmlText(licence)}.</p>`,
    '</main>', '</body>', '</html>', '',
  ].join('\n');
}
