import { listed } from './numbers.ts';
import type { ParameterName } from './types.ts';

/** Why a result does not stand in a comparison. */
export const notLike = {
  ion: (ion: string): string => `another ion: ${ion}`,
  notFitted: (geometry: string): string => `${geometry} complexes are stored and drawn, not fitted`,
  geometry: (geometry: string): string => `another geometry: ${geometry}`,
  spinUnknown: 'the spin state is not declared',
  spin: (spin: string): string => `another spin state: ${spin}`,
  ligands: 'another set of ligands',
  policy: (policy: string): string => `fitted under another policy: ${policy}`,
  withheld: (parameter: ParameterName, reason: string): string => `${parameter} is withheld: ${reason}`,
  jahnTeller: 'one band stands for a transition that a Jahn–Teller distortion splits',
  moreMetals: 'more than one metal centre',
  phase: (phase: string): string => `another phase: ${phase}`,
  temperatureUnknown: 'the temperature is not recorded',
  temperatureKnown: (kelvin: number): string => `measured at ${kelvin} K; the others have no recorded temperature`,
  temperature: (kelvin: number, near: number, reach: number): string => `measured at ${kelvin} K, more than ${reach} K from ${near} K`,
  anotherStands: (measurement: string): string => `${measurement} stands for the complex: its total uncertainty is smaller`,
} as const;

/** "solution, within 50 K of 295 K": what the members of a series share. */
export function conditionWords(phase: string | null, near: number | null, reach: number, orNotRecorded: boolean): string {
  const where = phase ?? 'all phases';
  if (near === null) return `${where}, temperature not recorded`;
  return `${where}, within ${reach} K of ${near} K${orNotRecorded ? ' or temperature not recorded' : ''}`;
}

/** "A is not distinguishable from B, C and 2 more." At most `most` names are given. */
export function notDistinguishableSentence(name: string, others: readonly string[], most = 4): string {
  if (others.length === 0) return `${name} is distinguishable from every other.`;
  const shown = others.length > most ? [...others.slice(0, most - 1), `${others.length - most + 1} more`] : others;
  return `${name} is not distinguishable from ${listed(shown)}.`;
}
