import { listed } from './numbers.ts';
import type { ParameterName } from './types.ts';

/** What keeps a result out of a comparison, in kinds that can be counted. */
export type UnlikeKind = 'ion' | 'geometry' | 'spin' | 'ligands' | 'policy' | 'withheld' | 'Jahn–Teller' | 'more metals' | 'phase' | 'temperature' | 'no temperature' | 'repeat' | 'rests on B' | 'no uncertainty';

/** Why a result does not stand in a comparison: the kind, and the reason in words. */
export interface Unlike {
  readonly kind: UnlikeKind;
  readonly reason: string;
}

const unlike = (kind: UnlikeKind, reason: string): Unlike => ({ kind, reason });

export const notLike = {
  ion: (ion: string) => unlike('ion', `another ion: ${ion}`),
  notFitted: (geometry: string) => unlike('geometry', `${geometry} complexes are stored and drawn, not fitted`),
  geometry: (geometry: string) => unlike('geometry', `another geometry: ${geometry}`),
  spinUnknown: unlike('spin', 'the spin state is not declared'),
  spin: (spin: string) => unlike('spin', `another spin state: ${spin}`),
  ligands: unlike('ligands', 'another set of ligands'),
  policy: (policy: string) => unlike('policy', `fitted under another policy: ${policy}`),
  withheld: (parameter: ParameterName, reason: string) => unlike('withheld', `${parameter} is withheld: ${reason}`),
  jahnTeller: unlike('Jahn–Teller', 'one band stands for a transition that a Jahn–Teller distortion splits'),
  moreMetals: unlike('more metals', 'more than one metal centre'),
  phase: (phase: string) => unlike('phase', `another phase: ${phase}`),
  temperatureUnknown: unlike('no temperature', 'the temperature is not recorded'),
  temperatureKnown: (kelvin: number) => unlike('temperature', `measured at ${kelvin} K; the others have no recorded temperature`),
  temperature: (kelvin: number, near: number, reach: number) => unlike('temperature', `measured at ${kelvin} K, more than ${reach} K from ${near} K`),
  anotherStands: (measurement: string) => unlike('repeat', `${measurement} stands for the complex: its total uncertainty is smaller`),
  fieldRestsOnB: unlike('rests on B', 'Delta rests on an assumed B'),
  noUncertainty: unlike('no uncertainty', 'no uncertainty stands with the value'),
} as const;

const kindWords: Readonly<Record<UnlikeKind, readonly [one: string, many: string]>> = {
  ion: ['of another ion', 'of other ions'], geometry: ['of another geometry', 'of other geometries'], spin: ['in another spin state', 'in other spin states'],
  ligands: ['with other ligands', 'with other ligands'], policy: ['under another policy', 'under another policy'], withheld: ['withheld', 'withheld'],
  'Jahn–Teller': ['with a Jahn–Teller distortion', 'with Jahn–Teller distortions'], 'more metals': ['with more than one metal', 'with more than one metal'],
  phase: ['in another phase', 'in other phases'], temperature: ['at another temperature', 'at other temperatures'],
  'no temperature': ['without a recorded temperature', 'without a recorded temperature'], repeat: ['repeat', 'repeats'],
  'rests on B': ['resting on an assumed B', 'resting on an assumed B'], 'no uncertainty': ['without an uncertainty', 'without an uncertainty'],
};

/** "6 in other phases", "1 withheld": how many were left out for one kind of reason. */
export function leftOutWords(kind: UnlikeKind, count: number): string {
  return `${count} ${kindWords[kind][count === 1 ? 0 : 1]}`;
}

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
