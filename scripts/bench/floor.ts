// How far the engine's fits are from the arithmetic that no fit can avoid, and that arithmetic by a general-purpose library.

import { fitAssignment, freeIon, isFit, ratioFor, significant, symmetricEigen } from '#engine';
import type { Block, FieldParameters } from '#engine';
import type { Task } from './engine.ts';
import { blockMatrix, libraryEigenvalues, placeOf } from './plainRoute.ts';
import { middleTime } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

interface FloorTask {
  readonly task: Task;
  readonly sign: 1 | -1;
  /** Those of its bands and its ground level. */
  readonly blocks: readonly Block[];
  /** Every local solution that the engine finds. */
  readonly solutions: readonly FieldParameters[];
}

export async function measureFloor(tasks: readonly Task[]): Promise<Measured[]> {
  const prepared = tasks.flatMap(prepare);
  if (prepared.length === 0) return [];
  let decompositions = 0;
  const once = (eigen: 'engine' | 'library') => (): void => {
    decompositions = 0;
    for (const { sign, blocks, solutions } of prepared)
      for (const at of solutions)
        for (const block of blocks) {
          if (eigen === 'engine') symmetricEigen(blockMatrix(block, sign, at), block.size);
          else libraryEigenvalues(block, sign, at);
          decompositions += 1;
        }
  };
  const engine = await middleTime(() => prepared.forEach(({ task }) => fit(task)));
  const floor = await middleTime(once('engine'));
  const library = await middleTime(once('library'));
  const each = (milliseconds: number): string => `${significant((1000 * milliseconds) / prepared.length, 3)} us`;
  return [
    { name: 'fit against its floor', value: engine / floor, unit: 'times', over: `${each(engine)} a fit; floor ${each(floor)}: the blocks of its bands and its ground level diagonalised once at each solution (${significant(decompositions / prepared.length, 3)} a fit)` },
    { name: 'library eigenvalues', value: library / floor, unit: 'times', over: `ml-matrix on the same blocks, against the engine's own routine with vectors: ${each(library)}` },
  ];
}

function fit({ ion, assigned, record: { engine, policy } }: Task) {
  return fitAssignment(ion, assigned, policy, ratioFor(policy, engine.ion.name), freeIon(policy.freeIons, engine.ion));
}

// Fits of Delta and B, with C or without; the others need no least squares.
function prepare(task: Task): FloorTask[] {
  const outcome = fit(task);
  if (!isFit(outcome) || (outcome.mode !== 'field, B' && outcome.mode !== 'field, B, C')) return [];
  const { electrons, geometry } = task.ion;
  const [best] = outcome.solutions;
  const labels = task.assigned.filter((_, k) => outcome.used[k]).map(({ label }) => label);
  return [{
    task, solutions: outcome.solutions.map(({ at }) => at), sign: geometry === 'octahedral' ? 1 : -1,
    blocks: [...new Set([best!.ground, ...labels].map((label) => placeOf(label, electrons, geometry).block))],
  }];
}
