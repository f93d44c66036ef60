import { parentPort } from 'node:worker_threads';
import { carryOut } from './study-job.js';
import type { Answer } from './workers.js';

/** The script of a worker thread: answers study jobs until it is ended. */
parentPort?.on('message', ({ index, job }: { readonly index: number; readonly job: unknown }) => {
  let answer: Answer;
  try {
    answer = { index, result: carryOut(job) };
  } catch (error) {
    const { message, stack } = error instanceof Error ? error : new Error(String(error));
    answer = { index, error: { message, stack } };
  }
  parentPort?.postMessage(answer);
});
