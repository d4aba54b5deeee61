import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { refit } from '../../../scripts/database/refit.ts';
import { generateCollection, generatedFiles } from '../../../scripts/generate/collection.ts';
import { randomFrom } from '../../../scripts/generate/random.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';

const seed = 77;
const place = temporaryFolder();
const content = join(place.path, 'content');
afterAll(() => place.remove());

/** Complexes that the collection starts with; the others of the generator's list are added later. */
const atFirst = 10;
const spare = generatedFiles(seed, 22).filter(({ path }) => path.startsWith('complexes/')).slice(atFirst);

const file = (path: string): string => join(content, path);
const text = (path: string): string => readFileSync(file(path), 'utf8');
const complexes = () => readCollection(content).collection!.complexes;
const measurements = (): number => complexes().reduce((sum, complex) => sum + complex.measurements.length, 0);

/** Each changes the content and says how many measurements must be fitted anew because of it. */
const changes: readonly ((random: ReturnType<typeof randomFrom>) => number)[] = [
  // One band of one measurement.
  (random) => {
    const { file: path } = random.pick(complexes());
    const bands = [...text(path).matchAll(/position: (\d+)/g)];
    const band = random.pick(bands);
    const moved = Number(band[1]) + random.whole(1, 9);
    writeFileSync(file(path), `${text(path).slice(0, band.index)}position: ${moved}${text(path).slice(band.index + band[0].length)}`);
    return 1;
  },
  // What no fit hangs on.
  (random) => {
    const { file: path } = random.pick(complexes());
    writeFileSync(file(path), `${text(path).replace(/\nnotes: .*\n?$/, '\n')}notes: Note ${random.whole(1, 1e6)}\n`);
    return 0;
  },
  // A record less.
  (random) => {
    const all = complexes();
    if (all.length > 4) rmSync(file(random.pick(all).file));
    return 0;
  },
  // A record more.
  () => {
    const more = spare.pop();
    if (more === undefined) return 0;
    writeFileSync(file(more.path), more.text);
    return complexes().find((complex) => complex.file === more.path)!.measurements.length;
  },
  // Another policy: everything.
  (random) => {
    writeFileSync(file('policy.yaml'), `name: house\nC/B: 4.${random.whole(100, 999)}(50)\nrival-margin: ${random.whole(2, 6)}\n`);
    return measurements();
  },
];

it('after any change fits anew what hangs on it alone, and writes the bytes of a cold run', { timeout: 120_000 }, () => {
  generateCollection(seed, atFirst, content);
  const [database, cold, cache] = [join(place.path, 'a.sqlite'), join(place.path, 'cold.sqlite'), join(place.path, 'cache.sqlite')];
  const run = (target: string, kept: string | null): number => {
    const result = refit({ content, database: target, cache: kept });
    if (!result.ok) throw new Error(JSON.stringify(result.faults));
    return result.refit.refitted;
  };
  expect(run(database, cache)).toBe(measurements());
  const random = randomFrom(seed, 'changes');
  // Every kind of change comes, some of them several at a time.
  const steps = [[0], [1], [2], [3], [4], ...Array.from({ length: 4 }, () => Array.from({ length: random.whole(1, 3) }, () => random.whole(0, 3)))];
  let before = readFileSync(database);
  for (const step of steps) {
    const most = step.map((kind) => changes[kind]!(random)).reduce((sum, count) => sum + count, 0);
    const fitted = run(database, cache);
    if (step.length === 1) expect([step, fitted]).toEqual([step, most]);
    else expect(fitted).toBeLessThanOrEqual(most);
    run(cold, null);
    const bytes = readFileSync(database);
    expect([step, bytes.equals(readFileSync(cold))]).toEqual([step, true]);
    expect([step, bytes.equals(before)]).toEqual([step, false]);
    before = bytes;
  }
});
