import { describe, expect, test } from 'vitest';
import { heavyAtoms, readStructure } from '../../scripts/structures/layout.ts';

const laidOut = (smiles: string) => {
  const read = readStructure(smiles);
  if (!read.ok) throw new Error(read.reason);
  return read.structure;
};

describe('a structure read from SMILES', () => {
  // Atom counts from the molecular formulas, hydrogen aside.
  test.each([
    ['NCCN', { N: 2, C: 2 }], ['c1ccnc(c1)c1ccccn1', { C: 10, N: 2 }], ['CC(=O)[CH-]C(C)=O', { C: 5, O: 2 }], ['[Cl-]', { Cl: 1 }], ['[2H]O[2H]', { O: 1 }],
  ] as const)('%s holds the atoms of its formula', (smiles, atoms) => {
    expect(Object.fromEntries(heavyAtoms(laidOut(smiles)))).toEqual(atoms);
  });

  test.each(['xx((', 'C1CC', '', '  ', 'C(C', '[Fe', 'c1ccccc', 'N)C'])('"%s" is refused with a reason', (smiles) => {
    const read = readStructure(smiles);
    expect(read.ok).toBe(false);
    if (!read.ok) expect(read.reason).toMatch(/^[a-z][^\n]{3,80}$/);
  });

  test('bonds have one length, and no two atoms lie on each other', () => {
    for (const smiles of ['c1cc2ccc3cccnc3c2nc1', 'NCC(=O)[O-]', 'C1CNCCNCCCNCCN1', 'CS(C)=O']) {
      const { atoms, bonds } = laidOut(smiles);
      for (const { from, to } of bonds) expect(Math.hypot(atoms[from]!.x - atoms[to]!.x, atoms[from]!.y - atoms[to]!.y)).toBeCloseTo(1, 0);
      atoms.forEach((one, index) => { for (const other of atoms.slice(index + 1)) expect(Math.hypot(one.x - other.x, one.y - other.y)).toBeGreaterThan(0.5); });
    }
  });

  test('the second line of a ring bond lies inside its ring', () => {
    const { atoms, bonds } = laidOut('c1ccncc1');
    const middle = { x: atoms.reduce((sum, { x }) => sum + x, 0) / 6, y: atoms.reduce((sum, { y }) => sum + y, 0) / 6 };
    const double = bonds.filter(({ order }) => order === 2);
    expect(double.length).toBe(3);
    for (const { from, to, side } of double) {
      const [a, b] = [atoms[from]!, atoms[to]!];
      expect(Math.sign((b.x - a.x) * (middle.y - a.y) - (b.y - a.y) * (middle.x - a.x))).toBe(side);
    }
  });

  test('a linear ligand is set level, a stereo centre has its wedge', () => {
    expect(new Set(laidOut('[C-]#N').atoms.map(({ y }) => y)).size).toBe(1);
    expect(laidOut('C[C@@H](N)CN').bonds.filter(({ wedge }) => wedge !== null).length).toBe(1);
    expect(laidOut('C[C@@H](N)CN').bonds.find(({ wedge }) => wedge !== null)!.wedge).not.toBe(laidOut('C[C@H](N)CN').bonds.find(({ wedge }) => wedge !== null)!.wedge);
  });
});
