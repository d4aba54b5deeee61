/** Milliseconds that a piece of work takes. */
export async function timed<T>(work: () => T | Promise<T>): Promise<{ readonly value: T; readonly milliseconds: number }> {
  const started = performance.now();
  const value = await work();
  return { value, milliseconds: performance.now() - started };
}

/** The middle one of some numbers. Throws RangeError where there is none. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)];
  if (middle === undefined) throw new RangeError('median of no values');
  return middle;
}

/** The middle time of three passes after one to warm up, in milliseconds. */
export async function middleTime(work: () => void): Promise<number> {
  work();
  const passes: number[] = [];
  while (passes.length < 3) passes.push((await timed(work)).milliseconds);
  return median(passes);
}

/** One measured line of the bench. */
export interface Measured {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  /** What the number was taken over. */
  readonly over: string;
}
