import { useMutation, useQueryClient } from '@tanstack/react-query';
import { stripSchema, type Strip } from '../../../../shared/api/strips';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import { ApiError } from '../../../api/http';
import { createStrip, stripKeys, updateStrip } from '../../../api/strips';
import { tagsOf, type StripDetails } from './strip-details';

interface Kept {
  details: StripDetails;
  parameters: StripParameters;
}

/** Why a strip was not saved; nothing of the work is lost. */
export type SaveProblem = { kind: 'stale'; current: Strip } | { kind: 'refused'; words: string };

function problemOf(error: unknown): SaveProblem {
  if (!(error instanceof ApiError)) return { kind: 'refused', words: 'Something went wrong; try again.' };
  const current = error.id === 'staleStrip' ? stripSchema.safeParse(error.details.current) : null;
  if (current?.success) return { kind: 'stale', current: current.data };
  const field = error.problems[0];
  return { kind: 'refused', words: field ? `${field.path}: allowed is ${field.allowed}.` : error.message };
}

function bodyOf({ details: { tagWords, ...details }, parameters }: Kept) {
  return { ...details, tags: tagsOf(tagWords), parameters };
}

/** Saving under an id, or as a new strip. */
export interface Saving {
  busy: boolean;
  create(kept: Kept): Promise<Strip | SaveProblem>;
  update(strip: Pick<Strip, 'id' | 'version'>, kept: Kept): Promise<Strip | SaveProblem>;
}

export function isProblem(outcome: Strip | SaveProblem): outcome is SaveProblem {
  return 'kind' in outcome;
}

export function useSaving(): Saving {
  const queryClient = useQueryClient();
  const onSuccess = async (strip: Strip): Promise<void> => {
    queryClient.setQueryData(stripKeys.one(strip.id), strip);
    await queryClient.invalidateQueries({ queryKey: [...stripKeys.all, 'list'] });
  };
  const creating = useMutation({ mutationFn: (kept: Kept) => createStrip(bodyOf(kept)), onSuccess });
  const updating = useMutation({
    mutationFn: ({ id, version, kept }: { id: string; version: number; kept: Kept }) =>
      updateStrip(id, { version, ...bodyOf(kept) }),
    onSuccess,
  });
  const outcome = (saved: Promise<Strip>): Promise<Strip | SaveProblem> => saved.catch(problemOf);
  return {
    busy: creating.isPending || updating.isPending,
    create: (kept) => outcome(creating.mutateAsync(kept)),
    update: ({ id, version }, kept) => outcome(updating.mutateAsync({ id, version, kept })),
  };
}
