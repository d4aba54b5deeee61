import { type Decimal, decimalOf, leadingPlace, roundToPlace, writeDecimal } from './decimal.ts';

/** "text": for the clipboard and for files, digits unbroken. "page": thin spaces between groups of three from five digits on. */
export type PrintForm = 'text' | 'page';

const thinSpace = '\u2009';
const minus = '\u2212';

/** Sets thin spaces into the whole-number part of five or more digits and into as long a fraction. */
function group(digits: string): string {
  const [whole = '', fraction] = digits.split('.');
  const left = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  if (fraction === undefined) return left;
  const right = fraction.length < 5 ? fraction : fraction.replace(/(\d{3})(?=\d)/g, `$1${thinSpace}`);
  return `${left}.${right}`;
}

function dress(decimal: Decimal, form: PrintForm): string {
  const written = writeDecimal({ ...decimal, negative: false });
  return (decimal.negative ? minus : '') + (form === 'page' ? group(written) : written);
}

/**
 * The decimal place (exponent of ten) to which a standard uncertainty is rounded: two significant digits where the leading
 * digit is 1 or 2, else one. GUM (JCGM 100:2008) 7.2.6 asks for at most two; the choice between one and two by the leading digit is
 * common practice.
 * @throws RangeError where u is not a finite number above 0.
 */
export function uncertaintyPlace(u: number): number {
  if (!(Number.isFinite(u) && u > 0)) throw new RangeError(`u must be a finite number above 0, got ${u}`);
  const place = leadingPlace(u);
  return decimalOf(u).digits.charAt(0) <= '2' ? place - 1 : place;
}

/** The rounded uncertainty in the units that belong in the brackets: whole where the place is a whole number, else last digits. */
function bracket(u: number, place: number): string {
  const rounded = roundToPlace(u, place);
  return place >= 0 ? writeDecimal(rounded) : rounded.digits;
}

/** A number with its uncertainty in two pieces, for typesetting: value "21 550", uncertainty "(60)" ("" where there is none). */
export interface ConciseParts {
  readonly value: string;
  readonly uncertainty: string;
}

/**
 * The pieces of `concise`: same arguments, same rules.
 * @throws RangeError where value or u is not finite or u is negative.
 */
export function conciseParts(value: number, u: number | null, form: PrintForm = 'text'): ConciseParts {
  if (u === null || u === 0) return { value: significant(value, 6, form), uncertainty: '' };
  const place = uncertaintyPlace(u);
  return { value: dress(roundToPlace(value, place), form), uncertainty: `(${bracket(u, place)})` };
}

/**
 * A value with its standard uncertainty in concise notation, "21550(60)" or "464.0(5)": the number in brackets is u in the
 * last digits of the value (GUM 7.2.2, example 2). u is rounded by `uncertaintyPlace`, the value to the same place; a value that
 * rounds away is "0". With u null, or 0 for an exact number, the value alone with at most six significant digits.
 * @throws RangeError where value or u is not finite or u is negative.
 */
export function concise(value: number, u: number | null, form: PrintForm = 'text'): string {
  const parts = conciseParts(value, u, form);
  return parts.value + parts.uncertainty;
}

/**
 * As `concise`, with an uncertainty for each side, "21550(+60 −40)". The smaller side sets the place; two sides that print alike
 * are printed once.
 * @throws RangeError where an argument is not finite or a side is not above 0.
 */
export function conciseTwoSided(value: number, uMinus: number, uPlus: number, form: PrintForm = 'text'): string {
  const place = Math.min(uncertaintyPlace(uMinus), uncertaintyPlace(uPlus));
  const [down, up] = [bracket(uMinus, place), bracket(uPlus, place)];
  const shown = dress(roundToPlace(value, place), form);
  return down === up ? `${shown}(${up})` : `${shown}(+${up} ${minus}${down})`;
}

/**
 * A number with a fixed count of decimals; -1 rounds to tens, -2 to hundreds. Real minus sign; never "−0".
 * @throws RangeError where the value is not finite or decimals is not a whole number.
 */
export function plain(value: number, decimals: number, form: PrintForm = 'text'): string {
  if (!Number.isInteger(decimals)) throw new RangeError(`decimals must be a whole number, got ${decimals}`);
  return dress(roundToPlace(value, -decimals), form);
}

/**
 * A number with at most the given count of significant digits, zeros at the end of a fraction dropped.
 * @throws RangeError where the value is not finite or figures is not a whole number above 0.
 */
export function significant(value: number, figures: number, form: PrintForm = 'text'): string {
  if (!(Number.isInteger(figures) && figures > 0)) throw new RangeError(`figures must be a whole number above 0, got ${figures}`);
  const rounded = roundToPlace(value, leadingPlace(value) - figures + 1);
  const zeros = /0*$/.exec(rounded.digits)?.[0].length ?? 0;
  const drop = rounded.digits === '0' ? -rounded.exponent : Math.min(zeros, Math.max(0, -rounded.exponent));
  const digits = rounded.digits === '0' ? '0' : rounded.digits.slice(0, rounded.digits.length - drop);
  return dress({ ...rounded, digits, exponent: rounded.exponent + drop }, form);
}
