import { Link } from 'react-router-dom';
import type { ExportJob } from '../../../shared/api/exports';
import { exportFormatWords } from '../../../shared/formats/export-format';
import { exportFileAddress } from '../../api/exports';
import { Button, buttonClass } from '../../components/button';
import { Tag } from '../../components/chip';
import { Notice } from '../../components/notice';
import { ProgressRule } from '../../components/progress-rule';
import { paths } from '../../lib/paths';
import { dayWords, durationWords, momentWords, sizeWords } from '../../lib/quantity-words';

export interface ExportActions {
  onCancel(job: ExportJob): void;
  onRestart(job: ExportJob): void;
  onDelete(job: ExportJob): void;
  busy: boolean;
}

/** An export's strip by name. */
export function exportTitle({ title }: Pick<ExportJob, 'title'>): string {
  return title.trim() === '' ? 'Untitled strip' : title;
}

/** What an export holds, and since when. */
function About({ job }: { job: ExportJob }) {
  const words = `${durationWords(job.durationS)} at ${job.sampleRateHz}/s, asked for ${momentWords(job.createdAt)}`;
  return (
    <div className="min-w-0">
      <h2 className="text-section font-semibold break-words">
        {job.stripId ? (
          <Link to={paths.strip(job.stripId)} className="hover:underline">
            {exportTitle(job)}
          </Link>
        ) : (
          exportTitle(job)
        )}
      </h2>
      <p className="mt-0.5 text-dense text-ink-3">{words}</p>
      <p className="mt-1.5 flex flex-wrap gap-1">
        {job.formats.map((format) => (
          <Tag key={format}>{exportFormatWords[format].label}</Tag>
        ))}
      </p>
    </div>
  );
}

/** How far it is, or what came of it. */
function Standing({ job }: { job: ExportJob }) {
  switch (job.state) {
    case 'waiting':
      return <p className="text-dense text-ink-2">Waits for its turn</p>;
    case 'running':
      return (
        <div>
          <p className="mb-1 flex justify-between text-dense text-ink-2">
            <span>Being made</span>
            <span className="font-mono">{Math.round(100 * job.progress)} %</span>
          </p>
          <ProgressRule label={`Progress of ${exportTitle(job)}`} share={job.progress} />
        </div>
      );
    case 'done':
      return (
        <div>
          <p className="font-mono text-dense">{sizeWords(job.file?.bytes ?? 0)}</p>
          <p className="text-caption text-ink-3">
            {job.removedAt && `Kept until ${dayWords(job.removedAt)}`}
          </p>
        </div>
      );
    case 'cancelled':
      return <p className="text-dense text-ink-2">Cancelled</p>;
    case 'failed':
      return <p className="text-dense font-medium text-red">Failed</p>;
  }
}

function Buttons({ job, actions }: { job: ExportJob; actions: ExportActions }) {
  const { busy } = actions;
  const of = exportTitle(job);
  if (job.state === 'waiting' || job.state === 'running') {
    return (
      <Button disabled={busy} aria-label={`Cancel ${of}`} onClick={() => actions.onCancel(job)}>
        Cancel
      </Button>
    );
  }
  return (
    <>
      {job.state === 'done' ? (
        <a
          href={exportFileAddress(job.id)}
          download
          aria-label={`Download ${of}`}
          className={buttonClass('plain')}
        >
          Download
        </a>
      ) : (
        <Button disabled={busy} aria-label={`Try ${of} again`} onClick={() => actions.onRestart(job)}>
          Try again
        </Button>
      )}
      <Button kind="danger" aria-label={`Delete ${of}`} onClick={() => actions.onDelete(job)}>
        Delete
      </Button>
    </>
  );
}

/** Remarks that a reader of the files should know, each with its format. */
export function ExportWarnings({ warnings }: Pick<ExportJob, 'warnings'>) {
  if (warnings.length === 0) return null;
  return (
    <Notice kind="amber" title="To know about these files:">
      <ul className="mt-1 list-disc pl-4">
        {warnings.map(({ format, text }, index) => (
          <li key={index} className="break-words">
            <span className="font-medium">{exportFormatWords[format].label}</span>: {text}
          </li>
        ))}
      </ul>
    </Notice>
  );
}

/** One export: what it is, how far it is, what can be done with it. */
export function ExportRow({ job, actions }: { job: ExportJob; actions: ExportActions }) {
  return (
    <li className="border-b border-rule py-4">
      <div className="grid gap-x-6 gap-y-3 tablet:grid-cols-[minmax(0,1fr)_180px_220px]">
        <About job={job} />
        <Standing job={job} />
        <div className="flex flex-wrap content-start items-start gap-2.5 tablet:justify-end">
          <Buttons job={job} actions={actions} />
        </div>
      </div>
      {(job.failure || job.warnings.length > 0) && (
        <div className="mt-3 max-w-3xl">
          {job.failure && (
            <Notice kind="red" title="The export failed.">
              {job.failure}
            </Notice>
          )}
          <ExportWarnings warnings={job.warnings} />
        </div>
      )}
    </li>
  );
}
