import type { BenchAnswer, BenchJob, BenchQuestion, BenchQuestions } from './bench-protocol';

/** The recorder bench in a Web Worker: questions are answered one after another, in order. */
export interface Bench {
  /** Rejects when the signal is aborted before its turn, or when the measurement fails. */
  ask<Kind extends BenchQuestion>(
    kind: Kind,
    ask: BenchQuestions[Kind]['ask'],
    signal: AbortSignal,
  ): Promise<BenchQuestions[Kind]['answer']>;
  close(): void;
}

interface Waiting {
  job: BenchJob;
  done(answer: unknown): void;
  fail(error: Error): void;
}

/** A bench with a worker of its own, so that slow tables do not hold up traces on another one. */
export function createBench(): Bench {
  const worker = new Worker(new URL('./bench-worker.ts', import.meta.url), { type: 'module' });
  let queue: Waiting[] = [];
  let running: Waiting | null = null;
  let lastId = 0;

  const startNext = (): void => {
    running = queue.shift() ?? null;
    if (running) worker.postMessage(running.job);
  };
  worker.addEventListener('message', ({ data }: MessageEvent<BenchAnswer>) => {
    if (data.id !== running?.job.id) return;
    const finished = running;
    startNext();
    if (data.ok) finished.done(data.answer);
    else finished.fail(new Error(data.message));
  });
  const failAll = (message: string): void => {
    const failed = [...(running ? [running] : []), ...queue];
    running = null;
    queue = [];
    for (const one of failed) one.fail(new Error(message));
  };
  worker.addEventListener('error', () => failAll('The engine could not be started.'));

  return {
    ask: (kind, ask, signal) =>
      new Promise((done, fail) => {
        const job = { id: ++lastId, kind, ask } as BenchJob;
        const waiting: Waiting = { job, done: done as (answer: unknown) => void, fail };
        signal.addEventListener('abort', () => {
          queue = queue.filter((one) => one !== waiting);
          fail(new DOMException('superseded', 'AbortError'));
        });
        queue.push(waiting);
        if (!running) startNext();
      }),
    close() {
      worker.terminate();
      failAll('The bench was closed.');
    },
  };
}
