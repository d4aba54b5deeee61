import { readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { feedReleases } from './describe.ts';
import { changesFeed } from './metadata/atom.ts';
import { robots, sitemap } from './metadata/siteFiles.ts';
import type { Published } from './published.ts';

/** Writes sitemap.xml, robots.txt and the feed of changes at the top of a built site; `unlisted` are pages that are no content, as tombstones. */
export function writeSiteFiles({ rows, publication }: Published, site: string, unlisted: ReadonlySet<string>): void {
  const pages = pagesOf(site).filter((page) => !unlisted.has(page));
  writeFileSync(join(site, 'sitemap.xml'), sitemap(publication, pages));
  writeFileSync(join(site, 'robots.txt'), robots(publication));
  writeFileSync(join(site, 'changes.xml'), changesFeed(publication, feedReleases(rows)));
}

/** Paths of the pages of a built site, in binary order: "", "complexes/cr-am6/". */
export function pagesOf(site: string): readonly string[] {
  return readdirSync(site, { recursive: true, encoding: 'utf8' }).map((name) => name.replaceAll('\\', '/'))
    .filter((name) => name === 'index.html' || name.endsWith('/index.html')).map((name) => name.slice(0, -'index.html'.length)).sort();
}
