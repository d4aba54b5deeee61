import { MessageChannel, receiveMessageOnPort, Worker } from 'node:worker_threads';
import type { MessagePort } from 'node:worker_threads';
import { threadsFor } from '../threads.ts';
import { readOneAsJson } from './readOne.ts';
import type { ReadingTask } from './readOne.ts';

/** Tasks for one thread, with the place of the first among all. */
export interface Batch {
  readonly first: number;
  readonly tasks: readonly ReadingTask[];
}

export interface Answer {
  readonly first: number;
  readonly readings: readonly string[];
  readonly failure: string | null;
}

/** Below this many measurements starting threads costs more than they save. */
const worthThreads = 150;

const batchSize = 16;

/** A batch takes well under a second; this long without an answer means that a thread died. */
const patience = 120_000;

/**
 * Reads all measurements, on as many threads as the machine has where there are enough of them.
 *
 * The answers come in the order of the tasks and are the same on any number of threads. `progress` is called with how many are
 * done. Throws where the engine fails on one, naming it.
 */
export function readAll(tasks: readonly ReadingTask[], progress: (done: number) => void = () => undefined): readonly string[] {
  const threads = threadsFor(tasks.length, worthThreads);
  if (threads < 2)
    return tasks.map((task, index) => {
      const json = readOneAsJson(task);
      progress(index + 1);
      return json;
    });
  return readOnThreads(tasks, threads, progress);
}

// The caller waits for the answers without an event loop, so that a refit stays one plain call.
function readOnThreads(tasks: readonly ReadingTask[], threads: number, progress: (done: number) => void): readonly string[] {
  const finished = new Int32Array(new SharedArrayBuffer(4));
  const workers: { readonly worker: Worker; readonly port: MessagePort }[] = [];
  const found = new Array<string>(tasks.length);
  let next = 0;
  let done = 0;
  const feed = (port: MessagePort): void => {
    if (next >= tasks.length) return;
    const batch: Batch = { first: next, tasks: tasks.slice(next, next + batchSize) };
    next += batchSize;
    port.postMessage(batch);
  };
  try {
    for (let i = 0; i < threads; i++) {
      const { port1, port2 } = new MessageChannel();
      const worker = new Worker(new URL('./readingWorker.ts', import.meta.url), { workerData: { port: port2, finished }, transferList: [port2] });
      worker.unref();
      port1.unref();
      workers.push({ worker, port: port1 });
      // A second batch waits at each thread, so that none stands idle while its answer is read.
      feed(port1);
      feed(port1);
    }
    let answered = 0;
    while (done < tasks.length) {
      if (Atomics.wait(finished, 0, answered, patience) === 'timed-out') throw new Error('a thread of the refit gave no answer; try again');
      answered = Atomics.load(finished, 0);
      for (const { port } of workers)
        for (let message = receiveMessageOnPort(port); message !== undefined; message = receiveMessageOnPort(port)) {
          const { first, readings, failure } = message.message as Answer;
          if (failure !== null) throw new Error(failure);
          readings.forEach((json, i) => { found[first + i] = json; });
          done += readings.length;
          progress(done);
          feed(port);
        }
    }
    return found;
  } finally {
    for (const { worker, port } of workers) {
      port.close();
      void worker.terminate();
    }
  }
}
