import { fitFactors, memberPlacements, placeResult, placingGround } from '#engine';
import type { ComplexIdentity, SeriesNumber, SeriesResult } from '#engine';
import { ligandEntries } from '../generate/ligands.ts';
import { ionNamed, metalEntries } from '../generate/metalIons.ts';
import { randomFrom } from '../generate/random.ts';
import { multiplicityOf } from '../generate/truth.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

const policy = { id: 'bench-00000000', differentialFloor: { delta: 50, racahB: 0.015 } };

/** Factor fits, predictions of every complex without its own data, and placing, over invented results of two sizes. */
export async function measureSeries(): Promise<Measured[]> {
  const lines: Measured[] = [];
  for (const count of [1000, 10_000]) {
    const results = inventedResults(count);
    const order = { parameter: 'Delta', geometry: 'octahedral', policy: policy.id, aqua: 'aqua' } as const;
    const times = [];
    for (let i = 0; i < 3; i += 1) times.push((await timed(() => fitFactors(results, order))).milliseconds);
    const fit = fitFactors(results, order);
    const unknowns = fit.islands.reduce((sum, island) => sum + island.solution.names.length, 0);
    lines.push({ name: `factors of ${count}`, value: median(times), unit: 'ms', over: `${fit.complexes.length} complexes, ${unknowns} unknowns: scatter, rank, uncertainties, every complex left out once` });
    lines.push({ name: `predictions of ${count}`, value: (await timed(() => memberPlacements(results, fit))).milliseconds, unit: 'ms', over: 'average environment and factors for every measurement' });
  }
  const results = inventedResults(1000);
  const own = results[17]!;
  const collection = { policy, aqua: 'aqua', results };
  const ground = await timed(() => placingGround(collection, own.complex, [`${own.complex.id}/${own.measurement}`]));
  const place = [];
  for (let i = 0; i < 21; i += 1) place.push((await timed(() => placeResult(ground.value, own))).milliseconds);
  lines.push({ name: 'placing, once a complex', value: ground.milliseconds, unit: 'ms', over: 'against 1000 complexes: factors without its own data' });
  lines.push({ name: 'placing, each time', value: median(place), unit: 'ms', over: 'against 1000 complexes: series, predictions, nearest, cautions' });
  return lines;
}

/** Results with one and two kinds of ligand on every ion of the generator, in a fixed random order of amounts. */
function inventedResults(count: number): readonly SeriesResult[] {
  const random = randomFrom(1, 'bench series');
  const monodentate = ligandEntries.filter(({ donors }) => donors.length === 1);
  return Array.from({ length: count }, (_, i): SeriesResult => {
    const metal = metalEntries[i % metalEntries.length]!;
    const [a, b] = [monodentate[Math.floor(i / metalEntries.length) % monodentate.length]!, random.pick(monodentate)];
    const many = a === b ? 6 : random.whole(1, 6);
    const ligands = [{ ligand: a.id, count: many, bound: 1 }, ...(many === 6 ? [] : [{ ligand: b.id, count: 6 - many, bound: 1 }])];
    const [f, h] = [(many * a.f + (6 - many) * b.f) / 6, (many * a.h + (6 - many) * b.h) / 6];
    const ion = ionNamed(metal.ion);
    const complex: ComplexIdentity = {
      id: `invented-${i}`, formula: `[${metal.ion}]`, ion, geometry: 'octahedral', geometryName: 'octahedral',
      // Isomers by number keep every complex one of its own.
      multiplicity: multiplicityOf(metal), isomer: String(i), ligands,
    };
    const number = (value: number, u: number): SeriesNumber => ({ value, u: u / 3, uTotal: u, standing: 'fitted', reason: null });
    const beta = 1 - metal.k * h + random.normal(0, 0.03);
    return {
      complex, measurement: 'solution-295', phase: 'solution', temperature: 295, policy: policy.id, verdict: 'untested',
      parameters: { Delta: number(metal.g * f * Math.exp(random.normal(0, 0.03)), 160), B: number(900 * beta, 27), C: number(3500, 100), beta: number(beta, 0.03) },
      correlation: -0.6, transitions: ['a4T1g', 'a4T2g'], cautions: [],
    };
  });
}
