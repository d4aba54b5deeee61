import type { FreeIon } from '../ions/types.ts';
import { cellsOf, isAbove, mostCells } from './cells.ts';
import type { Cells, CellTransition } from './cells.ts';
import { evidenceWeights, usualBeta } from './evidenceWeights.ts';
import type { Estimate } from '../policy/types.ts';
import type { GroundCase } from './transitions.ts';

/**
 * A lower bound of the misfit and the parameters' cost of a partial assignment, over every Delta/B (and every C/B where C
 * may be free), cheap enough to cut a search by.
 *
 * The curve is covered by cells (cells.ts). Within a cell a transition is E = rho (e + e_t dt + e_r dr) to second order,
 * so chi2 is a linear least-squares problem in (rho, rho dt, rho dr). Leaving the cell is not forbidden but charged
 * (dt/h)^2 and (dr/h)^2 over `slack`; inside the cell the charge is at most 2/slack, which is taken off again. The least
 * over all cells is therefore no higher than the true chi2, but for what is of second order in a cell.
 *
 * A cell is dropped for good where it lies beyond the limit, or where two bands that have to keep the order of the
 * calculated transitions cannot.
 */
export interface BoundNode {
  /** Cells still possible, ascending. */
  readonly cells: Int32Array;
  /** Sums of the normal equations for each of them: of all bands, then, where spin-forbidden ones may stay out of the fit, of the spin-allowed bands. */
  readonly sums: Float64Array;
  /** Bound in each cell of the fits in which every band takes part, and the best scale there. */
  readonly values: Float64Array;
  readonly scales: Float64Array;
  /** The same bound of the fits that leave spin-forbidden bands out. */
  readonly valuesOfSome: Float64Array;
  /** Bands that keep the order, and the transitions they were given. */
  readonly ordered: readonly Placed[];
  /** How many bands. */
  readonly assigned: number;
  /** How many spin-allowed bands, and what two of them may be forgiven (see `Addition.forgiven`). */
  readonly allowed: number;
  readonly forgiven: number;
  /** Least of misfit and parameters' cost, over fits in which some or all bands take part. */
  readonly least: number;
  /** The same over fits in which every band takes part. */
  readonly leastOfAll: number;
}

interface Placed {
  readonly position: number;
  readonly transition: CellTransition;
}

/** A band with the transition it is given. */
export interface Addition {
  readonly label: string;
  readonly position: number;
  /** u^2 + floor^2, the larger u. */
  readonly variance: number;
  readonly spinAllowed: boolean;
  /**
   * 2 u^2 / variance: two spin-allowed bands that miss a solution by no more than 2 u against each other are fitted by one of
   * them, so their misfit is forgiven.
   */
  readonly forgiven: number;
  /** Whether it must keep the order of the calculated transitions. */
  readonly keepsOrder: boolean;
}

export interface Bound {
  readonly cells: Cells;
  readonly root: BoundNode;
  /** The node with one more band; cells whose bound lies above the limit are dropped. */
  add(node: BoundNode, band: Addition, limit: number): BoundNode;
}

const slack = 4;
const sumsACell = 10;

/** Fewest parameters: of a fit that leaves bands out, of one with all bands, of one with spin-forbidden bands alone. */
const fewest = { ofSome: evidenceWeights.parameter, ofAll: 2 * evidenceWeights.parameter, ofForbidden: 3 * evidenceWeights.parameter } as const;

/**
 * @param ratio C/B that a policy assumes
 * @param forbidden whether spin-forbidden bands may be among the assigned: C may be free then, or they may stay out of the fit
 * @param anyAllowed whether any transition is spin-allowed: without one every fit takes all bands, with C free
 */
export function boundFor(ion: GroundCase, ratio: Estimate, forbidden: boolean, anyAllowed: boolean, freeIon: FreeIon | null): Bound {
  const cells = cellsOf(ion, ratio.value, forbidden);
  // Where spin-forbidden bands may stay out of the fit, the sums of the spin-allowed ones are kept beside those of all.
  const stride = forbidden && anyAllowed ? 2 * sumsACell : sumsACell;
  const ofAllParameters = anyAllowed ? fewest.ofAll : fewest.ofForbidden;
  // With C/B assumed its uncertainty is forgiven to a band that is only compared with the fit.
  const reachAssumed = Math.max(cells.halfRatio, ratio.u);

  /** Bound of fits in which spin-forbidden bands stay out; the sums at `at` are those of the spin-allowed ones and perhaps one of the others. */
  const ofSomeAt = (at: number, i: number, forgiven: number): number => fewest.ofSome + Math.max(0, leastInCell(at, cells, i, reachAssumed, null) - forgiven);

  return {
    cells,
    root: {
      cells: Int32Array.from({ length: cells.count }, (_, i) => i), sums: new Float64Array(cells.count * stride),
      values: new Float64Array(cells.count), scales: new Float64Array(cells.count),
      // Fits that leave bands out are those at the assumed C/B.
      valuesOfSome: Float64Array.from(cells.atRatio, (here) => (anyAllowed && here === 1 ? fewest.ofSome : Number.POSITIVE_INFINITY)),
      ordered: [], assigned: 0, allowed: 0, forgiven: 0, least: anyAllowed ? fewest.ofSome : ofAllParameters, leastOfAll: ofAllParameters,
    },
    add(node, band, limit) {
      const own = cells.transition(band.label);
      const allowed = node.allowed + (band.spinAllowed ? 1 : 0);
      const forgivenSum = node.forgiven + (band.spinAllowed ? band.forgiven : 0);
      const forgiven = allowed <= 2 ? forgivenSum : 0;
      const order = band.keepsOrder ? node.ordered : [];
      let count = 0;
      let least = Number.POSITIVE_INFINITY;
      let leastOfAll = Number.POSITIVE_INFINITY;
      for (let n = 0; n < node.cells.length; n++) {
        const i = node.cells[n]!;
        if (breaksOrder(cells, i, own, band.position, order)) continue;
        const at = count * stride;
        const atAllowed = at + stride - sumsACell;
        copySums(node.sums, n * stride, at, stride);
        addBand(at, own, i, band);
        const ofAll = forbidden ? ofAllParameters + leastInCell(at, cells, i, cells.halfRatio, freeIon) : Number.POSITIVE_INFINITY;
        let ofSome = node.valuesOfSome[n]!;
        if (ofSome < Number.POSITIVE_INFINITY && band.spinAllowed) {
          if (forbidden) addBand(atAllowed, own, i, band);
          ofSome = Math.max(ofSome, ofSomeAt(atAllowed, i, forgiven));
        } else if (ofSome < Number.POSITIVE_INFINITY && allowed > 0) {
          // One band compared costs at least what it would if it took part alone; several cost at least the most of them.
          keptSums.copyWithin(trial, atAllowed, atAllowed + sumsACell);
          addBand(trial, own, i, band);
          ofSome = Math.max(ofSome, ofSomeAt(trial, i, forgiven));
        }
        const value = Math.min(ofAll, ofSome);
        if (value > limit) continue;
        keptCells[count] = i;
        keptValues[count] = forbidden ? ofAll : ofSome;
        keptValuesOfSome[count] = ofSome;
        keptScales[count++] = keptSums[at]! > 0 ? keptSums[at + 6]! / keptSums[at]! : 0;
        if (value < least) least = value;
        if (ofAll < leastOfAll) leastOfAll = ofAll;
      }
      return {
        cells: keptCells.slice(0, count), sums: keptSums.slice(0, count * stride), values: keptValues.slice(0, count),
        valuesOfSome: keptValuesOfSome.slice(0, count), scales: keptScales.slice(0, count),
        least, leastOfAll: forbidden ? leastOfAll : least, assigned: node.assigned + 1, allowed, forgiven: forgivenSum,
        ordered: band.keepsOrder ? [...node.ordered, { transition: own, position: band.position }] : node.ordered,
      };
    },
  };
}

/** Work space for the cells that a step keeps; no ion has more. */
const keptCells = new Int32Array(mostCells);
const keptValues = new Float64Array(mostCells);
const keptValuesOfSome = new Float64Array(mostCells);
const keptScales = new Float64Array(mostCells);
const keptSums = new Float64Array(2 * sumsACell * mostCells + sumsACell);
/** Where sums are tried that are not kept. */
const trial = 2 * sumsACell * mostCells;

function copySums(from: Float64Array, start: number, to: number, stride: number): void {
  for (let k = 0; k < stride; k++) keptSums[to + k] = from[start + k]!;
}

/** Whether the transition lies on the wrong side of an earlier one everywhere in the cell. */
function breaksOrder(cells: Cells, i: number, own: CellTransition, at: number, order: readonly Placed[]): boolean {
  for (let k = 0; k < order.length; k++) {
    const { position, transition } = order[k]!;
    if (position < at ? isAbove(cells, i, transition, own) : position > at && isAbove(cells, i, own, transition)) return true;
  }
  return false;
}

function addBand(at: number, transition: CellTransition, i: number, { position, variance }: Addition): void {
  const weight = 1 / variance;
  const e = transition.e[i]!;
  const et = transition.et[i]!;
  const er = transition.er[i]!;
  const we = weight * e;
  const wt = weight * et;
  const wr = weight * er;
  keptSums[at]! += we * e;
  keptSums[at + 1]! += we * et;
  keptSums[at + 2]! += we * er;
  keptSums[at + 3]! += wt * et;
  keptSums[at + 4]! += wt * er;
  keptSums[at + 5]! += wr * er;
  keptSums[at + 6]! += we * position;
  keptSums[at + 7]! += wt * position;
  keptSums[at + 8]! += wr * position;
  keptSums[at + 9]! += weight * position * position;
}

/**
 * Least of the charged linear problem in one cell, by elimination of dr, dt and rho in turn from the normal equations.
 *
 * @param reach change of C/B that is charged 1 over `slack`
 * @param freeIon where given, a beta outside the usual range costs what it costs in the score
 */
function leastInCell(at: number, cells: Cells, i: number, reach: number, freeIon: FreeIon | null): number {
  const aa = keptSums[at]!;
  const av = keptSums[at + 6]!;
  const vv = keptSums[at + 9]!;
  // A positive scale is needed; its size sets the charge for leaving the cell.
  if (!(aa > 0) || !(av > 0)) return vv;
  const { halfAngle, halfRatio } = cells;
  const perScale = aa / av;
  const chargeOfOne = (perScale * perScale) / slack;
  let ab = keptSums[at + 1]!;
  let bb = keptSums[at + 3]! + chargeOfOne / (halfAngle * halfAngle);
  let bv = keptSums[at + 7]!;
  let aaLeft = aa;
  let avLeft = av;
  let least = vv;
  let charge = 1 / slack;
  if (halfRatio > 0) {
    const bc = keptSums[at + 4]!;
    const cv = keptSums[at + 8]!;
    const inverse = 1 / (keptSums[at + 5]! + chargeOfOne / (reach * reach));
    const ac = keptSums[at + 2]! * inverse;
    least -= cv * cv * inverse;
    ab -= ac * bc;
    bb -= bc * bc * inverse;
    bv -= bc * cv * inverse;
    aaLeft -= ac * keptSums[at + 2]!;
    avLeft -= ac * cv;
    charge += 1 / slack;
  }
  const inverse = 1 / bb;
  least -= bv * bv * inverse;
  aaLeft -= ab * ab * inverse;
  avLeft -= ab * bv * inverse;
  const variance = 1 / aaLeft;
  least -= avLeft * avLeft * variance;
  const ofBeta = freeIon ? leastOfBeta(avLeft * variance, variance, cells.racahB[i]!, cells.spreadB[i]!, freeIon.racahB0) : 0;
  return Math.max(0, least - charge) + ofBeta;
}

/** Least of (rho - best)^2 / variance and the penalty on beta, with B = rho b, where b varies by a fraction in the cell. */
function leastOfBeta(best: number, variance: number, b: number, spread: number, racahB0: number): number {
  const beta = (best * b) / racahB0;
  const beyond = Math.max(usualBeta.low - beta * (1 + spread), beta * (1 - spread) - usualBeta.high);
  if (!(beyond > 0)) return 0;
  return (beyond * beyond) / (usualBeta.step ** 2 + variance * ((b * (1 + spread)) / racahB0) ** 2);
}
