import type { Finding } from './findings.ts';
import { type Split, numberPattern } from './grammar.ts';
import { writeDecimal, decimalOf } from './decimal.ts';

const number = numberPattern;
const exponent = /^([+-]?(?:\d+\.?\d*|\.\d+)) ?(?:[eE] ?([+-]?\d{1,3})(?!\d)|[x×*·] ?10 ?\^? ?[({]?([+-]?[1-9]\d?)(?!\d)[)}]?)(.*)$/;
const separated = /\d+(?:[.,'’_ ]\d+)*/g;

/** Takes commas, apostrophes and underscores out of one number; null where it holds none of them. */
function uncomma(typed: string, unit: string): { text: string; decimal: boolean } | null {
  if (!/[,'’_]/.test(typed)) return null;
  const compact = typed.replace(/[ '’_]/g, '');
  const commas = compact.split(',').length - 1;
  if (commas === 0) return { text: compact, decimal: false };
  const [left = '', right = ''] = compact.split(',');
  if (commas > 1) return { text: compact.replace(/,/g, ''), decimal: false };
  if (left.includes('.')) return { text: `${left.replace(/\./g, '')}.${right}`, decimal: true };
  const wholeGroups = /^[1-9]\d{0,2}$/.test(left) && /^\d{3}(\.\d+)?$/.test(right);
  // 24,500 cm-1 and 1,100 nm are thousands; 464,500 nm and 2,670 eV can only be decimals.
  const decimal = !wholeGroups || /^(eV|kK|µm|um|%)/.test(unit) || (unit.startsWith('nm') && Number(left) > 9);
  return decimal ? { text: compact.replace(',', '.'), decimal: true } : { text: compact.replace(',', ''), decimal: false };
}

function commas(text: string): Finding | null {
  const unit = /[^\d.,'’_ ()±+-].*$/.exec(text.replace(/[(±].*?[)]?/, ''))?.[0] ?? '';
  let decimal: boolean | null = null;
  const candidate = text.replace(separated, (typed) => {
    const mended = uncomma(typed, unit);
    decimal ??= mended?.decimal ?? null;
    return mended?.text ?? typed;
  });
  if (decimal === null) return null;
  return decimal
    ? { code: 'DECIMAL_COMMA', candidate, note: 'a point, not a comma, before the decimals', advice: 'write a point, not a comma, before the decimals' }
    : { code: 'THOUSANDS_COMMA', candidate, note: 'no thousands comma', advice: 'write the number without commas' };
}

function power(text: string): Finding | null {
  const match = exponent.exec(text);
  if (!match) return null;
  const value = Number(`${match[1]}e${match[2] ?? match[3]}`);
  const size = Math.abs(value);
  const candidate = size >= 1e-6 && size < 1e12 ? writeDecimal(decimalOf(value)) + (match[4] ?? '') : null;
  return { code: 'EXPONENT', candidate, note: 'no exponent', advice: 'write the number in full, without an exponent' };
}

function notNumber(candidate: string | null, note: string, advice: string): Finding {
  return { code: 'NOT_A_NUMBER', candidate, note, advice };
}

function badNumber(text: string): Finding {
  if (/^[+-]? ?(nan|inf(inity)?|∞)(?![a-z])/i.test(text)) {
    return { code: 'NOT_FINITE', candidate: null, note: '', advice: 'write a number, or leave the field out where nothing was measured' };
  }
  if (/^(~|≈|∼|≃|c\.|ca\b\.?|about\b|approx)/i.test(text)) {
    return notNumber(null, '', 'write the number alone and say how sure it is in brackets, e.g. 21500(300) cm-1');
  }
  if (/^[<>≤≥]/.test(text)) return notNumber(null, '', 'a limit is not a value: leave the field out and put the limit into notes');
  if (/^\+ ?[\d.]/.test(text)) return notNumber(text.slice(1).trim(), 'no plus sign', 'write the number without a plus sign');
  const found = power(text) ?? commas(text);
  if (found) return found;
  if (/^-? ?\.\d/.test(text)) return notNumber(text.replace('.', '0.'), 'a digit before the point', 'write a digit before the point');
  if (/^-? ?\d[\d ]*\.(?!\d)/.test(text)) return notNumber(text.replace('.', ''), 'no point without decimals', 'write no point without decimals');
  if (new RegExp(`^${number} ?(-|to) ?\\d`).test(text)) {
    return notNumber(null, '', 'one number belongs here: write it with its uncertainty in brackets, e.g. 21500(300) cm-1');
  }
  const spaced = /^(-? ?\d+(?: \d+)+)(?![\d.]*[/])/.exec(text)?.[1];
  if (spaced) {
    const joined = spaced.replace(/ /g, '') + text.slice(spaced.length);
    return notNumber(joined, 'spaces only between groups of three digits', 'write the number without spaces');
  }
  return notNumber(null, '', /\d/.test(text) ? 'begin with the number, then the unit' : 'write a number');
}

function badUncertainty(candidate: string | null, note: string, advice: string): Finding {
  return { code: 'BAD_UNCERTAINTY', candidate, note, advice };
}

/** One or two numbers in the brackets of an uncertainty, with the signs in front of them. */
const signedSides = new RegExp(`\\( ?([+-]*) ?${number} ?(?:[/,;]? ?([+-]*) ?${number} ?)?\\)`);

/** An uncertainty with signs that are not one plus and one minus. */
function wrongSigns(text: string): Finding | null {
  const [, first = '', second = ''] = signedSides.exec(text) ?? [];
  if (first === '' && second === '') return null;
  return {
    code: 'UNCERTAINTY_SIGN', candidate: null, note: '',
    advice: 'give the side towards higher values with plus and the other with minus, both as sizes: 21550(+60 -40) cm-1',
  };
}

/** Says what is wrong with a text, in plain characters, that the grammar could not split. */
export function diagnose(split: Split & { readonly ok: false }, text: string): Finding {
  if (split.at === 'number') return badNumber(text);
  const separators = commas(text);
  if (separators) return separators;
  const advice = 'write the standard uncertainty in brackets, in the last digits: 21550(60) cm-1 or 464.0(5) nm';
  const signed = /\( ?± ?([^()]*)\)/.exec(text);
  if (signed) return badUncertainty(text.replace(signed[0], `(${signed[1]?.trim()})`), 'digits only in the brackets', advice);
  const signs = wrongSigns(text);
  if (signs) return signs;
  if (split.at === 'brackets' && !split.body.includes(')')) return badUncertainty(null, '', 'close the brackets: 21550(60) cm-1');
  return badUncertainty(null, '', advice);
}
