import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Where the page's answer finds the nonce of its style elements. */
export function styleNonceOf(response: { locals: Record<string, unknown> }): string {
  return String(response.locals.styleNonce);
}

/** A nonce for each answer, drawn before the headers are set. */
const drawNonce: RequestHandler = (_request, response, next) => {
  response.locals.styleNonce = randomBytes(16).toString('base64');
  next();
};

/**
 * Everything a page uses comes from its own origin; nothing is framed. Style attributes are allowed because the
 * widgets place their overlays with them; scripts must be files, and so must style sheets, but for the few that the
 * widgets add at run time with this answer's nonce.
 */
const headers = helmet({
  contentSecurityPolicy: {
    useDefaults: false,
    directives: {
      'default-src': ["'self'"],
      'script-src': ["'self'"],
      'script-src-attr': ["'none'"],
      'style-src': [
        "'self'",
        (_request, response) =>
          `'nonce-${styleNonceOf(response as unknown as { locals: Record<string, unknown> })}'`,
      ],
      'style-src-attr': ["'unsafe-inline'"],
      'img-src': ["'self'", 'data:', 'blob:'],
      'font-src': ["'self'"],
      'connect-src': ["'self'"],
      'worker-src': ["'self'"],
      'object-src': ["'none'"],
      'base-uri': ["'none'"],
      'form-action': ["'self'"],
      'frame-ancestors': ["'none'"],
    },
  },
  referrerPolicy: { policy: 'same-origin' },
});

export const securityHeaders: RequestHandler[] = [drawNonce, headers];
