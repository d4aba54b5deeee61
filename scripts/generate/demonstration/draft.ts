// Drafts of the demonstration's complex records: what the generator gives before anything is edited by hand.

import type { GeneratedFile } from '../collection.ts';
import { randomFrom } from '../random.ts';
import type { Random } from '../random.ts';
import { sampleOf } from '../recipes.ts';
import { complexText } from '../records.ts';
import type { DraftMeasurement } from '../records.ts';
import type { Setting } from '../settings.ts';
import { spectrumOf } from '../spectrum.ts';
import { truthOf } from '../truth.ts';
import { people } from './conditions.ts';
import type { Planned } from './conditions.ts';
import { plan } from './plan.ts';
import type { PlannedComplex } from './plan.ts';

/** The seed with which the demonstration in content/ was drafted. Chosen once, not tried out. */
export const demonstrationSeed = 2026;

/**
 * One draft record a planned complex; a measurement that shows no band at all is left out, and so is a complex without one.
 *
 * @throws RangeError where the drawn parameters contradict a planned spin state
 */
export function draftDemonstration(seed: number): readonly GeneratedFile[] {
  return plan.flatMap((one) => {
    const measurements = one.measurements.map((measurement) => drafted(one, measurement, seed)).filter((draft) => draft.bands.length > 0);
    return measurements.length === 0 ? [] : [{ path: `complexes/${one.recipe.id}.yaml`, text: complexText(one.recipe, measurements) }];
  });
}

function drafted(complex: PlannedComplex, planned: Planned, seed: number): DraftMeasurement {
  const { recipe } = complex;
  const person = people[planned.by];
  // A doped crystal has no salt of its own.
  const sample = planned.conditions.host === null ? sampleOf(recipe, complex.counter, complex.water) : null;
  const setting: Setting = { ...planned.conditions, sample, habits: person.habits };
  const random = randomFrom(seed, `notebook ${recipe.id} ${setting.id}`);
  const year = random.whole(person.from, person.to - 1);
  const notebook = `${person.initials} ${year - person.from + 1}, p. ${random.whole(3, 190)}`;
  return {
    setting, bands: spectrumOf(recipe, truthOf(recipe, seed), setting, seed),
    provenance: { notebook, by: person.initials, date: `${year}-${twoDigits(random.whole(1, 12))}-${workday(random)}` },
    quoted: [],
  };
}

const twoDigits = (value: number): string => String(value).padStart(2, '0');

function workday(random: Random): string {
  return twoDigits(random.whole(1, 28));
}
