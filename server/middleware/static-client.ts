import { existsSync, readFileSync } from 'node:fs';
import { extname, join, sep } from 'node:path';
import express, { type RequestHandler } from 'express';
import { styleNonceOf } from './security-headers';

/** Built files carry a hash of their content in their names, so they never change. */
const builtForEver = 'public, max-age=31536000, immutable';

/** Stands in index.html where each answer's nonce for style elements goes. */
const noncePlace = '__STYLE_NONCE__';

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
    const html = readFileSync(page, 'utf8').replace(noncePlace, styleNonceOf(response));
    response.set('Cache-Control', 'no-store').type('html').send(html);
  };
  return [files, sendPage];
}
