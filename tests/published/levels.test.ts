import { expect, test } from 'vitest';
import { freeIon, levels } from '#engine';
import type { FieldIon, FieldParameters } from '#engine';
import { energyAbove } from './levelEnergy.ts';
import { checkTable, reportStandings } from './table.ts';
import type { Row, RowStanding } from './table.ts';

reportStandings('levels at given parameters');

const octahedral = (electrons: number): FieldIon => ({ electrons, geometry: 'octahedral' });

/** Printed parameters and the levels that an independent program gives for them, in whole cm-1. */
const predicted: readonly {
  readonly name: string; readonly ion: FieldIon; readonly at: FieldParameters; readonly ground: string; readonly expected: Readonly<Record<string, number>>;
}[] = [
  {
    name: 'Co2+ in ZnNH4PO4.6H2O', ion: octahedral(7), at: { delta: 9800, racahB: 870, racahC: 3830 }, ground: '4T1 1',
    expected: { '4T2': 8620, '4A2': 18420, '4T1 2': 20489, '2E 1': 8129 },
  },
  {
    name: 'Ni2+ in ZnNH4PO4.6H2O', ion: octahedral(8), at: { delta: 9500, racahB: 930, racahC: 3550 }, ground: '3A2',
    expected: { '3T2': 9500, '3T1 1': 15616, '3T1 2': 26834, '1E 1': 14032, '1T2 1': 23125 },
  },
  {
    name: 'Fe3+ in oxides', ion: octahedral(5), at: { delta: 14950, racahB: 580, racahC: 3450 }, ground: '6A1',
    expected: { '4T1 1': 10961, '4T2 1': 14838, '4A1': 23050, '4E 1': 23050, '4T2 2': 25009, '4E 2': 27110 },
  },
  { name: 'NH4MnF3', ion: octahedral(5), at: { delta: 6940, racahB: 800, racahC: 3139 }, ground: '6A1', expected: { '4A1': 23695 } },
];

test('printed parameters give the levels of an independent program', () => {
  checkTable(predicted.flatMap(({ name, ion, at, ground, expected }) => Object.entries(expected).map(([level, energy]): Row => ({
    // Half of the last printed digit.
    name: `${name} ${level}`, got: energyAbove(ion, at, level, ground), expected: energy, tolerance: 0.51,
    standing: 'computed', source: 'independent full-configuration program at the printed Delta, B and C',
  }))));
});

test('the worked examples of the A2-ground ions', () => {
  const at = { delta: 17_500, racahB: 623, racahC: 4 * 623 };
  checkTable([{
    name: 'Cr(III) 17500, B 623: third band', got: energyAbove(octahedral(3), at, '4T1 2', '4A2'), expected: 37_950, tolerance: 25,
    standing: 'computed', source: 'independent program; B typed to whole cm-1',
  }]);
});

test('Cr(III) 24600 and 37800 as the two 4T1: no parameters give both; the closest ones have B 855', () => {
  // At fixed Delta/B = x the best scale is closed form; the sum of squares is then a curve in x, walked in small steps.
  const at = (x: number) => {
    const [nu2, nu3] = ['4T1 1', '4T1 2'].map((level) => energyAbove(octahedral(3), { delta: x, racahB: 1, racahC: 4 }, level, '4A2')) as [number, number];
    const racahB = (24_600 * nu2 + 37_800 * nu3) / (nu2 ** 2 + nu3 ** 2);
    return { racahB, misfit: Math.hypot(24_600 - racahB * nu2, 37_800 - racahB * nu3) };
  };
  const steps = Array.from({ length: 401 }, (_, step) => at(10 + step / 20));
  const best = steps.reduce((least, step) => (step.misfit < least.misfit ? step : least));
  expect(best.misfit).toBeGreaterThan(100);
  checkTable([{ name: 'B at the closest point', got: best.racahB, expected: 855, tolerance: 1.5, standing: 'computed', source: 'independent least squares' }]);
});

test("Jørgensen's h from a printed B: h = (1 - B/B0)/k with k 0.21 for Cr(III)", () => {
  const racahB0 = freeIon('published', { name: 'Cr(III)' })?.racahB0 ?? Number.NaN;
  const row = (racahB: number, expected: number, standing: RowStanding, source: string): Row =>
    ({ name: `h at B ${racahB}`, got: (1 - racahB / racahB0) / 0.21, expected, tolerance: 0.0006, standing, source });
  checkTable([
    row(697, 1.146, 'published', 'EPR and optical absorption studies of Cr3+ doped lithium potassium sulphate, abstract'),
    row(676, 1.255, 'computed', 'by hand from B0 918'),
  ]);
});

test('band ratios run between their weak-field and strong-field limits', () => {
  const ratio = (ion: FieldIon, deltaOverB: number, upper: string, lower: string, ground: string) => {
    const at = { delta: deltaOverB, racahB: 1, racahC: 4 };
    return energyAbove(ion, at, upper, ground) / energyAbove(ion, at, lower, ground);
  };
  const rows: Row[] = [];
  const add = (name: string, got: number, expected: number, tolerance: number) =>
    rows.push({ name, got, expected, tolerance, standing: 'computed', source: 'limits of the printed 2 x 2 matrices' });
  for (const electrons of [2, 7]) {
    const spin = electrons === 2 ? 3 : 4;
    add(`d${electrons} A2/T2 weak`, ratio(octahedral(electrons), 1e-3, `${spin}A2`, `${spin}T2`, `${spin}T1 1`), 2.25, 1e-3);
    add(`d${electrons} A2/T2 strong`, ratio(octahedral(electrons), 1e5, `${spin}A2`, `${spin}T2`, `${spin}T1 1`), 2, 1e-3);
    add(`d${electrons} T1(P)/T2 strong`, ratio(octahedral(electrons), 1e5, `${spin}T1 2`, `${spin}T2`, `${spin}T1 1`), 1, 1e-3);
  }
  for (const electrons of [3, 8]) {
    const spin = electrons === 8 ? 3 : 4;
    add(`d${electrons} nu2/nu1 weak`, ratio(octahedral(electrons), 1e-3, `${spin}T1 1`, `${spin}T2`, `${spin}A2`), 1.8, 1e-3);
    add(`d${electrons} nu2/nu1 strong`, ratio(octahedral(electrons), 1e5, `${spin}T1 1`, `${spin}T2`, `${spin}A2`), 1, 1e-3);
    add(`d${electrons} nu3/nu1 strong`, ratio(octahedral(electrons), 1e5, `${spin}T1 2`, `${spin}T2`, `${spin}A2`), 2, 1e-3);
  }
  checkTable(rows);
});

test('a high-spin d7 ion at Delta/B 11 with B 920 has three spin-allowed transitions, the first near 9 200 and the last near 21 200', () => {
  const all = levels(octahedral(7), { delta: 11 * 920, racahB: 920, racahC: 4.6 * 920 });
  expect(all[0]).toMatchObject({ multiplicity: 4, irrep: 'T1g' });
  const quartets = all.filter(({ multiplicity, energy }) => multiplicity === 4 && energy > 0).map(({ energy }) => energy);
  expect(quartets).toHaveLength(3);
  checkTable([
    { name: 'first', got: quartets[0] ?? null, expected: 9_200, tolerance: 0.05 * 9_200, standing: 'common practice', source: 'common practice, no source; ruler on a diagram' },
    { name: 'last', got: quartets[2] ?? null, expected: 21_200, tolerance: 0.05 * 21_200, standing: 'common practice', source: 'common practice, no source; ruler on a diagram' },
  ]);
});
