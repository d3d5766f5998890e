import express, { type RequestHandler } from 'express';
import { deepestJson, nestsTooDeep } from '../../shared/formats/json-depth';
import { invalidInput, wrongContentType } from '../errors';

/** A strip's parameters take about 4 kB; its texts at most another 30. */
export const bodyLimit = '256kb';

const parse = express.json({
  limit: bodyLimit,
  strict: false,
  verify: (_request, _response, body) => {
    if (!nestsTooDeep(body)) return;
    throw invalidInput([
      { path: '(root)', value: 'nested lists or objects', allowed: `${deepestJson} levels` },
    ]);
  },
});

/** Reads a JSON body; refuses any other kind. A request without a body passes as it is. */
export const jsonBody: RequestHandler = (request, response, next) => {
  const hasBody =
    request.headers['transfer-encoding'] !== undefined || Number(request.get('content-length')) > 0;
  if (hasBody && !request.is('application/json')) throw wrongContentType();
  parse(request, response, next);
};
