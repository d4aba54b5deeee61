import { describe, expect, it } from 'vitest';
import { freeIonB, ionNamed, metalEntries, metalEntry } from '../../../scripts/generate/metalIons.ts';

/** g (10^3 cm-1) and k as printed: C. K. Jorgensen, Modern Aspects of Ligand Field Theory (1971) pp. 347-348. */
const printedG: Record<string, number> = {
  'Mn(II)': 8, 'Fe(II)': 8.5, 'Ni(II)': 8.7, 'Co(II)': 9, 'V(II)': 12, 'Fe(III)': 14, 'Cr(III)': 17.4, 'Co(III)': 18.2, 'Ru(II)': 20, 'Mn(IV)': 24,
  'Mo(III)': 24.6, 'Rh(III)': 27,
};
const printedK: Record<string, number> = {
  'Mn(II)': 0.07, 'V(II)': 0.08, 'Fe(II)': 0.08, 'Co(II)': 0.09, 'Ni(II)': 0.12, 'Mo(III)': 0.15, 'Cr(III)': 0.21, 'Rh(III)': 0.3, 'Co(III)': 0.35,
  'Mn(IV)': 0.5,
};

/** Entries of the spin state that the printed factors belong to. */
const ordinary = metalEntries.filter((one) => !(one.ion === 'Co(III)' && one.spin === 'high') && !(one.ion === 'Fe(II)' && one.spin === 'low'));

describe('metal ions of the generator', () => {
  it('have invented factors within 10 % of the printed ones and equal to none', () => {
    for (const entry of ordinary) {
      for (const [own, printed] of [[entry.g / 1000, printedG[entry.ion]], [entry.k, printedK[entry.ion]]] as const) {
        if (printed === undefined) continue;
        expect(own, entry.ion).not.toBe(printed);
        expect(Math.abs(own / printed - 1), entry.ion).toBeLessThanOrEqual(0.1);
      }
    }
  });

  it('are ions of d1 to d9, with a spin where octahedral ions of their d count have two', () => {
    for (const { ion, spin } of metalEntries) {
      const { electrons } = ionNamed(ion);
      expect(electrons).toBeGreaterThanOrEqual(1);
      expect(electrons).toBeLessThanOrEqual(9);
      expect(spin !== null, ion).toBe(electrons >= 4 && electrons <= 7);
    }
  });

  it('are asked for by ion and spin; others are refused', () => {
    expect(metalEntry('Fe(II)', 'low').g).toBeGreaterThan(metalEntry('Fe(II)', 'high').g);
    expect(() => metalEntry('Cr(III)', 'low')).toThrow(/no entry for Cr\(III\), low spin/);
    expect(() => ionNamed('Xx(III)')).toThrow(RangeError);
    expect(freeIonB('Cr(III)')).toBe(918);
  });
});
