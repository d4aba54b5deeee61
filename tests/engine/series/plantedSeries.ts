import { placeResult, placingGround } from '#engine';
import type { ComparedCollection, Placement, SeriesResult } from '#engine';
import { randomFrom } from '../../../scripts/generate/random.ts';
import { result, testFloor, testPolicy } from './sample.ts';
import type { Invented } from './sample.ts';

// Factors that obey the rules exactly; three ions with four ligands each, Delta scattered by 2 %.
const f: Readonly<Record<string, number>> = { aqua: 1, chlorido: 0.78, ammine: 1.25, cyanido: 1.7 };
const h: Readonly<Record<string, number>> = { aqua: 1, chlorido: 2, ammine: 1.4, cyanido: 2 };
const g: Readonly<Record<string, number>> = { 'Cr(III)': 17400, 'V(II)': 12000, 'Mo(III)': 24600 };
const k: Readonly<Record<string, number>> = { 'Cr(III)': 0.21, 'V(II)': 0.08, 'Mo(III)': 0.15 };
const average = (values: Readonly<Record<string, number>>, set: Readonly<Record<string, number>>): number => Object.entries(set).reduce((sum, [one, count]) => sum + (count * values[one]!) / 6, 0);

/** A result whose Delta and beta follow from the factors of its ion and ligands; any field may be given. */
export const planted = (ion: string, set: Readonly<Record<string, number>>, more: Partial<Invented> = {}): SeriesResult =>
  result({ ion, ligands: set, delta: g[ion]! * average(f, set), beta: 1 - k[ion]! * average(h, set), ...more });

const random = randomFrom(4, 'place');

/** A collection of twelve homoleptic complexes. */
export const regular = Object.keys(g).flatMap((ion) => ['aqua', 'chlorido', 'ammine', 'cyanido'].map((ligand) => planted(ion, { [ligand]: 6 }))).map((one): SeriesResult => ({
  ...one, parameters: { ...one.parameters, Delta: { ...one.parameters.Delta, value: one.parameters.Delta.value! * Math.exp(random.normal(0, 0.02)) } },
}));

const collectionOf = (results: readonly SeriesResult[]): ComparedCollection => ({ policy: { id: testPolicy, differentialFloor: testFloor }, aqua: 'aqua', results });

/** A result placed in a collection, of which it may be a member. */
export const place = (one: SeriesResult, results: readonly SeriesResult[] = regular): Placement => placeResult(placingGround(collectionOf(results), one.complex, [`${one.complex.id}/${one.measurement}`]), one);

export const codes = (placement: Placement): readonly string[] => placement.cautions.map(({ code }) => code);
