import { isDemonstration } from '../begin/plan.ts';
import { places } from '../places.ts';

/** Tests that speak of the demonstration's own records. */
const aboutDemonstration: readonly string[] = [
  'tests/browser/compare.test.ts', 'tests/scripts/begin/begin.test.ts', 'tests/scripts/compare/compare.test.ts', 'tests/scripts/database/series.test.ts',
  'tests/scripts/export/exports.test.ts', 'tests/site/client/collection/search.test.ts', 'tests/site/client/compareData.test.ts', 'tests/site/data/figureWalk.test.ts',
  'tests/site/data/series.test.ts',
];

/** The tests that cannot run: those of the demonstration, where a group has begun a collection of its own. */
export function testsLeftOut(): readonly string[] {
  return isDemonstration(places.content) ? [] : aboutDemonstration;
}
