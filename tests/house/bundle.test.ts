import { join } from 'node:path';
import { createContext, runInContext } from 'node:vm';
import { gzipSync } from 'node:zlib';
import { build } from 'vite';
import { beforeAll, describe, expect, test } from 'vitest';
import * as engine from '#engine';
import { top } from './sources.ts';

/** The engine as a page carries it: one self-contained script, minified, built in memory. */
interface Bundle {
  readonly code: string;
  readonly imports: readonly string[];
  readonly modules: readonly string[];
}

/**
 * What a page may carry of the engine, compressed. No page imports it whole: each carries what it names, so the limits are set on
 * what pages name. The first is the physics and the fit, the second all that reads a measurement with its rivals and words.
 */
const carried = [
  { what: 'levels of an ion', names: ['levels', 'readLabel'], limit: 10_000 },
  { what: 'levels and the fit', names: ['levels', 'fitAssignment'], limit: 25_000 },
  { what: 'a measurement read with rivals, cautions and words', names: ['readWithRivals'], limit: 35_000 },
  { what: 'search of formulas', names: ['formulaKeys', 'normaliseQuery', 'searchScore'], limit: 12_000 },
] as const;
/** A file that is not on the disk: the plugin below answers for it. */
const entry = join(top, 'engine-in-a-page.js');

async function bundle(source: string): Promise<Bundle> {
  const built = await build({
    root: top,
    configFile: false,
    logLevel: 'silent',
    publicDir: false,
    plugins: [{
      name: 'engine-in-a-page',
      enforce: 'pre',
      resolveId: (id) => (id === entry ? entry : null),
      load: (id) => (id === entry ? source : null),
    }],
    build: { write: false, minify: true, target: 'es2022', lib: { entry, name: 'engine', formats: ['iife'] } },
  });
  const outputs = (Array.isArray(built) ? built : [built]).flatMap((one) => ('output' in one ? one.output : []));
  const chunks = outputs.flatMap((output) => (output.type === 'chunk' ? [output] : []));
  expect(chunks).toHaveLength(1);
  const [chunk] = chunks;
  return { code: chunk!.code, imports: [...chunk!.imports, ...chunk!.dynamicImports], modules: Object.keys(chunk!.modules) };
}

const gzipped = (code: string): number => gzipSync(code, { level: 9 }).length;

/** What a bundle holds that a page must not carry. */
function offences({ code, imports, modules }: Bundle): readonly string[] {
  const packages = modules.flatMap((id) => /node_modules\/((?:@[^/]+\/)?[^/]+)/.exec(id)?.[1] ?? []);
  return [
    ...imports.map((name) => `imports ${name}`),
    ...[...new Set(packages)].filter((name) => name === 'zod' || name === 'yaml').map((name) => `carries ${name}`),
    ...[...code.matchAll(/["'`]node:\w+|\bprocess\.\w+|\brequire\(/g)].map(([hit]) => `speaks of ${hit}`),
  ];
}

/** Runs a bundle where there is nothing but the language: no process, no require, no document. */
const runBare = (code: string): unknown => runInContext(`${code};engine`, createContext(Object.create(null) as object));

let page: Bundle;

beforeAll(async () => {
  page = await bundle("export * from '#engine';");
});

describe('the engine bundled for the browser', () => {
  test('carries no schema library, no YAML and nothing of Node', () => {
    expect(offences(page)).toEqual([]);
    expect(page.modules.filter((id) => id.includes('/engine/')).length).toBeGreaterThan(10);
  });

  test.each(carried)('weighs no more than it may: $what', async ({ what, names, limit }) => {
    const size = gzipped((await bundle(`export { ${names.join(', ')} } from '#engine';`)).code);
    console.info(`${what}: ${size} bytes compressed, limit ${limit}; the whole engine ${gzipped(page.code)}`);
    expect(size).toBeLessThanOrEqual(limit);
  });

  test('offers every name that it offers in Node', () => {
    expect(Object.keys(runBare(page.code) as object).toSorted()).toEqual(Object.keys(engine).toSorted());
  });

  test('computes every level of every ion to the same bits as in Node', () => {
    const inPage = runBare(page.code) as typeof engine;
    // Bits are compared through a text of 64-bit patterns, so that -0 and 0 differ and the two worlds' arrays do not matter.
    const written = ({ levels }: Pick<typeof engine, 'levels'>) => {
      const rows: string[] = [];
      for (let electrons = 1; electrons <= 9; electrons++)
        for (const geometry of ['octahedral', 'tetrahedral'] as const)
          for (const [delta, racahB, racahC] of [[17400, 725, 3300], [3120.7, 710.3, 3198.1], [0, 917, 4126.5], [33333.3, 444.4, 1999.9]] as const)
            for (const level of levels({ electrons, geometry }, { delta, racahB, racahC })) {
              const numbers = [level.energy, level.gradient.delta, level.gradient.racahB, level.gradient.racahC, level.eElectrons];
              rows.push([level.label, level.parent, level.degeneracy, ...new BigUint64Array(Float64Array.from(numbers).buffer)].join(' '));
            }
      return rows;
    };
    const [here, there] = [written(engine), written(inPage)];
    expect(here.length).toBeGreaterThan(800);
    expect(there).toEqual(here);
  });

  test('reads labels, finds crossings and prints uncertainties alike', () => {
    const inPage = runBare(page.code) as typeof engine;
    const words = (one: typeof engine) => JSON.stringify([
      one.readLabel('4T1g(F)', { electrons: 7, geometry: 'octahedral', multiplicity: 4, ratio: 4.63 }),
      one.levelNames(5, 'octahedral').map((label) => [one.shownLabel(label, 5), one.parentOf(label, 5, 4.48)]),
      [4, 5, 6, 7].map((electrons) => one.groundCrossings(electrons, 'octahedral', 4.5)),
      one.parseIon('Cr(III)'), one.freeIon('atomic-levels', { name: 'Cr(III)' }), one.concise(21550, 60),
    ]);
    expect(words(inPage)).toBe(words(engine));
  });
});

describe('the check itself', () => {
  test.each([
    ['a Node module', "import { readFileSync } from 'node:fs'; export const x = readFileSync;"],
    ['the process', 'export const x = () => process.platform;'],
    ['the YAML reader', "export { parse as x } from 'yaml';"],
    ['the schema library', "export { object as x } from 'zod';"],
  ])('notices %s', async (_, source) => {
    expect(offences(await bundle(source))).not.toEqual([]);
  });

  test('notices a bundle that is too heavy', async () => {
    expect(gzipped((await bundle("export * from 'zod';")).code)).toBeGreaterThan(Math.max(...carried.map(({ limit }) => limit)));
  });
});
