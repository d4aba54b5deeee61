import { defaultPolicy, freeIon, levels } from '#engine';
import type { FieldParameters, FreeIon, Policy } from '#engine';
import { fitAssignment } from '../../../engine/readings/fit.ts';
import { isFit } from '../../../engine/readings/fitTypes.ts';
import type { Assigned, Fit, FitOutcome } from '../../../engine/readings/fitTypes.ts';
import type { GroundCase } from '../../../engine/readings/transitions.ts';
import type { RatioUsed } from '../../../engine/readings/types.ts';

/** Transition energies at known parameters, from the public level function; cm-1, labels in letter form. */
export function transitionEnergies(ion: GroundCase, labels: readonly string[], at: FieldParameters): number[] {
  const all = levels(ion, at);
  const ground = all.find((level) => level.multiplicity === ion.multiplicity)!;
  return labels.map((label) => {
    const level = all.find((one) => one.label === label.split('/')[0]);
    if (level === undefined) throw new Error(`no level ${label}`);
    return level.energy - ground.energy;
  });
}

/** Readings at given positions; u one number for all, one a band, or [below, above] a band. */
export function readings(labels: readonly string[], positions: readonly number[], u: number | readonly (number | readonly [number, number])[] = 100): Assigned[] {
  return labels.map((label, k) => {
    const own = typeof u === 'number' ? u : u[k]!;
    const [uMinus, uPlus] = typeof own === 'number' ? [own, own] : own;
    return { label, observation: { bands: [k], position: positions[k]!, uMinus, uPlus, uAssumed: false } };
  });
}

/** Known parameters with what they are to be found from. */
export interface Planted {
  readonly name: string;
  readonly ionName: string;
  readonly ion: GroundCase;
  readonly labels: readonly string[];
  readonly at: FieldParameters;
}

/** One planted case; C follows from C/B. Labels in letter form, separated by blanks. */
export function planted(
  ionName: string, electrons: number, geometry: GroundCase['geometry'], multiplicity: number, labels: string, delta: number, racahB: number, ratio = 4.5,
): Planted {
  const list = labels.split(' ');
  return {
    name: `${ionName} ${geometry}, multiplicity ${multiplicity}: ${list.join(', ')}`, ionName, ion: { electrons, geometry, multiplicity }, labels: list,
    at: { delta, racahB, racahC: ratio * racahB },
  };
}

export const assumed = (value: number, u = 0.9): RatioUsed => ({ value, u, origin: 'policy' });

export interface Settings {
  readonly policy?: Policy;
  readonly ratio?: RatioUsed;
  readonly freeIon?: FreeIon | null;
}

/** Fits readings of a planted case with its own C/B taken as known unless another is given. */
export function fitOf(one: Planted, assigned: readonly Assigned[], settings: Settings = {}): FitOutcome {
  const { policy = defaultPolicy, ratio = assumed(one.at.racahC / one.at.racahB) } = settings;
  const free = settings.freeIon === undefined ? freeIon('published', { name: one.ionName }) : settings.freeIon;
  return fitAssignment(one.ion, assigned, policy, ratio, free);
}

/** The same where a fit must stand. */
export function standingFit(one: Planted, assigned: readonly Assigned[], settings: Settings = {}): Fit {
  const outcome = fitOf(one, assigned, settings);
  if (!isFit(outcome)) throw new Error(`${one.name}: ${outcome.status}, ${outcome.reason}`);
  return outcome;
}

/** Fit of the exact positions. */
export function exactFit(one: Planted, u: Parameters<typeof readings>[2] = 100, settings: Settings = {}): Fit {
  return standingFit(one, readings(one.labels, transitionEnergies(one.ion, one.labels, one.at), u), settings);
}

export const valuesOf = ({ delta, racahB, racahC }: FieldParameters): [number, number, number] => [delta, racahB, racahC];

/** Bands that fix Delta and B, C/B given: two or three, spin-allowed. */
export const forFieldAndB: readonly Planted[] = [
  planted('V(III)', 2, 'octahedral', 3, 'a3T2g b3T1g', 18_500, 650),
  planted('V(III)', 2, 'octahedral', 3, 'a3T2g b3T1g a3A2g', 18_500, 650),
  planted('Ti(II)', 2, 'tetrahedral', 3, 'a3T1 b3T1', 6000, 540),
  planted('Ti(II)', 2, 'tetrahedral', 3, 'a3T2 a3T1 b3T1', 6000, 540),
  planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g', 17_400, 725),
  planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g b4T1g', 17_400, 725),
  planted('Cr(III)', 3, 'tetrahedral', 4, 'a4T2 b4T1', 7500, 640),
  planted('Cr(III)', 3, 'tetrahedral', 4, 'a4T2 a4A2 b4T1', 7500, 640),
  planted('Mn(III)', 4, 'octahedral', 3, 'a3Eg a3T2g b3T1g', 36_000, 700),
  planted('Fe(III)', 5, 'octahedral', 2, 'a2A2g a2T1g b2T2g', 35_000, 620),
  planted('Co(III)', 6, 'octahedral', 1, 'a1T1g a1T2g', 23_500, 630),
  planted('Fe(II)', 6, 'octahedral', 1, 'a1T1g a1T2g b1T2g', 33_000, 430),
  planted('Co(II)', 7, 'octahedral', 4, 'a4T2g b4T1g', 9200, 820),
  planted('Co(II)', 7, 'octahedral', 4, 'a4T2g a4A2g b4T1g', 9200, 820),
  planted('Co(II)', 7, 'tetrahedral', 4, 'a4T1 b4T1', 3150, 715),
  planted('Co(II)', 7, 'tetrahedral', 4, 'a4T2 a4T1 b4T1', 3150, 715),
  planted('Co(II)', 7, 'octahedral', 2, 'a2T1g b2T1g a2T2g', 24_000, 640),
  planted('Ni(II)', 8, 'octahedral', 3, 'a3T2g b3T1g', 8700, 900),
  planted('Ni(II)', 8, 'octahedral', 3, 'a3T2g a3T1g b3T1g', 8700, 900),
  planted('Ni(II)', 8, 'tetrahedral', 3, 'a3T2 b3T1', 4000, 780),
  planted('Ni(II)', 8, 'tetrahedral', 3, 'a3T2 a3A2 b3T1', 4000, 780),
];

/** Bands that fix Delta, B and C: spin-forbidden ones among them, or nothing else. */
export const forAllThree: readonly Planted[] = [
  planted('V(III)', 2, 'octahedral', 3, 'a3T2g b3T1g a1T2g a1A1g', 18_500, 650, 4.2),
  planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g a4T1g a2Eg', 17_400, 700, 4.7),
  planted('Mn(IV)', 3, 'octahedral', 4, 'a4T2g a4T1g a2Eg a2T2g', 21_800, 600, 5.9),
  planted('Mn(II)', 5, 'octahedral', 6, 'a4T1g a4T2g a4A1g/a4Eg', 8000, 780, 4.3),
  planted('Mn(II)', 5, 'octahedral', 6, 'a4T1g a4T2g a4A1g/a4Eg b4T2g b4Eg', 8000, 780, 4.3),
  planted('Fe(III)', 5, 'tetrahedral', 6, 'a4T1 a4T2 a4A1/a4E b4T2', 6500, 600, 5.2),
  planted('Co(III)', 6, 'octahedral', 1, 'a1T1g a1T2g a3T1g', 23_500, 630, 5.6),
  planted('Ni(II)', 8, 'octahedral', 3, 'a3T2g a3T1g b3T1g a1Eg a1T2g', 9500, 900, 4.1),
];

/** One band that moves with Delta alone. */
export const forFieldAlone: readonly Planted[] = [
  planted('Ti(III)', 1, 'octahedral', 2, 'a2Eg', 20_300, 500),
  planted('V(IV)', 1, 'tetrahedral', 2, 'a2T2', 9000, 500),
  planted('Cr(III)', 3, 'octahedral', 4, 'a4T2g', 17_400, 688.5),
  planted('Cr(II)', 4, 'octahedral', 5, 'a5T2g', 14_000, 607.5),
  planted('Fe(II)', 6, 'octahedral', 5, 'a5Eg', 10_400, 687.75),
  planted('Fe(II)', 6, 'tetrahedral', 5, 'a5T2', 4000, 687.75),
  planted('Ni(II)', 8, 'octahedral', 3, 'a3T2g', 8700, 772.5),
  planted('Cu(II)', 9, 'octahedral', 2, 'a2T2g', 12_600, 930),
];
