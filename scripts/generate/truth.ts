// The true spectrum of an invented complex: parameters, exact levels, and the model's own error in each transition.

import { groundLabel, levels } from '#engine';
import type { Level } from '#engine';
import { ligandEntry } from './ligands.ts';
import { freeIonB, ionNamed, metalEntry, tetrahedralShare } from './metalIons.ts';
import { randomFrom } from './random.ts';
import type { Random } from './random.ts';
import type { Recipe } from './recipes.ts';

export interface Transition {
  /** Letter form, "b4T1g". */
  readonly label: string;
  /** Where the band lies, cm-1: exact level plus the model's error. */
  readonly position: number;
  readonly spinAllowed: boolean;
  /** Same configuration as the ground level: a narrow line. */
  readonly narrow: boolean;
  readonly twoElectron: boolean;
}

export interface Truth {
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
  readonly transitions: readonly Transition[];
}

/** Average over the donor atoms (the rule of average environment) of a ligand's factor. */
export function averageFactor(recipe: Recipe, factor: 'f' | 'h'): number {
  let sum = 0;
  let atoms = 0;
  for (const [id, count] of recipe.ligands) {
    const ligand = ligandEntry(id);
    sum += count * ligand.donors.length * ligand[factor];
    atoms += count * ligand.donors.length;
  }
  return sum / atoms;
}

/**
 * Delta = g avg(f) exp N(0, 0.02), B = B0 (1 - k avg(h)) (1 + N(0, 0.03)), C = B N(4.8, 0.6) or by the ion's own ratio, kept within 3.2
 * to 6.2; tetrahedral Delta by a fixed share; levels exact; then an error by transition: one electron N(0, 100), highest T1g of octahedral d3
 * N(-850, 150), A2g of octahedral d2 and d7 N(-500, 400), spin-flip lines N(0, 190) together and N(0, 60) each so that they
 * keep their order, octahedral Co(II) all bands together N(200, 100). Where two kinds of ligand stand round the ion every broad band moves
 * by N(0, 0.06 of the difference of their fields) besides: the lower symmetry shifts maxima, and the cubic model knows nothing of it.
 *
 * @throws RangeError where the lowest level at these parameters is not the declared one: the recipe's spin is then not believable
 */
export function truthOf(recipe: Recipe, seed: number): Truth {
  const random = randomFrom(seed, `truth ${recipe.id}`);
  const metal = metalEntry(recipe.ion, recipe.spin);
  const share = recipe.geometry === 'tetrahedral' ? tetrahedralShare : 1;
  const delta = metal.g * share * averageFactor(recipe, 'f') * Math.exp(random.normal(0, 0.02));
  const racahB = Math.max(0.4, 1 - metal.k * averageFactor(recipe, 'h')) * freeIonB(recipe.ion) * (1 + random.normal(0, 0.03));
  const [mean, deviation] = metal.ratio ?? [4.8, 0.6];
  const racahC = racahB * Math.min(6.2, Math.max(3.2, random.normal(mean, deviation)));
  const ion = ionNamed(recipe.ion);
  const all = levels({ electrons: ion.electrons, geometry: recipe.geometry }, { delta, racahB, racahC });
  const ground = all[0]!;
  const declared = groundLabel(ion.electrons, recipe.geometry, multiplicityOf(recipe));
  if (ground.label !== declared) throw new RangeError(`truthOf: ${recipe.id}: the lowest level is ${ground.label}, not ${declared}`);
  const shifts = {
    all: recipe.ion === 'Co(II)' && recipe.geometry === 'octahedral' ? random.normal(200, 100) : 0,
    lines: random.normal(0, 190),
    lowSymmetry: 0.06 * metal.g * share * fieldDifference(recipe),
  };
  const lowSymmetry = randomFrom(seed, `low symmetry ${recipe.id}`);
  const transitions = all
    .filter((level) => level.label !== ground.label && isLookedFor(level, ground, recipe))
    .map((level) => transitionTo(level, ground, recipe, shifts, random, lowSymmetry));
  return { delta, racahB, racahC, transitions: withPairJoined(transitions) };
}

/** Multiplicity of the ground state: highest, or lowest for low spin. */
export function multiplicityOf(recipe: Pick<Recipe, 'ion' | 'spin'>): number {
  const { electrons } = ionNamed(recipe.ion);
  if (recipe.spin === 'low') return electrons % 2 === 0 ? (electrons === 4 ? 3 : 1) : 2;
  return (electrons <= 5 ? electrons : 10 - electrons) + 1;
}

/** Spin-forbidden levels that spectra of this kind show, and how many of each name from the lowest. */
const spinForbidden: Readonly<Record<string, readonly string[]>> = {
  'd3 octahedral': ['a2Eg', 'a2T1g', 'a2T2g'],
  'd8 octahedral': ['a1Eg', 'a1T2g'],
  'd5 octahedral': ['a4T1g', 'a4T2g', 'a4A1g', 'a4Eg', 'b4T2g', 'b4Eg', 'b4T1g'],
  'd5 tetrahedral': ['a4T1', 'a4T2', 'a4A1', 'a4E', 'b4T2', 'b4E', 'b4T1'],
  'd6 octahedral low': ['a3T1g'],
};

function isLookedFor(level: Level, ground: Level, recipe: Recipe): boolean {
  const moved = Math.abs(level.eElectrons - ground.eElectrons);
  // Of low-spin d6 the levels two electrons away are too weak to be seen.
  if (level.multiplicity === ground.multiplicity) return level.energy < 60000 && !(recipe.spin === 'low' && moved > 1.5);
  const name = `d${ionNamed(recipe.ion).electrons} ${recipe.geometry}${recipe.spin === 'low' ? ' low' : ''}`;
  return (spinForbidden[name] ?? []).includes(level.label);
}

/** Errors of the bands of one complex, cm-1. */
interface Shifts {
  /** Of all bands together. */
  readonly all: number;
  /** Of all spin-flip lines together. */
  readonly lines: number;
  /** Standard deviation of what the lower symmetry of mixed ligands adds to each broad band. */
  readonly lowSymmetry: number;
}

/** Largest difference of f between the ligands of a complex. */
function fieldDifference(recipe: Recipe): number {
  const factors = recipe.ligands.map(([id]) => ligandEntry(id).f);
  return Math.max(...factors) - Math.min(...factors);
}

function transitionTo(level: Level, ground: Level, recipe: Recipe, shifts: Shifts, random: Random, lowSymmetry: Random): Transition {
  const { electrons } = ionNamed(recipe.ion);
  const spinAllowed = level.multiplicity === ground.multiplicity;
  const moved = Math.abs(level.eElectrons - ground.eElectrons);
  const narrow = !spinAllowed && moved < 0.4;
  const octahedral = recipe.geometry === 'octahedral';
  const highestT1 = octahedral && electrons === 3 && level.label === 'b4T1g';
  const farA2 = octahedral && (electrons === 2 || electrons === 7) && spinAllowed && level.irrep === 'A2g';
  let error = narrow ? shifts.lines + random.normal(0, 60) : random.normal(0, 100);
  if (highestT1) error = random.normal(-850, 150);
  if (farA2) error = random.normal(-500, 400);
  const moves = narrow || shifts.lowSymmetry === 0 ? 0 : lowSymmetry.normal(0, shifts.lowSymmetry);
  return { label: level.label, position: level.energy + error + moves + shifts.all, spinAllowed, narrow, twoElectron: highestT1 || farA2 };
}

/** The degenerate pair of d5 is one band, named by both. */
function withPairJoined(transitions: readonly Transition[]): Transition[] {
  const second = transitions.find((one) => /^a4Eg?$/.test(one.label) && transitions.some((other) => /^a4A1g?$/.test(other.label)));
  return transitions
    .filter((one) => one !== second)
    .map((one) => (second && /^a4A1g?$/.test(one.label) ? { ...one, label: `${one.label}/${second.label}` } : one))
    .sort((a, b) => a.position - b.position);
}
