import { toWavenumber } from './convert.ts';
import { clip, faultOf } from './findings.ts';
import { parseQuantity } from './parse.ts';
import { plainCharacters } from './spelling.ts';
import type { Quantity, QuantityCode, QuantityFault } from './types.ts';

/** A stretch of the wavenumber axis, cm-1, low end first. */
export interface Range {
  readonly low: number;
  readonly high: number;
}

const expected = 'a range with a unit, e.g. 28600 - 33300 cm-1 or 300 - 1100 nm';

function refuse(code: QuantityCode, text: string, advice: string): QuantityFault {
  return faultOf({ code, candidate: null, note: '', advice }, text, expected, null);
}

/** Both limits of a text cut at one dash, or the fault of the first limit that cannot be read, with the whole range mended where it can be. */
function limits(left: string, right: string, text: string): readonly [Quantity, Quantity] | QuantityFault {
  const high = parseQuantity(right, 'energy');
  const rightMended = high.ok ? right : high.corrected;
  const mended = high.ok ? high : parseQuantity(rightMended ?? '', 'energy');
  const unit = mended.ok ? ` ${mended.quantity.unit}` : '';
  const alone = parseQuantity(left, 'energy');
  // A limit without unit takes that of the other, also where commas hide that it has none.
  const hasUnit = alone.ok || alone.code === 'UNKNOWN_UNIT' || alone.code === 'WRONG_UNIT' || /[a-zµ]/i.test(left);
  const low = hasUnit ? alone : parseQuantity(left + unit, 'energy');
  if (low.ok && high.ok) return [low.quantity, high.quantity];
  const fault = !low.ok && (high.ok || high.code === low.code || low.code !== 'NO_UNIT') ? low : (high as QuantityFault);
  const leftMended = low.ok ? left : low.corrected;
  const shown = leftMended !== null && !low.ok && !hasUnit ? leftMended.slice(0, leftMended.length - unit.length) : leftMended;
  const lowMended = low.ok ? low : parseQuantity(leftMended ?? '', 'energy');
  // Two limits that mend to one place are no range: then there is nothing to offer.
  const one = lowMended.ok && mended.ok && toWavenumber(lowMended.quantity).position === toWavenumber(mended.quantity).position;
  const corrected = shown === null || rightMended === null || one ? null : `${shown} - ${rightMended}`;
  const remark = / \([^()]*\)$/.exec(fault.mend)?.[0] ?? '';
  return { ...fault, found: clip(text), expected, corrected, mend: corrected === null ? fault.mend : `write ${corrected}${remark}` };
}

/**
 * Reads one range, `300 - 1100 nm` or `28600 cm-1 to 33300 cm-1`, in either order.
 * @returns low < high in cm-1, or a fault; never throws.
 */
export function parseRange(text: string): { readonly ok: true; readonly range: Range } | QuantityFault {
  const plain = plainCharacters(text);
  if (plain === '') return refuse('EMPTY', text, 'write a range, or leave the field out where it is not known');
  if (plain.length > 120) return refuse('TOO_LONG', text, 'write two limits and a unit');
  let first: QuantityFault | null = null;
  for (const cut of plain.matchAll(/ ?- ?| to |…|\.\.+/g)) {
    const left = plain.slice(0, cut.index).trim();
    const right = plain.slice(cut.index + cut[0].length).trim();
    if (left === '' || !/\d/.test(right)) continue;
    const both = limits(left, right, text);
    if ('ok' in both) {
      first ??= both;
      continue;
    }
    const [one, two] = both.map((limit) => toWavenumber(limit).position) as [number, number];
    if (both.some((limit) => limit.u !== null)) return refuse('BAD_UNCERTAINTY', text, 'write the limits of a range without uncertainty');
    if (one === two) return refuse('BAD_RANGE', text, 'write two different limits');
    return { ok: true, range: { low: Math.min(one, two), high: Math.max(one, two) } };
  }
  return first ?? refuse('BAD_RANGE', text, 'write two limits with a dash between them');
}

/**
 * Reads ranges separated by semicolons, `300 - 700 nm; 750 - 1100 nm`.
 * @returns the ranges in cm-1 in the order typed, or the first fault; never throws.
 */
export function parseRanges(text: string): { readonly ok: true; readonly ranges: readonly Range[] } | QuantityFault {
  const ranges: Range[] = [];
  for (const part of text.split(';')) {
    const parsed = parseRange(part);
    if (!parsed.ok) return parsed;
    ranges.push(parsed.range);
  }
  return { ok: true, ranges };
}
