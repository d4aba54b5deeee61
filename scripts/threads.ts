import { availableParallelism } from 'node:os';

/** More threads than this wait for each other more than they do. */
const most = 8;

/**
 * On how many threads to do `tasks`: one a core where there are at least `worth` of them, else one.
 * BANDSTEAD_THREADS names the number for any count: 1 needs the least memory. The results are the same on any number.
 */
export function threadsFor(tasks: number, worth: number): number {
  const wanted = Number(process.env['BANDSTEAD_THREADS']);
  if (Number.isInteger(wanted) && wanted >= 1) return Math.min(wanted, most, Math.max(1, tasks));
  return tasks < worth ? 1 : Math.min(availableParallelism(), most);
}
