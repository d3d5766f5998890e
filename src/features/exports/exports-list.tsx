import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { exportKeptDays, type ExportJob, type ExportList } from '../../../shared/api/exports';
import { cancelExport, deleteExport, exportKeys, exportListQuery, restartExport } from '../../api/exports';
import { Button, buttonClass } from '../../components/button';
import { ConfirmDialog } from '../../components/dialog';
import { EmptyState } from '../../components/empty-state';
import { Notice } from '../../components/notice';
import { useToast } from '../../components/toast';
import { paths } from '../../lib/paths';
import { sizeWords } from '../../lib/quantity-words';
import { ExportRow, exportTitle } from './export-row';

function useExportActions() {
  const queryClient = useQueryClient();
  const toast = useToast();
  const shared = {
    onSettled: () => queryClient.invalidateQueries({ queryKey: exportKeys.all }),
    onError: (error: Error) => toast(`That did not work. ${error.message}`),
  };
  const cancelling = useMutation({ mutationFn: (job: ExportJob) => cancelExport(job.id), ...shared });
  const restarting = useMutation({ mutationFn: (job: ExportJob) => restartExport(job.id), ...shared });
  const deleting = useMutation({
    mutationFn: (job: ExportJob) => deleteExport(job.id),
    onSuccess: () => toast('Export deleted'),
    ...shared,
  });
  return {
    cancel: cancelling.mutate,
    restart: restarting.mutate,
    remove: deleting.mutate,
    busy: cancelling.isPending || restarting.isPending,
  };
}

/** How much of the space is taken, as a sentence. */
function Space({ usedBytes, spaceBytes }: ExportList) {
  return (
    <p role="status" className="mt-4 text-caption text-ink-3">
      {sizeWords(usedBytes)} of {sizeWords(spaceBytes)} used. Exports are removed after {exportKeptDays} days.
    </p>
  );
}

/** One's exports: those being made, with their progress, and those that can be fetched. */
export function ExportsList() {
  const { data: list, error, isPending, refetch } = useQuery(exportListQuery);
  const actions = useExportActions();
  const [confirming, setConfirming] = useState<ExportJob | null>(null);
  return (
    <main className="mx-auto w-full max-w-6xl px-4 py-5 tablet:px-6">
      <h1 className="text-title font-semibold tracking-[-0.012em]">Exports</h1>
      <p className="mt-1 max-w-prose text-body text-ink-2">
        Files made of your strips: synthetic teaching material, not patient recordings. Only you see them.
      </p>
      <div className="mt-4">
        {error && (
          <div className="mb-5 flex flex-wrap items-center gap-3">
            <Notice kind="red" title="The exports could not be listed.">
              {error.message}
            </Notice>
            <Button onClick={() => void refetch()}>Try again</Button>
          </div>
        )}
        {isPending && !error && <p className="text-body text-ink-3">Looking for exports …</p>}
        {list && list.exports.length === 0 && (
          <EmptyState
            title="No exports yet"
            text="Open a strip and choose Download under More. Long recordings are made in the background and wait here."
          >
            <Link to={paths.strips()} className={buttonClass('plain')}>
              Choose a strip
            </Link>
          </EmptyState>
        )}
        {list && list.exports.length > 0 && (
          <ul aria-label="Exports" className="border-t border-edge">
            {list.exports.map((job) => (
              <ExportRow
                key={job.id}
                job={job}
                actions={{
                  onCancel: actions.cancel,
                  onRestart: actions.restart,
                  onDelete: setConfirming,
                  busy: actions.busy,
                }}
              />
            ))}
          </ul>
        )}
        {list && <Space {...list} />}
      </div>
      <ConfirmDialog
        open={confirming !== null}
        title={`Delete the export of “${confirming ? exportTitle(confirming) : ''}”?`}
        description="Its file is removed for good. The strip stays, and can be exported again."
        safe="Keep it"
        action="Delete"
        danger
        onAct={() => {
          if (confirming) actions.remove(confirming);
          setConfirming(null);
        }}
        onClose={() => setConfirming(null)}
      />
    </main>
  );
}
