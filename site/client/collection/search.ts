import { type FormulaMatch, type MatchKind, type NormalisedQuery, type QueryWord, nameWords, normaliseQuery, readIonLoosely } from '#engine';
import { figures, plainNumber } from '../../data/show.ts';
import { nearNames } from '../../../scripts/content/nearest.ts';
import type { FoundCollection, FoundComplex, FoundRow } from './packed.ts';
import { type NumberClause, type Query, readQuery } from './query.ts';
import { FIELDS, type SearchIndex, beginningWith, holding } from './searchIndex.ts';

/** A row that answers a search. */
export interface Hit {
  readonly row: number;
  readonly score: number;
  /** Why it was found, "formula", "band near 21 550 cm⁻¹"; said only for rows that are shown. */
  readonly why: () => string;
}

export interface Found {
  readonly hits: readonly Hit[];
  /** true where nothing answers and the hits are the nearest instead. */
  readonly nearest: boolean;
}

/** Rows that answer a search text, best first; equally good ones in the order of the book. */
export function search(collection: FoundCollection, index: SearchIndex, typed: string): Found {
  const query = readQuery(typed);
  const hits = answers(collection, index, query);
  if (hits.length > 0) return { hits: sorted(hits), nearest: false };
  return { hits: sorted(nearest(collection, index, query)), nearest: true };
}

/** Scores are far below this, and differ by more than one in as many where they differ. */
const HIGH = 1024;

/** By score, then by row. Numbers are sorted several times faster than objects, and one letter may find ten thousand rows. */
function sorted(hits: readonly Hit[]): readonly Hit[] {
  const rows = 2 ** 32;
  const byRow = new Map(hits.map((hit) => [hit.row, hit]));
  return [...Float64Array.from(hits, ({ row, score }) => (HIGH * HIGH - Math.round(score * HIGH)) * rows + row).sort()].map((key) => byRow.get(key % rows)!);
}

function answers(collection: FoundCollection, index: SearchIndex, query: Query): readonly Hit[] {
  const { rows, complexes } = collection;
  const byText = query.text === '' ? null : textHits(collection, index, query.text);
  const candidates: readonly Hit[] = byText ?? rows.map(({ place }) => ({ row: place, score: 0, why: () => '' }));
  if (query.numbers.length === 0 && query.electrons === null && query.ion === null) return byText ?? [];
  return candidates.flatMap((hit): Hit[] => {
    const row = rows[hit.row]!;
    let { score } = hit;
    if (query.ion !== null && complexes[row.complex]!.ion.name !== query.ion) return [];
    if (query.electrons !== null) {
      if (complexes[row.complex]!.ion.electrons !== query.electrons) return [];
      score += 50;
    }
    const numbers: NumberFound[] = [];
    for (const clause of query.numbers) {
      const found = numberFound(row, clause);
      if (found === null || found.distance > 0) return [];
      numbers.push(found);
      score += 60 - 30 * found.off;
    }
    return [{
      row: hit.row, score,
      why: () => [...(hit.score === 0 ? [] : [hit.why()]), ...(query.ion === null ? [] : [query.ion]), ...(query.electrons === null ? [] : [`d${query.electrons}`]), ...numbers.map(({ value }, place) => SHOWN[query.numbers[place]!.kind](value))].join(', '),
    }];
  });
}

interface NumberFound {
  readonly value: number;
  /** How far outside what was asked for; 0: inside. */
  readonly distance: number;
  /** 0 at the centre of what was asked for, 1 at its end. */
  readonly off: number;
}

/** The row's number nearest to a clause; null where it has none. */
function numberFound(row: FoundRow, clause: NumberClause): NumberFound | null {
  if (clause.kind !== 'band') {
    const value = clause.kind === 'Delta' ? row.delta : clause.kind === 'B' ? row.racahB : row.beta;
    return value === null ? null : { value, distance: Math.max(0, clause.low - value, value - clause.high), off: 0 };
  }
  const { low, high, centre } = clause;
  let best: NumberFound | null = null;
  for (const value of row.bands) {
    const distance = Math.max(0, low - value, value - high);
    const off = centre === null ? 0 : Math.abs(value - centre) / Math.max(1, high - centre);
    if (best === null || distance < best.distance || (distance === best.distance && off < best.off)) best = { value, distance, off };
  }
  return best;
}

const SHOWN: Readonly<Record<NumberClause['kind'], (value: number) => string>> = {
  band: (value) => `band near ${plainNumber(value, 0)} cm⁻¹`, Delta: (value) => `Δ ${plainNumber(value, 0)} cm⁻¹`, B: (value) => `B ${plainNumber(value, 0)} cm⁻¹`, beta: (value) => `β ${figures(value, 2)}`,
};

function textHits(collection: FoundCollection, index: SearchIndex, text: string): readonly Hit[] {
  const { complexes, rows } = collection;
  const query = normaliseQuery(text);
  const best = new Map<number, Hit>();
  const add = (hit: Hit): void => { if ((best.get(hit.row)?.score ?? 0) < hit.score) best.set(hit.row, hit); };
  const rowsOf = (complex: number): readonly FoundRow[] => rows.slice(complexes[complex]!.firstRow, complexes[complex + 1]?.firstRow ?? rows.length);
  const [id = '', measurement] = text.trim().toLowerCase().split('/');
  const known = index.ids.get(id);
  if (known !== undefined) for (const row of rowsOf(known)) if (measurement === undefined || row.measurement.startsWith(measurement)) add({ row: row.place, score: 120, why: () => 'record id' });
  const alone = readIonLoosely(text) !== null;
  if (!query.formula && query.words.length > 0) fieldHits(collection, index, query.words, add);
  for (const [complex, { score, kind }] of matches(index, query, best.size === 0)) {
    const why = (): string => alone && kind === 'ion and ligands' ? 'ion' : kind === 'words' ? 'name or ligand' : kind;
    for (const row of rowsOf(complex)) add({ row: row.place, score, why });
  }
  return [...best.values()];
}

/**
 * Every complex that answers, with the score and kind that `searchMatch` gives it, read off the index.
 * @param pieces false: what answers by a mere piece of a formula or name is left out
 */
export function matches(index: SearchIndex, query: NormalisedQuery, pieces = true): ReadonlyMap<number, FormulaMatch> {
  const { squeezed: text, words, formula, charge, isomer } = query;
  const found = new Map<number, FormulaMatch>();
  const add = (places: Iterable<number>, worth: number, kind: MatchKind): void => {
    for (const place of places) {
      if (found.has(place)) continue;
      const keys = index.keys[place]!;
      const adjusted = worth + (charge === null ? 0 : charge === keys.charge ? 5 : -5) + (isomer === null ? 0 : isomer === keys.isomer ? 4 : -4);
      found.set(place, { score: adjusted, kind });
    }
  };
  if (text === '') {
    if (charge !== null) add([...index.keys.keys()].filter((place) => index.keys[place]!.charge === charge), 20, 'charge');
    return found;
  }
  add(index.formulas.exact.get(text) ?? [], 100, 'formula');
  add(index.names.exact.get(text) ?? [], 90, 'name');
  add(index.donors.exact.get(text) ?? [], 80, 'donor atoms');
  const all = withWords(index, words);
  if (formula) add(all, 70, 'ion and ligands');
  add(beginningWith(index.formulas, text), formula || text.length > 2 ? 60 : 40, 'start of the formula');
  add(beginningWith(index.names, text), 50, 'start of a name');
  add(all, 40, 'words');
  if (pieces && found.size === 0 && !formula && text.length > 2) add([...holding(index.formulas, text), ...holding(index.names, text)], 30, 'part of a formula or name');
  return found;
}

/** Complexes that hold every word. */
function withWords(index: SearchIndex, words: readonly QueryWord[]): ReadonlySet<number> {
  let all: ReadonlySet<number> = new Set();
  words.forEach((word, place) => {
    const own = new Set(withWord(index, word));
    all = place === 0 ? own : new Set([...all].filter((one) => own.has(one)));
  });
  return all;
}

function withWord({ words }: SearchIndex, { text, whole }: QueryWord): readonly number[] {
  return whole ? [...words.exact.get(text) ?? [], ...beginningWith(words, `${text}:`)] : beginningWith(words, text);
}

/** A word this short names no field by its beginning: "cr" is chromium and not a crystal. */
const shortest = 3;

/** Rows whose every query word stands in a field or in a name or formula, at least one in a field. */
function fieldHits({ complexes, rows }: FoundCollection, index: SearchIndex, words: readonly QueryWord[], add: (hit: Hit) => void): void {
  const wanted = words.map((word) => ({ fields: new Set(word.text.length < shortest ? [] : beginningWith(index.fields, word.text)), complexes: new Set(withWord(index, word)) }));
  // Every row that one word names a field of; what answers by names and formulas alone is found without it.
  const candidates = new Set(wanted.flatMap(({ fields }) => [...fields]));
  for (const place of candidates) {
    const row = rows[place]!;
    let inFields = 0;
    const all = wanted.every(({ fields, complexes: holders }) => {
      if (fields.has(place)) inFields += 1;
      else if (!holders.has(row.complex)) return false;
      return true;
    });
    if (all) add({ row: place, score: inFields < wanted.length ? 45 : 38, why: () => fieldsNamed(row, complexes[row.complex]!, words) });
  }
}

/** "geometry tetrahedral, medium water": the fields in which a query's words stand. */
const fieldsNamed = (row: FoundRow, complex: FoundComplex, words: readonly QueryWord[]): string => FIELDS
  .filter(([, of]) => nameWords(of(row, complex)).some((own) => words.some(({ text }) => text.length >= shortest && own.startsWith(text))))
  .map(([name, of]) => `${name} ${of(row, complex)}`).join(', ');

/** So many are offered where nothing answers. */
const NEAREST = 5;

/** What lies nearest where nothing answers: by number, or by the spelling of ids, names, formulas, ligands and metals. */
function nearest(collection: FoundCollection, index: SearchIndex, query: Query): readonly Hit[] {
  const { rows, complexes } = collection;
  const [clause] = query.numbers;
  if (clause !== undefined && query.text === '') {
    return rows.flatMap((row) => { const found = numberFound(row, clause); return found === null ? [] : [{ row: row.place, found }]; })
      .sort((a, b) => a.found.distance - b.found.distance || a.row - b.row).slice(0, NEAREST).map(({ row, found }, place) => ({ row, score: NEAREST - place, why: () => SHOWN[clause.kind](found.value) }));
  }
  // What answers a part of what was asked.
  if (query.text !== '' && (query.numbers.length > 0 || query.electrons !== null || query.ion !== null)) {
    const part = sorted(answers(collection, index, { text: query.text, numbers: [], electrons: null, ion: null }));
    if (part.length > 0) return part.slice(0, NEAREST);
  }
  const { squeezed: text } = normaliseQuery(query.text);
  if (text.length < 2) return [];
  const words = index.words.sorted.filter((word) => word.length > 2 && !/[:=]/.test(word));
  const lists = [[...index.ids.keys()], ...(/\d/.test(text) ? [index.formulas.sorted, index.names.sorted, words] : [words, index.names.sorted, index.formulas.sorted])];
  // The first letter is seldom mistyped, and looking at all spellings would take too long.
  const alike = (list: readonly string[]): readonly string[] => list.filter((one) => one[0] === text[0]);
  const near = [nearNames(query.text.toLowerCase(), alike(lists[0]!)), ...lists.slice(1).map((list) => nearNames(text, alike(list), 2))].flat();
  const hits = new Map<number, Hit>();
  for (const name of near) {
    const id = index.ids.get(name);
    const places = id !== undefined ? [id] : index.formulas.exact.get(name) ?? index.names.exact.get(name) ?? index.words.exact.get(name) ?? [];
    for (const place of places.slice(0, NEAREST)) {
      const row = complexes[place]!.firstRow;
      if (!hits.has(row) && hits.size < NEAREST) hits.set(row, { row, score: NEAREST - hits.size, why: () => `near in spelling to ${name}` });
    }
  }
  return [...hits.values()];
}
