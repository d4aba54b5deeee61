import { freeIon, readWithRivals } from '#engine';
import type { Collection, MeasurementRecord } from '../content/types.ts';
import { complexFits } from '../database/complexFits.ts';
import { loadedEngineHash } from '../database/fingerprint.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

interface NamedMeasurement extends Pick<MeasurementRecord, 'engine' | 'policy'> {
  /** Full id. */
  readonly id: string;
}

export function measurementsOf({ complexes }: Collection): NamedMeasurement[] {
  return complexes.flatMap((complex) => complex.measurements.map(({ id, engine, policy }) => ({ id: `${complex.id}/${id}`, engine, policy })));
}

export function readOne({ engine, policy }: NamedMeasurement): void {
  readWithRivals(engine, policy, freeIon(policy.freeIons, engine.ion));
}

/** The record of a collection that takes longest to read, with its rivals: the middle of five times, once all is warm. */
export async function measureSlowest(collection: Collection): Promise<Measured[]> {
  const tasks = measurementsOf(collection);
  if (tasks.length === 0) return [];
  tasks.forEach(readOne);
  const times: { readonly id: string; readonly milliseconds: number }[] = [];
  // One after the other: what waits for another record would count its time too.
  for (const task of tasks) {
    const passes: number[] = [];
    while (passes.length < 5) passes.push((await timed(() => readOne(task))).milliseconds);
    times.push({ id: task.id, milliseconds: median(passes) });
  }
  const [slowest] = times.sort((a, b) => b.milliseconds - a.milliseconds);
  return [
    { name: 'slowest record', value: slowest!.milliseconds, unit: 'ms', over: `${slowest!.id}, of ${times.length} measurements of the content folder` },
    { name: 'middle record', value: median(times.map(({ milliseconds }) => milliseconds)), unit: 'ms', over: 'of the same measurements' },
  ];
}

/** Reading many measurements with rivals on the threads of this machine, from a standing start, with the rows of their complexes. */
export async function measureThreads(collection: Collection): Promise<Measured[]> {
  const { complexes } = collection;
  const { value, milliseconds } = await timed(() => {
    const fits = complexFits({ basis: collection, engine: loadedEngineHash(), cache: null, expected: complexes.length, progress: undefined, take: () => undefined });
    try {
      for (const complex of complexes) fits.add(complex);
      return fits.finish([]);
    } finally {
      fits.close();
    }
  });
  return [{ name: 'readings on threads', value: milliseconds / 1000, unit: 's', over: `${value} generated measurements with rivals, start of the threads, level tables and rows included` }];
}
