import { type FormulaShown, formulaShown } from '../../data/typeset.ts';
import { type FoundCollection, type PackedSearch, unpackSearch } from '../collection/packed.ts';
import { search } from '../collection/search.ts';
import { type SearchIndex, buildIndex } from '../collection/searchIndex.ts';
import { fetchJson } from '../page/fetchJson.ts';

/** A measurement that may be picked. */
export interface Offer {
  /** "cr-am6/aq-295" */
  readonly pick: string;
  readonly formula: FormulaShown;
  readonly conditions: string;
}

const MOST = 8;
let ready: Promise<{ readonly collection: FoundCollection; readonly index: SearchIndex }> | null = null;

async function load(): Promise<{ readonly collection: FoundCollection; readonly index: SearchIndex }> {
  const collection = unpackSearch(await fetchJson<PackedSearch>('data/search.json'));
  return { collection, index: await buildIndex(collection, () => new Promise((done) => { setTimeout(done, 0); })) };
}

/** The measurements that answer a search text best. */
export async function offers(query: string): Promise<readonly Offer[]> {
  ready ??= load();
  ready.catch(() => { ready = null; });
  const { collection, index } = await ready;
  const abbreviations = collection.packed.ligands.flatMap(({ abbreviation }) => abbreviation ?? []);
  return search(collection, index, query).hits.slice(0, MOST).map(({ row }) => {
    const { complex, measurement, phase, medium } = collection.rows[row]!;
    const { id, formula, isomer } = collection.complexes[complex]!;
    return { pick: `${id}/${measurement}`, formula: formulaShown(formula, isomer, abbreviations), conditions: [measurement, phase, medium].filter((text) => text !== '').join(', ') };
  });
}
