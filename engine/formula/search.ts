import { romanNumeral } from '../ions/oxidation.ts';
import { readIonLoosely } from '../ions/readIonLoosely.ts';
import { entitiesOf } from './composition.ts';
import { isMetal } from './elements.ts';
import { entityWords } from './groupWords.ts';
import type { FormulaKeys } from './keys.ts';
import { parseFormula } from './parse.ts';
import { plainFormula } from './print.ts';
import type { Formula, FormulaNode } from './types.ts';
import { folded, nameWords, squeezed } from './words.ts';

/** A word that a record's words must hold; `whole`: not merely begin with. */
export interface QueryWord {
  readonly text: string;
  readonly whole: boolean;
}

/** A search text in the form in which `searchScore` compares it. */
export interface NormalisedQuery {
  /** Letters and digits alone, without charge; "" where nothing but a charge was typed. */
  readonly squeezed: string;
  /** true where the text was a formula with a metal: then nothing is found by a mere piece of a formula. */
  readonly formula: boolean;
  readonly words: readonly QueryWord[];
  readonly charge: number | null;
  readonly isomer: string | null;
}

function metalInside(nodes: readonly FormulaNode[]): boolean {
  return nodes.some((node) => (node.kind === 'element' && isMetal(node.symbol)) || (node.kind === 'group' && metalInside(node.nodes)));
}

/** The formula that a text is, charges glued to counts included; null for names and half-typed formulas. */
function asFormula(text: string): Formula | null {
  // "Cobalt" could be read as Co with a ligand "balt".
  if (/[A-Z][a-z]{3}/.test(text) || /[a-z]{6}/.test(text)) return null;
  let parsed = parseFormula(text);
  if (!parsed.ok && parsed.code === 'CHARGE_AMBIGUOUS' && parsed.corrected !== null) parsed = parseFormula(parsed.corrected);
  return parsed.ok && metalInside(parsed.formula.parts.flatMap((part) => part.nodes)) ? parsed.formula : null;
}

/** Takes a charge off the end of a text that is no whole formula. */
function chargeOff(text: string): { readonly rest: string; readonly charge: number | null } {
  const plain = text.replace(/<\/?su[bp]>/g, '').replace(/[⁺]/g, '+').replace(/[⁻−–]/g, '-');
  const end = /(^|[\]^})])\s*[{(]?([0-9⁰¹²³⁴-⁹]?)([+-])[)}]*$/.exec(plain) ?? /(^|\s)([0-9⁰¹²³⁴-⁹])([+-])$/.exec(plain);
  if (!end || /[a-z]{6}/i.test(plain)) return { rest: text, charge: null };
  const size = end[2] === '' ? 1 : Number(folded(end[2] ?? '1'));
  return { rest: plain.slice(0, end.index + (end[1]?.length ?? 0)), charge: end[3] === '+' ? size : -size };
}

/**
 * Charge of the complex by what stands outside its brackets, "K3[Fe(CN)6]" 3-, "[Cr(NH3)6]Cl3" 3+; null where nothing or something
 * else stands there. Water of crystallisation does not count.
 */
function chargeByCounterIons(text: string): number | null {
  const plain = folded(text).replace(/[<>/_{}]|sub|sup/g, '');
  const before = /^(?:k|na|li|rb|cs|\(?nh4\)?)(\d?)\[/.exec(plain);
  const after = /\](?:cl|br|i|\(?no3\)?|\(?clo4\)?|\(?bf4\)?|\(?pf6\)?)(\d?)(?:$|[·*.\s])/.exec(plain);
  if ((before === null) === (after === null)) return null;
  const count = Number((before ?? after)![1] || 1);
  return before === null ? count : -count;
}

const roman = /^(i{1,3}|iv|vi{0,3})$/;

/** Words of free text; a number behind a word is how often it stands there, "nh3 6". */
function looseWords(text: string): readonly QueryWord[] {
  const words: QueryWord[] = [];
  for (const word of nameWords(text)) {
    const last = words.at(-1);
    if (/^\d+$/.test(word) && last) words[words.length - 1] = { text: `${last.text}:${word}`, whole: true };
    else words.push({ text: word, whole: roman.test(word) });
  }
  return words;
}

/**
 * Brings a search text into its normal form: a formula in any usual spelling (`Cr(NH3)6`, `[Cr(NH₃)₆]³⁺`, `[Cr(NH_3)_6]^{3+}`,
 * `cr nh3 6`, `K3[Cr(CN)6]`, `CrN6`), an ion (`Cr3+`, `chromium(III)`), names (`chromium ammine`) or a charge alone (`3+`). Never throws.
 */
export function normaliseQuery(text: string): NormalisedQuery {
  const query = text.trim().slice(0, 200);
  const ion = readIonLoosely(query);
  if (ion !== null) {
    const words = [`=${folded(ion.metal)}`, folded(romanNumeral(ion.oxidation))].map((word) => ({ text: word, whole: true }));
    return { squeezed: squeezed(ion.name), formula: true, words, charge: null, isomer: null };
  }
  const formula = asFormula(query);
  if (formula !== null) {
    const nodes = entitiesOf(formula)[0] ?? [];
    return {
      squeezed: squeezed(plainFormula({ isomer: null, parts: [{ multiplier: 1, nodes }], charge: null })),
      formula: true,
      words: entityWords(formula).map((word) => ({ text: word, whole: true })),
      charge: formula.charge ?? chargeByCounterIons(query),
      isomer: formula.isomer === null ? null : folded(formula.isomer),
    };
  }
  const { rest, charge } = chargeOff(query);
  const isomer = /^(cis|trans|fac|mer)(?=[-\s([])/i.exec(rest)?.[1]?.toLowerCase() ?? null;
  const body = isomer === null ? rest : rest.slice(isomer.length);
  // Counter-ions outside square brackets are no part of the complex; nor is a charge being typed behind them.
  const inside = /\[(.+)\]/.exec(body)?.[1] ?? body;
  return { squeezed: squeezed(inside), formula: false, words: looseWords(inside), charge, isomer };
}

function holds(keys: FormulaKeys, word: QueryWord): boolean {
  return keys.words.some((key) => key === word.text || key.startsWith(word.whole ? `${word.text}:` : word.text));
}

/** By what a complex answers a query. */
export type MatchKind = 'charge' | 'formula' | 'name' | 'donor atoms' | 'ion and ligands' | 'start of the formula' | 'start of a name' | 'words' | 'part of a formula or name';

/** The best match by itself, without charge and isomer: its worth and its kind; null for none. */
function base(query: NormalisedQuery, keys: FormulaKeys): readonly [worth: number, kind: MatchKind] | null {
  const text = query.squeezed;
  if (text === '') return query.charge !== null && query.charge === keys.charge ? [20, 'charge'] : null;
  if (keys.formulas.includes(text)) return [100, 'formula'];
  if (keys.names.includes(text)) return [90, 'name'];
  if (keys.donors.includes(text)) return [80, 'donor atoms'];
  const allWords = query.words.length > 0 && query.words.every((word) => holds(keys, word));
  if (allWords && query.formula) return [70, 'ion and ligands'];
  if (keys.formulas.some((formula) => formula.startsWith(text))) return [query.formula || text.length > 2 ? 60 : 40, 'start of the formula'];
  if (keys.names.some((name) => name.startsWith(text))) return [50, 'start of a name'];
  if (allWords) return [40, 'words'];
  const piece = !query.formula && text.length > 2;
  return piece && [...keys.formulas, ...keys.names].some((whole) => whole.includes(text)) ? [30, 'part of a formula or name'] : null;
}

/** A complex that answers a query: how well (higher is better), and by what. */
export interface FormulaMatch {
  readonly score: number;
  readonly kind: MatchKind;
}

/**
 * How and how well a complex answers a query; null where it does not. A charge or an isomer that was typed decides between
 * complexes that agree in all else and never hides one.
 */
export function searchMatch(query: NormalisedQuery, keys: FormulaKeys): FormulaMatch | null {
  const found = base(query, keys);
  if (found === null) return null;
  const [worth, kind] = found;
  const charge = query.charge === null ? 0 : query.charge === keys.charge ? 5 : -5;
  const isomer = query.isomer === null ? 0 : query.isomer === keys.isomer ? 4 : -4;
  return { score: worth + charge + isomer, kind };
}

/** The score of `searchMatch`; 0 where the complex does not answer. */
export function searchScore(query: NormalisedQuery, keys: FormulaKeys): number {
  return searchMatch(query, keys)?.score ?? 0;
}
