import type { FieldParameters, Gradient } from '../levels/levels.ts';
import { fieldSign } from '../levels/levels.ts';
import { diagonalise, levelBends, levelSlopes } from '../levels/solve.ts';
import type { LevelBends, LevelSlopes } from '../levels/solve.ts';
import type { Block } from '../shell/blocks.ts';
import { levelPlace } from './table.ts';
import type { FieldCase } from './table.ts';

/** A transition at given parameters: energy in cm-1 and exact derivatives by Delta, B and C. */
export interface TransitionAt {
  readonly energy: number;
  readonly gradient: Gradient;
}

/**
 * Transitions from one level to others, prepared to be evaluated many times without allocation. The arrays hold
 * the last place asked for, one entry a transition.
 */
export interface Evaluator {
  readonly energy: Float64Array;
  /** d energy / d Delta, B, C. */
  readonly delta: Float64Array;
  readonly racahB: Float64Array;
  readonly racahC: Float64Array;
  /** Second derivatives, where they were asked for. */
  readonly bends: readonly LevelBends[];
  evaluate(delta: number, racahB: number, racahC: number): void;
}

interface Wanted {
  /** Place of the level in its block. */
  readonly level: number;
  /** Place among the transitions; -1 for the ground level. */
  readonly slot: number;
}

interface Solved {
  readonly block: Block;
  readonly wanted: Wanted[];
}

/** The levels asked for, gathered by block, so that each block is solved once; the ground level is the very first. */
function byBlock(ion: FieldCase, ground: string, labels: readonly string[]): readonly Solved[] {
  const lowest = levelPlace(ion, ground);
  const found: Solved[] = [{ block: lowest.block, wanted: [{ level: lowest.index, slot: -1 }] }];
  for (let slot = 0; slot < labels.length; slot++) {
    const { block, index } = levelPlace(ion, labels[slot]!);
    const entry = found.find((one) => one.block === block);
    if (entry) entry.wanted.push({ level: index, slot });
    else found.push({ block, wanted: [{ level: index, slot }] });
  }
  return found;
}

const noBend = (): LevelBends => ({ fieldField: 0, fieldB: 0, fieldC: 0, bB: 0, bC: 0, cC: 0 });

/** Derivatives of the level at hand and of the ground level. */
const slopes: LevelSlopes = { field: 0, racahB: 0, racahC: 0 };
const groundSlopes: LevelSlopes = { field: 0, racahB: 0, racahC: 0 };
const groundBend = noBend();

function subtract(bend: LevelBends, other: LevelBends): void {
  bend.fieldField -= other.fieldField;
  bend.fieldB -= other.fieldB;
  bend.fieldC -= other.fieldC;
  bend.bB -= other.bB;
  bend.bC -= other.bC;
  bend.cC -= other.cC;
}

/**
 * Prepares the transitions from the ground level to the levels named; labels in letter form.
 *
 * @param withBends whether second derivatives are wanted too
 */
export function evaluatorOf(ion: FieldCase, ground: string, labels: readonly string[], withBends = false): Evaluator {
  const sign = fieldSign(ion.geometry);
  const plan = byBlock(ion, ground, labels);
  const count = labels.length;
  const energy = new Float64Array(count);
  const delta = new Float64Array(count);
  const racahB = new Float64Array(count);
  const racahC = new Float64Array(count);
  const bends = withBends ? labels.map(noBend) : [];
  return {
    energy, delta, racahB, racahC, bends,
    evaluate(atDelta, atB, atC) {
      for (const { block, wanted } of plan) {
        const diagonal = diagonalise(block, sign, atDelta, atB, atC);
        for (const { level, slot } of wanted) {
          levelSlopes(block, sign, diagonal, level, slot < 0 ? groundSlopes : slopes);
          if (withBends) levelBends(block, sign, diagonal, level, slot < 0 ? groundBend : bends[slot]!);
          if (slot < 0) continue;
          if (withBends) subtract(bends[slot]!, groundBend);
          delta[slot] = slopes.field - groundSlopes.field;
          racahB[slot] = slopes.racahB - groundSlopes.racahB;
          racahC[slot] = slopes.racahC - groundSlopes.racahC;
          // Energies are homogeneous of degree one: Euler's theorem is more exact than the eigenvalues.
          energy[slot] = atDelta * delta[slot]! + atB * racahB[slot]! + atC * racahC[slot]!;
        }
      }
    },
  };
}

/** Transitions from one level to others, at any parameters; the order of `labels` is kept. */
export function transitionsAt(ion: FieldCase, ground: string, labels: readonly string[], at: FieldParameters): TransitionAt[] {
  const { energy, delta, racahB, racahC, evaluate } = evaluatorOf(ion, ground, labels);
  evaluate(at.delta, at.racahB, at.racahC);
  return labels.map((_, k) => ({ energy: energy[k]!, gradient: { delta: delta[k]!, racahB: racahB[k]!, racahC: racahC[k]! } }));
}
