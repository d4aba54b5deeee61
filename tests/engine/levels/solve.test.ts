import { describe, expect, test } from 'vitest';
import { shellBlocks } from '../../../engine/shell/blocks.ts';
import type { Block } from '../../../engine/shell/blocks.ts';
import { clusters, solveBlock } from '../../../engine/levels/solve.ts';

const electronCounts = [2, 3, 4, 5, 6, 7, 8];

/** Least gap between neighbours `i` and `i + 1` of a block for Delta/B in (0, 60], refined where the gap turns. */
function narrowest(block: Block, ratio: number, i: number): { readonly gap: number; readonly deltaOverB: number } {
  const at = (x: number) => {
    const { energy, field } = solveBlock(block, 1, x, 1, ratio);
    return { gap: energy[i + 1]! - energy[i]!, slope: field[i + 1]! - field[i]! };
  };
  let best = { gap: Number.POSITIVE_INFINITY, deltaOverB: 0 };
  for (let x = 0.5; x < 60; x += 0.5) {
    let [low, high] = [x, x + 0.5];
    if (at(low).gap < best.gap) best = { gap: at(low).gap, deltaOverB: low };
    if (at(low).slope >= 0 || at(high).slope <= 0) continue;
    for (let step = 0; step < 40; step++) {
      const middle = (low + high) / 2;
      if (at(middle).slope < 0) low = middle;
      else high = middle;
    }
    if (at(low).gap < best.gap) best = { gap: at(low).gap, deltaOverB: low };
  }
  return best;
}

describe('levels of one block do not cross', () => {
  // The range of C/B that fitted spectra show: 3.2 to 6.4.
  test.each(electronCounts)('d%i: neighbours of one block stay apart for every Delta/B from 0.5 to 60', (electrons) => {
    for (const block of shellBlocks(electrons))
      for (const ratio of [3.2, 4, 4.5, 5, 6.4])
        for (let i = 0; i + 1 < block.size; i++) {
          const { gap, deltaOverB } = narrowest(block, ratio, i);
          expect(gap, `${block.multiplicity}${block.irrep} ${i + 1} at Delta/B ${deltaOverB}, C/B ${ratio}`).toBeGreaterThan(1e-3);
        }
  });

  test('the rule is one of general parameters: at C/B = 2 and Delta/B = 2.4, far from any complex, two 2E levels of octahedral d7 touch', () => {
    const block = shellBlocks(7).find(({ multiplicity, irrep }) => multiplicity === 2 && irrep === 'E')!;
    const { energy } = solveBlock(block, 1, 2.4, 1, 2);
    expect(energy[2]! - energy[1]!).toBeCloseTo(0, 12);
    expect(narrowest(block, 2.2, 1).gap).toBeGreaterThan(1e-3);
  });
});

describe('one block', () => {
  test.each([1, ...electronCounts, 9])('d%i: eigenvalues of every block are ascending and add up to the trace', (electrons) => {
    for (const block of shellBlocks(electrons))
      for (const [sign, delta, racahB, racahC] of [[1, 17400, 725, 3300], [-1, 3120, 710, 3200], [1, 0, 900, 4000], [-1, 1e5, 1, 4]] as const) {
        const { energy } = solveBlock(block, sign, delta, racahB, racahC);
        let trace = 0;
        let size = 0;
        for (let i = 0; i < block.size; i++) {
          const at = i * block.size + i;
          trace += sign * delta * block.field[at]! + racahB * block.racahB[at]! + racahC * block.racahC[at]!;
          size += Math.abs(energy[i]!);
          if (i > 0) expect(energy[i]!).toBeGreaterThanOrEqual(energy[i - 1]! - 1e-12 * size);
        }
        expect(Math.abs(energy.reduce((a, b) => a + b) - trace)).toBeLessThan(1e-12 * (size + 1));
      }
  });
});

test('clusters gather neighbours within the tolerance, chain-wise, and leave the rest alone', () => {
  expect(clusters([0, 1, 1.05, 1.1, 3], 0.06)).toEqual([[0, 0], [1, 3], [4, 4]]);
  expect(clusters([2], 1)).toEqual([[0, 0]]);
  expect(clusters([], 1)).toEqual([]);
});
