import { describe, expect, test } from 'vitest';
import { complementaryError, upperTail } from '../../../engine/readings/chiSquare.ts';
import { checkTable, reportStandings } from '../../published/table.ts';
import type { Row } from '../../published/table.ts';

reportStandings('chi-square');

const tableOfChiSquare = 'M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, table 26.8 (from memory)';
const tableOfError = 'M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, table 7.1 (from memory)';

/** chi2 exceeded with probability Q, as printed: degrees of freedom, then Q and the printed digits. */
const quantiles: readonly (readonly [number, Readonly<Record<string, string>>])[] = [
  [1, { 0.5: '0.454937', 0.1: '2.70554', 0.05: '3.84146', 0.025: '5.02389', 0.01: '6.63490', 0.005: '7.87944', 0.001: '10.828' }],
  [2, { 0.995: '0.0100251', 0.5: '1.38629', 0.1: '4.60517', 0.05: '5.99147', 0.025: '7.37776', 0.01: '9.21034', 0.005: '10.5966', 0.001: '13.816' }],
  [3, { 0.5: '2.36597', 0.1: '6.25139', 0.05: '7.81473', 0.025: '9.34840', 0.01: '11.3449', 0.005: '12.8381', 0.001: '16.266' }],
  [4, { 0.5: '3.35670', 0.1: '7.77944', 0.05: '9.48773', 0.025: '11.1433', 0.01: '13.2767', 0.005: '14.8602', 0.001: '18.467' }],
  [5, { 0.995: '0.411740', 0.5: '4.35146', 0.1: '9.23635', 0.05: '11.0705', 0.025: '12.8325', 0.01: '15.0863', 0.005: '16.7496', 0.001: '20.515' }],
  [10, { 0.5: '9.34182', 0.1: '15.9871', 0.05: '18.3070', 0.025: '20.4831', 0.01: '23.2093', 0.005: '25.1882', 0.001: '29.588' }],
  [30, { 0.05: '43.7729', 0.01: '50.8922' }],
];

/** One unit in the last printed digit. */
const lastDigit = (printed: string): number => 10 ** -(printed.split('.')[1]?.length ?? 0);

test('the upper tail at every printed quantile is the probability of its column, to the last printed digit', () => {
  checkTable(
    quantiles.flatMap(([degrees, columns]) =>
      Object.entries(columns).map(([q, printed]): Row => {
        const x = Number(printed);
        const step = lastDigit(printed);
        return {
          name: `chi2 ${printed} with ${degrees} degrees of freedom`, got: upperTail(x, degrees), expected: Number(q),
          tolerance: upperTail(x - step, degrees) - upperTail(x + step, degrees), standing: 'memory', source: tableOfChiSquare,
        };
      }),
    ),
  );
});

test('the printed digits of a table are worth testing: each pins its probability to better than one part in a hundred', () => {
  for (const [degrees, columns] of quantiles)
    for (const [q, printed] of Object.entries(columns)) {
      const step = lastDigit(printed);
      expect((upperTail(Number(printed) - step, degrees) - upperTail(Number(printed) + step, degrees)) / Number(q)).toBeLessThan(0.01);
    }
});

/** Q by Simpson's rule on the density; x = y^2 takes away the pole at 0 of one degree of freedom. */
function integrated(x: number, degrees: number): number {
  const gammas = [Number.NaN, Math.sqrt(Math.PI), 1];
  for (let nu = 3; nu <= degrees; nu++) gammas[nu] = (nu / 2 - 1) * gammas[nu - 2]!;
  const density = (y: number): number => (2 * y ** (degrees - 1) * Math.exp((-y * y) / 2)) / (2 ** (degrees / 2) * gammas[degrees]!);
  const [from, to, pieces] = [Math.sqrt(x), Math.sqrt(x) + 14, 4000];
  const step = (to - from) / pieces;
  let sum = density(from) + density(to);
  for (let i = 1; i < pieces; i++) sum += (i % 2 ? 4 : 2) * density(from + i * step);
  return (sum * step) / 3;
}

describe('laws', () => {
  test.each([1, 2, 3, 4, 5, 6, 7, 12, 25])('%i degrees of freedom: it is the integral of the density, to the accuracy stated', (degrees) => {
    for (const x of [0, 0.01, 0.5, 1, 3, 6.6, 12.4, 12.6, 20, 40]) {
      const expected = integrated(x, degrees);
      expect(Math.abs(upperTail(x, degrees) / expected - 1), `chi2 ${x}`).toBeLessThan(1e-7);
    }
  });

  test.each([1, 2, 3, 4, 9, 10])('%i degrees of freedom: it falls from 1 at chi2 = 0, without a step', (degrees) => {
    expect(upperTail(0, degrees)).toBeCloseTo(1, 15);
    let before = 1;
    for (let x = 0.01; x < 60; x += 0.01) {
      const now = upperTail(x, degrees);
      expect(now).toBeLessThanOrEqual(before);
      // The density is at most 4 from 0.01 on, so no step exceeds it times the width.
      expect(before - now).toBeLessThan(x < 0.015 ? 0.09 : 0.04);
      before = now;
    }
  });

  test('more degrees of freedom leave more in the tail', () => {
    for (const x of [0.1, 1, 5, 20]) for (let degrees = 1; degrees < 12; degrees++) expect(upperTail(x, degrees + 1)).toBeGreaterThan(upperTail(x, degrees));
  });

  // Q(1, x/2) = exp(-x/2).
  test('two degrees of freedom: the exponential', () => {
    for (const x of [0, 0.3, 2, 9.21, 700]) expect(upperTail(x, 2)).toBe(Math.exp(-x / 2));
  });

  test('a hopeless misfit has a probability of 0, never below it and never NaN', () => {
    for (const degrees of [1, 2, 3, 8]) expect(upperTail(1e6, degrees)).toBe(0);
  });
});

describe('the complementary error function', () => {
  test('it agrees with the printed error function', () => {
    checkTable(
      ([[0, 0], [0.1, 0.112462916], [0.25, 0.2763263902], [0.5, 0.5204998778], [0.75, 0.7111556337], [1, 0.8427007929], [1.5, 0.9661051465], [2, 0.995322265]] as const)
        .map(([x, erf]): Row => ({ name: `erfc ${x}`, got: complementaryError(x), expected: 1 - erf, tolerance: 1e-10, standing: 'memory', source: tableOfError })),
    );
  });

  test('far out it keeps its relative accuracy', () => {
    checkTable(
      ([[2.5, 4.069520174e-4], [3, 2.2090497e-5], [4, 1.541725790e-8], [5, 1.537459794e-12]] as const)
        .map(([x, erfc]): Row => ({ name: `erfc ${x}`, got: complementaryError(x), expected: erfc, tolerance: 1e-9 * erfc, standing: 'memory', source: tableOfError })),
    );
  });

  test('series and continued fraction meet at 2.5', () => {
    const [below, above] = [complementaryError(2.5 - 1e-12), complementaryError(2.5)];
    expect(Math.abs(below / above - 1)).toBeLessThan(1e-9);
  });
});

test.each([[-1, 1], [Number.NaN, 1], [1, 0], [1, 1.5], [1, -2], [1, Number.NaN]])('chi2 %d with %d degrees of freedom is refused', (x, degrees) => {
  expect(() => upperTail(x, degrees)).toThrow(RangeError);
});
