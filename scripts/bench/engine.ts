import { freeIon, levels, readMeasurement } from '#engine';
import type { Collection, MeasurementRecord } from '../content/types.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

/**
 * What deriving the symmetry blocks of each d^n costs: the first call of `levels` less a later one. It must run before anything
 * else has asked for levels in this process.
 */
export async function measureBlocks(): Promise<Measured[]> {
  const lines: Measured[] = [];
  for (let electrons = 1; electrons <= 9; electrons += 1) {
    const call = () => timed(() => levels({ electrons, geometry: 'octahedral' }, { delta: 15000, racahB: 800, racahC: 3600 }));
    const first = (await call()).milliseconds;
    const later = median([(await call()).milliseconds, (await call()).milliseconds, (await call()).milliseconds]);
    lines.push({ name: `blocks of d${electrons}`, value: Math.max(0, first - later), unit: 'ms', over: 'first call of levels less a later one' });
  }
  return lines;
}

/** Complete readings a second on one core, once the level tables stand, and what the tables cost. */
export async function measureReadings(collection: Collection): Promise<Measured[]> {
  const records = collection.complexes.flatMap(({ measurements }) => measurements);
  if (records.length === 0) return [];
  const read = ({ engine, policy }: MeasurementRecord) => readMeasurement(engine, policy, freeIon(policy.freeIons, engine.ion));
  const first = await timed(() => records.forEach(read));
  // Enough passes for two seconds or so, so that the rate is not that of a cold compiler.
  const passes: number[] = [];
  while (passes.length < 3 || (passes.reduce((a, b) => a + b) < 2000 && passes.length < 50)) passes.push((await timed(() => records.forEach(read))).milliseconds);
  const pass = median(passes);
  const cases = new Set(records.map(({ engine }) => `${engine.ion.electrons} ${engine.geometry} ${engine.multiplicity}`)).size;
  return [
    { name: 'readings', value: (1000 * records.length) / pass, unit: 'a second', over: `${records.length} measurements of ${cases} kinds of ion: assignment, all branches, covariance, predictions, cautions, words` },
    { name: 'level tables', value: Math.max(0, first.milliseconds - pass) / cases, unit: 'ms each', over: `first pass less a later one, over ${cases} kinds of ion; the compiler's warming up is in it` },
  ];
}
