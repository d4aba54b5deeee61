import { expect, test } from 'vitest';
import { ionName, metals, parseIon, readIonLoosely } from '#engine';

test.each([
  ['Ti(III)', 1, '3d'], ['V(III)', 2, '3d'], ['Cr(III)', 3, '3d'], ['Mn(III)', 4, '3d'], ['Fe(III)', 5, '3d'], ['Co(III)', 6, '3d'],
  ['Co(II)', 7, '3d'], ['Ni(II)', 8, '3d'], ['Cu(II)', 9, '3d'], ['Zn(II)', 10, '3d'], ['Sc(III)', 0, '3d'],
  ['Mo(III)', 3, '4d'], ['Rh(III)', 6, '4d'], ['Pd(II)', 8, '4d'], ['Re(IV)', 3, '5d'], ['Ir(III)', 6, '5d'], ['Pt(IV)', 6, '5d'], ['Au(III)', 8, '5d'],
  ['Ni(0)', 10, '3d'], ['Mn(-I)', 8, '3d'], ['Os(VIII)', 0, '5d'],
])('%s has %i d electrons and belongs to the %s row', (name, electrons, row) => {
  expect(parseIon(name)).toMatchObject({ ion: { name, electrons, row }, reason: null });
});

test('every legal ion of the table reads back from its own name', () => {
  let read = 0;
  for (const { symbol, group } of metals) {
    for (let oxidation = group - 10; oxidation <= group; oxidation += 1) {
      expect(parseIon(ionName(symbol, oxidation)).ion).toMatchObject({ metal: symbol, oxidation, electrons: group - oxidation });
      read += 1;
    }
  }
  expect(read).toBe(30 * 11);
});

test.each([
  ['Cr(VIII)', 'goes up to 6'], ['Sc(IV)', 'goes up to 3'], ['Zn(I)', '11 d electrons'], ['Cu(0)', '11 d electrons'], ['Cr8+', 'goes up to 6'],
])('the impossible d count of %s is refused in words', (text, words) => {
  const { ion, fault, reason, near } = parseIon(text);
  expect(ion).toBeNull();
  expect(fault).toBe('impossible d count');
  expect(reason).toContain(words);
  expect(near.length).toBeGreaterThan(0);
  for (const name of near) expect(parseIon(name).ion?.metal).toBe(text.slice(0, 2));
});

test.each([
  'Cr3+', 'Cr³⁺', 'Cr+3', 'Cr 3+', 'CrIII', 'Cr III', 'Cr(3)', 'Cr(3+)', 'Cr(+3)', 'Cr(iii)', 'cr(III)', 'CR(III)', 'chromium(III)', 'Chromium (III)', ' Cr(III)',
])('"%s" is understood by search; a record is told to write Cr(III)', (text) => {
  expect(readIonLoosely(text)?.name).toBe('Cr(III)');
  expect(parseIon(text)).toMatchObject({ ion: null, fault: 'spelling', near: ['Cr(III)'] });
});

test('Co(II) is cobalt and CO(II) is not taken silently', () => {
  expect(parseIon('Co(II)').ion?.metal).toBe('Co');
  expect(parseIon('CO(II)')).toMatchObject({ ion: null, near: ['Co(II)'] });
});

test.each([
  ['Xr(III)', 'Cr(III)'], ['cromium(III)', 'Cr(III)'], ['Nj(II)', 'Ni(II)'],
])('for the unknown metal %s a near name is offered', (text, near) => {
  expect(parseIon(text)).toMatchObject({ ion: null, fault: 'unknown metal' });
  expect(parseIon(text).near).toContain(near);
});

test('a metal without an oxidation state gets the two states around III', () => {
  expect(parseIon('Cr')).toMatchObject({ ion: null, fault: 'no oxidation state', near: ['Cr(III)', 'Cr(II)'] });
  expect(parseIon('Cr').reason).toContain('oxidation state of chromium is missing');
});

test.each(['', 'd3', 'Al(III)', 'Gd(III)', '3', '(III)', 'Cr(IIII)', 'Cr(XIII)', 'Cr(-0)', 'Cr(III)Cr(III)', '[Cr(NH3)6]3+', 'Cr(III'])(
  '"%s" is no metal ion and has a reason', (text) => {
    const parsed = parseIon(text);
    expect(parsed.ion).toBeNull();
    expect(parsed.reason).not.toBe('');
  });
