import { describe, expect, test } from 'vitest';
import { defaultPolicy, policyId } from '#engine';
import type { Policy } from '#engine';

describe('the id of a policy', () => {
  test('is the typed name and eight hexadecimal digits', () => {
    expect(policyId({ ...defaultPolicy, name: 'house-2026' })).toMatch(/^house-2026-[0-9a-f]{8}$/);
  });

  test('does not depend on the order in which values were written', () => {
    const perIon = { 'Cr(III)': { value: 4.5, u: 0.5 }, 'Ni(II)': { value: 4.2, u: 0.4 } };
    const turned = { 'Ni(II)': { u: 0.4, value: 4.2 }, 'Cr(III)': { u: 0.5, value: 4.5 } };
    const one = { ...defaultPolicy, cOverB: { general: { value: 4.5, u: 0.9 }, perIon } };
    const other = { ...defaultPolicy, cOverB: { perIon: turned, general: { u: 0.9, value: 4.5 } } };
    expect(policyId(one)).toBe(policyId(other));
  });

  test('changes with every single value of the policy', () => {
    const changed: readonly Policy[] = [
      { ...defaultPolicy, cOverB: { general: { value: 4, u: 0.9 }, perIon: {} } },
      { ...defaultPolicy, cOverB: { general: { value: 4.5, u: 0 }, perIon: {} } },
      { ...defaultPolicy, cOverB: { general: { value: 4.5, u: 0.9 }, perIon: { 'Cr(III)': { value: 4.5, u: 0.9 } } } },
      { ...defaultPolicy, floors: { ...defaultPolicy.floors, general: 151 } },
      { ...defaultPolicy, floors: { ...defaultPolicy.floors, spinFlip: 251 } },
      { ...defaultPolicy, floors: { ...defaultPolicy.floors, twoElectron: 601 } },
      { ...defaultPolicy, ceilings: { ...defaultPolicy.ceilings, delta: 0.11 } },
      { ...defaultPolicy, ceilings: { ...defaultPolicy.ceilings, racahB: 0.16 } },
      { ...defaultPolicy, ceilings: { ...defaultPolicy.ceilings, racahC: 0.16 } },
      { ...defaultPolicy, differentialFloor: { ...defaultPolicy.differentialFloor, delta: 51 } },
      { ...defaultPolicy, differentialFloor: { ...defaultPolicy.differentialFloor, racahB: 0.016 } },
      { ...defaultPolicy, freeIons: 'atomic-levels' },
      { ...defaultPolicy, rivalMargin: 5 },
      { ...defaultPolicy, defaultUncertainties: { ...defaultPolicy.defaultUncertainties, maximum: 81 } },
      { ...defaultPolicy, defaultUncertainties: { ...defaultPolicy.defaultUncertainties, line: 16 } },
    ];
    const ids = new Set([defaultPolicy, ...changed].map(policyId));
    expect(ids.size).toBe(changed.length + 1);
  });

  test('keeps its digits when only the name changes', () => {
    const digits = (policy: Policy) => policyId(policy).slice(-8);
    expect(digits({ ...defaultPolicy, name: 'renamed' })).toBe(digits(defaultPolicy));
  });
});

test('the default policy carries the values that the manual states', () => {
  expect(defaultPolicy.cOverB.general).toEqual({ value: 4.5, u: 0.9 });
  expect(defaultPolicy.floors).toEqual({ general: 150, spinFlip: 250, twoElectron: 600 });
  expect(defaultPolicy.ceilings).toEqual({ delta: 0.1, racahB: 0.15, racahC: 0.15 });
});
