// changes.xml: an Atom feed (RFC 4287), one entry a release, the newest first.

import { element, xmlStart } from './xml.ts';
import type { Publication } from './publication.ts';

export interface FeedRelease {
  readonly id: string;
  readonly date: string;
  readonly who: string;
  readonly cause: string;
  /** The changes that it brought, each a sentence. */
  readonly changes: readonly string[];
}

/** Most changes that an entry tells; the page tells all. */
const mostTold = 200;

/** The feed. Before the first release it holds one entry: that the collection was started. */
export function changesFeed(publication: Publication, releases: readonly FeedRelease[]): string {
  const { address, title, group, licence, started, software } = publication;
  const updated = releases.at(-1)?.date ?? started;
  const page = `${address}changes/`;
  const entries = releases.length === 0
    ? [entry(page, `${page}#started`, 'The collection was started', started, 'No release has been frozen yet.')]
    : [...releases].reverse().map(({ id, date, who, cause, changes }, index) =>
      entry(page, `${page}#release-${id}`, `Release ${id}`, date, told(who, cause, index === releases.length - 1 ? null : changes)));
  return `${xmlStart}${element('feed', { xmlns: 'http://www.w3.org/2005/Atom', 'xml:lang': 'en-GB' }, [
    element('id', {}, page),
    element('title', {}, `Changes: ${title}`),
    element('updated', {}, instant(updated)),
    element('author', {}, [element('name', {}, group)]),
    element('link', { rel: 'self', type: 'application/atom+xml', href: `${address}changes.xml` }, null),
    element('link', { rel: 'alternate', type: 'text/html', href: page }, null),
    element('rights', {}, licence),
    element('generator', {}, software),
    ...entries,
  ])}\n`;
}

function entry(page: string, id: string, title: string, date: string, content: string): string {
  return element('entry', {}, [
    element('id', {}, id), element('title', {}, title), element('updated', {}, instant(date)), element('link', { rel: 'alternate', type: 'text/html', href: page }, null),
    element('content', { type: 'text' }, content),
  ]);
}

function told(who: string, cause: string, changes: readonly string[] | null): string {
  if (changes === null) return `${sentence(cause)} Released by ${who}. It is the first release.`;
  const rest = changes.length - mostTold;
  const list = changes.length === 0 ? 'No number changed.' : `${changes.slice(0, mostTold).join(' ')}${rest > 0 ? ` And ${rest} more.` : ''}`;
  return `${sentence(cause)} Released by ${who}. ${list}`;
}

function sentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

function instant(date: string): string {
  return `${date}T00:00:00Z`;
}
