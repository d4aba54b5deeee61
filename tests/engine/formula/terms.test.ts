import { expect, test } from 'vitest';
import { additiveName, spokenTerm, termParts } from '#engine';

test('a term label is set with a high multiplicity and a low index', () => {
  expect(termParts('b4T1g')).toEqual([
    { text: 'b', style: 'italic' }, { text: '4', style: 'super' }, { text: 'T', style: 'plain' }, { text: '1g', style: 'sub' },
  ]);
  expect(termParts('3A2')).toEqual([{ text: '3', style: 'super' }, { text: 'A', style: 'plain' }, { text: '2', style: 'sub' }]);
  expect(termParts('2E')).toEqual([{ text: '2', style: 'super' }, { text: 'E', style: 'plain' }]);
  expect(termParts('4F')).toEqual([{ text: '4', style: 'super' }, { text: 'F', style: 'plain' }]);
  expect(termParts('4T1g(P)').at(-1)).toEqual({ text: '(P)', style: 'plain' });
});

test('the two names of a pair are set with a comma', () => {
  expect(termParts('a4A1g/a4Eg').map(({ text }) => text).join('')).toBe('a4A1g, a4Eg');
});

test('words that are no term stay as they are', () => {
  expect(termParts('CT')).toEqual([{ text: 'CT', style: 'plain' }]);
  expect(spokenTerm('CT')).toBe('CT');
});

test.each([
  ['b4T1g', 'b quartet T 1 g'],
  ['4T2g', 'quartet T 2 g'],
  ['4T1g(P)', 'quartet T 1 g from P'],
  ['4A1g/4Eg', 'quartet A 1 g and quartet E g'],
  ['2T2', 'doublet T 2'],
  ['6A1g', 'sextet A 1 g'],
  ["2D'", 'doublet D prime'],
])('%s is said %s', (label, said) => {
  expect(spokenTerm(label)).toBe(said);
});

test('additive names after the Red Book 2005, IR-9.2.2: alphabetical order whatever the number, bis and tris with brackets, -ate in anions', () => {
  expect(additiveName('Cr', 'chromium', 'III', [{ name: 'ammine', count: 6 }], 3)).toBe('hexaamminechromium(III)');
  expect(additiveName('Co', 'cobalt', 'III', [{ name: 'ethane-1,2-diamine', count: 3 }], 3)).toBe('tris(ethane-1,2-diamine)cobalt(III)');
  expect(additiveName('Co', 'cobalt', 'II', [{ name: 'chlorido', count: 4 }], -2)).toBe('tetrachloridocobaltate(II)');
  expect(additiveName('Fe', 'iron', 'II', [{ name: 'cyanido', count: 6 }], -4)).toBe('hexacyanidoferrate(II)');
  expect(additiveName('Cr', 'chromium', 'III', [{ name: 'chlorido', count: 1 }, { name: 'ammine', count: 5 }], 2)).toBe('pentaamminechloridochromium(III)');
});
