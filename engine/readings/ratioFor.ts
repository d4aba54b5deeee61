import type { Policy } from '../policy/types.ts';
import type { RatioUsed } from './types.ts';

/** What the policy says of C/B for an ion. */
export function ratioFor(policy: Policy, ionName: string): RatioUsed {
  const own = policy.cOverB.perIon[ionName];
  return own ? { ...own, origin: 'policy for this ion' } : { ...policy.cOverB.general, origin: 'policy' };
}
