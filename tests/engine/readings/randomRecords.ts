import { defaultPolicy, freeIon, groundLabel, shownLabel } from '#engine';
import type { Band, FreeIon, Measurement } from '#engine';
import { transitionsAt } from '../../../engine/readings/evaluate.ts';
import { ratioFor } from '../../../engine/readings/ratioFor.ts';
import type { SearchTask } from '../../../engine/readings/scoring.ts';
import { transitionsOf } from '../../../engine/readings/transitions.ts';
import type { GroundCase, Transition } from '../../../engine/readings/transitions.ts';

/** An ion in its field, with the range of Delta/B that its complexes show. */
export interface RecordKind {
  readonly name: string;
  readonly ion: GroundCase;
  readonly deltaOverB: readonly [number, number];
}

const kind = (name: string, electrons: number, geometry: GroundCase['geometry'], multiplicity: number, low: number, high: number): RecordKind =>
  ({ name, ion: { electrons, geometry, multiplicity }, deltaOverB: [low, high] });

export const recordKinds: readonly RecordKind[] = [
  kind('V(III)', 2, 'octahedral', 3, 15, 35), kind('Cr(III)', 3, 'octahedral', 4, 15, 35), kind('Mn(IV)', 3, 'octahedral', 4, 20, 40),
  kind('Mn(III)', 4, 'octahedral', 5, 12, 25), kind('Mn(II)', 5, 'octahedral', 6, 7, 16), kind('Mn(II)', 5, 'tetrahedral', 6, 3, 8),
  kind('Fe(III)', 5, 'octahedral', 2, 32, 48), kind('Co(III)', 6, 'octahedral', 1, 28, 48), kind('Co(II)', 7, 'octahedral', 4, 8, 16),
  kind('Co(II)', 7, 'tetrahedral', 4, 3, 7), kind('Co(II)', 7, 'octahedral', 2, 24, 36), kind('Ni(II)', 8, 'octahedral', 3, 8, 16),
  kind('Ni(II)', 8, 'tetrahedral', 3, 3, 7),
];

function freeIonOf(name: string): FreeIon {
  const found = freeIon('published', { name });
  if (!found) throw new Error(`no free ion ${name}`);
  return found;
}

const band = (position: number, change: Partial<Band>): Band => ({
  position, uMinus: null, uPlus: null, halfDigit: 5, coverageNotStated: false, kind: 'maximum', side: null, width: null, epsilon: null, strength: null,
  degeneracy: null, deconvoluted: false, role: 'transition', terms: [], leftOut: null, ...change,
});

/**
 * A record of two to four bands drawn from one ion's transitions at random parameters, scattered, with or without widths,
 * strengths and typed candidates; as a search sees it.
 */
export function randomTask({ name, ion, deltaOverB: [low, high] }: RecordKind, next: () => number): SearchTask {
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)]!;
  const free = freeIonOf(name);
  const racahB = free.racahB0 * (0.5 + 0.5 * next());
  const at = { delta: racahB * (low + (high - low) * next()), racahB, racahC: racahB * (3.8 + 1.5 * next()) };
  const all = transitionsOf(ion);
  const allowed = all.filter((one) => one.spinAllowed).slice(0, 4);
  const lines = all.filter((one) => !one.spinAllowed && one.sameConfiguration).slice(0, 5);
  const pool = allowed.length === 0 ? all.filter((one) => one.multiplicity === ion.multiplicity - 2).slice(0, 6) : [...allowed, ...lines];
  const drawn = [...new Set(Array.from({ length: 2 + Math.floor(3 * next()) }, () => pick(pool)))];
  const scatter = pick([0, 100, 300, 800]);
  const energies = transitionsAt(ion, groundLabel(ion.electrons, ion.geometry, ion.multiplicity)!, drawn.map((one) => one.label), at);
  const termOf = (one: Transition): string => shownLabel(one.label, ion.electrons);
  const bands = drawn.map((one, k) => {
    const isLine = allowed.length > 0 && lines.includes(one);
    const u = next() < 0.5 ? null : 30 + 100 * next();
    return band(Math.max(2000, energies[k]!.energy + scatter * (2 * next() - 1)), {
      uMinus: u, uPlus: u === null ? null : u * (next() < 0.7 ? 1 : 2),
      kind: isLine && next() < 0.8 ? 'line' : next() < 0.85 ? 'maximum' : 'shoulder', side: next() < 0.5 ? 'higher' : null,
      width: next() < 0.5 ? null : isLine ? 200 : 3000, epsilon: next() < 0.5 ? null : isLine ? 0.5 : ion.geometry === 'octahedral' ? 20 : 300,
      terms: next() < 0.75 ? [] : [termOf(one), ...(next() < 0.5 ? [termOf(pick(pool))] : [])],
    });
  });
  const measurement: Measurement = {
    ion: { name, metal: name.slice(0, 2), oxidation: 0, electrons: ion.electrons, row: '3d' }, geometry: ion.geometry, geometryName: ion.geometry,
    multiplicity: ion.multiplicity, phase: 'solution', medium: null, temperature: null, technique: null, bands, absent: [],
    scanned: next() < 0.5 ? [] : [{ low: 5000, high: 35_000 }], innocenceDoubtful: false, nuclearity: 1, donors: null,
  };
  return { measurement, ion, policy: defaultPolicy, ratio: ratioFor(defaultPolicy, name), freeIon: free };
}
