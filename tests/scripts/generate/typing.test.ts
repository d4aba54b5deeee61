import { freeIon, levelNames, parseQuantity, readLabel, toWavenumber } from '#engine';
import { describe, expect, it } from 'vitest';
import { ionNamed, metalEntries } from '../../../scripts/generate/metalIons.ts';
import type { Recipe } from '../../../scripts/generate/recipes.ts';
import type { Habits } from '../../../scripts/generate/settings.ts';
import type { SeenBand } from '../../../scripts/generate/spectrum.ts';
import { multiplicityOf } from '../../../scripts/generate/truth.ts';
import { typedEpsilon, typedPosition, typedTerm } from '../../../scripts/generate/typing.ts';

const habits: Habits = { unit: 'cm-1', step: 50, typesUncertainty: true, typesEpsilon: true, typesWidth: true, typesTerms: true };

function band(position: number, kind: SeenBand['kind'] = 'maximum'): SeenBand {
  return { label: 'a4T2g', position, kind, side: null, width: 3000, epsilon: 36.44, degeneracy: null };
}

describe('numbers as people type them', () => {
  it('are written in the unit of the person, with the uncertainty in the last digits', () => {
    expect(typedPosition(band(21548.3), habits)).toBe('21550(90) cm-1');
    expect(typedPosition(band(21548.3), { ...habits, typesUncertainty: false })).toBe('21550 cm-1');
    expect(typedPosition(band(21561.2), { ...habits, unit: 'nm' })).toBe('464(2) nm');
    expect(typedPosition(band(15302.4, 'line'), { ...habits, unit: 'nm' })).toBe('653.5(4) nm');
    expect(typedPosition(band(21548.3), { ...habits, unit: 'eV' })).toBe('2.67(1) eV');
    expect(typedEpsilon(36.44)).toBe('36');
    expect(typedEpsilon(0.0634)).toBe('0.063');
  });

  it.each(['cm-1', 'nm', 'eV'] as const)('in %s read back within the rounding', (unit) => {
    for (let position = 4000; position < 44_000; position += 517) {
      for (const typesUncertainty of [true, false]) {
        const parsed = parseQuantity(typedPosition(band(position), { ...habits, unit, typesUncertainty }), 'energy');
        if (!parsed.ok) throw new Error(parsed.expected);
        const read = toWavenumber(parsed.quantity);
        // Half of 50 cm-1, of 1 nm or of 0.01 eV.
        const rounding = unit === 'cm-1' ? 25 : unit === 'nm' ? (0.51 * position * position) / 1e7 : 41;
        expect(Math.abs(read.position - position)).toBeLessThanOrEqual(rounding);
      }
    }
  });
});

/** C0/B0 by which the reader resolves parents. */
function ratioOf(ion: string): number {
  const published = freeIon('published', { name: ion });
  return published?.racahC0 ? published.racahC0 / published.racahB0 : 4.5;
}

describe('labels as chemists type them', () => {
  it('read back to the level they were made from, for every level of every ion', () => {
    let tried = 0;
    for (const { ion, spin } of metalEntries) {
      const { electrons } = ionNamed(ion);
      for (const geometry of ['octahedral', 'tetrahedral'] as const) {
        const recipe: Recipe = { id: 'probe', ion, spin, geometry, ligands: [['aqua', 6]], isomer: 'none' };
        const context = { electrons, geometry, multiplicity: multiplicityOf(recipe), ratio: ratioOf(ion) };
        for (const label of levelNames(electrons, geometry)) {
          const read = readLabel(typedTerm(label, recipe), context);
          if (!read.ok) {
            expect(read.code, `${ion} ${label}`).toBe('TERM_IS_GROUND');
            continue;
          }
          expect(read.labels.some((one) => one.split('/').includes(label)) && read.labels.length === 1, `${ion} ${geometry} ${label}: ${typedTerm(label, recipe)}`).toBe(true);
          tried += 1;
        }
      }
    }
    expect(tried).toBeGreaterThan(500);
  });
});
