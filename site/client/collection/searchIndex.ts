import { type FormulaKeys, elementName, formulaKeys, nameWords } from '#engine';
import { type FoundCollection, type FoundComplex, type FoundRow, heldLigands } from './packed.ts';

/** Texts with the complexes that hold them, sorted for looking up beginnings. */
interface Postings {
  readonly exact: ReadonlyMap<string, readonly number[]>;
  readonly sorted: readonly string[];
  /** All of them with a line break around each, for looking up pieces. */
  readonly joined: string;
}

/** All by which complexes are found. Complexes are named by their place. */
export interface SearchIndex {
  readonly keys: readonly FormulaKeys[];
  readonly formulas: Postings;
  readonly names: Postings;
  readonly donors: Postings;
  readonly words: Postings;
  /** Words of geometry, spin, isomer, phase, medium and verdict, with the rows that hold them. */
  readonly fields: Postings;
  readonly ids: ReadonlyMap<string, number>;
}

/** Fields of a row that words may name. */
export const FIELDS: readonly (readonly [name: string, of: (row: FoundRow, complex: FoundComplex) => string])[] = [
  ['geometry', (_, { geometry }) => geometry], ['spin', (_, { spin }) => spin], ['isomer', (_, { isomer }) => isomer],
  ['phase', ({ phase }) => phase], ['medium', ({ medium }) => medium], ['verdict', ({ verdict }) => verdict],
];

/** So many complexes are worked on before the page may breathe. */
const SLICE = 50;

/**
 * Builds the index from the packed collection, in slices.
 * @param rest waits a moment between slices, so that typing and scrolling go on
 */
export async function buildIndex(collection: FoundCollection, rest: () => Promise<void>): Promise<SearchIndex> {
  const keys: FormulaKeys[] = [];
  const [formulas, names, donors, words, fields] = [gather(), gather(), gather(), gather(), gather()];
  for (const [place, complex] of collection.complexes.entries()) {
    if (place % SLICE === SLICE - 1) await rest();
    const own = keysOf(collection, complex);
    keys.push(own);
    for (const text of own.formulas) formulas.add(text, place);
    for (const text of own.names) names.add(text, place);
    for (const text of own.donors) donors.add(text, place);
    for (const text of own.words) words.add(text, place);
  }
  const wordsOf = new Map<string, readonly string[]>();
  for (const row of collection.rows) {
    if (row.place % (20 * SLICE) === 0) await rest();
    for (const [, of] of FIELDS) {
      const text = of(row, collection.complexes[row.complex]!);
      const own = wordsOf.get(text) ?? nameWords(text);
      wordsOf.set(text, own);
      for (const word of own) fields.add(word, row.place);
    }
  }
  await rest();
  return {
    keys, formulas: formulas.done(), names: names.done(), donors: donors.done(), words: words.done(), fields: fields.done(),
    ids: new Map(collection.complexes.map(({ id }, place) => [id, place])),
  };
}

/** The keys of a complex, as `searchMatch` compares them. */
export function keysOf({ packed }: FoundCollection, { ion, formula, isomer, set, name }: FoundComplex): FormulaKeys {
  const ligands = heldLigands(packed.sets[set]!, packed.ligands);
  const charge = /(?:[\])])(\d*)([+-])$/.exec(formula);
  return formulaKeys({
    formula, charge: charge === null ? 0 : Number(charge[1] || 1) * (charge[2] === '+' ? 1 : -1), isomer, metal: ion.metal, metalName: elementName(ion.metal) ?? ion.metal,
    oxidation: ion.oxidation, ligands, more: name === null ? [] : [name],
  });
}

function gather(): { readonly add: (text: string, place: number) => void; readonly done: () => Postings } {
  const exact = new Map<string, number[]>();
  return {
    add: (text, place) => {
      const list = exact.get(text);
      if (list === undefined) exact.set(text, [place]);
      else list.push(place);
    },
    done: () => {
      const sorted = [...exact.keys()].sort();
      return { exact, sorted, joined: `\n${sorted.join('\n')}\n` };
    },
  };
}

/** Places of every text that begins with `start`. */
export function beginningWith({ exact, sorted }: Postings, start: string): readonly number[] {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle]! < start) low = middle + 1;
    else high = middle;
  }
  const found: number[] = [];
  for (let place = low; place < sorted.length && sorted[place]!.startsWith(start); place += 1) for (const one of exact.get(sorted[place]!)!) found.push(one);
  return found;
}

/** Places of every text that holds `piece`. */
export function holding({ exact, joined }: Postings, piece: string): readonly number[] {
  const found: number[] = [];
  for (let at = joined.indexOf(piece); at !== -1;) {
    const end = joined.indexOf('\n', at);
    for (const one of exact.get(joined.slice(joined.lastIndexOf('\n', at) + 1, end))!) found.push(one);
    at = joined.indexOf(piece, end);
  }
  return found;
}
