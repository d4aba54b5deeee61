import { levelNames } from '../levels/labels.ts';
import { fieldSign } from '../levels/levels.ts';
import { solveBlock } from '../levels/solve.ts';
import type { BlockSolution } from '../levels/solve.ts';
import type { Block } from '../shell/blocks.ts';
import { highestRatio, lowestRatio } from './freeRatio.ts';
import { angleScale, levelPlace } from './table.ts';
import type { GroundCase } from './transitions.ts';

/** Transition energies at the centres of cells, with their derivatives by t and by C/B, for rho = 1. */
export interface CellTransition {
  readonly e: Float64Array;
  readonly et: Float64Array;
  readonly er: Float64Array;
}

/** Cells that cover every Delta/B, and every C/B where it may be free. */
export interface Cells {
  readonly count: number;
  readonly halfAngle: number;
  /** 0 where C/B is fixed. */
  readonly halfRatio: number;
  /** t at the centre of each cell. */
  readonly angle: Float64Array;
  /** 1 where the assumed C/B lies in the cell. */
  readonly atRatio: Uint8Array;
  /** B at the centre of each cell for rho = 1, and by which fraction it varies inside. */
  readonly racahB: Float64Array;
  readonly spreadB: Float64Array;
  /** Transition energies and derivatives by label; computed on first use. */
  transition(label: string): CellTransition;
}

const fixedRatioCells = 90;
const freeRatioAngleCells = 45;
const freeRatioCells = 4;

/** No covering has more cells. */
export const mostCells = Math.max(fixedRatioCells, freeRatioAngleCells * freeRatioCells);

/** By this much of B, and this part of what the derivatives give, a difference of transitions may bend within a cell. */
const bendOfB = 0.05;
const bendOfSlope = 0.2;

const held = new Map<string, Cells>();

/**
 * Cells of an ion at one C/B, or over all C/B.
 *
 * @param ratio C/B where it is fixed; else it is only among those covered
 */
export function cellsOf(ion: GroundCase, ratio: number, free: boolean): Cells {
  const key = `${ion.electrons} ${ion.geometry} ${ion.multiplicity} ${ratio} ${free}`;
  let cells = held.get(key);
  if (!cells) {
    const low = Math.min(lowestRatio, ratio);
    const width = (Math.max(highestRatio, ratio) - low) / freeRatioCells;
    cells = free
      ? makeCells(ion, ratio, Array.from({ length: freeRatioCells }, (_, i) => low + (i + 0.5) * width), freeRatioAngleCells, width / 2)
      : makeCells(ion, ratio, [ratio], fixedRatioCells, 0);
    if (held.size > 200) held.delete(held.keys().next().value!);
    held.set(key, cells);
  }
  return cells;
}

function makeCells(ion: GroundCase, assumed: number, ratios: readonly number[], angles: number, halfRatio: number): Cells {
  const width = Math.PI / 2 / angles;
  const centres = ratios.flatMap((r) => Array.from({ length: angles }, (_, i) => ({ t: (i + 0.5) * width, r })));
  const known = new Map<string, CellTransition>();
  const sign = fieldSign(ion.geometry);
  const solved = new Map<Block, BlockSolution[]>();
  const absolute = (label: string, i: number): { e: number; et: number; er: number } => {
    const { block, index } = levelPlace(ion, label);
    let solutions = solved.get(block);
    if (!solutions) {
      solutions = centres.map(({ t, r }) => solveBlock(block, sign, angleScale * Math.sin(t), Math.cos(t), r * Math.cos(t)));
      solved.set(block, solutions);
    }
    const solution = solutions[i]!;
    const { t, r } = centres[i]!;
    const field = solution.field[index]!;
    const racahC = solution.racahC[index]!;
    return {
      e: solution.energy[index]!,
      et: field * angleScale * Math.cos(t) - (solution.racahB[index]! + r * racahC) * Math.sin(t),
      er: racahC * Math.cos(t),
    };
  };
  const ofSpin = levelNames(ion.electrons, ion.geometry).filter(
    (label) => label.startsWith('a') && levelPlace(ion, label).block.multiplicity === ion.multiplicity,
  );
  const ground = centres.map((_, i) => ofSpin.map((label) => absolute(label, i)).reduce((lowest, level) => (level.e < lowest.e ? level : lowest)));
  const halfAngle = width / 2;
  return {
    count: centres.length, halfAngle, halfRatio,
    angle: Float64Array.from(centres, ({ t }) => t),
    atRatio: Uint8Array.from(centres, ({ r }) => (Math.abs(assumed - r) <= halfRatio * (1 + 1e-9) ? 1 : 0)),
    racahB: Float64Array.from(centres, ({ t }) => Math.cos(t)),
    // To first order and a little more; the last cells reach B = 0.
    spreadB: Float64Array.from(centres, ({ t }) => Math.min(1, 1.1 * halfAngle * Math.tan(t))),
    transition(label) {
      let found = known.get(label);
      if (!found) {
        found = { e: new Float64Array(centres.length), et: new Float64Array(centres.length), er: new Float64Array(centres.length) };
        for (let i = 0; i < centres.length; i++) {
          const level = absolute(label, i);
          found.e[i] = level.e - ground[i]!.e;
          found.et[i] = level.et - ground[i]!.et;
          found.er[i] = level.er - ground[i]!.er;
        }
        known.set(label, found);
      }
      return found;
    },
  };
}

/** Whether one transition lies above another everywhere in a cell, by more than a margin for rho = 1. */
export function isAbove({ halfAngle, halfRatio }: Cells, cell: number, upper: CellTransition, lower: CellTransition, margin = 0): boolean {
  const least = upper.e[cell]! - lower.e[cell]! - bendOfB - margin;
  if (least <= 0) return false;
  const reach = Math.abs(upper.et[cell]! - lower.et[cell]!) * halfAngle + Math.abs(upper.er[cell]! - lower.er[cell]!) * halfRatio;
  return least > (1 + bendOfSlope) * reach;
}

/** How many electrons a transition promotes to e: its derivative by Delta. */
export function promoted({ angle }: Cells, cell: number, { e, et }: CellTransition): number {
  const t = angle[cell]!;
  return (e[cell]! * Math.sin(t) + et[cell]! * Math.cos(t)) / angleScale;
}
