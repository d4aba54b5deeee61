import { describe, expect, test } from 'vitest';
import { groundLabel } from '#engine';
import { transitionsAt } from '../../../engine/readings/evaluate.ts';
import { fieldsForPosition } from '../../../engine/readings/fieldRoots.ts';
import { transitionsOf } from '../../../engine/readings/transitions.ts';
import type { GroundCase } from '../../../engine/readings/transitions.ts';
import { seeded } from '../../published/random.ts';

const cases: readonly GroundCase[] = [
  { electrons: 2, geometry: 'octahedral', multiplicity: 3 }, { electrons: 3, geometry: 'tetrahedral', multiplicity: 4 },
  { electrons: 6, geometry: 'octahedral', multiplicity: 1 }, { electrons: 7, geometry: 'octahedral', multiplicity: 4 },
  { electrons: 5, geometry: 'octahedral', multiplicity: 2 }, { electrons: 8, geometry: 'tetrahedral', multiplicity: 3 },
];

const racahB = 700;
const ratio = 4.5;

/** Fields in small steps of Delta/B between which a transition passes a position. */
function passages(position: number, energies: readonly number[]): number {
  return energies.slice(1).filter((energy, i) => energy < position !== energies[i]! < position).length;
}

describe.each(cases)('d$electrons $geometry, multiplicity $multiplicity', (ion) => {
  const ground = groundLabel(ion.electrons, ion.geometry, ion.multiplicity)!;
  const labels = transitionsOf(ion).filter((one) => one.spinAllowed).slice(0, 5).map((one) => one.label);
  const energyOf = (label: string, delta: number): number => transitionsAt(ion, ground, [label], { delta, racahB, racahC: ratio * racahB })[0]!.energy;

  test('every field found puts the transition at the position, and as many are found as small steps show', () => {
    const next = seeded(31);
    for (const label of labels) {
      const energies = Array.from({ length: 1601 }, (_, i) => energyOf(label, 0.05 * i * racahB));
      for (let n = 0; n < 20; n++) {
        const position = 2000 + 40_000 * next();
        const roots = fieldsForPosition(ion, ground, label, position, racahB, ratio);
        for (const root of roots) expect(energyOf(label, root)).toBeCloseTo(position, 6);
        expect(roots, `${label} at ${position}`).toEqual([...roots].sort((a, b) => a - b));
        expect(roots.filter((root) => root <= 80 * racahB).length, `${label} at ${position}`).toBe(passages(position, energies));
      }
    }
  });
});
