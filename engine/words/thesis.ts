import { concise } from '../quantity/print.ts';
import { listed, wholeNumber } from './numbers.ts';
import type { ParameterName, Standing, Verdict } from './types.ts';

/** What the sentence for a thesis needs. */
export interface ThesisFacts {
  readonly verdict: Verdict;
  /** Bands in the fit, with their transitions as printed. */
  readonly bands: readonly { readonly observed: number; readonly label: string }[];
  readonly parameters: readonly { readonly name: ParameterName; readonly value: number | null; readonly uTotal: number | null; readonly standing: Standing }[];
  /** B0 and its set where beta is given. */
  readonly freeIon: { readonly racahB0: number; readonly set: string } | null;
  readonly spareBands: number;
  /** "C/B = 4.5(9)" where C was assumed and matters. */
  readonly assumed: string | null;
  /** Why nothing is given. */
  readonly reason: string | null;
  readonly policy: string;
}

function numberOf({ name, value, uTotal, standing }: ThesisFacts['parameters'][number], freeIon: ThesisFacts['freeIon']): string {
  const unit = name === 'beta' ? (freeIon ? ` (B₀ = ${wholeNumber(freeIon.racahB0)} cm⁻¹, free-ion set “${freeIon.set}”)` : '') : ' cm⁻¹';
  const mark = standing === 'assumed' ? ', resting on an assumed value' : '';
  return `${name} = ${concise(value!, uTotal, 'page')}${unit}${mark}`;
}

const testOf = (verdict: Verdict, spare: number): string => {
  if (verdict === 'strained') return 'the spare bands disagree with it (strained)';
  if (spare === 0) return 'no band is spare, so the reading is untested';
  return `${spare === 1 ? 'one spare band agrees' : `${spare} spare bands agree`} with it`;
};

/** One sentence that a student can put into a thesis: bands, assignment, numbers with standard uncertainties, standing. */
export function thesisSentence(facts: ThesisFacts): string {
  const given = facts.parameters.filter((parameter) => parameter.value !== null);
  if (given.length === 0) return `The bands give no ligand-field parameters: ${facts.reason ?? facts.verdict} (policy ${facts.policy}).`;
  const bands = facts.bands.map(({ observed, label }) => `${wholeNumber(observed)} cm⁻¹ (${label})`);
  const numbers = given.map((parameter) => numberOf(parameter, facts.freeIon));
  const assumed = facts.assumed ? `, with ${facts.assumed} assumed` : '';
  return (
    `The band${bands.length === 1 ? '' : 's'} at ${listed(bands)} give${bands.length === 1 ? 's' : ''} ${listed(numbers)}${assumed}; ` +
    `${testOf(facts.verdict, facts.spareBands)}. Uncertainties in parentheses are standard uncertainties in the last digits, the model's floor included (policy ${facts.policy}).`
  );
}
