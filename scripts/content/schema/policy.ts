// The file policy.yaml, and the override of one of its values on a measurement.

import { z } from 'zod';
import { parseIon, parseQuantity } from '#engine';
import type { Estimate, Quantity } from '#engine';
import { choice, energy, leaf, quantity, text } from './leaves.ts';

/** A ratio C/B. A bare number is taken as exact. */
const ratio = () =>
  leaf<Estimate>((typed) => {
    const parsed = parseQuantity(typed, 'number');
    if (!parsed.ok) return { code: parsed.code, found: parsed.found, expected: 'a ratio with its uncertainty, e.g. 4.5(9); a bare number is taken as exact', mend: parsed.mend };
    const { value, u } = parsed.quantity;
    if (value >= 2 && value <= 9) return { value: { value, u: u ?? 0 } };
    return { code: 'POLICY_VALUE', found: typed, expected: 'a ratio from 2 to 9', mend: 'check the number: C/B of transition-metal ions lies between 3 and 7' };
  }).meta({ bare: 'number' });

const ionName = () =>
  leaf<string>((typed) => {
    if (typed === 'general') return { value: typed };
    const parsed = parseIon(typed);
    if (parsed.ion !== null) return { value: parsed.ion.name };
    return { code: 'ION_UNKNOWN', found: typed, expected: 'an ion such as Cr(III), or the word general', mend: parsed.near.length > 0 ? `write ${parsed.near.join(' or ')}` : 'write the ion as in Cr(III)' };
  });

/** A share of a value, in percent, above 0 and up to 100. */
const share = () =>
  leaf<Quantity>((typed) => {
    const parsed = parseQuantity(typed, 'percent');
    if (!parsed.ok) return { code: parsed.code, found: parsed.found, expected: parsed.expected, mend: parsed.mend };
    if (parsed.quantity.value > 0 && parsed.quantity.value <= 100) return { value: parsed.quantity };
    return { code: 'POLICY_VALUE', found: typed, expected: 'a share above 0 and up to 100 %', mend: 'check the number' };
  });

const margin = () =>
  leaf<number>((typed) => {
    const parsed = parseQuantity(typed, 'number', { zero: true });
    if (parsed.ok && parsed.quantity.u === null && parsed.quantity.value <= 100) return { value: parsed.quantity.value };
    if (!parsed.ok) return { code: parsed.code, found: parsed.found, expected: parsed.expected, mend: parsed.mend };
    return { code: 'POLICY_VALUE', found: typed, expected: 'a number from 0 to 100', mend: 'write the margin in units of chi-squared, 4 for instance' };
  }).meta({ bare: 'number' });

const ratios = () => z.union([ratio(), z.record(ionName(), ratio())]).meta({ description: 'C/B used where C is not fitted: one value, or one an ion; a bare number is exact', examples: ['4.5(9)', '{ Cr(III): 4.5(5), general: 4.5(9) }'] });

const floors = () => z.strictObject({
  general: energy({ zero: true }).optional().meta({ description: 'of all other transitions', examples: ['150 cm-1'] }),
  'spin-flip': energy({ zero: true }).optional().meta({ description: 'of spin-flip lines', examples: ['250 cm-1'] }),
  'two-electron': energy({ zero: true }).optional().meta({ description: 'of two-electron bands', examples: ['600 cm-1'] }),
}).meta({ description: 'what the model itself is good to, one standard uncertainty', examples: ['{ general: 150 cm-1, spin-flip: 250 cm-1, two-electron: 600 cm-1 }'] });

const ceilings = () => z.strictObject({
  Delta: share().optional().meta({ description: 'of Delta', examples: ['10 %'] }),
  B: share().optional().meta({ description: 'of B', examples: ['15 %'] }),
  C: share().optional().meta({ description: 'of C', examples: ['15 %'] }),
}).meta({ description: 'largest total uncertainty with which a parameter is published', examples: ['{ Delta: 10 %, B: 15 %, C: 15 % }'] });

const defaultUncertainties = () => z.strictObject({
  maximum: energy().optional().meta({ description: 'of a maximum without width', examples: ['80 cm-1'] }),
  line: energy().optional().meta({ description: 'of a line', examples: ['15 cm-1'] }),
}).meta({ description: 'taken where a reading is typed without one', examples: ['{ maximum: 80 cm-1, line: 15 cm-1 }'] });

const fittedC = () => choice(['fitted where determinable', 'assumed']).meta({
  description: 'whether spin-flip bands fit C where they determine it, or C/B is assumed always', examples: ['fitted where determinable'],
});

const rivalMargin = () => margin().meta({ description: 'a rival reading this close in score is named in the verdict', examples: ['4'] });

export const policySchema = z.strictObject({
  name: leaf<string>((typed) => {
    if (/^[A-Za-z][A-Za-z0-9-]{0,40}$/.test(typed)) return { value: typed };
    return { code: 'BAD_ID', found: typed, expected: 'a name of letters, digits and hyphens that starts with a letter', mend: 'write a name such as house-2026' };
  }).optional().meta({ description: 'first part of the policy id', examples: ['house-2026'] }),
  'C/B': ratios().optional(),
  C: fittedC().optional(),
  floors: floors().optional(),
  ceilings: ceilings().optional(),
  'differential-floor': z.strictObject({
    Delta: energy({ zero: true }).optional().meta({ description: 'in Delta', examples: ['50 cm-1'] }),
    B: quantity('percent', { zero: true }).optional().meta({ description: 'in B, as a share', examples: ['1.5 %'] }),
  }).optional().meta({ description: 'floor on the difference of two like results', examples: ['{ Delta: 50 cm-1, B: 1.5 % }'] }),
  'free-ions': choice(['published', 'atomic-levels']).optional().meta({ description: 'free-ion set behind beta', examples: ['published'] }),
  'rival-margin': rivalMargin().optional(),
  'default-uncertainties': defaultUncertainties().optional(),
});

/** One value of the policy with the reason why another holds for one measurement. */
export const overrideSchema = z.strictObject({
  'C/B': ratio().optional().meta({ description: 'C/B for this measurement', examples: ['4.0(3)'] }),
  C: fittedC().optional(),
  floors: floors().optional(),
  ceilings: ceilings().optional(),
  'rival-margin': rivalMargin().optional(),
  'default-uncertainties': defaultUncertainties().optional(),
  because: text().meta({ description: 'the reason', examples: ['"fitted in the parent compound"'] }),
});
