import { freeIon as freeIonOf } from '../ions/freeIon.ts';
import type { FreeIon } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { auditCause } from '../words/audit.ts';
import type { CauseFacts } from '../words/audit.ts';
import type { ParameterName } from '../words/types.ts';
import { isFit } from './fitTypes.ts';
import { ratioFor } from './ratioFor.ts';
import { searchReadings } from './search.ts';
import { declaredCase } from './cases.ts';
import type { Reading } from './types.ts';

/** Parameters as printed elsewhere; Delta may be given as Dq. cm-1, beta bare. */
export interface Quoted {
  readonly Delta: number | null;
  readonly Dq: number | null;
  readonly B: number | null;
  readonly C: number | null;
  readonly beta: number | null;
}

/** One quoted number against the refitted one. */
export interface AuditRow {
  readonly parameter: ParameterName;
  readonly quoted: number;
  /** null where it is withheld. */
  readonly refitted: number | null;
  readonly uTotal: number | null;
  readonly difference: number | null;
  /** Difference over u(total). */
  readonly z: number | null;
  /** A likely cause in words, found by trying; null where the values agree or nothing tried explains it. */
  readonly cause: string | null;
}

/** A difference beyond this many u counts as a disagreement. */
export const disagreesFrom = 2;

/** A cause is named where it brings the number to within this fraction of the quoted one. */
const reproduced = 0.01;

const close = (a: number, b: number): boolean => Math.abs(a - b) <= reproduced * Math.abs(b);

/** Everything the search for a cause may try. */
interface Suspect {
  readonly measurement: Measurement;
  readonly policy: Policy;
  readonly freeIon: FreeIon | null;
  readonly reading: Reading;
  readonly parameter: ParameterName;
  readonly quoted: number;
}

/** Delta, B, C and beta of the chosen assignment under changed input; null where no fit stands. */
function refit({ measurement, policy, freeIon }: Pick<Suspect, 'measurement' | 'policy' | 'freeIon'>): Record<ParameterName, number> | null {
  const ion = declaredCase(measurement);
  if (typeof ion === 'string') return null;
  const best = searchReadings({ measurement, ion, policy, ratio: ratioFor(policy, measurement.ion.name), freeIon }, 'as typed').readings[0];
  if (!best || !isFit(best.outcome)) return null;
  const { delta, racahB, racahC } = best.outcome.solutions[0]!.at;
  return { Delta: delta, B: racahB, C: racahC, beta: freeIon ? racahB / freeIon.racahB0 : Number.NaN };
}

/** Powers and simple factors by which a number is mistyped or confused: Dq for Delta, kK for cm-1, half, double. */
const factors = [10, 0.1, 1000, 0.001, 2, 0.5];

function byFactor({ reading, parameter, quoted }: Suspect): CauseFacts | null {
  const value = reading.parameters.find((one) => one.name === parameter)?.value;
  const factor = value == null ? undefined : factors.find((one) => close(quoted * one, value));
  return factor === undefined ? null : { kind: 'factor', value: factor };
}

function bySwappedDigits({ reading, parameter, quoted }: Suspect): CauseFacts | null {
  const fitted = reading.parameters.find((one) => one.name === parameter);
  if (fitted?.value == null || fitted.uTotal === null) return null;
  const digits = String(Math.round(quoted));
  for (let i = 0; i + 1 < digits.length; i++) {
    const swapped = Number(digits.slice(0, i) + digits[i + 1] + digits[i] + digits.slice(i + 2));
    if (swapped !== Math.round(quoted) && Math.abs(swapped - fitted.value) < Math.min(fitted.uTotal, reproduced * fitted.value)) return { kind: 'swapped digits', value: swapped };
  }
  return null;
}

function byOtherPair({ reading, parameter, quoted }: Suspect): CauseFacts | null {
  const pair = reading.stress?.pairs.find(({ at }) => {
    if (!at) return false;
    const value = parameter === 'Delta' ? at.delta : parameter === 'B' ? at.racahB : null;
    return value !== null && close(value, quoted);
  });
  return pair ? { kind: 'pair', labels: pair.labels } : null;
}

function byOtherRatio(suspect: Suspect): CauseFacts | null {
  const inForce = suspect.reading.ratio;
  const fitted = suspect.reading.parameters.find((one) => one.name === suspect.parameter)?.value;
  if (!inForce || inForce.origin === 'fitted' || fitted == null) return null;
  const gap = Math.abs(suspect.quoted - fitted);
  const attempts = [3.5, 4, 4.5, 5, 5.5, 6].filter((value) => Math.abs(value - inForce.value) > 1e-9).map((value) => {
    const policy: Policy = { ...suspect.policy, cOverB: { general: { value, u: 0 }, perIon: {} } };
    const found = refit({ ...suspect, policy })?.[suspect.parameter];
    return { value, left: found === undefined ? Number.POSITIVE_INFINITY : Math.abs(found - suspect.quoted) };
  });
  const best = attempts.reduce((a, b) => (b.left < a.left ? b : a));
  // Where C/B hardly moves the number, no C/B explains it.
  return best.left <= reproduced * Math.abs(suspect.quoted) && best.left < gap / 4 ? { kind: 'ratio', value: best.value } : null;
}

function byOtherFreeIon({ reading, parameter, quoted, measurement, policy }: Suspect): CauseFacts | null {
  const racahB = reading.parameters.find((one) => one.name === 'B')?.value;
  if (parameter !== 'beta' || racahB == null) return null;
  const set = policy.freeIons === 'published' ? 'atomic-levels' : 'published';
  const other = freeIonOf(set, measurement.ion);
  return other && close(racahB / other.racahB0, quoted) ? { kind: 'free ion', set } : null;
}

function byPlainMean(suspect: Suspect): CauseFacts | null {
  const { measurement } = suspect;
  if (!measurement.bands.some((band) => band.kind === 'component' && band.degeneracy !== null)) return null;
  const bands = measurement.bands.map((band) => (band.degeneracy === null ? band : { ...band, degeneracy: 1 }));
  const found = refit({ ...suspect, measurement: { ...measurement, bands } })?.[suspect.parameter];
  return found !== undefined && close(found, suspect.quoted) ? { kind: 'plain mean' } : null;
}

function byWholeNanometres(suspect: Suspect): CauseFacts | null {
  const bands = suspect.measurement.bands.map((band) => ({ ...band, position: 1e7 / Math.round(1e7 / band.position) }));
  const found = refit({ ...suspect, measurement: { ...suspect.measurement, bands } })?.[suspect.parameter];
  const value = suspect.reading.parameters.find((one) => one.name === suspect.parameter)?.value;
  // Only where rounding moves the number: otherwise anything would "explain" it.
  return found !== undefined && value != null && !close(value, suspect.quoted) && close(found, suspect.quoted) ? { kind: 'nanometres' } : null;
}

/** Tried in this order: the cheapest mistakes first. */
const causes = [byFactor, bySwappedDigits, byOtherPair, byPlainMean, byOtherFreeIon, byOtherRatio, byWholeNanometres];

/** Sets every quoted number beside the refitted one and looks for a cause where they disagree. */
export function auditQuoted(measurement: Measurement, policy: Policy, freeIon: FreeIon | null, reading: Reading, quoted: Quoted): readonly AuditRow[] {
  const asked: [ParameterName, number | null][] = [
    ['Delta', quoted.Delta ?? (quoted.Dq === null ? null : 10 * quoted.Dq)], ['B', quoted.B], ['C', quoted.C], ['beta', quoted.beta],
  ];
  return asked.flatMap(([parameter, value]): AuditRow[] => {
    if (value === null) return [];
    const fitted = reading.parameters.find((one) => one.name === parameter)!;
    const difference = fitted.value === null ? null : value - fitted.value;
    const z = difference === null || !fitted.uTotal ? null : difference / fitted.uTotal;
    const suspect: Suspect = { measurement, policy, freeIon, reading, parameter, quoted: value };
    let cause: string | null = null;
    if (z !== null && Math.abs(z) > disagreesFrom)
      for (const attempt of causes) {
        const facts = attempt(suspect);
        if (facts) {
          cause = auditCause(facts, parameter, measurement.ion.electrons);
          break;
        }
      }
    return [{ parameter, quoted: value, refitted: fitted.value, uTotal: fitted.uTotal, difference, z, cause }];
  });
}
