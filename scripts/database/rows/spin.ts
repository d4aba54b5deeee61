const words = ['singlet', 'doublet', 'triplet', 'quartet', 'quintet', 'sextet'] as const;

/** A multiplicity 2S+1 as the trade says it, "quartet" for 4; null stays null. Throws RangeError outside 1 to 6. */
export function spinWord(multiplicity: number | null): string | null {
  if (multiplicity === null) return null;
  const word = words[multiplicity - 1];
  if (word === undefined) throw new RangeError(`multiplicity ${multiplicity}: expected a whole number from 1 to 6`);
  return word;
}
