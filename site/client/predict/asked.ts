import { type Geometry, type Ion, defaultPolicy, parseIon, parseQuantity, toWavenumber } from '#engine';
import { hasSpinChoice, resolvedSpin } from '../../../scripts/content/spin.ts';
import { spinNames } from '../../../scripts/content/vocabulary.ts';
import type { FieldFault } from '../page/faults.ts';

/** The form of the predict page as typed. */
export interface PredictForm {
  readonly ion: string;
  readonly geometry: string;
  readonly spin: string;
  readonly Delta: string;
  readonly B: string;
  readonly C: string;
  readonly ratio: string;
}

/** What was asked for, energies in cm-1. */
export interface Asked {
  readonly ion: Ion;
  readonly geometry: Geometry;
  /** null: that of the lowest level. */
  readonly multiplicity: number | null;
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
  readonly assumed: readonly string[];
}

export type ReadAsked = { readonly asked: Asked; readonly faults: readonly [] } | { readonly asked: null; readonly faults: readonly FieldFault[] };

/** Reads the form by the rules of `npm run predict`. Empty fields that are needed are waited for without a fault. */
export function readAsked(form: PredictForm): ReadAsked {
  const faults: FieldFault[] = [];
  const assumed: string[] = [];
  const ion = readIon(form.ion, faults);
  const geometry: Geometry = form.geometry === 'tetrahedral' ? 'tetrahedral' : 'octahedral';
  const delta = readEnergy('Delta', form.Delta, faults);
  const racahB = readEnergy('B', form.B, faults);
  const racahC = readRacahC(form, racahB, faults, assumed);
  const multiplicity = ion === null ? null : readSpin(form.spin, ion, geometry, faults, assumed);
  if (faults.length > 0 || ion === null || delta === null || racahB === null || racahC === null) return { asked: null, faults };
  return { asked: { ion, geometry, multiplicity, delta, racahB, racahC, assumed }, faults: [] };
}

function readIon(typed: string, faults: FieldFault[]): Ion | null {
  if (typed.trim() === '') return null;
  const { ion, reason, near } = parseIon(typed.trim());
  const none = ion !== null && (ion.electrons < 1 || ion.electrons > 9);
  if (ion !== null && !none) return ion;
  faults.push({ field: 'ion', text: none ? `${ion.name} is d${ion.electrons}: it has no d-d bands` : `${reason}${near.length === 0 ? '' : `: did you mean ${near.join(' or ')}?`}` });
  return null;
}

function readEnergy(field: string, typed: string, faults: FieldFault[]): number | null {
  if (typed.trim() === '') return null;
  const parsed = parseQuantity(/^[\d. ]+$/.test(typed) ? `${typed} cm-1` : typed, 'energy');
  if (parsed.ok) return toWavenumber(parsed.quantity).position;
  faults.push({ field, text: `expected ${parsed.expected}; ${parsed.mend}` });
  return null;
}

function readRacahC({ C, ratio }: PredictForm, racahB: number | null, faults: FieldFault[], assumed: string[]): number | null {
  const racahC = readEnergy('C', C, faults);
  if (racahC !== null && ratio.trim() !== '') {
    faults.push({ field: 'ratio', text: 'give C or C/B, not both' });
    return null;
  }
  if (C.trim() !== '') return racahC;
  if (racahB === null) return null;
  if (ratio.trim() === '') {
    const { value } = defaultPolicy.cOverB.general;
    assumed.push(`C/B ${value}`);
    return value * racahB;
  }
  const parsed = parseQuantity(ratio, 'number');
  if (parsed.ok) return parsed.quantity.value * racahB;
  faults.push({ field: 'ratio', text: `expected ${parsed.expected}; ${parsed.mend}` });
  return null;
}

function readSpin(typed: string, ion: Ion, geometry: Geometry, faults: FieldFault[], assumed: string[]): number | null {
  const name = spinNames.find((one) => one === typed);
  if (name === undefined) {
    if (hasSpinChoice(ion.electrons, geometry)) assumed.push('the spin of the lowest level at these parameters');
    return null;
  }
  const { multiplicity, possible } = resolvedSpin(ion.electrons, geometry, name);
  if (multiplicity === null) faults.push({ field: 'spin', text: `${ion.name}, ${geometry}, may be ${possible.join(', ')}` });
  return multiplicity;
}

/** Steps of the arrow keys; with Shift ten times as far. */
const STEPS: Readonly<Record<string, { readonly step: number; readonly decimals: number }>> = {
  Delta: { step: 100, decimals: 0 }, B: { step: 10, decimals: 0 }, C: { step: 10, decimals: 0 }, ratio: { step: 0.1, decimals: 2 },
};

/**
 * The text of a field one step up or down; null where the field takes no steps or holds no bare number. Never below 0: a step that
 * would pass it stays.
 */
export function stepped(field: string, typed: string, steps: number): string | null {
  const known = STEPS[field];
  const bare = /^\s*(\d+(?:\.\d+)?)\s*(?:cm-1)?\s*$/.exec(typed)?.[1];
  if (known === undefined || bare === undefined) return null;
  const { step, decimals } = known;
  const value = Number(bare) + steps * step;
  return value <= 0 ? typed : String(Number(value.toFixed(decimals + (bare.split('.')[1]?.length ?? 0))));
}
