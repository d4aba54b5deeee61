// One of the threads of readAll.ts: reads batches of measurements until its port is closed.

import { workerData } from 'node:worker_threads';
import type { MessagePort } from 'node:worker_threads';
import type { Answer, Batch } from './readAll.ts';
import { readOneAsJson } from './readOne.ts';

const { port, finished } = workerData as { readonly port: MessagePort; readonly finished: Int32Array };

function answer({ first, tasks }: Batch): Answer {
  try {
    return { first, readings: tasks.map(readOneAsJson), failure: null };
  } catch (error) {
    return { first, readings: [], failure: error instanceof Error ? error.message : String(error) };
  }
}

port.on('message', (batch: Batch) => {
  port.postMessage(answer(batch));
  Atomics.add(finished, 0, 1);
  Atomics.notify(finished, 0);
});
