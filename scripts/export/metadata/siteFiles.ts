// Files at the top of the site for machines that walk it: sitemap.xml and robots.txt.

import { element, xmlStart } from './xml.ts';
import type { Publication } from './publication.ts';

/** sitemap.xml (sitemaps.org, 0.9). `pages` are paths within the site; the format holds at most 50 000 addresses. */
export function sitemap({ address, date }: Publication, pages: readonly string[]): string {
  if (pages.length > 50_000) throw new RangeError(`a sitemap of ${pages.length} addresses: expected at most 50 000`);
  return `${xmlStart}${element('urlset', { xmlns: 'http://www.sitemaps.org/schemas/sitemap/0.9' },
    pages.map((page) => element('url', {}, [element('loc', {}, encodeURI(`${address}${page}`)), element('lastmod', {}, date)])))}\n`;
}

/** robots.txt (RFC 9309). It counts only where the site stands at the top of its host; elsewhere it does no harm. */
export function robots({ address }: Publication): string {
  return `User-agent: *\nAllow: /\n\nSitemap: ${address}sitemap.xml\n`;
}
