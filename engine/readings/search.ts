import type { FreeIon } from '../ions/types.ts';
import { readLabel } from '../levels/labels.ts';
import type { Policy } from '../policy/types.ts';
import { transitionsAt } from './evaluate.ts';
import { betaPenalty, fitAssignment, isFit } from './fit.ts';
import type { Assigned, FitOutcome } from './fit.ts';
import { mergedBands, setAside, singleBand } from '../measurement/observation.ts';
import type { Observation } from '../measurement/observation.ts';
import { transitionOf, transitionsOf } from './transitions.ts';
import type { GroundCase, Transition } from './transitions.ts';
import type { Band, Measurement } from '../measurement/types.ts';
import type { Range } from '../quantity/range.ts';
import type { RatioUsed } from './types.ts';

/** One band, or merged components, with the transitions it may be. */
interface Item {
  readonly observation: Observation;
  readonly candidates: readonly string[];
  /** Whether the candidates were typed; an untyped band may also stay unassigned. */
  readonly typed: boolean;
}

/** One way to assign the bands, with what the fit made of it. */
export interface ScoredReading {
  readonly assigned: readonly Assigned[];
  /** Bands that stay out, with the reason. */
  readonly notFitted: readonly { readonly band: number; readonly reason: string }[];
  readonly outcome: FitOutcome;
  /** chi2 + 2 x free parameters + evidence; infinite where no fit stands. Lower is better. */
  readonly score: number;
  readonly origin: 'typed' | 'proposed' | 'none';
}

/** Narrower than this, or fainter, a band is taken for a spin-flip line where no term is typed. */
const narrowWidth = 600;
const faintEpsilon = 1;

/** How many spin-forbidden candidates an untyped band gets. */
const candidatesAtMost = 6;

const unassignedPenalty = 9;
const gapPenalty = 9;
const unseenPenalty = 4;
const skippedLinePenalty = 2;

/** More assignments than this are not tried; typed terms keep real records far below. */
const assignmentsAtMost = 20_000;

const parametersOf = { field: 1, 'field, B assumed': 1, 'field, B': 2, 'field, B by a line': 2, 'field, B, C': 3 } as const;

function looksLikeLine(band: Band): boolean {
  return band.kind === 'line' || band.kind === 'zero-phonon' || (band.width !== null && band.width < narrowWidth) || (band.epsilon !== null && band.epsilon < faintEpsilon);
}

/** Transitions an untyped band may be: spin-allowed for a broad band, spin-flip for a line; quartets of high-spin d5 for both. */
function proposedFor(band: Band, transitions: readonly Transition[], groundMultiplicity: number): readonly string[] {
  const everyAllowed = transitions.filter((t) => t.spinAllowed);
  // Of high-spin d5 only the quartets are seen: one spin turned, not two.
  if (everyAllowed.length === 0) return transitions.filter((t) => t.multiplicity === groundMultiplicity - 2).slice(0, candidatesAtMost).map((t) => t.label);
  if (looksLikeLine(band)) return transitions.filter((t) => !t.spinAllowed && t.sameConfiguration).slice(0, candidatesAtMost).map((t) => t.label);
  // Up to three spin-allowed transitions are all within reach; of the many of low-spin ions only the lowest of each block.
  return (everyAllowed.length <= 3 ? everyAllowed : everyAllowed.filter((t) => t.label.startsWith('a')).slice(0, 2)).map((t) => t.label);
}

function typedCandidates(band: Band, ion: GroundCase, ratio: number): readonly string[] {
  const labels = band.terms.flatMap((term) => {
    const reading = readLabel(term, { electrons: ion.electrons, geometry: ion.geometry, multiplicity: ion.multiplicity, ratio });
    return reading.ok ? reading.labels : [];
  });
  return [...new Set(labels)];
}

interface Gathered {
  readonly items: readonly Item[];
  readonly notFitted: readonly { readonly band: number; readonly reason: string }[];
}

/** Turns bands into items: sets aside what is never fitted and merges the components of one term. */
function gather(measurement: Measurement, ion: GroundCase, policy: Policy, parentRatio: number): Gathered {
  const transitions = transitionsOf(ion);
  const items: Item[] = [];
  const notFitted: { band: number; reason: string }[] = [];
  const components = new Map<string, number[]>();
  measurement.bands.forEach((band, index) => {
    const reason = setAside(band);
    if (reason !== null) {
      notFitted.push({ band: index, reason });
      return;
    }
    if (band.kind === 'component') {
      if (band.degeneracy === null) {
        notFitted.push({ band: index, reason: 'a component without its degeneracy cannot enter a barycentre' });
        return;
      }
      const key = [...band.terms].sort().join('|');
      const group = components.get(key);
      if (group) group.push(index);
      else components.set(key, [index]);
      return;
    }
    const typed = band.terms.length > 0;
    const candidates = typed ? typedCandidates(band, ion, parentRatio) : proposedFor(band, transitions, ion.multiplicity);
    if (typed && candidates.length === 0) notFitted.push({ band: index, reason: `no transition of this ion is named ${band.terms.join(' or ')}` });
    else items.push({ observation: singleBand(measurement, index, policy), candidates, typed });
  });
  for (const indices of components.values()) {
    const first = measurement.bands[indices[0]!]!;
    const typed = first.terms.length > 0;
    items.push({
      observation: mergedBands(measurement, indices, policy),
      candidates: typed ? typedCandidates(first, ion, parentRatio) : proposedFor(first, transitions, ion.multiplicity),
      typed,
    });
  }
  items.sort((a, b) => a.observation.position - b.observation.position);
  return { items, notFitted };
}

/** Every way to give each item one of its candidates, no transition twice (the d5 pair excepted); null leaves an untyped item out. */
function assignments(items: readonly Item[]): (string | null)[][] {
  const found: (string | null)[][] = [];
  const chosen: (string | null)[] = [];
  const visit = (at: number): void => {
    if (found.length >= assignmentsAtMost) return;
    if (at === items.length) {
      found.push([...chosen]);
      return;
    }
    const item = items[at]!;
    for (const label of item.candidates) {
      if (chosen.includes(label) && !label.includes('/')) continue;
      chosen.push(label);
      visit(at + 1);
      chosen.pop();
    }
    if (!item.typed) {
      chosen.push(null);
      visit(at + 1);
      chosen.pop();
    }
  };
  visit(0);
  return found;
}

const within = (ranges: readonly Range[], position: number): boolean => ranges.some((range) => position >= range.low && position <= range.high);

/** Transitions that the fit predicts where a band should have been seen. */
function unseenEvidence(measurement: Measurement, ion: GroundCase, assigned: readonly Assigned[], outcome: FitOutcome): number {
  if (!isFit(outcome)) return 0;
  const { at, ground } = outcome.solutions[0]!;
  const positions = assigned.map((one) => one.observation.position);
  const lowest = Math.min(...positions);
  const highest = Math.max(...positions);
  const all = transitionsOf(ion);
  const noneAllowed = all.every((t) => !t.spinAllowed);
  const expected = (t: Transition): boolean => t.spinAllowed || (noneAllowed && t.multiplicity === ion.multiplicity - 2);
  const open = all.filter((t) => (expected(t) || t.sameConfiguration) && !assigned.some((one) => one.label === t.label));
  const lines = assigned.filter((one) => !transitionOf(ion, one.label).spinAllowed).map((one) => one.observation.position);
  return transitionsAt(ion, ground, open.map((t) => t.label), at).reduce((sum, { energy }, i) => {
    // A spin-flip line below an assigned one is seldom missed: the lowest, 2E, is the strongest.
    if (!expected(open[i]!)) return lines.some((position) => position > energy) ? sum + skippedLinePenalty : sum;
    if (energy < lowest) return sum;
    if (energy <= highest) return sum + gapPenalty;
    return within([...measurement.scanned, ...measurement.absent], energy) ? sum + unseenPenalty : sum;
  }, 0);
}

/** Whether bands that the engine assigned keep the order of the calculated transitions. */
function keepsOrder(items: readonly Item[], labels: readonly (string | null)[], assigned: readonly Assigned[], outcome: FitOutcome): boolean {
  if (!isFit(outcome)) return true;
  const rows = assigned
    .map((one, k) => ({ position: one.observation.position, calculated: outcome.calculated[k]!.energy, open: items[labels.indexOf(one.label)]?.candidates.length !== 1 }))
    .filter((row) => row.open)
    .sort((a, b) => a.position - b.position);
  return rows.every((row, i) => i === 0 || row.calculated >= rows[i - 1]!.calculated - 1e-6);
}

/**
 * All assignments of a measurement's bands within the typed candidates, or in the spin-allowed order where
 * none is typed, each with its fit; best score first.
 */
export function searchReadings(measurement: Measurement, ion: GroundCase, policy: Policy, ratio: RatioUsed, freeIon: FreeIon | null): readonly ScoredReading[] {
  const parentRatio = freeIon?.racahC0 ? freeIon.racahC0 / freeIon.racahB0 : 4.5;
  const { items, notFitted } = gather(measurement, ion, policy, parentRatio);
  const fixed = items.every((item) => item.typed && item.candidates.length === 1);
  const origin = items.length === 0 ? 'none' : items.some((item) => item.typed) ? 'typed' : 'proposed';
  const readings = assignments(items).map((labels): ScoredReading => {
    const assigned: Assigned[] = [];
    const left = [...notFitted];
    items.forEach(({ observation }, i) => {
      const label = labels[i];
      if (label) assigned.push({ label, observation });
      else for (const band of observation.bands) left.push({ band, reason: 'no spin-allowed transition is left for it' });
    });
    const outcome = fitAssignment(ion, assigned, policy, ratio, freeIon);
    const unassigned = labels.filter((label) => label === null).length;
    const legal = isFit(outcome) && (fixed || keepsOrder(items, labels, assigned, outcome));
    const score = legal
      ? outcome.solutions[0]!.chi2 + 2 * parametersOf[outcome.mode] + unassignedPenalty * unassigned +
        betaPenalty(outcome.solutions[0]!.at.racahB, outcome.assumedBeta ? null : freeIon) + unseenEvidence(measurement, ion, assigned, outcome)
      : Number.POSITIVE_INFINITY;
    return { assigned, notFitted: left.sort((a, b) => a.band - b.band), outcome, score, origin };
  });
  // With nothing that fits, the reading that assigns most bands tells most about why.
  return readings.sort((a, b) => compareScores(a.score, b.score) || b.assigned.length - a.assigned.length);
}

function compareScores(a: number, b: number): number {
  return a === b ? 0 : a < b ? -1 : 1;
}
