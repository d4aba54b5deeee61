// The metal ions of the generator, each in one geometry-free entry a spin state, with invented factors.

import { freeIon, parseIon } from '#engine';
import type { Ion } from '#engine';

/** High, low, or null where d count and geometry leave no choice. */
export type Spin = 'high' | 'low' | null;

export interface MetalEntry {
  /** Start of every record id, "cr", "co2". */
  readonly key: string;
  readonly ion: string;
  readonly spin: Spin;
  /** Invented g: octahedral Delta with six aqua ligands, cm-1. */
  readonly g: number;
  /** Invented k of B = B0 (1 - k h). */
  readonly k: number;
  /** Invented C/B, mean and standard deviation; null: 4.8 and 0.6. */
  readonly ratio: readonly [mean: number, deviation: number] | null;
  /** Shift of charge transfer from the ligand, cm-1, against Cr(III); negative for oxidising ions. */
  readonly acceptorShift: number;
  /** Foot of charge transfer to bipyridine-like ligands, cm-1. */
  readonly donorEdge: number;
}

/**
 * Invented: near the printed g and k (C. K. Jorgensen, Modern Aspects of Ligand Field Theory, 1971) and on purpose not equal
 * to them; where nothing is printed, a plausible number. k of Fe(III) departs from the print on purpose. High-spin and low-spin states of an ion have entries of their own.
 */
export const metalEntries: readonly MetalEntry[] = [
  { key: 'ti', ion: 'Ti(III)', spin: null, g: 20100, k: 0.2, ratio: null, acceptorShift: 3000, donorEdge: 15000 },
  { key: 'v4', ion: 'V(IV)', spin: null, g: 25800, k: 0.3, ratio: null, acceptorShift: -2500, donorEdge: 30000 },
  { key: 'v3', ion: 'V(III)', spin: null, g: 18700, k: 0.26, ratio: null, acceptorShift: 1000, donorEdge: 24000 },
  { key: 'v2', ion: 'V(II)', spin: null, g: 12500, k: 0.085, ratio: null, acceptorShift: 6000, donorEdge: 14500 },
  { key: 'cr', ion: 'Cr(III)', spin: null, g: 17550, k: 0.2, ratio: [4.75, 0.25], acceptorShift: 0, donorEdge: 25500 },
  { key: 'mn4', ion: 'Mn(IV)', spin: null, g: 23100, k: 0.46, ratio: null, acceptorShift: -6000, donorEdge: 30000 },
  { key: 'mo3', ion: 'Mo(III)', spin: null, g: 23800, k: 0.16, ratio: null, acceptorShift: 3000, donorEdge: 17000 },
  { key: 'cr2', ion: 'Cr(II)', spin: 'high', g: 13900, k: 0.1, ratio: null, acceptorShift: 6000, donorEdge: 15500 },
  { key: 'mn3', ion: 'Mn(III)', spin: 'high', g: 19300, k: 0.13, ratio: null, acceptorShift: -6500, donorEdge: 30000 },
  { key: 'mn2', ion: 'Mn(II)', spin: 'high', g: 8350, k: 0.075, ratio: [4.35, 0.2], acceptorShift: 8000, donorEdge: 26000 },
  { key: 'fe3', ion: 'Fe(III)', spin: 'high', g: 13900, k: 0.13, ratio: [3.6, 0.2], acceptorShift: -9500, donorEdge: 30000 },
  { key: 'fe2', ion: 'Fe(II)', spin: 'high', g: 9150, k: 0.085, ratio: null, acceptorShift: 5000, donorEdge: 16500 },
  { key: 'fe2', ion: 'Fe(II)', spin: 'low', g: 19500, k: 0.25, ratio: null, acceptorShift: -3000, donorEdge: 16500 },
  { key: 'co3', ion: 'Co(III)', spin: 'low', g: 18500, k: 0.33, ratio: null, acceptorShift: -4500, donorEdge: 28500 },
  { key: 'co3', ion: 'Co(III)', spin: 'high', g: 14600, k: 0.3, ratio: null, acceptorShift: -4500, donorEdge: 28500 },
  { key: 'rh', ion: 'Rh(III)', spin: 'low', g: 26500, k: 0.29, ratio: null, acceptorShift: 3000, donorEdge: 29500 },
  { key: 'ru', ion: 'Ru(II)', spin: 'low', g: 20600, k: 0.2, ratio: null, acceptorShift: 5000, donorEdge: 19000 },
  { key: 'co2', ion: 'Co(II)', spin: 'high', g: 9250, k: 0.095, ratio: null, acceptorShift: 4000, donorEdge: 22000 },
  { key: 'ni', ion: 'Ni(II)', spin: null, g: 8550, k: 0.112, ratio: null, acceptorShift: 4000, donorEdge: 26500 },
  { key: 'cu', ion: 'Cu(II)', spin: null, g: 12500, k: 0.1, ratio: null, acceptorShift: -3500, donorEdge: 25500 },
];

/** Delta of a tetrahedral complex over that of the octahedral one: 4/9 by the rule, here a little above it. */
export const tetrahedralShare = 0.452;

/** The entry of an ion in a spin state. Throws RangeError where there is none. */
export function metalEntry(ion: string, spin: Spin): MetalEntry {
  const found = metalEntries.find((entry) => entry.ion === ion && entry.spin === spin);
  if (!found) throw new RangeError(`metalEntry: no entry for ${ion}${spin ? `, ${spin} spin` : ''}`);
  return found;
}

/** The ion by its name. Throws RangeError for a name that is none. */
export function ionNamed(name: string): Ion {
  const parsed = parseIon(name);
  if (parsed.ion === null) throw new RangeError(`ionNamed: ${name}: ${parsed.reason}`);
  return parsed.ion;
}

/** B0 of the published set, cm-1; a plausible number where the set has no row (d1 ions, whose bands do not hang on B). */
export function freeIonB(ion: string): number {
  return freeIon('published', { name: ion })?.racahB0 ?? 720;
}
