import { describe, expect, test } from 'vitest';
import { levels } from '#engine';
import type { Geometry } from '#engine';
import { isOutside, ratioWindows } from '../../../engine/cautions/ratioWindows.ts';

const cases: readonly (readonly [number, Geometry])[] = [[2, 'octahedral'], [3, 'octahedral'], [7, 'octahedral'], [8, 'octahedral'], [2, 'tetrahedral'], [3, 'tetrahedral'], [7, 'tetrahedral'], [8, 'tetrahedral']];
const multiplicityOf = (electrons: number): number => Math.min(electrons, 10 - electrons) + 1;
const windowsOf = (electrons: number, geometry: Geometry) => ratioWindows({ electrons, geometry, multiplicity: multiplicityOf(electrons) });

/** Energies above the lowest level of the highest multiplicity, from the weakest to the strongest field. */
function energiesAt(electrons: number, geometry: Geometry, deltaOverB: number): ReadonlyMap<string, number> {
  const spin = multiplicityOf(electrons);
  const found = levels({ electrons, geometry }, { delta: deltaOverB * 700, racahB: 700, racahC: 3150 }).filter(({ multiplicity }) => multiplicity === spin);
  const ground = Math.min(...found.map(({ energy }) => energy));
  return new Map(found.map(({ label, energy }) => [label, energy - ground]));
}

const fields = Array.from({ length: 300 }, (_, i) => 10 ** (-2 + i / 50));

describe.each(cases)('d%i %s', (electrons, geometry) => {
  test('no field brings a ratio outside its window', () => {
    for (const field of fields) {
      const energies = energiesAt(electrons, geometry, field);
      for (const window of windowsOf(electrons, geometry)) {
        const ratio = energies.get(window.upper)! / energies.get(window.lower)!;
        expect({ field, ...window, outside: isOutside({ ...window, least: window.least === null ? null : window.least - 1e-6, most: window.most === null ? null : window.most + 1e-6 }, ratio) })
          .toEqual({ field, ...window, outside: false });
      }
    }
  });

  test('each limit is reached in the weakest or the strongest field, to half a per cent', () => {
    const ends = [fields[0]!, fields.at(-1)!].map((field) => energiesAt(electrons, geometry, field));
    for (const { upper, lower, least, most } of windowsOf(electrons, geometry)) {
      const ratios = ends.map((energies) => energies.get(upper)! / energies.get(lower)!);
      if (least !== null) expect(Math.min(...ratios) / least).toBeCloseTo(1, 2);
      if (most !== null) expect(Math.max(...ratios) / most).toBeCloseTo(1, 2);
    }
  });
});

test('ions without such windows have none', () => {
  for (const [electrons, multiplicity] of [[1, 2], [4, 5], [5, 6], [6, 1], [9, 2]] as const) expect(ratioWindows({ electrons, geometry: 'octahedral', multiplicity })).toEqual([]);
  expect(ratioWindows({ electrons: 7, geometry: 'octahedral', multiplicity: 2 })).toEqual([]);
});
