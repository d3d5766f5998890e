import type { RecorderReportRequestInput } from '../../shared/api/recorder-report';
import { requestBytes } from './http';

/** The dated conformance report of settings, as PDF. Throws `ApiError`. */
export function requestRecorderReport(request: RecorderReportRequestInput): Promise<ArrayBuffer> {
  return requestBytes('/api/recorder-report', { method: 'POST', body: request });
}
