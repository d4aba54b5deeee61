// The check that every published address is there, and which of its pages are those of addresses that are gone.

import { existsSync } from 'node:fs';
import { join } from 'node:path';
import type { Published } from '../export/published.ts';
import { historyFromRows } from './rows.ts';

/**
 * The pages of a built site that say what became of an address: content of no search engine.
 * @throws Error where a published address, gone or not, has no page or file
 */
export function gonePages({ rows }: Pick<Published, 'rows'>, site: string): ReadonlySet<string> {
  const { releases, gone } = historyFromRows(rows);
  const pages = gone.filter(({ address, kind }) => kind !== 'corrected' && address.endsWith('/')).map(({ address }) => address);
  const goneFiles = new Set(gone.map(({ address }) => address).filter((address) => !address.endsWith('/')));
  const held = new Set([...releases.flatMap(({ addresses }) => addresses), ...pages].filter((address) => !address.includes('#') && !goneFiles.has(address)));
  const missing = [...held].filter((address) => !existsSync(join(site, address, address === '' || address.endsWith('/') ? 'index.html' : '')));
  if (missing.length > 0) throw new Error(`the site has nothing at ${missing.slice(0, 5).map((address) => (address === '' ? 'its first page' : address)).join(', ')}${missing.length > 5 ? ` and ${missing.length - 5} more` : ''}, published by an earlier release`);
  return new Set(pages);
}
