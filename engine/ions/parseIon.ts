import { makeIon } from './makeIon.ts';
import { metalOf, metals } from './metals.ts';
import { ionName, readRomanNumeral } from './oxidation.ts';
import { readIonLoosely, takeIonApart } from './readIonLoosely.ts';
import type { Ion } from './types.ts';

/** An ion, or why the text is none, with names that may have been meant (nearest first). */
export type ParsedIon =
  | { readonly ion: Ion; readonly fault: null; readonly reason: null; readonly near: readonly string[] }
  | { readonly ion: null; readonly fault: IonFault; readonly reason: string; readonly near: readonly string[] };

/** What is wrong with the name of an ion. */
export type IonFault = 'spelling' | 'unknown metal' | 'no oxidation state' | 'impossible d count';

/**
 * Reads the name of a metal ion as a record types it: element symbol and Roman numeral in brackets, "Cr(III)", "Ni(0)", "Mn(-I)".
 * Returns the ion with its d count (group - oxidation). Any other spelling is refused with a reason and the near names,
 * and so is a metal outside the d block, an oxidation state above the group number and a d count above 10.
 * Never throws.
 */
export function parseIon(text: string): ParsedIon {
  const shape = /^([A-Z][a-z]?)\(([-\u2212]?[IVX]+|0)\)$/.exec(text);
  const oxidation = shape === null ? null : readRomanNumeral(shape[2] ?? '');
  if (shape === null || oxidation === null) return refuseSpelling(text);
  const metal = metalOf(shape[1] ?? '');
  if (metal === null) return refuseMetal(shape[1] ?? '', oxidation);
  const ion = makeIon(metal, oxidation);
  if ('reason' in ion) return { ion: null, fault: 'impossible d count', reason: ion.reason, near: statesNearest(metal.symbol, oxidation) };
  return { ion, fault: null, reason: null, near: [] };
}

function refuseSpelling(text: string): ParsedIon {
  const meant = readIonLoosely(text);
  if (meant !== null) return { ion: null, fault: 'spelling', reason: `an ion is written with a Roman numeral in brackets, ${meant.name}`, near: [meant.name] };
  const parts = takeIonApart(text);
  if (parts === null || (parts.metal === null && parts.oxidation === null)) {
    return { ion: null, fault: 'spelling', reason: 'not a metal ion: an element symbol and a Roman numeral in brackets are needed, Cr(III)', near: [] };
  }
  if (parts.metal === null) return refuseMetal(parts.word, parts.oxidation ?? 0);
  if (parts.oxidation === null) {
    return {
      ion: null,
      fault: 'no oxidation state',
      reason: `the oxidation state of ${parts.metal.name} is missing or is no Roman numeral from 0 to XII`,
      near: statesNearest(parts.metal.symbol, 3),
    };
  }
  const ion = makeIon(parts.metal, parts.oxidation);
  // A legal ion was taken by readIonLoosely above, so only an impossible one is left.
  if (!('reason' in ion)) return { ion: null, fault: 'spelling', reason: `an ion is written ${ion.name}`, near: [ion.name] };
  return { ion: null, fault: 'impossible d count', reason: ion.reason, near: statesNearest(parts.metal.symbol, parts.oxidation) };
}

function refuseMetal(word: string, oxidation: number): ParsedIon {
  return { ion: null, fault: 'unknown metal', reason: `"${word}" is not one of the thirty d-block metals (Sc to Zn, Y to Cd, La, Hf to Hg)`, near: metalsNear(word, oxidation) };
}

/** The two legal oxidation states of a metal that lie nearest to the one typed; 0 is offered only where nothing else is near. */
function statesNearest(symbol: string, typed: number): readonly string[] {
  const metal = metalOf(symbol);
  if (metal === null) return [];
  return [1, 2, 3, 4, 5, 6, 7, 8, 0]
    .filter((oxidation) => !('reason' in makeIon(metal, oxidation)))
    .sort((first, second) => Math.abs(first - typed) - Math.abs(second - typed))
    .slice(0, 2)
    .map((oxidation) => ionName(symbol, oxidation));
}

/** Ions of metals whose symbol or name is at most one (symbol) or two (name) keystrokes from the word. */
function metalsNear(word: string, oxidation: number): readonly string[] {
  const lower = word.toLowerCase();
  return metals
    .map((metal) => ({
      metal,
      steps: lower.length > 2 ? keystrokes(lower, metal.name) : keystrokes(lower, metal.symbol.toLowerCase()),
    }))
    .filter(({ metal, steps }) => steps <= (lower.length > 2 ? 2 : 1) && !('reason' in makeIon(metal, oxidation)))
    .sort((first, second) => first.steps - second.steps)
    .slice(0, 4)
    .map(({ metal }) => ionName(metal.symbol, oxidation));
}

/** Least number of letters inserted, left out or changed between two words (Levenshtein 1966). */
function keystrokes(first: string, second: string): number {
  let previous = Array.from({ length: second.length + 1 }, (_, place) => place);
  for (let i = 1; i <= first.length; i += 1) {
    const current = [i];
    for (let j = 1; j <= second.length; j += 1) {
      const changed = (previous[j - 1] ?? 0) + (first[i - 1] === second[j - 1] ? 0 : 1);
      current.push(Math.min(changed, (previous[j] ?? 0) + 1, (current[j - 1] ?? 0) + 1));
    }
    previous = current;
  }
  return previous[second.length] ?? 0;
}
