import type { Request, RequestHandler } from 'express';
import { signInRequired } from '../errors';
import type { Account } from '../services/session/account';

export const sessionCookie = 'paceloom-session';

const accounts = new WeakMap<Request, Account>();

/** The token of a request's session cookie; null without one. */
export function tokenOf(request: Request): string | null {
  const cookies = request.cookies as Record<string, unknown> | undefined;
  const token = cookies?.[sessionCookie];
  return typeof token === 'string' ? token : null;
}

/** Finds out whom a request is from; a cookie that is worth nothing counts as none. */
export function authenticate(findSession: (token: string) => Promise<Account | null>): RequestHandler {
  return async (request, _response, next) => {
    const token = tokenOf(request);
    const account = token === null ? null : await findSession(token);
    if (account) accounts.set(request, account);
    next();
  };
}

/** Whom a request is from; null when nobody is signed in. */
export function accountOf(request: Request): Account | null {
  return accounts.get(request) ?? null;
}

/** As `accountOf`, for routes that only the signed-in reach. */
export function signedInAccount(request: Request): Account {
  const account = accountOf(request);
  if (!account) throw signInRequired();
  return account;
}
