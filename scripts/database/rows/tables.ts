import type { Reading } from '#engine';
import type { Collection } from '../../content/types.ts';
import { historyRows } from '../../release/rows.ts';
import { snapshotOf } from '../../release/snapshot.ts';
import type { Snapshot } from '../../release/types.ts';
import { noHistory } from '../../release/types.ts';
import type { History } from '../../release/types.ts';
import { frameRows, releaseRow, sharedRows } from './collection.ts';
import type { CollectionFrame } from './collection.ts';
import { complexResult } from './complexResult.ts';
import type { ComplexFacts } from './complexResult.ts';
import { floorFactorRows, reviewRows } from './review.ts';
import { mergeTables } from './row.ts';
import type { Tables } from './row.ts';
import { seriesRows } from './series.ts';

/** The full id of a measurement, "cr-am6/aq-295". */
export function measurementKey(complex: string, measurement: string): string {
  return `${complex}/${measurement}`;
}

/** Order by id: binary, never the locale's. */
export function byId(a: { readonly id: string }, b: { readonly id: string }): number {
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}

/** What made the numbers: sha256 of the engine's sources, hex, and name and version of the software. */
export interface Origin {
  readonly engine: string;
  readonly software: string;
}

/** The rows that hang on all complexes together. `complexes` ascend by id. */
export function wholeTables(frame: CollectionFrame, history: History, complexes: readonly ComplexFacts[], origin: Origin): Tables {
  return mergeTables([
    { release: [releaseRow(frame, complexes)] },
    { review: reviewRows(complexes.flatMap(({ review }) => review)) },
    floorFactorRows(complexes.flatMap(({ spare }) => spare)),
    seriesRows(complexes.flatMap(({ series }) => series), frame.ligands, frame.policyId),
    historyRows(history, snapshotOfFacts(frame, complexes, origin)),
  ]);
}

/** What a release would freeze now. */
export function snapshotOfFacts(frame: CollectionFrame, complexes: readonly ComplexFacts[], origin: Origin): Snapshot {
  return snapshotOf(frame, complexes.map(({ frozen }) => frozen), origin);
}

/**
 * Every row of the database for a collection and its readings, by full measurement id; the first reading of each is the chosen one.
 * Throws where a measurement has no reading.
 */
export function allTables(collection: Collection, readings: ReadonlyMap<string, readonly Reading[]>, engine: string, software: string): Tables {
  const results = collection.complexes.map((complex) =>
    complexResult(complex, collection.ligands, complex.measurements.map(({ id }) => readings.get(measurementKey(complex.id, id)) ?? []), collection.policyId));
  const facts = results.map((result) => result.facts);
  return mergeTables([
    frameRows(collection, engine, software), ...facts.map(sharedRows(collection)), ...results.map(({ tables }) => tables),
    wholeTables(collection, noHistory, facts, { engine, software }),
  ]);
}
