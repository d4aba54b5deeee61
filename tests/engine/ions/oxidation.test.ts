import { expect, test } from 'vitest';
import { elementName, ionName, metals, readRomanNumeral, romanNumeral } from '#engine';

test.each([[0, '0'], [1, 'I'], [4, 'IV'], [6, 'VI'], [8, 'VIII'], [9, 'IX'], [-1, '-I'], [-2, '-II']])('oxidation state %i is written %s', (oxidation, numeral) => {
  expect(romanNumeral(oxidation)).toBe(numeral);
  expect(readRomanNumeral(numeral)).toBe(oxidation);
});

test('a real minus sign reads as the hyphen does', () => {
  expect(readRomanNumeral('\u2212I')).toBe(-1);
});

test.each(['', '-0', 'iii', 'IIII', '3', 'IIX'])('"%s" is no Roman numeral', (text) => {
  expect(readRomanNumeral(text)).toBeNull();
});

test('a fraction or a huge oxidation state is refused with the value', () => {
  expect(() => romanNumeral(2.5)).toThrow('2.5');
  expect(() => ionName('Cr', 13)).toThrow('13');
});

test('the table holds ten metals a row, each with its group and an English name', () => {
  for (const row of ['3d', '4d', '5d']) {
    expect(metals.filter((metal) => metal.row === row).map((metal) => metal.group)).toEqual([3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
  }
  expect(elementName('Cr')).toBe('chromium');
  expect(elementName('Hg')).toBe('mercury');
  expect(() => elementName('Al')).toThrow('"Al"');
});
