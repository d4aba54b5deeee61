import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  parseQuantity, parseRange, parseRanges, type Quantity, toFraction, toKelvin, toWavenumber, type Wanted, wavelength, wavelengthShown, widthToWavenumber,
} from '#engine';

function quantity(text: string, wanted: Wanted = 'energy'): Quantity {
  const parsed = parseQuantity(text, wanted);
  if (!parsed.ok) throw new Error(parsed.mend);
  return parsed.quantity;
}

describe('to wavenumbers', () => {
  test('1 eV is 8065.543937 cm-1 (NIST, CODATA 2018 energy equivalents)', () => {
    expect(toWavenumber(quantity('1.0 eV')).position).toBeCloseTo(8065.543937, 6);
    expect(toWavenumber(quantity('1000(1) meV')).uPlus).toBeCloseTo(8.065543937, 9);
  });

  test('kilokayser and wavenumbers are exact', () => {
    expect(toWavenumber(quantity('21.55(6) kK'))).toEqual({ position: 21550, uMinus: 60, uPlus: 60, halfDigit: 5 });
    expect(toWavenumber(quantity('21550 cm-1'))).toEqual({ position: 21550, uMinus: null, uPlus: null, halfDigit: 0.5 });
  });

  test('a wavelength: 1e7/lambda, u times 1e7/lambda squared', () => {
    const found = toWavenumber(quantity('500.0(5) nm'));
    expect(found.position).toBeCloseTo(20000, 9);
    expect(found.uPlus).toBeCloseTo(20, 9);
    expect(found.halfDigit).toBeCloseTo(2, 9);
    expect(toWavenumber(quantity('0.5000(5) µm')).uMinus).toBeCloseTo(20, 9);
  });

  test('the two sides of a wavelength change places', () => {
    const found = toWavenumber(quantity('500(+2 -1) nm'));
    expect(found.uMinus).toBeCloseTo(80, 9);
    expect(found.uPlus).toBeCloseTo(40, 9);
  });

  test('law: the first-order u agrees with the difference quotient', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2000, max: 20000 }), fc.integer({ min: 1, max: 9 }), (tenths, u) => {
        const text = (tenths / 10).toFixed(1);
        const { uPlus } = toWavenumber(quantity(`${text}(${u}) nm`));
        const lambda = tenths / 10;
        const difference = (1e7 / (lambda - u / 10) - 1e7 / (lambda + u / 10)) / 2;
        expect(uPlus).not.toBeNull();
        expect((uPlus ?? 0) / difference).toBeCloseTo(1, 3);
      }),
    );
  });

  test('units that are not of energy are refused', () => {
    expect(() => toWavenumber(quantity('295 K', 'temperature'))).toThrow(RangeError);
    expect(() => toWavenumber({ ...quantity('500 nm'), value: 0 })).toThrow(RangeError);
  });
});

describe('widths', () => {
  test('a width in nm is the distance of the two half-height points', () => {
    expect(widthToWavenumber(20000, quantity('80 nm'))).toBeCloseTo(1e7 / 460 - 1e7 / 540, 9);
    expect(widthToWavenumber(20000, quantity('3100 cm-1'))).toBe(3100);
  });

  test('a width wider than its band allows has no lower half-height point', () => {
    expect(widthToWavenumber(20000, quantity('1000 nm'))).toBeNull();
    expect(() => widthToWavenumber(0, quantity('80 nm'))).toThrow(RangeError);
  });
});

describe('ranges', () => {
  const range = (text: string) => {
    const parsed = parseRange(text);
    if (!parsed.ok) throw new Error(parsed.mend);
    return parsed.range;
  };

  test.each(['28600 - 33300 cm-1', '28600-33300 cm-1', '28 600 – 33 300 cm⁻¹', '28600 cm-1 - 33300 cm-1', '33300 to 28600 cm-1', '28.6 - 33.3 kK'])('%s', (text) => {
    expect(range(text)).toEqual({ low: 28600, high: 33300 });
  });

  test('wavelengths swap ends', () => {
    expect(range('400 - 1000 nm')).toEqual({ low: 10000, high: 25000 });
  });

  test('several ranges, separated by semicolons', () => {
    expect(parseRanges('400 - 500 nm; 8000 - 10000 cm-1')).toEqual({ ok: true, ranges: [{ low: 20000, high: 25000 }, { low: 8000, high: 10000 }] });
  });

  test.each([
    ['', 'EMPTY', null],
    ['300 nm', 'BAD_RANGE', null],
    ['300 - 300 nm', 'BAD_RANGE', null],
    ['300 - 1100', 'NO_UNIT', '300 - 1100 nm'],
    ['28,600 - 33,300 cm-1', 'THOUSANDS_COMMA', '28600 - 33300 cm-1'],
    ['28600(50) - 33300 cm-1', 'BAD_UNCERTAINTY', null],
    ['28600 - 33300 furlong', 'UNKNOWN_UNIT', null],
    ['- - - -', 'BAD_RANGE', null],
  ])('%s is refused', (text, code, corrected) => {
    expect(parseRange(text)).toMatchObject({ ok: false, code, corrected, found: text });
  });

  test('no text makes the reader throw; a mended range is read', () => {
    const soup = fc.string({ unit: fc.constantFrom(...'0123456789.,-– ;cmnmeVkK()to⁻¹'), maxLength: 40 });
    fc.assert(
      fc.property(fc.oneof(soup, fc.string({ unit: 'binary' })), (text) => {
        const parsed = parseRange(text);
        if (parsed.ok) expect(parsed.range.low).toBeLessThan(parsed.range.high);
        else if (parsed.corrected !== null) expect(parseRange(parsed.corrected)).toMatchObject({ ok: true });
        parseRanges(text);
      }),
      { numRuns: 2000 },
    );
  });
});

test('temperatures and percentages', () => {
  expect(toKelvin(quantity('22(1) °C', 'temperature'))).toEqual({ value: 295.15, u: 1 });
  expect(toKelvin(quantity('77 K', 'temperature'))).toEqual({ value: 77, u: null });
  expect(toFraction(quantity('15 %', 'percent'))).toEqual({ value: 0.15, u: null });
});

test('wavelengths for show', () => {
  expect(wavelength(20000)).toBe(500);
  expect(wavelengthShown(21550, 60)).toBe('464.0(13)');
  expect(wavelengthShown(21550, null)).toBe('464');
  expect(wavelengthShown(8500, null)).toBe('1176');
});
