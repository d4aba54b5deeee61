import type { FieldParameters, Gradient } from '../levels/levels.ts';
import { fieldSign } from '../levels/levels.ts';
import { solveBlock } from '../levels/solve.ts';
import type { Block } from '../shell/blocks.ts';
import { levelPlace } from './table.ts';
import type { FieldCase } from './table.ts';

/** A transition at given parameters: energy in cm-1 and exact derivatives by Delta, B and C. */
export interface TransitionAt {
  readonly energy: number;
  readonly gradient: Gradient;
}

/** Transitions from one level to others, at any parameters; the order of `labels` is kept. */
export function transitionsAt(ion: FieldCase, ground: string, labels: readonly string[], at: FieldParameters): TransitionAt[] {
  const solved = new Map<Block, ReturnType<typeof solveBlock>>();
  const level = (label: string) => {
    const { block, index } = levelPlace(ion, label);
    let solution = solved.get(block);
    if (!solution) {
      solution = solveBlock(block, fieldSign(ion.geometry), at.delta, at.racahB, at.racahC);
      solved.set(block, solution);
    }
    return { energy: solution.energy[index]!, field: solution.field[index]!, b: solution.racahB[index]!, c: solution.racahC[index]! };
  };
  const lower = level(ground);
  return labels.map((label) => {
    const upper = level(label);
    return {
      energy: upper.energy - lower.energy,
      gradient: { delta: upper.field - lower.field, racahB: upper.b - lower.b, racahC: upper.c - lower.c },
    };
  });
}
