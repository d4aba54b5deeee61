import { describe, expect, test } from 'vitest';
import { factorMap, factorSeries, fitFactors, isPrediction } from '#engine';
import type { SeriesResult } from '#engine';
import { runsAlike } from '../../../engine/series/groups.ts';
import { result, testPolicy } from './sample.ts';

const f: Readonly<Record<string, number>> = { chlorido: 0.78, fluorido: 0.9, aqua: 1, urea: 1.01, ammine: 1.25 };
const g: Readonly<Record<string, number>> = { 'Cr(III)': 17400, 'V(II)': 12000, 'Mo(III)': 24600 };
const regular = Object.entries(g).flatMap(([ion, gValue]) => Object.entries(f).map(([ligand, fValue]) => result({ ion, ligands: { [ligand]: 6 }, delta: gValue * fValue })));
const fit = (results: readonly SeriesResult[]) => fitFactors(results, { parameter: 'Delta', geometry: 'octahedral', policy: testPolicy, aqua: 'aqua' });

describe('runs of neighbours that cannot be told apart', () => {
  const within = (values: readonly number[], reach: number) => runsAlike(values.length, (i, j) => Math.abs(values[i]! - values[j]!) <= reach);
  test('runs overlap where likeness is not carried on, and none lies within another', () => {
    expect(within([0, 1, 2, 5, 6, 9], 1)).toEqual([{ first: 0, last: 1 }, { first: 1, last: 2 }, { first: 3, last: 4 }]);
    expect(within([0, 1, 2], 2)).toEqual([{ first: 0, last: 2 }]);
    expect(within([0, 3, 6], 1)).toEqual([]);
    expect([within([], 1), within([1], 1)]).toEqual([[], []]);
  });
  test('every pair of a run is alike, and every alike pair of neighbours stands in a run', () => {
    const values = Array.from({ length: 40 }, (_, i) => i + 0.9 * Math.sin(3 * i)).sort((a, b) => a - b);
    const runs = within(values, 2.3);
    for (const { first, last } of runs) for (let i = first; i < last; i++) for (let j = i + 1; j <= last; j++) expect(values[j]! - values[i]!).toBeLessThanOrEqual(2.3);
    for (let i = 1; i < values.length; i++)
      if (values[i]! - values[i - 1]! <= 2.3) expect(runs.some(({ first, last }) => first <= i - 1 && i <= last)).toBe(true);
  });
});

describe('factors in their order', () => {
  test('ascend, ligands and ions apart; near ones are bracketed, far ones are not', () => {
    const [ligands, ions] = factorSeries(fit(regular));
    expect(ligands!.factors.map(({ name }) => name)).toEqual(['chlorido', 'fluorido', 'aqua', 'urea', 'ammine']);
    expect(ions!.factors.map(({ name }) => name.split(' ')[0])).toEqual(['V(II)', 'Cr(III)', 'Mo(III)']);
    expect(ligands!.groups).toEqual([{ first: 2, last: 3 }]);
    expect(ions!.groups).toEqual([]);
  });
  test('two ions that share all their ligands are told apart by their own data: the doubt of the shared ligands falls out', () => {
    // g of two ions known only through one ligand of uncertain f: each u is large, that of their ratio is not.
    const chain = [
      result({ ion: 'Cr(III)', ligands: { aqua: 6 }, delta: 17400, uDeltaTotal: 3000 }), result({ ion: 'Cr(III)', ligands: { ammine: 6 }, delta: 21600, uDeltaTotal: 10 }),
      result({ ion: 'V(II)', ligands: { ammine: 6 }, delta: 15000, uDeltaTotal: 10 }), result({ ion: 'Mo(III)', ligands: { ammine: 6 }, delta: 18000, uDeltaTotal: 10 }),
    ];
    const ions = factorSeries(fit(chain)).find(({ kind }) => kind === 'ion')!;
    const [vanadium, molybdenum] = ions.factors;
    expect(molybdenum!.value! - vanadium!.value!).toBeLessThan(2 * Math.hypot(vanadium!.u!, molybdenum!.u!));
    expect(ions.groups.some(({ first, last }) => first <= 0 && last >= 1)).toBe(false);
  });
  test('islands stand apart', () => {
    const apart = [...regular, result({ ion: 'Ni(II)', multiplicity: 3, ligands: { bromido: 6 }, delta: 7000 })];
    expect(factorSeries(fit(apart)).map(({ kind, island, factors }) => [kind, island, factors.length])).toEqual([['ligand', 1, 5], ['ion', 1, 3], ['ligand', 2, 1], ['ion', 2, 1]]);
  });
});

describe('the map of ions and ligands', () => {
  const without = regular.filter(({ complex }) => !(complex.ion.name === 'V(II)' && complex.ligands[0]!.ligand === 'ammine'));
  test('a complex that is not there is predicted by the factors of the others', () => {
    const map = factorMap(fit(without));
    expect([map.ions.length, map.ligands.length, map.rows.length, map.rows[0]!.length]).toEqual([3, 5, 3, 5]);
    const cell = map.rows.flat().find(({ ion, ligand }) => ion.startsWith('V(II)') && ligand === 'ammine')!;
    expect(cell.found).toBeNull();
    expect(isPrediction(cell.predicted) && cell.predicted.predicted).toBeCloseTo(15000, 0);
    expect(map.rows.flat().filter(({ found }) => found !== null)).toHaveLength(14);
  });
  test('a measured complex is predicted without its own data', () => {
    const odd = regular.map((one) => (one.complex.ion.name === 'V(II)' && one.complex.ligands[0]!.ligand === 'ammine' ? result({ ion: 'V(II)', ligands: { ammine: 6 }, delta: 12000 }) : one));
    const cell = factorMap(fit(odd)).rows.flat().find(({ ion, ligand }) => ion.startsWith('V(II)') && ligand === 'ammine')!;
    expect(cell.found!.result.parameters.Delta.value).toBe(12000);
    expect(isPrediction(cell.predicted) && cell.predicted.predicted).toBeGreaterThan(14000);
  });
  test('what nothing fixes says why; a mixed complex fills no cell', () => {
    const apart = factorMap(fit([...regular, result({ ion: 'Ni(II)', multiplicity: 3, ligands: { bromido: 6 }, delta: 7000 }), result({ ion: 'Cr(III)', ligands: { aqua: 3, ammine: 3 }, delta: 19500 })]));
    const cells = apart.rows.flat();
    const across = cells.find(({ ion, ligand }) => ion.startsWith('Ni(II)') && ligand === 'aqua')!;
    expect(across.predicted).toEqual({ reason: expect.stringContaining('different islands') });
    expect(cells.filter(({ found }) => found !== null)).toHaveLength(16);
    expect(factorMap(fit([]))).toEqual({ ions: [], ligands: [], rows: [] });
  });
});
