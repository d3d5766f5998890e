import { z } from 'zod';

/** Every failure the API answers with, and its HTTP status. The client branches on the id, never on the text. */
export const errorStatuses = {
  /** The request was understood and refused; `problems` names every field. */
  invalidInput: 400,
  /** A render of more than `longestRenderS`: it belongs to an export job. */
  longStrip: 400,
  /** A file that a newer version of the product wrote. */
  newerFile: 400,
  /** Wrong e-mail or password. */
  signInFailed: 401,
  /** No session, or one that has ended. */
  signInRequired: 401,
  /** Signed in, but this role or person may not do this. */
  notAllowed: 403,
  /** A request that changes something came from another site. */
  crossSite: 403,
  /** Signing in over a plain connection that is not this computer's own. */
  insecureConnection: 403,
  notFound: 404,
  methodNotAllowed: 405,
  /** Someone saved in between; `details.current` is the strip as it now stands. */
  staleStrip: 409,
  /** The library changed between looking at a preset file and importing it; `details.analysis` is a new look. */
  staleImport: 409,
  /** As many exports of this person wait or run as may. */
  tooManyExports: 409,
  /** This person's exports take all the space they may. */
  exportSpaceFull: 409,
  /** Only an export that failed or was cancelled can be started again. */
  exportCannotRestart: 409,
  tooLarge: 413,
  wrongContentType: 415,
  /** A range that lies outside of the file. */
  badRange: 416,
  /** Sign-in is locked for a while; `Retry-After` says for how many seconds. */
  tooManyAttempts: 429,
  /** A defect of ours; the answer says nothing of its insides. */
  unexpected: 500,
  /** Every worker is busy and the queue is full; `Retry-After` says when to come back. */
  renderQueueFull: 503,
  /** The render took longer than its limit. */
  renderTooLong: 504,
} as const;

export type ApiErrorId = keyof typeof errorStatuses;

export const problemSchema = z.object({
  item: z.string().optional(),
  path: z.string(),
  value: z.string(),
  allowed: z.string(),
});

const errorIds = Object.keys(errorStatuses) as [ApiErrorId, ...ApiErrorId[]];

/** The body of every failure. */
export const apiErrorSchema = z.object({
  error: z.object({
    id: z.enum(errorIds),
    /** A sentence for people. */
    message: z.string(),
    /** Field by field, for `invalidInput` and `longStrip`. Paths start at the body, such as `parameters.durationS`. */
    problems: z.array(problemSchema).optional(),
    details: z.record(z.string(), z.unknown()).optional(),
  }),
});
export type ApiErrorBody = z.infer<typeof apiErrorSchema>;
