import type { Response } from 'express';

/** Aborted when the client leaves before its answer is sent. */
export function untilClientLeaves(response: Response): AbortSignal {
  const controller = new AbortController();
  response.once('close', () => {
    if (!response.writableFinished) controller.abort(new Error('the client left'));
  });
  return controller.signal;
}
