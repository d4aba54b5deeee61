import { describe, expect, test } from 'vitest';
import { defaultPolicy, freeIon, readWithRivals } from '#engine';
import { gatherItems } from '../../../engine/readings/candidates.ts';
import type { Freedom } from '../../../engine/readings/candidates.ts';
import { isFit } from '../../../engine/readings/fitTypes.ts';
import { scoreChoices } from '../../../engine/readings/scoring.ts';
import type { Choice, ScoredReading, SearchTask } from '../../../engine/readings/scoring.ts';
import { keepWithin, readingsAtMost, searchReadings } from '../../../engine/readings/search.ts';
import { searchStopped } from '../../../engine/words/remarks.ts';
import { seeded } from '../../published/random.ts';
import { band, measurement } from '../measurement/sample.ts';
import { randomTask, recordKinds } from './randomRecords.ts';
import type { RecordKind } from './randomRecords.ts';

// The search against trying every way to give each band one of its candidates or none, no transition twice: the same best
// readings with the same scores, on small records drawn at random.

const count = process.env['BANDSTEAD_LONG'] === '1' ? 400 : 12;
const freedoms: readonly Freedom[] = ['as typed', 'free'];

/** C0/B0 by which typed parents are resolved. */
const parentRatio = ({ freeIon }: SearchTask): number => (freeIon?.racahC0 ? freeIon.racahC0 / freeIon.racahB0 : 4.5);

/** Every assignment, fitted and scored, best first; those that no fit reproduces are left out. */
function everyReading(task: SearchTask, freedom: Freedom): ScoredReading[] {
  const { items, notFitted } = gatherItems(task.measurement, task.ion, task.policy, parentRatio(task), freedom);
  const found: ScoredReading[] = [];
  const walk = (at: number, choices: readonly Choice[]): void => {
    const item = items[at];
    if (!item) {
      found.push(scoreChoices(task, choices, notFitted));
      return;
    }
    for (const label of item.candidates) if (label.includes('/') || !choices.some((one) => one.label === label)) walk(at + 1, [...choices, { item, label }]);
    if (item.leaveOut) walk(at + 1, [...choices, { item, label: null }]);
  };
  walk(0, []);
  return found.filter(({ score }) => Number.isFinite(score)).sort((a, b) => a.score - b.score);
}

const keyOf = ({ assigned }: ScoredReading): string => assigned.map(({ label, observation }) => `${label}@${observation.bands.join('+')}`).join(' ');

/** What is wrong with the search's answer: wanted readings that it lacks, and wrong ones that it has. */
function faultsOf(task: SearchTask, freedom: Freedom, every: readonly ScoredReading[], known = Number.POSITIVE_INFINITY): string[] {
  const { readings, complete } = searchReadings(task, freedom, known);
  const got = readings.filter(({ score }) => Number.isFinite(score));
  const best = Math.min(known, every[0]?.score ?? known);
  const wanted = every.filter(({ score }, n) => score <= best + keepWithin && n < readingsAtMost - (Number.isFinite(known) ? 1 : 0));
  const last = wanted.at(-1)?.score ?? Number.NEGATIVE_INFINITY;
  const scores = new Map(got.map((reading) => [keyOf(reading), reading.score]));
  const right = new Map(every.map((reading) => [keyOf(reading), reading.score]));
  const story = `${freedom}, ${task.measurement.bands.map(({ position, kind, terms }) => `${position.toFixed(0)} ${kind}${terms.length > 0 ? ` (${terms.join(', ')})` : ''}`).join('; ')}`;
  return [
    ...(complete ? [] : [`${story}: stopped early`]),
    // Of readings that tie with the last one wanted any will do.
    ...wanted.filter((one) => !scores.has(keyOf(one)) && one.score < last - 1e-6).map((one) => `${story}: missed ${keyOf(one)}, score ${one.score}, best ${best}`),
    ...(got.length < wanted.length ? [`${story}: ${got.length} readings for ${wanted.length}`] : []),
    ...got.filter((one) => !(Math.abs(one.score - right.get(keyOf(one))!) < 1e-9)).map((one) => `${story}: ${keyOf(one)} with score ${one.score}`),
    ...got.filter((one, n) => n > 0 && one.score < got[n - 1]!.score).map((one) => `${story}: ${keyOf(one)} out of order`),
  ];
}

function run(kind: RecordKind, seed: number): void {
  const next = seeded(seed);
  const faults: string[] = [];
  let several = 0;
  for (let n = 0; n < count; n++) {
    const task = randomTask(kind, next);
    for (const freedom of freedoms) {
      const every = everyReading(task, freedom);
      if (every.length > 1) several++;
      faults.push(...faultsOf(task, freedom, every));
      // Against a better reading found elsewhere, and against one that is worse than the best here.
      if (every[0]) for (const away of [-5, 3]) faults.push(...faultsOf(task, freedom, every, every[0].score + away));
    }
  }
  if (faults.length > 0) throw new Error(`${faults.length} faults in ${count} records:\n${faults.slice(0, 12).join('\n')}`);
  expect(several, 'records that can be read in several ways').toBeGreaterThan(count / 3);
}

describe(`the search finds the same best readings as trying all: ${count} records an ion, typed and free`, () => {
  test.each(recordKinds.map((kind, n) => [`${kind.name} ${kind.ion.geometry}, multiplicity ${kind.ion.multiplicity}`, kind, 900 + n] as const))('%s', (_, kind, seed) => {
    run(kind, seed);
  }, 600_000);
});

test('where nothing fits, the one reading told assigns every band that can be assigned, and says why no fit stands', () => {
  const task = randomTask(recordKinds.find(({ name }) => name === 'V(III)')!, seeded(5));
  // nu(A2) below nu(T2) has no solution in d2 octahedral (check-values section 7).
  const bands = [25_600, 17_200].map((position, k) => ({ ...task.measurement.bands[0]!, position, uMinus: 50, uPlus: 50, kind: 'maximum' as const, epsilon: 8, width: 3000, terms: [k === 0 ? '3T2g' : '3A2g'] }));
  const [only, ...others] = searchReadings({ ...task, measurement: { ...task.measurement, bands } }, 'as typed').readings;
  expect(others).toEqual([]);
  expect(only!.score).toBe(Number.POSITIVE_INFINITY);
  expect(only!.assigned.map(({ label }) => label).sort()).toEqual(['a3A2g', 'a3T2g']);
  expect(isFit(only!.outcome)).toBe(false);
});

test('a record without bands that could be assigned gives one reading with none', () => {
  const task = randomTask(recordKinds[1]!, seeded(7));
  const bands = task.measurement.bands.map((band) => ({ ...band, role: 'CT' as const }));
  const readings = searchReadings({ ...task, measurement: { ...task.measurement, bands } }, 'free').readings;
  expect(readings).toHaveLength(1);
  expect(readings[0]).toMatchObject({ assigned: [], origin: 'none', score: Number.POSITIVE_INFINITY });
  expect(readings[0]!.notFitted).toHaveLength(bands.length);
});

test('forty bands without a term end in time, and the reading says that not all was tried', () => {
  const many = measurement('Mn(II)', Array.from({ length: 40 }, (_, k) => band(9000 + 825 * k + 137 * (k % 3))), { multiplicity: 6 });
  const { chosen } = readWithRivals(many, defaultPolicy, freeIon('published', many.ion));
  expect(chosen.remarks).toContain(searchStopped);
  const few = measurement('Mn(II)', [band(18_900), band(23_100)], { multiplicity: 6 });
  expect(readWithRivals(few, defaultPolicy, freeIon('published', few.ion)).chosen.remarks).not.toContain(searchStopped);
});
