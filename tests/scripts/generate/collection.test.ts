import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import type { ReadResult } from '../../../scripts/content/types.ts';
import { generateCollection, generatedFiles } from '../../../scripts/generate/collection.ts';
import { everyRecipe } from '../../../scripts/generate/enumerate.ts';

describe('every recipe', () => {
  const recipes = everyRecipe();

  it('is enough for ten thousand records', () => {
    expect(recipes.length).toBeGreaterThan(12_000);
  });

  it('has an id of its own that the record format takes', () => {
    expect(new Set(recipes.map((one) => one.id)).size).toBe(recipes.length);
    expect(recipes.filter((one) => !/^[a-z][a-z0-9-]{1,40}$/.test(one.id))).toEqual([]);
  });
});

describe('a generated collection', () => {
  let directory: string;
  let result: ReadResult;
  beforeAll(() => {
    directory = mkdtempSync(join(tmpdir(), 'bandstead-generated-'));
    generateCollection(11, 150, directory);
    result = readCollection(directory);
  });
  afterAll(() => rmSync(directory, { recursive: true, force: true }));

  it('is read without a fault', () => {
    expect(result.faults).toEqual([]);
    expect(result.collection?.complexes.length).toBe(150);
  });

  it('holds each formula and isomer once', () => {
    const identities = result.collection!.complexes.map((one) => `${one.formula} ${one.geometryName} ${one.isomer}`);
    expect(new Set(identities).size).toBe(identities.length);
  });

  it('varies media, temperatures, techniques, units and the number of measurements', () => {
    const measurements = result.collection!.complexes.flatMap((one) => one.measurements);
    expect(new Set(measurements.map((one) => one.medium)).size).toBeGreaterThan(5);
    expect(new Set(measurements.map((one) => one.engine.temperature)).size).toBeGreaterThanOrEqual(3);
    expect(new Set(measurements.map((one) => one.engine.technique)).size).toBeGreaterThanOrEqual(2);
    expect(measurements.length).toBeGreaterThan(160);
    const typed = measurements.flatMap((one) => one.bands.map((band) => band.positionTyped));
    for (const unit of ['cm-1', 'nm', 'eV']) expect(typed.some((text) => text.endsWith(unit))).toBe(true);
  });

  it('is the same for the same seed and another for another seed', () => {
    expect(generatedFiles(11, 20)).toEqual(generatedFiles(11, 20));
    expect(generatedFiles(12, 20)).not.toEqual(generatedFiles(11, 20));
  });

  it('keeps the records of a smaller collection when it grows', () => {
    const larger = new Map(generatedFiles(11, 40).map((file) => [file.path, file.text]));
    for (const file of generatedFiles(11, 20)) expect(larger.get(file.path)).toBe(file.text);
  });

  it('may be empty, and refuses a count that it cannot reach', () => {
    expect(generatedFiles(11, 0).filter((file) => file.path.startsWith('complexes/'))).toEqual([]);
    expect(() => generatedFiles(11, -1)).toThrow(/count: -1/);
    expect(() => generatedFiles(11, 1.5)).toThrow(RangeError);
  });
});
