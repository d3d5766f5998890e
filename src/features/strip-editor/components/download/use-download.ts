import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { CreateExportInput, ExportJob } from '../../../../../shared/api/exports';
import { createExport, exportFileAddress, exportKeys, exportQuery } from '../../../../api/exports';
import { downloadFrom } from '../../../../lib/download';

/** An export from asking for it to its file in the browser's downloads. */
export function useDownload() {
  const queryClient = useQueryClient();
  const [id, setId] = useState<string | null>(null);
  const fetched = useRef<string | null>(null);
  const asking = useMutation({
    mutationFn: (request: CreateExportInput) => createExport(request),
    onSuccess: async (job) => {
      queryClient.setQueryData(exportKeys.one(job.id), job);
      setId(job.id);
      await queryClient.invalidateQueries({ queryKey: exportKeys.list });
    },
  });
  const { data: job = null } = useQuery({ ...exportQuery(id ?? ''), enabled: id !== null });
  useEffect(() => {
    if (job?.state !== 'done' || fetched.current === job.id) return;
    fetched.current = job.id;
    downloadFrom(exportFileAddress(job.id));
    void queryClient.invalidateQueries({ queryKey: exportKeys.list });
  }, [job, queryClient]);
  return { ask: asking.mutate, asking: asking.isPending, error: asking.error, job: job as ExportJob | null };
}
