import { errorStatuses, type ApiErrorId } from '../shared/api/errors';
import type { Problem } from '../shared/errors';

interface ErrorExtras {
  problems?: readonly Problem[];
  /** Goes to the client as it is: no secrets. */
  details?: Record<string, unknown>;
  /** Sent as the Retry-After header. */
  retryAfterS?: number;
}

/** A failure the API knows by name; the error middleware turns it into an answer. */
export class AppError extends Error {
  readonly id: ApiErrorId;
  readonly status: number;
  readonly problems?: readonly Problem[];
  readonly details?: Record<string, unknown>;
  readonly retryAfterS?: number;

  constructor(id: ApiErrorId, message: string, extras: ErrorExtras = {}) {
    super(message);
    this.name = 'AppError';
    this.id = id;
    this.status = errorStatuses[id];
    this.problems = extras.problems;
    this.details = extras.details;
    this.retryAfterS = extras.retryAfterS;
  }
}

export const invalidInput = (problems: readonly Problem[]): AppError =>
  new AppError('invalidInput', 'Some of what was sent cannot be accepted.', { problems });

export const signInFailed = (): AppError => new AppError('signInFailed', 'E-mail and password do not match.');

export const signInRequired = (): AppError => new AppError('signInRequired', 'Sign in to continue.');

export const notAllowed = (message = 'Your role may not do this.'): AppError =>
  new AppError('notAllowed', message);

export const crossSite = (): AppError =>
  new AppError('crossSite', 'This request came from another site and was refused.');

export const insecureConnection = (): AppError =>
  new AppError('insecureConnection', 'Signing in needs https, except on this computer itself.');

export const notFound = (what = 'page'): AppError => new AppError('notFound', `There is no such ${what}.`);

export const methodNotAllowed = (): AppError =>
  new AppError('methodNotAllowed', 'This address does not take that kind of request.');

/** `current` is the strip as it now stands, as the API presents it. */
export const staleStrip = (current: unknown): AppError =>
  new AppError('staleStrip', 'Someone saved this strip after you opened it. Nothing was overwritten.', {
    details: { current },
  });

export const tooLarge = (message = 'The request is too large.'): AppError =>
  new AppError('tooLarge', message);

export const newerFile = (message: string): AppError => new AppError('newerFile', message);

/** Problems that an answer lists; the rest is counted. */
const mostProblems = 50;

/** `problems`: all that was found in the file. */
export const presetFileRefused = (problems: readonly Problem[]): AppError => {
  const count =
    problems.length === 1 ? 'One thing in it is wrong' : `${problems.length} things in it are wrong`;
  return new AppError('invalidInput', `This file cannot be imported. ${count}. Nothing was changed.`, {
    problems: problems.slice(0, mostProblems),
    details: { more: Math.max(0, problems.length - mostProblems) },
  });
};

/** `analysis` is what the file would do now, as the API presents it. */
export const staleImport = (analysis: unknown): AppError =>
  new AppError(
    'staleImport',
    'The library changed after the file was looked at. Nothing was imported; look at the choices again.',
    { details: { analysis } },
  );

export const badRange = (): AppError => new AppError('badRange', 'The file ends before this range begins.');

export const wrongContentType = (): AppError =>
  new AppError('wrongContentType', 'Send JSON, with the content type application/json.');

export const tooManyExports = (most: number): AppError =>
  new AppError(
    'tooManyExports',
    `You have ${most} exports waiting or running, as many as there may be. Wait for one, or cancel one.`,
  );

export const exportSpaceFull = (spaceBytes: number): AppError =>
  new AppError(
    'exportSpaceFull',
    `Your exports take all of the ${spaceBytes / 1e9} GB they may. Delete some, then try again.`,
  );

export const exportCannotRestart = (): AppError =>
  new AppError('exportCannotRestart', 'Only an export that failed or was cancelled can be started again.');

export const tooManyAttempts = (retryAfterS: number): AppError =>
  new AppError('tooManyAttempts', 'Too many failed attempts. Wait a little, then try again.', {
    retryAfterS,
  });

export const longStrip = (durationS: number, longestS: number): AppError =>
  new AppError('longStrip', `Strips of more than ${longestS} s are made by an export.`, {
    problems: [
      { path: 'parameters.durationS', value: String(durationS), allowed: `1 to ${longestS} s here` },
    ],
  });

export const renderQueueFull = (): AppError =>
  new AppError('renderQueueFull', 'The server is busy drawing other strips. Try again in a moment.', {
    retryAfterS: 2,
  });

export const renderTooLong = (limitMs: number): AppError =>
  new AppError('renderTooLong', `Drawing this strip took longer than ${limitMs / 1000} s and was stopped.`);
