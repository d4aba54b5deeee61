// What changed between two states of a collection, number by number, each with its cause.

import type { ParameterName } from '#engine';
import { parameterNames } from './snapshot.ts';
import type { Change, FrozenComplex, FrozenMeasurement, FrozenNumber, Snapshot } from './types.ts';
import { addedWords, numberWords, removedWords, verdictWords } from './words.ts';

/** Two values count as one where they differ by no more than this part of themselves: another machine may differ in the last bits. */
const sameWithin = 1e-9;

type Compared = Pick<Snapshot, 'engine' | 'software' | 'complexes'>;

/** The changes from one state to the next, by complex, measurement and parameter. */
export function changesBetween(before: Compared, after: Compared): readonly Change[] {
  const context = { engineChanged: before.engine !== after.engine, softwareChanged: before.software !== after.software };
  return pairs(before.complexes, after.complexes).flatMap(([id, old, now]): Change[] => {
    if (old === null) return [whole('complex added', id, null, addedWords(id))];
    if (now === null) return [whole('complex removed', id, null, removedWords(id))];
    return changesOfComplex(old, now, context);
  });
}

interface Context {
  readonly engineChanged: boolean;
  readonly softwareChanged: boolean;
}

function changesOfComplex(before: FrozenComplex, after: FrozenComplex, context: Context): Change[] {
  return pairs(before.measurements, after.measurements).flatMap(([id, old, now]): Change[] => {
    const full = `${after.id}/${id}`;
    if (old === null) return [whole('measurement added', after.id, id, addedWords(full))];
    if (now === null) return [whole('measurement removed', after.id, id, removedWords(full))];
    const verdict = old.verdict === now.verdict ? [] : [{
      ...nothing, kind: 'verdict' as const, complex: after.id, measurement: id, cause: causeOf(old, now, context, null), text: verdictWords(full, old.verdict, now.verdict, causeOf(old, now, context, null)),
    }];
    return [...verdict, ...parameterNames.flatMap((parameter) => numberChange(after.id, old, now, parameter, context))];
  });
}

function numberChange(complex: string, before: FrozenMeasurement, after: FrozenMeasurement, parameter: ParameterName, context: Context): Change[] {
  const [old, now] = [before.numbers[parameter], after.numbers[parameter]];
  if (same(old, now)) return [];
  const cause = causeOf(before, after, context, parameter);
  return [{
    kind: 'number', complex, measurement: after.id, parameter, before: old.value, beforeU: old.u_total, after: now.value, afterU: now.u_total, cause,
    text: numberWords(`${complex}/${after.id}`, parameter, old, now, cause),
  }];
}

function same(a: FrozenNumber, b: FrozenNumber): boolean {
  return a.standing === b.standing && close(a.value, b.value) && close(a.u, b.u) && close(a.u_total, b.u_total);
}

function close(a: number | null, b: number | null): boolean {
  if (a === null || b === null) return a === b;
  return Math.abs(a - b) <= sameWithin * Math.max(Math.abs(a), Math.abs(b));
}

/**
 * What of a measurement changed between two states, in the order in which a reader asks: readings, policy, free-ion set, engine.
 * The free-ion set moves beta alone; it is named for another number only where nothing else changed. A policy that only got
 * another name is not a cause.
 */
export function causeOf(before: FrozenMeasurement, after: FrozenMeasurement, { engineChanged, softwareChanged }: Context, parameter: ParameterName | null): string {
  const freeIon = before.free_ion !== after.free_ion;
  const causes = [
    ...(before.readings === after.readings ? [] : ['readings']),
    ...(before.policy.slice(-8) === after.policy.slice(-8) ? [] : ['policy']),
    ...(freeIon && parameter === 'beta' ? ['free-ion set'] : []),
    ...(engineChanged ? ['engine'] : []),
  ];
  if (causes.length > 0) return causes.join(', ');
  return freeIon ? 'free-ion set' : softwareChanged ? 'software' : 'machine';
}

const nothing = { parameter: null, before: null, beforeU: null, after: null, afterU: null } as const;

function whole(kind: Change['kind'], complex: string, measurement: string | null, text: string): Change {
  return { ...nothing, kind, complex, measurement, cause: 'record', text };
}

/** Old and new of every id, ids in binary order. */
function pairs<T extends { readonly id: string }>(before: readonly T[], after: readonly T[]): [string, T | null, T | null][] {
  const [old, now] = [before, after].map((list) => new Map(list.map((one) => [one.id, one])));
  return [...new Set([...old!.keys(), ...now!.keys()])].sort().map((id) => [id, old!.get(id) ?? null, now!.get(id) ?? null]);
}
