/** One level of a term: its J (whole or half) and energy in cm-1. */
export interface FineLevel {
  readonly j: number;
  readonly energy: number;
}

/**
 * The J-weighted barycentre of a term's levels: sum (2J + 1) E / sum (2J + 1), in cm-1.
 * To first order in spin-orbit coupling this is the energy of the term without it.
 * Throws RangeError for an empty list and for a J that is negative or not a multiple of one half.
 * Source: Condon & Shortley, The Theory of Atomic Spectra, chapter 7.
 */
export function barycentre(levels: readonly FineLevel[]): number {
  if (levels.length === 0) throw new RangeError('barycentre: no levels given');
  let states = 0;
  let sum = 0;
  for (const { j, energy } of levels) {
    if (!(j >= 0) || !Number.isInteger(2 * j)) throw new RangeError(`barycentre: J ${j} is not a multiple of one half from 0 up`);
    states += 2 * j + 1;
    sum += (2 * j + 1) * energy;
  }
  return sum / states;
}
