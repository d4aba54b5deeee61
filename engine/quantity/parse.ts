import { writeDecimal, decimalOf } from './decimal.ts';
import { diagnose } from './diagnose.ts';
import { expectation, faultOf, type Finding } from './findings.ts';
import { decimals, type Pieces, split } from './grammar.ts';
import { plainCharacters } from './spelling.ts';
import type { ParsedQuantity, Quantity, QuantityCode, QuantityFault, Unit, Wanted } from './types.ts';
import { unitMeant, unitOf, unitsFor } from './units.ts';

/** Values that a field may hold beside positive ones. Bare numbers and percentages may always be zero. */
export interface Allowance {
  readonly zero?: boolean;
  readonly negative?: boolean;
}

type Outcome = { readonly ok: true; readonly quantity: Omit<Quantity, 'typed'> } | { readonly ok: false; readonly finding: Finding };

const longest = 80;
const mostDigits = 15;

function no(code: QuantityCode, candidate: string | null, note: string, advice: string): Outcome {
  return { ok: false, finding: { code, candidate, note, advice } };
}

/** A unit for a bare number, by its size; only ever offered, never assumed. */
function unitOffered(value: number, wanted: Wanted): { unit: Unit; note: string } | null {
  if (wanted === 'temperature') return { unit: 'K', note: 'if it is in kelvin' };
  // 0.15 may be 15 % or 0.15 %: only the person knows.
  if (wanted === 'percent') return value < 1 ? null : { unit: '%', note: 'the sign % is needed' };
  if (value >= 2000) return { unit: 'cm-1', note: 'if it is a wavenumber' };
  if (value >= 100) return { unit: 'nm', note: 'if it is a wavelength; a wavenumber takes cm-1' };
  return value >= 10 ? { unit: 'kK', note: 'if it is in kilokayser, 1000 cm-1' } : { unit: 'eV', note: 'if it is in electronvolt' };
}

function units(pieces: Pieces, text: string, wanted: Wanted): Outcome | Unit {
  const allowed = unitsFor(wanted);
  const named = allowed.filter((unit) => unit !== '').join(', ');
  const list = named.length < allowed.join(', ').length ? `write the number alone, or in ${named}` : `use ${named}`;
  const withUnit = (unit: Unit) => {
    if (pieces.unit !== '') return text.replace(pieces.unit, unit);
    const end = pieces.k === null ? text.length : text.search(/[ ,;]*\(? ?k ?=/i);
    return `${text.slice(0, end)} ${unit}${text.slice(end)}`;
  };
  if (pieces.unitOfU !== '' && unitOf(pieces.unitOfU) !== unitOf(pieces.unit)) {
    return no('BAD_UNCERTAINTY', null, '', 'give the uncertainty in the unit of the number');
  }
  if (pieces.unit === '') {
    if (allowed.includes('')) return '';
    const offered = unitOffered(Number(pieces.number), wanted);
    return no('NO_UNIT', offered && withUnit(offered.unit), offered?.note ?? '', `write the unit: ${list}`);
  }
  const unit = unitOf(pieces.unit);
  if (unit !== null && allowed.includes(unit)) return unit;
  const bare = allowed.length === 1 && allowed[0] === '';
  const without = pieces.unitOfU === '' ? text.replace(pieces.unit, '').trim() : null;
  if (unit === null) {
    const likely = unitMeant(pieces.unit, wanted);
    if (bare) return no('UNKNOWN_UNIT', null, '', 'write the number alone');
    return no('UNKNOWN_UNIT', likely && withUnit(likely), `the unit is spelt ${likely}`, list);
  }
  if (bare) return no('WRONG_UNIT', without, 'no unit here', 'write the number alone');
  const likely = unitMeant(pieces.unit, wanted);
  return no('WRONG_UNIT', likely && withUnit(likely), `the unit is spelt ${likely}`, list);
}

function sign(pieces: Pieces, text: string, unit: Unit, wanted: Wanted, allow: Allowance): Outcome | number {
  const size = Number(pieces.number);
  const value = pieces.negative && size !== 0 ? -size : size;
  if (unit === '°C') {
    return value > -273.15 ? value : no('NEGATIVE', null, '', 'no temperature lies at or below -273.15 °C');
  }
  if (value < 0 && !allow.negative) {
    return no('NEGATIVE', text.replace(/^(\(?)- ?/, '$1'), 'no minus sign', 'write a number above 0');
  }
  const mayVanish = allow.zero || allow.negative || !['energy', 'temperature'].includes(wanted);
  if (value === 0 && !mayVanish) return no('ZERO', null, '', 'write a number above 0, or leave the field out where nothing was measured');
  return value;
}

function coverageFactor(pieces: Pieces): Outcome | number {
  if (pieces.k === null) return 1;
  if (pieces.plus === null) return no('BAD_COVERAGE', null, '', 'a coverage factor needs an uncertainty: 21550 ± 120 cm-1 (k = 2)');
  const k = /^\d+(\.\d+)?$/.test(pieces.k) ? Number(pieces.k) : Number.NaN;
  return k >= 1 && k <= 10 ? k : no('BAD_COVERAGE', null, '', 'write the coverage factor as a number from 1 to 10: (k = 2)');
}

function read(text: string, wanted: Wanted, allow: Allowance): Outcome {
  if (text === '') return no('EMPTY', null, '', 'write a number, or leave the field out where nothing was measured');
  if (text.length > longest) return no('TOO_LONG', null, '', `write the number with its unit, at most ${longest} characters`);
  const parts = split(text);
  if (!parts.ok) return { ok: false, finding: diagnose(parts, text) };
  const { pieces } = parts;
  if (pieces.number.replace('.', '').replace(/^0+/, '').length > mostDigits) {
    return no('TOO_LONG', null, '', `write at most ${mostDigits} digits`);
  }
  const unit = units(pieces, text, wanted);
  if (typeof unit !== 'string') return unit;
  const value = sign(pieces, text, unit, wanted, allow);
  if (typeof value !== 'number') return value;
  const k = coverageFactor(pieces);
  if (typeof k !== 'number') return k;
  if (pieces.plus === 0 || pieces.minus === 0) {
    const without = pieces.coverage === 'concise' ? text.replace(/ ?\([^()]*\)/, '') : null;
    return no('ZERO_UNCERTAINTY', without, 'an uncertainty of 0 is never right; leave out one that is not known', 'leave the uncertainty out where it is not known');
  }
  if (wanted === 'count' && (pieces.plus !== null || pieces.number.includes('.'))) {
    return no('NOT_A_COUNT', Number.isInteger(value) ? writeDecimal(decimalOf(value)) : null, 'a whole number', 'write a whole number');
  }
  const [uMinus, uPlus] = [pieces.minus === null ? null : pieces.minus / k, pieces.plus === null ? null : pieces.plus / k];
  const u = uMinus === null || uPlus === null ? null : Math.max(uMinus, uPlus);
  const halfDigit = Number(`5e-${decimals(pieces.number) + 1}`);
  return { ok: true, quantity: { value, u, uMinus, uPlus, unit, halfDigit, coverage: pieces.coverage } };
}

/** The first text, following the mended texts from one to the next, that is read without fault; null where none is. */
function settle(candidate: string | null, wanted: Wanted, allow: Allowance): string | null {
  let text = candidate;
  for (let step = 0; step < 4 && text !== null; step += 1) {
    const outcome = read(plainCharacters(text), wanted, allow);
    if (outcome.ok) return text;
    text = outcome.finding.candidate;
  }
  return null;
}

/**
 * Reads a number with unit and uncertainty as a person types it: `21550(60) cm-1`, `464.0(5) nm`, `21550(+60 -40) cm-1`,
 * `24 500 cm-1`, `21550 ± 60 cm-1`, `21550 ± 120 cm-1 (k = 2)`, `295 K`, `15 %`, `4.5(9)`. Digits in brackets without a point count in the last digits of the
 * number (GUM 7.2.2, example 2); with a point they stand as typed: 464.0(1.2) is 1.2. An uncertainty with a stated k is divided by it.
 * @returns the quantity in the unit typed, or a fault with a lasting code and the mended text; never throws.
 * Not checked: whether an energy lies in a sensible range.
 */
export function parseQuantity(text: string, wanted: Wanted, allow: Allowance = {}): ParsedQuantity | QuantityFault {
  const outcome = read(plainCharacters(text), wanted, allow);
  if (outcome.ok) return { ok: true, quantity: { ...outcome.quantity, typed: text.trim() } };
  return faultOf(outcome.finding, text, expectation(wanted), settle(outcome.finding.candidate, wanted, allow));
}
