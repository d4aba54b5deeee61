import { plain } from '#engine';

/** Places of ticks and how they are printed. */
export interface Ticks {
  readonly values: number[];
  readonly text: (value: number) => string;
}

/** About five ticks between two ends, with as many decimals as the step between them needs, all alike. */
export function ticksBetween(low: number, high: number): Ticks {
  const rough = (high - low) / 5;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((factor) => factor * power).find((candidate) => candidate >= rough)!;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const first = Math.ceil(low / step - 1e-9);
  const values = Array.from({ length: Math.floor(high / step + 1e-9) - first + 1 }, (_, index) => (first + index) * step);
  return { values, text: (value) => plain(value, decimals, 'page') };
}
