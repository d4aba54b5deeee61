/** A decimal number as digits: (-1)^negative x digits x 10^exponent, `digits` a whole number without leading zeros ("0" for zero). */
export interface Decimal {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
}

/**
 * The shortest decimal that reads back as the given number.
 * @throws RangeError where the number is not finite.
 */
export function decimalOf(value: number): Decimal {
  if (!Number.isFinite(value)) throw new RangeError(`value must be a finite number, got ${value}`);
  const [mantissa = '0', power = '0'] = Math.abs(value).toExponential().split('e');
  const [whole = '0', fraction = ''] = mantissa.split('.');
  return { negative: value < 0, digits: whole + fraction, exponent: Number(power) - fraction.length };
}

/** Exponent of the leading digit: 4 for 21550, -1 for 0.5, 0 for zero. */
export function leadingPlace(value: number): number {
  const decimal = decimalOf(value);
  return decimal.exponent + decimal.digits.length - 1;
}

/**
 * Rounds a number to a multiple of 10^place, halves away from zero (ISO 80000-1:2009, annex B, rule B). The rounding works on the
 * decimal digits, so that 2.675 to two places is 2.68 although its binary value lies below.
 */
export function roundToPlace(value: number, place: number): Decimal {
  const { negative, digits, exponent } = decimalOf(value);
  if (place <= exponent) {
    const padded = digits === '0' ? '0' : digits + '0'.repeat(exponent - place);
    return { negative: negative && padded !== '0', digits: padded, exponent: place };
  }
  const dropped = place - exponent;
  const kept = dropped >= digits.length ? '0' : digits.slice(0, digits.length - dropped);
  const next = dropped > digits.length ? '0' : digits.charAt(digits.length - dropped);
  const rounded = (BigInt(kept) + (next >= '5' ? 1n : 0n)).toString();
  return { negative: negative && rounded !== '0', digits: rounded, exponent: place };
}

/** A decimal written out in full, "-0.050", without exponent notation. */
export function writeDecimal(decimal: Decimal): string {
  const { negative, digits, exponent } = decimal;
  const sign = negative ? '-' : '';
  if (exponent >= 0) return sign + (digits === '0' ? '0' : digits + '0'.repeat(exponent));
  const padded = digits.padStart(1 - exponent, '0');
  const point = padded.length + exponent;
  return `${sign}${padded.slice(0, point)}.${padded.slice(point)}`;
}
