import { transitionsAt } from './evaluate.ts';
import { levelTable, pointOnCurve } from './table.ts';
import type { LevelTable } from './table.ts';
import type { GroundCase } from './transitions.ts';

/** Which parameters a transition can feel at all, by its sensitivities at an ordinary field. */
interface Feels {
  readonly delta: boolean;
  readonly racahB: boolean;
}

const feltHeld = new WeakMap<LevelTable, Map<string, Feels>>();

export function feels(ion: GroundCase, ground: string, label: string, ratio: number): Feels {
  const table = levelTable(ion, ratio);
  let held = feltHeld.get(table);
  if (!held) {
    held = new Map();
    feltHeld.set(table, held);
  }
  const key = `${ground} ${label}`;
  let found = held.get(key);
  if (!found) {
    const { gradient } = transitionsAt(ion, ground, [label], pointOnCurve(Math.PI / 4, ratio))[0]!;
    found = { delta: Math.abs(gradient.delta) > 1e-9, racahB: Math.abs(gradient.racahB) > 1e-9 || Math.abs(gradient.racahC) > 1e-9 };
    held.set(key, found);
  }
  return found;
}
