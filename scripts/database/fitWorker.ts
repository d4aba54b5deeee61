// One of the threads of fitPool.ts: fits batches of complexes until its port is closed.

import { workerData } from 'node:worker_threads';
import type { MessagePort } from 'node:worker_threads';
import { fitComplex } from './fitComplex.ts';
import type { Basis, ComplexTask } from './fitComplex.ts';
import type { Answer } from './fitPool.ts';

const { port, finished, basis } = workerData as { readonly port: MessagePort; readonly finished: Int32Array; readonly basis: Basis };

function answer(tasks: readonly ComplexTask[]): Answer {
  try {
    return { fitted: tasks.map((task) => fitComplex(task, basis)), failure: null };
  } catch (error) {
    return { fitted: [], failure: error instanceof Error ? error.message : String(error) };
  }
}

port.on('message', (tasks: readonly ComplexTask[]) => {
  port.postMessage(answer(tasks));
  Atomics.add(finished, 0, 1);
  Atomics.notify(finished, 0);
});
