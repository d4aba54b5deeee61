/** The energy of a free-ion term: b B + c C + factor sqrt(bb B^2 + bc B C + cc C^2), Racah's A dropped. */
export interface TermFormula {
  /** Multiplicity and letter, "2D". */
  readonly term: string;
  readonly b: number;
  readonly c: number;
  readonly root: { readonly factor: number; readonly bb: number; readonly bc: number; readonly cc: number } | null;
}

/** One term at given Racah parameters. `term` carries a prime for each lower term of the same kind: "2D", "2D'", "2D''". */
export interface TermEnergy {
  readonly term: string;
  readonly energy: number;
  readonly gradient: { readonly racahB: number; readonly racahC: number };
}

const linear = (term: string, b: number, c: number): TermFormula => ({ term, b, c, root: null });

/** Two terms of one kind, the roots of a 2 x 2 block. */
const pair = (term: string, b: number, c: number, factor: number, bb: number, bc: number, cc: number): readonly TermFormula[] =>
  [-factor, factor].map((signed) => ({ term, b, c, root: { factor: signed, bb, bc, cc } }));

const formulas: readonly (readonly TermFormula[])[] = [
  [linear('1S', 0, 0)],
  [linear('2D', 0, 0)],
  [linear('3F', -8, 0), linear('3P', 7, 0), linear('1D', -3, 2), linear('1G', 4, 2), linear('1S', 14, 7)],
  [
    linear('4F', -15, 0), linear('4P', 0, 0), linear('2G', -11, 3), linear('2H', -6, 3), linear('2P', -6, 3), linear('2F', 9, 3),
    ...pair('2D', 5, 5, 1, 193, 8, 4),
  ],
  [
    linear('5D', -21, 0), linear('3H', -17, 4), linear('3G', -12, 4), linear('3D', -5, 4),
    ...pair('3F', -5, 5.5, 1.5, 68, 4, 1), ...pair('3P', -5, 5.5, 0.5, 912, -24, 9),
    linear('1I', -15, 6), linear('1F', 0, 6),
    ...pair('1G', -5, 7.5, 0.5, 708, -12, 9), ...pair('1D', 9, 7.5, 1.5, 144, 8, 1), ...pair('1S', 10, 10, 2, 193, 8, 4),
  ],
  [
    linear('6S', -35, 0), linear('4G', -25, 5), linear('4P', -28, 7), linear('4D', -18, 5), linear('4F', -13, 7),
    linear('2I', -24, 8), linear('2H', -22, 10), linear('2G', -13, 8), linear('2G', 3, 10), linear('2F', -9, 8), linear('2F', -25, 10),
    linear('2S', -3, 8), linear('2D', -4, 10), linear('2P', 20, 10), ...pair('2D', -3, 11, 3, 57, 2, 1),
  ],
];

/**
 * The published formulas of the free-ion terms of d^n. d^n and d^(10-n) share them (their common constants differ, and are dropped).
 * Throws RangeError for a d count that is not a whole number from 0 to 10.
 * Source: G. Racah, Phys. Rev. 62, 438 (1942); from memory, held against this engine's own blocks by
 * tests/published/free-ion-terms.test.ts.
 */
export function termFormulas(electrons: number): readonly TermFormula[] {
  const list = formulas[Math.min(electrons, 10 - electrons)];
  if (list === undefined) throw new RangeError(`termFormulas: electrons ${electrons} is not a whole number from 0 to 10`);
  return list;
}

/**
 * Energies of all free-ion terms of d^n at Racah's B and C (cm-1), ascending, Racah's A dropped, with their exact derivatives.
 * Terms of one kind are numbered by energy: the lowest is "2D", the next "2D'".
 * Throws RangeError for an impossible d count.
 */
export function termEnergies(electrons: number, racahB: number, racahC: number): readonly TermEnergy[] {
  const seen = new Map<string, number>();
  return termFormulas(electrons)
    .map((formula) => ({ ...energyOf(formula, racahB, racahC), term: formula.term }))
    .sort((first, second) => first.energy - second.energy)
    .map((value) => {
      const lower = seen.get(value.term) ?? 0;
      seen.set(value.term, lower + 1);
      return { ...value, term: value.term + "'".repeat(lower) };
    });
}

function energyOf({ b, c, root }: TermFormula, racahB: number, racahC: number): Omit<TermEnergy, 'term'> {
  const flat = { energy: b * racahB + c * racahC, gradient: { racahB: b, racahC: c } };
  if (root === null) return flat;
  const { factor, bb, bc, cc } = root;
  const length = Math.sqrt(bb * racahB ** 2 + bc * racahB * racahC + cc * racahC ** 2);
  if (length === 0) return flat;
  return {
    energy: flat.energy + factor * length,
    gradient: {
      racahB: b + (factor * (2 * bb * racahB + bc * racahC)) / (2 * length),
      racahC: c + (factor * (bc * racahB + 2 * cc * racahC)) / (2 * length),
    },
  };
}
