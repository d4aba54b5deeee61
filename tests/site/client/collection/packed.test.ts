import { gzipSync } from 'node:zlib';
import { beforeAll, describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { digits, ofDigits, ofSignedDigits, signedDigits } from '../../../../site/client/collection/digits.ts';
import { type PackedSearch, bandUnit, deltaUnit, unpackSearch } from '../../../../site/client/collection/packed.ts';
import { type PackedRow, SLICE_ROWS, unpackRow } from '../../../../site/client/collection/rowSlice.ts';
import { resultRow } from '../../../../site/components/resultRow.ts';
import { orderedResults, resultRowOf } from '../../../../site/data/collection.ts';
import { readRows } from '../../../../site/data/database.ts';
import { rowSlice, rowSlices } from '../../../../site/data/rowSlices.ts';
import { searchData, spinText } from '../../../../site/data/search.ts';
import { type CollectionTree, collectionTree } from '../../../../site/data/tree.ts';
import { refittedDemonstration } from '../../demonstration.ts';

let tree: CollectionTree;
beforeAll(async () => {
  tree = collectionTree(readRows(await refittedDemonstration()));
});

// Through JSON, as the page gets it.
const throughJson = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;

test('what search reads is what the database holds, to the steps in which it is told', () => {
  const { complexes, rows } = unpackSearch(throughJson<PackedSearch>(searchData(tree)));
  const results = orderedResults(tree);
  expect(rows.length).toBe(results.length);
  results.forEach(({ row, complex, chosen, bands }, place) => {
    const found = rows[place]!;
    const of = complexes[found.complex]!;
    const where = `${complex.row.id}/${row.id}`;
    expect(`${of.id}/${found.measurement}`).toBe(where);
    expect([of.formula, of.isomer, of.ion.name, of.geometry, of.spin, found.phase, found.medium, found.verdict, found.cFitted], where)
      .toEqual([complex.row.formula, complex.row.isomer, complex.ion.name, complex.row.geometry, spinText(complex.row, complex.ion.electrons), row.phase, row.medium ?? row.host ?? '', chosen.row.verdict, chosen.parameters.C.standing === 'fitted']);
    const { Delta, B, beta } = chosen.parameters;
    for (const [told, value, step] of [[found.delta, Delta.value, deltaUnit], [found.racahB, B.value, 1], [found.beta, beta.value, 0.002]] as const) {
      expect(told === null, where).toBe(value === null);
      if (told !== null && value !== null) expect(Math.abs(told - value), where).toBeLessThanOrEqual(step / 2 + 1e-9);
    }
    expect(found.bands.length, where).toBe(bands.length);
    found.bands.forEach((band, index) => expect(Math.abs(band - bands[index]!.position), where).toBeLessThanOrEqual(bandUnit / 2));
  });
});

test('a row drawn in the page is the row that the build wrote, byte for byte', () => {
  const { complexes, rows } = unpackSearch(throughJson<PackedSearch>(searchData(tree)));
  const slices = rowSlices(tree).map((number) => throughJson<readonly PackedRow[]>(rowSlice(tree, number)));
  expect(slices.flat().length).toBe(rows.length);
  orderedResults(tree).forEach((measurement, place) => {
    const built = resultRowOf(measurement);
    const { measurement: id, verdict, complex } = rows[place]!;
    const drawn = unpackRow(slices[Math.floor(place / SLICE_ROWS)]![place % SLICE_ROWS]!, { complex: complexes[complex]!.id, measurement: id, ion: complexes[complex]!.ion.name, verdict, formula: built.formula });
    // The built strip holds positions in full; the page draws whole wavenumbers, a hundredth of a pixel apart at most.
    const rounded = (html: string): string => html.replace(/\d+\.\d+/g, (number) => Number(number).toFixed(1)).replaceAll('.0"', '"').replace(/(\d)\.0\b/g, '$1');
    const [one, other] = [rounded(resultRow(built, 'x')), rounded(resultRow(drawn, 'x'))];
    const numbers = (html: string): readonly number[] => [...html.matchAll(/\d+(?:\.\d+)?/g)].map(([number]) => Number(number));
    expect(other.replace(/\d+(\.\d+)?/g, '#')).toBe(one.replace(/\d+(\.\d+)?/g, '#'));
    numbers(other).forEach((number, index) => expect(Math.abs(number - numbers(one)[index]!)).toBeLessThanOrEqual(0.11));
  });
});

describe('columns of digits', () => {
  test('come back as they went', () => {
    fc.assert(fc.property(fc.array(fc.nat(10_000_000)), (numbers) => { expect(ofDigits(throughJson(digits(numbers)))).toEqual(numbers); }));
    fc.assert(fc.property(fc.array(fc.integer({ min: -1_000_000, max: 1_000_000 })), (numbers) => { expect(ofSignedDigits(throughJson(signedDigits(numbers)))).toEqual(numbers); }));
  });

  test('refuse what is not whole or below 0', () => {
    expect(() => digits([1.5])).toThrow(RangeError);
    expect(() => digits([-1])).toThrow(RangeError);
  });

  test('are smaller than numbers', () => {
    const numbers = Array.from({ length: 5000 }, (_, place) => (place * 7919) % 1009);
    expect(gzipSync(JSON.stringify(digits(numbers))).length).toBeLessThan(gzipSync(JSON.stringify(numbers)).length);
  });
});
