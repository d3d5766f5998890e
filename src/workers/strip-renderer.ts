import type { StripRecording } from '../../shared/engine/render';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import type { RenderAnswer, RenderJob } from './protocol';

/** What a renderer puts out; `superseded` renders are never shown. */
export type RenderResult = { ok: true; recordings: StripRecording[] } | { ok: false; message: string };

/** Renders strips in a Web Worker, one job at a time; of the jobs that wait only the newest is kept. */
export interface StripRenderer {
  render(strips: StripParameters[], show: (result: RenderResult) => void): void;
  close(): void;
}

interface Waiting {
  job: RenderJob;
  show: (result: RenderResult) => void;
}

function startWorker(): Worker {
  return new Worker(new URL('./strip-worker.ts', import.meta.url), { type: 'module' });
}

/** A renderer for one view; the worker is the same engine that the server and the command line run. */
export function createStripRenderer(): StripRenderer {
  const worker = startWorker();
  let running: Waiting | null = null;
  let waiting: Waiting | null = null;
  let lastId = 0;

  const start = (next: Waiting | null): void => {
    running = next;
    if (next) worker.postMessage(next.job);
  };
  const finish = (result: RenderResult): void => {
    const done = running;
    const next = waiting;
    waiting = null;
    start(next);
    done?.show(result);
  };
  worker.addEventListener('message', ({ data }: MessageEvent<RenderAnswer>) => {
    if (data.id === running?.job.id) finish(data);
  });
  worker.addEventListener('error', () => finish({ ok: false, message: 'The engine could not be started.' }));

  return {
    render(strips, show) {
      const next: Waiting = { job: { id: ++lastId, strips }, show };
      if (running) waiting = next;
      else start(next);
    },
    close: () => worker.terminate(),
  };
}

/**
 * One renderer for many small pictures: jobs are queued, none is dropped.
 */
export function createQueuedRenderer(): {
  render(strip: StripParameters): Promise<StripRecording>;
  close(): void;
} {
  const worker = startWorker();
  const pending = new Map<
    number,
    { done: (recording: StripRecording) => void; fail: (error: Error) => void }
  >();
  let lastId = 0;
  worker.addEventListener('message', ({ data }: MessageEvent<RenderAnswer>) => {
    const job = pending.get(data.id);
    pending.delete(data.id);
    if (!job) return;
    if (data.ok) job.done(data.recordings[0]);
    else job.fail(new Error(data.message));
  });
  worker.addEventListener('error', () => {
    for (const { fail } of pending.values()) fail(new Error('The engine could not be started.'));
    pending.clear();
  });
  return {
    render(strip) {
      const job: RenderJob = { id: ++lastId, strips: [strip] };
      return new Promise((done, fail) => {
        pending.set(job.id, { done, fail });
        worker.postMessage(job);
      });
    },
    close: () => worker.terminate(),
  };
}
