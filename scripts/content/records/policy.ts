// policy.yaml and overrides turned into the engine's policy.

import { defaultPolicy, toWavenumber } from '#engine';
import type { Policy, Quantity } from '#engine';
import type { z } from 'zod';
import type { overrideSchema, policySchema } from '../schema/policy.ts';

export type PolicyFile = z.output<typeof policySchema>;
export type PolicyOverride = z.output<typeof overrideSchema>;

const energyOr = (typed: Quantity | undefined, otherwise: number): number => (typed === undefined ? otherwise : toWavenumber(typed).position);
const shareOr = (typed: Quantity | undefined, otherwise: number): number => (typed === undefined ? otherwise : typed.value / 100);

type Common = Pick<PolicyFile, 'C' | 'floors' | 'ceilings' | 'rival-margin' | 'default-uncertainties'>;

function withCommon(base: Policy, typed: Common): Policy {
  const { floors, ceilings } = typed;
  const defaults = typed['default-uncertainties'];
  return {
    ...base,
    floors: {
      general: energyOr(floors?.general, base.floors.general),
      spinFlip: energyOr(floors?.['spin-flip'], base.floors.spinFlip),
      twoElectron: energyOr(floors?.['two-electron'], base.floors.twoElectron),
    },
    ceilings: {
      delta: shareOr(ceilings?.Delta, base.ceilings.delta),
      racahB: shareOr(ceilings?.B, base.ceilings.racahB),
      racahC: shareOr(ceilings?.C, base.ceilings.racahC),
    },
    cFitted: typed.C === undefined ? base.cFitted : typed.C === 'fitted where determinable',
    rivalMargin: typed['rival-margin'] ?? base.rivalMargin,
    defaultUncertainties: {
      maximum: energyOr(defaults?.maximum, base.defaultUncertainties.maximum),
      line: energyOr(defaults?.line, base.defaultUncertainties.line),
    },
  };
}

/** The collection's policy: what is typed, and the defaults for the rest. */
export function policyOf(typed: PolicyFile): Policy {
  const common = withCommon(defaultPolicy, typed);
  const difference = typed['differential-floor'];
  return {
    ...common,
    name: typed.name ?? defaultPolicy.name,
    cOverB: ratiosOf(typed['C/B'], defaultPolicy),
    differentialFloor: {
      delta: energyOr(difference?.Delta, defaultPolicy.differentialFloor.delta),
      racahB: shareOr(difference?.B, defaultPolicy.differentialFloor.racahB),
    },
    freeIons: typed['free-ions'] ?? defaultPolicy.freeIons,
  };
}

function ratiosOf(typed: PolicyFile['C/B'], base: Policy): Policy['cOverB'] {
  if (typed === undefined) return base.cOverB;
  if ('value' in typed && typeof typed.value === 'number') return { general: typed as { value: number; u: number }, perIon: {} };
  const { general, ...perIon } = typed as Record<string, { value: number; u: number }>;
  return { general: general ?? base.cOverB.general, perIon };
}

/** The policy of one measurement: the collection's with the overridden value. A C/B of its own replaces that of its ion. */
export function overriddenPolicy(policy: Policy, override: PolicyOverride): Policy {
  const ratio = override['C/B'];
  const common = withCommon(policy, override);
  return ratio === undefined ? common : { ...common, cOverB: { general: ratio, perIon: {} } };
}
