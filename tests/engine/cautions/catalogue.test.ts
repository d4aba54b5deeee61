import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { type CautionSubject, cautionMeanings, hazardCodes } from '#engine';
import { complexCases } from './complexCases.ts';
import { hazardCases } from './hazardCases.ts';
import { placingCases } from './placingCases.ts';
import { spectralCases } from './spectralCases.ts';

const engine = join(import.meta.dirname, '../../../engine');

/** Codes that a file of the engine raises, as its source writes them. */
const raisedIn = (file: string): readonly string[] =>
  [...new Set([...readFileSync(join(engine, file), 'utf8').matchAll(/(?:code: |, )'([A-Z]+(?:_[A-Z]+)*)'/g)].map(([, code]) => code!))].sort();
const listedFor = (subject: CautionSubject): readonly string[] => cautionMeanings.filter((one) => one.subject === subject).map(({ code }) => code).sort();

test.each([['reading', 'cautions/spectral.ts', 30], ['complex', 'cautions/ofComplex.ts', 4], ['comparison', 'series/placingCautions.ts', 10]] as const)(
  'every caution of a %s is in the catalogue, and nothing else is', (subject, file, least) => {
    expect(raisedIn(file).length).toBeGreaterThanOrEqual(least);
    expect(listedFor(subject)).toEqual(raisedIn(file));
  });

test('every hazard class is in the catalogue', () => {
  expect(listedFor('hazard')).toEqual([...hazardCodes].sort());
});

/** Every table of pairs: a record that raises a code, and one that comes near and does not. Each has its test beside it. */
const pairs: Readonly<Record<CautionSubject, Readonly<Record<string, unknown>>>> = { hazard: hazardCases, reading: spectralCases, complex: complexCases, comparison: placingCases };

test('no code of the catalogue is without its pair, and no pair is for another code', () => {
  const listed = (Object.keys(pairs) as CautionSubject[]).flatMap((subject) => Object.keys(pairs[subject]).map((code) => `${subject} ${code}`));
  expect(listed.sort()).toEqual(cautionMeanings.map(({ subject, code }) => `${subject} ${code}`).sort());
});

test('a code stands once and its meaning is one whole text', () => {
  const codes = cautionMeanings.map(({ code }) => code);
  expect(new Set(codes).size).toBe(codes.length);
  for (const { code, meaning } of cautionMeanings) expect(meaning, code).toMatch(/^(?:[A-Z]|beta|1Eg).*\.$/);
});
