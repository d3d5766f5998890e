import type { CookieOptions, Request } from 'express';
import { insecureConnection } from '../../errors';

const ownComputer = new Set(['localhost', '127.0.0.1', '[::1]']);

/** Whether a request came to this very computer by a name that never leaves it. */
function isOwnComputer(request: Request): boolean {
  return ownComputer.has(request.hostname);
}

/**
 * Not readable by scripts, not sent along from other sites, and over https only, except on this computer itself.
 * Throws `insecureConnection` where the browser would throw such a cookie away.
 */
export function sessionCookieOptions(request: Request, expiresAt?: Date): CookieOptions {
  if (!request.secure && !isOwnComputer(request)) throw insecureConnection();
  return { httpOnly: true, sameSite: 'strict', secure: request.secure, path: '/', expires: expiresAt };
}
