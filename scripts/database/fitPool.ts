import { MessageChannel, receiveMessageOnPort, Worker } from 'node:worker_threads';
import type { MessagePort } from 'node:worker_threads';
import { threadsFor } from '../threads.ts';
import { fitComplex } from './fitComplex.ts';
import type { Basis, ComplexTask, FittedComplex } from './fitComplex.ts';

export interface Answer {
  readonly fitted: readonly FittedComplex[];
  readonly failure: string | null;
}

/** Below this many complexes starting threads costs more than they save. */
const worthThreads = 100;

const batchSize = 8;

/** Batches that may wait at each thread. More would only hold memory. */
const mostWaiting = 8;

/** MB. A thread has about 70 in use; without a limit it lets several times as much of what it no longer needs lie about. */
const memory = { maxOldGenerationSizeMb: 512, maxYoungGenerationSizeMb: 48 } as const;

/** A batch takes well under a second; this long without an answer means that a thread died. */
const patience = 120_000;

/** Takes complexes while the caller still reads others, and gives them back fitted in any order. */
export interface FitPool {
  readonly add: (task: ComplexTask) => void;
  /** Waits until everything is fitted and given back. */
  readonly finish: () => void;
  /** Ends the threads; to be called in every case. */
  readonly close: () => void;
}

/**
 * A pool for about `expected` complexes, on as many threads as the machine has where there are enough of them. The results are the same on any
 * number of threads. Throws, at any call, where the engine fails on a measurement, naming it.
 */
export function fitPool(basis: Basis, expected: number, take: (fitted: FittedComplex) => void): FitPool {
  const threads = threadsFor(expected, worthThreads);
  if (threads < 2) return { add: (task) => take(fitComplex(task, basis)), finish: () => undefined, close: () => undefined };
  return poolOfThreads(basis, threads, take);
}

interface Thread {
  readonly worker: Worker;
  readonly port: MessagePort;
  waiting: number;
}

// The caller waits for the answers without an event loop, so that a refit stays one plain call.
function poolOfThreads(basis: Basis, count: number, take: (fitted: FittedComplex) => void): FitPool {
  const finished = new Int32Array(new SharedArrayBuffer(4));
  const threads = Array.from({ length: count }, (): Thread => {
    const { port1, port2 } = new MessageChannel();
    const worker = new Worker(new URL('./fitWorker.ts', import.meta.url), { workerData: { port: port2, finished, basis }, transferList: [port2], resourceLimits: memory });
    worker.unref();
    port1.unref();
    return { worker, port: port1, waiting: 0 };
  });
  let batch: ComplexTask[] = [];
  let sent = 0;
  let received = 0;
  const receive = (): void => {
    for (const thread of threads)
      for (let message = receiveMessageOnPort(thread.port); message !== undefined; message = receiveMessageOnPort(thread.port)) {
        const { fitted, failure } = message.message as Answer;
        if (failure !== null) throw new Error(failure);
        thread.waiting -= 1;
        received += 1;
        fitted.forEach(take);
      }
  };
  const wait = (): void => {
    if (Atomics.wait(finished, 0, received, patience) === 'timed-out') throw new Error('a thread of the refit gave no answer; try again');
    receive();
  };
  const send = (): void => {
    receive();
    const least = (): Thread => threads.reduce((a, b) => (b.waiting < a.waiting ? b : a));
    while (least().waiting >= mostWaiting) wait();
    const thread = least();
    thread.port.postMessage(batch);
    thread.waiting += 1;
    sent += 1;
    batch = [];
  };
  return {
    add: (task) => {
      batch.push(task);
      if (batch.length >= batchSize) send();
    },
    finish: () => {
      if (batch.length > 0) send();
      while (received < sent) wait();
    },
    close: () => {
      for (const { worker, port } of threads) {
        port.close();
        void worker.terminate();
      }
    },
  };
}
