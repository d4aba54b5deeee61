import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { concise, conciseParts, conciseTwoSided, parseQuantity, plain, significant, uncertaintyPlace, unitShown } from '#engine';

describe('concise notation', () => {
  test('published: the rounding examples of GUM (JCGM 100:2008) 7.2.6', () => {
    // y = 10,057 62 ohm with u_c = 27 mohm is to be given as 10,058 ohm; u = 28,05 kHz as 28 kHz.
    expect(concise(10.05762, 0.027)).toBe('10.058(27)');
    expect(concise(1000, 28.05)).toBe('1000(28)');
  });

  test('a u that begins with 3 or more keeps one digit, where the GUM allows two: 100,021 47(35) of 7.2.2', () => {
    expect(concise(100.02147, 0.00035)).toBe('100.0215(4)');
  });

  test.each([
    [21550, 60, '21550(60)'],
    [21547, 63, '21550(60)'],
    [21553, 124, '21550(120)'],
    [21553, 97, '21550(100)'],
    [464.03, 0.5, '464.0(5)'],
    [464.03, 1.24, '464.0(12)'],
    [464.03, 2.96, '464.0(30)'],
    [464.03, 0.96, '464.0(10)'],
    [21550.4, 29.6, '21550(30)'],
    [0.8041, 0.0123, '0.804(12)'],
    [-12.4, 3, '−12(3)'],
    [3, 60, '0(60)'],
    [-3, 60, '0(60)'],
    [50, 60, '50(60)'],
    [2.675, 0.04, '2.68(4)'],
    [21550, 1e-9, '21550.0000000000(10)'],
    [21550, null, '21550'],
    [21550, 0, '21550'],
    [4.5, null, '4.5'],
    [0, null, '0'],
  ])('%d with u %s is %s', (value, u, text) => {
    expect(concise(value, u)).toBe(text);
  });

  test('thin spaces only on the page, from five digits on', () => {
    expect(concise(21550, 60, 'page')).toBe('21\u2009550(60)');
    expect(concise(9999, 60, 'page')).toBe('10\u2009000(60)');
    expect(concise(9940, 60, 'page')).toBe('9940(60)');
    expect(plain(-1234567, 0, 'page')).toBe('−1\u2009234\u2009567');
    expect(plain(0.123456, 6, 'page')).toBe('0.123\u2009456');
    expect(conciseParts(21550, 60, 'page')).toEqual({ value: '21\u2009550', uncertainty: '(60)' });
  });

  test('two sides', () => {
    expect(conciseTwoSided(21550, 40, 60)).toBe('21550(+60 −40)');
    expect(conciseTwoSided(21550, 60, 60)).toBe('21550(60)');
    expect(conciseTwoSided(464, 0.4, 1.5)).toBe('464.0(+15 −4)');
  });

  test('impossible arguments are refused', () => {
    expect(() => concise(Number.NaN, 1)).toThrow(RangeError);
    expect(() => concise(1, -1)).toThrow(RangeError);
    expect(() => concise(1, Number.POSITIVE_INFINITY)).toThrow(RangeError);
    expect(() => uncertaintyPlace(0)).toThrow(RangeError);
    expect(() => plain(1, 0.5)).toThrow(RangeError);
  });
});

test('plain numbers round halves away from zero, never print minus zero', () => {
  expect([plain(2.675, 2), plain(-0.4, 0), plain(-0.5, 0), plain(1234, -2), plain(1250, -2), plain(5e-7, 3), plain(1e21, 0)]).toEqual([
    '2.68', '0', '−1', '1200', '1300', '0.000', `1${'0'.repeat(21)}`,
  ]);
  expect([significant(464.03, 4), significant(1100.4, 4), significant(0.00012345, 2), significant(99.96, 3), significant(0, 3)]).toEqual([
    '464', '1100', '0.00012', '100', '0',
  ]);
});

test('units as a page prints them', () => {
  expect([unitShown('cm-1'), unitShown('nm'), unitShown('L mol-1 cm-1')]).toEqual(['cm⁻¹', 'nm', 'L mol⁻¹ cm⁻¹']);
});

describe('laws', () => {
  const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
  const u = fc.double({ min: 1e-6, max: 1e5, noNaN: true, minExcluded: true });

  test('what is printed is read back within half a unit of the last digit of u, in both forms', () => {
    fc.assert(
      fc.property(value, u, fc.constantFrom('text' as const, 'page' as const), (x, s, form) => {
        const parsed = parseQuantity(concise(x, s, form), 'number', { negative: true });
        if (!parsed.ok) throw new Error(parsed.mend);
        const half = 0.5 * 10 ** uncertaintyPlace(s);
        expect(Math.abs(parsed.quantity.value - x)).toBeLessThanOrEqual(half * (1 + 1e-6));
        expect(Math.abs((parsed.quantity.u ?? 0) - s)).toBeLessThanOrEqual(half * (1 + 1e-6));
      }),
    );
  });

  test('u is printed with one or two digits, at most 17 % away from u', () => {
    fc.assert(
      fc.property(u, (s) => {
        const shown = /\((\d+)\)/.exec(concise(0, s))?.[1] ?? '';
        expect(shown.replace(/0+$/, '').length).toBeLessThanOrEqual(2);
        const place = uncertaintyPlace(s);
        const printed = Number(shown) * (place < 0 ? 10 ** place : 1);
        // Worst case: one digit from 3 on, 3.5 printed as 4.
        expect(Math.abs(printed / s - 1)).toBeLessThan(0.17);
      }),
    );
  });

  test('the digits do not depend on the scale, from 1e-9 to 1e9', () => {
    const digits = (text: string) => text.replace(/[.(].*$/, '').length + text;
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 99999999 }), fc.integer({ min: 1, max: 9999 }), fc.integer({ min: -9, max: 9 }), (n, s, power) => {
        const at = (shift: number) => concise(Number(`${n}e${shift}`), Number(`${s}e${shift}`)).replace(/[.]/g, '').replace(/\((\d+)\)/, (_, d: string) => `(${d.replace(/0+$/, '')})`).replace(/^0+(?=\d)/, '').replace(/0*\(/, '(');
        expect(at(power)).toBe(at(0));
        expect(digits(at(power))).toBe(digits(at(0)));
      }),
    );
  });
});
