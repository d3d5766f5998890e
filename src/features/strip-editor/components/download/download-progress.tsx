import { Link } from 'react-router-dom';
import type { ExportJob } from '../../../../../shared/api/exports';
import { exportFormatWords } from '../../../../../shared/formats/export-format';
import { exportFileAddress } from '../../../../api/exports';
import { Notice } from '../../../../components/notice';
import { ProgressRule } from '../../../../components/progress-rule';
import { paths } from '../../../../lib/paths';
import { dayWords, sizeWords } from '../../../../lib/quantity-words';

const exportsLink = (
  <Link to={paths.exports()} className="font-medium text-teal-dark underline">
    Exports
  </Link>
);

function Done({ job }: { job: ExportJob }) {
  return (
    <div className="flex flex-col gap-3">
      <p role="status" className="text-body break-words">
        <strong className="font-semibold">{job.file?.name}</strong>, {sizeWords(job.file?.bytes ?? 0)}, is in
        your downloads. It is kept under {exportsLink}
        {job.removedAt && ` until ${dayWords(job.removedAt)}`}.{' '}
        <a href={exportFileAddress(job.id)} download className="font-medium text-teal-dark underline">
          Download it again
        </a>
      </p>
      {job.warnings.length > 0 && (
        <Notice kind="amber" title="To know about these files:">
          <ul className="mt-1 max-h-40 list-disc overflow-auto pl-4" tabIndex={0} aria-label="Remarks">
            {job.warnings.map(({ format, text }, index) => (
              <li key={index} className="break-words">
                <span className="font-medium">{exportFormatWords[format].label}</span>: {text}
              </li>
            ))}
          </ul>
        </Notice>
      )}
    </div>
  );
}

/** From waiting to the file, or to why there is none. */
export function DownloadProgress({ job }: { job: ExportJob }) {
  if (job.state === 'done') return <Done job={job} />;
  if (job.state === 'failed' || job.state === 'cancelled') {
    return (
      <Notice kind="red" title={job.state === 'failed' ? 'The export failed.' : 'The export was cancelled.'}>
        {job.failure} The strip is untouched.
      </Notice>
    );
  }
  return (
    <div>
      <p className="mb-2 flex justify-between text-body text-ink-2">
        <span>{job.state === 'waiting' ? 'Waits for its turn …' : 'Being made …'}</span>
        <span className="font-mono text-dense">{Math.round(100 * job.progress)} %</span>
      </p>
      <ProgressRule label="Progress of the export" share={job.progress} />
      <p className="mt-3 text-dense text-ink-3">
        You may close this and go on: it is made all the same and waits under {exportsLink}.
      </p>
    </div>
  );
}
