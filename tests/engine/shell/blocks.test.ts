import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, test, vi } from 'vitest';
import { levels } from '../../../engine/levels/levels.ts';
import { blockDegeneracy, shellBlocks } from '../../../engine/shell/blocks.ts';
import type { Block } from '../../../engine/shell/blocks.ts';

const electronCounts = [1, 2, 3, 4, 5, 6, 7, 8, 9];
const operators = ['field', 'racahB', 'racahC', 'angular'] as const;
const nameOf = (block: Block): string => `${block.multiplicity}${block.irrep}`;

function product(a: Float64Array, b: Float64Array, size: number): Float64Array {
  return Float64Array.from({ length: size * size }, (_, at) => {
    let sum = 0;
    for (let k = 0; k < size; k++) sum += a[Math.floor(at / size) * size + k]! * b[k * size + (at % size)]!;
    return sum;
  });
}

const eigenvalues = (matrix: Float64Array, size: number): number[] =>
  new EigenvalueDecomposition(new Matrix(Array.from({ length: size }, (_, i) => [...matrix.subarray(i * size, (i + 1) * size)])), { assumeSymmetric: true }).realEigenvalues;

/** All numbers of the blocks of one ion, bit for bit. */
const written = (blocks: readonly Block[]): string =>
  JSON.stringify(blocks.map((block) => [nameOf(block), block.size, ...operators.map((name) => [...new BigUint64Array(block[name].slice().buffer)].map(String))]));

describe.each(electronCounts)('the blocks of d%i', (electrons) => {
  const blocks = shellBlocks(electrons);

  test('stand once each, highest spin first, then A1, A2, E, T1, T2', () => {
    const order = blocks.map(({ multiplicity, irrep }) => (9 - multiplicity) * 10 + ['A1', 'A2', 'E', 'T1', 'T2'].indexOf(irrep));
    expect(order).toEqual([...new Set(order)].toSorted((a, b) => a - b));
    expect(blocks[0]!.multiplicity).toBe(Math.min(electrons, 10 - electrons) + 1);
  });

  test('hold square matrices of their size, exactly symmetric, the field diagonal with one entry a configuration', () => {
    for (const block of blocks) {
      for (const name of operators) {
        expect(block[name]).toHaveLength(block.size ** 2);
        for (let i = 0; i < block.size; i++) for (let j = 0; j < i; j++) expect(block[name][i * block.size + j]).toBe(block[name][j * block.size + i]);
      }
      for (let i = 0; i < block.size; i++) {
        const eElectrons = block.field[i * block.size + i]! + 0.4 * electrons;
        expect(eElectrons).toBeCloseTo(Math.round(eElectrons), 12);
        for (let j = 0; j < i; j++) expect(block.field[i * block.size + j]).toBe(0);
      }
    }
  });

  test('repulsion keeps the orbital angular momentum: B and C commute with L squared, and the field of n electrons in general does not', () => {
    let disturbed = 0;
    for (const block of blocks) {
      const commutator = (name: 'field' | 'racahB' | 'racahC') => {
        const [forward, backward] = [product(block[name], block.angular, block.size), product(block.angular, block[name], block.size)];
        return Math.max(...forward.map((value, i) => Math.abs(value - backward[i]!)));
      };
      expect(commutator('racahB'), nameOf(block)).toBeLessThan(1e-9);
      expect(commutator('racahC'), nameOf(block)).toBeLessThan(1e-9);
      disturbed = Math.max(disturbed, commutator('field'));
    }
    if (electrons > 1 && electrons < 9) expect(disturbed).toBeGreaterThan(0.1);
  });

  test('L squared has the values L(L + 1) of whole L, each as often as the irreducible representation stands in that L', () => {
    // How S to I split in O: H. Bethe, Ann. Phys. 395, 133 (1929), from memory.
    const splitting: readonly string[] = ['A1', 'T1', 'E T2', 'A2 T1 T2', 'A1 E T1 T2', 'E T1 T1 T2', 'A1 A2 E T1 T2 T2'];
    const counts = new Map<string, number>();
    for (const block of blocks)
      for (const square of eigenvalues(block.angular, block.size)) {
        const momentum = Math.round((Math.sqrt(4 * Math.max(0, square) + 1) - 1) / 2);
        expect(square).toBeCloseTo(momentum * (momentum + 1), 9);
        const key = `${block.multiplicity} ${momentum} ${block.irrep}`;
        counts.set(key, (counts.get(key) ?? 0) + 1);
      }
    // All irreducible representations of one L must count the same number of terms.
    const terms = new Map<string, Set<number>>();
    for (const [key, count] of counts) {
      const [multiplicity, momentum, irrep] = key.split(' ') as [string, string, string];
      const times = splitting[Number(momentum)]!.split(' ').filter((name) => name === irrep).length;
      expect(times, key).toBeGreaterThan(0);
      const term = `${multiplicity} ${momentum}`;
      terms.set(term, (terms.get(term) ?? new Set()).add(count / times));
    }
    for (const [term, number] of terms) expect(number.size, term).toBe(1);
    for (const term of terms.keys())
      for (const irrep of new Set(splitting[Number(term.split(' ')[1])]!.split(' '))) expect(counts.has(`${term} ${irrep}`), `${term} ${irrep}`).toBe(true);
  });

  test('hold all C(10, n) states', () => {
    const choose = [1, 10, 45, 120, 210, 252, 210, 120, 45, 10];
    expect(blocks.reduce((sum, block) => sum + block.size * blockDegeneracy(block), 0)).toBe(choose[electrons]);
  });
});

describe('derivation', () => {
  test('gives the same bits whichever ion is asked for first', async () => {
    const here = electronCounts.map((electrons) => written(shellBlocks(electrons)));
    vi.resetModules();
    const fresh = await import('../../../engine/shell/blocks.ts');
    expect(fresh.shellBlocks).not.toBe(shellBlocks);
    for (const electrons of [5, 9, 6, 1, 4, 8, 2, 7, 3]) expect(written(fresh.shellBlocks(electrons)) === here[electrons - 1], `d${electrons}`).toBe(true);
  });

  test('is done once: a second question returns the same blocks', () => {
    expect(shellBlocks(5)).toBe(shellBlocks(5));
  });

  test('is not disturbed by use: levels leave the blocks as they were', () => {
    const before = written(shellBlocks(4));
    for (const geometry of ['octahedral', 'tetrahedral'] as const) levels({ electrons: 4, geometry }, { delta: 14000, racahB: 810, racahC: 3500 });
    expect(written(shellBlocks(4)) === before).toBe(true);
  });

  test.each([0, 10, 3.5, -2, Number.NaN, Number.POSITIVE_INFINITY])('of d%s is refused by name', (electrons) => {
    expect(() => shellBlocks(electrons)).toThrow(new RangeError(`electrons: ${electrons} is not a whole number from 1 to 9`));
  });
});
