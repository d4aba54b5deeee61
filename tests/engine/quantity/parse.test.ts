import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Allowance, parseQuantity, type Quantity, type QuantityCode, type QuantityFault, type Wanted } from '#engine';

function good(text: string, wanted: Wanted = 'energy', allow: Allowance = {}): Quantity {
  const parsed = parseQuantity(text, wanted, allow);
  if (!parsed.ok) throw new Error(`${text}: ${parsed.code}, ${parsed.mend}`);
  return parsed.quantity;
}

function bad(text: string, wanted: Wanted = 'energy', allow: Allowance = {}): QuantityFault {
  const parsed = parseQuantity(text, wanted, allow);
  if (parsed.ok) throw new Error(`${text} was read as ${JSON.stringify(parsed.quantity)}`);
  return parsed;
}

describe('the notations of a reading', () => {
  test.each([
    ['21550(60) cm-1', 21550, 60, 'cm-1', 'concise', 0.5],
    ['21550 (60) cm-1', 21550, 60, 'cm-1', 'concise', 0.5],
    ['464.0(5) nm', 464, 0.5, 'nm', 'concise', 0.05],
    ['464.0(12) nm', 464, 1.2, 'nm', 'concise', 0.05],
    ['464.0(1.2) nm', 464, 1.2, 'nm', 'concise', 0.05],
    ['2.67(1) eV', 2.67, 0.01, 'eV', 'concise', 0.005],
    ['24 500 cm-1', 24500, null, 'cm-1', 'none', 0.5],
    ['24\u2009500 cm-1', 24500, null, 'cm-1', 'none', 0.5],
    ['24\u00a0500(100)\u00a0cm-1', 24500, 100, 'cm-1', 'concise', 0.5],
    ['21550 ± 60 cm-1', 21550, 60, 'cm-1', 'plus-minus', 0.5],
    ['21550 +- 60 cm-1', 21550, 60, 'cm-1', 'plus-minus', 0.5],
    ['21550+/-60 cm-1', 21550, 60, 'cm-1', 'plus-minus', 0.5],
    ['(21550 ± 60) cm-1', 21550, 60, 'cm-1', 'plus-minus', 0.5],
    ['21550 cm-1 ± 60 cm-1', 21550, 60, 'cm-1', 'plus-minus', 0.5],
    ['21550 ± 120 cm-1 (k = 2)', 21550, 60, 'cm-1', 'k', 0.5],
    ['21550 ± 120 cm-1, k=2', 21550, 60, 'cm-1', 'k', 0.5],
    ['(21550 ± 120) cm-1 (k=2)', 21550, 60, 'cm-1', 'k', 0.5],
    ['21.55(6) kK', 21.55, 0.06, 'kK', 'concise', 0.005],
    ['0.464 um', 0.464, null, 'µm', 'none', 0.0005],
    ['0.464 \u03bcm', 0.464, null, 'µm', 'none', 0.0005],
    ['2670 meV', 2670, null, 'meV', 'none', 0.5],
    ['464nm', 464, null, 'nm', 'none', 0.5],
  ] as const)('%s', (text, value, u, unit, coverage, halfDigit) => {
    expect(good(text)).toMatchObject({ value, u, unit, coverage, halfDigit, typed: text.trim() });
  });

  test.each(['cm-1', 'cm^-1', 'cm⁻¹', 'cm−1', 'cm–1', '/cm', '1/cm', 'cm^{-1}'])('%s is the wavenumber unit', (unit) => {
    expect(good(`21550(60) ${unit}`).unit).toBe('cm-1');
  });

  test('an uncertainty with two sides keeps both, and u is the larger', () => {
    const sides = { u: 60, uMinus: 40, uPlus: 60 };
    expect(good('21550(+60 -40) cm-1')).toMatchObject(sides);
    expect(good('21550(+60 −40) cm-1')).toMatchObject(sides);
    expect(good('21550(-40/+60) cm-1')).toMatchObject(sides);
    expect(good('464.0(+6, -4) nm')).toMatchObject({ uMinus: 0.4, uPlus: 0.6 });
  });

  test('published: GUM (JCGM 100:2008) 7.2.2, the three short forms of 100,021 47 g with u_c = 0,35 mg mean the same', () => {
    const forms = ['100.021 47(35)', '100.021 47(0.000 35)', '(100.021 47 ± 0.000 35)'];
    expect(forms.map((form) => good(form, 'number')).map(({ value, u }) => [value, u])).toEqual(Array(3).fill([100.02147, 0.00035]));
  });

  test('from memory: the Bohr radius of CODATA 2018 in the concise form of NIST, 0.529 177 210 903(80)', () => {
    expect(good('0.529 177 210 903(80)', 'number')).toMatchObject({ value: 0.529177210903, u: 8e-11 });
  });

  test('other fields: temperature, percentage, bare number, absorption coefficient, count', () => {
    expect(good('295(5) K', 'temperature')).toMatchObject({ value: 295, u: 5, unit: 'K' });
    expect(good('−196 °C', 'temperature')).toMatchObject({ value: -196, unit: '°C' });
    expect(good('1.5 %', 'percent')).toMatchObject({ value: 1.5, unit: '%' });
    expect(good('4.5(9)', 'number')).toMatchObject({ value: 4.5, u: 0.9, unit: '' });
    expect(good('36', 'absorption-coefficient')).toMatchObject({ value: 36, unit: '' });
    expect(good('36(2) L mol⁻¹ cm⁻¹', 'absorption-coefficient')).toMatchObject({ value: 36, u: 2 });
    expect(good('6', 'count').value).toBe(6);
  });

  test('zero and negative numbers only where the field allows them', () => {
    expect(good('0 cm-1', 'energy', { zero: true }).value).toBe(0);
    expect(good('−12 cm-1', 'energy', { negative: true }).value).toBe(-12);
    expect(good('0 %', 'percent').value).toBe(0);
    expect(Object.is(good('-0', 'number').value, 0)).toBe(true);
  });
});

describe('what is refused, and how it is mended', () => {
  test.each([
    ['', 'EMPTY', null],
    ['   ', 'EMPTY', null],
    ['2'.repeat(81), 'TOO_LONG', null],
    ['1234567890123456 cm-1', 'TOO_LONG', null],
    ['24,500', 'THOUSANDS_COMMA', '24500 cm-1'],
    ['24,500 cm-1', 'THOUSANDS_COMMA', '24500 cm-1'],
    ['24,500(100) cm-1', 'THOUSANDS_COMMA', '24500(100) cm-1'],
    ["24'500 cm-1", 'THOUSANDS_COMMA', '24500 cm-1'],
    ['1,100 nm', 'THOUSANDS_COMMA', '1100 nm'],
    ['464,5 nm', 'DECIMAL_COMMA', '464.5 nm'],
    ['464,5(5) nm', 'DECIMAL_COMMA', '464.5(5) nm'],
    ['464,500 nm', 'DECIMAL_COMMA', '464.500 nm'],
    ['2,670 eV', 'DECIMAL_COMMA', '2.670 eV'],
    ['24.500,5 cm-1', 'DECIMAL_COMMA', '24500.5 cm-1'],
    ['2.15e4 cm-1', 'EXPONENT', '21500 cm-1'],
    ['2.15E+04(3) cm-1', 'EXPONENT', '21500(3) cm-1'],
    ['2.15 × 10⁴ cm-1', 'EXPONENT', '21500 cm-1'],
    ['1E300 cm-1', 'EXPONENT', null],
    ['-5 cm-1', 'NEGATIVE', '5 cm-1'],
    ['0 cm-1', 'ZERO', null],
    ['NaN', 'NOT_FINITE', null],
    ['-Infinity cm-1', 'NOT_FINITE', null],
    ['∞ cm-1', 'NOT_FINITE', null],
    ['21550', 'NO_UNIT', '21550 cm-1'],
    ['464', 'NO_UNIT', '464 nm'],
    ['21550 ± 120 (k = 2)', 'NO_UNIT', '21550 ± 120 cm-1 (k = 2)'],
    ['21550 CM-1', 'UNKNOWN_UNIT', '21550 cm-1'],
    ['21550 cm', 'UNKNOWN_UNIT', '21550 cm-1'],
    ['464 Nm', 'UNKNOWN_UNIT', '464 nm'],
    ['12 parsec', 'UNKNOWN_UNIT', null],
    ['constructor', 'NOT_A_NUMBER', null],
    ['12 constructor', 'UNKNOWN_UNIT', null],
    ['295 K', 'WRONG_UNIT', null],
    ['21550(0) cm-1', 'ZERO_UNCERTAINTY', '21550 cm-1'],
    ['21550 ± 0 cm-1', 'ZERO_UNCERTAINTY', null],
    ['21550(60 cm-1', 'BAD_UNCERTAINTY', null],
    ['21550() cm-1', 'BAD_UNCERTAINTY', null],
    ['21550(±60) cm-1', 'BAD_UNCERTAINTY', '21550(60) cm-1'],
    ['21550 cm-1 ± 0.3 %', 'BAD_UNCERTAINTY', null],
    ['21550(+60 +40) cm-1', 'UNCERTAINTY_SIGN', null],
    ['464.0(−5 −8) nm', 'UNCERTAINTY_SIGN', null],
    ['21550(60/-40) cm-1', 'UNCERTAINTY_SIGN', null],
    ['21550(-60) cm-1', 'UNCERTAINTY_SIGN', null],
    ['21550 ± 60 ± 3 cm-1', 'BAD_UNCERTAINTY', null],
    ['21550(60) ± 3 cm-1', 'BAD_UNCERTAINTY', null],
    ['21550 cm-1 (k = 2)', 'BAD_COVERAGE', null],
    ['21550 ± 60 cm-1 (k = 0)', 'BAD_COVERAGE', null],
    ['21550 ± 60 cm-1 (k = two)', 'BAD_COVERAGE', null],
    ['ca. 21500 cm-1', 'NOT_A_NUMBER', null],
    ['< 300 nm', 'NOT_A_NUMBER', null],
    ['24 50 cm-1', 'NOT_A_NUMBER', '2450 cm-1'],
    ['.5 eV', 'NOT_A_NUMBER', '0.5 eV'],
    ['5. eV', 'NOT_A_NUMBER', '5 eV'],
    ['+5 eV', 'NOT_A_NUMBER', '5 eV'],
    ['300 - 400 nm', 'NOT_A_NUMBER', null],
  ] as [string, QuantityCode, string | null][])('%s is %s', (text, code, corrected) => {
    const fault = bad(text);
    expect(fault).toMatchObject({ code, corrected });
    expect(fault.mend).not.toBe('');
    expect(fault.expected).toBe('a number with a unit, e.g. 24500(100) cm-1 or 408.2(5) nm');
  });

  test('the message of the house example', () => {
    expect(bad('24,500')).toMatchObject({ found: '24,500', mend: 'write 24500 cm-1 (no thousands comma)' });
  });

  test('other fields name what they expect', () => {
    expect(bad('36 cm-1', 'absorption-coefficient')).toMatchObject({ code: 'WRONG_UNIT', mend: 'write the number alone, or in L mol-1 cm-1' });
    expect(bad('295', 'temperature')).toMatchObject({ code: 'NO_UNIT', corrected: '295 K' });
    expect(bad('22 C', 'temperature')).toMatchObject({ code: 'UNKNOWN_UNIT', corrected: '22 °C' });
    expect(bad('-300 °C', 'temperature').code).toBe('NEGATIVE');
    expect(bad('15', 'percent')).toMatchObject({ code: 'NO_UNIT', corrected: '15 %' });
    expect(bad('0.15', 'percent')).toMatchObject({ code: 'NO_UNIT', corrected: null });
    expect(bad('4.5 eV', 'number')).toMatchObject({ code: 'WRONG_UNIT', corrected: '4.5' });
    expect(bad('6.0', 'count')).toMatchObject({ code: 'NOT_A_COUNT', corrected: '6' });
    expect(bad('6(1)', 'count')).toMatchObject({ code: 'NOT_A_COUNT' });
    expect(bad('1E3', 'count')).toMatchObject({ code: 'EXPONENT', corrected: '1000' });
    expect(bad('x'.repeat(200)).found).toHaveLength(60);
  });
});

describe('laws', () => {
  const kinds: Wanted[] = ['energy', 'temperature', 'percent', 'number', 'absorption-coefficient', 'count'];
  const soup = fc.string({ unit: fc.constantFrom(...'0123456789..,,-+±() ()eEkK=x×^%°CcmnmeVµ⁻¹−∞~<'), maxLength: 30 });

  test('no text makes the reader throw, every mended text is read, and what is read is finite', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary', maxLength: 100 }), soup), fc.constantFrom(...kinds), (text, wanted) => {
        const parsed = parseQuantity(text, wanted);
        if (!parsed.ok) {
          if (parsed.corrected !== null) expect(parseQuantity(parsed.corrected, wanted).ok).toBe(true);
          return;
        }
        const { value, u, uMinus, uPlus, halfDigit } = parsed.quantity;
        expect(Number.isFinite(value)).toBe(true);
        expect(halfDigit).toBeGreaterThan(0);
        expect([u === null, uMinus === null, uPlus === null]).toEqual(Array(3).fill(u === null));
        if (u !== null && uMinus !== null && uPlus !== null) {
          expect(Math.min(uMinus, uPlus)).toBeGreaterThan(0);
          expect(u).toBe(Math.max(uMinus, uPlus));
        }
      }),
      { numRuns: 3000 },
    );
  });

  test('a comma between digits is never read as anything', () => {
    fc.assert(
      fc.property(fc.nat(99999), fc.nat(9999), fc.constantFrom('cm-1', 'nm', 'eV'), (left, right, unit) => {
        expect(['THOUSANDS_COMMA', 'DECIMAL_COMMA']).toContain(bad(`${left},${right} ${unit}`).code);
      }),
    );
  });

  test('scale: moving the point of number and uncertainty together moves the result alike', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999999 }), fc.integer({ min: 1, max: 99 }), fc.integer({ min: 0, max: 9 }), (digits, u, places) => {
        const whole = good(`${digits}(${u}) cm-1`);
        const scaled = good(`${(BigInt(digits)).toString().padStart(places + 1, '0').replace(new RegExp(`(\\d{${places}})$`), places ? '.$1' : '$1')}(${u}) cm-1`);
        expect(scaled.value).toBeCloseTo(whole.value / 10 ** places, 12);
        expect((scaled.u ?? 0) / (whole.u ?? 1)).toBeCloseTo(10 ** -places, 12);
        expect(scaled.halfDigit / whole.halfDigit).toBeCloseTo(10 ** -places, 12);
      }),
    );
  });
});
