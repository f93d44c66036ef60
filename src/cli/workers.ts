import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';

/** Carries out jobs, plain data in and out, wherever there is room. */
export interface Workers {
  /** Results in the order of the jobs, whatever order they were finished in. The first failure ends the run. */
  run<Result>(jobs: readonly unknown[], onDone: () => void): Promise<Result[]>;
}

/** What a worker thread answers to `{ index, job }`. */
export type Answer =
  | { readonly index: number; readonly result: unknown }
  | { readonly index: number; readonly error: { readonly message: string; readonly stack?: string } };

/** Carries jobs out one by one in this thread, pausing between them so that progress is seen. */
export function inThisThread(work: (job: unknown) => unknown): Workers {
  return {
    async run<Result>(jobs: readonly unknown[], onDone: () => void) {
      const results: Result[] = [];
      for (const job of jobs) {
        results.push(work(job) as Result);
        onDone();
        await new Promise(setImmediate);
      }
      return results;
    },
  };
}

/**
 * Threads that each take the next job as they finish one; they live as long as a run. A thread that dies ends the run
 * with an error that says so.
 *
 * @param script  module that answers each `{ index, job }` with an `Answer`
 */
export function threadPool(script: URL, size = availableParallelism()): Workers {
  return {
    async run<Result>(jobs: readonly unknown[], onDone: () => void) {
      const results: Result[] = new Array(jobs.length);
      let next = 0;
      const work = (thread: Worker) =>
        new Promise<void>((resolve, reject) => {
          const giveNext = () => {
            if (next >= jobs.length) return resolve();
            const index = next++;
            thread.postMessage({ index, job: jobs[index] });
          };
          thread.on('message', (answer: Answer) => {
            if ('error' in answer) return reject(Object.assign(new Error(answer.error.message), answer.error));
            results[answer.index] = answer.result as Result;
            onDone();
            giveNext();
          });
          thread.on('error', reject);
          thread.on('exit', (code) =>
            reject(new Error(`a worker thread ended in the middle of its work (exit code ${code})`)),
          );
          giveNext();
        });
      const threads = Array.from({ length: Math.min(size, jobs.length) }, () => new Worker(script));
      try {
        await Promise.all(threads.map(work));
      } finally {
        // After a failure the other threads may be deep in a job; nothing more is wanted of them.
        await Promise.all(threads.map((thread) => thread.terminate()));
      }
      return results;
    },
  };
}
