import { describe, expect, test } from 'vitest';
import type { z } from 'zod';
import { editDistance, nearNames, orList } from '../../../scripts/content/nearest.ts';
import { charge } from '../../../scripts/content/schema/leaves.ts';
import { date, doi, licence, orcid, webAddress } from '../../../scripts/content/schema/references.ts';

/** The value read, or null where it is refused. */
const read = (schema: z.ZodType, text: string): unknown => {
  const parsed = schema.safeParse(text);
  return parsed.success ? parsed.data : null;
};

describe('identifiers', () => {
  // ISO 7064 MOD 11-2 check digits: the examples of ORCID's own documentation.
  test.each([['0000-0002-1825-0097', true], ['0000-0001-5109-3700', true], ['0000-0002-1694-233X', true], ['0000-0002-1825-0098', false], ['0000-0002-1694-2330', false], ['0000000218250097', false]])('ORCID %s: %s', (text, good) => {
    expect(read(orcid(), text)).toBe(good ? text : null);
  });

  test.each([['10.5555/example.12', '10.5555/example.12'], ['https://doi.org/10.5555/a(1)', '10.5555/a(1)'], ['doi: 10.5555/x', '10.5555/x'], ['10.1/x', null], ['example', null]])('DOI %s', (text, value) => {
    expect(read(doi(), text)).toBe(value);
  });

  test.each([['CC-BY-4.0', true], ['CC0-1.0', true], ['MIT', true], ['CC BY 4.0', false], ['', false], ['(MIT)', false]])('SPDX %s: %s', (text, good) => {
    expect(read(licence(), text)).toBe(good ? text : null);
  });

  test.each([['https://example.org/bands/', true], ['http://localhost:4321/', true], ['example.org', false], ['ftp://example.org', false], ['javascript:alert(1)', false], ['https://example.org/"><script>', false]])('address %s: %s', (text, good) => {
    expect(read(webAddress(), text)).toBe(good ? text : null);
  });
});

describe('dates of the calendar', () => {
  test.each([['2024-02-29', true], ['2023-02-29', false], ['1900-02-29', false], ['2000-02-29', true], ['2024-13-01', false], ['2024-04-31', false], ['2024-4-3', false], ['24-04-03', false], ['0000-01-01', false]])('%s: %s', (text, good) => {
    expect(read(date(), text)).toBe(good ? text : null);
  });
});

test.each([['0', 0], ['-2', -2], ['2-', -2], ['+1', 1], ['3+', 3], ['\u22121', -1], ['-0', 0], ['two', null], ['--2', null], ['1.5', null]])('charge %s is %s', (text, value) => {
  expect(read(charge(), text)).toBe(value);
});

describe('near names', () => {
  test('a swap of neighbours is one slip', () => {
    expect(editDistance('hihg', 'high')).toBe(1);
    expect(editDistance('', 'abc')).toBe(3);
  });

  test('the distance does not depend on the order of the two words', () => {
    for (const [a, b] of [['ammine', 'amine'], ['postion', 'position'], ['kitten', 'sitting']] as const) expect(editDistance(a, b)).toBe(editDistance(b, a));
  });

  test('the nearest comes first, what is far is not offered', () => {
    expect(nearNames('amine', ['aqua', 'ammine', 'en'])).toEqual(['ammine']);
    expect(nearNames('colour', ['formula', 'ion', 'spin'])).toEqual([]);
    expect(nearNames('Spin', ['spin'])).toEqual(['spin']);
  });

  test('lists read as a sentence does', () => {
    expect([orList(['a']), orList(['a', 'b']), orList(['a', 'b', 'c'])]).toEqual(['a', 'a or b', 'a, b or c']);
  });
});
