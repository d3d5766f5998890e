import { existsSync } from 'node:fs';
import { extname, join, sep } from 'node:path';
import express, { type RequestHandler } from 'express';

/** Built files carry a hash of their content in their names, so they never change. */
const builtForEver = 'public, max-age=31536000, immutable';

/**
 * The built client: its files, and its one page for every other address, since the client does its own routing.
 * Addresses that look like a file but are none stay 404.
 */
export function staticClient(directory: string): RequestHandler[] {
  const page = join(directory, 'index.html');
  const built = join(directory, 'assets') + sep;
  const files = express.static(directory, {
    index: false,
    setHeaders: (response, file: string) => {
      response.setHeader('Cache-Control', file.startsWith(built) ? builtForEver : 'no-cache');
    },
  });
  const sendPage: RequestHandler = (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') return next();
    if (extname(request.path) !== '') return next();
    if (!existsSync(page)) {
      response.status(503).type('text').send('The pages are not built yet. Start with: npm start\n');
      return;
    }
    response.set('Cache-Control', 'no-cache');
    response.sendFile(page);
  };
  return [files, sendPage];
}
