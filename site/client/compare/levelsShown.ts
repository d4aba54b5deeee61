import { type Geometry, levels } from '#engine';
import type { LevelColumn } from '../../charts/levelColumns.ts';
import { type Parts, termShown } from '../../data/typeset.ts';

/** What the levels of a reading are drawn from. Energies in cm-1. */
export interface SolvedReading {
  readonly electrons: number;
  readonly geometry: Geometry;
  readonly multiplicity: number;
  readonly ground: string;
  readonly solution: { readonly delta: number; readonly racahB: number; readonly racahC: number };
  readonly transitions: readonly { readonly label: string; readonly observed: number; readonly used: boolean }[];
}

/** More levels than this and only those of the ground level's multiplicity and the assigned ones are drawn. */
const MOST_LEVELS = 14;

/** The levels of one reading up to a little above `reach`, cm-1, with its observed bands. */
export function levelColumn(name: Parts, { electrons, geometry, multiplicity, ground, solution, transitions }: SolvedReading, reach: number): LevelColumn {
  const all = levels({ electrons, geometry }, solution);
  const origin = all.find(({ label }) => label === ground)?.energy ?? 0;
  const assigned = new Set(transitions.flatMap(({ label }) => label.split('/')));
  const inReach = all.map((level) => ({ ...level, energy: level.energy - origin })).filter(({ energy, label }) => energy >= 0 && (energy <= reach || assigned.has(label)));
  const few = inReach.length <= MOST_LEVELS ? inReach : inReach.filter((level) => level.multiplicity === multiplicity || assigned.has(level.label));
  return {
    name, levels: few.map((level) => ({ energy: level.energy, parts: termShown(level.label, electrons), spinAllowed: level.multiplicity === multiplicity })),
    bands: transitions.map(({ observed, used }) => ({ observed, used })),
  };
}

/** How far up the levels of several readings are drawn: a little above the highest observed band. */
export const commonReach = (readings: readonly Pick<SolvedReading, 'transitions'>[]): number => 1.15 * Math.max(10_000, ...readings.flatMap(({ transitions }) => transitions.map(({ observed }) => observed)));
