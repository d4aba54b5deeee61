const numerals = ['0', 'I', 'II', 'III', 'IV', 'V', 'VI', 'VII', 'VIII', 'IX', 'X', 'XI', 'XII'] as const;

/**
 * An oxidation state as a Roman numeral after IUPAC: 0 is "0", -1 is "-I".
 * Source: IUPAC, Nomenclature of Inorganic Chemistry (2005), IR-5.4.2.2.
 * Throws RangeError outside -12 to 12 and for a number that is not whole.
 */
export function romanNumeral(oxidation: number): string {
  const numeral = numerals[Math.abs(oxidation)];
  if (numeral === undefined) throw new RangeError(`romanNumeral: oxidation ${oxidation} is not a whole number from -12 to 12`);
  return oxidation < 0 ? `-${numeral}` : numeral;
}

/** The oxidation state of a Roman numeral in capitals ("III", "0", "-I"; a real minus sign is taken too), or null. */
export function readRomanNumeral(text: string): number | null {
  const negative = /^[-\u2212]/.test(text);
  const size = (numerals as readonly string[]).indexOf(negative ? text.slice(1) : text);
  if (size < 0 || (negative && size === 0)) return null;
  return negative ? -size : size;
}

/** The name by which records, pages and the database know an ion: "Cr(III)". */
export function ionName(metal: string, oxidation: number): string {
  return `${metal}(${romanNumeral(oxidation)})`;
}
