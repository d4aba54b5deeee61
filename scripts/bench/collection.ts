import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { readCollection } from '../content/readCollection.ts';
import type { Collection } from '../content/types.ts';
import { refit } from '../database/refit.ts';
import type { Refit, RefitResult } from '../database/refit.ts';
import { generateCollection } from '../generate/collection.ts';
import { addressOf } from '../publish/address.ts';
import { buildPages, countPages } from '../publish/pages.ts';
import { timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

const seed = 20260105;

/** Writes a generated collection into a folder and reads it back. Throws where the generator's records have faults. */
export async function prepareCollection(folder: string, records: number): Promise<{ readonly collection: Collection; readonly lines: Measured[] }> {
  const content = join(folder, 'content');
  mkdirSync(content, { recursive: true });
  generateCollection(seed, records, content);
  const { value, milliseconds } = await timed(() => readCollection(content));
  if (value.collection === null) {
    const [fault] = value.faults;
    throw new Error(`the generated records have ${value.faults.length} faults, the first: ${fault?.file}:${fault?.line} ${fault?.code} ${fault?.found}`);
  }
  return {
    collection: value.collection,
    lines: [{ name: 'reading records', value: (1000 * value.filesRead) / milliseconds, unit: 'files a second', over: `${value.filesRead} files` }],
  };
}

/** A cold refit, and one where nothing has changed. */
export async function measureRefit(folder: string): Promise<Measured[]> {
  const order = { content: join(folder, 'content'), database: join(folder, 'collection.sqlite'), cache: join(folder, 'readings.sqlite') };
  const cold = await timed(() => refit(order));
  const cached = await timed(() => refit(order));
  const measurements = refitOf(cold.value).measurements;
  const again = refitOf(cached.value).refitted;
  if (again > 0) throw new Error(`${again} measurements were fitted twice: were the engine's sources changed meanwhile?`);
  return [
    { name: 'refit, cold', value: cold.milliseconds / 1000, unit: 's', over: `${measurements} measurements, records to database` },
    { name: 'refit, nothing changed', value: cached.milliseconds / 1000, unit: 's', over: `${measurements} measurements, all from the cache` },
    { name: 'refit, cold against cached', value: cold.milliseconds / cached.milliseconds, unit: 'times', over: 'ratio of the two' },
  ];
}

/** Pages a second, after the refit. */
export async function measurePages(folder: string, collection: Collection): Promise<Measured[]> {
  const out = join(folder, 'site');
  mkdirSync(out);
  const { milliseconds } = await timed(() => buildPages(join(folder, 'collection.sqlite'), addressOf(collection.group.url), out));
  const pages = countPages(out);
  return [{ name: 'pages', value: (1000 * pages) / milliseconds, unit: 'a second', over: `${pages} pages of ${collection.complexes.length} complexes in ${(milliseconds / 1000).toFixed(1)} s` }];
}

function refitOf(result: RefitResult): Refit {
  if (!result.ok) throw new Error(`the generated records have ${result.faults.length} faults`);
  return result.refit;
}
