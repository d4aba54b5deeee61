import { mkdirSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { generateCollection } from '../generate/collection.ts';
import { buildBarePages } from './bare.ts';
import { runWatched } from './process.ts';
import type { Ran } from './process.ts';
import type { Measured } from './stopwatch.ts';

const seed = 20260105;

/** The commands as a group runs them, each in a process of its own, over generated collections: time, memory, and what they write. */
export async function measureScale(folder: string, complexes: number, pages: boolean, say: (lines: readonly Measured[]) => void): Promise<void> {
  const smaller = Math.max(1, Math.round(complexes / 10));
  const few = await measureRefits(prepare(folder, smaller), smaller, say);
  const place = prepare(folder, complexes);
  const many = await measureRefits(place, complexes, say);
  const growth = (name: 'cold' | 'changed'): number => Math.log(many[name].seconds / few[name].seconds) / Math.log(complexes / smaller);
  say([
    { name: 'growth of the cold refit', value: growth('cold'), unit: 'exponent', over: `from ${smaller} to ${complexes} complexes` },
    { name: 'growth, one changed', value: growth('changed'), unit: 'exponent', over: `from ${smaller} to ${complexes} complexes` },
  ]);
  if (pages) await measureBuild(place, complexes, say);
}

interface Place {
  readonly content: string;
  readonly database: string;
  readonly site: string;
  readonly environment: Readonly<Record<string, string>>;
}

function prepare(folder: string, complexes: number): Place {
  const own = join(folder, String(complexes));
  const place = { content: join(own, 'content'), database: join(own, 'collection.sqlite'), site: join(own, 'site'), environment: { BANDSTEAD_CACHE: join(own, 'cache') } };
  mkdirSync(place.content, { recursive: true });
  generateCollection(seed, complexes, place.content);
  return place;
}

async function measureRefits(place: Place, complexes: number, say: (lines: readonly Measured[]) => void): Promise<{ readonly cold: Ran; readonly changed: Ran }> {
  const over = `${complexes} complexes`;
  const cold = await command('refit', place);
  say([...taken('refit, cold', cold, over), { name: 'database', value: statSync(place.database).size / 1e6, unit: 'MB', over }]);
  const unchanged = await command('refit', place);
  say(taken('refit, nothing changed', unchanged, over));
  changeOne(place.content);
  const changed = await command('refit', place);
  say(taken('refit, one record changed', changed, over));
  return { cold, changed };
}

/** From content to site as on a machine that has never seen the collection, and the page builder alone with as many plain pages. */
async function measureBuild(place: Place, complexes: number, say: (lines: readonly Measured[]) => void): Promise<void> {
  const built = await command('build', place, ['--cold', '--out', place.site]);
  const facts = JSON.parse(built.said) as { pages: number; stages: Readonly<Record<string, number>> };
  const over = `${facts.pages} pages of ${complexes} complexes`;
  const files = filesOf(place.site);
  say([
    ...taken('build, cold', built, `content to site, ${over}`),
    ...Object.entries(facts.stages).map(([name, value]) => ({ name: `of it ${name}`, value, unit: 's', over })),
    { name: 'size of the site', value: files.bytes / 1e6, unit: 'MB', over },
    { name: 'files of the site', value: files.count, unit: 'files', over },
  ]);
  const bare = await buildBarePages(facts.pages);
  say([
    ...taken('bare page builder', bare, `${facts.pages} pages with a table each`),
    { name: 'build against bare', value: built.seconds / bare.seconds, unit: 'times', over: 'content to site, cold, against the bare pages' },
    { name: 'pages against bare', value: facts.stages['pages']! / bare.seconds, unit: 'times', over: 'the pages alone' },
  ]);
}

function command(name: string, { content, database, environment }: Place, more: readonly string[] = []): Promise<Ran> {
  return runWatched([join('scripts', 'require-node.mjs'), join('scripts', `${name}.ts`), '--content', content, '--database', database, '--json', ...more], environment);
}

/** Types another position for the first band of the first complex. */
export function changeOne(content: string): void {
  const name = readdirSync(join(content, 'complexes')).sort()[0]!;
  const file = join(content, 'complexes', name);
  const old = readFileSync(file, 'utf8');
  const changed = old.replace(/position: (\d+)/, (_, position: string) => `position: ${Number(position) + 10}`);
  if (changed === old) throw new Error(`${name} has no position to change`);
  writeFileSync(file, changed);
}

function taken(name: string, { seconds, memory }: Ran, over: string): Measured[] {
  return [
    { name, value: seconds, unit: 's', over },
    ...(memory === null ? [] : [{ name: `${name}, memory`, value: memory / 1e6, unit: 'MB', over: 'most that all its processes held at once' }]),
  ];
}

function filesOf(folder: string): { readonly count: number; readonly bytes: number } {
  const sizes = readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).map(({ parentPath, name }) => statSync(join(parentPath, name)).size);
  return { count: sizes.length, bytes: sizes.reduce((sum, size) => sum + size, 0) };
}
