import express, { type RequestHandler } from 'express';
import { invalidInput, wrongContentType } from '../errors';

/** A strip's parameters take about 4 kB; its texts at most another 30. */
export const bodyLimit = '256kb';
/** Our deepest body has six levels. */
const deepest = 24;

const quote = '"'.charCodeAt(0);
const backslash = '\\'.charCodeAt(0);
const opening = new Set(['{'.charCodeAt(0), '['.charCodeAt(0)]);
const closing = new Set(['}'.charCodeAt(0), ']'.charCodeAt(0)]);

/** Whether JSON nests deeper than anything of ours, where recursive code would run out of stack. */
function nestsTooDeep(body: Buffer): boolean {
  let depth = 0;
  let inText = false;
  for (let i = 0; i < body.length; i++) {
    const byte = body[i];
    if (inText) {
      if (byte === backslash) i++;
      else if (byte === quote) inText = false;
    } else if (byte === quote) inText = true;
    else if (opening.has(byte) && ++depth > deepest) return true;
    else if (closing.has(byte)) depth--;
  }
  return false;
}

const parse = express.json({
  limit: bodyLimit,
  strict: false,
  verify: (_request, _response, body) => {
    if (!nestsTooDeep(body)) return;
    throw invalidInput([{ path: '(root)', value: 'nested lists or objects', allowed: `${deepest} levels` }]);
  },
});

/** Reads a JSON body; refuses any other kind. A request without a body passes as it is. */
export const jsonBody: RequestHandler = (request, response, next) => {
  const hasBody =
    request.headers['transfer-encoding'] !== undefined || Number(request.get('content-length')) > 0;
  if (hasBody && !request.is('application/json')) throw wrongContentType();
  parse(request, response, next);
};
