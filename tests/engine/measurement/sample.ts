import { parseIon } from '#engine';
import type { Band, Ion, Measurement } from '#engine';

/** An ion by its name; throws for a name that is none. */
export function ionNamed(name: string): Ion {
  const { ion } = parseIon(name);
  if (ion === null) throw new Error(`no ion "${name}"`);
  return ion;
}

/** A maximum at a position, whole wavenumbers, all else not recorded; any field may be given. */
export function band(position: number, given: Partial<Band> = {}): Band {
  return {
    position, uMinus: null, uPlus: null, halfDigit: 0.5, coverageNotStated: false, kind: 'maximum', side: null, width: null, epsilon: null, strength: null,
    degeneracy: null, deconvoluted: false, role: 'transition', terms: [], leftOut: null, ...given,
  };
}

/** A band with a typed term and a typed u, symmetric or [towards lower, towards higher]. */
export function termBand(position: number, term: string, u: number | readonly [number, number] = 100, given: Partial<Band> = {}): Band {
  const [uMinus, uPlus] = typeof u === 'number' ? [u, u] : u;
  return band(position, { uMinus, uPlus, terms: [term], ...given });
}

/** A measurement of an octahedral complex in solution, all else not recorded; any field may be given. */
export function measurement(ion: string, bands: readonly Band[], given: Partial<Omit<Measurement, 'ion' | 'bands'>> = {}): Measurement {
  return {
    ion: ionNamed(ion), geometry: 'octahedral', geometryName: given.geometry ?? 'octahedral', multiplicity: null, phase: 'solution', medium: null, temperature: null,
    technique: 'absorption', bands, absent: [], scanned: [], innocenceDoubtful: false, nuclearity: 1, donors: null, ...given,
  };
}
