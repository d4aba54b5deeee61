import { inversePositive } from '../linear/solveSymmetric.ts';
import { termEnergies } from './termFormulas.ts';
import type { Term } from './terms.ts';

/** Racah parameters that fit a list of term energies best, in cm-1. */
export interface TermFit {
  readonly racahB: number;
  readonly racahC: number;
  /** Energy of the barycentre that the observed scale calls zero: observed = formula + offset. */
  readonly offset: number;
  /** Root of the mean squared residual over all terms. */
  readonly rms: number;
  /** observed - calculated, in the order of the terms given. */
  readonly residuals: readonly number[];
}

const maximumSteps = 60;

/**
 * Unweighted least squares of B, C and a common offset over free-ion terms, by Gauss-Newton steps on the published formulas.
 * Terms of one kind are paired by energy order: an observed "2D'" goes with the second 2D of the formulas.
 * `terms` are energies in cm-1 above any common zero. Three terms or more are needed; three are met exactly and leave
 * nothing to judge the fit by (rms is then 0 by construction).
 * Throws RangeError for fewer terms, a term the d count has not, or terms that do not fix B and C.
 * Held by tests/engine/ions/fitTerms.test.ts.
 */
export function fitTerms(electrons: number, terms: readonly Term[]): TermFit {
  if (terms.length < 3) throw new RangeError(`fitTerms: ${terms.length} terms given, at least 3 are needed for B, C and an offset`);
  let [racahB, racahC, offset] = [900, 3600, 0];
  for (let step = 0; step < maximumSteps; step += 1) {
    const rows = compare(electrons, terms, racahB, racahC, offset);
    const slopes = rows.map(({ gradient }) => [gradient.racahB, gradient.racahC, 1]);
    const normal = [0, 1, 2].map((i) => [0, 1, 2].map((j) => slopes.reduce((sum, row) => sum + row[i]! * row[j]!, 0)));
    const inverse = inversePositive(normal);
    if (!inverse || isSingular(normal, inverse)) throw new RangeError(`fitTerms: the ${terms.length} terms of d${electrons} do not fix B and C`);
    const right = [0, 1, 2].map((i) => slopes.reduce((sum, row, k) => sum + row[i]! * rows[k]!.residual, 0));
    const [changeB, changeC, changeOffset] = inverse.map((row) => row.reduce((sum, value, j) => sum + value * right[j]!, 0)) as [number, number, number];
    racahB += changeB;
    racahC += changeC;
    offset += changeOffset;
    if (Math.abs(changeB) + Math.abs(changeC) < 1e-8) {
      const residuals = compare(electrons, terms, racahB, racahC, offset).map(({ residual }) => residual);
      return { racahB, racahC, offset, residuals, rms: Math.sqrt(residuals.reduce((sum, r) => sum + r * r, 0) / residuals.length) };
    }
  }
  throw new RangeError(`fitTerms: no convergence in ${maximumSteps} steps for the ${terms.length} terms of d${electrons}`);
}

/** A parameter that others can stand in for has a variance inflation (N_ii times its inverse's N_ii) beyond all rounding. */
function isSingular(normal: readonly (readonly number[])[], inverse: readonly (readonly number[])[]): boolean {
  return normal.some((row, i) => row[i]! * inverse[i]![i]! > 1e12);
}

function compare(electrons: number, terms: readonly Term[], racahB: number, racahC: number, offset: number) {
  const calculated = new Map(termEnergies(electrons, racahB, racahC).map((value) => [value.term, value]));
  return terms.map(({ term, energy }) => {
    const match = calculated.get(term);
    if (match === undefined) throw new RangeError(`fitTerms: d${electrons} has no term ${term}`);
    return { residual: energy - match.energy - offset, gradient: match.gradient };
  });
}
