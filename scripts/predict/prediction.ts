import { degeneratePair, levels, lowestLevel } from '#engine';
import type { Geometry, Level } from '#engine';

export interface PredictionOrder {
  readonly electrons: number;
  readonly geometry: Geometry;
  /** Multiplicity of the ground level; null: the lowest level at these parameters, whatever its spin. */
  readonly multiplicity: number | null;
  /** cm-1 */
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
}

/** One transition from the ground level. */
export interface PredictedTransition {
  /** Letter form; the coinciding pair of d5 under both names. */
  readonly label: string;
  readonly parent: string | null;
  /** cm-1 above the ground level. */
  readonly position: number;
  readonly spinAllowed: boolean;
  /** d(position)/d(parameter). */
  readonly gradient: { readonly delta: number; readonly racahB: number; readonly racahC: number };
}

export interface Prediction {
  /** Letter form. */
  readonly ground: string;
  readonly multiplicity: number;
  /** The lowest level at these parameters; another one than `ground` where the declared spin is not the lowest. */
  readonly lowest: string;
  /** Spin-allowed transitions first, each kind in order of energy. Levels below a declared ground level are left out. */
  readonly transitions: readonly PredictedTransition[];
}

/**
 * Band positions of an ion at given parameters: vertical transitions from the ground level in the cubic model.
 * Throws RangeError for electron numbers outside 1 to 9, negative parameters, and a multiplicity the ion has not.
 */
export function predict(order: PredictionOrder): Prediction {
  const { electrons, geometry, delta, racahB, racahC } = order;
  const all = levels({ electrons, geometry }, { delta, racahB, racahC });
  const lowest = all[0];
  if (lowest === undefined) throw new RangeError(`d${electrons} has no levels`);
  const ground = order.multiplicity === null
    ? lowest : named(all, lowestLevel(electrons, geometry, delta, racahB, racahC, order.multiplicity).label);
  const pair = degeneratePair(electrons, geometry);
  const transitions = all
    .filter((level) => level !== ground && level.energy >= ground.energy && level.label !== pair?.members[1])
    .map((level) => ({
      label: level.label === pair?.members[0] ? pair.label : level.label,
      parent: level.parent,
      position: level.energy - ground.energy,
      spinAllowed: level.multiplicity === ground.multiplicity,
      gradient: difference(level.gradient, ground.gradient),
    }));
  return {
    ground: ground.label,
    multiplicity: ground.multiplicity,
    lowest: lowest.label,
    transitions: [...transitions.filter(({ spinAllowed }) => spinAllowed), ...transitions.filter(({ spinAllowed }) => !spinAllowed)],
  };
}

function named(all: readonly Level[], label: string): Level {
  const level = all.find((one) => one.label === label);
  if (level === undefined) throw new RangeError(`label: there is no level "${label}"`);
  return level;
}

function difference(a: Level['gradient'], b: Level['gradient']): Level['gradient'] {
  return { delta: a.delta - b.delta, racahB: a.racahB - b.racahB, racahC: a.racahC - b.racahC };
}
