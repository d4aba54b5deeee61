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

/** One measured line of the bench. */
export interface Measured {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  /** What the number was taken over. */
  readonly over: string;
}
