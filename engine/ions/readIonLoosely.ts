import { makeIon } from './makeIon.ts';
import { metals } from './metals.ts';
import { readRomanNumeral } from './oxidation.ts';
import type { Metal } from './metals.ts';
import type { Ion } from './types.ts';

const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** The parts of a loosely written ion: the metal where it is known, the word that named it, the oxidation state where one was written. */
export interface LooseIon {
  readonly word: string;
  readonly metal: Metal | null;
  readonly oxidation: number | null;
}

/**
 * Takes a loosely written ion apart: "Cr3+", "Cr³⁺", "Cr+3", "CrIII", "Cr(3)", "cr (iii)", "chromium(III)", "Chromium".
 * Returns null where the text is no word with an optional oxidation state behind it.
 */
export function takeIonApart(text: string): LooseIon | null {
  const plain = text.trim()
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(superscripts.indexOf(digit)))
    .replaceAll('⁺', '+').replaceAll('⁻', '-').replaceAll('\u2212', '-');
  const shape = /^([A-Za-z]+?)\s*(?:\(\s*([-+]?(?:[0-9]+|[ivx]+)\+?)\s*\)|\s([-+]?[ivx]+)|([-+]?[0-9]*[-+]?))?$/i.exec(plain);
  if (shape === null) return null;
  return split(shape[1] ?? '', shape[2] ?? shape[3] ?? shape[4] ?? '');
}

/** The ion that a loosely written text most likely means, or null. For search and for near names; a record must type "Cr(III)". */
export function readIonLoosely(text: string): Ion | null {
  const parts = takeIonApart(text);
  if (parts === null || parts.metal === null || parts.oxidation === null) return null;
  const ion = makeIon(parts.metal, parts.oxidation);
  return 'reason' in ion ? null : ion;
}

function split(word: string, charge: string): LooseIon {
  const metal = findMetal(word);
  if (charge !== '' || metal !== null) return { word, metal, oxidation: readCharge(charge) };
  // "CrIII": the numeral follows the symbol without a bracket.
  const joined = /^([A-Z][a-z]?)([IVX]+)$/.exec(word);
  if (joined === null) return { word, metal: null, oxidation: null };
  const [, symbol = '', numeral = ''] = joined;
  return { word: symbol, metal: findMetal(symbol), oxidation: readRomanNumeral(numeral) };
}

function findMetal(word: string): Metal | null {
  const lower = word.toLowerCase();
  return metals.find((metal) => metal.symbol.toLowerCase() === lower || metal.name === lower) ?? null;
}

function readCharge(text: string): number | null {
  if (text === '') return null;
  if (text === '+') return 1;
  const negative = text.startsWith('-') || text.endsWith('-');
  const size = text.replace(/[-+]/g, '');
  const value = /^[0-9]+$/.test(size) ? Number(size) : readRomanNumeral(size.toUpperCase());
  if (value === null || value > 12) return null;
  return negative && value !== 0 ? -value : value;
}
