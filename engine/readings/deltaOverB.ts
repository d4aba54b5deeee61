import type { FieldParameters } from '../levels/levels.ts';

/** Delta/B of a point, where B is positive. */
export function deltaOverB(at: FieldParameters): number | null {
  return at.racahB > 0 ? at.delta / at.racahB : null;
}
