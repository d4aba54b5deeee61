import type { FreeIon } from '../ions/types.ts';
import { quadratic } from './covariance.ts';
import { transitionsAt } from './evaluate.ts';
import type { Fit } from './fitTypes.ts';
import { spinCrossing } from './groundCheck.ts';
import { levelPlace } from './table.ts';
import type { GroundCase } from './transitions.ts';
import { solveBlock } from '../levels/solve.ts';
import { fieldSign } from '../levels/levels.ts';
import type { DoubletOrder, GroundState } from './types.ts';

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
