import type { Target } from '../../../engine/readings/misfit.ts';
import type { GroundCase } from '../../../engine/readings/transitions.ts';
import { seeded } from '../../published/random.ts';
import type { FineCurve } from './bruteForce.ts';
import { finePieces } from './bruteForce.ts';

/** One ion, field and spin with the transitions that cases are drawn from. */
export interface Configuration {
  readonly name: string;
  readonly ion: GroundCase;
  /** C/B. */
  readonly ratio: number;
  readonly labels: readonly string[];
}

const of = (name: string, electrons: number, geometry: GroundCase['geometry'], multiplicity: number, ratio: number, labels: string): Configuration => ({
  name, ion: { electrons, geometry, multiplicity }, ratio, labels: labels.split(' '),
});

/** Ions, fields and spins. */
export const configurations: readonly Configuration[] = [
  of('d2 octahedral', 2, 'octahedral', 3, 4.5, 'a3T2g b3T1g a3A2g'),
  of('d2 tetrahedral', 2, 'tetrahedral', 3, 4.5, 'a3T2 a3T1 b3T1'),
  of('d3 octahedral', 3, 'octahedral', 4, 4.5, 'a4T2g a4T1g b4T1g'),
  of('d3 octahedral with spin-flip lines', 3, 'octahedral', 4, 4.5, 'a4T2g a4T1g a2Eg a2T1g a2T2g'),
  of('d3 tetrahedral', 3, 'tetrahedral', 4, 4.5, 'a4T2 b4T1 a4A2'),
  of('d4 octahedral, low spin', 4, 'octahedral', 3, 4.5, 'b3T1g c3T1g a3T2g b3T2g a3Eg a3A1g a3A2g'),
  of('d5 octahedral, high spin', 5, 'octahedral', 6, 4.5, 'a4T1g a4T2g a4Eg b4T2g b4Eg c4T1g'),
  of('d6 octahedral, low spin', 6, 'octahedral', 1, 4.5, 'a1T1g a1T2g b1T1g b1T2g a1Eg b1A1g'),
  of('d7 octahedral', 7, 'octahedral', 4, 4.5, 'a4T2g b4T1g a4A2g'),
  of('d7 tetrahedral', 7, 'tetrahedral', 4, 4.5, 'a4T2 a4T1 b4T1'),
  of('d7 octahedral, low spin', 7, 'octahedral', 2, 4.5, 'a2T1g b2T1g a2T2g b2T2g b2Eg a2A1g a2A2g'),
  of('d8 octahedral', 8, 'octahedral', 3, 4.5, 'a3T2g a3T1g b3T1g'),
  of('d8 octahedral with singlets', 8, 'octahedral', 3, 4.5, 'a3T2g a3T1g b3T1g a1Eg a1T2g a1A1g'),
  of('d8 tetrahedral', 8, 'tetrahedral', 3, 4.5, 'a3T2 b3T1 a3A2'),
  // Grounds that change along the curve, and other C/B.
  of('d3 octahedral, doublet ground', 3, 'octahedral', 2, 4.5, 'b2Eg a2T1g a2T2g b2T2g a2A1g'),
  of('d4 octahedral, singlet ground', 4, 'octahedral', 1, 4.5, 'a1T2g b1T2g a1Eg b1Eg a1T1g a1A1g b1A1g'),
  of('d4 tetrahedral, low spin', 4, 'tetrahedral', 1, 4.5, 'a1T1 a1T2 b1T2 a1E b1A1'),
  of('d5 octahedral, low spin', 5, 'octahedral', 2, 4.5, 'b2T2g c2T2g a2A2g a2T1g a2Eg a2A1g'),
  of('d6 octahedral, low spin, C/B 3.2', 6, 'octahedral', 1, 3.2, 'a1T1g a1T2g b1T1g b1T2g'),
  of('d6 octahedral, low spin, C/B 6.4', 6, 'octahedral', 1, 6.4, 'a1T1g a1T2g b1T1g b1T2g'),
  of('d7 octahedral, low spin, C/B 3.2', 7, 'octahedral', 2, 3.2, 'a2T1g b2T1g a2T2g b2T2g b2Eg'),
];

export interface BranchCase {
  readonly kind: string;
  readonly labels: readonly string[];
  readonly targets: readonly Target[];
}

/** How a case's positions come about; each kind takes its turn. */
export const kinds = ['planted', 'planted, misassigned', 'anywhere', 'two bands close together', 'planted near a crossing'] as const;

/**
 * Draws cases for a configuration: two or three of its transitions, positions by kind, u from 10 to 800 cm-1 on each
 * side, alike in every second case. Repeatable by its seed.
 */
export function branchCases(configuration: Configuration, curve: FineCurve, count: number, seed: number): readonly BranchCase[] {
  const next = seeded(seed);
  const between = (low: number, high: number): number => low + (high - low) * next();
  const logarithmic = (low: number, high: number): number => low * (high / low) ** next();
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)]!;
  const shuffled = <T>(list: readonly T[]): T[] => {
    const left = [...list];
    return list.map(() => left.splice(Math.floor(next() * left.length), 1)[0]!);
  };

  /** Positions that Delta and B at grid point i give, with a scatter. */
  const planted = (labels: readonly string[], i: number): number[] => {
    const racahB = between(300, 1200);
    const scatter = pick([0, 0, 50, 300, 1500]);
    const scale = racahB / Math.max(0.02, Math.cos(i * curve.step));
    return labels.map((label) => Math.max(500, scale * (curve.energies.get(label)![i]! - curve.lowest[i]!) + scatter * (next() + next() + next() - 1.5) * 2));
  };
  const anyPoint = (): number => Math.round(Math.atan(logarithmic(0.3, 80) / 20) / curve.step);

  /** A grid point close to where two of the transitions cross or the lowest level changes; anywhere where neither happens. */
  const nearCrossing = (labels: readonly string[]): number => {
    const places = [...curve.changes];
    for (let a = 0; a < labels.length; a++)
      for (let b = 0; b < a; b++) {
        const [first, second] = [curve.energies.get(labels[a]!)!, curve.energies.get(labels[b]!)!];
        for (let i = 1000; i < finePieces - 1000; i++) if (first[i]! > second[i]! !== first[i + 1]! > second[i + 1]!) places.push(i);
      }
    if (places.length === 0) return anyPoint();
    return Math.min(finePieces - 100, Math.max(100, pick(places) + Math.round(between(-2000, 2000))));
  };

  return Array.from({ length: count }, (_, n) => {
    const kind = kinds[n % kinds.length]!;
    const labels = shuffled(configuration.labels).slice(0, pick([2, 3]));
    const positions = ((): number[] => {
      switch (kind) {
        case 'planted':
          return planted(labels, anyPoint());
        case 'planted, misassigned':
          return shuffled(planted(labels, anyPoint()));
        case 'anywhere':
          return labels.map(() => logarithmic(2000, 50_000));
        case 'two bands close together': {
          const first = logarithmic(4000, 40_000);
          return labels.map((__, k) => (k === 0 ? first : k === 1 ? first + between(-100, 100) : logarithmic(2000, 50_000)));
        }
        case 'planted near a crossing':
          return planted(labels, nearCrossing(labels));
      }
    })();
    const lopsided = next() < 0.5;
    const targets = positions.map((observed) => {
      const below = logarithmic(10, 800);
      const above = lopsided ? logarithmic(10, 800) : below;
      return { observed, weightBelow: below ** -2, weightAbove: above ** -2 };
    });
    return { kind, labels, targets };
  });
}
