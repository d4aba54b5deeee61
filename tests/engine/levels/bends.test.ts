import { describe, expect, test } from 'vitest';
import { diagonalise, levelBends, levelSlopes } from '../../../engine/levels/solve.ts';
import type { LevelBends, LevelSlopes } from '../../../engine/levels/solve.ts';
import { shellBlocks } from '../../../engine/shell/blocks.ts';
import type { Block } from '../../../engine/shell/blocks.ts';

type Place = readonly [number, number, number];

function slopesAt(block: Block, sign: number, [delta, racahB, racahC]: Place, k: number): Place {
  const into: LevelSlopes = { field: 0, racahB: 0, racahC: 0 };
  levelSlopes(block, sign, diagonalise(block, sign, delta, racahB, racahC), k, into);
  return [into.field, into.racahB, into.racahC];
}

function bendsAt(block: Block, sign: number, [delta, racahB, racahC]: Place, k: number): readonly Place[] {
  const into: LevelBends = { fieldField: 0, fieldB: 0, fieldC: 0, bB: 0, bC: 0, cC: 0 };
  levelBends(block, sign, diagonalise(block, sign, delta, racahB, racahC), k, into);
  return [[into.fieldField, into.fieldB, into.fieldC], [into.fieldB, into.bB, into.bC], [into.fieldC, into.bC, into.cC]];
}

const places: readonly (readonly [number, Place])[] = [[1, [17_400, 725, 3300]], [-1, [3120, 710, 3200]], [1, [31_000, 480, 2300]]];

describe.each([2, 3, 4, 5, 6, 7, 8])('second derivatives of the levels of d%i', (electrons) => {
  test('are the differences of the first ones', () => {
    for (const block of shellBlocks(electrons))
      for (const [sign, at] of places)
        for (let k = 0; k < block.size; k++) {
          const bends = bendsAt(block, sign, at, k);
          for (let p = 0; p < 3; p++) {
            const step = 1e-4 * at[p]!;
            const moved = (by: number): Place => at.map((value, i) => (i === p ? value + by : value)) as unknown as Place;
            const up = slopesAt(block, sign, moved(step), k);
            const down = slopesAt(block, sign, moved(-step), k);
            for (let q = 0; q < 3; q++) {
              const difference = (up[q]! - down[q]!) / (2 * step);
              // The third derivative, of the size of bend^2, spoils the difference by the square of the step.
              expect(Math.abs(bends[p]![q]! - difference) * at[p]!, `${block.multiplicity}${block.irrep} ${k}, ${p}${q}`).toBeLessThan(1e-3 * (1 + Math.abs(difference) * at[p]!));
            }
          }
        }
  });

  test('vanish along a common scale of all parameters: energies are homogeneous', () => {
    for (const block of shellBlocks(electrons))
      for (const [sign, at] of places)
        for (let k = 0; k < block.size; k++)
          for (const row of bendsAt(block, sign, at, k)) {
            const along = row.reduce((sum, bend, q) => sum + bend * at[q]!, 0);
            const size = row.reduce((sum, bend, q) => sum + Math.abs(bend) * at[q]!, 0);
            expect(Math.abs(along)).toBeLessThanOrEqual(1e-9 * size + 1e-15);
          }
  });
});
