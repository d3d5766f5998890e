import type { RequestHandler } from 'express';
import { crossSite } from '../errors';

const harmless = new Set(['GET', 'HEAD', 'OPTIONS']);

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}

/**
 * Refuses requests that change something when a browser sent them for another site: by `Sec-Fetch-Site`, or by
 * `Origin` where that is missing. Hosts are compared, not schemes, since a proxy may end the encryption. A
 * client that sends neither header is no browser, and nobody's cookie rides along with it.
 */
export const sameOrigin: RequestHandler = (request, _response, next) => {
  if (harmless.has(request.method)) return next();
  const site = request.get('sec-fetch-site');
  const origin = request.get('origin');
  if (site !== undefined && site !== 'same-origin' && site !== 'none') throw crossSite();
  if (origin !== undefined && hostOf(origin) !== request.get('host')) throw crossSite();
  next();
};
