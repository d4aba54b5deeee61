import { expect, test } from 'vitest';
import { atomicLevelsSet, fitTerms, freeIon, freeIonSets, freeIonsIn, parseIon, racahBOfTwoTerms, termTables } from '#engine';

const tableOf = (ion: string) => {
  const table = termTables.find((candidate) => candidate.ion === ion);
  if (table === undefined) throw new Error(`no terms of ${ion}`);
  return table;
};

// Computed for this project by an independent program from the NIST levels; printed to whole cm-1.
test.each([
  ['Ti(II)', 695], ['V(II)', 755], ['V(III)', 862], ['Cr(III)', 917], ['Mn(IV)', 1065], ['Co(II)', 971], ['Ni(II)', 1056],
])('15 B0 = E(P) - E(F) gives B0 of %s as %i', (ion, expected) => {
  expect(Math.round(racahBOfTwoTerms(tableOf(ion)) ?? Number.NaN)).toBe(expected);
});

// As above: unweighted least squares of B, C and an offset by an independent program.
test.each([
  ['Ti(II)', 708, 2387, 393], ['V(II)', 769, 2794, 533], ['Mn(IV)', 1103, 4288, 749], ['Mn(II)', 889, 3404, 745], ['Cr(II)', 844, 3027, 877],
  ['Fe(II)', 935, 3721, 870], ['Ni(III)', 1168, 4702, 833], ['Cr(III)', 945, 3586, 640], ['Fe(III)', 1068, 4124, 861], ['Co(II)', 1000, 4073, 757],
  ['Ni(II)', 1082, 3982, 571],
])('all terms of %s give B %i, C %i with a misfit of %i', (ion, b, c, rms) => {
  const { electrons, terms } = tableOf(ion);
  const fit = fitTerms(electrons, terms);
  expect([Math.round(fit.racahB), Math.round(fit.racahC), Math.round(fit.rms)]).toEqual([b, c, rms]);
});

test('the set atomic-levels takes B0 from two terms for d2, d3, d7 and d8, else from all terms, and says which', () => {
  for (const table of termTables) {
    const row = freeIon('atomic-levels', { name: table.ion });
    const twoTerms = racahBOfTwoTerms(table);
    const expected = twoTerms ?? fitTerms(table.electrons, table.terms).racahB;
    expect(row?.racahB0, table.ion).toBeCloseTo(expected, 1);
    expect(row?.kind).toBe([2, 3, 7, 8].includes(table.electrons) ? 'two highest-multiplicity terms' : 'least squares over all terms');
    expect(row?.source).toContain(table.spectrum);
  }
});

test('a set that has no row for an ion answers null and borrows nothing', () => {
  for (const name of ['Co(III)', 'Rh(III)', 'Cu(II)', 'Ti(III)']) expect(freeIon('atomic-levels', { name })).toBeNull();
  for (const name of ['Ti(III)', 'Zn(II)']) expect(freeIon('published', { name })).toBeNull();
  expect(freeIon('published', { name: 'Co(III)' })?.racahB0).toBe(1065);
});

test('every row names an ion of the table once, its set and a source; positive B0, C0 positive or null', () => {
  for (const { name, sources, version } of freeIonSets) {
    const rows = freeIonsIn(name);
    expect(rows.length).toBeGreaterThan(10);
    expect(new Set(rows.map(({ ion }) => ion)).size).toBe(rows.length);
    expect(version).not.toBe('');
    expect(sources.length).toBeGreaterThan(0);
    for (const row of rows) {
      expect(parseIon(row.ion).ion?.name).toBe(row.ion);
      expect(row.set).toBe(name);
      expect(row.source.length).toBeGreaterThan(20);
      expect(row.racahB0).toBeGreaterThan(0);
      expect(row.racahC0 === null || row.racahC0 > row.racahB0).toBe(true);
    }
  }
});

test('rows that were not seen in print say so', () => {
  for (const name of ['Mn(IV)', 'Cu(II)', 'Rh(III)', 'Pt(IV)']) expect(freeIon('published', { name })?.source).toContain('B0: from memory');
  expect(freeIon('published', { name: 'Cr(III)' })?.source).toContain('Jolly');
  for (const { racahC0, source } of freeIonsIn('published')) if (racahC0 !== null) expect(source).toMatch(/C0.*from memory/);
});

test('the two sets differ by at most 5 % where B0 is of the same kind, by at most 6 % elsewhere', () => {
  const ratios = atomicLevelsSet().flatMap((row) => {
    const other = freeIon('published', { name: row.ion });
    return other === null ? [] : [{ kind: row.kind, difference: Math.abs(row.racahB0 / other.racahB0 - 1) }];
  });
  expect(ratios.length).toBe(13);
  for (const { kind, difference } of ratios) expect(difference).toBeLessThan(kind.startsWith('two') ? 0.05 : 0.06);
});
