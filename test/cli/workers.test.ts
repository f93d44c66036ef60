import { describe, expect, it } from 'vitest';
import { inThisThread, threadPool } from '../../src/cli/workers.js';

const script = new URL('./fixtures/answering-worker.mjs', import.meta.url);
interface Result {
  readonly value: number;
  readonly threadId: number;
}

describe('the pool of worker threads', () => {
  it('places results by the order of the jobs, not of their arrival, and uses every thread', async () => {
    // The first job outlasts all others, so the other thread finishes them before it.
    const jobs = Array.from({ length: 20 }, (_, value) => ({ value, delay: value === 0 ? 300 : 2 }));
    let done = 0;
    const results = await threadPool(script, 2).run<Result>(jobs, () => {
      done += 1;
    });
    expect(results.map((result) => result.value)).toEqual(jobs.map((job) => job.value));
    expect(done).toBe(20);
    expect(new Set(results.map((result) => result.threadId)).size).toBe(2);
  });

  it('can be used again, also with fewer jobs than threads and with none', async () => {
    const pool = threadPool(script, 4);
    expect(await pool.run<Result>([], () => {})).toEqual([]);
    expect((await pool.run<Result>([{ value: 7 }], () => {}))[0].value).toBe(7);
  });

  it.each([
    ['answers with an error', { fail: 'no root in the interval' }, /no root in the interval/],
    ['throws outside an answer', { crash: 'undefined is not a column' }, /undefined is not a column/],
    ['ends with a code', { exit: 7 }, /ended in the middle of its work \(exit code 7\)/],
    ['ends as if all were well', { exit: 0 }, /ended in the middle of its work \(exit code 0\)/],
  ])('fails, with the cause, when a thread %s', async (_, job, message) => {
    const jobs = [{ value: 1 }, job, { value: 2, delay: 5 }, { value: 3, delay: 60_000 }];
    await expect(threadPool(script, 2).run(jobs, () => {})).rejects.toThrow(message);
  });

  it('keeps the place in the program where a job failed', async () => {
    const failure = threadPool(script, 1).run([{ fail: 'x' }], () => {});
    await expect(failure).rejects.toMatchObject({ stack: expect.stringContaining('at there') });
  });
});

describe('working in this thread', () => {
  it('gives results in order and stops at the first failure', async () => {
    const started: number[] = [];
    const workers = inThisThread((job) => {
      started.push(job as number);
      if (job === 3) throw new Error('three');
      return (job as number) * 2;
    });
    expect(await workers.run([1, 2], () => {})).toEqual([2, 4]);
    await expect(workers.run([3, 4], () => {})).rejects.toThrow('three');
    expect(started).toEqual([1, 2, 3]);
  });
});
