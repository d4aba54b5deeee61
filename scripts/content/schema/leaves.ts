// The kinds of value that a field may hold: each is a text as typed, read into what it means.
// A leaf reports its own finding (code, expected, how to mend) through zod's custom issue.

import { z } from 'zod';
import { parseQuantity, parseRanges } from '#engine';
import type { Quantity, Range, Unit } from '#engine';
import type { FaultCode } from '../codes.ts';
import type { Finding } from '../report.ts';

/** Notes beside a field: for the manual, for editors, and whether an editor may show the value as a number or a truth value. */
declare module 'zod' {
  interface GlobalMeta {
    examples?: string[];
    bare?: 'number' | 'boolean';
  }
}

const longestText = 4000;

/** A leaf that is read by a function returning the value or a finding. */
export function leaf<T>(read: (text: string) => { readonly value: T } | Finding) {
  return z.string().transform((text, context): T => {
    const result = read(text);
    if ('value' in result) return result.value;
    context.addIssue({ code: 'custom', message: result.expected, params: { finding: result } });
    return z.NEVER;
  });
}

function finding(code: FaultCode, found: string, expected: string, mend: string): Finding {
  return { code, found, expected, mend };
}

/** Free text, spaces at the ends taken off. */
export const text = () =>
  leaf<string>((typed) => {
    const value = typed.trim();
    if (value.length > longestText) return finding('TEXT_TOO_LONG', `${value.length} characters`, `at most ${longestText} characters`, 'shorten the text, or keep it in a file of its own');
    if (/[\u0000-\u0008\u000b-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069]/.test(value)) return finding('CONTROL_CHARACTER', value, 'text without control characters and characters that turn the direction of writing', 'delete the invisible character, or type the text again');
    return { value };
  }).meta({ bare: 'number' });

/** One of a closed list of words. */
export const choice = <const T extends string>(names: readonly [T, ...T[]]) => z.enum(names);

/** A whole number, `least` or more. */
export const count = (least: number, most: number) =>
  leaf<number>((typed) => {
    const expected = `a whole number from ${least} to ${most}`;
    const parsed = parseQuantity(typed, 'count');
    if (!parsed.ok) return finding(parsed.code, parsed.found, expected, parsed.corrected === null ? 'write a whole number in digits' : parsed.mend);
    const { value } = parsed.quantity;
    return value >= least && value <= most ? { value } : finding('BAD_COUNT', typed, expected, 'check the number');
  }).meta({ bare: 'number' });

/** A charge as it is typed: 0, -2, 3, 2-, 3+. */
export const charge = () =>
  leaf<number>((typed) => {
    const found = /^(?:([-+−]?)(\d{1,2})|(\d{1,2})([-+−]))$/.exec(typed.trim());
    if (found === null) return finding('BAD_CHARGE', typed, 'a charge as a whole number with its sign, e.g. 0, -1 or -2', 'write the charge of one free ligand: 0 for water, -1 for chloride');
    const size = Number(found[2] ?? found[3]);
    const negative = /[-−]/.test(found[1] ?? found[4] ?? '');
    return { value: negative && size !== 0 ? -size : size };
  }).meta({ bare: 'number' });

export const flag = () =>
  leaf<boolean>((typed) => {
    if (typed === 'true') return { value: true };
    if (typed === 'false') return { value: false };
    return finding('UNKNOWN_CHOICE', typed, 'true or false', `write ${/^(y|yes|on|1)$/i.test(typed) ? 'true' : 'true or false'}`);
  }).meta({ bare: 'boolean' });

type WantedQuantity = Parameters<typeof parseQuantity>[1];

/** A quantity with its unit and uncertainty, as typed. `units` narrows the units of its kind. */
export function quantity(wanted: WantedQuantity, options: { readonly zero?: boolean; readonly units?: readonly Unit[] } = {}) {
  return leaf<Quantity>((typed) => {
    const parsed = parseQuantity(typed, wanted, { zero: options.zero ?? false });
    if (!parsed.ok) {
      if (options.units === undefined) return finding(parsed.code, parsed.found, parsed.expected, parsed.mend);
      return finding(parsed.code, parsed.found, energyDifference, parsed.code === 'NO_UNIT' ? unitAdvice(typed) : parsed.mend);
    }
    if (options.units !== undefined && !options.units.includes(parsed.quantity.unit)) {
      return finding('WRONG_UNIT', typed, energyDifference, 'convert the value: an energy difference cannot be given as a wavelength');
    }
    return { value: parsed.quantity };
  });
}

const energyDifference = 'an energy with its unit, e.g. 650 cm-1 or 0.65 kK';

/** A bare number for an energy difference: hundreds are cm-1, small numbers kK. */
function unitAdvice(typed: string): string {
  const bare = typed.trim();
  return Number.parseFloat(bare.replaceAll(' ', '')) >= 20 ? `write ${bare} cm-1 if it is a wavenumber` : `write ${bare} kK if it is in kilokayser, or the unit that it has`;
}

/** An energy that is no band position: a wavelength makes no sense for it. */
export const energy = (options: { readonly zero?: boolean } = {}) => quantity('energy', { ...options, units: ['cm-1', 'kK', 'eV', 'meV'] });

export const number = () => quantity('number').meta({ bare: 'number' });

/** A number with a unit of any kind, kept as text: "0.010 mol/L", "1 cm". */
export const withUnit = (example: string) =>
  leaf<string>((typed) => {
    const value = typed.trim();
    if (/^\d[\d.]*(\(\d+(\.\d+)?\))?\s*[A-Za-zµμ°/%]/.test(value) && value.length <= 60) return { value };
    const bare = /^[\d.]+$/.test(value);
    return finding(bare ? 'NO_UNIT' : 'NOT_A_NUMBER', typed, `a number with its unit, e.g. ${example}`, bare ? `write the unit behind the number, as in ${example}` : `write it as in ${example}`);
  }).meta({ examples: [example] });

export interface TypedRanges {
  readonly typed: string;
  readonly ranges: readonly Range[];
}

/** One or more ranges of energy or wavelength, separated by semicolons. */
export const ranges = () =>
  leaf<TypedRanges>((typed) => {
    const parsed = parseRanges(typed);
    if (!parsed.ok) {
      const single = parseQuantity(typed, 'energy');
      if (single.ok) return finding('BAD_RANGE', typed, parsed.expected, 'write two limits with a dash between them');
      return finding(parsed.code, parsed.found === '' ? typed : parsed.found, parsed.expected, parsed.mend);
    }
    return { value: { typed: typed.trim(), ranges: parsed.ranges } };
  });
