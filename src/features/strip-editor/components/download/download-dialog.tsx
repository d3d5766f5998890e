import { useState } from 'react';
import type { CreateExportInput } from '../../../../../shared/api/exports';
import type { StripParameters } from '../../../../../shared/parameters/strip-parameters';
import { ApiError } from '../../../../api/http';
import { isUnfinished } from '../../../../api/exports';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import { Notice } from '../../../../components/notice';
import { DownloadForm, type DownloadChoice } from './download-form';
import { DownloadProgress } from './download-progress';
import { useDownload } from './use-download';

interface DownloadDialogProps {
  /** What is exported: as the editor shows it, saved or not. */
  parameters: StripParameters;
  /** The saved strip, when nothing was changed since. */
  stripId: string | null;
  onClose(): void;
}

/** Why an export was refused: at the length where that is the reason, else in a sentence. */
function refusalOf(error: Error | null): { duration?: string; words?: string } {
  if (!error) return {};
  if (!(error instanceof ApiError)) return { words: 'Something went wrong; try again.' };
  const problem = error.problems[0];
  if (!problem) return { words: error.message };
  if (problem.path === 'durationS')
    return { duration: `${problem.value} s is too long: ${problem.allowed}.` };
  return { words: `${problem.path}: ${problem.value} is not allowed; allowed: ${problem.allowed}.` };
}

/** The strip as files: choose formats and length, wait, have them in the downloads. */
export function DownloadDialog({ parameters, stripId, onClose }: DownloadDialogProps) {
  const { durationS, recorder } = parameters;
  const [choice, setChoice] = useState<DownloadChoice>({ formats: ['csv'], bundle: false, durationS });
  const { ask, asking, error, job } = useDownload();
  const refusal = refusalOf(error);
  const start = (): void => {
    const source: CreateExportInput = stripId ? { stripId, formats: [] } : { parameters, formats: [] };
    ask({ ...source, ...choice, formats: [...choice.formats] });
  };
  return (
    <Dialog
      open
      title="Download"
      description={job || stripId ? undefined : 'The strip as it stands here, also what is not saved of it.'}
      onClose={onClose}
    >
      {job ? (
        <div className="mt-4">
          <DownloadProgress job={job} />
        </div>
      ) : (
        <>
          {refusal.words && (
            <div className="mt-3">
              <Notice kind="red" title="Not exported.">
                {refusal.words}
              </Notice>
            </div>
          )}
          <DownloadForm
            choice={choice}
            sampleRateHz={recorder.sampleRateHz}
            durationError={refusal.duration}
            onChange={setChoice}
          />
        </>
      )}
      <div className="mt-5 flex flex-wrap items-center justify-end gap-2.5">
        {!job && choice.formats.length === 0 && (
          <span className="mr-auto text-dense text-ink-3">Choose a format first.</span>
        )}
        <Button onClick={onClose}>
          {job ? (isUnfinished(job) ? 'Go on meanwhile' : 'Close') : 'Cancel'}
        </Button>
        {!job && (
          <Button kind="primary" disabled={asking || choice.formats.length === 0} onClick={start}>
            {asking ? 'Asking …' : 'Download'}
          </Button>
        )}
      </div>
    </Dialog>
  );
}
