import { engineVersion } from '../../shared/engine/engine-version';
import type { BenchSetting } from '../../shared/recorder-bench/bench-setting';
import { measureConformance } from '../../shared/recorder-bench/conformance';
import { recorderReportPdf } from '../exports/recorder-report-pdf';

export interface ReportTask {
  settings: BenchSetting[];
  /** YYYY-MM-DD. */
  madeOn: string;
  productVersion: string;
}

/** Measures the settings and writes the report as PDF. */
export default function report({ settings, madeOn, productVersion }: ReportTask): Promise<Uint8Array> {
  return recorderReportPdf(measureConformance(settings), { madeOn, productVersion, engineVersion });
}
