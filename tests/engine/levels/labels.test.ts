import { describe, expect, test } from 'vitest';
import { degeneratePair, groundLabel, levelNames, levels, parentOf, readLabel, shownLabel } from '#engine';
import type { Geometry, LabelContext } from '#engine';

/** C0/B0 of the free ions, Tanabe and Sugano's choices (from memory). */
const cobaltII: LabelContext = { electrons: 7, geometry: 'octahedral', multiplicity: 4, ratio: 4.63 };
const cobaltIITetrahedral: LabelContext = { ...cobaltII, geometry: 'tetrahedral' };
const chromiumIII: LabelContext = { electrons: 3, geometry: 'octahedral', multiplicity: 4, ratio: 4.5 };
const nickelII: LabelContext = { electrons: 8, geometry: 'octahedral', multiplicity: 3, ratio: 4.71 };
const manganeseII: LabelContext = { electrons: 5, geometry: 'octahedral', multiplicity: 6, ratio: 4.48 };
const cobaltIII: LabelContext = { electrons: 6, geometry: 'octahedral', multiplicity: 1, ratio: 4.81 };

const meant = (typed: string, context: LabelContext): readonly string[] | string => {
  const reading = readLabel(typed, context);
  return reading.ok ? reading.labels : reading.code;
};

function fault(typed: string, context: LabelContext): { readonly code: string; readonly expected: string; readonly mend: string } {
  const reading = readLabel(typed, context);
  if (reading.ok) throw new Error(`${typed} was read as ${reading.labels.join(', ')}`);
  return reading;
}

describe('T1 ground levels: the letter a is the ground level', () => {
  test('4T1g(F) as a band of octahedral cobalt(II) is refused: it is the ground level, and 4T1g(P) is offered', () => {
    const { code, mend } = fault('4T1g(F)', cobaltII);
    expect(code).toBe('TERM_IS_GROUND');
    expect(mend).toContain('this is the ground level; for the transition write 4T1g(P)');
    expect(mend).toContain('b4T1g');
  });

  test('a4T1g of octahedral cobalt(II) is refused as the ground level too', () => {
    expect(meant('a4T1g', cobaltII)).toBe('TERM_IS_GROUND');
  });

  test('bare 4T1g of octahedral cobalt(II) can only mean the transition to 4T1g(P)', () => {
    expect(meant('4T1g', cobaltII)).toEqual(['b4T1g']);
    expect(meant('4T1g(P)', cobaltII)).toEqual(['b4T1g']);
    expect(meant('b4T1g', cobaltII)).toEqual(['b4T1g']);
  });

  test('in octahedral vanadium(III), also T1-ground, 3T1g(F) is refused and 3T1g(P) is read', () => {
    const vanadiumIII: LabelContext = { electrons: 2, geometry: 'octahedral', multiplicity: 3, ratio: 4.42 };
    expect(meant('3T1g(F)', vanadiumIII)).toBe('TERM_IS_GROUND');
    expect(meant('3T1g(P)', vanadiumIII)).toEqual(['b3T1g']);
  });

  test('in low-spin cobalt(II) the ground level is 2Eg, so 4T1g(F) is an excited level and legal', () => {
    const lowSpin = { ...cobaltII, multiplicity: 2 };
    expect(meant('4T1g(F)', lowSpin)).toEqual(['a4T1g']);
    expect(meant('a2Eg', lowSpin)).toBe('TERM_IS_GROUND');
  });
});

describe('A2 ground levels: both T1 levels are excited', () => {
  test.each([
    ['chromium(III), octahedral', '4T1g(F)', chromiumIII, ['a4T1g']],
    ['nickel(II), octahedral', '3T1g(F)', nickelII, ['a3T1g']],
    ['cobalt(II), tetrahedral', '4T1(F)', cobaltIITetrahedral, ['a4T1']],
    ['chromium(III), octahedral', '4T1g(P)', chromiumIII, ['b4T1g']],
    ['nickel(II), octahedral', '3T1g(P)', nickelII, ['b3T1g']],
    ['cobalt(II), tetrahedral', '4T1(P)', cobaltIITetrahedral, ['b4T1']],
  ] as const)('%s: %s is read', (_, typed, context, labels) => {
    expect(meant(typed, context)).toEqual(labels);
  });

  test('bare 4T1g of chromium(III) leaves both levels of that name as candidates', () => {
    expect(meant('4T1g', chromiumIII)).toEqual(['a4T1g', 'b4T1g']);
  });

  test('the ground level 4A2g of chromium(III) is refused, and no other 4A2g can be offered', () => {
    const { code, mend } = fault('4A2g', chromiumIII);
    expect(code).toBe('TERM_IS_GROUND');
    expect(mend).toBe('this is the ground level: no transition ends on it');
  });
});

describe('letters and g', () => {
  test('a letter may always be typed, also where the ion has only one level of the name', () => {
    expect(meant('a4T2g', chromiumIII)).toEqual(['a4T2g']);
    expect(meant('4T2g', chromiumIII)).toEqual(['a4T2g']);
  });

  test('g may be left out, also in an octahedron', () => {
    expect(meant('4T2', chromiumIII)).toEqual(['a4T2g']);
    expect(meant('b4T1', chromiumIII)).toEqual(['b4T1g']);
    expect(meant('4T1(P)', cobaltII)).toEqual(['b4T1g']);
  });

  test('g typed for a tetrahedral ion is not held against it: the geometry stands beside it, and the label is kept without g', () => {
    expect(meant('4T1g(P)', cobaltIITetrahedral)).toEqual(['b4T1']);
    expect(meant('g2T2g', { ...manganeseII, geometry: 'tetrahedral' })).toEqual(['g2T2']);
  });

  test('a letter past the last level is refused with the levels there are', () => {
    const { code, expected, mend } = fault('c4T1g', chromiumIII);
    expect(code).toBe('TERM_UNKNOWN');
    expect(expected).toBe('one of a4T1g, b4T1g');
    expect(mend).toBe('the ion has 2 levels of the name 4T1g');
  });

  test('a letter and a parent must agree', () => {
    expect(meant('b4T1g(P)', chromiumIII)).toEqual(['b4T1g']);
    expect(meant('a4T1g(P)', chromiumIII)).toBe('TERM_UNKNOWN');
  });

  test('spaces inside a label do not matter', () => {
    expect(meant(' 4 T1g (P) ', chromiumIII)).toEqual(['b4T1g']);
  });

  test.each(['', 'T2g', '4T3g', '4T2u', '7A1g', '4t2g', 'A4T2g', '4T2g(X)', '4T2g()', '(P)4T1g', '4T2gg', 'k2T1g', '4T2g+', '4T2g/'])(
    '%j is no label, and the message shows some', (typed) => {
      const { code, expected } = fault(typed, chromiumIII);
      expect(code).toBe('TERM_UNREADABLE');
      expect(expected).toContain('4T1g(P)');
    });

  test.each(['3T2g', '5Eg', '6A1g'])('%s of chromium(III) is refused: three electrons make doublets and quartets', (typed) => {
    const { code, expected } = fault(typed, chromiumIII);
    expect(code).toBe('TERM_UNKNOWN');
    expect(expected).toContain('multiplicities 4, 2');
    expect(expected).toContain('4A2g, 4T1g, 4T2g');
  });

  test('a level of the right spin that the ion has not is refused', () => {
    expect(meant('4Eg', chromiumIII)).toBe('TERM_UNKNOWN');
    expect(meant('3T2g', nickelII)).toEqual(['a3T2g']);
    expect(meant('3Eg', nickelII)).toBe('TERM_UNKNOWN');
  });
});

describe('parents', () => {
  test('spin-flip levels of chromium(III) by parent: 2Eg(G), 2T1g(G) and 2T2g(G) are the lowest of their names', () => {
    expect(meant('2Eg(G)', chromiumIII)).toEqual(['a2Eg']);
    expect(meant('2T1g(G)', chromiumIII)).toEqual(['a2T1g']);
    expect(meant('2T2g(G)', chromiumIII)).toEqual(['a2T2g']);
  });

  test('a parent that the level has not is refused with the parents there are', () => {
    const { code, expected } = fault('4T1g(G)', chromiumIII);
    expect(code).toBe('TERM_UNKNOWN');
    expect(expected).toBe('one of a4T1g (from F); b4T1g (from P)');
  });

  test('2P and 2H of d3 and d7 always lie together: 2T1g(H) and 2T1g(P) ask for the letter', () => {
    for (const context of [chromiumIII, cobaltII])
      for (const typed of ['2T1g(H)', '2T1g(P)']) {
        const { code, expected, mend } = fault(typed, context);
        expect(code).toBe('TERM_AMBIGUOUS');
        expect(expected).toBe('the letter form: one of b2T1g, c2T1g, d2T1g');
        expect(mend).toMatch(/P and H|H and P/);
      }
  });

  test('2T2g(H) of d3 names one level: 2P has no 2T2g', () => {
    const labels = meant('2T2g(H)', chromiumIII);
    expect(labels).toHaveLength(1);
    expect(parentOf(labels[0]!, 3, 4.5)).toBe('H');
  });

  test('parents closer than 0.05 B are shown together: 2G and 2H of d5 at C/B 4.5, 3P and 3F of d4 and d6 at C/B 5', () => {
    const parentsOf = (electrons: number, multiplicity: number, irrep: string, ratio: number) =>
      'abcdefghij'.split('').map((letter) => parentOf(`${letter}${multiplicity}${irrep}`, electrons, ratio)).filter((parent) => parent !== null);
    // E(2G) - E(2H) = 9B - 2C (Racah 1942): 0 at 4.5, 0.04 B at 4.48, 0.2 B at 4.4.
    for (const ratio of [4.5, 4.48, 4.52]) expect(parentsOf(5, 2, 'T1g', ratio).filter((parent) => /G, H|H, G/.test(parent))).toHaveLength(3);
    for (const ratio of [4.4, 4.6]) expect(parentsOf(5, 2, 'T1g', ratio).join(' ')).not.toMatch(/,/);
    for (const electrons of [4, 6]) {
      expect(parentsOf(electrons, 3, 'T1g', 5).filter((parent) => /P, F|F, P/.test(parent))).toHaveLength(2);
      expect(parentsOf(electrons, 3, 'T1g', 4.4).join(' ')).not.toMatch(/P, F|F, P/);
    }
  });

  test('the second term of one letter carries a prime: 2D and 2D\' of d3, 3F and 3F\' of d4', () => {
    const doublets = 'abcd'.split('').map((letter) => parentOf(`${letter}2Eg`, 3, 4.5));
    expect(doublets.toSorted()).toEqual(['D', "D'", 'G', 'H']);
    expect(doublets.indexOf('D')).toBeLessThan(doublets.indexOf("D'"));
    expect([parentOf('a3A2g', 4, 4.4), parentOf('b3A2g', 4, 4.4)]).toEqual(['F', "F'"]);
  });

  test('2Eg(D) of d3 is the lower 2D; its prime form is the upper', () => {
    const [lower, upper] = ['2Eg(D)', "2Eg(D')"].map((typed) => meant(typed, chromiumIII));
    expect(lower).toEqual(['c2Eg']);
    expect(upper).toEqual(['d2Eg']);
  });

  test('the parent of a label is that of the level it names at the same C/B', () => {
    for (const electrons of [1, 2, 3, 4, 5, 6, 7, 8, 9])
      for (const { label, parent } of levels({ electrons, geometry: 'octahedral' }, { delta: 12000, racahB: 1000, racahC: 4200 })) {
        const shown = parentOf(label, electrons, 4.2)!;
        if (parent === null) expect(shown).toMatch(/, /);
        else expect(shown.split(', ')).toContain(parent);
      }
  });

  test('a label that the ion has not, or without a letter, has no parent', () => {
    expect(parentOf('c4T1g', 3, 4.5)).toBeNull();
    expect(parentOf('a5Eg', 3, 4.5)).toBeNull();
    expect(parentOf('4T1g', 3, 4.5)).toBeNull();
    expect(parentOf('CT', 3, 4.5)).toBeNull();
  });

  test('the parent of the d5 pair is G under either name', () => {
    expect(parentOf('a4A1g/a4Eg', 5, 4.48)).toBe('G');
    expect(parentOf('a4A1g', 5, 4.48)).toBe('G');
    expect(parentOf('a4Eg', 5, 4.48)).toBe('G');
    expect(parentOf('b4Eg', 5, 4.48)).toBe('D');
  });
});

describe('the pair 4A1g and 4Eg(G) of d5', () => {
  test('4A1g, 4Eg(G), a4Eg and 4A1g/4Eg all mean the one level at 10B + 5C', () => {
    for (const typed of ['4A1g', 'a4A1g', '4Eg(G)', 'a4Eg', '4A1g/4Eg', '4Eg/4A1g', '4A1g/4Eg(G)', '4A1/4E', 'a4A1g/a4Eg'])
      expect(meant(typed, manganeseII), typed).toEqual(['a4A1g/a4Eg']);
  });

  test('bare 4Eg may mean the pair or the level from 4D', () => {
    expect(meant('4Eg', manganeseII)).toEqual(['a4A1g/a4Eg', 'b4Eg']);
    expect(meant('4Eg(D)', manganeseII)).toEqual(['b4Eg']);
  });

  test('the two names belong to one energy at any field: 10B + 5C above 6A1g', () => {
    for (const geometry of ['octahedral', 'tetrahedral'] as const)
      for (const delta of [0, 7500, 14000]) {
        const found = levels({ electrons: 5, geometry }, { delta, racahB: 850, racahC: 3200 });
        const ground = found.find(({ multiplicity }) => multiplicity === 6)!;
        for (const name of degeneratePair(5, geometry)!.members)
          expect(found.find(({ label }) => label === name)!.energy - ground.energy).toBeCloseTo(10 * 850 + 5 * 3200, 6);
      }
  });

  test('no other ion has such a pair, and two labels joined by a stroke are then asked to be listed', () => {
    expect([1, 2, 3, 4, 6, 7, 8, 9].map((electrons) => degeneratePair(electrons, 'octahedral'))).toEqual(Array(8).fill(null));
    const { code, mend } = fault('4T2g/4T1g', chromiumIII);
    expect(code).toBe('TERM_AMBIGUOUS');
    expect(mend).toContain('[4T2g, 4T1g]');
    expect(meant('4T1g/4T2g', manganeseII)).toBe('TERM_AMBIGUOUS');
  });

  test('a fault in one half of a joined label is told as that fault', () => {
    expect(meant('4A1g/4Xg', manganeseII)).toBe('TERM_UNREADABLE');
    expect(meant('4A1g/4Eg', chromiumIII)).toBe('TERM_UNKNOWN');
  });
});

describe('ground levels', () => {
  // Ground terms of cubic complexes: Tanabe and Sugano, J. Phys. Soc. Jpn. 9, 766 (1954), diagrams (from memory).
  test.each([
    [1, 'octahedral', 2, 'a2T2g'], [2, 'octahedral', 3, 'a3T1g'], [3, 'octahedral', 4, 'a4A2g'], [4, 'octahedral', 5, 'a5Eg'],
    [5, 'octahedral', 6, 'a6A1g'], [6, 'octahedral', 5, 'a5T2g'], [7, 'octahedral', 4, 'a4T1g'], [8, 'octahedral', 3, 'a3A2g'], [9, 'octahedral', 2, 'a2Eg'],
    [4, 'octahedral', 3, 'a3T1g'], [5, 'octahedral', 2, 'a2T2g'], [6, 'octahedral', 1, 'a1A1g'], [7, 'octahedral', 2, 'a2Eg'],
    [1, 'tetrahedral', 2, 'a2E'], [2, 'tetrahedral', 3, 'a3A2'], [3, 'tetrahedral', 4, 'a4T1'], [4, 'tetrahedral', 5, 'a5T2'],
    [5, 'tetrahedral', 6, 'a6A1'], [6, 'tetrahedral', 5, 'a5E'], [7, 'tetrahedral', 4, 'a4A2'], [8, 'tetrahedral', 3, 'a3T1'], [9, 'tetrahedral', 2, 'a2T2'],
  ] as const)('d%i %s with multiplicity %i has the ground level %s', (electrons, geometry: Geometry, multiplicity, label) => {
    expect(groundLabel(electrons, geometry, multiplicity)).toBe(label);
  });

  test('where no spin is declared the highest is meant', () => {
    expect(groundLabel(6, 'octahedral', null)).toBe('a5T2g');
    expect(meant('5T2g', { ...cobaltIII, multiplicity: null })).toBe('TERM_IS_GROUND');
    expect(meant('5T2g', cobaltIII)).toEqual(['a5T2g']);
  });

  test('a multiplicity that the ion cannot have has no ground level', () => {
    expect(groundLabel(3, 'octahedral', 3)).toBeNull();
    expect(groundLabel(8, 'octahedral', 5)).toBeNull();
  });
});

describe('what a message offers can be typed', () => {
  test('every label offered in place of a ground level is read, and none of them is the ground level again', () => {
    let offered = 0;
    for (const geometry of ['octahedral', 'tetrahedral'] as const)
      for (let electrons = 1; electrons <= 9; electrons++)
        for (const multiplicity of [1, 2, 3, 4, 5, 6])
          for (const ratio of [4, 4.48, 5]) {
            const context: LabelContext = { electrons, geometry, multiplicity, ratio };
            const ground = groundLabel(electrons, geometry, multiplicity);
            if (!ground) continue;
            const { mend } = fault(ground, context);
            const advice = mend.split('for the transition write ')[1];
            for (const label of advice?.split(/, (?=[1-6a-j])| or /) ?? []) {
              offered++;
              const read = meant(label, context);
              expect(Array.isArray(read), `${label} for d${electrons} ${geometry}, multiplicity ${multiplicity}: ${read}`).toBe(true);
              expect(read).not.toContain(ground);
            }
          }
    expect(offered).toBeGreaterThan(100);
  });
});

describe('labels as printed', () => {
  test('the letter is printed only where the block holds more than one level', () => {
    expect(shownLabel('a4T2g', 3)).toBe('4T2g');
    expect(shownLabel('a4T1g', 3)).toBe('a4T1g');
    expect(shownLabel('b4T1g', 7)).toBe('b4T1g');
    expect(shownLabel('a4A2', 7)).toBe('4A2');
    expect(shownLabel('a5Eg', 4)).toBe('5Eg');
    expect(shownLabel('j2T2g', 5)).toBe('j2T2g');
  });

  test('the d5 pair is printed without letters, its members as any other level', () => {
    expect(shownLabel('a4A1g/a4Eg', 5)).toBe('4A1g/4Eg');
    expect(shownLabel('a4A1/a4E', 5)).toBe('4A1/4E');
    expect(shownLabel('a4A1g', 5)).toBe('4A1g');
    expect(shownLabel('a4Eg', 5)).toBe('a4Eg');
  });

  test('what is no level is printed as it stands', () => {
    expect(shownLabel('CT', 3)).toBe('CT');
    expect(shownLabel('ligand', 5)).toBe('ligand');
  });

  test('every excited level of every ion, printed, is read back as itself', () => {
    for (const geometry of ['octahedral', 'tetrahedral'] as const)
      for (let electrons = 1; electrons <= 9; electrons++) {
        const context: LabelContext = { electrons, geometry, multiplicity: null, ratio: 4.5 };
        const pair = degeneratePair(electrons, geometry);
        const ground = groundLabel(electrons, geometry, null);
        for (const label of levelNames(electrons, geometry)) {
          const reading = meant(shownLabel(label, electrons), context);
          if (label === ground) expect(reading).toBe('TERM_IS_GROUND');
          else expect(reading, label).toEqual([pair?.members.includes(label) ? pair.label : label]);
        }
        if (pair) expect(meant(shownLabel(pair.label, electrons), context)).toEqual([pair.label]);
      }
  });

  test('the names of all levels are those that the levels carry, each once', () => {
    for (const geometry of ['octahedral', 'tetrahedral'] as const)
      for (let electrons = 1; electrons <= 9; electrons++) {
        const names = levelNames(electrons, geometry);
        expect(new Set(names).size).toBe(names.length);
        expect(names.toSorted()).toEqual(levels({ electrons, geometry }, { delta: 10000, racahB: 800, racahC: 3600 }).map(({ label }) => label).toSorted());
      }
  });
});
