/** Printable characters that stand in JSON as they are. */
const ALPHABET = [...Array(92).keys()].map((place) => String.fromCharCode(35 + place)).filter((sign) => sign !== '\\').slice(0, 90).join('');
const BASE = ALPHABET.length;

/**
 * A column of whole numbers as text: one string for each digit to the base 90, the lowest first. Digits of one kind side by side
 * compress better than numbers do, so a column of ten thousand small numbers takes little more than its information.
 * @throws RangeError where a number is not whole or is below 0; `signedDigits` takes those
 */
export function digits(numbers: readonly number[]): readonly string[] {
  const columns: string[] = [];
  let left = numbers;
  while (left.some((value) => value > 0) || columns.length === 0) {
    columns.push(left.map((value) => {
      if (!Number.isInteger(value) || value < 0) throw new RangeError(`a column holds whole numbers from 0 on, found ${value}`);
      return ALPHABET[value % BASE]!;
    }).join(''));
    left = left.map((value) => Math.floor(value / BASE));
  }
  return columns;
}

export function ofDigits(columns: readonly string[]): readonly number[] {
  const value = new Map([...ALPHABET].map((sign, place) => [sign, place]));
  return Array.from({ length: columns[0]?.length ?? 0 }, (_, row) => columns.reduceRight((sum, column) => sum * BASE + value.get(column[row]!)!, 0));
}

/** Numbers of either sign: 0, -1, 1, -2, 2 ... as 0, 1, 2, 3, 4. */
export const signedDigits = (numbers: readonly number[]): readonly string[] => digits(numbers.map((value) => value < 0 ? -2 * value - 1 : 2 * value));
export const ofSignedDigits = (columns: readonly string[]): readonly number[] => ofDigits(columns).map((value) => value % 2 === 1 ? -(value + 1) / 2 : value / 2);
