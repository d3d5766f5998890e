import type { Express, RequestHandler } from 'express';
import { authorize, routeAccess, type RouteKey } from '../middleware/authorize';
import { jsonBody } from '../middleware/json-body';
import { presetUpload } from '../middleware/preset-upload';
import { methodNotAllowed } from '../errors';

/** One handler, or a chain, for each line of the access table. */
export type RouteHandlers<Keys extends RouteKey = RouteKey> = Readonly<
  Record<Keys, RequestHandler | RequestHandler[]>
>;

/** Routes that take something other than JSON. */
const bodyReaders: Partial<Record<RouteKey, RequestHandler>> = { 'POST /api/strips/import': presetUpload };

type Method = 'get' | 'post' | 'put' | 'delete';

function split(key: RouteKey): { method: Method; path: string } {
  const [method, path] = key.split(' ');
  return { method: method.toLowerCase() as Method, path };
}

/** Registers every route of the table behind its access check; bodies are read only once that is passed. */
export function registerRoutes(app: Express, handlers: RouteHandlers): void {
  const keys = Object.keys(routeAccess) as RouteKey[];
  const methodsOf = new Map<string, string[]>();
  for (const key of keys) {
    const { method, path } = split(key);
    app[method](path, authorize(key), bodyReaders[key] ?? jsonBody, handlers[key]);
    methodsOf.set(path, [...(methodsOf.get(path) ?? []), method.toUpperCase()]);
  }
  for (const [path, methods] of methodsOf) {
    app.all(path, (_request, response) => {
      response.set('Allow', methods.join(', '));
      throw methodNotAllowed();
    });
  }
}
