// A whole generated content folder of any size, for measurements of speed and for tests.

import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { everyRecipe } from './enumerate.ts';
import { ligandEntries, ligandEntry } from './ligands.ts';
import { randomFrom, shuffled } from './random.ts';
import type { Random } from './random.ts';
import { chargeOf, sampleOf } from './recipes.ts';
import type { Recipe } from './recipes.ts';
import { complexText, ligandText } from './records.ts';
import type { DraftMeasurement } from './records.ts';
import { scans } from './settings.ts';
import type { Habits, Setting } from './settings.ts';
import { spectrumOf } from './spectrum.ts';
import { truthOf } from './truth.ts';
import type { Truth } from './truth.ts';

/** Path within the content folder and text of one file. */
export interface GeneratedFile {
  readonly path: string;
  readonly text: string;
}

/**
 * The files of a generated collection: group, policy, source, ligands and `count` complexes with one to three measurements each.
 * A complex whose drawn parameters contradict its spin state, or that shows no band, gives way to the next one.
 *
 * @throws RangeError where more complexes are asked for than the generator knows
 */
export function generatedFiles(seed: number, count: number): readonly GeneratedFile[] {
  if (!Number.isInteger(count) || count < 0) throw new RangeError(`generatedFiles: count: ${count} is not a whole number of at least 0`);
  const files: GeneratedFile[] = [...frameFiles(seed), ...ligandEntries.map((one) => ({ path: `ligands/${one.id}.yaml`, text: ligandText(one) }))];
  const recipes = shuffled(everyRecipe(), randomFrom(seed, 'order'));
  let made = 0;
  for (const recipe of recipes) {
    if (made === count) break;
    const text = recordOf(recipe, seed);
    if (text === null) continue;
    files.push({ path: `complexes/${recipe.id}.yaml`, text });
    made += 1;
  }
  if (made < count) throw new RangeError(`generatedFiles: count: ${count} is more than the ${made} complexes that the generator knows`);
  return files;
}

/** Writes the files of `generatedFiles` below a directory, which is made where it is missing. */
export function generateCollection(seed: number, count: number, directory: string): void {
  const files = generatedFiles(seed, count);
  for (const folder of ['complexes', 'ligands', 'sources']) mkdirSync(join(directory, folder), { recursive: true });
  for (const file of files) writeFileSync(join(directory, file.path), file.text);
}

function frameFiles(seed: number): GeneratedFile[] {
  const group = [
    'title: Generated readings', 'group: No group (generated)', `description: "Invented readings, seed ${seed}."`,
    'licence: CC0-1.0', 'url: https://bandstead.example/generated/', 'release: 0.1.0', 'started: 2020-01-01', 'demonstration: true', '',
  ];
  const source = ['reference: "Generated numbers, not published. Invented."', 'year: 2020', ''];
  return [
    { path: 'group.yaml', text: group.join('\n') },
    { path: 'policy.yaml', text: 'name: generated\n' },
    { path: 'sources/generated.yaml', text: source.join('\n') },
  ];
}

function recordOf(recipe: Recipe, seed: number): string | null {
  const truth = believable(recipe, seed);
  if (truth === null) return null;
  const random = randomFrom(seed, `record ${recipe.id}`);
  const settings = settingsFor(recipe, random);
  const measurements = settings.flatMap((setting): DraftMeasurement[] => {
    const bands = spectrumOf(recipe, truth, setting, seed);
    if (bands.length === 0) return [];
    const notebook = `${random.whole(1, 30)}, p. ${random.whole(1, 200)}`;
    const date = `20${random.whole(10, 25)}-0${random.whole(1, 9)}-${random.whole(10, 28)}`;
    return [{ setting, bands, provenance: { notebook, by: random.pick(['AB', 'CD', 'EF']), date }, quoted: quotedBy(truth, random) }];
  });
  return measurements.length === 0 ? null : complexText(recipe, measurements);
}

/** The truth of a recipe, or null where its spin state is not the lowest at the drawn parameters. */
function believable(recipe: Recipe, seed: number): Truth | null {
  try {
    return truthOf(recipe, seed);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

function quotedBy(truth: Truth, random: Random): DraftMeasurement['quoted'] {
  if (!random.chance(0.1)) return [];
  const delta = Math.round((truth.delta * (1 + random.normal(0, 0.01))) / 50) * 50;
  return [[['Delta', `${delta} cm-1`], ['cite', 'generated'], ['where', `p. ${random.whole(1, 90)}`]]];
}

function settingsFor(recipe: Recipe, random: Random): Setting[] {
  const charge = chargeOf(recipe);
  const sample = sampleOf(recipe, charge > 0 ? random.pick(['NO3', 'Cl', 'BF4']) : random.pick(['K', 'Cs', 'Na']));
  const solvents = recipe.ligands.flatMap(([id]) => ligandEntry(id).solvents);
  const solution: Setting = {
    id: 'solution-295', phase: 'solution', medium: random.pick(solvents), sample, host: null,
    temperature: random.chance(0.3) ? 'room' : random.chance(0.1) ? null : 295, technique: 'absorption',
    scan: random.pick([scans.usual, scans.usual, scans.wide, scans.visible]), habits: habitsFor(random),
  };
  const solid: Setting = { ...solution, id: 'solid-295', phase: 'solid', medium: null, temperature: 295, technique: 'diffuse reflectance', scan: scans.wide, habits: habitsFor(random) };
  const cold: Setting = { ...solid, id: 'crystal-80', phase: 'crystal', temperature: 80, technique: 'absorption', habits: habitsFor(random) };
  const kinds = random.between(0, 1);
  return kinds < 0.6 ? [solution] : kinds < 0.75 ? [solid] : kinds < 0.93 ? [solution, cold] : [solution, solid, cold];
}

function habitsFor(random: Random): Habits {
  return {
    unit: random.chance(0.65) ? 'cm-1' : random.chance(0.85) ? 'nm' : 'eV',
    step: random.pick([10, 50, 50, 100]),
    typesUncertainty: random.chance(0.5),
    typesEpsilon: random.chance(0.75),
    typesWidth: random.chance(0.6),
    typesTerms: random.chance(0.85),
  };
}
