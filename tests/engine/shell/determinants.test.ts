import { describe, expect, test } from 'vitest';
import { alphaOf, betaOf, countBits, determinants, minors, occupied, orbitalSets, pairElement } from '../../../engine/shell/determinants.ts';
import { pairIntegrals } from '../../../engine/shell/integrals.ts';
import { seeded } from '../../published/random.ts';

describe('determinants', () => {
  test('there are C(5, up) C(5, down) of them, all different, each with the electrons asked for', () => {
    const choose = [1, 5, 10, 10, 5, 1];
    for (let up = 0; up <= 5; up++)
      for (let down = 0; down <= 5; down++) {
        const all = determinants(up, down);
        expect(new Set(all).size).toBe(choose[up]! * choose[down]!);
        for (const determinant of all) {
          expect(countBits(alphaOf(determinant))).toBe(up);
          expect(countBits(betaOf(determinant))).toBe(down);
          expect(occupied(determinant)).toHaveLength(up + down);
        }
      }
  });

  test('occupied spin orbitals are listed ascending, spin up first', () => {
    expect(occupied(0b01001_00101)).toEqual([0, 2, 5, 8]);
    expect(occupied(0)).toEqual([]);
  });
});

/** The same element straight from (1/2) sum <pq|rs> p+ q+ s r on strings of creators, one exchange of neighbours at a time. */
function byOperators(left: number, right: number, pair: Float64Array): number {
  const apply = (start: { mask: number; sign: number }, p: number, creates: boolean) => {
    const holds = (start.mask & (1 << p)) !== 0;
    if (holds === creates) return null;
    const before = occupied(start.mask).filter((bit) => bit < p).length;
    return { mask: start.mask ^ (1 << p), sign: before % 2 === 0 ? start.sign : -start.sign };
  };
  let sum = 0;
  for (let r = 0; r < 10; r++) for (let s = 0; s < 10; s++) {
    const first = apply({ mask: right, sign: 1 }, r, false);
    const second = first && apply(first, s, false);
    if (!second) continue;
    for (let p = 0; p < 10; p++) for (let q = 0; q < 10; q++) {
      if (p < 5 !== r < 5 || q < 5 !== s < 5) continue;
      const third = apply(second, q, true);
      const fourth = third && apply(third, p, true);
      if (fourth?.mask === left) sum += (fourth.sign * pair[(((p % 5) * 5 + (q % 5)) * 5 + (r % 5)) * 5 + (s % 5)]!) / 2;
    }
  }
  return sum;
}

describe('two-electron elements', () => {
  const { racahB, racahC } = pairIntegrals();

  test('the integrals have the symmetry of real orbitals: electrons may be exchanged, and either of them turned round', () => {
    for (const pair of [racahB, racahC]) {
      const at = (a: number, b: number, c: number, d: number) => pair[((a * 5 + b) * 5 + c) * 5 + d]!;
      for (let a = 0; a < 5; a++) for (let b = 0; b < 5; b++) for (let c = 0; c < 5; c++) for (let d = 0; d < 5; d++)
        for (const other of [at(b, a, d, c), at(c, b, a, d), at(a, d, c, b)]) expect(other).toBeCloseTo(at(a, b, c, d), 12);
    }
  });

  // Published: J. S. Griffith, The Theory of Transition-Metal Ions, table A26, with A dropped; from memory.
  test('Coulomb and exchange integrals of the real d orbitals are the published ones', () => {
    const [yz, xz, xy, z2, x2y2] = [0, 1, 2, 3, 4];
    const coulomb = (a: number, b: number) => [racahB, racahC].map((pair) => pair[((a * 5 + b) * 5 + a) * 5 + b]!);
    const exchange = (a: number, b: number) => [racahB, racahC].map((pair) => pair[((a * 5 + b) * 5 + b) * 5 + a]!);
    const rows: [number[], number, number][] = [
      ...[yz, xz, xy, z2, x2y2].map((a): [number[], number, number] => [coulomb(a!, a!), 4, 3]),
      [coulomb(xz!, yz!), -2, 1], [coulomb(xy!, yz!), -2, 1], [coulomb(xy!, xz!), -2, 1],
      [coulomb(z2!, xz!), 2, 1], [coulomb(z2!, yz!), 2, 1], [coulomb(z2!, xy!), -4, 1],
      [coulomb(z2!, x2y2!), -4, 1], [coulomb(x2y2!, xz!), -2, 1], [coulomb(x2y2!, yz!), -2, 1], [coulomb(x2y2!, xy!), 4, 1],
      [exchange(xz!, yz!), 3, 1], [exchange(xy!, yz!), 3, 1], [exchange(xy!, xz!), 3, 1],
      [exchange(z2!, xz!), 1, 1], [exchange(z2!, yz!), 1, 1], [exchange(z2!, xy!), 4, 1],
      [exchange(z2!, x2y2!), 4, 1], [exchange(x2y2!, xz!), 3, 1], [exchange(x2y2!, yz!), 3, 1], [exchange(x2y2!, xy!), 0, 1],
    ];
    const bad = rows.flatMap(([[b, c], wantedB, wantedC], i) => (Math.abs(b! - wantedB) < 1e-12 && Math.abs(c! - wantedC) < 1e-12 ? [] : [`row ${i}: ${b} B + ${c} C, printed ${wantedB} B + ${wantedC} C`]));
    expect(bad).toEqual([]);
  });

  test('the Slater-Condon rules give what the operators give, one exchange at a time', () => {
    const random = seeded(1929);
    let nonzero = 0;
    for (const [up, down] of [[1, 1], [2, 1], [2, 2], [3, 2], [4, 3], [5, 3]] as const) {
      const all = determinants(up, down);
      for (let trial = 0; trial < 120; trial++) {
        const left = all[Math.floor(random() * all.length)]!;
        const right = trial % 10 === 0 ? left : all[Math.floor(random() * all.length)]!;
        const expected = byOperators(left, right, racahB);
        expect(pairElement(left, right, racahB)).toBeCloseTo(expected, 11);
        if (Math.abs(expected) > 1e-9) nonzero++;
      }
    }
    expect(nonzero).toBeGreaterThan(100);
  });

  test('more than two electrons in other orbitals give 0', () => {
    expect(pairElement(0b00111, 0b11000 | (1 << 5), racahB)).toBe(0);
  });
});

describe('minors', () => {
  const random = seeded(5);
  const [a, b] = [0, 1].map(() => Float64Array.from({ length: 25 }, () => 2 * random() - 1)) as [Float64Array, Float64Array];
  const times = (x: Float64Array, y: Float64Array, n: number) =>
    Float64Array.from({ length: n * n }, (_, at) => Array.from({ length: n }, (__, k) => x[Math.floor(at / n) * n + k]! * y[k * n + (at % n)]!).reduce((s, v) => s + v));

  test.each([0, 1, 2, 3, 4, 5])('of order %i: those of a product are the product of those (Cauchy and Binet)', (size) => {
    const count = orbitalSets(size).length;
    const together = minors(times(a, b, 5), size);
    times(minors(a, size), minors(b, size), count).forEach((value, i) => expect(value).toBeCloseTo(together[i]!, 11));
  });

  test('of order 1 are the matrix itself, of order 5 its determinant', () => {
    expect([...minors(a, 1)]).toEqual([...a]);
    const triangular = Float64Array.from({ length: 25 }, (_, at) => (at % 5 > Math.floor(at / 5) ? a[at]! : at % 6 === 0 ? at + 1 : 0));
    expect(minors(triangular, 5)[0]).toBeCloseTo(1 * 7 * 13 * 19 * 25, 8);
  });
});
