import { describe, expect, it } from 'vitest';
import { changesBetween } from '../../../scripts/release/changes.ts';
import type { FrozenComplex, FrozenMeasurement, FrozenNumber } from '../../../scripts/release/types.ts';

const number = (value: number | null, u = 160): FrozenNumber => (value === null ? { value, u: null, u_total: null, standing: 'withheld' } : { value, u, u_total: u, standing: 'fitted' });
const measurement = (changes: Partial<FrozenMeasurement> = {}): FrozenMeasurement => ({
  id: 'aq', verdict: 'tested', readings: 'a', policy: 'house-11112222', free_ion: 'published 918 3850',
  numbers: { Delta: number(21550), B: number(650, 30), C: number(null), beta: number(0.708, 0.036) }, ...changes,
});
const numbers = (changes: Partial<FrozenMeasurement['numbers']>): Pick<FrozenMeasurement, 'numbers'> => ({ numbers: { ...measurement().numbers, ...changes } });
const complex = (measurements: readonly FrozenMeasurement[], id = 'cr-am6'): FrozenComplex => ({ id, formula: '[Cr(NH3)6]3+', ion: 'Cr(III)', geometry: 'octahedral', isomer: 'none', measurements });
const state = (complexes: readonly FrozenComplex[], engine = 'e1', software = 'bandstead 1') => ({ complexes, engine, software });
const between = (before: FrozenMeasurement, after: FrozenMeasurement, engine = 'e1', software = 'bandstead 1') =>
  changesBetween(state([complex([before])]), state([complex([after])], engine, software));

describe('what changed between two releases', () => {
  it('is nothing where every number is the same, whatever the readings, and within 1e-9 of itself', () => {
    expect(between(measurement(), measurement({ readings: 'b' }))).toEqual([]);
    expect(between(measurement(), measurement(numbers({ Delta: number(21550 * (1 + 5e-10)) })), 'e2')).toEqual([]);
    expect(between(measurement(), measurement(numbers({ Delta: number(21550 * (1 + 5e-9)) })), 'e2')).toHaveLength(1);
  });

  it('names the number, both values and the cause', () => {
    expect(between(measurement(), measurement({ readings: 'b', ...numbers({ Delta: number(21600, 170) }) }))).toEqual([{
      kind: 'number', complex: 'cr-am6', measurement: 'aq', parameter: 'Delta', before: 21550, beforeU: 160, after: 21600, afterU: 170, cause: 'readings',
      text: 'cr-am6/aq: Delta went from 21\u2009550(160) to 21\u2009600(170) cm⁻¹ (readings).',
    }]);
  });

  const moved = numbers({ Delta: number(21600), beta: number(0.72, 0.036) });
  it.each<[string, Partial<FrozenMeasurement>, string, string, string[]]>([
    ['another policy', { policy: 'house-33334444' }, 'e1', 'bandstead 1', ['policy', 'policy']],
    ['another free-ion set, which moves beta', { readings: 'b', free_ion: 'atomic-levels 900 none' }, 'e1', 'bandstead 1', ['readings', 'readings, free-ion set']],
    ['a free-ion set alone', { free_ion: 'atomic-levels 900 none' }, 'e1', 'bandstead 1', ['free-ion set', 'free-ion set']],
    ['another engine', {}, 'e2', 'bandstead 2', ['engine', 'engine']],
    ['readings and engine together', { readings: 'b' }, 'e2', 'bandstead 1', ['readings, engine', 'readings, engine']],
    ['a policy that only got another name, under new software', { policy: 'other-11112222' }, 'e1', 'bandstead 2', ['software', 'software']],
    ['nothing that is known', {}, 'e1', 'bandstead 1', ['machine', 'machine']],
  ])('gives as cause: %s', (_, changes, engine, software, causes) => {
    expect(between(measurement(), measurement({ ...changes, ...moved }), engine, software).map(({ cause }) => cause)).toEqual(causes);
  });

  it('tells numbers that came, went, or only changed their standing or their last bits', () => {
    const text = (after: Partial<FrozenMeasurement['numbers']>, before: Partial<FrozenMeasurement['numbers']> = {}) =>
      between(measurement(numbers(before)), measurement({ readings: 'b', ...numbers(after) })).map((change) => change.text);
    expect(text({ C: number(2900, 90) })).toEqual(['cr-am6/aq: C was withheld and is now 2900(90) cm⁻¹ (readings).']);
    expect(text({ beta: number(null) })).toEqual(['cr-am6/aq: beta was 0.71(4) and is now withheld (readings).']);
    expect(text({ Delta: { ...number(21550), standing: 'assumed' } })).toEqual(['cr-am6/aq: Delta 21\u2009550(160) cm⁻¹ was fitted and is now assumed (readings).']);
    expect(text({ Delta: number(21550.1) })).toEqual(['cr-am6/aq: Delta 21\u2009550(160) cm⁻¹ changed by less than is printed (readings).']);
  });

  it('tells records and measurements that came and went, and verdicts, in the order of ids', () => {
    const before = state([complex([measurement()]), complex([measurement()], 'ni-aq6'), complex([measurement(), measurement({ id: 'solid' })], 'v-aq6')]);
    const after = state([complex([measurement({ verdict: 'strained', readings: 'b' })]), complex([measurement()], 'co-aq6'), complex([measurement(), measurement({ id: 'glass' })], 'v-aq6')]);
    expect(changesBetween(before, after).map(({ kind, text, cause }) => [kind, text, cause])).toEqual([
      ['complex added', 'co-aq6 was added.', 'record'],
      ['verdict', 'cr-am6/aq: the verdict went from tested to strained (readings).', 'readings'],
      ['complex removed', 'ni-aq6 was taken away.', 'record'],
      ['measurement added', 'v-aq6/glass was added.', 'record'],
      ['measurement removed', 'v-aq6/solid was taken away.', 'record'],
    ]);
  });
});
