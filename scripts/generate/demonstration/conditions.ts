// Conditions and people of the demonstration. Everybody and everything here is invented.

import { scans } from '../settings.ts';
import type { Habits, Scan, Setting } from '../settings.ts';

export interface Person {
  readonly name: string;
  readonly initials: string;
  /** First and last year at the bench. */
  readonly from: number;
  readonly to: number;
  readonly habits: Habits;
}

/** Invented people with their ways of typing. */
export const people = {
  TL: person('Thale Lindqvar', 'TL', 2006, 2013, { unit: 'cm-1', step: 10, typesUncertainty: true, typesEpsilon: true, typesWidth: true, typesTerms: true }),
  OM: person('Odo Marrenfeld', 'OM', 2008, 2016, { unit: 'nm', step: 10, typesUncertainty: true, typesEpsilon: true, typesWidth: true, typesTerms: true }),
  SQ: person('Sunniva Quarle', 'SQ', 2012, 2020, { unit: 'cm-1', step: 50, typesUncertainty: false, typesEpsilon: true, typesWidth: false, typesTerms: true }),
  EV: person('Emrik Vossander', 'EV', 2018, 2026, { unit: 'eV', step: 10, typesUncertainty: true, typesEpsilon: true, typesWidth: true, typesTerms: true }),
  BR: person('Brannoc Rhuvane', 'BR', 2015, 2026, { unit: 'cm-1', step: 100, typesUncertainty: false, typesEpsilon: true, typesWidth: true, typesTerms: false }),
} as const;

export type Initials = keyof typeof people;

function person(name: string, initials: string, from: number, to: number, habits: Habits): Person {
  return { name, initials, from, to, habits };
}

/** A measurement to be made: conditions without the sample, and who made it. */
export interface Planned {
  readonly conditions: Omit<Setting, 'sample' | 'habits'>;
  readonly by: Initials;
}

export interface Extra {
  /** Id of the measurement where a second one of the kind needs its own. */
  readonly id?: string;
}

function planned(id: string, by: Initials, rest: Partial<Planned['conditions']>, extra: Extra): Planned {
  const plain = { phase: 'solution', medium: null, host: null, temperature: 295, technique: 'absorption', scan: scans.usual } as const;
  return { conditions: { ...plain, ...rest, id: extra.id ?? id }, by };
}

/** A solution at 295 K. */
export function solution(by: Initials, medium: string, scan: Scan | null = scans.usual, extra: Extra = {}): Planned {
  return planned(medium.includes('water') || medium.includes('acid') ? 'aq-295' : 'solution-295', by, { medium, scan }, extra);
}

/** A crystal at 295 K or as cold as given. */
export function crystal(by: Initials, temperature: number, scan: Scan | null = scans.wide, extra: Extra = {}): Planned {
  return planned(`crystal-${temperature}`, by, { phase: 'crystal', temperature, scan }, extra);
}

/** A crystal of another compound that holds a little of the complex. */
export function doped(by: Initials, host: string, temperature: number, scan: Scan | null = scans.wide, extra: Extra = {}): Planned {
  return planned(`doped-${temperature}`, by, { phase: 'crystal', host, temperature, scan }, extra);
}

/** A powder in diffuse reflectance at room temperature. */
export function powder(by: Initials, scan: Scan | null = scans.wide, extra: Extra = {}): Planned {
  return planned('powder-room', by, { phase: 'solid', temperature: 'room', technique: 'diffuse reflectance', scan }, extra);
}

/** A frozen glass. */
export function glass(by: Initials, medium: string, temperature: number, extra: Extra = {}): Planned {
  return planned(`glass-${temperature}`, by, { phase: 'glass', medium, temperature }, extra);
}
