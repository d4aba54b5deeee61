import { freeIon, readWithRivals } from '#engine';
import type { Collection } from '../content/types.ts';
import { readAll } from '../database/readAll.ts';
import type { ReadingTask } from '../database/readOne.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

export function tasksOf({ complexes }: Collection): ReadingTask[] {
  return complexes.flatMap((complex) => complex.measurements.map(({ id, engine, policy }) => ({ id: `${complex.id}/${id}`, measurement: engine, policy })));
}

/** The record of a collection that takes longest to read, with its rivals: the middle of five times, once all is warm. */
export async function measureSlowest(collection: Collection): Promise<Measured[]> {
  const tasks = tasksOf(collection);
  if (tasks.length === 0) return [];
  const read = ({ measurement, policy }: ReadingTask): void => { readWithRivals(measurement, policy, freeIon(policy.freeIons, measurement.ion)); };
  tasks.forEach(read);
  const times: { readonly id: string; readonly milliseconds: number }[] = [];
  // One after the other: what waits for another record would count its time too.
  for (const task of tasks) {
    const passes: number[] = [];
    while (passes.length < 5) passes.push((await timed(() => read(task))).milliseconds);
    times.push({ id: task.id, milliseconds: median(passes) });
  }
  const [slowest] = times.sort((a, b) => b.milliseconds - a.milliseconds);
  return [
    { name: 'slowest record', value: slowest!.milliseconds, unit: 'ms', over: `${slowest!.id}, of ${times.length} measurements of the content folder` },
    { name: 'middle record', value: median(times.map(({ milliseconds }) => milliseconds)), unit: 'ms', over: 'of the same measurements' },
  ];
}

/** Reading many measurements with rivals on the threads of this machine, from a standing start. */
export async function measureThreads(collection: Collection, count: number): Promise<Measured[]> {
  const tasks = tasksOf(collection).slice(0, count);
  const { milliseconds } = await timed(() => readAll(tasks));
  return [{ name: 'readings on threads', value: milliseconds / 1000, unit: 's', over: `${tasks.length} generated measurements with rivals, start of the threads and level tables included` }];
}
