// How an invented measurement was made, and the habits of the person who typed it.

import type { Measurement } from '#engine';

export interface Scan {
  /** As typed, "300 - 1100 nm". */
  readonly typed: string;
  /** cm-1. */
  readonly low: number;
  readonly high: number;
}

export interface Habits {
  readonly unit: 'cm-1' | 'nm' | 'eV';
  /** Broad bands in cm-1 are rounded to this. */
  readonly step: 10 | 50 | 100;
  readonly typesUncertainty: boolean;
  readonly typesEpsilon: boolean;
  readonly typesWidth: boolean;
  readonly typesTerms: boolean;
}

export interface Setting {
  readonly id: string;
  readonly phase: Measurement['phase'];
  readonly medium: string | null;
  readonly sample: string | null;
  readonly host: string | null;
  /** K; "room" as typed; null: not recorded. */
  readonly temperature: number | 'room' | null;
  readonly technique: Measurement['technique'];
  /** null: not recorded. */
  readonly scan: Scan | null;
  readonly habits: Habits;
}

/** Scans in nanometres, by what the instruments of the invented laboratory reach. */
export const scans = {
  visible: scanOf(350, 1000),
  usual: scanOf(300, 1100),
  ultraviolet: scanOf(220, 1100),
  wide: scanOf(250, 2500),
  red: scanOf(400, 2500),
} as const;

function scanOf(from: number, to: number): Scan {
  return { typed: `${from} - ${to} nm`, low: 1e7 / to, high: 1e7 / from };
}

/** True for a sample cooled to liquid nitrogen or below. */
export function isCold(setting: Pick<Setting, 'temperature'>): boolean {
  return typeof setting.temperature === 'number' && setting.temperature <= 120;
}
