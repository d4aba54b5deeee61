import { normaliseQuery, searchScore } from '#engine';
import type { SearchEntry } from './compact.ts';

/** Complexes that answer a query, best first; equally good ones keep the order of the book. An empty query finds all. */
export function find(entries: readonly SearchEntry[], text: string): readonly SearchEntry[] {
  if (text.trim() === '') return entries;
  const query = normaliseQuery(text);
  return entries.map((entry, place) => ({ entry, place, score: searchScore(query, entry.keys) }))
    .filter(({ score }) => score > 0)
    .sort((a, b) => b.score - a.score || a.place - b.place)
    .map(({ entry }) => entry);
}
