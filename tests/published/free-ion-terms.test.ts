import { expect, test } from 'vitest';
import { fitTerms, levels, racahBOfTwoTerms, termEnergies, termSource, termTables } from '#engine';
import { parameterSets } from './random.ts';
import { checkTable, reportStandings } from './table.ts';
import type { Row } from './table.ts';

reportStandings('free-ion terms');

/** How a term splits in a cubic field, by L. Source: H. Bethe, Ann. Phys. 395, 133 (1929). */
const cubic: Readonly<Record<string, string>> = {
  S: 'A1', P: 'T1', D: 'E T2', F: 'A2 T1 T2', G: 'A1 E T1 T2', H: 'E T1 T1 T2', I: 'A1 A2 E T1 T2 T2',
};

/** Energies above the ground term, gathered by block ("3T1") and ascending. */
function byBlock(entries: readonly { readonly block: string; readonly energy: number }[]): Record<string, number[]> {
  const gathered: Record<string, number[]> = {};
  for (const { block, energy } of entries) gathered[block] = [...(gathered[block] ?? []), energy];
  for (const list of Object.values(gathered)) list.sort((a, b) => a - b);
  return gathered;
}

for (const electrons of [1, 2, 3, 4, 5, 6, 7, 8, 9]) {
  for (const geometry of ['octahedral', 'tetrahedral'] as const) {
    test(`d${electrons} ${geometry}: at Delta = 0 every block holds exactly the terms of Racah's formulas`, () => {
      for (const { racahB, racahC } of parameterSets(4, 60 + electrons)) {
        const terms = termEnergies(electrons, racahB, racahC);
        const ground = terms[0]?.energy ?? Number.NaN;
        const expected = byBlock(terms.flatMap(({ term, energy }) =>
          (cubic[term[1] ?? ''] ?? '').split(' ').map((irrep) => ({ block: `${term[0]}${irrep}`, energy: energy - ground }))));
        const got = byBlock(levels({ electrons, geometry }, { delta: 0, racahB, racahC })
          .map(({ multiplicity, irrep, energy }) => ({ block: `${multiplicity}${irrep.replace('g', '')}`, energy })));
        expect(Object.keys(got).toSorted()).toEqual(Object.keys(expected).toSorted());
        const highest = Math.max(...terms.map(({ energy }) => energy - ground), 1);
        checkTable(Object.entries(expected).flatMap(([block, energies]) => {
          expect(got[block], `size of block ${block}`).toHaveLength(energies.length);
          return energies.map((energy, place): Row => ({
            name: `d${electrons} ${block} ${place + 1}`, got: got[block]?.[place] ?? null, expected: energy, tolerance: 1e-9 * highest,
            standing: 'memory', source: 'Racah, Phys. Rev. 62, 438 (1942)',
          }));
        }));
      }
    });
  }
}

/** B from the two highest-multiplicity terms, then B, C and rms misfit of the least squares over all terms, whole cm-1. */
const fitted: readonly (readonly [ion: string, twoTerms: number | null, fit: readonly [number, number, number] | null])[] = [
  ['Ti(II)', 695, [708, 2387, 393]], ['V(II)', 755, [769, 2794, 533]], ['V(III)', 862, null], ['Cr(III)', 917, [945, 3586, 640]],
  ['Mn(IV)', 1065, [1103, 4288, 749]], ['Co(II)', 971, [1000, 4073, 757]], ['Ni(II)', 1056, [1082, 3982, 571]],
  ['Ni(III)', null, [1168, 4702, 833]], ['Mn(II)', null, [889, 3404, 745]], ['Cr(II)', null, [844, 3027, 877]],
  ['Fe(II)', null, [935, 3721, 870]], ['Fe(III)', null, [1068, 4124, 861]],
];

test('B and C of the measured terms are those of an independent program', () => {
  checkTable(fitted.flatMap(([ion, twoTerms, expected]) => {
    const table = termTables.find((candidate) => candidate.ion === ion);
    if (table === undefined) throw new Error(`no terms of ${ion}`);
    // Half of the last printed digit, and the rounding of the terms themselves.
    const row = (name: string, got: number | null, value: number): Row => ({
      name: `${ion} ${name}`, got, expected: value, tolerance: 0.6, standing: 'computed', source: `independent least squares; ${termSource}`,
    });
    const rows = twoTerms === null ? [] : [row('B from two terms', racahBOfTwoTerms(table), twoTerms)];
    if (expected === null) return rows;
    const fit = fitTerms(table.electrons, table.terms);
    return [...rows, row('B', fit.racahB, expected[0]), row('C', fit.racahC, expected[1]), row('rms', fit.rms, expected[2])];
  }));
});

test('one B and C reproduce every measured term to two and a half times the rms misfit: the limit of the method, 400 to 2200 cm-1', () => {
  checkTable(termTables.filter(({ terms }) => terms.length > 3).flatMap(({ ion, electrons, terms }) => {
    const { residuals, rms } = fitTerms(electrons, terms);
    return terms.map(({ term, energy }, place): Row => ({
      name: `${ion} ${term}`, got: energy - (residuals[place] ?? Number.NaN), expected: energy, tolerance: 2.5 * rms,
      standing: 'published', source: termSource,
    }));
  }));
});
