import type { FreeIon } from '../ions/types.ts';
import { usualBeta } from './evidenceWeights.ts';

/** Penalty, on the scale of chi2, on a beta outside 0.5 to 1.0; 0 where B0 is not known. */
export function betaPenalty(racahB: number, freeIon: FreeIon | null): number {
  if (!freeIon) return 0;
  const beta = racahB / freeIon.racahB0;
  const { low, high, step } = usualBeta;
  const beyond = beta > high ? beta - high : beta < low ? low - beta : 0;
  return (beyond / step) ** 2;
}
