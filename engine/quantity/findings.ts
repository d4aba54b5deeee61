import type { QuantityCode, QuantityFault, Wanted } from './types.ts';

/** What is wrong with a typed text, before the mended text itself has been read. */
export interface Finding {
  readonly code: QuantityCode;
  /** A text that comes nearer to what is wanted; null where only the person can know it. */
  readonly candidate: string | null;
  /** A remark beside the mended text. */
  readonly note: string;
  /** What to do where there is no mended text. */
  readonly advice: string;
}

const expectations: Readonly<Record<Wanted, string>> = {
  energy: 'a number with a unit, e.g. 24500(100) cm-1 or 408.2(5) nm',
  temperature: 'a temperature with its unit, e.g. 295 K or 22(1) °C',
  percent: 'a number with the sign %, e.g. 15 %',
  number: 'a number without unit, e.g. 4.5 or 4.5(9)',
  'absorption-coefficient': 'a number, e.g. 36 or 36(2), alone or in L mol-1 cm-1',
  count: 'a whole number, e.g. 6',
};

/** What a field expects, in words. */
export function expectation(wanted: Wanted): string {
  return expectations[wanted];
}

/** Cuts what was typed so that a report stays readable. */
export function clip(text: string): string {
  const characters = Array.from(text.trim());
  return characters.length <= 60 ? characters.join('') : `${characters.slice(0, 59).join('')}…`;
}

/** The fault that a finding becomes once the mended text is known. */
export function faultOf(finding: Finding, typed: string, expected: string, corrected: string | null): QuantityFault {
  const remark = finding.note === '' ? '' : ` (${finding.note})`;
  const mend = corrected === null ? finding.advice : `write ${corrected}${remark}`;
  return { ok: false, code: finding.code, found: clip(typed), expected, mend, corrected };
}
