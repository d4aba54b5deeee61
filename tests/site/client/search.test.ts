import { expect, test } from 'vitest';
import { type CompactCollection, searchEntry } from '../../../site/client/compact.ts';
import { find } from '../../../site/client/find.ts';
import { resultRow } from '../../../site/components/resultRow.ts';
import { orderedResults, resultRowOf } from '../../../site/data/collection.ts';
import { searchData } from '../../../site/data/search.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
// Through JSON, as the page gets it.
const compact = JSON.parse(JSON.stringify(searchData(tree))) as CompactCollection;
const entries = compact.complexes.map((complex) => searchEntry(compact, complex));
const found = (query: string): readonly string[] => find(entries, query).map(({ rows }) => rows[0]!.complex);

test('a row drawn in the page is the row that the build wrote', () => {
  const built = orderedResults(tree).map((measurement) => resultRow(resultRowOf(measurement), 'x').replace(/<title.*?<\/title>/, ''));
  const drawn = entries.flatMap(({ rows }) => rows).map((row) => resultRow(row, 'x').replace(/<title.*?<\/title>/, ''));
  expect(drawn).toEqual(built);
});

test.each([
  ['Cr(NH3)6', 'cr-am6'], ['[Cr(NH3)6]3+', 'cr-am6'], ['[Cr(NH₃)₆]³⁺', 'cr-am6'], ['cr nh3 6', 'cr-am6'], ['[Cr(en)₃]³⁺', 'cr-en3'], ['cr en 3', 'cr-en3'],
  ['hexaamminechromium', 'cr-am6'], ['CoCl4', 'co-cl4'], ['tetrahedral', 'co-cl4'], ['ethylenediamine', 'cr-cl2-en2'], ['cr-am6', 'cr-am6'], ['Ni(II)', 'ni-aq6'], ['nickel', 'ni-aq6'],
])('%s finds %s first', (query, id) => {
  expect(found(query)[0]).toBe(id);
});

test('an exact formula finds that complex alone, an empty query all, nonsense none', () => {
  expect(found('Cr(NH3)6')).toEqual(['cr-am6']);
  expect(found('  ')).toHaveLength(8);
  expect(found('xyzzy')).toEqual([]);
});
