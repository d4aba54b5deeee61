import { join } from 'node:path';
import { expect, test } from 'vitest';
import { defaultPolicy, freeIon, readWithRivals } from '#engine';
import type { Measurement, Reading } from '#engine';
import { readCollection } from '../../scripts/content/readCollection.ts';
import { expectedFits } from './complexes-expected.ts';

// The readings of tests/published/complexes with the term labels taken away, under the default policy: geometry, spin and the kind
// of each band stay, and the spectrum counts as scanned from 1000 to 45 000 cm-1. The typed assignment is the right one.

const { collection, faults } = readCollection(join(import.meta.dirname, 'complexes'));
if (!collection) throw new Error(faults.map((fault) => `${fault.file}:${fault.line} ${fault.code}`).join('\n'));
const measurements = new Map(collection.complexes.flatMap(({ id, measurements: own }) => own.map((one): [string, Measurement] => [`${id}/${one.id}`, one.engine])));

const scanned = [{ low: 1000, high: 45_000 }];
const withoutLabels = (measurement: Measurement): Measurement => ({ ...measurement, scanned, bands: measurement.bands.map((band) => ({ ...band, terms: [] })) });

/** What each band is taken for; bands that stay out are not in it. */
const assignmentOf = ({ bands, geometry, multiplicity }: Reading): string =>
  `${geometry} ${multiplicity}: ${bands.map(({ bands: own, label, observed }) => `${label} ${Math.round(observed)} (band ${own.join('+')})`).sort().join(', ')}`;

function readingsOf(measurement: Measurement): Reading[] {
  const { chosen, rivals } = readWithRivals(measurement, defaultPolicy, freeIon(defaultPolicy.freeIons, measurement.ion));
  return [chosen, ...rivals];
}

interface Placed {
  readonly id: string;
  /** From 1; null where the right assignment is not among the readings. */
  readonly rank: number | null;
  readonly story: string;
}

const placed = expectedFits.map(({ measurement: id }): Placed => {
  const measurement = measurements.get(id);
  if (!measurement) throw new Error(`no measurement ${id}`);
  const right = assignmentOf(readingsOf(measurement)[0]!);
  const found = readingsOf(withoutLabels(measurement)).map((reading) => ({ assignment: assignmentOf(reading), score: reading.score }));
  const at = found.findIndex(({ assignment }) => assignment === right);
  return { id, rank: at < 0 ? null : at + 1, story: `${id}: right is ${right}\n${found.map(({ assignment, score }) => `    ${score?.toFixed(2) ?? 'no fit'} ${assignment}`).join('\n')}` };
});

const notFirst = placed.filter(({ rank }) => rank !== 1);
console.info(`unlabelled: the right assignment is first in ${placed.length - notFirst.length} of ${placed.length} rows${notFirst.map(({ story }) => `\n  ${story}`).join('')}`);

test('without labels the right assignment is ranked first in at least 90 % of the rows', () => {
  expect(placed.length).toBeGreaterThan(30);
  expect(placed.filter(({ rank }) => rank === 1).length, notFirst.map(({ story }) => story).join('\n')).toBeGreaterThanOrEqual(0.9 * placed.length);
});

test('and in the first three in all of them', () => {
  expect(placed.filter(({ rank }) => rank === null || rank > 3).map(({ story }) => story)).toEqual([]);
});
