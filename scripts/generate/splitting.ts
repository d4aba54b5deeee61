// Bands that a lower symmetry or the Jahn-Teller effect takes apart.

import { ligandEntry } from './ligands.ts';
import { ionNamed, metalEntry } from './metalIons.ts';
import type { Random } from './random.ts';
import type { Recipe } from './recipes.ts';
import type { Transition, Truth } from './truth.ts';

export interface Component {
  /** cm-1 from the barycentre; degeneracy times offset sums to zero. */
  readonly offset: number;
  readonly degeneracy: number;
}

/** Components nearer than this run into one maximum. */
const resolved = 1900;

/**
 * Components of a broad band: none (one maximum), two, or "envelope" (wide and shapeless).
 *
 * trans-MA4B2 of d3 and low-spin d6: the lowest T band splits into one state at Delta of MA6 and two at the mean of MA6 and MB6,
 * whose barycentre is that of the rule of average environment. Jahn-Teller ions: d1 and high-spin d6 two states of the E level,
 * d9 and high-spin d4 an envelope, d9 at times two components.
 */
export function componentsOf(transition: Transition, recipe: Recipe, truth: Truth, random: Random): readonly Component[] | 'envelope' {
  if (recipe.geometry !== 'octahedral' || !transition.spinAllowed) return [];
  const { electrons } = ionNamed(recipe.ion);
  if (electrons === 1) return evenPair(random.between(2100, 3000));
  if (electrons === 6 && recipe.spin === 'high') return random.chance(0.7) ? evenPair(random.between(1900, 2600)) : [];
  if (electrons === 4 && recipe.spin === 'high') return 'envelope';
  if (electrons === 9) return random.chance(0.6) ? 'envelope' : onePlusTwo(-random.between(2400, 3600));
  const lowest = truth.transitions.find((one) => one.spinAllowed);
  if (recipe.isomer !== 'trans' || transition !== lowest || !(electrons === 3 || (electrons === 6 && recipe.spin === 'low'))) return [];
  const separation = tetragonalSeparation(recipe);
  return Math.abs(separation) < resolved ? [] : onePlusTwo(separation);
}

function evenPair(separation: number): readonly Component[] {
  return [{ offset: -separation / 2, degeneracy: 1 }, { offset: separation / 2, degeneracy: 1 }];
}

/** One state `separation` above two (below, where negative). */
function onePlusTwo(separation: number): readonly Component[] {
  const pair = [{ offset: -separation / 3, degeneracy: 2 }, { offset: (2 * separation) / 3, degeneracy: 1 }];
  return pair.sort((a, b) => a.offset - b.offset);
}

/** Half of Delta(MA6) - Delta(MB6) for trans-MA4B2, four donor atoms of A in the plane. */
function tetragonalSeparation(recipe: Recipe): number {
  const atoms = recipe.ligands.map(([id, count]) => ({ f: ligandEntry(id).f, atoms: count * ligandEntry(id).donors.length }));
  const plane = atoms.find((one) => one.atoms === 4);
  const axis = atoms.find((one) => one.atoms === 2);
  return plane && axis ? (metalEntry(recipe.ion, recipe.spin).g * (plane.f - axis.f)) / 2 : 0;
}
