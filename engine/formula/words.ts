import { plainDigits } from './scripts.ts';

const numberWords: readonly (readonly [RegExp, string])[] = [
  [/bis(?=\()/g, 'di'], [/tris(?=\()/g, 'tri'], [/tetrakis(?=\()/g, 'tetra'], [/pentakis(?=\()/g, 'penta'], [/hexakis(?=\()/g, 'hexa'],
];

/** Small letters without accents, one kind of dash, plain digits: the first step for everything that is indexed or looked for. */
export function folded(text: string): string {
  return plainDigits(text).normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replace(/[‐-―−⁻]/g, '-').replace(/sulph/g, 'sulf');
}

/** Letters and digits alone, "crnh36"; bis( and tris( become di and tri, so that a name is found with or without brackets. */
export function squeezed(text: string): string {
  return numberWords.reduce((out, [pattern, word]) => out.replace(pattern, word), folded(text)).replace(/[^\p{L}\p{N}]/gu, '');
}

const unsaid = new Set(['complex', 'complexes', 'ion', 'ions', 'of', 'the', 'and', 'bis', 'tris', 'tetrakis', 'pentakis', 'hexakis']);

/** The words of a name or query: locants such as "1,2-" and words that tell nothing are dropped. */
export function nameWords(text: string): readonly string[] {
  return folded(text)
    .replace(/(^|[^\p{L}\p{N}])\d+['′]*(?:,\d+['′]*)*(?=-)/gu, '$1 ')
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '' && !unsaid.has(word));
}
