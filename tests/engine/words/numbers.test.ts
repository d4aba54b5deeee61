import { describe, expect, test } from 'vitest';
import { listed, perCent, wholeNumber } from '../../../engine/words/numbers.ts';

const thin = '\u2009';

describe('wavenumbers in sentences', () => {
  test.each([
    [0, '0'], [7, '7'], [999.6, '1000'], [9999, '9999'], [9999.5, `10${thin}000`], [21_550, `21${thin}550`], [100_000, `100${thin}000`], [1_234_567, `1${thin}234${thin}567`],
  ])('%d is written %s: whole, grouped by thin spaces from five digits on', (value, text) => {
    expect(wholeNumber(value)).toBe(text);
  });

  test('a negative one carries the real minus sign, and what rounds to nothing carries none', () => {
    expect(wholeNumber(-21_550)).toBe(`\u221221${thin}550`);
    expect(wholeNumber(-3)).toBe('\u22123');
    expect(wholeNumber(-0.4)).toBe('0');
  });
});

describe('fractions as per cent', () => {
  test.each([[0.004, '0.4 %'], [0.0312, '3.1 %'], [0.0949, '9.5 %'], [0.1, '10 %'], [0.154, '15 %'], [1.68, '168 %']])('%d is %s', (value, text) => {
    expect(perCent(value)).toBe(text);
  });
});

describe('lists', () => {
  test.each([[[], ''], [['B'], 'B'], [['Delta', 'B'], 'Delta and B'], [['Delta', 'B', 'C'], 'Delta, B and C']])('%j reads %j', (items, text) => {
    expect(listed(items)).toBe(text);
  });
});
