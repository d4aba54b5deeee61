import { bibtexEntry } from './bibtex.ts';

/** A row of the table source. */
export interface SourceCited {
  readonly id: string;
  readonly reference: string;
  /** JSON list of names. */
  readonly authors: string;
  readonly title: string | null;
  readonly journal: string | null;
  readonly year: string | null;
  readonly volume: string | null;
  readonly pages: string | null;
  readonly doi: string | null;
  readonly url: string | null;
}

/** sources.bib: the publications that the records cite, under their record ids. The printed reference stands in `note`. */
export function sourcesBib(sources: readonly SourceCited[]): string {
  if (sources.length === 0) return '% The collection cites no publications.\n';
  return sources.map((source) => bibtexEntry(source.journal === null ? 'misc' : 'article', source.id, [
    ['author', JSON.parse(source.authors) as string[], 'people'], ['title', source.title], ['journal', source.journal], ['year', source.year],
    ['volume', source.volume], ['pages', source.pages?.replace(/(\d)[-–](\d)/, '$1--$2') ?? null], ['doi', source.doi], ['url', source.url], ['note', source.reference],
  ])).join('\n');
}
