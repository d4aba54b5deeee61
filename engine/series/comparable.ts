// What may stand beside what: like with like, and the reason in words for everything that is left out.

import type { Geometry } from '../ions/types.ts';
import { notLike } from '../words/series.ts';
import type { Unlike, UnlikeKind } from '../words/series.ts';
import { complexKey, ionWords, ligandSetKey, measurementId, phaseClass, spinName } from './identity.ts';
import type { ComplexIdentity, PhaseClass, SeriesParameter, SeriesResult } from './types.ts';

/** K: results further apart than this are not compared by default. */
export const temperatureReach = 50;
/** K. */
export const roomTemperature = 295;

/** Which temperatures may stand together. */
export interface TemperatureFrame {
  /** K; null: only results whose temperature was not recorded. */
  readonly near: number | null;
  /** true: results without a recorded temperature are let in beside those near `near`. */
  readonly orNotRecorded: boolean;
}

/** What the members of a comparison share. null: any. */
export interface Frame {
  readonly policy: string;
  readonly ion: string | null;
  readonly geometry: Geometry | null;
  readonly multiplicity: number | null;
  /** As `ligandSetKey` gives it. */
  readonly ligandSet: string | null;
  readonly phase: PhaseClass | null;
  readonly temperature: TemperatureFrame;
}

/** A measurement that was left out, and why. */
export interface NotCompared {
  readonly result: SeriesResult;
  readonly kind: UnlikeKind;
  readonly reason: string;
}

/** Results that may be compared, one for each complex. */
export interface Comparable {
  readonly parameter: SeriesParameter;
  readonly frame: Frame;
  /** Ascending by value; where equal by complex id. */
  readonly members: readonly SeriesResult[];
  /** In the order of the candidates. */
  readonly leftOut: readonly NotCompared[];
}

/**
 * Why a result may not stand in a frame, or null where it may. This is the one place where likeness is decided; pages, exports and
 * commands all come here.
 */
export function whyUnlike(result: SeriesResult, parameter: SeriesParameter, frame: Frame): Unlike | null {
  const { complex, cautions } = result;
  const number = result.parameters[parameter];
  if (frame.ion !== null && complex.ion.name !== frame.ion) return notLike.ion(complex.ion.name);
  if (complex.geometry === null) return notLike.notFitted(complex.geometryName);
  if (frame.geometry !== null && complex.geometry !== frame.geometry) return notLike.geometry(complex.geometry);
  if (frame.multiplicity !== null && complex.multiplicity !== frame.multiplicity)
    return complex.multiplicity === null ? notLike.spinUnknown : notLike.spin(spinName(complex.multiplicity));
  if (frame.ligandSet !== null && ligandSetKey(complex) !== frame.ligandSet) return notLike.ligands;
  if (result.policy !== frame.policy) return notLike.policy(result.policy);
  if (number.value === null) return notLike.withheld(parameter, number.reason ?? 'withheld');
  if (cautions.includes('JAHN_TELLER_ENVELOPE')) return notLike.jahnTeller;
  if (cautions.includes('MORE_THAN_ONE_METAL')) return notLike.moreMetals;
  if (frame.phase !== null && phaseClass(result) !== frame.phase) return notLike.phase(result.phase);
  return temperatureUnlike(result.temperature, frame.temperature);
}

function temperatureUnlike(temperature: number | null, { near, orNotRecorded }: TemperatureFrame): Unlike | null {
  if (temperature === null) return near === null || orNotRecorded ? null : notLike.temperatureUnknown;
  if (near === null) return notLike.temperatureKnown(temperature);
  return Math.abs(temperature - near) <= temperatureReach ? null : notLike.temperature(temperature, near, temperatureReach);
}

/**
 * The results of a list that may be compared in a frame: like with like, one for each complex. Of several measurements of a complex
 * the one with the smallest total uncertainty stands for it (where equal, the first by id).
 */
export function selectComparable(candidates: readonly SeriesResult[], parameter: SeriesParameter, frame: Frame): Comparable {
  const leftOut = new Map<SeriesResult, Unlike>();
  const best = new Map<string, SeriesResult>();
  for (const result of candidates) {
    const unlike = whyUnlike(result, parameter, frame);
    if (unlike !== null) {
      leftOut.set(result, unlike);
      continue;
    }
    const key = complexKey(result.complex);
    const rival = best.get(key);
    if (rival === undefined) best.set(key, result);
    else if (standsBefore(result, rival, parameter)) {
      leftOut.set(rival, notLike.anotherStands(measurementId(result)));
      best.set(key, result);
    } else leftOut.set(result, notLike.anotherStands(measurementId(rival)));
  }
  const members = [...best.values()].sort((a, b) =>
    a.parameters[parameter].value! - b.parameters[parameter].value! || (measurementId(a) < measurementId(b) ? -1 : 1));
  const inOrder = candidates.filter((result) => leftOut.has(result)).map((result) => ({ result, ...leftOut.get(result)! }));
  return { parameter, frame, members, leftOut: inOrder };
}

function standsBefore(result: SeriesResult, rival: SeriesResult, parameter: SeriesParameter): boolean {
  const [own, other] = [result, rival].map((one) => one.parameters[parameter].uTotal ?? Number.POSITIVE_INFINITY) as [number, number];
  return own < other || (own === other && measurementId(result) < measurementId(rival));
}

/** The frame of an ion's own series, its phase and temperature still open. */
export type Subject = Pick<Frame, 'policy' | 'ion' | 'geometry' | 'multiplicity' | 'ligandSet'>;

/** The subject of the series by ligand of a complex's ion, in its geometry and spin. */
export function ionSubject(complex: ComplexIdentity, policy: string): Subject {
  return { policy, ion: complex.ion.name, geometry: complex.geometry, multiplicity: complex.multiplicity, ligandSet: null };
}

/** The subject of the series by ion of a complex's set of ligands, in its geometry; spin states stand side by side. */
export function ligandSubject(complex: ComplexIdentity, policy: string): Subject {
  return { policy, ion: null, geometry: complex.geometry, multiplicity: null, ligandSet: ligandSetKey(complex) };
}

const usualConditions: readonly Pick<Frame, 'phase' | 'temperature'>[] = [
  { phase: 'solution', temperature: { near: roomTemperature, orNotRecorded: false } },
  { phase: 'solid', temperature: { near: roomTemperature, orNotRecorded: false } },
  { phase: 'solution', temperature: { near: null, orNotRecorded: false } },
  { phase: 'solid', temperature: { near: null, orNotRecorded: false } },
  { phase: 'solid', temperature: { near: 77, orNotRecorded: false } },
  { phase: 'solution', temperature: { near: 77, orNotRecorded: false } },
];

/**
 * The usual series of a subject: the phase class and temperature under which most complexes can be compared, solution at room
 * temperature where equal.
 */
export function usualSeries(candidates: readonly SeriesResult[], parameter: SeriesParameter, subject: Subject): Comparable {
  let most: Comparable | null = null;
  for (const conditions of usualConditions) {
    const one = selectComparable(candidates, parameter, { ...subject, ...conditions });
    if (most === null || one.members.length > most.members.length) most = one;
  }
  return most!;
}

/** Ion, geometry and spin states of a list of results, in the order in which they come, each with its results. */
export function byIon(results: readonly SeriesResult[]): ReadonlyMap<string, readonly SeriesResult[]> {
  const groups = new Map<string, SeriesResult[]>();
  for (const result of results) {
    const key = ionWords(result.complex);
    const group = groups.get(key);
    if (group) group.push(result);
    else groups.set(key, [result]);
  }
  return groups;
}
