import { evaluatorOf } from './evaluate.ts';
import { angleScale, levelTable } from './table.ts';
import type { GroundCase } from './transitions.ts';

/** Delta/B up to which a field is looked for; it holds every complex known. */
const strongestField = 80;

/**
 * Every Delta at which a transition lies at a given position, with B and C/B given, ascending.
 *
 * Roots are bracketed on the level table and refined by Newton steps on exact levels, to 1e-12 of Delta.
 *
 * @param position cm-1
 */
export function fieldsForPosition(ion: GroundCase, ground: string, label: string, position: number, racahB: number, ratio: number): number[] {
  const table = levelTable(ion, ratio);
  const { energy } = table.transition(ground, label);
  const lastPoint = Math.ceil(Math.atan(strongestField / angleScale) / table.step);
  const { evaluate, energy: exact, delta: slope } = evaluatorOf(ion, ground, [label]);
  const roots: number[] = [];
  for (let i = 0, before = racahB * energy[0]! - position; i < lastPoint; i++) {
    const after = (racahB * energy[i + 1]!) / Math.cos((i + 1) * table.step) - position;
    if (before < 0 !== after < 0) roots.push(refined(i, before, after));
    before = after;
  }
  return roots;

  /** The root between two grid points at which the transition misses the position by `before` and `after`. */
  function refined(i: number, before: number, after: number): number {
    let low = angleScale * racahB * Math.tan(i * table.step);
    let high = angleScale * racahB * Math.tan((i + 1) * table.step);
    let delta = low + ((high - low) * before) / (before - after);
    for (let step = 0; step < 60; step++) {
      evaluate(delta, racahB, ratio * racahB);
      const miss = exact[0]! - position;
      if (miss < 0 === before < 0) low = delta;
      else high = delta;
      const newton = delta - miss / slope[0]!;
      const next = newton >= low && newton <= high ? newton : (low + high) / 2;
      if (Math.abs(next - delta) <= 1e-12 * delta) return next;
      delta = next;
    }
    return delta;
  }
}
