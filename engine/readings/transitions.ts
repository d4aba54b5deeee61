import { degeneratePair, groundLabel } from '../levels/labels.ts';
import type { Geometry } from '../ions/types.ts';
import type { FloorClass, Policy } from '../policy/types.ts';
import { levelTable } from './table.ts';
import type { FieldCase } from './table.ts';
import { levelPlace } from './table.ts';
import { levelNames } from '../levels/labels.ts';

/** What is known of a transition without knowing the parameters. */
export interface Transition {
  /** Letter form; the d5 pair under both names. */
  readonly label: string;
  readonly multiplicity: number;
  /** Same multiplicity as the ground level. */
  readonly spinAllowed: boolean;
  /** The excited level keeps the ground level's t2/e configuration: a narrow line. */
  readonly sameConfiguration: boolean;
  readonly floorClass: FloorClass;
}

/** Angle and C/B at which configurations are compared: Delta/B = 20, an ordinary field. */
const compareAt = Math.PI / 4;
const compareRatio = 4.5;

/**
 * Bands reached by two electrons, for which a cubic one-B model is known to miss by several hundred cm-1:
 * 4T1g(P) of octahedral d3 and A2g of octahedral d2 and d7.
 */
function isTwoElectron(ion: FieldCase, label: string): boolean {
  if (ion.geometry !== 'octahedral') return false;
  return (
    (ion.electrons === 3 && label === 'b4T1g') || (ion.electrons === 2 && label === 'a3A2g') || (ion.electrons === 7 && label === 'a4A2g')
  );
}

export interface GroundCase extends FieldCase {
  /** Declared multiplicity of the ground level. */
  readonly multiplicity: number;
}

interface Transitions {
  readonly ascending: readonly Transition[];
  readonly byLabel: ReadonlyMap<string, Transition>;
}

/** By geometry, number of electrons and multiplicity, so that no key has to be built on the hot path. */
const known: Record<Geometry, Transitions[][]> = { octahedral: [], tetrahedral: [] };

function held({ electrons, geometry, multiplicity }: GroundCase): Transitions {
  known[geometry][electrons] ??= [];
  const bySpin = known[geometry][electrons];
  if (!bySpin[multiplicity]) {
    const ascending = findTransitions({ electrons, geometry, multiplicity });
    bySpin[multiplicity] = { ascending, byLabel: new Map(ascending.map((transition) => [transition.label, transition])) };
  }
  return bySpin[multiplicity];
}

/** All transitions from the ground level of the declared multiplicity, ascending at Delta/B = 20. */
export const transitionsOf = (ion: GroundCase): readonly Transition[] => held(ion).ascending;

function findTransitions(ion: GroundCase): readonly Transition[] {
  const ground = groundLabel(ion.electrons, ion.geometry, ion.multiplicity);
  const pair = degeneratePair(ion.electrons, ion.geometry);
  const table = levelTable(ion, compareRatio);
  const groundSlope = ground ? table.exact([ground], compareAt)[0]!.gradient.delta : 0;
  return levelNames(ion.electrons, ion.geometry)
    .filter((label) => label !== ground && label !== pair?.members[1])
    .map((label) => {
      const level = table.exact([label], compareAt)[0]!;
      const spinAllowed = levelPlace(ion, label).block.multiplicity === ion.multiplicity;
      // n_e differs by the difference of the field derivatives (Hellmann-Feynman).
      const sameConfiguration = Math.abs(level.gradient.delta - groundSlope) < 0.5;
      const floorClass: FloorClass = isTwoElectron(ion, label) ? 'twoElectron' : !spinAllowed && sameConfiguration ? 'spinFlip' : 'general';
      const name = label === pair?.members[0] ? pair.label : label;
      return { transition: { label: name, multiplicity: levelPlace(ion, label).block.multiplicity, spinAllowed, sameConfiguration, floorClass }, energy: level.energy };
    })
    .sort((a, b) => a.energy - b.energy)
    .map((entry) => entry.transition);
}

export function transitionOf(ion: GroundCase, label: string): Transition {
  const found = held(ion).byLabel.get(label);
  if (!found) throw new RangeError(`label: "${label}" is no transition of d${ion.electrons} ${ion.geometry}`);
  return found;
}

/** The model's floor of a transition under a policy, cm-1. */
export function floorOf(ion: GroundCase, label: string, policy: Policy): number {
  return policy.floors[transitionOf(ion, label).floorClass];
}
