import { levelNames } from '../levels/labels.ts';
import { fieldSign } from '../levels/levels.ts';
import { solveBlock } from '../levels/solve.ts';
import { highestRatio, lowestRatio } from './freeRatio.ts';
import { angleScale, levelPlace } from './table.ts';
import type { GroundCase } from './transitions.ts';

/**
 * A lower bound of chi2 for a partial assignment, over every Delta/B (and every C/B from 2 to 9 where C may be
 * free), cheap enough to cut a search by.
 *
 * The curve is covered by cells. Within a cell a transition is E = rho (e + e_t dt + e_r dr) to second order, so
 * chi2 is a linear least-squares problem in (rho, rho dt, rho dr). Leaving the cell is not forbidden but charged
 * (dt/h)^2 and (dr/h)^2 over `slack`; inside the cell the charge is at most 2/slack, which is taken off again.
 * The least over all cells is therefore no higher than the true chi2, but for what is of second order in a cell.
 */
interface Cells {
  readonly count: number;
  readonly halfAngle: number;
  /** 0 where C/B is fixed. */
  readonly halfRatio: number;
  /** Transition energies and derivatives by label; computed on first use. */
  transition(label: string): { readonly e: Float64Array; readonly et: Float64Array; readonly er: Float64Array };
}

const slack = 4;
const fixedRatioCells = 90;
const freeRatioAngleCells = 45;
const freeRatios = [2.875, 4.625, 6.375, 8.125];

const held = new Map<string, Cells>();

/** Cells of an ion at one C/B, or over all C/B (null). */
function cellsOf(ion: GroundCase, ratio: number | null): Cells {
  const key = `${ion.electrons} ${ion.geometry} ${ion.multiplicity} ${ratio}`;
  let cells = held.get(key);
  if (!cells) {
    cells = makeCells(ion, ratio);
    if (held.size > 200) held.delete(held.keys().next().value!);
    held.set(key, cells);
  }
  return cells;
}

function makeCells(ion: GroundCase, ratio: number | null): Cells {
  const angles = ratio === null ? freeRatioAngleCells : fixedRatioCells;
  const ratios = ratio === null ? freeRatios : [ratio];
  const width = Math.PI / 2 / angles;
  const centres = ratios.flatMap((r) => Array.from({ length: angles }, (_, i) => ({ t: (i + 0.5) * width, r })));
  const known = new Map<string, { e: Float64Array; et: Float64Array; er: Float64Array }>();
  const sign = fieldSign(ion.geometry);
  const solved = new Map<object, ReturnType<typeof solveBlock>[]>();
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
  return {
    count: centres.length,
    halfAngle: width / 2,
    halfRatio: ratio === null ? (highestRatio - lowestRatio) / freeRatios.length / 2 : 0,
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

/** Sums of the normal equations at every cell, for the bands assigned so far. */
const sumsACell = 10;

export interface Bound {
  /** Sums with one more band; the given sums are not changed. null: no band yet. */
  add(sums: Float64Array | null, label: string, position: number, variance: number): Float64Array;
  /** Lower bound of chi2 for the bands in the sums. */
  least(sums: Float64Array | null): number;
}

/**
 * The bound for an ion.
 *
 * @param ratio C/B; null where C may be free
 */
export function boundFor(ion: GroundCase, ratio: number | null): Bound {
  const cells = cellsOf(ion, ratio);
  return {
    add(sums, label, position, variance) {
      const next = sums ? sums.slice() : new Float64Array(cells.count * sumsACell);
      const { e, et, er } = cells.transition(label);
      const weight = 1 / variance;
      for (let i = 0, at = 0; i < cells.count; i++, at += sumsACell) {
        const a = e[i]!;
        const b = et[i]!;
        const c = er[i]!;
        const wa = weight * a;
        const wb = weight * b;
        const wc = weight * c;
        next[at]! += wa * a;
        next[at + 1]! += wa * b;
        next[at + 2]! += wa * c;
        next[at + 3]! += wb * b;
        next[at + 4]! += wb * c;
        next[at + 5]! += wc * c;
        next[at + 6]! += wa * position;
        next[at + 7]! += wb * position;
        next[at + 8]! += wc * position;
        next[at + 9]! += weight * position * position;
      }
      return next;
    },
    least(sums) {
      if (!sums) return 0;
      let best = Number.POSITIVE_INFINITY;
      for (let i = 0, at = 0; i < cells.count; i++, at += sumsACell) {
        const value = leastInCell(sums, at, cells.halfAngle, cells.halfRatio);
        if (value < best) best = value;
      }
      return Math.max(0, best - (cells.halfRatio > 0 ? 2 : 1) / slack);
    },
  };
}

/** Least of the charged linear problem in one cell, by elimination of the 3 x 3 (or 2 x 2) normal equations. */
function leastInCell(sums: Float64Array, at: number, halfAngle: number, halfRatio: number): number {
  const aa = sums[at]!;
  const av = sums[at + 6]!;
  const vv = sums[at + 9]!;
  // A positive scale is needed; its size sets the charge for leaving the cell.
  if (!(aa > 0) || !(av > 0)) return vv;
  const rho = av / aa;
  const ab = sums[at + 1]!;
  const bb = sums[at + 3]! + 1 / (slack * (rho * halfAngle) ** 2);
  const bv = sums[at + 7]!;
  const first = av / aa;
  let least = vv - av * first;
  const bbLeft = bb - (ab * ab) / aa;
  const bvLeft = bv - ab * first;
  least -= (bvLeft * bvLeft) / bbLeft;
  if (halfRatio > 0) {
    const ac = sums[at + 2]!;
    const bc = sums[at + 4]!;
    const cc = sums[at + 5]! + 1 / (slack * (rho * halfRatio) ** 2);
    const cv = sums[at + 8]!;
    const bcLeft = bc - (ab * ac) / aa;
    const ccLeft = cc - (ac * ac) / aa - (bcLeft * bcLeft) / bbLeft;
    const cvLeft = cv - ac * first - (bcLeft * bvLeft) / bbLeft;
    least -= (cvLeft * cvLeft) / ccLeft;
  }
  return least;
}
