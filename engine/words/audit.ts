import { shownLabel } from '../levels/labels.ts';
import { wholeNumber } from './numbers.ts';
import type { ParameterName } from './types.ts';

/** Why a quoted number may differ from the refitted one. */
export type CauseFacts =
  | { readonly kind: 'factor'; readonly value: number }
  | { readonly kind: 'swapped digits'; readonly value: number }
  | { readonly kind: 'pair'; readonly labels: readonly [string, string] }
  | { readonly kind: 'ratio'; readonly value: number }
  | { readonly kind: 'free ion'; readonly set: string }
  | { readonly kind: 'plain mean' }
  | { readonly kind: 'nanometres' };

/** "Likely the pair 4T2g and b4T1g alone was used." */
export function auditCause(facts: CauseFacts, parameter: ParameterName, electrons: number): string {
  switch (facts.kind) {
    case 'factor':
      if (parameter === 'Delta' && facts.value === 10) return 'Likely Dq was printed as Delta.';
      if (parameter === 'Delta' && facts.value === 0.1) return 'Likely Delta was printed as Dq.';
      return `Likely off by a factor of ${facts.value < 1 ? 1 / facts.value : facts.value}.`;
    case 'swapped digits':
      return `Likely two digits were swapped: ${wholeNumber(facts.value)}.`;
    case 'pair':
      return `Likely taken from ${shownLabel(facts.labels[0], electrons)} and ${shownLabel(facts.labels[1], electrons)} alone.`;
    case 'ratio':
      return `Likely fitted with C/B = ${facts.value}.`;
    case 'free ion':
      return `Likely taken against the free-ion set “${facts.set}”.`;
    case 'plain mean':
      return 'Likely the plain mean of the components was used, not the barycentre weighted by degeneracy.';
    case 'nanometres':
      return 'Likely fitted to positions rounded to whole nanometres.';
  }
}
