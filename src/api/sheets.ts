import type { SheetsRequestInput } from '../../shared/api/sheets';
import { requestBytes } from './http';

/** Pages of strips as a file. Throws `ApiError`. */
export function requestSheets(request: SheetsRequestInput): Promise<ArrayBuffer> {
  return requestBytes('/api/sheets', { method: 'POST', body: request });
}
