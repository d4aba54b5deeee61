import { wholeNumber } from './numbers.ts';
import type { ParameterName } from './types.ts';

/** One band that would help, and what it would do. */
export interface HelpfulBand {
  /** As printed, "4T1g(P)" or "b4T1g". */
  readonly label: string;
  readonly low: number;
  readonly high: number;
  readonly parameter: ParameterName;
  /** u now; null where the parameter is not fixed at all. */
  readonly uNow: number | null;
  readonly uThen: number;
}

/** "b4T1g, expected 36 000 to 40 000 cm-1, would cut u(B) from 107 to 16 cm-1." */
export function helpfulBandSentence(band: HelpfulBand): string {
  const where = `${band.label}, expected ${wholeNumber(band.low)} to ${wholeNumber(band.high)} cm⁻¹,`;
  return band.uNow === null
    ? `${where} would fix ${band.parameter} to about ±${wholeNumber(band.uThen)} cm⁻¹ (one standard uncertainty).`
    : `${where} would cut u(${band.parameter}) from ${wholeNumber(band.uNow)} to ${wholeNumber(band.uThen)} cm⁻¹.`;
}
