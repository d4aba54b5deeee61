import type { FreeIon } from '../ions/types.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { Fit } from './fit.ts';
import { spinCrossing } from './groundCheck.ts';
import { levelPlace } from './table.ts';
import type { GroundCase } from './transitions.ts';
import { solveBlock } from '../levels/solve.ts';
import { fieldSign } from '../levels/levels.ts';

/** What the fit says of the ground level. */
export interface GroundState {
  /** Delta/B at which the ground spin changes at this C/B; null where it never does. */
  readonly crossing: number | null;
  /** Field stabilisation of the ground level in units of Delta, negative; and in cm-1. */
  readonly stabilisationInDelta: number;
  readonly stabilisation: number;
}

/** E(4T2g) - E(2Eg) of octahedral d3, with its uncertainty; `decidable` only where C was fitted. */
export interface DoubletOrder {
  readonly gap: number;
  readonly u: number;
  readonly decidable: boolean;
}

export function groundStateOf(ion: GroundCase, fit: Fit): GroundState {
  const { at, ground } = fit.solutions[0]!;
  const { block, index } = levelPlace(ion, ground);
  const field = solveBlock(block, fieldSign(ion.geometry), at.delta, at.racahB, at.racahC).field[index]!;
  // Shown to one decimal: C/B to two is enough, and lets the crossing be held.
  const crossing = at.racahB > 0 ? (spinCrossing(ion, Math.round(fit.ratio.value * 100) / 100)?.deltaOverB ?? null) : null;
  return { crossing, stabilisationInDelta: field, stabilisation: field * at.delta };
}

export function doubletOrder(ion: GroundCase, fit: Fit, freeIon: FreeIon | null): DoubletOrder | null {
  if (ion.electrons !== 3 || ion.geometry !== 'octahedral' || !freeIon) return null;
  const { at, ground } = fit.solutions[0]!;
  const [doublet, quartet] = transitionsAt(ion, ground, ['a2Eg', 'a4T2g'], at);
  const slopes = [
    quartet!.gradient.delta - doublet!.gradient.delta,
    quartet!.gradient.racahB - doublet!.gradient.racahB,
    quartet!.gradient.racahC - doublet!.gradient.racahC,
  ];
  return { gap: quartet!.energy - doublet!.energy, u: Math.sqrt(quadratic(slopes, fit.total)), decidable: fit.mode === 'field, B, C' };
}
