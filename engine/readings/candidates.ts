import { readLabel } from '../levels/labels.ts';
import { mergedBands, setAside, singleBand } from '../measurement/observation.ts';
import type { Observation } from '../measurement/observation.ts';
import type { Band, BandRole, Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { isStrong, looksNarrow, looksWeak } from './evidence.ts';
import { transitionsOf } from './transitions.ts';
import type { GroundCase, Transition } from './transitions.ts';

/** One band, or merged components, with the transitions it may be. */
export interface Item {
  readonly observation: Observation;
  /** Letter form, ascending at an ordinary field. */
  readonly candidates: readonly string[];
  /** Whether it may stay unassigned, and what that says against the reading. */
  readonly leaveOut: { readonly reason: string; readonly counts: boolean } | null;
  readonly typed: boolean;
}

export interface NotFitted {
  readonly band: number;
  readonly reason: string;
}

export interface Gathered {
  /** Ascending in position. */
  readonly items: readonly Item[];
  readonly notFitted: readonly NotFitted[];
}

/** Whether bands keep to their typed terms, or may be anything their looks allow. */
export type Freedom = 'as typed' | 'free';

/** How many spin-forbidden lines, and how many transitions of a spin-rich low-spin ion, an untyped band is tried for. */
const linesAtMost = 6;
const allowedAtMost = 4;

/** Spin-allowed transitions a broad band may be. */
function broadCandidates(ion: GroundCase, transitions: readonly Transition[]): readonly Transition[] {
  const allowed = transitions.filter((t) => t.spinAllowed);
  // Of high-spin d5 only the quartets are seen: one spin turned, not two.
  if (allowed.length === 0) return transitions.filter((t) => t.multiplicity === ion.multiplicity - 2).slice(0, linesAtMost);
  if (allowed.length <= 3) return allowed;
  // Of the spin-rich low-spin ions only d6 is known to show spin-forbidden bands below its spin-allowed ones.
  const forbidden = ion.electrons === 6 ? transitions.filter((t) => t.multiplicity === ion.multiplicity + 2).slice(0, 2) : [];
  return [...forbidden, ...allowed.slice(0, allowedAtMost)];
}

const lineCandidates = (transitions: readonly Transition[]): readonly Transition[] => transitions.filter((t) => !t.spinAllowed && t.sameConfiguration).slice(0, linesAtMost);

/** Transitions that a band may be by its looks. */
export function candidatesByLooks(ion: GroundCase, band: Band): readonly string[] {
  const transitions = transitionsOf(ion);
  const broad = broadCandidates(ion, transitions);
  const lines = lineCandidates(transitions);
  const found = band.kind === 'dip' ? lines : looksNarrow(band) || looksWeak(band) ? [...lines, ...broad] : broad;
  return [...new Set(found.map((t) => t.label))];
}

function typedCandidates(band: Band, ion: GroundCase, parentRatio: number): readonly string[] {
  const labels = band.terms.flatMap((term) => {
    const reading = readLabel(term, { electrons: ion.electrons, geometry: ion.geometry, multiplicity: ion.multiplicity, ratio: parentRatio });
    return reading.ok ? reading.labels : [];
  });
  return [...new Set(labels)];
}

/** Words of a term list that name no level. */
const roleWords: readonly string[] = ['CT', 'ligand', 'vibration', 'impurity'] satisfies readonly BandRole[];

function itemOf(observation: Observation, band: Band, ion: GroundCase, parentRatio: number, freedom: Freedom): Item | string {
  const typed = band.terms.length > 0 && freedom === 'as typed';
  // A list such as [4T1g(F), CT] lets the band be no d-d transition at all.
  const maybeOther = typed && band.terms.some((term) => roleWords.includes(term));
  const other = { reason: `may be ${band.terms.find((term) => roleWords.includes(term))}, as typed`, counts: !isStrong(band) };
  const leaveOut = maybeOther ? other : typed ? null : isStrong(band) ? { reason: 'as strong as charge transfer', counts: false } : { reason: 'no transition is left for it', counts: true };
  const candidates = typed ? typedCandidates(band, ion, parentRatio) : candidatesByLooks(ion, band);
  if (typed && candidates.length === 0) return `no transition of this ion is named ${band.terms.join(' or ')}`;
  return { observation, candidates, leaveOut, typed };
}

/**
 * Turns bands into items: sets aside what is never fitted and merges components of one term to their
 * weighted barycentre.
 *
 * @param parentRatio C0/B0 by which parents in typed labels are resolved
 */
export function gatherItems(measurement: Measurement, ion: GroundCase, policy: Policy, parentRatio: number, freedom: Freedom): Gathered {
  const items: Item[] = [];
  const notFitted: NotFitted[] = [];
  const components = new Map<string, number[]>();
  const take = (observation: Observation, band: Band): void => {
    const item = itemOf(observation, band, ion, parentRatio, freedom);
    if (typeof item === 'string') for (const index of observation.bands) notFitted.push({ band: index, reason: item });
    else items.push(item);
  };
  measurement.bands.forEach((band, index) => {
    const reason = setAside(band);
    if (reason !== null) notFitted.push({ band: index, reason });
    else if (band.kind !== 'component') take(singleBand(measurement, index, policy), band);
    else if (band.degeneracy === null) notFitted.push({ band: index, reason: 'a component without its degeneracy cannot enter a barycentre' });
    else {
      // One term under two spellings, 4T1g(F) and a4T1g, is one group.
      const key = [...typedCandidates(band, ion, parentRatio)].sort().join('|');
      components.set(key, [...(components.get(key) ?? []), index]);
    }
  });
  for (const indices of components.values()) take(mergedBands(measurement, indices, policy), measurement.bands[indices[0]!]!);
  items.sort((a, b) => a.observation.position - b.observation.position);
  return { items, notFitted };
}
