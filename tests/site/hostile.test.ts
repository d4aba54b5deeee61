import { parseHTML } from 'linkedom';
import { expect, test } from 'vitest';
import { packRow, unpackRow } from '../../site/client/collection/rowSlice.ts';
import { partsMarkup, resultRow } from '../../site/components/resultRow.ts';
import { orderedResults, resultRowOf } from '../../site/data/collection.ts';
import { complexPage } from '../../site/data/complex.ts';
import { ionPage } from '../../site/data/ion.ts';
import { sampleTree } from './sample.ts';

const HOSTILE = '"><img src=x onerror=alert(1)><script>alert(2)</script>';
const tree = sampleTree({ hostile: HOSTILE });

/** What a browser would make of markup: no element but those the site writes. */
function elements(markup: string): readonly string[] {
  const { document } = parseHTML(`<!doctype html><html><body><table><tbody>${markup}</tbody></table></body></html>`);
  return [...document.querySelectorAll('img, script, [onerror]')].map((element) => element.tagName);
}

test('hostile text in records stays text in rows drawn at build and in the page', () => {
  const built = orderedResults(tree).map(resultRowOf);
  const inPage = built.map((row) => unpackRow(JSON.parse(JSON.stringify(packRow(row))), row));
  const rows = [...built, ...inPage];
  expect(rows.some((row) => row.conditions.includes('<script>'))).toBe(true);
  for (const row of rows) expect(elements(resultRow(row, 'x'))).toEqual([]);
});

test('hostile text stays text in figures and typeset parts', () => {
  for (const complex of tree.complexes) {
    const page = complexPage(tree, complex);
    for (const { read, meaning, sure } of page.measurements) {
      expect(elements(read.strip!.svg)).toEqual([]);
      expect(elements(partsMarkup(sure.reason))).toEqual([]);
      if (meaning.scheme) expect(elements(meaning.scheme.svg)).toEqual([]);
    }
  }
  for (const { name } of tree.ions) for (const { svg } of ionPage(tree, name).diagrams) expect(elements(svg)).toEqual([]);
});
