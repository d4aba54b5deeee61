import { levelNames } from '#engine';
import { levelLabel } from '../../../engine/levels/levels.ts';
import { solveBlock } from '../../../engine/levels/solve.ts';
import type { Target } from '../../../engine/readings/misfit.ts';
import { angleScale } from '../../../engine/readings/table.ts';
import type { GroundCase } from '../../../engine/readings/transitions.ts';
import { shellBlocks } from '../../../engine/shell/blocks.ts';

// chi2 along the curve Delta = 20 rho sin t, B = rho cos t, C = (C/B) B by plain trial at every point of a fine grid:
// what the scan of the engine, with its brackets and its interpolation, is held against.

/** Levels at every point of the fine grid, rho = 1. */
export interface FineCurve {
  readonly ion: GroundCase;
  readonly ratio: number;
  readonly step: number;
  readonly energies: ReadonlyMap<string, Float64Array>;
  /** Energy of the lowest level of the declared multiplicity, and which one it is. */
  readonly lowest: Float64Array;
  readonly names: readonly string[];
  /** Place in `names` of the lowest level at each point. */
  readonly which: Uint8Array;
  readonly lowestLabel: (i: number) => string;
  /** Grid indices just above which another level becomes lowest. */
  readonly changes: readonly number[];
}

export const finePieces = 100_000;

export function fineCurve(ion: GroundCase, ratio: number, labels: readonly string[]): FineCurve {
  const { electrons, geometry, multiplicity } = ion;
  const step = Math.PI / 2 / finePieces;
  const energies = new Map(labels.map((label) => [label, new Float64Array(finePieces + 1)]));
  const lowest = new Float64Array(finePieces + 1).fill(Number.POSITIVE_INFINITY);
  const which = new Uint8Array(finePieces + 1);
  const names: string[] = [];
  for (const block of shellBlocks(electrons)) {
    const ownLabels = Array.from({ length: block.size }, (_, index) => levelLabel(block, index + 1, geometry));
    const mayBeLowest = block.multiplicity === multiplicity;
    if (!mayBeLowest && !ownLabels.some((label) => energies.has(label))) continue;
    const columns = ownLabels.map((label) => energies.get(label));
    for (let i = 0; i <= finePieces; i++) {
      const b = Math.cos(i * step);
      const { energy } = solveBlock(block, geometry === 'octahedral' ? 1 : -1, angleScale * Math.sin(i * step), b, ratio * b);
      columns.forEach((column, index) => {
        if (column) column[i] = energy[index]!;
      });
      if (mayBeLowest && energy[0]! < lowest[i]!) {
        lowest[i] = energy[0]!;
        which[i] = names.length;
      }
    }
    names.push(ownLabels[0]!);
  }
  const changes: number[] = [];
  // At the very ends levels coincide, and rounding decides which is lowest.
  for (let i = 2; i < finePieces; i++) if (which[i] !== which[i - 1]) changes.push(i - 1);
  return { ion, ratio, step, energies, lowest, names, which, lowestLabel: (i) => names[which[i]!]!, changes };
}

/** Readings with u on each side, as plain columns for the inner loop. */
interface Columns {
  readonly observed: Float64Array;
  readonly below: Float64Array;
  readonly above: Float64Array;
  readonly alike: boolean;
}

const columnsOf = (targets: readonly Target[]): Columns => ({
  observed: Float64Array.from(targets, (target) => target.observed),
  below: Float64Array.from(targets, (target) => target.weightBelow),
  above: Float64Array.from(targets, (target) => target.weightAbove),
  alike: targets.every((target) => target.weightBelow === target.weightAbove),
});

/** The best scale by Newton's steps on the convex, piecewise quadratic chi2(rho); written apart from the engine's. */
function bestByNewton({ observed, below, above, alike }: Columns, energies: Float64Array): number {
  let rho = Number.NaN;
  for (let round = 0; round < 50; round++) {
    let products = 0;
    let squares = 0;
    for (let k = 0; k < observed.length; k++) {
      const energy = energies[k]!;
      const weighted = energy * (rho * energy > observed[k]! ? above[k]! : below[k]!);
      products += weighted * observed[k]!;
      squares += weighted * energy;
    }
    const next = products / squares;
    if (alike || next === rho) return next;
    rho = next;
  }
  return rho;
}

function misfitOf({ observed, below, above }: Columns, energies: Float64Array, rho: number): number {
  let sum = 0;
  for (let k = 0; k < observed.length; k++) {
    const miss = observed[k]! - rho * energies[k]!;
    sum += (miss > 0 ? below[k]! : above[k]!) * miss * miss;
  }
  return sum;
}

/**
 * Least chi2 at every grid point; NaN where no positive scale is best. From point to point the sides on which the readings lie rarely
 * change, so each point starts with those of the last: the best scale of a set of sides is right where it leaves them as they are.
 */
export function trialMisfits(curve: FineCurve, labels: readonly string[], targets: readonly Target[], into: Float64Array): Float64Array {
  const levels = labels.map((label) => curve.energies.get(label)!);
  const { observed, below, above } = columnsOf(targets);
  const size = labels.length;
  const energies = new Float64Array(size);
  const weights = Float64Array.from(below);
  // From the ground level to itself there is no transition.
  const itself = curve.names.map((name) => labels.includes(name));
  const { lowest, which } = curve;
  for (let i = 0; i <= finePieces; i++) {
    const ground = lowest[i]!;
    for (let k = 0; k < size; k++) energies[k] = levels[k]![i]! - ground;
    let rho = 0;
    for (let round = 0, changed = true; changed && round < 50; round++) {
      let products = 0;
      let squares = 0;
      for (let k = 0; k < size; k++) {
        const weighted = weights[k]! * energies[k]!;
        products += weighted * observed[k]!;
        squares += weighted * energies[k]!;
      }
      rho = products / squares;
      changed = false;
      for (let k = 0; k < size; k++) {
        const weight = rho * energies[k]! > observed[k]! ? above[k]! : below[k]!;
        if (weight !== weights[k]!) changed = true;
        weights[k] = weight;
      }
    }
    let sum = 0;
    for (let k = 0; k < size; k++) {
      const miss = observed[k]! - rho * energies[k]!;
      sum += weights[k]! * miss * miss;
    }
    into[i] = rho > 0 && !itself[which[i]!] ? sum : Number.NaN;
  }
  return into;
}

/**
 * Size of the rounding in a chi2 that is a sum of squares of differences of these readings. A transition is a difference of two
 * levels: where it is small against them, `cancellation` times, it has lost as many figures.
 */
export function roundingOf(targets: readonly Target[], cancellation = 1): number {
  return (1e-12 + 8 * Number.EPSILON * cancellation) * targets.reduce((sum, { observed, weightBelow, weightAbove }) => sum + Math.max(weightBelow, weightAbove) * observed ** 2, 0);
}

/** How many times larger than the smallest transition the levels at a grid point are. */
export function cancellationAt(curve: FineCurve, labels: readonly string[], i: number): number {
  return Math.max(...labels.map((label) => {
    const energy = curve.energies.get(label)![i]!;
    return (Math.abs(energy) + Math.abs(curve.lowest[i]!)) / Math.abs(energy - curve.lowest[i]!);
  }));
}

/** Whether tried values between two grid points nowhere rise above the first by more than `least`: they lie in one valley as far as can be told. */
export function inOneValley(misfits: Float64Array, from: number, to: number, least: number): boolean {
  for (let i = Math.min(from, to); i <= Math.max(from, to); i++) if (!(misfits[i]! - misfits[from]! <= least)) return false;
  return true;
}

/**
 * Grid indices of the local minima of tried values that rise on both sides by more than `least`, away from both
 * ends and from every change of the lowest level by at least two points.
 */
export function trialMinima(curve: FineCurve, misfits: Float64Array, least: number): number[] {
  const found: number[] = [];
  const rises = (from: number, direction: 1 | -1): boolean => {
    for (let i = from + direction; i >= 0 && i <= finePieces; i += direction) {
      const over = misfits[i]! - misfits[from]!;
      if (Number.isNaN(over) || over < 0) return false;
      if (over > least) return true;
    }
    return false;
  };
  for (let i = 2; i < finePieces - 1; i++)
    if (misfits[i]! < misfits[i - 1]! && misfits[i]! <= misfits[i + 1]! && !curve.changes.some((change) => Math.abs(change + 0.5 - i) < 2.5) && rises(i, -1) && rises(i, 1))
      found.push(i);
  return found;
}

/** Least chi2 at any t from levels solved there, the ground level given. */
export function misfitAt(curve: Pick<FineCurve, 'ion' | 'ratio'>, ground: string, labels: readonly string[], targets: readonly Target[], t: number): { chi2: number; rho: number } {
  const energyOf = (label: string): number => energyAt(curve, label, t);
  const lower = energyOf(ground);
  const energies = Float64Array.from(labels, (label) => energyOf(label) - lower);
  const columns = columnsOf(targets);
  const rho = bestByNewton(columns, energies);
  return { chi2: misfitOf(columns, energies, rho), rho };
}

/** Absolute energy of one level at t, rho = 1. */
export function energyAt({ ion, ratio }: Pick<FineCurve, 'ion' | 'ratio'>, label: string, t: number): number {
  for (const block of shellBlocks(ion.electrons))
    for (let index = 0; index < block.size; index++)
      if (levelLabel(block, index + 1, ion.geometry) === label)
        return solveBlock(block, ion.geometry === 'octahedral' ? 1 : -1, angleScale * Math.sin(t), Math.cos(t), ratio * Math.cos(t)).energy[index]!;
  throw new Error(`no level ${label}`);
}

/** The lowest level of the declared multiplicity at t, by its energy. */
export function lowestAt({ ion, ratio }: Pick<FineCurve, 'ion' | 'ratio'>, t: number): number {
  const names = levelNames(ion.electrons, ion.geometry).filter((label) => label.startsWith(`a${ion.multiplicity}`));
  return Math.min(...names.map((label) => energyAt({ ion, ratio }, label, t)));
}

