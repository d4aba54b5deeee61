import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isPrediction, measurementId, placingGround, predictFromFactors } from '#engine';
import type { SeriesResult } from '#engine';
import { readStoredCollection } from '../../../scripts/compare/collection.ts';
import { refit, refitCollection } from '../../../scripts/database/refit.ts';
import { readContent } from '../../../scripts/release/readContent.ts';
import { places } from '../../../scripts/places.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';

const place = temporaryFolder();
/** The demonstration collection: large enough for factors, with octahedral and tetrahedral complexes. */
const { content } = places;
const file = join(place.path, 'c.sqlite');
let database: Database.Database;
let direct: readonly SeriesResult[];

beforeAll(() => {
  const done = refit({ content, database: file, cache: null });
  if (!done.ok) throw new Error(JSON.stringify(done.faults));
  const { collection, history } = readContent(content);
  direct = refitCollection(collection!, history, 0, { cache: null }).facts.flatMap(({ series }) => series);
  database = new Database(file, { readonly: true });
});
afterAll(() => {
  database.close();
  place.remove();
});

const rows = <T>(sql: string): T[] => database.prepare(sql).all() as T[];

describe('factors and placements in the database', () => {
  it('the results read back from the database are those that the fits were made of', () => {
    expect(direct.length).toBeGreaterThan(100);
    expect(readStoredCollection(file).compared.results).toEqual(direct);
  });

  it('every complex of a fitted geometry stands in a fit or is left out with a reason, once for each parameter', () => {
    for (const parameter of ['Delta', 'beta']) {
      const inFit = rows<{ id: string }>(`SELECT complex || '/' || measurement AS id FROM factor_complex WHERE parameter = '${parameter}'`).map(({ id }) => id);
      const out = rows<{ id: string; reason: string }>(`SELECT complex || '/' || measurement AS id, reason FROM factor_left_out WHERE parameter = '${parameter}'`);
      expect(inFit.length, parameter).toBeGreaterThan(20);
      expect(out.every(({ reason }) => reason.length > 5)).toBe(true);
      expect([...inFit, ...out.map(({ id }) => id)].sort()).toEqual(direct.filter(({ complex }) => complex.geometry !== null).map(measurementId).sort());
    }
  });

  it('octahedral and tetrahedral factors are apart, and each island has one ligand set to 1', () => {
    const islands = rows<{ parameter: string; geometry: string; number: number; gauge: string }>('SELECT * FROM factor_island');
    expect(new Set(islands.map(({ geometry }) => geometry)).size).toBe(2);
    for (const { parameter, geometry, number, gauge } of islands) {
      const gauges = rows<{ name: string; value: number; u: number }>(`SELECT name, value, u FROM factor WHERE parameter = '${parameter}' AND geometry = '${geometry}' AND island = ${number} AND gauge = 1`);
      expect(gauges).toEqual([{ name: gauge, value: 1, u: 0 }]);
    }
    expect(rows("SELECT * FROM factor WHERE kind = 'ion' AND geometry = 'octahedral' AND name NOT LIKE '% octahedral %'")).toEqual([]);
  });

  it('a factor without a test says so, and one from one complex says it', () => {
    expect(rows('SELECT * FROM factor WHERE tested = 0 AND reason IS NULL')).toEqual([]);
    const single = rows<{ reason: string }>('SELECT reason FROM factor WHERE complexes = 1 AND gauge = 0 AND value IS NOT NULL');
    expect(single.length).toBeGreaterThan(0);
    expect(new Set(single.map(({ reason }) => reason))).toEqual(new Set(['from one complex: no test']));
  });

  it('a stored prediction is the one that the rest of the collection makes', () => {
    const { compared } = readStoredCollection(file);
    const stored = rows<{ id: string; predicted: number; u: number }>("SELECT complex || '/' || measurement AS id, predicted, u FROM placement WHERE parameter = 'Delta' AND method = 'factors' AND predicted IS NOT NULL");
    expect(stored.length).toBeGreaterThan(20);
    for (const { id, predicted, u } of stored.slice(0, 12)) {
      const result = direct.find((one) => measurementId(one) === id)!;
      const fresh = predictFromFactors(placingGround(compared, result.complex, [id]).fits!.Delta, result.complex);
      if (!isPrediction(fresh)) throw new Error(`${id}: ${fresh.reason}`);
      // By algebra against a new fit of the others, whose weights differ a little: a fifth of u.
      expect(Math.abs(fresh.predicted - predicted), id).toBeLessThan(0.2 * u);
    }
  });

  it('a placement names a prediction or a reason, and a z only beside a published number', () => {
    expect(rows("SELECT * FROM placement p JOIN parameter n ON n.complex = p.complex AND n.measurement = p.measurement AND n.reading = 1 AND n.name = p.parameter WHERE p.z IS NOT NULL AND n.value IS NULL")).toEqual([]);
    expect(rows("SELECT method FROM placement WHERE predicted IS NULL AND reason IS NULL")).toEqual([]);
  });
});
