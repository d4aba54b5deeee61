// All believable complexes of the generator's ions and ligands, in a fixed order.

import { ligandEntries, ligandEntry } from './ligands.ts';
import type { LigandEntry } from './ligands.ts';
import { metalEntries } from './metalIons.ts';
import type { MetalEntry } from './metalIons.ts';
import { chargeOf } from './recipes.ts';
import type { Recipe } from './recipes.ts';

type Shape = Pick<Recipe, 'ligands' | 'isomer'>;

/** Ways to fill six places with one or two kinds of ligand: donor atoms of each, isomers of each way. */
const mixtures: readonly (readonly [number, readonly Recipe['isomer'][]])[] = [
  [5, ['none']],
  [4, ['cis', 'trans']],
  [3, ['fac', 'mer']],
];

function octahedralShapes(): Shape[] {
  const whole = ligandEntries.map((one): Shape => ({ ligands: [[one.id, 6 / one.donors.length]], isomer: 'none' }));
  const mixed = ligandEntries.flatMap((first) => ligandEntries.flatMap((second) => (first === second ? [] : pairShapes(first, second))));
  return [...whole, ...mixed];
}

function pairShapes(first: LigandEntry, second: LigandEntry): Shape[] {
  return mixtures.flatMap(([atoms, isomers]) => {
    const counts = [atoms / first.donors.length, (6 - atoms) / second.donors.length] as const;
    // Three and three is the same pair either way round.
    if (!counts.every(Number.isInteger) || (atoms === 3 && first.id > second.id)) return [];
    const ligands = [[first.id, counts[0]], [second.id, counts[1]]] as const;
    // Beside one chelate the other four places are filled in one way only.
    const fitting = second.donors.length === 2 ? (['none'] as const) : isomers;
    return fitting.map((isomer) => ({ ligands, isomer }));
  });
}

function tetrahedralShapes(): Shape[] {
  return ['chlorido', 'bromido', 'iodido', 'thiocyanato-n', 'azido', 'imidazole'].map((id) => ({ ligands: [[id, 4]], isomer: 'none' }));
}

const tetrahedralIons = ['V(III)', 'Mn(II)', 'Fe(III)', 'Fe(II)', 'Co(II)', 'Ni(II)', 'Cu(II)'];

/** "cr-en2-cl2-cis", "co2-cl4"; the spin stands in ids where an ion occurs with two. */
export function recipeId(metal: Pick<MetalEntry, 'key' | 'ion' | 'spin'>, shape: Shape): string {
  const twoSpins = metalEntries.filter((one) => one.ion === metal.ion).length > 1;
  const parts = shape.ligands.map(([id, count]) => `${ligandEntry(id).key}${count === 1 ? '' : count}`);
  return [metal.key, ...(twoSpins && metal.spin ? [metal.spin] : []), ...parts, ...(shape.isomer === 'none' ? [] : [shape.isomer])].join('-');
}

function recipesOf(metal: MetalEntry): Recipe[] {
  const make = (geometry: Recipe['geometry']) => (shape: Shape): Recipe => ({
    id: recipeId(metal, shape), ion: metal.ion, geometry, spin: metal.spin, ...shape,
  });
  const octahedral = octahedralShapes().map(make('octahedral'));
  const tetrahedral = tetrahedralIons.includes(metal.ion) && metal.spin !== 'low' ? tetrahedralShapes().map(make('tetrahedral')) : [];
  return [...octahedral, ...tetrahedral].filter((recipe) => Math.abs(chargeOf(recipe)) <= 4);
}

/**
 * Every complex that the generator knows, complexes of one kind of ligand first. An ion is taken in one spin state here
 * (low where it occurs with two), so that a formula with its isomer occurs once.
 */
export function everyRecipe(): readonly Recipe[] {
  const metals = metalEntries.filter((one) => !(one.spin === 'high' && metalEntries.some((other) => other.ion === one.ion && other.spin === 'low')));
  const all = metals.flatMap(recipesOf);
  return [...all.filter((one) => one.ligands.length === 1), ...all.filter((one) => one.ligands.length > 1)];
}
