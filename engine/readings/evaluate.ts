import type { FieldParameters, Gradient } from '../levels/levels.ts';
import { fieldSign } from '../levels/levels.ts';
import { diagonalise, levelSlopes } from '../levels/solve.ts';
import type { Diagonal } from '../levels/solve.ts';
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
  const sign = fieldSign(ion.geometry);
  const solved = new Map<Block, Diagonal>();
  const level = (label: string) => {
    const { block, index } = levelPlace(ion, label);
    let diagonal = solved.get(block);
    if (!diagonal) {
      diagonal = diagonalise(block, sign, at.delta, at.racahB, at.racahC);
      solved.set(block, diagonal);
    }
    const { field, racahB, racahC } = levelSlopes(block, sign, diagonal, index);
    return { energy: at.delta * field + at.racahB * racahB + at.racahC * racahC, field, b: racahB, c: racahC };
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
