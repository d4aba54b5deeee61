import { expect, it } from 'vitest';
import { siteReadsRowsOnly } from '../../house/rules.ts';
import { allSources } from '../../house/sources.ts';

/** What pages borrow: dictionary, lists of files, citations, metadata, addresses, the words of changes. */
const borrowed = [
  'columns.ts', 'files.ts', 'paths.ts', 'describe.ts', 'dictionary/parseSchema.ts', 'dictionary/show.ts', 'dictionary/units.ts', 'metadata/publication.ts',
  'metadata/cite.ts', 'metadata/jsonLd.ts', 'metadata/signposting.ts', 'metadata/atom.ts',
].map((name) => `scripts/export/${name}`).concat('scripts/release/words.ts');

it('the site may borrow what it shows of the exports without a database, a schema library or YAML', () => {
  const sources = allSources();
  expect(borrowed.filter((path) => !sources.some((source) => source.path === path))).toEqual([]);
  const page = { path: 'site/data/borrowing.ts', text: borrowed.map((path) => `import '../../${path}';`).join('\n') };
  expect(siteReadsRowsOnly([...sources.filter(({ path }) => path.startsWith('scripts/')), page])).toEqual([]);
  const careless = { ...page, text: "import '../../scripts/export/results.ts';" };
  expect(siteReadsRowsOnly([...sources.filter(({ path }) => path.startsWith('scripts/')), careless])).toEqual(['scripts/export/results.ts imports better-sqlite3']);
});
