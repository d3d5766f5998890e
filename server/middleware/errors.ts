import type { ErrorRequestHandler, RequestHandler, Response } from 'express';
import { errorStatuses, type ApiErrorBody } from '../../shared/api/errors';
import { InvalidInputError } from '../../shared/errors';
import { AppError, invalidInput, notFound, tooLarge, wrongContentType } from '../errors';

/** What express and its body parser throw: an error with the status it stands for. */
interface HttpError {
  status: number;
  type?: string;
}

function isHttpError(error: unknown): error is HttpError {
  return error instanceof Error && 'status' in error && typeof error.status === 'number';
}

function fromHttpError({ status, type }: HttpError): AppError | null {
  if (status === errorStatuses.tooLarge) return tooLarge();
  if (status === errorStatuses.wrongContentType) return wrongContentType();
  if (type === 'entity.parse.failed') {
    return invalidInput([{ path: '(root)', value: 'a body that is not JSON', allowed: 'JSON' }]);
  }
  if (status >= 400 && status < 500) {
    return invalidInput([{ path: '(root)', value: 'a malformed request', allowed: 'a well-formed request' }]);
  }
  return null;
}

function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof InvalidInputError) return invalidInput(error.problems);
  return isHttpError(error) ? fromHttpError(error) : null;
}

function answer(response: Response, error: AppError): void {
  const { id, message, problems, details } = error;
  const body: ApiErrorBody = { error: { id, message, problems: problems && [...problems], details } };
  if (error.retryAfterS !== undefined) response.set('Retry-After', String(Math.ceil(error.retryAfterS)));
  response.status(error.status).json(body);
}

const unexpected = (): AppError =>
  new AppError('unexpected', 'Something went wrong on our side. Nothing you sent is to blame.');

/** The one exit for failures: known ones by name, all others as one safe 500 that is logged. */
export function answerErrors(logError: (error: unknown) => void): ErrorRequestHandler {
  return (error: unknown, _request, response, next) => {
    const known = toAppError(error);
    if (!known) logError(error);
    if (response.headersSent) return next(error);
    answer(response, known ?? unexpected());
  };
}

/** For addresses under /api that no route took. */
export const noSuchRoute: RequestHandler = () => {
  throw notFound('address in this API');
};
