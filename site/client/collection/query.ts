import { parseQuantity, parseRange, readIonLoosely, toWavenumber } from '#engine';

/** What is looked for in the numbers of a row. Energies in cm-1; beta is a number. */
export type NumberClause =
  | { readonly kind: 'band'; readonly low: number; readonly high: number; readonly centre: number | null }
  | { readonly kind: 'Delta' | 'B' | 'beta'; readonly low: number; readonly high: number };

/** A search text taken apart: numbers with their meaning, a d count, and what is left, which is a formula, a name or words. */
export interface Query {
  readonly text: string;
  readonly numbers: readonly NumberClause[];
  readonly electrons: number | null;
  /** An ion that stands among other words, "Cr(III)"; one that stands alone is part of the text. */
  readonly ion: string | null;
}

/** A band typed without uncertainty is looked for so far to each side, cm-1. */
export const bandReach = 300;

const UNIT = '(?:cm-1|cm\\^-1|cm⁻¹|cm−1|/cm|1/cm|kK|nm|µm|μm|um|eV)';
const NUMBER = '\\d[\\d\u2009\u202f ]*(?:\\.\\d+)?';
const PARAMETER = new RegExp(`(?:^|[\\s,;])(Delta|Δ|10\\s?Dq|Dq|B|beta|β)\\s*(?:=|:|~|≈|about|near|is)?\\s*(?:(${NUMBER})\\s*(?:-|–|—|−|to|\\.\\.)\\s*(${NUMBER})|([<>≤≥]=?)\\s*(${NUMBER})|(${NUMBER}))\\s*(${UNIT})?(?=$|[\\s,;])`, 'g');
const BAND_RANGE = new RegExp(`(?:^|[\\s,;])(?:bands?\\s+)?(${NUMBER}\\s*(?:-|–|—|−|to)\\s*${NUMBER}\\s*${UNIT})(?=$|[\\s,;])`, 'g');
const BAND = new RegExp(`(?:^|[\\s,;])(?:bands?\\s+(?:at|near)?\\s*)?(${NUMBER}(?:\\([\\d.]+\\))?\\s*${UNIT})(?=$|[\\s,;])`, 'g');
const COUNT = /(?:^|[\s,;])d\s?\^?\{?(10|[0-9]|¹⁰|[⁰¹²³⁴-⁹])\}?(?=$|[\s,;])/;

/** Takes a search text apart. Never throws. */
export function readQuery(typed: string): Query {
  const numbers: NumberClause[] = [];
  let electrons: number | null = null;
  let text = typed.trim().slice(0, 200);
  text = text.replace(PARAMETER, (whole, name: string, low?: string, high?: string, sign?: string, limit?: string, about?: string, unit?: string) => {
    const clause = parameterClause(name, [low, high, sign, limit, about], unit ?? null);
    if (clause === null) return whole;
    numbers.push(clause);
    return ' ';
  });
  text = text.replace(BAND_RANGE, (whole, range: string) => {
    const parsed = parseRange(range);
    if (!parsed.ok) return whole;
    numbers.push({ kind: 'band', ...parsed.range, centre: null });
    return ' ';
  });
  text = text.replace(BAND, (whole, position: string) => {
    const parsed = parseQuantity(position, 'energy');
    if (!parsed.ok) return whole;
    const { position: centre, uPlus, uMinus } = toWavenumber(parsed.quantity);
    const reach = uPlus === null || uMinus === null ? bandReach : 2 * Math.max(uPlus, uMinus);
    numbers.push({ kind: 'band', low: centre - reach, high: centre + reach, centre });
    return ' ';
  });
  text = text.replace(COUNT, (_, digits: string) => {
    electrons = Number([...digits].map((sign) => { const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign); return raised < 0 ? sign : String(raised); }).join(''));
    return ' ';
  });
  text = text.replace(/\s+/g, ' ').replace(/^[\s,;]+|[\s,;]+$/g, '');
  const { ion, rest } = takeIon(text);
  return { text: rest, numbers, electrons, ion };
}

/** Takes an ion with its oxidation state out of several words. */
function takeIon(text: string): { readonly ion: string | null; readonly rest: string } {
  const words = text.split(' ');
  if (words.length < 2) return { ion: null, rest: text };
  for (const [place, word] of words.entries()) {
    const ion = /[+⁺]$|\(?[IVX]+\)?$/i.test(word) ? readIonLoosely(word) : null;
    if (ion !== null) return { ion: ion.name, rest: words.filter((_, other) => other !== place).join(' ') };
  }
  return { ion: null, rest: text };
}

/** Half-widths of a parameter given by one number: a twentieth of it. */
const PART = 0.05;

function parameterClause(name: string, [low, high, sign, limit, about]: readonly (string | undefined)[], unit: string | null): NumberClause | null {
  const kind = name === 'beta' || name === 'β' ? 'beta' : name === 'B' ? 'B' : 'Delta';
  const times = name === 'Dq' ? 10 : 1;
  const read = (text: string): number | null => {
    const bare = text.replace(/[\s\u2009\u202f]/g, '');
    if (kind === 'beta') return unit === null ? Number(bare) : null;
    const parsed = parseQuantity(`${bare} ${unit ?? 'cm-1'}`, 'energy');
    return parsed.ok ? times * toWavenumber(parsed.quantity).position : null;
  };
  if (low !== undefined && high !== undefined) {
    const ends = [read(low), read(high)];
    return ends.some((end) => end === null) ? null : { kind, low: Math.min(ends[0]!, ends[1]!), high: Math.max(ends[0]!, ends[1]!) };
  }
  const value = read(limit ?? about ?? '');
  if (value === null) return null;
  if (sign !== undefined) return sign.startsWith('>') || sign === '≥' ? { kind, low: value, high: Number.POSITIVE_INFINITY } : { kind, low: 0, high: value };
  return { kind, low: value * (1 - PART), high: value * (1 + PART) };
}
