import { describe, expect, test } from 'vitest';
import { type Column, isEmpty, stateOf, toggled, withColumn, withState } from '../../../../site/client/collection/address.ts';
import { facetsOf, filtered } from '../../../../site/client/collection/facets.ts';
import { csvOf, csvRecords, jsonOf } from '../../../../site/client/collection/files.ts';
import { SORT_KEYS, nextSorting, ordered } from '../../../../site/client/collection/order.ts';
import { unpackSearch } from '../../../../site/client/collection/packed.ts';
import { searchData } from '../../../../site/data/search.ts';
import { sampleTree } from '../../sample.ts';

const collection = unpackSearch(searchData(sampleTree()));
const all = collection.rows.map(({ place }) => place);
const ids = (rows: readonly number[]): readonly string[] => rows.map((row) => collection.complexes[collection.rows[row]!.complex]!.id);

describe('sorting', () => {
  test.each(SORT_KEYS)('by %s is by value, missing last either way, and loses no row', (key) => {
    const up = ordered(collection, all, { key, descending: false });
    const down = ordered(collection, all, { key, descending: true });
    expect([...up].sort()).toEqual([...all].sort());
    if (key === 'complex' || key === 'verdict') return;
    const value = (row: number): number | null => collection.rows[row]![key === 'Delta' ? 'delta' : key === 'B' ? 'racahB' : 'beta'];
    const present = all.filter((row) => value(row) !== null).length;
    for (const [rows, sign] of [[up, 1], [down, -1]] as const) {
      const values = rows.map(value);
      expect(values.slice(present).every((one) => one === null)).toBe(true);
      for (let place = 1; place < present; place += 1) expect(sign * (values[place]! - values[place - 1]!)).toBeGreaterThanOrEqual(0);
    }
    expect(present).toBeLessThan(key === 'Delta' ? all.length + 1 : all.length);
  });

  test('ties keep the order of the book', () => {
    const up = ordered(collection, all, { key: 'verdict', descending: false });
    for (let place = 1; place < up.length; place += 1) if (collection.rows[up[place]!]!.verdict === collection.rows[up[place - 1]!]!.verdict) expect(up[place]!).toBeGreaterThan(up[place - 1]!);
  });

  test('a head turns up, down and off', () => {
    expect(nextSorting(null, 'B')).toEqual({ key: 'B', descending: false });
    expect(nextSorting({ key: 'B', descending: false }, 'B')).toEqual({ key: 'B', descending: true });
    expect(nextSorting({ key: 'B', descending: true }, 'B')).toBeNull();
    expect(nextSorting({ key: 'B', descending: true }, 'Delta')).toEqual({ key: 'Delta', descending: false });
  });
});

describe('facets', () => {
  const facets = facetsOf(collection);
  const none = new Map<string, ReadonlySet<string>>();

  test('count every row once for each of its values', () => {
    const { rows, counts } = filtered(facets, none, all);
    expect(rows).toEqual(all);
    facets.forEach(({ name, ofRow }, place) => expect(counts[place]!.reduce((sum, count) => sum + count, 0), name).toBe(ofRow.flat().length));
  });

  test('a value’s count is the number of rows that choosing it leaves', () => {
    const chosen = new Map([['ion', new Set(['Cr(III)'])]]);
    const { counts } = filtered(facets, chosen, all);
    facets.forEach(({ name, values }, place) => values.forEach((value, index) => {
      const own = name === 'ion' ? new Map([['ion', new Set([value])]]) : new Map([...chosen, [name, new Set([value])]]);
      expect(counts[place]![index], `${name} ${value}`).toBe(filtered(facets, own, all).rows.length);
    }));
  });

  test('terms observed are those of the chosen readings, as printed', () => {
    const terms = facets.find(({ name }) => name === 'term')!;
    expect(terms.values).toEqual(expect.arrayContaining(['4T2g', '3T2g', '2Eg']));
    expect(new Set(ids(filtered(facets, new Map([['term', new Set(['4T1'])]]), all).rows))).toEqual(new Set());
    expect(new Set(ids(filtered(facets, new Map([['term', new Set(['a4T1'])]]), all).rows))).toEqual(new Set(['co-cl4']));
  });

  test('two values of one facet widen, two facets narrow', () => {
    expect(new Set(ids(filtered(facets, new Map([['ion', new Set(['Ni(II)', 'Co(II)'])]]), all).rows))).toEqual(new Set(['ni-aq6', 'ni-am6', 'co-cl4']));
    expect(new Set(ids(filtered(facets, new Map([['ion', new Set(['Ni(II)', 'Co(II)'])], ['geometry', new Set(['tetrahedral'])]]), all).rows))).toEqual(new Set(['co-cl4']));
    expect(filtered(facets, new Map([['ion', new Set(['Xx(I)'])]]), all).rows).toEqual([]);
  });
});

test('the whole state goes into the address and comes back, and leaves other parameters alone', () => {
  const names = ['ion', 'ligand'];
  const state = { query: 'Cr(NH3)6 & "x"', sorting: { key: 'Delta', descending: true }, chosen: new Map([['ion', new Set(['Cr(III)', 'Co(III)'])], ['ligand', new Set(["2,2'-bipyridine"])]]), hidden: new Set<Column>(['Delta', 'verdict']) } as const;
  const query = withState(new URLSearchParams('other=1'), state, names);
  expect(query.get('other')).toBe('1');
  expect(stateOf(new URLSearchParams(query.toString()), names)).toEqual(state);
  expect(isEmpty(stateOf(new URLSearchParams('sort=nonsense'), names))).toBe(true);
  const off = toggled(toggled(state, 'ion', 'Cr(III)'), 'ion', 'Co(III)');
  expect([...off.chosen.keys()]).toEqual(['ligand']);
  expect([...withColumn(withColumn(state, 'Delta'), 'bands').hidden].sort()).toEqual(['bands', 'verdict']);
  expect(isEmpty(stateOf(new URLSearchParams('without=beta&without=nonsense'), names))).toBe(true);
});

describe('the rows shown as a file', () => {
  const csv = 'complex,measurement,reason\r\ncr-am6,aq-295,"a, ""b""\nsecond line"\r\nni-aq6,aq-295,x\r\n';

  test('CSV keeps the heading and whole records, line breaks within quotes too', () => {
    expect(csvRecords(csv)).toHaveLength(3);
    expect(csvOf(csv, new Set(['cr-am6/aq-295']))).toBe('complex,measurement,reason\r\ncr-am6,aq-295,"a, ""b""\nsecond line"\r\n');
  });

  test('JSON keeps all but the rows not wanted', () => {
    const whole = JSON.stringify({ title: 'x', results: [{ complex: 'a', measurement: 'm', B: null }, { complex: 'b', measurement: 'm' }] });
    expect(JSON.parse(jsonOf(whole, new Set(['a/m'])))).toEqual({ title: 'x', results: [{ complex: 'a', measurement: 'm', B: null }] });
  });
});
