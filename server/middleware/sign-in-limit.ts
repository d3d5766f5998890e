import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { errorStatuses } from '../../shared/api/errors';
import { tooManyAttempts } from '../errors';

export interface SignInLimits {
  windowMs: number;
  /** Failed attempts for one e-mail from one address. */
  perPerson: number;
  /** Failed attempts from one address, whoever they were for; a classroom shares one. */
  perAddress: number;
}

export const usualSignInLimits: SignInLimits = { windowMs: 10 * 60_000, perPerson: 10, perAddress: 100 };

function emailOf(request: Request): string {
  const body = request.body as { email?: unknown } | undefined;
  return typeof body?.email === 'string' ? body.email.trim().toLowerCase().slice(0, 254) : '';
}

function limiter(windowMs: number, limit: number, keyOf: (request: Request) => string): RequestHandler {
  return rateLimit({
    windowMs,
    limit,
    keyGenerator: keyOf,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => response.statusCode !== errorStatuses.signInFailed,
    standardHeaders: false,
    legacyHeaders: false,
    handler: (request, _response, next) => {
      const resetTime = (request as Request & { rateLimit?: { resetTime?: Date } }).rateLimit?.resetTime;
      const waitMs = resetTime ? resetTime.getTime() - Date.now() : windowMs;
      next(tooManyAttempts(Math.max(1, waitMs / 1000)));
    },
  });
}

/** Locks sign-in after too many failures; attempts that succeed, or are malformed, do not count. */
export function signInLimit({ windowMs, perPerson, perAddress }: SignInLimits): RequestHandler[] {
  const address = (request: Request): string => ipKeyGenerator(request.ip ?? '');
  return [
    limiter(windowMs, perAddress, address),
    limiter(windowMs, perPerson, (request) => `${address(request)} ${emailOf(request)}`),
  ];
}
