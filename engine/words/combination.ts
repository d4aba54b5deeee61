import { concise } from '../quantity/print.ts';
import type { ParameterName } from './types.ts';

/** "Delta − 0.59 C is fixed to 20 410(170) cm⁻¹, whatever C is." */
export function combinationSentence(combination: { first: ParameterName; second: ParameterName; slope: number; value: number; u: number }): string {
  const { first, second, slope, value, u } = combination;
  const factor = Math.abs(slope) < 10 ? Math.abs(slope).toFixed(2) : Math.abs(slope).toFixed(1);
  return `${first} ${slope < 0 ? '−' : '+'} ${factor} ${second} is fixed to ${concise(value, u, 'page')} cm⁻¹ for any ${second} nearby.`;
}
