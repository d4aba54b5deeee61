import type { Block } from '../shell/blocks.ts';
import type { Irrep } from '../shell/rotations.ts';
import { symmetricEigen } from '../linear/symmetricEigen.ts';
import { between, clusters } from './solve.ts';

/** Letters of free-ion terms by total orbital angular momentum L. */
const termLetters = ['S', 'P', 'D', 'F', 'G', 'H', 'I'];

/** The free-ion terms that a level of a block may come from. */
export interface Parent {
  /** Term letter, with a prime for each lower term of the same letter and multiplicity: "F", "D'"; several where they coincide. */
  readonly letters: readonly string[];
}

/** How many levels of one irreducible representation a term of angular momentum L has, L up to 6: H holds T1 twice and I holds T2 twice. */
const timesIn = (irrep: Irrep, momentum: number): number => ((irrep === 'T1' && momentum === 5) || (irrep === 'T2' && momentum === 6) ? 2 : 1);

/**
 * Free-ion parents of the levels of one block, in ascending order of the levels.
 *
 * Levels of one block never cross for Delta > 0, so level i belongs to the i-th free-ion eigenvalue of the
 * block at the same C/B. L is read off the block's matrix of L^2.
 *
 * @param racahB,racahC the free ion's parameters; only their ratio matters
 * @param closeness terms closer than this (same unit as B) are named together
 */
export function blockParents(block: Block, racahB: number, racahC: number, closeness: number): readonly Parent[] {
  const { size } = block;
  const total = new Float64Array(size * size);
  for (let i = 0; i < total.length; i++) total[i] = racahB * block.racahB[i]! + racahC * block.racahC[i]!;
  const { values, vectors } = symmetricEigen(total, size);
  const seen = new Map<number, number>();
  const parents: Parent[] = [];
  const terms: { letter: string; energy: number }[] = [];
  for (const [first, last] of clusters(values, 1e-9 * (Math.abs(racahB) + Math.abs(racahC)))) {
    const count = last - first + 1;
    const inner = new Float64Array(count * count);
    for (let a = 0; a < count; a++)
      for (let b = 0; b < count; b++) inner[a * count + b] = between(block.angular, vectors, size, first + a, first + b);
    const momenta = Array.from(symmetricEigen(inner, count).values, (square) => Math.round((Math.sqrt(4 * Math.max(0, square) + 1) - 1) / 2));
    for (const momentum of new Set(momenta)) {
      // Two terms of one letter may coincide (2F and 2F' of d5 at C/B = 8): each has its own letter.
      const termsAlike = momenta.filter((other) => other === momentum).length / timesIn(block.irrep, momentum);
      for (let term = 0; term < termsAlike; term++) {
        const earlier = seen.get(momentum) ?? 0;
        seen.set(momentum, earlier + 1);
        terms.push({ letter: termLetters[momentum]! + "'".repeat(earlier), energy: values[first]! });
      }
    }
  }
  for (const value of values) {
    const letters = terms.filter((term) => Math.abs(term.energy - value) <= closeness).map((term) => term.letter);
    parents.push({ letters });
  }
  return parents;
}
