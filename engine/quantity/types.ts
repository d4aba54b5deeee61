/** The units a person may type, in their printed spelling. "" is a bare number. */
export type Unit =
  | 'cm-1' | 'kK' | 'nm' | 'µm' | 'eV' | 'meV' | 'K' | '°C' | '%' | 'L mol-1 cm-1' | '';

/**
 * What a field asks for. "count" is a whole number without unit; "number" a bare number, with or without uncertainty;
 * "absorption-coefficient" a bare number or one in L mol-1 cm-1.
 */
export type Wanted = 'energy' | 'temperature' | 'percent' | 'number' | 'absorption-coefficient' | 'count';

/**
 * How the uncertainty was typed: "none"; "concise" 21550(60); "plus-minus" 21550 ± 60, coverage not stated and taken as
 * one standard uncertainty; "k" with a stated coverage factor, divided by it.
 */
export type Coverage = 'none' | 'concise' | 'plus-minus' | 'k';

/** A number as typed, in the unit typed. Every u is one standard uncertainty in that unit. */
export interface Quantity {
  readonly value: number;
  /** null: none was typed. Where two sides were typed, the larger. */
  readonly u: number | null;
  /** u towards smaller values in the unit typed; null exactly where u is null. */
  readonly uMinus: number | null;
  /** u towards larger values in the unit typed; null exactly where u is null. */
  readonly uPlus: number | null;
  readonly unit: Unit;
  /** Half of the last typed digit. */
  readonly halfDigit: number;
  readonly coverage: Coverage;
  /** The text as typed, without spaces around it. */
  readonly typed: string;
}

/** The closed set of reasons for which a typed quantity is refused. The codes last. */
export type QuantityCode =
  | 'EMPTY' | 'TOO_LONG' | 'NOT_A_NUMBER' | 'NOT_FINITE' | 'EXPONENT' | 'THOUSANDS_COMMA' | 'DECIMAL_COMMA'
  | 'NEGATIVE' | 'ZERO' | 'NO_UNIT' | 'UNKNOWN_UNIT' | 'WRONG_UNIT' | 'BAD_UNCERTAINTY' | 'ZERO_UNCERTAINTY' | 'UNCERTAINTY_SIGN'
  | 'BAD_COVERAGE' | 'NOT_A_COUNT' | 'BAD_RANGE';

/** Why a typed quantity was refused, in the words of a fault report. */
export interface QuantityFault {
  readonly ok: false;
  readonly code: QuantityCode;
  /** What was typed, cut to 60 characters. */
  readonly found: string;
  readonly expected: string;
  /** What to do, one clause, "write 24500 cm-1 (no thousands comma)". */
  readonly mend: string;
  /** The whole text as it should be typed, or null where only the person can know it. */
  readonly corrected: string | null;
}

export interface ParsedQuantity {
  readonly ok: true;
  readonly quantity: Quantity;
}
