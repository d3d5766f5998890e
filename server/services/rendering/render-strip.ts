import type { RenderRequest } from '../../../shared/api/render';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import type { Database } from '../../models/database';
import type { Account } from '../session/account';
import { getStrip } from '../strips/keep-strips';
import { readKeptParameters } from '../strips/kept-parameters';
import type { RenderPool } from './render-pool';

async function wantedParameters(
  database: Database,
  account: Account,
  request: RenderRequest,
): Promise<StripParameters> {
  if (request.parameters) return request.parameters;
  return readKeptParameters(await getStrip(database, account, request.stripId ?? ''));
}

/** Renders given parameters, or those of a strip the account may see, as bytes of shared/formats/strip-binary.ts. */
export async function renderRequested(
  { database, renderPool }: { database: Database; renderPool: RenderPool },
  account: Account,
  request: RenderRequest,
  signal: AbortSignal,
): Promise<Uint8Array<ArrayBuffer>> {
  const parameters = await wantedParameters(database, account, request);
  return renderPool.render({ parameters, unquantised: request.unquantised }, signal);
}
