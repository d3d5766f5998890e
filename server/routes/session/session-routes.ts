import type { RequestHandler } from 'express';
import { signInRequestSchema } from '../../../shared/api/session';
import { sessionCookie, signedInAccount, tokenOf } from '../../middleware/authenticate';
import { bodyOf } from '../../middleware/validate';
import { signIn, signOut, type SessionDependencies } from '../../services/session/sessions';
import type { RouteHandlers } from '../register-routes';
import { presentSession } from './presenter';
import { sessionCookieOptions } from './session-cookie';

type Keys = 'POST /api/session' | 'GET /api/session' | 'DELETE /api/session';

/** Malformed attempts are refused before the limiter counts. */
const checkSignIn: RequestHandler = (request, _response, next) => {
  sessionCookieOptions(request);
  request.body = bodyOf(signInRequestSchema, request);
  next();
};

export function sessionRoutes(
  dependencies: SessionDependencies,
  limitSignIn: RequestHandler[],
): RouteHandlers<Keys> {
  return {
    'POST /api/session': [
      checkSignIn,
      ...limitSignIn,
      async (request, response) => {
        const { account, token, expiresAt } = await signIn(
          dependencies,
          bodyOf(signInRequestSchema, request),
        );
        response.cookie(sessionCookie, token, sessionCookieOptions(request, expiresAt));
        response.json(presentSession(account));
      },
    ],
    'GET /api/session': (request, response) => {
      response.json(presentSession(signedInAccount(request)));
    },
    'DELETE /api/session': async (request, response) => {
      const token = tokenOf(request);
      if (token !== null) await signOut(dependencies, token);
      response.clearCookie(sessionCookie, { path: '/', httpOnly: true, sameSite: 'strict' });
      response.status(204).end();
    },
  };
}
