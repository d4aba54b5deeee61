import { significant } from '../quantity/print.ts';
import { listed, wholeNumber } from './numbers.ts';
import type { ParameterName } from './types.ts';

/** What one more band would do to one number: u now (null: not fixed) and then, cm-1. */
export interface Gain {
  readonly parameter: ParameterName;
  readonly uNow: number | null;
  readonly uThen: number;
}

/** "b4T1g, expected 36 000 to 40 000 cm-1, would cut u(B) from 107 to 16 cm-1 and fix C to about ±90 cm-1." */
export function helpfulBandSentence(label: string, low: number, high: number, gains: readonly Gain[]): string {
  const parts = gains.map(({ parameter, uNow, uThen }) =>
    uNow === null ? `fix ${parameter} to about ±${significant(uThen, 2, 'page')} cm⁻¹` : `cut u(${parameter}) from ${wholeNumber(uNow)} to ${wholeNumber(uThen)} cm⁻¹`,
  );
  return `${label}, expected ${wholeNumber(low)} to ${wholeNumber(high)} cm⁻¹, would ${listed(parts)}.`;
}
