import { test } from 'vitest';
import type { FieldIon, FieldParameters } from '#engine';
import { energyAbove } from './levelEnergy.ts';
import { parameterSets } from './random.ts';
import { checkTable, reportStandings } from './table.ts';
import type { Row } from './table.ts';

reportStandings('published matrices');

const source = 'Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 753 and 766 (1954)';
const sets = parameterSets(20, 1954);

/** A block of one or two states as printed: diagonal, then the element between them. D may be negative. */
type Printed = (b: number, c: number, d: number) => readonly [number] | readonly [number, number, number];

const d2: Readonly<Record<string, Printed>> = {
  '3T1': (b, _, d) => [-5 * b, 4 * b + d, 6 * b],
  '3T2': (b, _, d) => [-8 * b + d],
  '3A2': (b, _, d) => [-8 * b + 2 * d],
  '1T1': (b, c, d) => [4 * b + 2 * c + d],
  '1T2': (b, c, d) => [b + 2 * c, 2 * c + d, 2 * Math.sqrt(3) * b],
  '1E': (b, c, d) => [b + 2 * c, 2 * c + 2 * d, -2 * Math.sqrt(3) * b],
  '1A1': (b, c, d) => [10 * b + 5 * c, 8 * b + 4 * c + 2 * d, Math.sqrt(6) * (2 * b + c)],
};
const d3: Readonly<Record<string, Printed>> = {
  '4A2': (b) => [-15 * b],
  '4T2': (b, _, d) => [-15 * b + d],
  '4T1': (b, _, d) => [-3 * b + d, -12 * b + 2 * d, 6 * b],
};
const d5: Readonly<Record<string, Printed>> = {
  '6A1': (b) => [-35 * b],
  '4A1': (b, c) => [-25 * b + 5 * c],
  '4E': (b, c) => [-25 * b + 5 * c, -18 * b + 5 * c, 0],
  '4A2': (b, c) => [-13 * b + 7 * c],
};

/** Eigenvalues of a printed block, ascending, by the closed form for two states. */
function eigenvalues(block: ReturnType<Printed>): readonly number[] {
  if (block.length === 1) return block;
  const [first, second, between] = block;
  const half = Math.hypot((first - second) / 2, between);
  return [(first + second) / 2 - half, (first + second) / 2 + half];
}

/** All energies of the printed blocks above one of them, against the engine's. `sign` is that of D for the ion and geometry. */
function rowsOf(ion: FieldIon, printed: Readonly<Record<string, Printed>>, reference: string, sign: 1 | -1, parameters: FieldParameters): readonly Row[] {
  const { delta, racahB, racahC } = parameters;
  const valuesOf = (block: Printed) => eigenvalues(block(racahB, racahC, sign * delta));
  const zero = valuesOf(printed[reference]!)[0]!;
  const highest = Math.max(...Object.values(printed).flatMap(valuesOf)) - zero;
  return Object.entries(printed).flatMap(([name, block]) => valuesOf(block).map((value, place): Row => ({
    name: `d${ion.electrons} ${ion.geometry} ${name} ${place + 1} at ${Math.round(delta)}/${Math.round(racahB)}/${Math.round(racahC)}`,
    got: energyAbove(ion, parameters, `${name} ${place + 1}`, reference), expected: value - zero,
    tolerance: 1e-9 * (Math.abs(highest) + delta + racahB), standing: 'memory', source,
  })));
}

// d^n and d^(10-n), octahedral and tetrahedral, differ by the sign of D alone.
test.each([
  { name: 'd2', electrons: 2, printed: d2, reference: '3A2' },
  { name: 'd3 quartets', electrons: 3, printed: d3, reference: '4A2' },
] as const)('the printed $name matrices are ours for d^n and d^(10-n), octahedral and tetrahedral', ({ electrons, printed, reference }) => {
  for (const parameters of sets) {
    checkTable([
      ...rowsOf({ electrons, geometry: 'octahedral' }, printed, reference, 1, parameters),
      ...rowsOf({ electrons: 10 - electrons, geometry: 'tetrahedral' }, printed, reference, 1, parameters),
      ...rowsOf({ electrons: 10 - electrons, geometry: 'octahedral' }, printed, reference, -1, parameters),
      ...rowsOf({ electrons, geometry: 'tetrahedral' }, printed, reference, -1, parameters),
    ]);
  }
});

test('the d5 quartets 4A1, 4E and 4A2 stand at 10B + 5C, 10B + 5C and 17B + 5C, 22B + 7C above 6A1 at any Delta', () => {
  for (const parameters of sets) {
    checkTable((['octahedral', 'tetrahedral'] as const).flatMap((geometry) => rowsOf({ electrons: 5, geometry }, d5, '6A1', 1, parameters)));
  }
});

test('A2 ground: nu1 = D, nu2 and nu3 from the square root, and 15B = nu2 + nu3 - 3 nu1', () => {
  for (const { ion, a2, t2, t1 } of [
    { ion: { electrons: 3, geometry: 'octahedral' }, a2: '4A2', t2: '4T2', t1: '4T1' },
    { ion: { electrons: 8, geometry: 'octahedral' }, a2: '3A2', t2: '3T2', t1: '3T1' },
    { ion: { electrons: 2, geometry: 'tetrahedral' }, a2: '3A2', t2: '3T2', t1: '3T1' },
    { ion: { electrons: 7, geometry: 'tetrahedral' }, a2: '4A2', t2: '4T2', t1: '4T1' },
  ] as const) {
    for (const parameters of sets) {
      const { delta: d, racahB: b } = parameters;
      const root = Math.sqrt(225 * b * b - 18 * b * d + d * d);
      const [nu1, nu2, nu3] = [t2, `${t1} 1`, `${t1} 2`].map((level) => energyAbove(ion, parameters, level, a2)) as [number, number, number];
      const row = (name: string, got: number, expected: number): Row =>
        ({ name: `d${ion.electrons} ${ion.geometry} ${name}`, got, expected, tolerance: 1e-9 * (d + 30 * b), standing: 'memory', source });
      checkTable([
        row('nu1', nu1, d), row('nu2', nu2, (15 * b + 3 * d - root) / 2), row('nu3', nu3, (15 * b + 3 * d + root) / 2), row('15B', nu2 + nu3 - 3 * nu1, 15 * b),
      ]);
    }
  }
});

test('T1 ground: T2, A2 and T1(P) from one square root', () => {
  for (const { ion, spin } of [
    { ion: { electrons: 2, geometry: 'octahedral' }, spin: 3 },
    { ion: { electrons: 7, geometry: 'octahedral' }, spin: 4 },
    { ion: { electrons: 3, geometry: 'tetrahedral' }, spin: 4 },
    { ion: { electrons: 8, geometry: 'tetrahedral' }, spin: 3 },
  ] as const) {
    for (const parameters of sets) {
      const { delta: d, racahB: b } = parameters;
      const root = Math.sqrt(225 * b * b + 18 * b * d + d * d);
      const row = (name: string, expected: number): Row => ({
        name: `d${ion.electrons} ${ion.geometry} ${name}`, got: energyAbove(ion, parameters, `${spin}${name}`, `${spin}T1 1`), expected,
        tolerance: 1e-9 * (d + 30 * b), standing: 'memory', source,
      });
      checkTable([row('T2', (d - 15 * b + root) / 2), row('A2', (d - 15 * b + root) / 2 + d), row('T1 2', root)]);
    }
  }
});
