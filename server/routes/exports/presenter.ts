import type { ExportJob, ExportWarning } from '../../../shared/api/exports';
import type { ExportFormat } from '../../../shared/formats/export-format';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import type { ExportJobRow } from '../../models/models';
import { exportFileName } from '../../services/exports/export-jobs';

/** An export as the API gives it; `running` is the share of it that is done while it runs. */
export function presentExport(job: ExportJobRow, running: number): ExportJob {
  const { recorder } = JSON.parse(job.parameters) as StripParameters;
  const done = job.state === 'done';
  return {
    id: job.id,
    title: job.title,
    stripId: job.stripId,
    formats: JSON.parse(job.formats) as ExportFormat[],
    durationS: job.durationS,
    sampleRateHz: recorder.sampleRateHz,
    state: job.state,
    progress: done ? 1 : job.state === 'running' ? running : 0,
    failure: job.failure,
    warnings: JSON.parse(job.warnings) as ExportWarning[],
    file: done ? { name: exportFileName(job), bytes: job.bytes ?? 0 } : null,
    createdAt: job.createdAt,
    finishedAt: job.finishedAt,
    removedAt: job.removedAt,
  };
}
